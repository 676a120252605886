import 'server-only';
import { createHash } from 'node:crypto';
import { and, eq, lte, sql } from 'drizzle-orm';
import type { Tx } from '@/db/client';
import { placeShowings } from '@/db/schema/gardens';
import { letters, lettersDue, letterTexts, sendings } from '@/db/schema/letters';
import type { Id } from '@/lib/core/ids';
import { firstOrNull } from '@/lib/core/only';
import { addMinutes } from '@/lib/core/time';
import type { SystemCtx } from '@/lib/infra/context';
import { log } from '@/lib/infra/log';
import { mailFailure, sendMail } from '@/lib/infra/mail';
import { inTransaction } from '@/lib/infra/transaction';
import { composeLetter, type Composed, type OutboxLetter } from './compose';
import { siteHost } from './links';
import { letterHtml } from './rules/html';
import { blanked, type Letter } from './rules/letter';
import { letterText } from './rules/plain';
import { oneLine } from './rules/printable';

const LONGEST_WAIT = 6 * 60;

/** Minutes until a letter is tried again after `tries` tries: 1, 2, 4 … to six hours, for ever. */
export const waitMinutes = (tries: number): number => Math.min(2 ** Math.max(0, tries - 1), LONGEST_WAIT);

/** The Message-ID of a letter, made from its key: sent twice, it is the same, and mail programs show it once. */
export const messageIdOf = (key: string, host: string): string => `<${createHash('sha256').update(key).digest('hex').slice(0, 40)}@${host}>`;

/**
 * Sends one letter if it is due. Taking it moves its due time on by the next wait, in one statement, so that two workers
 * never send it at once and a worker that dies leaves it to be tried again. Sent, it is recorded and due no more.
 */
export async function sendLetter(ctx: SystemCtx, letterId: Id<'letter'>): Promise<'sent' | 'failed' | 'dropped' | 'not due'> {
  const taken = await takeDue(ctx, letterId);
  if (!taken) return 'not due';
  const outbox = await findOutbox(ctx, letterId);
  const composed: Composed = outbox ? await composeLetter(ctx, outbox) : { dropped: 'Its words were erased.' };
  if ('dropped' in composed) {
    await settle(ctx, letterId, taken.nextAt, 'dropped', composed.dropped);
    return 'dropped';
  }
  try {
    await sendMail(toMail(ctx, taken.key, outbox, composed));
  } catch (error) {
    const detail = mailFailure(error);
    log.warn('letter not sent', { letterId, kind: outbox?.kind, tries: taken.tries });
    await ctx.db.insert(sendings).values({ letterId, triedAt: ctx.now, outcome: 'failed', detail });
    return 'failed';
  }
  await settle(ctx, letterId, taken.nextAt, 'sent', null, async (tx) => keepWords(tx, ctx, outbox, composed));
  return 'sent';
}

async function takeDue({ db, now }: SystemCtx, letterId: Id<'letter'>): Promise<{ tries: number; nextAt: Date; key: string } | null> {
  return inTransaction(db, async (tx) => {
    const row = firstOrNull(await tx.select({ tries: lettersDue.tries, key: letters.key }).from(lettersDue).innerJoin(letters, eq(letters.id, lettersDue.letterId))
      .where(and(eq(lettersDue.letterId, letterId), lte(lettersDue.dueAt, now))).for('no key update', { of: lettersDue, skipLocked: true }));
    if (!row) return null;
    const tries = row.tries + 1;
    const nextAt = addMinutes(now, waitMinutes(tries));
    await tx.update(lettersDue).set({ tries, dueAt: nextAt }).where(eq(lettersDue.letterId, letterId));
    return { tries, nextAt, key: row.key };
  });
}

async function findOutbox({ db }: SystemCtx, letterId: Id<'letter'>): Promise<OutboxLetter | null> {
  const row = firstOrNull(await db.select({
    id: letters.id, kind: letters.kind, bookingId: letters.bookingId, madeAt: letters.madeAt, name: letterTexts.toName, address: letterTexts.toAddress, facts: letterTexts.facts,
  }).from(letters).innerJoin(letterTexts, eq(letterTexts.letterId, letters.id)).where(eq(letters.id, letterId)));
  if (!row?.address || !row.facts) return null;
  return { id: row.id, kind: row.kind, bookingId: row.bookingId, madeAt: row.madeAt, to: { name: row.name ?? '', address: row.address }, facts: row.facts };
}

function toMail({ club }: SystemCtx, key: string, outbox: OutboxLetter | null, { letter, calendar }: { letter: Letter; calendar: Exclude<Composed, { dropped: string }>['calendar'] }) {
  const address = (outbox?.to.address ?? '').replace(/[\u0000-\u001f\u007f]/g, '');
  return {
    messageId: messageIdOf(key, siteHost()), from: { name: oneLine(club.name), address: club.email }, to: { name: oneLine(outbox?.to.name ?? ''), address },
    subject: oneLine(letter.subject), html: letterHtml(letter), text: letterText(letter), calendar,
  };
}

/** Records how a try ended and, in the same transaction, that the letter is due no more, unless an officer asked again meanwhile. */
async function settle({ db, now }: SystemCtx, letterId: Id<'letter'>, nextAt: Date, outcome: 'sent' | 'dropped', detail: string | null, also?: (tx: Tx) => Promise<void>): Promise<void> {
  await inTransaction(db, async (tx) => {
    await tx.insert(sendings).values({ letterId, triedAt: now, outcome, detail });
    await tx.delete(lettersDue).where(and(eq(lettersDue.letterId, letterId), eq(lettersDue.dueAt, nextAt)));
    await also?.(tx);
  });
}

/** Keeps the words for the office with codes, links and addresses left out, the SEQUENCE that went, and who was shown which place. */
async function keepWords(tx: Tx, { now }: SystemCtx, outbox: OutboxLetter | null, composed: Exclude<Composed, { dropped: string }>): Promise<void> {
  if (!outbox) return;
  const shown = blanked(composed.letter);
  const sequence = composed.gone === undefined ? {} : { sentSequence: composed.gone };
  await tx.update(letterTexts).set({ subject: oneLine(shown.subject), html: letterHtml(shown), text: letterText(shown), facts: { ...withoutSecrets(outbox.facts), ...sequence } })
    .where(and(eq(letterTexts.letterId, outbox.id), sql`${letterTexts.toAddress} is not null`));
  if (composed.shown.length > 0) await tx.insert(placeShowings).values(composed.shown.map((gardenId) => ({ gardenId, at: now, viewerKind: 'letter', viewerId: outbox.id })));
}

/** A sign-in code is of no use once it was sent; what is left of its facts names nothing. */
const withoutSecrets = ({ code, secret, ...rest }: Record<string, unknown>) => (code === undefined && secret === undefined ? rest : { ...rest, code: '', secret: '' });
