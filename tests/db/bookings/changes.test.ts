import { and, eq, sql } from 'drizzle-orm';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { getDb } from '@/db/client';
import { visits } from '@/db/schema/bookings';
import { journalEntries, payments, postings, refunds } from '@/db/schema/books';
import { auditTrail } from '@/db/schema/club';
import { gateFacts } from '@/db/schema/gate';
import { letters, letterTexts } from '@/db/schema/letters';
import { prices } from '@/db/schema/opendays';
import { sendRefunds, applyRefund } from '@/lib/books/commands/refunds';
import { bookFees } from '@/lib/books/commands/fees';
import { applyPayment } from '@/lib/bookings/commands/apply-payment';
import { changeVisit, moveVisit } from '@/lib/bookings/commands/change';
import { giveBack, giveBackForParty } from '@/lib/bookings/commands/give-back';
import { newId, type Id } from '@/lib/core/ids';
import { only } from '@/lib/core/only';
import { addMinutes } from '@/lib/core/time';
import { aBrowser, aClub, anEntryTime, aStop, cleo, ctxOf, MAY_15, NOON } from '../../support/cast';
import type { CardsStandIn } from '../../support/cards-stand-in';
import { keep, liveHeadsAt, outcomes, refusalOf, takenAt } from './hold-cast';
import { aDayAhead, bookingOf, cardsAt, eveHolds, evePays, machine, paidSnapshot } from './pay-cast';

let cards: CardsStandIn;
beforeAll(async () => {
  cards = await cardsAt();
  await aClub();
});
afterAll(() => cards.stop());

const FOUR = { adults: 3, children: 1, babes: 0 };

/** Eve's paid booking of one visit. */
async function eveBooked({ capacity = 12, people = FOUR } = {}) {
  const { day, stop, time } = await aDayAhead({ capacity });
  const eve = await eveHolds(day.id, [time.id], NOON, aBrowser(), people);
  await applyPayment(await ctxOf(machine, NOON), await paidSnapshot(cards, (await evePays(eve, NOON)).sessionId));
  const visit = only(await getDb().select().from(visits).where(eq(visits.bookingId, eve.bookingId)));
  return { day, stop, time, bookingId: eve.bookingId, visitId: visit.id, by: { kind: 'booking' as const, bookingId: eve.bookingId } };
}
const visitOf = async (id: Id<'visit'>) => only(await getDb().select().from(visits).where(eq(visits.id, id)));
const refundsOf = async (bookingId: Id<'booking'>) => (await getDb().select({ amount: refunds.amountMinor, done: refunds.doneAt, failed: refunds.failedAt, id: refunds.id, processorId: refunds.processorId })
  .from(refunds).innerJoin(payments, eq(payments.id, refunds.paymentId)).where(eq(payments.bookingId, bookingId)));
const lettersOf = async (bookingId: Id<'booking'>) => (await getDb().select({ kind: letters.kind, facts: letterTexts.facts }).from(letters).innerJoin(letterTexts, eq(letterTexts.letterId, letters.id))
  .where(eq(letters.bookingId, bookingId))).filter((letter) => letter.kind !== 'confirmation');
const ONE = { adults: 1, children: 0, babes: 0 };
const lastMoment = addMinutes(MAY_15.opensAt, -60);

