import { eq } from 'drizzle-orm';
import { beforeAll, describe, expect, it } from 'vitest';
import { getDb } from '@/db/client';
import { bookings, visits } from '@/db/schema/bookings';
import { entryTimes, openDays, prices } from '@/db/schema/opendays';
import { newId } from '@/lib/core/ids';
import { only } from '@/lib/core/only';
import { addMinutes } from '@/lib/core/time';
import { aBrowser, aClub, ada, anEntryTime, anOpenDay, apart, aStop, NOON, onTheDay } from '../../support/cast';
import { keep, liveHeadsAt, refusalOf, takenAt } from './hold-cast';

beforeAll(() => aClub());

async function aDay(capacity = 12) {
  const day = await anOpenDay();
  const [first, second] = [await aStop(day.id, 1), await aStop(day.id, 2)];
  return { day, first, second, morning: await anEntryTime(first, { capacity }), noon: await anEntryTime(second, { capacity, atMinutes: 120 }) };
}

describe('keeping places', () => {
  it('keeps all the places for the club’s ten minutes, at the prices of the moment', async () => {
    const { day, morning, noon } = await aDay();
    const member = await ada();

    const id = await keep(day.id, [morning.id, noon.id], aBrowser(member.householdId), { people: { adults: 2, children: 1, babes: 1 } });

    const booking = only(await getDb().select().from(bookings).where(eq(bookings.id, id)));
    expect(booking).toMatchObject({ totalMinor: 4000, currency: 'USD', householdId: member.householdId, heldUntil: addMinutes(NOON, 10), confirmedAt: null });
    expect(booking.code).toMatch(/^[0-9A-HJKMNP-TV-Z]{8}$/);
    expect(await getDb().select({ heads: visits.heads, adultMinor: visits.adultMinor }).from(visits).where(eq(visits.bookingId, id)))
      .toEqual([{ heads: 3, adultMinor: 800 }, { heads: 3, adultMinor: 800 }]);
    expect([await takenAt(morning.id), await takenAt(noon.id)]).toEqual([3, 3]);
  });

  it('takes a stop’s own price before the open day’s', async () => {
    const { day, first, morning, noon } = await aDay();
    await getDb().insert(prices).values({ openDayId: day.id, stopId: first.id, kind: 'adult', amountMinor: 1000 });

    const id = await keep(day.id, [morning.id, noon.id]);

    expect(only(await getDb().select({ total: bookings.totalMinor }).from(bookings).where(eq(bookings.id, id))).total).toBe(2 * 1000 + 2 * 800);
  });

  it('keeps none of the places when one time is full', async () => {
    const { day, first, morning } = await aDay();
    const full = await anEntryTime(first, { capacity: 1, atMinutes: 240 });

    expect(await refusalOf(keep(day.id, [morning.id, full.id]))).toBe('places_gone');

    expect(await takenAt(morning.id)).toBe(0);
    expect(await getDb().select().from(bookings).where(eq(bookings.openDayId, day.id))).toEqual([]);
  });

  it('takes the last places exactly, and not one more', async () => {
    const { day, morning } = await aDay(4);

    await keep(day.id, [morning.id]);
    await keep(day.id, [morning.id]);

    expect(await refusalOf(keep(day.id, [morning.id]))).toBe('places_gone');
    expect(await takenAt(morning.id)).toBe(4);
  });

  it('gives the browser’s earlier hold of the day back when it chooses again', async () => {
    const { day, morning, noon } = await aDay();
    const eve = aBrowser();
    const before = await keep(day.id, [morning.id], eve);

    await keep(day.id, [morning.id, noon.id], eve);

    expect(only(await getDb().select({ at: bookings.releasedAt }).from(bookings).where(eq(bookings.id, before))).at).toEqual(NOON);
    expect([await takenAt(morning.id), await takenAt(noon.id)]).toEqual([2, 2]);
  });

  it('keeps the earlier hold as it was when the new choice is refused', async () => {
    const { day, first, morning } = await aDay();
    const full = await anEntryTime(first, { capacity: 1, atMinutes: 240 });
    const eve = aBrowser();
    const before = await keep(day.id, [morning.id], eve);

    expect(await refusalOf(keep(day.id, [full.id], eve))).toBe('places_gone');

    expect(only(await getDb().select({ at: bookings.releasedAt }).from(bookings).where(eq(bookings.id, before))).at).toBeNull();
    expect(await takenAt(morning.id)).toBe(2);
  });

  it('lets the next party have the places of a hold that has run out, and of none that has not', async () => {
    const { day, morning } = await aDay(2);
    const slow = await keep(day.id, [morning.id]);

    expect(await refusalOf(keep(day.id, [morning.id], aBrowser(), { now: addMinutes(NOON, 9) }))).toBe('places_gone');
    expect(await refusalOf(keep(day.id, [morning.id], aBrowser(), { now: addMinutes(NOON, 10) }))).toBe('done');

    expect(only(await getDb().select({ at: bookings.releasedAt }).from(bookings).where(eq(bookings.id, slow))).at).toEqual(addMinutes(NOON, 10));
    expect(await takenAt(morning.id)).toBe(2);
    expect(await liveHeadsAt(morning.id)).toBe(2);
  });

  it('leaves a hold that has run out in peace while there are places enough', async () => {
    const { day, morning } = await aDay(4);
    const slow = await keep(day.id, [morning.id]);

    await keep(day.id, [morning.id], aBrowser(), { now: addMinutes(NOON, 11) });

    expect(only(await getDb().select({ at: bookings.releasedAt }).from(bookings).where(eq(bookings.id, slow))).at).toBeNull();
  });

  it('refuses two times that cannot both be reached, with the reason, unless the party insists', async () => {
    const { day, first, second } = await aDay();
    await apart(first.gardenId, second.gardenId, 15);
    const [early, late] = [await anEntryTime(first, { atMinutes: 30 }), await anEntryTime(second, { atMinutes: 75 })];

    const asked = keep(day.id, [early.id, late.id], aBrowser(), { insists: false });

    await expect(asked).rejects.toMatchObject({ code: 'clash', sentence: expect.stringMatching(/^11:15 at Garden \d+: 15 min from Garden \d+, you would be 5 late\./) });
    expect(await refusalOf(keep(day.id, [early.id, late.id], aBrowser(), { insists: true }))).toBe('done');
  });

  it('allows two times that can be reached to the minute', async () => {
    const { day, first, second } = await aDay();
    await apart(first.gardenId, second.gardenId, 15);
    const [early, late] = [await anEntryTime(first, { atMinutes: 30 }), await anEntryTime(second, { atMinutes: 80 })];

    expect(await refusalOf(keep(day.id, [early.id, late.id], aBrowser(), { insists: false }))).toBe('done');
  });

  it.each([
    ['nobody comes', { adults: 0, children: 0, babes: 0 }, 'nobody_in_party'],
    ['children come alone', { adults: 0, children: 2, babes: 0 }, 'child_needs_adult'],
    ['a babe comes alone', { adults: 0, children: 0, babes: 1 }, 'child_needs_adult'],
    ['ten people come', { adults: 8, children: 1, babes: 1 }, 'party_too_large'],
  ])('refuses when %s', async (_what, people, code) => {
    const { day, morning } = await aDay();

    expect(await refusalOf(keep(day.id, [morning.id], aBrowser(), { people }))).toBe(code);
    expect(await takenAt(morning.id)).toBe(0);
  });

  it('refuses a time of another open day, one that is unknown, closed or over', async () => {
    const [{ day, morning, first }, other] = [await aDay(), await aDay()];
    const closed = await anEntryTime(first, { atMinutes: 200, closedAt: NOON });

    expect(await refusalOf(keep(day.id, [other.morning.id]))).toBe('wrong_open_day');
    expect(await refusalOf(keep(day.id, [morning.id, newId()]))).toBe('not_found');
    expect(await refusalOf(keep(newId(), [morning.id]))).toBe('not_found');
    expect(await refusalOf(keep(day.id, [closed.id]))).toBe('entry_time_closed');
    expect(await refusalOf(keep(day.id, [morning.id], aBrowser(), { now: onTheDay(20) }))).toBe('entry_time_over');
    expect(await refusalOf(keep(day.id, [morning.id], aBrowser(), { now: addMinutes(onTheDay(20), -1) }))).toBe('done');
  });

  it('refuses a day that is not published or is called off', async () => {
    const [hidden, off] = [await aDay(), await aDay()];
    await getDb().update(openDays).set({ publishedAt: null }).where(eq(openDays.id, hidden.day.id));
    await getDb().update(openDays).set({ calledOffAt: NOON }).where(eq(openDays.id, off.day.id));

    expect(await refusalOf(keep(hidden.day.id, [hidden.morning.id]))).toBe('open_day_not_open');
    expect(await refusalOf(keep(off.day.id, [off.morning.id]))).toBe('called_off');
  });

  it('counts what one browser asks for', async () => {
    const { day, morning } = await aDay();
    const eager = aBrowser();
    for (let turn = 0; turn < 60; turn += 1) await keep(day.id, [morning.id], eager);

    expect(await refusalOf(keep(day.id, [morning.id], eager))).toBe('too_many_tries');
    expect(await refusalOf(keep(day.id, [morning.id], eager, { now: addMinutes(NOON, 10) }))).toBe('done');
  });

  it('is kept from overselling by the database itself, whatever a command does', async () => {
    const { morning } = await aDay(4);

    const wrong = getDb().update(entryTimes).set({ taken: 5 }).where(eq(entryTimes.id, morning.id));

    await expect(wrong).rejects.toMatchObject({ cause: { constraint: 'entry_times_never_oversold' } });
  });
});
