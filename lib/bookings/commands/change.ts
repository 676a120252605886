import 'server-only';
import { and, eq, isNull } from 'drizzle-orm';
import type { Tx } from '@/db/client';
import { visits } from '@/db/schema/bookings';
import { recordChange } from '@/lib/club/commands';
import { percentOfMinor } from '@/lib/core/money';
import { Refusal, refuseIf } from '@/lib/core/refusal';
import { formatTime } from '@/lib/core/time';
import type { AccountCtx, BookingActor, Ctx } from '@/lib/infra/context';
import { inTransaction } from '@/lib/infra/transaction';
import { priceChange } from '../rules/change';
import { clashSentence, dayRefusal, entryRefusal, type EntryFacts } from '../rules/hold';
import { changeRefusal, refundPercent } from '../rules/refund';
import type { ChangeInput, MoveVisitInput } from '../schema';
import { findWishFacts } from '../queries/entry-facts';
import { movePlaces } from './places';
import { lockVisit, queueChangeLetters, refundOf, type Standing } from './standing';

/**
 * Moves one visit to another entry time of the same day at the same or a lower price. What it costs less comes back by
 * the refund rule's percent of this moment, as for people given back. The visit keeps its id, UID and code; its version rises.
 */
export async function changeVisit(ctx: Ctx<BookingActor>, input: ChangeInput): Promise<{ refundMinor: number }> {
  return inTransaction(ctx.db, async (tx) => {
    const visit = await lockVisit(tx, ctx.actor.bookingId, input);
    refuseIf(changeRefusal(visit.opensAt, ctx.club, ctx.now));
    const entry = await findTarget(tx, ctx, visit, input);
    const price = priceChange(visit, visit, entry);
    if ('refusal' in price) throw new Refusal(price.refusal);
    const lessMinor = percentOfMinor(price.lessMinor, refundPercent(visit.opensAt, ctx.club, ctx.now));
    await move(tx, ctx, visit, entry, { adultMinor: entry.adultMinor, childMinor: entry.childMinor, babeMinor: entry.babeMinor });
    const refundMinor = await refundOf(tx, ctx, visit.bookingId, lessMinor, 'a cheaper entry time');
    await queueChangeLetters(tx, ctx, visit, visit.version + 1, { kind: 'change', refundMinor });
    return { refundMinor };
  });
}

/** An officer moves a party's visit, at any time and whatever it costs: the party pays no more and gets nothing back. */
export async function moveVisit(ctx: AccountCtx, input: MoveVisitInput): Promise<void> {
  await inTransaction(ctx.db, async (tx) => {
    const visit = await lockVisit(tx, null, input);
    const entry = await findTarget(tx, ctx, visit, input);
    await move(tx, ctx, visit, entry, {});
    await queueChangeLetters(tx, ctx, visit, visit.version + 1, { kind: 'change', refundMinor: 0, reason: input.reason });
    await recordChange(tx, ctx, {
      action: 'moved a visit', subjectKind: 'booking', subjectId: visit.bookingId,
      before: { garden: visit.garden, at: formatTime(visit.opensAt, ctx.club) }, after: { garden: entry.gardenName, at: formatTime(entry.opensAt, ctx.club), reason: input.reason },
    });
  });
}

/** The entry time asked for, if this party may have it beside its other visits. */
async function findTarget(tx: Tx, ctx: Ctx, visit: Standing, input: ChangeInput): Promise<EntryFacts> {
  const others = await tx.select({ id: visits.entryTimeId }).from(visits).where(and(eq(visits.bookingId, visit.bookingId), isNull(visits.givenBackAt)));
  if (others.some((other) => other.id === input.entryTimeId)) throw new Refusal('clash', { sentence: 'You hold places at that time already. Choose another.' });
  const kept = others.filter((other) => other.id !== visit.entryTimeId).map((other) => other.id);
  const facts = await findWishFacts(tx, visit.openDayId, [input.entryTimeId, ...kept]);
  const entry = facts?.entries.find((one) => one.entryTimeId === input.entryTimeId);
  if (!facts || !entry) throw new Refusal('not_found');
  if (entry.openDayId !== visit.openDayId) throw new Refusal('wrong_open_day');
  refuseIf(dayRefusal(facts.day, ctx.now) ?? entryRefusal(entry, ctx.now));
  const clash = input.insists ? null : clashSentence(facts.entries, facts.minutes, ctx.club);
  if (clash !== null) throw new Refusal('clash', { sentence: clash });
  return entry;
}

/** Both entry times change in one statement, then the visit: it is never counted twice or not at all. */
async function move(tx: Tx, ctx: Ctx, visit: Standing, entry: EntryFacts, prices: { adultMinor?: number; childMinor?: number; babeMinor?: number }): Promise<void> {
  const isMoved = await movePlaces(tx, [{ entryTimeId: visit.entryTimeId, heads: -visit.heads }, { entryTimeId: entry.entryTimeId, heads: visit.heads }]);
  if (!isMoved) throw new Refusal('places_gone');
  await tx.update(visits).set({ entryTimeId: entry.entryTimeId, version: visit.version + 1, movedAt: ctx.now, ...prices }).where(eq(visits.id, visit.id));
}