describe('giving back', () => {
  it('frees the places, owes the money by the club’s rule and writes to the party, all in one', async () => {
    const { time, bookingId, visitId, by } = await eveBooked();

    expect(await giveBack(await ctxOf(by, addMinutes(MAY_15.opensAt, -120)), { visitId, version: 1, ...ONE })).toEqual({ refundMinor: 400 });

    expect(await visitOf(visitId)).toMatchObject({ adults: 2, children: 1, heads: 3, version: 2, givenBackAt: null });
    expect([await takenAt(time.id), await liveHeadsAt(time.id)]).toEqual([3, 3]);
    expect((await refundsOf(bookingId)).map((refund) => refund.amount)).toEqual([400]);
    expect((await lettersOf(bookingId)).filter((letter) => letter.kind === 'given-back')).toMatchObject([{ facts: { refundMinor: 400, was: [expect.stringMatching(/^Garden \d+ at 10:00, 3 adults and 1 child$/)] } }]);
    expect((await bookingOf(bookingId)).cancelledAt).toBeNull();
  });

  it('cancels the booking when the last of its people go, and withdraws the invitation', async () => {
    const { time, bookingId, visitId, by } = await eveBooked();

    await giveBack(await ctxOf(by), { visitId, version: 1, ...FOUR });

    expect(await bookingOf(bookingId)).toMatchObject({ cancelledAt: NOON });
    expect(await takenAt(time.id)).toBe(0);
    expect((await refundsOf(bookingId)).map((refund) => refund.amount)).toEqual([2800]);
    expect((await lettersOf(bookingId)).filter((letter) => letter.kind === 'calendar' && letter.facts?.['visitId'] === visitId)).toHaveLength(2); // the first invitation, and the one that takes it back
  });

  it('is allowed to the very minute that changes end, and not after', async () => {
    const [first, second] = [await eveBooked(), await eveBooked()];

    expect(await refusalOf(giveBack(await ctxOf(first.by, lastMoment), { visitId: first.visitId, version: 1, ...ONE }))).toBe('done');
    expect(await refusalOf(giveBack(await ctxOf(second.by, addMinutes(lastMoment, 1)), { visitId: second.visitId, version: 1, ...ONE }))).toBe('changes_over');
  });

  it('refuses a stranger, an old page, too many people, children left alone, a used ticket', async () => {
    const [eve, other] = [await eveBooked(), await eveBooked()];
    const ctx = await ctxOf(eve.by);
    const tries = { stranger: { visitId: other.visitId, version: 1, ...ONE }, old: { visitId: eve.visitId, version: 2, ...ONE }, many: { visitId: eve.visitId, version: 1, adults: 4, children: 0, babes: 0 }, alone: { visitId: eve.visitId, version: 1, adults: 3, children: 0, babes: 0 }, nobody: { visitId: eve.visitId, version: 1, adults: 0, children: 0, babes: 0 } };
    const ends: Record<string, string> = {};
    for (const [name, input] of Object.entries(tries)) ends[name] = await refusalOf(giveBack(ctx, input));
    await getDb().insert(gateFacts).values({ id: newId<'gateFact'>(), openDayId: eve.day.id, stopId: eve.stop.id, visitId: eve.visitId, kind: 'admit', adults: 1, atPhone: NOON, receivedAt: NOON });

    expect(ends).toEqual({ stranger: 'not_found', old: 'changed_meanwhile', many: 'more_than_booked', alone: 'child_needs_adult', nobody: 'nobody_in_party' });
    expect(await refusalOf(giveBack(ctx, { visitId: eve.visitId, version: 1, ...ONE }))).toBe('already_came_in');
    expect(await takenAt(eve.time.id)).toBe(4);
  });

  it('happens once when pressed twice at once', async () => {
    const { time, bookingId, visitId, by } = await eveBooked();
    const ctx = await ctxOf(by);

    expect(await outcomes([1, 2].map(() => () => giveBack(ctx, { visitId, version: 1, ...ONE })))).toEqual({ done: 1, changed_meanwhile: 1 });
    expect(await takenAt(time.id)).toBe(3);
    expect(await refundsOf(bookingId)).toHaveLength(1);
  });

  it('can be done by an officer after changes end, in full when the club is at fault, and is in the audit', async () => {
    const { bookingId, visitId } = await eveBooked();
    const officer = await cleo();

    const given = await giveBackForParty(await ctxOf(officer, addMinutes(lastMoment, 30)), { visitId, version: 1, ...ONE, reason: 'the host is ill', refundPercent: 100 });

    expect(given).toEqual({ refundMinor: 800 });
    expect(only(await getDb().select().from(auditTrail).where(eq(auditTrail.subjectId, bookingId)))).toMatchObject({ accountId: officer.accountId, action: 'gave places back for a party' });
  });
});

describe('changing the entry time', () => {
  it('moves the places in one step, keeps the visit and raises its version', async () => {
    const { stop, time, bookingId, visitId, by } = await eveBooked();
    const later = await anEntryTime(stop, { capacity: 4, atMinutes: 120 });

    await changeVisit(await ctxOf(by), { visitId, version: 1, entryTimeId: later.id, insists: false });

    expect(await visitOf(visitId)).toMatchObject({ entryTimeId: later.id, version: 2, movedAt: NOON });
    expect([await takenAt(time.id), await takenAt(later.id)]).toEqual([0, 4]);
    expect((await lettersOf(bookingId)).map((letter) => letter.kind).sort()).toEqual(['calendar', 'calendar', 'change']);
    expect(await refundsOf(bookingId)).toEqual([]);
  });

  it('keeps everything as it was when the other time is full, closed, dearer or of another day', async () => {
    const { day, stop, time, visitId, by } = await eveBooked();
    const other = await aStop(day.id, 2);
    await getDb().insert(prices).values({ openDayId: day.id, stopId: other.id, kind: 'child', amountMinor: 401 });
    const [full, shut, dear, elsewhere] = [await anEntryTime(stop, { capacity: 3, atMinutes: 60 }), await anEntryTime(stop, { atMinutes: 120, closedAt: NOON }), await anEntryTime(other, { atMinutes: 120 }), (await aDayAhead()).time];
    const ctx = await ctxOf(by);
    const ends = [];
    for (const target of [full, shut, dear, elsewhere, time]) ends.push(await refusalOf(changeVisit(ctx, { visitId, version: 1, entryTimeId: target.id, insists: false })));

    expect(ends).toEqual(['places_gone', 'entry_time_closed', 'dearer', 'wrong_open_day', 'clash']);
    expect([await takenAt(time.id), await takenAt(dear.id)]).toEqual([4, 0]);
    expect(await visitOf(visitId)).toMatchObject({ entryTimeId: time.id, version: 1 });
  });

  it('gives back by the club’s rule what the other time costs less', async () => {
    const { day, bookingId, visitId, by } = await eveBooked();
    const other = await aStop(day.id, 2);
    await getDb().insert(prices).values({ openDayId: day.id, stopId: other.id, kind: 'adult', amountMinor: 500 });
    const cheap = await anEntryTime(other, { atMinutes: 120 });

    const inTime = addMinutes(MAY_15.opensAt, -24 * 60);
    expect(await changeVisit(await ctxOf(by, inTime), { visitId, version: 1, entryTimeId: cheap.id, insists: false })).toEqual({ refundMinor: 450 });

    expect((await refundsOf(bookingId)).map((refund) => refund.amount)).toEqual([450]);
    expect(await visitOf(visitId)).toMatchObject({ adultMinor: 500, childMinor: 400 });
  });

  it('lets two parties swap into each other’s full time only as places allow, without a deadlock', async () => {
    const eve = await eveBooked({ capacity: 4 });
    const noon = await anEntryTime(eve.stop, { capacity: 4, atMinutes: 120 });
    await keep(eve.day.id, [noon.id], aBrowser(), { people: FOUR });

    expect(await refusalOf(changeVisit(await ctxOf(eve.by), { visitId: eve.visitId, version: 1, entryTimeId: noon.id, insists: false }))).toBe('places_gone');
    expect([await takenAt(eve.time.id), await takenAt(noon.id)]).toEqual([4, 4]);
  });

  it('can be done by an officer to a dearer time at no more cost', async () => {
    const { day, bookingId, visitId } = await eveBooked();
    const other = await aStop(day.id, 2);
    await getDb().insert(prices).values({ openDayId: day.id, stopId: other.id, kind: 'adult', amountMinor: 9000 });
    const dear = await anEntryTime(other, { atMinutes: 120 });

    await moveVisit(await ctxOf(await cleo()), { visitId, version: 1, entryTimeId: dear.id, insists: false, reason: 'the first garden flooded' });

    expect(await visitOf(visitId)).toMatchObject({ entryTimeId: dear.id, adultMinor: 800 });
    expect((await lettersOf(bookingId)).find((letter) => letter.kind === 'change')?.facts).toMatchObject({ reason: 'the first garden flooded' });
  });
});

