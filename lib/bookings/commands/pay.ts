import 'server-only';
import { asc, eq } from 'drizzle-orm';
import type { Tx } from '@/db/client';
import { bookings, visits } from '@/db/schema/bookings';
import { gardens } from '@/db/schema/gardens';
import { entryTimes, openDays, stops } from '@/db/schema/opendays';
import type { Id } from '@/lib/core/ids';
import { Refusal } from '@/lib/core/refusal';
import { formatInstant } from '@/lib/core/time';
import { askForSession, keepSession, openAttempt } from '@/lib/books/commands/attempts';
import type { SessionSnapshot } from '@/lib/infra/cards';
import type { Ctx, HolderActor } from '@/lib/infra/context';
import { inTransaction } from '@/lib/infra/transaction';
import { costMinor } from '../rules/party';
import type { DetailsInput, HoldIdInput } from '../schema';
import { confirmFree, requireDetails } from './confirm';
import { lockLiveHold, lockOwn, saveDetails } from './keeping';

/** Where a party goes next: to the processor's page, or to its booking, which cost nothing. */
export type Next = { payAt: string } | { confirmed: string };

/** Writes down who the party is, then starts its payment, or confirms places that cost nothing. */
export async function payOrConfirm(ctx: Ctx<HolderActor>, input: DetailsInput): Promise<Next> {
  const own = await inTransaction(ctx.db, (tx) => lockOwn(tx, ctx, input.bookingId));
  if (own.confirmedAt !== null) return { confirmed: own.code };
  await saveDetails(ctx, input);
  return own.totalMinor > 0 ? { payAt: await startPayment(ctx, input) } : { confirmed: await confirmFree(ctx, input) };
}

/**
 * Opens a payment for kept places and answers the address of the processor's page. The attempt is committed before the
 * processor is called and its session after; the first press moves the kept-until time to the session's end, once. A
 * second press, or another tab, gets the same session.
 */
export async function startPayment(ctx: Ctx<HolderActor>, input: HoldIdInput): Promise<string> {
  const { attempt, checkout } = await inTransaction(ctx.db, async (tx) => {
    const hold = await lockLiveHold(tx, ctx, input.bookingId);
    if (hold.heldUntil <= ctx.now) throw new Refusal('hold_over');
    if (hold.totalMinor === 0) throw new Refusal('nothing_to_pay');
    const { email } = await requireDetails(tx, hold);
    const opened = await openAttempt(tx, ctx.now, { bookingId: hold.id }, { amountMinor: hold.totalMinor, currency: hold.currency });
    return { attempt: opened, checkout: { lines: await linesOf(tx, ctx, hold.id), email, donePath: '/hold/paid', backPath: '/hold' } };
  });
  if (attempt.sessionUrl !== null) return attempt.sessionUrl;
  const session = await askForSession(attempt, checkout);
  await keepUntilSessionEnds(ctx, input.bookingId, attempt.id, session);
  if (session.url === null) throw new Refusal('hold_paying'); // paid or ended in another tab meanwhile
  return session.url;
}

async function keepUntilSessionEnds(ctx: Ctx<HolderActor>, bookingId: Id<'booking'>, attemptId: Id<'attempt'>, session: SessionSnapshot): Promise<void> {
  await inTransaction(ctx.db, async (tx) => {
    const hold = await lockOwn(tx, ctx, bookingId);
    await keepSession(tx, attemptId, session);
    if (hold.paymentMovedAt !== null || hold.confirmedAt !== null || hold.releasedAt !== null) return;
    await tx.update(bookings).set({ heldUntil: session.expiresAt, paymentMovedAt: ctx.now }).where(eq(bookings.id, bookingId));
  });
}

/** What the processor's page lists: one line a visit that costs something. */
async function linesOf(tx: Tx, { club }: Ctx, bookingId: Id<'booking'>) {
  const rows = await tx.select({
    garden: gardens.railwayName, day: openDays.title, opensAt: entryTimes.opensAt, adults: visits.adults, children: visits.children, babes: visits.babes,
    adultMinor: visits.adultMinor, childMinor: visits.childMinor, babeMinor: visits.babeMinor,
  }).from(visits)
    .innerJoin(entryTimes, eq(entryTimes.id, visits.entryTimeId))
    .innerJoin(stops, eq(stops.id, entryTimes.stopId))
    .innerJoin(gardens, eq(gardens.id, stops.gardenId))
    .innerJoin(openDays, eq(openDays.id, visits.openDayId))
    .where(eq(visits.bookingId, bookingId)).orderBy(asc(entryTimes.opensAt));
  return rows.map((row) => ({ name: `${row.day}: ${row.garden}, ${formatInstant(row.opensAt, club)}`, amountMinor: costMinor(row, row) })).filter((line) => line.amountMinor > 0);
}
