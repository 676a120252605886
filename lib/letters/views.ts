import type { Id } from '@/lib/core/ids';

/** Rows of one page of the office's letters. */
export const LETTER_PAGE_ROWS = 50;

/** How a letter stands: waiting for its time, failing and tried again, sent, or not sent any more. */
export type LetterState = 'waiting' | 'failing' | 'sent' | 'dropped';

/** One line of the office's list. */
export type LetterRow = {
  id: Id<'letter'>; kind: string; kindWords: string; madeAt: Date; to: string; subject: string | null; state: LetterState;
  /** When it was last tried, or null. */
  triedAt: Date | null;
  /** When it is tried next, or null. */
  dueAt: Date | null;
  detail: string | null;
  maySendAgain: boolean;
};

/** One page of the list. */
export type LetterPage = { rows: LetterRow[]; total: number; page: number; pages: number };

/** One letter opened: its words without codes, links and addresses (null until it was sent), and each try. */
export type LetterView = LetterRow & { text: string | null; tries: { triedAt: Date; outcome: 'sent' | 'failed' | 'dropped'; detail: string | null }[] };

const KINDS: Record<string, string> = {
  confirmation: 'confirmation', change: 'change', 'given-back': 'given back', refund: 'refund', 'places-lost': 'places lost', reminder: 'reminder',
  calendar: 'invitation to a calendar', 'sign-in': 'sign-in code', invitation: 'invitation of an officer', 'dues-receipt': 'dues receipt', notice: 'notice',
};

/** A kind of letter in the office's words. */
export const kindWords = (kind: string): string => KINDS[kind] ?? kind;

type Facts = {
  id: Id<'letter'>; kind: string; madeAt: Date; toName: string | null; toAddress: string | null; subject: string | null; dueAt: Date | null; tries: number | null;
  outcome: 'sent' | 'failed' | 'dropped' | null; triedAt: string | Date | null; detail: string | null;
};

/** A line of the list from what the tables say. */
export function toLetterRow(facts: Facts): LetterRow {
  const { id, kind, madeAt, subject, dueAt, detail } = facts;
  const to = facts.toAddress === null ? '(erased)' : facts.toName ? `${facts.toName} <${facts.toAddress}>` : facts.toAddress;
  return {
    id, kind, kindWords: kindWords(kind), madeAt, to, subject, state: stateOf(facts), triedAt: facts.triedAt === null ? null : new Date(facts.triedAt), dueAt, detail,
    maySendAgain: facts.toAddress !== null && kind !== 'sign-in',
  };
}

function stateOf({ dueAt, tries, outcome }: Facts): LetterState {
  if (dueAt !== null) return (tries ?? 0) > 0 && outcome === 'failed' ? 'failing' : 'waiting';
  return outcome === 'dropped' ? 'dropped' : 'sent';
}