describe('money going back', () => {
  const balanceOfDay = async (dayId: Id<'openDay'>) => Object.fromEntries((await getDb().select({ account: postings.account, sum: sql<number>`sum(${postings.amountMinor})::int` })
    .from(postings).innerJoin(journalEntries, eq(journalEntries.id, postings.entryId)).where(eq(postings.openDayId, dayId)).groupBy(postings.account)).map((row) => [row.account, row.sum]));

  it('goes to the processor once, is booked, and its fee too', async () => {
    const { day, bookingId, visitId, by } = await eveBooked();
    await giveBack(await ctxOf(by), { visitId, version: 1, ...ONE });

    await sendRefunds(await ctxOf(machine, NOON));
    await sendRefunds(await ctxOf(machine, NOON));
    await bookFees(await ctxOf(machine, NOON));
    await bookFees(await ctxOf(machine, NOON));

    expect(await refundsOf(bookingId)).toMatchObject([{ amount: 800, done: NOON, processorId: expect.stringMatching(/^re_/) }]);
    expect(await balanceOfDay(day.id)).toEqual({ 'cards-clearing': 2800 - 800 - 111, 'ticket-income': -2000, 'refunds-owed': 0, 'card-fees': 111 }); // 2.9 % and 30 of 2800
  });

  it('is tried again after the processor failed, and not sent twice when only its answer was lost', async () => {
    const { bookingId, visitId, by } = await eveBooked();
    await giveBack(await ctxOf(by), { visitId, version: 1, ...ONE });
    await cards.order({ do: 'trouble', dropNext: 5 });
    await sendRefunds(await ctxOf(machine, NOON));
    await cards.order({ do: 'trouble' });
    expect(await refundsOf(bookingId)).toMatchObject([{ done: null }]);

    await sendRefunds(await ctxOf(machine, addMinutes(NOON, 2)));

    expect(await refundsOf(bookingId)).toMatchObject([{ done: addMinutes(NOON, 2) }]);
    const ours = only(await refundsOf(bookingId)).id;
    expect(cards.cards.store.all('refund').filter((refund) => refund.metadata['refund'] === ours)).toHaveLength(1);
  });

  it('is owed again when the payer’s bank sends it back', async () => {
    const { day, bookingId, visitId, by } = await eveBooked();
    await giveBack(await ctxOf(by), { visitId, version: 1, ...ONE });
    await sendRefunds(await ctxOf(machine, NOON));
    const done = only(await refundsOf(bookingId));

    const failed = { refundId: String(done.processorId), ourId: done.id, state: 'failed' as const, amountMinor: 800 };
    await applyRefund(await ctxOf(machine, NOON), failed);
    await applyRefund(await ctxOf(machine, NOON), failed);

    expect(await refundsOf(bookingId)).toMatchObject([{ failed: NOON }]);
    expect((await balanceOfDay(day.id))['refunds-owed']).toBe(-800);
    expect(await getDb().select().from(journalEntries).where(and(eq(journalEntries.kind, 'refund-failed'), eq(journalEntries.sourceId, done.id)))).toHaveLength(1);
  });
});
