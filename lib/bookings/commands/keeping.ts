import 'server-only';
import { and, eq, isNull } from 'drizzle-orm';
import type { Tx } from '@/db/client';
import { bookingContacts, bookings, visits } from '@/db/schema/bookings';
import { paymentAttempts } from '@/db/schema/books';
import type { Id } from '@/lib/core/ids';
import { firstOrNull } from '@/lib/core/only';
import { Refusal } from '@/lib/core/refusal';
import type { Ctx, HolderActor } from '@/lib/infra/context';
import { enqueue } from '@/lib/infra/queue';
import { inTransaction } from '@/lib/infra/transaction';
import { SETTLE_ATTEMPT, settleAttemptKey } from '../jobs';
import { keptLonger } from '../rules/hold';
import type { DetailsInput, HoldIdInput } from '../schema';
import { holdPlaces } from './hold';
import { releaseHold } from './places';

const held = {
  id: bookings.id, openDayId: bookings.openDayId, code: bookings.code, madeAt: bookings.madeAt, heldUntil: bookings.heldUntil, confirmedAt: bookings.confirmedAt, releasedAt: bookings.releasedAt,
  rulesAgreedAt: bookings.rulesAgreedAt, totalMinor: bookings.totalMinor, currency: bookings.currency, householdId: bookings.householdId, paymentMovedAt: bookings.paymentMovedAt,
};

/** This browser's own booking, locked; a stranger's is not there. */
export async function lockOwn(tx: Tx, { actor }: Ctx<HolderActor>, bookingId: Id<'booking'>) {
  const booking = firstOrNull(await tx.select(held).from(bookings).where(and(eq(bookings.id, bookingId), eq(bookings.holderHash, actor.holderHash))).for('no key update'));
  if (!booking) throw new Refusal('not_found');
  return booking;
}

/** As `lockOwn`, and the places are still kept at this moment. */
export async function lockLiveHold(tx: Tx, ctx: Ctx<HolderActor>, bookingId: Id<'booking'>) {
  const booking = await lockOwn(tx, ctx, bookingId);
  if (booking.confirmedAt !== null) throw new Refusal('changed_meanwhile');
  const isPaying = await hasOpenAttempt(tx, bookingId);
  if (isOver(booking, isPaying, ctx.now)) throw new Refusal('hold_over');
  return { ...booking, isPaying };
}

/** A hold is over at the minute it names, unless a payment is open. */
const isOver = (hold: { releasedAt: Date | null; heldUntil: Date }, isPaying: boolean, now: Date) => hold.releasedAt !== null || (hold.heldUntil <= now && !isPaying);

const hasOpenAttempt = async (tx: Tx, bookingId: Id<'booking'>) =>
  (await tx.select({ id: paymentAttempts.id }).from(paymentAttempts).where(and(eq(paymentAttempts.bookingId, bookingId), isNull(paymentAttempts.endedAt))).limit(1)).length > 0;

/** Keeps the places longer, up to the payment limit; answers until when. */
export async function keepLonger(ctx: Ctx<HolderActor>, input: HoldIdInput): Promise<Date> {
  return inTransaction(ctx.db, async (tx) => {
    const hold = await lockLiveHold(tx, ctx, input.bookingId);
    const until = ctx.club.holdsMayBeExtended && !hold.isPaying ? keptLonger(hold, ctx.now, ctx.club.holdMinutes) : null;
    if (until === null) throw new Refusal('hold_not_longer');
    await tx.update(bookings).set({ heldUntil: until }).where(eq(bookings.id, hold.id));
    return until;
  });
}

/**
 * Gives the places back before their time. With a payment open they stay kept until the processor says that its session
 * has ended: the party's time ends now, and the worker is nudged to ask.
 */
export async function letGo(ctx: Ctx<HolderActor>, input: HoldIdInput): Promise<void> {
  await inTransaction(ctx.db, async (tx) => {
    const booking = await lockOwn(tx, ctx, input.bookingId);
    if (booking.confirmedAt !== null) throw new Refusal('changed_meanwhile');
    if (booking.releasedAt !== null) return;
    const attempt = firstOrNull(await tx.select({ id: paymentAttempts.id }).from(paymentAttempts).where(and(eq(paymentAttempts.bookingId, booking.id), isNull(paymentAttempts.endedAt))));
    if (!attempt) return releaseHold(tx, booking.id, ctx.now);
    await tx.update(bookings).set({ heldUntil: ctx.now }).where(eq(bookings.id, booking.id));
    await enqueue(tx, SETTLE_ATTEMPT, { attemptId: attempt.id }, { runAt: ctx.now, jobKey: settleAttemptKey(attempt.id) });
  });
}

/**
 * Writes down who the party is and that it agreed to the visit rules. When the places are no longer kept it refuses, but
 * what was typed stays written down: whoever keeps the same places again finds it there.
 */
export async function saveDetails(ctx: Ctx<HolderActor>, input: DetailsInput): Promise<void> {
  const isKept = await inTransaction(ctx.db, async (tx) => {
    const hold = await lockOwn(tx, ctx, input.bookingId);
    if (hold.confirmedAt !== null) throw new Refusal('changed_meanwhile');
    const details = { name: input.name, email: input.email, phone: input.phone };
    await tx.insert(bookingContacts).values({ bookingId: hold.id, ...details }).onConflictDoUpdate({ target: bookingContacts.bookingId, set: details });
    if (isOver(hold, await hasOpenAttempt(tx, hold.id), ctx.now)) return false;
    await tx.update(bookings).set({ rulesAgreedAt: ctx.now, wantsInvitations: input.wantsInvitations }).where(eq(bookings.id, hold.id));
    return true;
  });
  if (!isKept) throw new Refusal('hold_over');
}

/** Keeps the same places for the same people once more after a hold ran out, with what was typed; answers the new booking. */
export async function keepAgain(ctx: Ctx<HolderActor>, input: HoldIdInput): Promise<Id<'booking'>> {
  const { db, actor } = ctx;
  const old = firstOrNull(await db.select({ openDayId: bookings.openDayId, insistsAt: bookings.insistsAt, confirmedAt: bookings.confirmedAt, wantsInvitations: bookings.wantsInvitations }).from(bookings)
    .where(and(eq(bookings.id, input.bookingId), eq(bookings.holderHash, actor.holderHash))));
  if (!old) throw new Refusal('not_found');
  if (old.confirmedAt !== null) throw new Refusal('changed_meanwhile');
  const wanted = await db.select({ entryTimeId: visits.entryTimeId, adults: visits.adults, children: visits.children, babes: visits.babes }).from(visits).where(eq(visits.bookingId, input.bookingId));
  const bookingId = await holdPlaces(ctx, { openDayId: old.openDayId, wanted, insists: old.insistsAt !== null });
  const typed = firstOrNull(await db.select({ name: bookingContacts.name, email: bookingContacts.email, phone: bookingContacts.phone }).from(bookingContacts).where(eq(bookingContacts.bookingId, input.bookingId)));
  if (typed) await db.insert(bookingContacts).values({ bookingId, name: typed.name, email: typed.email, phone: typed.phone }).onConflictDoNothing();
  await db.update(bookings).set({ wantsInvitations: old.wantsInvitations }).where(eq(bookings.id, bookingId));
  return bookingId;
}
