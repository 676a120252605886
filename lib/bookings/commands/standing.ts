import 'server-only';
import { and, asc, eq, sql } from 'drizzle-orm';
import type { Tx } from '@/db/client';
import { bookings, visits } from '@/db/schema/bookings';
import { payments } from '@/db/schema/books';
import { gardens } from '@/db/schema/gardens';
import { gateFacts } from '@/db/schema/gate';
import { entryTimes, stops } from '@/db/schema/opendays';
import { leftOfPayment, oweRefund } from '@/lib/books/commands/refunds';
import type { Id } from '@/lib/core/ids';
import { firstOrNull, only } from '@/lib/core/only';
import { Refusal, refuseIf } from '@/lib/core/refusal';
import { formatTime } from '@/lib/core/time';
import type { Ctx } from '@/lib/infra/context';
import { queueLetter } from '@/lib/letters/commands';
import { partyInWords } from '@/lib/opendays/rules/prices';
import { standingRefusal } from '../rules/change';
import { findParty } from './confirm';

/** A party's visit that an admission was recorded for and not taken back. */
const cameIn = sql<boolean>`exists (select from ${gateFacts} f where f.visit_id = ${visits.id} and f.kind = 'admit'
  and not exists (select from ${gateFacts} u where u.undoes_id = f.id and u.kind = 'undo'))`;

const standing = {
  id: visits.id, bookingId: visits.bookingId, openDayId: visits.openDayId, entryTimeId: visits.entryTimeId, adults: visits.adults, children: visits.children, babes: visits.babes, heads: visits.heads,
  adultMinor: visits.adultMinor, childMinor: visits.childMinor, babeMinor: visits.babeMinor, version: visits.version, givenBackAt: visits.givenBackAt, cameIn,
  opensAt: entryTimes.opensAt, stopId: entryTimes.stopId, garden: gardens.shortName, currency: bookings.currency, confirmedAt: bookings.confirmedAt, cancelledAt: bookings.cancelledAt,
};

export type Standing = Awaited<ReturnType<typeof lockVisit>>;

/** A confirmed booking's visit, its booking locked; the version is the one the party was looking at. `bookingId` null: an officer, any booking. */
export async function lockVisit(tx: Tx, bookingId: Id<'booking'> | null, asked: { visitId: Id<'visit'>; version: number }) {
  const owner = firstOrNull(await tx.select({ bookingId: visits.bookingId }).from(visits).where(and(eq(visits.id, asked.visitId), ...(bookingId === null ? [] : [eq(visits.bookingId, bookingId)]))));
  if (!owner) throw new Refusal('not_found');
  await tx.select({ id: bookings.id }).from(bookings).where(eq(bookings.id, owner.bookingId)).for('no key update');
  const visit = only(await tx.select(standing).from(visits)
    .innerJoin(bookings, eq(bookings.id, visits.bookingId))
    .innerJoin(entryTimes, eq(entryTimes.id, visits.entryTimeId))
    .innerJoin(stops, eq(stops.id, entryTimes.stopId))
    .innerJoin(gardens, eq(gardens.id, stops.gardenId))
    .where(eq(visits.id, asked.visitId)));
  if (visit.confirmedAt === null) throw new Refusal('not_found');
  refuseIf(standingRefusal(visit, asked.version));
  return visit;
}

/** How a visit stood, for the letter about its change: "Pine Barrow at 11:30, 2 adults and 1 child". */
export const inWords = (visit: Pick<Standing, 'garden' | 'opensAt' | 'adults' | 'children' | 'babes'>, { club }: Ctx): string =>
  `${visit.garden} at ${formatTime(visit.opensAt, club)}, ${partyInWords(visit)}`;

/**
 * Owes this much of the booking's payment back, or what is left of it when an officer gave money back before; nothing for
 * places that cost nothing or were not paid through us. Answers how much that is. The booking is locked.
 */
export async function refundOf(tx: Tx, ctx: Ctx, bookingId: Id<'booking'>, amountMinor: number, reason: string): Promise<number> {
  const payment = firstOrNull(await tx.select({ id: payments.id }).from(payments).where(eq(payments.bookingId, bookingId)).orderBy(asc(payments.recordedAt)).limit(1));
  const owedMinor = payment ? Math.min(amountMinor, await leftOfPayment(tx, payment.id)) : 0;
  if (payment && owedMinor > 0) await oweRefund(tx, ctx, { paymentId: payment.id, amountMinor: owedMinor, reason });
  return owedMinor;
}

/** Owes the party the letter about a change, and the invitation that takes the visit's new state to its calendar. */
export async function queueChangeLetters(tx: Tx, ctx: Ctx, before: Standing, version: number, said: { kind: 'change' | 'given-back'; refundMinor: number; reason?: string }): Promise<void> {
  const party = await findParty(tx, before.bookingId);
  if (!party) return;
  const { to, openDayId, bookingId } = party;
  const key = `${before.id}:${version}`;
  const facts = { was: [inWords(before, ctx)], refundMinor: said.refundMinor, ...(said.reason === undefined ? {} : { reason: said.reason }) };
  await queueLetter(tx, { key: `${said.kind}:${key}`, kind: said.kind, to, madeAt: ctx.now, dueAt: ctx.now, openDayId, bookingId, facts });
  if (!party.wantsInvitations) return;
  await queueLetter(tx, { key: `calendar:${key}`, kind: 'calendar', to, madeAt: ctx.now, dueAt: ctx.now, openDayId, bookingId, facts: { visitId: before.id } });
}
