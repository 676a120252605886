import { eq, sql } from 'drizzle-orm';
import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest';
import { getDb } from '@/db/client';
import { bookingContacts, bookings } from '@/db/schema/bookings';
import { cardPayments, journalEntries, paymentAttempts, payments, postings, refunds } from '@/db/schema/books';
import { letters, lettersDue } from '@/db/schema/letters';
import { applyPayment } from '@/lib/bookings/commands/apply-payment';
import { confirmFree } from '@/lib/bookings/commands/confirm';
import { payOrConfirm, startPayment } from '@/lib/bookings/commands/pay';
import { settleAttempt } from '@/lib/bookings/commands/settle';
import { endHolds } from '@/lib/bookings/commands/places';
import { only } from '@/lib/core/only';
import { addMinutes } from '@/lib/core/time';
import { expireSession } from '@/lib/infra/cards';
import { aBrowser, aClub, ctxOf, MAY_15, NOON } from '../../support/cast';
import type { CardsStandIn } from '../../support/cards-stand-in';
import { keep, refusalOf, takenAt } from './hold-cast';
import { aDayAhead, attemptOf, bookingOf, cardsAt, eveHolds, evePays, machine, paidSnapshot } from './pay-cast';

let cards: CardsStandIn;
const now = NOON;
beforeAll(async () => {
  cards = await cardsAt();
  await aClub();
});
afterAll(() => cards.stop());
beforeEach(() => cards.order({ do: 'trouble' }));

const letterKinds = async (bookingId: string) => (await getDb().select({ kind: letters.kind }).from(letters)
  .innerJoin(lettersDue, eq(lettersDue.letterId, letters.id)).where(sql`${letters.bookingId} = ${bookingId}`)).map((row) => row.kind).sort();
const balances = async () => Object.fromEntries((await getDb().select({ account: postings.account, sum: sql<number>`sum(${postings.amountMinor})::int` })
  .from(postings).innerJoin(journalEntries, eq(journalEntries.id, postings.entryId)).groupBy(postings.account)).map((row) => [row.account, row.sum]));

describe('pressing Pay', () => {
  it('moves the kept-until time to the session’s end, once, and gives a second press the same page', async () => {
    const { day, time } = await aDayAhead();
    const eve = await eveHolds(day.id, [time.id], now);

    const first = await evePays(eve, now);
    const again = await startPayment(await ctxOf(eve.who, addMinutes(now, 2)), eve);

    expect(again).toBe(first.url);
    expect((await bookingOf(eve.bookingId)).heldUntil).toEqual(addMinutes(now, 31));
    expect((await attemptOf(eve.bookingId)).amountMinor).toBe(1600);
  });

  it('is refused when the places are no longer kept, cost nothing, or nobody has agreed to the rules', async () => {
    const [{ day, time }, free] = [await aDayAhead(), await aDayAhead({ price: { adult: 0, child: 0, babe: 0 } })];
    const late = await eveHolds(day.id, [time.id], now);
    const gift = await eveHolds(free.day.id, [free.time.id], now);
    const silent = aBrowser();
    const unsaid = await keep(day.id, [time.id], silent, { now });

    expect(await refusalOf(startPayment(await ctxOf(late.who, addMinutes(now, 10)), late))).toBe('hold_over');
    expect(await refusalOf(startPayment(await ctxOf(gift.who, now), gift))).toBe('nothing_to_pay');
    expect(await refusalOf(startPayment(await ctxOf(silent, now), { bookingId: unsaid }))).toBe('terms_not_agreed');
    expect(await refusalOf(confirmFree(await ctxOf(late.who, now), late))).toBe('must_be_paid');
  });

  it('works for an address that is legal and rare, which the card service need not know', async () => {
    const { day, time } = await aDayAhead();
    const eve = await eveHolds(day.id, [time.id], now);
    await getDb().update(bookingContacts).set({ email: '"eve marlow"@visitors.example' }).where(eq(bookingContacts.bookingId, eve.bookingId));

    expect((await evePays(eve, now)).url).toMatch(/\/pay\/cs_test_/);
  });

  it('does nothing for a stranger’s hold', async () => {
    const { day, time } = await aDayAhead();
    const eve = await eveHolds(day.id, [time.id], now);

    expect(await refusalOf(startPayment(await ctxOf(aBrowser(), now), eve))).toBe('not_found');
  });

  it('says that no money has moved when the card service does not answer, and keeps the places', async () => {
    const { day, time } = await aDayAhead();
    const eve = await eveHolds(day.id, [time.id], now);
    await cards.order({ do: 'trouble', failNext: 5 });

    expect(await refusalOf(startPayment(await ctxOf(eve.who, now), eve))).toBe('cards_unavailable');

    expect(await attemptOf(eve.bookingId)).toMatchObject({ sessionId: null, endedAt: null });
    await endHolds(getDb(), addMinutes(now, 60));
    expect(await takenAt(time.id)).toBe(2);
  });

  it('lets the worker end an attempt that the card service never took, after which paying works again', async () => {
    const { day, time } = await aDayAhead();
    const eve = await eveHolds(day.id, [time.id], now);
    await cards.order({ do: 'trouble', failNext: 1 });
    await refusalOf(startPayment(await ctxOf(eve.who, now), eve));
    await cards.order({ do: 'trouble' });

    await settleAttempt(await ctxOf(machine, addMinutes(now, 2)), (await attemptOf(eve.bookingId)).id);

    expect((await attemptOf(eve.bookingId)).outcome).toBe('failed');
    expect(await startPayment(await ctxOf(eve.who, addMinutes(now, 2)), eve)).toMatch(/\/pay\/cs_test_/);
  });

  it('finds the session of a call whose answer was lost, and ends it before anybody could pay', async () => {
    const { day, time } = await aDayAhead();
    const eve = await eveHolds(day.id, [time.id], now);
    await cards.order({ do: 'trouble', dropNext: 5 });
    expect(await refusalOf(startPayment(await ctxOf(eve.who, now), eve))).toBe('cards_unavailable');
    await cards.order({ do: 'trouble' });

    await settleAttempt(await ctxOf(machine, addMinutes(now, 12)), (await attemptOf(eve.bookingId)).id);

    expect(await attemptOf(eve.bookingId)).toMatchObject({ outcome: 'expired', sessionId: expect.stringMatching(/^cs_test_/) });
    expect(await takenAt(time.id)).toBe(0);
  });
});

