import 'server-only';
import { createHash } from 'node:crypto';
import { eq } from 'drizzle-orm';
import type { Tx } from '@/db/client';
import { letters, lettersDue, letterTexts } from '@/db/schema/letters';
import { asId, type Id } from '@/lib/core/ids';
import { firstOrNull } from '@/lib/core/only';
import { Refusal } from '@/lib/core/refusal';
import { recordChange } from '@/lib/club/commands';
import type { AccountCtx } from '@/lib/infra/context';
import { enqueue } from '@/lib/infra/queue';
import { inTransaction } from '@/lib/infra/transaction';
import { SEND_LETTER, sendLetterKey } from './jobs';
import type { LetterFacts, LetterKind, SendAgainInput } from './schema';

/** A letter to be written in the transaction of its cause. `key` says what happened: the same cause never makes two letters. */
export type NewLetter<K extends LetterKind = LetterKind> = {
  key: string;
  kind: K;
  to: { name: string | null; address: string };
  madeAt: Date;
  dueAt: Date;
  openDayId?: Id<'openDay'>;
  bookingId?: Id<'booking'>;
  householdId?: Id<'household'>;
  facts: LetterFacts<K>;
};

/** Writes a letter into the outbox, inside the caller's transaction; returns its id, or null when its key is there already. */
export async function queueLetter<K extends LetterKind>(tx: Tx, letter: NewLetter<K>): Promise<Id<'letter'> | null> {
  const { key, kind, to, madeAt, dueAt, openDayId, bookingId, householdId, facts } = letter;
  const hash = createHash('sha256').update(JSON.stringify([key, kind, to, facts])).digest('base64url');
  const made = firstOrNull(await tx.insert(letters).values({ key, kind, madeAt, hash, openDayId, bookingId, householdId })
    .onConflictDoNothing({ target: letters.key }).returning({ id: letters.id }));
  if (!made) return null;
  await tx.insert(letterTexts).values({ letterId: made.id, toName: to.name, toAddress: to.address, facts });
  await tx.insert(lettersDue).values({ letterId: made.id, dueAt });
  if (dueAt <= madeAt) await enqueue(tx, SEND_LETTER, { letterId: made.id }, { runAt: dueAt, jobKey: sendLetterKey(made.id) });
  return made.id;
}

/** Makes a letter due again at once, for an officer; a letter whose words were erased is not there any more. */
export async function sendAgain(ctx: AccountCtx, input: SendAgainInput): Promise<void> {
  const letterId = asId<'letter'>(input.letterId);
  await inTransaction(ctx.db, async (tx) => {
    const letter = firstOrNull(await tx.select({ kind: letters.kind, address: letterTexts.toAddress, facts: letterTexts.facts })
      .from(letters).innerJoin(letterTexts, eq(letterTexts.letterId, letters.id)).where(eq(letters.id, letterId)));
    if (!letter?.address || !letter.facts) throw new Refusal('not_found');
    if (letter.kind === 'sign-in') throw new Refusal('not_allowed', { sentence: 'A sign-in code is sent once. They can ask for a new one on the sign-in page.' });
    await tx.insert(lettersDue).values({ letterId, dueAt: ctx.now })
      .onConflictDoUpdate({ target: lettersDue.letterId, set: { dueAt: ctx.now } });
    await enqueue(tx, SEND_LETTER, { letterId }, { runAt: ctx.now, jobKey: sendLetterKey(letterId) });
    await recordChange(tx, ctx, { action: 'sent a letter again', subjectKind: 'letter', subjectId: letterId });
  });
}
