import 'server-only';
import { and, eq, sql } from 'drizzle-orm';
import type { Tx } from '@/db/client';
import { bookings, visits } from '@/db/schema/bookings';
import { cardPayments, paymentAttempts, payments, refunds } from '@/db/schema/books';
import { entryTimes } from '@/db/schema/opendays';
import { nextReceipt, postEntry } from '@/lib/books/commands';
import type { Id } from '@/lib/core/ids';
import { firstOrNull, only } from '@/lib/core/only';
import { Refusal } from '@/lib/core/refusal';
import { dayOf } from '@/lib/core/time';
import { settleCharge } from '@/lib/dues/commands';
import type { SessionSnapshot } from '@/lib/infra/cards';
import type { Ctx, SystemCtx } from '@/lib/infra/context';
import { log } from '@/lib/infra/log';
import { inTransaction } from '@/lib/infra/transaction';
import { queueLetter } from '@/lib/letters/commands';
import { confirmBooking, findParty } from './confirm';
import { movePlaces, releaseHold } from './places';

/** What became of a snapshot: `kept` when it changed nothing, because it came again, too early, or belongs to no attempt of ours. */
export type Applied = 'confirmed' | 'refunded' | 'expired' | 'kept';

/**
 * Applies what the processor says of a session: the one command for the webhook and the reconciler, however often, late
 * or out of order it is told. Locks the booking, then its attempt; unique on the payment and its outcome.
 */
export async function applyPayment(ctx: SystemCtx, snapshot: SessionSnapshot): Promise<Applied> {
  if (!snapshot.isPaid && snapshot.status !== 'expired') return 'kept';
  return inTransaction(ctx.db, async (tx) => {
    const locked = await lockPaid(tx, snapshot);
    if (!locked) {
      log.warn('payment of no attempt of ours', { session: snapshot.sessionId.slice(0, 12) });
      return 'kept';
    }
    return snapshot.isPaid ? applyPaid(tx, ctx, locked, snapshot) : expireAttempt(tx, ctx, locked);
  });
}

type Attempt = { id: Id<'attempt'>; bookingId: Id<'booking'> | null; chargeId: Id<'charge'> | null; amountMinor: number; currency: string; endedAt: Date | null };
type Booking = { id: Id<'booking'>; openDayId: Id<'openDay'>; householdId: Id<'household'> | null; heldUntil: Date; confirmedAt: Date | null; releasedAt: Date | null };
type Locked = { attempt: Attempt; booking: Booking | null };

const attemptFacts = { id: paymentAttempts.id, bookingId: paymentAttempts.bookingId, chargeId: paymentAttempts.chargeId, amountMinor: paymentAttempts.amountMinor, currency: paymentAttempts.currency, endedAt: paymentAttempts.endedAt };
const bookingFacts = { id: bookings.id, openDayId: bookings.openDayId, householdId: bookings.householdId, heldUntil: bookings.heldUntil, confirmedAt: bookings.confirmedAt, releasedAt: bookings.releasedAt };

/** The attempt a session belongs to and its booking, both read under their locks, the booking's first. */
async function lockPaid(tx: Tx, snapshot: SessionSnapshot): Promise<Locked | null> {
  const known = firstOrNull(await tx.select({ id: paymentAttempts.id, bookingId: paymentAttempts.bookingId }).from(paymentAttempts)
    .where(sql`${paymentAttempts.sessionId} = ${snapshot.sessionId} or (${paymentAttempts.sessionId} is null and ${paymentAttempts.id}::text = ${snapshot.attemptId ?? ''})`));
  if (!known) return null;
  const booking = known.bookingId === null ? null : only(await tx.select(bookingFacts).from(bookings).where(eq(bookings.id, known.bookingId)).for('no key update'));
  const attempt = only(await tx.select(attemptFacts).from(paymentAttempts).where(eq(paymentAttempts.id, known.id)).for('no key update'));
  return { attempt, booking };
}

async function applyPaid(tx: Tx, ctx: SystemCtx, { attempt, booking }: Locked, snapshot: SessionSnapshot): Promise<Applied> {
  if (snapshot.paymentIntentId === null || snapshot.amountMinor !== attempt.amountMinor || snapshot.currency !== attempt.currency) {
    log.error('payment of another amount or currency', new Error('payment does not match its attempt'), { attempt: attempt.id });
    return 'kept';
  }
  const isNews = await tx.insert(cardPayments).values({
    objectId: snapshot.paymentIntentId, outcome: 'paid', attemptId: attempt.id, amountMinor: attempt.amountMinor, currency: attempt.currency, appliedAt: ctx.now,
  }).onConflictDoNothing().returning({ id: cardPayments.id });
  if (isNews.length === 0) return 'kept';
  await tx.update(paymentAttempts).set({ endedAt: attempt.endedAt ?? ctx.now, outcome: 'paid', paymentIntentId: snapshot.paymentIntentId, sessionId: snapshot.sessionId }).where(eq(paymentAttempts.id, attempt.id));
  const placed = booking === null ? await settleDues(tx, ctx, attempt) : await settleBooking(tx, ctx, attempt, booking);
  if (!placed) await sendAllBack(tx, ctx, attempt, booking);
  return placed ? 'confirmed' : 'refunded';
}