describe('money that arrives', () => {
  it('confirms the booking, books it, numbers the receipt and owes the letters, all at once', async () => {
    const { day, time } = await aDayAhead();
    const eve = await eveHolds(day.id, [time.id], now);
    const { sessionId } = await evePays(eve, now);

    expect(await applyPayment(await ctxOf(machine, now), await paidSnapshot(cards, sessionId))).toBe('confirmed');

    expect(await bookingOf(eve.bookingId)).toMatchObject({ confirmedAt: now, releasedAt: null });
    expect(only(await getDb().select().from(payments).where(eq(payments.bookingId, eve.bookingId)))).toMatchObject({ method: 'card', amountMinor: 1600, currency: 'USD' });
    expect(await letterKinds(eve.bookingId)).toEqual(['calendar', 'confirmation']);
    expect(await balances()).toEqual({ 'cards-clearing': 1600, 'ticket-income': -1600 });
    expect(await takenAt(time.id)).toBe(2);
  });

  it('is applied once, however often it is told', async () => {
    const { day, time } = await aDayAhead();
    const eve = await eveHolds(day.id, [time.id], now);
    const { sessionId } = await evePays(eve, now);
    const snapshot = await paidSnapshot(cards, sessionId);
    await applyPayment(await ctxOf(machine, now), snapshot);

    expect(await applyPayment(await ctxOf(machine, now), snapshot)).toBe('kept');
    expect(await getDb().select().from(payments).where(eq(payments.bookingId, eve.bookingId))).toHaveLength(1);
  });

  it('is not believed in another amount or currency', async () => {
    const { day, time } = await aDayAhead();
    const eve = await eveHolds(day.id, [time.id], now);
    const snapshot = await paidSnapshot(cards, (await evePays(eve, now)).sessionId);
    const said = console.error;
    const lines: string[] = [];
    console.error = (line: string) => lines.push(line);

    const ends = [await applyPayment(await ctxOf(machine, now), { ...snapshot, amountMinor: 1 }), await applyPayment(await ctxOf(machine, now), { ...snapshot, currency: 'CAD' })];
    console.error = said;

    expect(ends).toEqual(['kept', 'kept']);
    expect(lines).toHaveLength(2);
    expect((await bookingOf(eve.bookingId)).confirmedAt).toBeNull();
  });

  it('is told by the reconciler when the webhook was lost', async () => {
    const { day, time } = await aDayAhead();
    const eve = await eveHolds(day.id, [time.id], now);
    const { sessionId, attemptId } = await evePays(eve, now);
    await paidSnapshot(cards, sessionId);

    await settleAttempt(await ctxOf(machine, addMinutes(now, 1)), attemptId);

    expect((await bookingOf(eve.bookingId)).confirmedAt).not.toBeNull();
  });

  it('takes the places again when they were given back meanwhile and are still there', async () => {
    const { day, time } = await aDayAhead();
    const eve = await eveHolds(day.id, [time.id], now);
    const { sessionId } = await evePays(eve, now);
    const paid = await paidSnapshot(cards, sessionId);
    await applyPayment(await ctxOf(machine, addMinutes(now, 40)), { ...paid, isPaid: false, status: 'expired' });
    expect(await takenAt(time.id)).toBe(0);

    expect(await applyPayment(await ctxOf(machine, addMinutes(now, 41)), paid)).toBe('confirmed');

    expect(await takenAt(time.id)).toBe(2);
    expect(await bookingOf(eve.bookingId)).toMatchObject({ releasedAt: null });
  });

  it('goes back in full, with a letter, when the places are gone', async () => {
    const { day, time } = await aDayAhead({ capacity: 2 });
    const eve = await eveHolds(day.id, [time.id], now);
    const { sessionId, attemptId } = await evePays(eve, now);
    const paid = await paidSnapshot(cards, sessionId);
    await applyPayment(await ctxOf(machine, addMinutes(now, 40)), { ...paid, isPaid: false, status: 'expired' });
    await keep(day.id, [time.id], aBrowser(), { now: addMinutes(now, 40) });

    expect(await applyPayment(await ctxOf(machine, addMinutes(now, 41)), paid)).toBe('refunded');

    expect(only(await getDb().select().from(refunds).where(eq(refunds.attemptId, attemptId)))).toMatchObject({ amountMinor: 1600, paymentId: null });
    expect(await letterKinds(eve.bookingId)).toEqual(['places-lost']);
    expect(await takenAt(time.id)).toBe(2);
    expect(await bookingOf(eve.bookingId)).toMatchObject({ confirmedAt: null });
  });

  it('goes back in full when the entry time is over', async () => {
    const { day, time } = await aDayAhead();
    const eve = await eveHolds(day.id, [time.id], now);
    const paid = await paidSnapshot(cards, (await evePays(eve, now)).sessionId);
    await applyPayment(await ctxOf(machine, addMinutes(now, 40)), { ...paid, isPaid: false, status: 'expired' });

    expect(await applyPayment(await ctxOf(machine, addMinutes(MAY_15.opensAt, 20)), paid)).toBe('refunded');
    expect(await takenAt(time.id)).toBe(0);
  });
});

