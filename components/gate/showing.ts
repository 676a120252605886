import { peopleCount, type Heads } from '@/lib/gate/rules/facts';
import { judge, type GateTicket, type Verdict } from '@/lib/gate/rules/verdict';
import type { Gate } from './use-gate';

/** A ticket that stands at the gate. Its next admission has its id already, so a double tap is one admission. */
export type Showing = { ticket: GateTicket | null; admitId: string };

/** Where the helper is. */
export type Place =
  | { at: 'watching'; note: string | null }
  | { at: 'ticket'; showing: Showing }
  | { at: 'some'; showing: Showing }
  | { at: 'why'; showing: Showing; heads: Heads }
  | { at: 'story'; showing: Showing }
  | { at: 'finding' }
  | { at: 'where' };

/** The ticket as the list has it now, or as it was shown. */
export const ticketNow = (gate: Gate, { ticket }: Showing): GateTicket | null =>
  ticket === null ? null : (gate.list.parties.find(({ visitId }) => visitId === ticket.visitId) ?? ticket);

/** The name on the list; a ticket that is not on it shows none. */
export const nameOf = (gate: Gate, ticket: GateTicket | null): string | null =>
  gate.list.parties.find(({ visitId }) => visitId === ticket?.visitId)?.name ?? null;

export const verdictNow = (gate: Gate, showing: Showing): Verdict => judge(ticketNow(gate, showing), gate.list.here, gate.fold, gate.now);

/** Puts a ticket before the gate; every no that is said is written down too. */
export function show(gate: Gate, ticket: GateTicket | null): Showing {
  const showing = { ticket, admitId: crypto.randomUUID() };
  const verdict = verdictNow(gate, showing);
  if (verdict.kind !== 'let_in') {
    const isHere = ticket !== null && ticket.stopId === gate.list.here.stopId;
    const heads = 'heads' in verdict ? verdict.heads : { adults: 0, children: 0, babes: 0 };
    gate.record({ id: crypto.randomUUID(), kind: 'refuse', undoesId: null, visitId: isHere ? ticket.visitId : null, ...heads, verdict: verdict.kind, reason: null });
  }
  return showing;
}

/**
 * Lets in `heads` of a shown ticket and answers with the showing it was let in by: an admission that was turned down or
 * taken back has spent its id. `reason` is what the helper says when the gate said not yet, late or full.
 */
export function letIn(gate: Gate, showing: Showing, heads: Heads, said: { verdict: string; reason: string | null }): Showing {
  const { ticket } = showing;
  if (ticket === null || peopleCount(heads) === 0) return showing;
  const isSpent = gate.fold.refused.has(showing.admitId) || gate.fold.undone.has(showing.admitId);
  const used = isSpent ? { ...showing, admitId: crypto.randomUUID() } : showing;
  const { adults, children, babes } = heads;
  gate.record({ id: used.admitId, kind: 'admit', undoesId: null, visitId: ticket.visitId, adults, children, babes, ...said });
  return used;
}

/** Takes a fact back; the fact stays written, and so does the taking back. */
export const takeBack = (gate: Gate, id: string): void =>
  gate.record({ id: crypto.randomUUID(), kind: 'undo', undoesId: id, visitId: null, adults: 0, children: 0, babes: 0, verdict: null, reason: null });

/** Counts one person out and says which fact it was, so that it can be taken back. */
export function countOut(gate: Gate): string {
  const id = crypto.randomUUID();
  gate.record({ id, kind: 'count-out', undoesId: null, visitId: null, adults: 1, children: 0, babes: 0, verdict: null, reason: null });
  return id;
}