/** Pays the charge; false when it was paid another way meanwhile or is not owed any more. */
async function settleDues(tx: Tx, ctx: Ctx, attempt: Attempt): Promise<boolean> {
  if (attempt.chargeId === null) return false;
  try {
    await settleCharge(tx, ctx, { chargeId: attempt.chargeId, method: 'card', amountMinor: attempt.amountMinor, receivedOn: dayOf(ctx.now, ctx.club.timeZone), attemptId: attempt.id });
    return true;
  } catch (error) {
    if (error instanceof Refusal) return false; // it refuses before it writes
    throw error;
  }
}

/** Confirms the booking and books the money; places that were given back are taken again if they are there. False when they are gone. */
async function settleBooking(tx: Tx, ctx: Ctx, attempt: Attempt, booking: Booking): Promise<boolean> {
  if (booking.confirmedAt !== null) return false; // paid twice: the second payment goes back
  if (booking.releasedAt !== null && !(await takeAgain(tx, ctx.now, booking.id, booking.releasedAt))) return false;
  await confirmBooking(tx, ctx, booking.id);
  const receivedOn = dayOf(ctx.now, ctx.club.timeZone);
  const receipt = await nextReceipt(tx, Number(receivedOn.slice(0, 4)));
  const payment = only(await tx.insert(payments).values({
    bookingId: booking.id, householdId: booking.householdId, method: 'card', amountMinor: attempt.amountMinor, currency: attempt.currency, receivedOn,
    attemptId: attempt.id, receiptYear: receipt.year, receiptNumber: receipt.number, recordedAt: ctx.now,
  }).returning({ id: payments.id }));
  await postEntry(tx, ctx, { kind: 'received', method: 'card', for: 'tickets', amountMinor: attempt.amountMinor },
    { sourceId: payment.id, openDayId: booking.openDayId, householdId: booking.householdId, currency: attempt.currency });
  return true;
}

/** Takes the places of a hold that was given back once more, all or none; a closed or ended entry time has none. */
async function takeAgain(tx: Tx, now: Date, bookingId: Id<'booking'>, releasedAt: Date): Promise<boolean> {
  const lost = await tx.select({ id: visits.id, entryTimeId: visits.entryTimeId, heads: visits.heads, graceUntil: entryTimes.graceUntil })
    .from(visits).innerJoin(entryTimes, eq(entryTimes.id, visits.entryTimeId)).where(and(eq(visits.bookingId, bookingId), eq(visits.givenBackAt, releasedAt)));
  if (lost.length === 0 || lost.some((visit) => visit.graceUntil <= now)) return false;
  const isThere = await tryInside(tx, (inner) => movePlaces(inner, lost));
  if (!isThere) return false;
  for (const visit of lost) await tx.update(visits).set({ givenBackAt: null }).where(eq(visits.id, visit.id));
  return true;
}

/** Runs `work` in a savepoint that is undone when it answers false: some places may have been moved before one was full. */
async function tryInside(tx: Tx, work: (inner: Tx) => Promise<boolean>): Promise<boolean> {
  const undone = new Error('undone');
  try {
    await tx.transaction(async (inner) => {
      if (!(await work(inner))) throw undone;
    });
    return true;
  } catch (error) {
    if (error === undone) return false;
    throw error;
  }
}

/** Money without places: a full refund is due at once, with a letter that says so. */
async function sendAllBack(tx: Tx, ctx: Ctx, attempt: Attempt, booking: Booking | null): Promise<void> {
  const forWhat = attempt.bookingId === null ? 'dues' : 'tickets';
  await tx.insert(refunds).values({ attemptId: attempt.id, amountMinor: attempt.amountMinor, currency: attempt.currency, reason: forWhat === 'tickets' ? 'the places were gone' : 'it was paid already', askedAt: ctx.now, dueAt: ctx.now });
  await postEntry(tx, ctx, { kind: 'unplaced', for: forWhat, amountMinor: attempt.amountMinor }, { sourceId: attempt.id, currency: attempt.currency, openDayId: booking?.openDayId ?? null });
  const party = attempt.bookingId === null ? null : await findParty(tx, attempt.bookingId);
  if (party) await queueLetter(tx, { key: `places-lost:${attempt.id}`, kind: 'places-lost', to: party.to, madeAt: ctx.now, dueAt: ctx.now, openDayId: party.openDayId, bookingId: party.bookingId, facts: { refundMinor: attempt.amountMinor } });
  log.warn('money came without places', { attempt: attempt.id });
}

/** The processor says that the session expired unpaid: the attempt ends, and the places are free if the party's time is up. */
async function expireAttempt(tx: Tx, ctx: Ctx, { attempt, booking }: Locked): Promise<Applied> {
  if (attempt.endedAt !== null) return 'kept'; // a late word after "paid" changes nothing
  await tx.update(paymentAttempts).set({ endedAt: ctx.now, outcome: 'expired' }).where(eq(paymentAttempts.id, attempt.id));
  if (booking && booking.confirmedAt === null && booking.releasedAt === null && booking.heldUntil <= ctx.now) await releaseHold(tx, booking.id, ctx.now);
  return 'expired';
}