describe('a payment that is not finished', () => {
  it('keeps its places past their time until the card service says that the session has expired', async () => {
    const { day, time } = await aDayAhead({ capacity: 2 });
    const eve = await eveHolds(day.id, [time.id], now);
    const { attemptId, sessionId } = await evePays(eve, now);
    const later = addMinutes(now, 32);

    await endHolds(getDb(), later);
    expect(await refusalOf(keep(day.id, [time.id], aBrowser(), { now: later }))).toBe('places_gone');

    await settleAttempt(await ctxOf(machine, later), attemptId);
    expect((await expireSession(sessionId)).status).toBe('expired');
    expect(await attemptOf(eve.bookingId)).toMatchObject({ outcome: 'expired' });
    expect((await bookingOf(eve.bookingId)).releasedAt).toEqual(later);
    expect(await refusalOf(keep(day.id, [time.id], aBrowser(), { now: later }))).toBe('done');
  });

  it('is left alone while the party still has time', async () => {
    const { day, time } = await aDayAhead();
    const eve = await eveHolds(day.id, [time.id], now);
    const { attemptId } = await evePays(eve, now);

    await settleAttempt(await ctxOf(machine, addMinutes(now, 20)), attemptId);

    expect((await attemptOf(eve.bookingId)).endedAt).toBeNull();
  });

  it('stands in the way of another choice of the same browser, so that nobody pays for places it let go', async () => {
    const { day, time } = await aDayAhead();
    const eve = await eveHolds(day.id, [time.id], now);
    await evePays(eve, now);

    expect(await refusalOf(keep(day.id, [time.id], eve.who, { now }))).toBe('hold_paying');
  });
});

describe('places that cost nothing', () => {
  it('are confirmed by one press, and a second press is content', async () => {
    const { day, time } = await aDayAhead({ price: { adult: 0, child: 0, babe: 0 } });
    const who = aBrowser();
    const bookingId = await keep(day.id, [time.id], who, { now });
    const details = { bookingId, name: 'Eve Marlow', email: 'eve@visitors.example', phone: null, rulesAgreed: true, wantsInvitations: false };

    const next = await payOrConfirm(await ctxOf(who, now), details);
    const again = await payOrConfirm(await ctxOf(who, now), details);

    const { code } = only(await getDb().select({ code: bookings.code }).from(bookings).where(eq(bookings.id, bookingId)));
    expect([next, again]).toEqual([{ confirmed: code }, { confirmed: code }]);
    expect(await letterKinds(bookingId)).toEqual(['confirmation']);
    expect(await getDb().select().from(paymentAttempts).where(eq(paymentAttempts.bookingId, bookingId))).toEqual([]);
    expect(await getDb().select().from(cardPayments).where(eq(cardPayments.objectId, bookingId))).toEqual([]);
  });
});
