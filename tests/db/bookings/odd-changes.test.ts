import { and, eq, isNull } from 'drizzle-orm';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { getDb } from '@/db/client';
import { visits } from '@/db/schema/bookings';
import { journalEntries, payments, postings, refunds } from '@/db/schema/books';
import { letters, letterTexts } from '@/db/schema/letters';
import { prices } from '@/db/schema/opendays';
import { applyPayment } from '@/lib/bookings/commands/apply-payment';
import { changeVisit } from '@/lib/bookings/commands/change';
import { giveBack, giveBackForParty } from '@/lib/bookings/commands/give-back';
import { showBooking } from '@/lib/bookings/commands/show-booking';
import { endHolds } from '@/lib/bookings/commands/places';
import { settleAttempts } from '@/lib/bookings/commands/settle';
import { holdPlaces } from '@/lib/bookings/commands/hold';
import { holdInput } from '@/lib/bookings/schema';
import { sendRefunds } from '@/lib/books/commands/refunds';
import { giveBackPayment } from '@/lib/books/commands/give-back-payment';
import type { Id } from '@/lib/core/ids';
import { only } from '@/lib/core/only';
import { addMinutes } from '@/lib/core/time';
import { aBrowser, aClub, anEntryTime, aStop, cleo, ctxOf, dov, NOON } from '../../support/cast';
import type { CardsStandIn } from '../../support/cards-stand-in';
import { keep, liveHeadsAt, refusalOf, takenAt } from './hold-cast';
import { aDayAhead, bookingOf, cardsAt, eveHolds, evePays, machine, paidSnapshot } from './pay-cast';

let cards: CardsStandIn;
beforeAll(async () => {
  cards = await cardsAt();
  await aClub();
});
afterAll(() => cards.stop());

const TWO = { adults: 2, children: 0, babes: 0 };

/** Eve's two places, paid with $16. */
async function evePaid() {
  const { day, time } = await aDayAhead();
  const eve = await eveHolds(day.id, [time.id], NOON);
  await applyPayment(await ctxOf(machine, NOON), await paidSnapshot(cards, (await evePays(eve, NOON)).sessionId));
  const visit = only(await getDb().select({ id: visits.id }).from(visits).where(eq(visits.bookingId, eve.bookingId)));
  const payment = only(await getDb().select({ id: payments.id }).from(payments).where(eq(payments.bookingId, eve.bookingId)));
  return { day, time, bookingId: eve.bookingId, visitId: visit.id, paymentId: payment.id, by: { kind: 'booking' as const, bookingId: eve.bookingId } };
}

const backOf = async (paymentId: Id<'payment'>) => (await getDb().select({ amount: refunds.amountMinor }).from(refunds).where(eq(refunds.paymentId, paymentId))).map(({ amount }) => amount);
const toldOf = async (bookingId: Id<'booking'>, kind: string) => (await getDb().select({ facts: letterTexts.facts }).from(letters).innerJoin(letterTexts, eq(letterTexts.letterId, letters.id))
  .where(and(eq(letters.bookingId, bookingId), eq(letters.kind, kind)))).map(({ facts }) => facts);

describe('places whose money the treasurer gave back already', () => {
  it('can still be given back: nothing more is returned, and the letter says so', async () => {
    const { time, bookingId, visitId, paymentId, by } = await evePaid();
    await giveBackPayment(await ctxOf(await dov()), { paymentId, amount: '16.00', reason: 'a hard week' });

    expect(await giveBack(await ctxOf(by), { visitId, version: 1, ...TWO })).toEqual({ refundMinor: 0 });

    expect([await takenAt(time.id), await liveHeadsAt(time.id)]).toEqual([0, 0]);
    expect(await backOf(paymentId)).toEqual([1600]);
    expect(await toldOf(bookingId, 'given-back')).toMatchObject([{ refundMinor: 0 }]);
  });

  it('are promised no more than what is left, before the button', async () => {
    const { paymentId, by } = await evePaid();
    const promise = async () => (await showBooking(await ctxOf(by))).visits[0]?.change?.now;
    expect(await promise()).toBe('All $16.00 comes back the way you paid.');

    await giveBackPayment(await ctxOf(await dov()), { paymentId, amount: '10.00', reason: 'a hard week' });

    expect(await promise()).toBe('$6.00 comes back the way you paid: the rest of your payment went back before.');
  });

  it('return only what is left of the payment, whoever gives them back', async () => {
    const { visitId, paymentId } = await evePaid();
    await giveBackPayment(await ctxOf(await dov()), { paymentId, amount: '10.00', reason: 'a hard week' });

    expect(await giveBackForParty(await ctxOf(await cleo()), { visitId, version: 1, ...TWO, reason: 'storm', refundPercent: 100 })).toEqual({ refundMinor: 600 });

    expect((await backOf(paymentId)).reduce((sum, amount) => sum + amount, 0)).toBe(1600);
  });

  it('can be changed to a cheaper time, with what is left of the difference', async () => {
    const { day, visitId, paymentId, by } = await evePaid();
    const free = await aStop(day.id, 2);
    await getDb().insert(prices).values([{ openDayId: day.id, stopId: free.id, kind: 'adult', amountMinor: 0 }]);
    const cheaper = await anEntryTime(free, { atMinutes: 60 });
    await giveBackPayment(await ctxOf(await dov()), { paymentId, amount: '15.00', reason: 'a hard week' });

    expect(await changeVisit(await ctxOf(by), { visitId, version: 1, entryTimeId: cheaper.id, insists: true })).toEqual({ refundMinor: 100 });
  });
});

