import { eq, sql } from 'drizzle-orm';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { getDb } from '@/db/client';
import { bookings } from '@/db/schema/bookings';
import { journalEntries, payments, refunds } from '@/db/schema/books';
import { letters } from '@/db/schema/letters';
import { applyPayment } from '@/lib/bookings/commands/apply-payment';
import { keepLonger } from '@/lib/bookings/commands/keeping';
import { endHold } from '@/lib/bookings/commands/places';
import type { Id } from '@/lib/core/ids';
import { addMinutes } from '@/lib/core/time';
import { aBrowser, aClub, ctxOf, NOON } from '../../support/cast';
import type { CardsStandIn } from '../../support/cards-stand-in';
import { keep, liveHeadsAt, outcomes, refusalOf, takenAt } from './hold-cast';
import { aDayAhead, bookingOf, cardsAt, eveHolds, evePays, machine, paidSnapshot } from './pay-cast';

let cards: CardsStandIn;
beforeAll(async () => {
  cards = await cardsAt();
  await aClub();
});
afterAll(() => cards.stop());

/** Starts everything while a booking's row is locked by someone else, waits until all of it stands in the queue or is done, and lets go. */
async function allAtOnce(bookingId: Id<'booking'>, starts: readonly (() => Promise<unknown>)[]): Promise<PromiseSettledResult<unknown>[]> {
  const holder = await getDb().$client.connect();
  await holder.query('begin');
  await holder.query('select from bookings where id = $1 for no key update', [bookingId]);
  let done = 0;
  const running: Promise<unknown>[] = [];
  for (const start of starts) {
    running.push(start().finally(() => { done += 1; }));
    while ((await queued()) < running.length - done); // each stands in the queue before the next comes
  }
  await holder.query('commit');
  holder.release();
  return Promise.allSettled(running);
}

async function queued(): Promise<number> {
  const { rows } = await getDb().execute<{ n: number }>(sql`select count(*)::int as n from pg_stat_activity where datname = current_database() and wait_event_type = 'Lock'`);
  return rows[0]?.n ?? 0;
}

describe('races about money', () => {
  it('confirms once when the webhook comes ten times at once', async () => {
    const { day, time } = await aDayAhead();
    const eve = await eveHolds(day.id, [time.id], NOON);
    const snapshot = await paidSnapshot(cards, (await evePays(eve, NOON)).sessionId);
    const ctx = await ctxOf(machine, NOON);

    const ends = await Promise.all(Array.from({ length: 10 }, () => applyPayment(ctx, snapshot)));

    expect(ends.filter((end) => end === 'confirmed')).toHaveLength(1);
    expect(await getDb().select().from(payments).where(eq(payments.bookingId, eve.bookingId))).toHaveLength(1);
    expect(await getDb().select().from(refunds)).toEqual([]);
    expect(await getDb().select().from(journalEntries)).toHaveLength(1);
    expect((await getDb().select().from(letters).where(eq(letters.bookingId, eve.bookingId))).map((letter) => letter.kind).sort()).toEqual(['calendar', 'confirmation']);
  });

  it.each([['paid first', 0], ['expired first', 1]])('ends with the places paid for when it is told "paid" and "expired" at the same moment, %s', async (_order, first) => {
    const { day, time } = await aDayAhead();
    const eve = await eveHolds(day.id, [time.id], NOON);
    const paid = await paidSnapshot(cards, (await evePays(eve, NOON)).sessionId);
    const expired = { ...paid, isPaid: false, status: 'expired' as const };
    const ctx = await ctxOf(machine, addMinutes(NOON, 40));
    const both = [() => applyPayment(ctx, paid), () => applyPayment(ctx, expired)];

    await allAtOnce(eve.bookingId, first === 0 ? both : [...both].reverse());

    expect(await bookingOf(eve.bookingId)).toMatchObject({ releasedAt: null, confirmedAt: addMinutes(NOON, 40) });
    expect([await takenAt(time.id), await liveHeadsAt(time.id)]).toEqual([2, 2]);
    expect(await getDb().select().from(payments).where(eq(payments.bookingId, eve.bookingId))).toHaveLength(1);
  });

  it.each([['the party first', 0], ['the sweep first', 1]])('keeps longer or gives back, never both, when they meet, %s', async (_order, first) => {
    const { day, time } = await aDayAhead();
    const who = aBrowser();
    const bookingId = await keep(day.id, [time.id], who, { now: NOON });
    const justBefore = await ctxOf(who, new Date(addMinutes(NOON, 10).getTime() - 1));
    let answer = '';
    const both = [
      async () => { answer = await refusalOf(keepLonger(justBefore, { bookingId })); },
      () => endHold(getDb(), bookingId, addMinutes(NOON, 10)),
    ];

    await allAtOnce(bookingId, first === 0 ? both : [...both].reverse());

    const isKept = (await bookingOf(bookingId)).releasedAt === null;
    expect(answer).toBe(isKept ? 'done' : 'hold_over');
    expect(isKept).toBe(first === 0);
    expect([await takenAt(time.id), await liveHeadsAt(time.id)]).toEqual(isKept ? [2, 2] : [0, 0]);
  });

  it('opens one payment when Pay is pressed in two tabs at once', async () => {
    const { day, time } = await aDayAhead();
    const parties = await Promise.all(Array.from({ length: 5 }, () => eveHolds(day.id, [time.id], NOON)));

    for (const eve of parties) {
      const ends = await Promise.all(Array.from({ length: 8 }, () => evePays(eve, NOON)));

      expect(new Set(ends.map((end) => end.url)).size).toBe(1);
    }
  });

  it('numbers the receipts of a year without a gap when twenty payments arrive at once', async () => {
    const { day, time } = await aDayAhead({ capacity: 60 });
    const snapshots = [];
    for (let party = 0; party < 20; party += 1) snapshots.push(await paidSnapshot(cards, (await evePays(await eveHolds(day.id, [time.id], NOON), NOON)).sessionId));
    const ctx = await ctxOf(machine, addMinutes(NOON, 1));
    const before = (await getDb().select().from(payments)).length;

    expect(await outcomes(snapshots.map((snapshot) => () => applyPayment(ctx, snapshot)))).toEqual({ done: 20 });

    const numbers = (await getDb().select({ number: payments.receiptNumber }).from(payments)).map((row) => row.number).sort((a, b) => a - b);
    expect(numbers).toEqual(Array.from({ length: before + 20 }, (_, index) => index + 1));
    expect(await getDb().select({ id: bookings.id }).from(bookings).where(eq(bookings.openDayId, day.id))).toHaveLength(20);
  });
});
