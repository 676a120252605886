import 'server-only';
import { and, eq, isNull } from 'drizzle-orm';
import type { Tx } from '@/db/client';
import { bookings, visits } from '@/db/schema/bookings';
import { recordChange } from '@/lib/club/commands';
import { percentOfMinor } from '@/lib/core/money';
import { Refusal, refuseIf } from '@/lib/core/refusal';
import type { AccountCtx, BookingActor, Ctx } from '@/lib/infra/context';
import { inTransaction } from '@/lib/infra/transaction';
import { costMinor, countPeople, headsOf, peopleLeft, type People } from '../rules/party';
import { changeRefusal, refundPercent } from '../rules/refund';
import type { GiveBackForPartyInput, GiveBackInput } from '../schema';
import { movePlaces } from './places';
import { lockVisit, queueChangeLetters, refundOf, type Standing } from './standing';

/** What was given back: how much money follows. */
export type GivenBack = { refundMinor: number };

/** Gives some or all people of one visit back, as the party itself may: until changes end, under the club's refund rule. */
export async function giveBack(ctx: Ctx<BookingActor>, input: GiveBackInput): Promise<GivenBack> {
  return inTransaction(ctx.db, async (tx) => {
    const visit = await lockVisit(tx, ctx.actor.bookingId, input);
    refuseIf(changeRefusal(visit.opensAt, ctx.club, ctx.now));
    return take(tx, ctx, visit, input, { percent: refundPercent(visit.opensAt, ctx.club, ctx.now) });
  });
}

/** An officer gives people back for a party, at any time, at the club's rule or another percent; the reason goes into the audit and the letter. */
export async function giveBackForParty(ctx: AccountCtx, input: GiveBackForPartyInput): Promise<GivenBack> {
  return inTransaction(ctx.db, async (tx) => {
    const visit = await lockVisit(tx, null, input);
    const given = await take(tx, ctx, visit, input, { percent: input.refundPercent ?? refundPercent(visit.opensAt, ctx.club, ctx.now), reason: input.reason });
    await recordChange(tx, ctx, {
      action: 'gave places back for a party', subjectKind: 'booking', subjectId: visit.bookingId,
      before: { garden: visit.garden, adults: visit.adults, children: visit.children, babes: visit.babes },
      after: { adults: input.adults, children: input.children, babes: input.babes, refundMinor: given.refundMinor, reason: input.reason },
    });
    return given;
  });
}

async function take(tx: Tx, ctx: Ctx, visit: Standing, back: People, terms: { percent: number; reason?: string }): Promise<GivenBack> {
  const answer = peopleLeft(visit, back);
  if ('refusal' in answer) throw new Refusal(answer.refusal, answer.refusal === 'nobody_in_party' ? { sentence: 'Say how many people are not coming: at least one.' } : {});
  const { left } = answer;
  const isGone = countPeople(left) === 0;
  const countsBabes = visit.heads !== visit.adults + visit.children || visit.babes === 0;
  const heads = isGone ? 0 : headsOf(left, countsBabes);
  await movePlaces(tx, [{ entryTimeId: visit.entryTimeId, heads: heads - visit.heads }]);
  const version = visit.version + 1;
  await tx.update(visits).set(isGone ? { givenBackAt: ctx.now, version } : { ...pick(left), heads, version }).where(eq(visits.id, visit.id));
  const refundMinor = await refundOf(tx, ctx, visit.bookingId, percentOfMinor(costMinor(back, visit), terms.percent), terms.reason ?? 'places given back');
  await queueChangeLetters(tx, ctx, visit, version, { kind: 'given-back', refundMinor, ...(terms.reason === undefined ? {} : { reason: terms.reason }) });
  if (isGone) await cancelIfEmpty(tx, ctx, visit.bookingId);
  return { refundMinor };
}

const pick = ({ adults, children, babes }: People) => ({ adults, children, babes });

/** A booking whose last visit was given back is cancelled. Its row is locked. */
async function cancelIfEmpty(tx: Tx, { now }: Ctx, bookingId: Standing['bookingId']): Promise<void> {
  const live = await tx.select({ id: visits.id }).from(visits).where(and(eq(visits.bookingId, bookingId), isNull(visits.givenBackAt))).limit(1);
  if (live.length === 0) await tx.update(bookings).set({ cancelledAt: now }).where(eq(bookings.id, bookingId));
}
