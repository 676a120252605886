import 'server-only';
import { and, asc, eq, isNull, lte, notExists, sql } from 'drizzle-orm';
import type { Db, Tx } from '@/db/client';
import { bookings, visits } from '@/db/schema/bookings';
import { paymentAttempts } from '@/db/schema/books';
import type { Id } from '@/lib/core/ids';
import { firstOrNull, only } from '@/lib/core/only';
import { log } from '@/lib/infra/log';
import { inTransaction } from '@/lib/infra/transaction';

/** Places taken (positive) or given back (negative) at one entry time. */
export type Move = { entryTimeId: Id<'entryTime'>; heads: number };

/**
 * Moves places at several entry times in one statement that locks them in id order; false when one is too full or closed,
 * and then the caller must roll back. Booking rows are locked before this, the receipt counter after.
 */
export async function movePlaces(tx: Tx, moves: readonly Move[]): Promise<boolean> {
  if (moves.length === 0) return true;
  const ids = sql.join(moves.map((move) => sql`${move.entryTimeId}::uuid`), sql`, `);
  const heads = sql.join(moves.map((move) => sql`${move.heads}::integer`), sql`, `);
  const { rows } = await tx.execute<{ moved: number }>(sql`select move_places(array[${ids}], array[${heads}]) as moved`);
  return only(rows).moved === new Set(moves.map((move) => move.entryTimeId)).size;
}

const openAttempt = (tx: Tx | Db) => tx.select({ id: paymentAttempts.id }).from(paymentAttempts).where(and(eq(paymentAttempts.bookingId, bookings.id), isNull(paymentAttempts.endedAt)));

/** Gives all places of a hold back; the caller has locked the booking and knows that it is neither confirmed nor released. */
export async function releaseHold(tx: Tx, bookingId: Id<'booking'>, now: Date): Promise<void> {
  await tx.update(bookings).set({ releasedAt: now }).where(eq(bookings.id, bookingId));
  const back = await tx.update(visits).set({ givenBackAt: now }).where(and(eq(visits.bookingId, bookingId), isNull(visits.givenBackAt)))
    .returning({ entryTimeId: visits.entryTimeId, heads: visits.heads });
  await movePlaces(tx, back.map(({ entryTimeId, heads }) => ({ entryTimeId, heads: -heads })));
}

/** Gives one hold back if, once locked, it is still there, has run out, and has no payment open. True when it did. */
export async function endHold(db: Db | Tx, bookingId: Id<'booking'>, now: Date): Promise<boolean> {
  return inTransaction(db, async (tx) => {
    const hold = firstOrNull(await tx.select({ heldUntil: bookings.heldUntil, confirmedAt: bookings.confirmedAt, releasedAt: bookings.releasedAt })
      .from(bookings).where(eq(bookings.id, bookingId)).for('no key update'));
    if (!hold || hold.confirmedAt !== null || hold.releasedAt !== null || hold.heldUntil > now) return false;
    // Asked after the lock: startPayment takes the same lock before it opens an attempt.
    const open = await tx.select({ id: paymentAttempts.id }).from(paymentAttempts).where(and(eq(paymentAttempts.bookingId, bookingId), isNull(paymentAttempts.endedAt))).limit(1);
    if (open.length > 0) return false;
    await releaseHold(tx, bookingId, now);
    return true;
  });
}

/** Gives back every hold that has run out and has no payment open, oldest first, at most 200 a call; how many. One that breaks does not keep the others. */
export async function endHolds(db: Db, now: Date): Promise<number> {
  const ended = await db.select({ id: bookings.id }).from(bookings)
    .where(and(isNull(bookings.confirmedAt), isNull(bookings.releasedAt), lte(bookings.heldUntil, now), notExists(openAttempt(db))))
    .orderBy(asc(bookings.heldUntil)).limit(200);
  let count = 0;
  for (const { id } of ended) {
    const isEnded = await endHold(db, id, now).catch((error: unknown) => {
      log.error('ended hold', error, { booking: id });
      return false;
    });
    if (isEnded) count += 1;
  }
  return count;
}