describe('a card service that does not answer', () => {
  it('is not asked about every refund of a sweep: the others wait for the next one', async () => {
    const triesOf = async (paymentId: Id<'payment'>) => only(await getDb().select({ tries: refunds.tries, doneAt: refunds.doneAt }).from(refunds).where(eq(refunds.paymentId, paymentId)));
    await sendRefunds(await ctxOf(machine, addMinutes(NOON, 600))); // what earlier tests owe
    const [first, second] = [await evePaid(), await evePaid()];
    await giveBack(await ctxOf(first.by, addMinutes(NOON, 601)), { visitId: first.visitId, version: 1, ...TWO });
    await giveBack(await ctxOf(second.by, addMinutes(NOON, 602)), { visitId: second.visitId, version: 1, ...TWO });

    await cards.order({ do: 'trouble', dropNext: 20, onlyPath: 'refunds' });
    await sendRefunds(await ctxOf(machine, addMinutes(NOON, 603)));
    await cards.order({ do: 'trouble' });

    expect([(await triesOf(first.paymentId)).tries, (await triesOf(second.paymentId)).tries]).toEqual([1, 0]);
    await sendRefunds(await ctxOf(machine, addMinutes(NOON, 605)));
    expect([(await triesOf(first.paymentId)).doneAt, (await triesOf(second.paymentId)).doneAt]).not.toContain(null);
  });
});

describe('one payment that cannot be settled now', () => {
  it('does not keep the others from being settled in the same sweep', async () => {
    const { day, time } = await aDayAhead();
    const [first, second] = [await eveHolds(day.id, [time.id], NOON), await eveHolds(day.id, [time.id], NOON)];
    for (const [at, hold] of [first, second].entries()) await cards.order({ do: 'pay', session: (await evePays(hold, addMinutes(NOON, at / 60))).sessionId });
    const other = await getDb().$client.connect();
    await other.query('begin');
    await other.query('select 1 from bookings where id = $1 for update', [first.bookingId]);

    await settleAttempts(await ctxOf(machine, addMinutes(NOON, 1)));

    await other.query('rollback');
    other.release();
    expect([(await bookingOf(first.bookingId)).confirmedAt, (await bookingOf(second.bookingId)).confirmedAt]).toEqual([null, addMinutes(NOON, 1)]);
    await settleAttempts(await ctxOf(machine, addMinutes(NOON, 2)));
    expect((await bookingOf(first.bookingId)).confirmedAt).toEqual(addMinutes(NOON, 2));
  });
});

describe('one hold that cannot be given back now', () => {
  it('does not keep the others from being given back in the same sweep', async () => {
    const { day, time } = await aDayAhead();
    const [first, second] = [await keep(day.id, [time.id]), await keep(day.id, [time.id], aBrowser(), { now: addMinutes(NOON, 1 / 60) })];
    const other = await getDb().$client.connect();
    await other.query('begin');
    await other.query('select 1 from bookings where id = $1 for update', [first]);

    await endHolds(getDb(), addMinutes(NOON, 30));

    await other.query('rollback');
    other.release();
    expect([(await bookingOf(first)).releasedAt, (await bookingOf(second)).releasedAt]).toEqual([null, addMinutes(NOON, 30)]);
  });
});

describe('an entry time that stays locked', () => {
  it('is answered in words, and nothing is kept', async () => {
    const { day, time } = await aDayAhead();
    const other = await getDb().$client.connect();
    await other.query('begin');
    await other.query('select 1 from entry_times where id = $1 for update', [time.id]);

    expect(await refusalOf(keep(day.id, [time.id]))).toBe('busy');

    await other.query('rollback');
    other.release();
    expect([await takenAt(time.id), await liveHeadsAt(time.id)]).toEqual([0, 0]);
  });
});

describe('an id typed in capitals', () => {
  it('names the same entry time: no booking without visits comes of it', async () => {
    const { day, time } = await aDayAhead();
    const input = holdInput.parse({ openDayId: day.id, wanted: [{ entryTimeId: time.id.toUpperCase(), ...TWO }] });

    const bookingId = await holdPlaces(await ctxOf(aBrowser()), input);

    expect(await getDb().select({ heads: visits.heads }).from(visits).where(eq(visits.bookingId, bookingId))).toEqual([{ heads: 2 }]);
    expect(await takenAt(time.id)).toBe(2);
  });

  it('is not a second entry time beside the same in small letters', async () => {
    const { day, time } = await aDayAhead();

    expect(holdInput.safeParse({ openDayId: day.id, wanted: [time.id, time.id.toUpperCase()].map((entryTimeId) => ({ entryTimeId, ...TWO })) }).success).toBe(false);
  });
});

describe('money that came for places that are gone', () => {
  it('stands in the books under its open day, coming and going', async () => {
    const { day, time } = await aDayAhead({ capacity: 2 });
    const eve = await eveHolds(day.id, [time.id], NOON);
    const { sessionId, attemptId } = await evePays(eve, NOON);
    const paid = await paidSnapshot(cards, sessionId);
    await applyPayment(await ctxOf(machine, addMinutes(NOON, 60)), { ...paid, isPaid: false, status: 'expired' });
    await endHolds(getDb(), addMinutes(NOON, 60));
    await eveHolds(day.id, [time.id], addMinutes(NOON, 61));

    expect(await applyPayment(await ctxOf(machine, addMinutes(NOON, 62)), paid)).toBe('refunded');

    const lines = await getDb().select({ openDayId: postings.openDayId }).from(postings).innerJoin(journalEntries, eq(journalEntries.id, postings.entryId))
      .where(and(eq(journalEntries.kind, 'unplaced'), eq(journalEntries.sourceId, attemptId)));
    expect(lines).toEqual([{ openDayId: day.id }, { openDayId: day.id }]);
    expect(await getDb().select({ id: visits.id }).from(visits).where(and(eq(visits.bookingId, eve.bookingId), isNull(visits.givenBackAt)))).toEqual([]);
  });
});
