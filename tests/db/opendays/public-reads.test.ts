import { beforeAll, describe, expect, test } from 'vitest';
import { getDb } from '@/db/client';
import { bookings, visits } from '@/db/schema/bookings';
import { paymentAttempts } from '@/db/schema/books';
import { entryTimes, prices } from '@/db/schema/opendays';
import { eq } from 'drizzle-orm';
import { newId, type Id } from '@/lib/core/ids';
import { only } from '@/lib/core/only';
import { addMinutes } from '@/lib/core/time';
import { findOpenDay, findOwnKept, findPlacesLeft, listOpenDays } from '@/lib/opendays/queries';
import { aBrowser, aClub, aGarden, anEntryTime, anOpenDay, apart, aStop, ctxOf, MAY_15, NOON } from '@/tests/support/cast';

const stranger = { kind: 'anyone' } as const;
const DRAWN = '0123456789ABCDEFGHJKMNPQRSTVWXYZ';
let drawn = 0;
const aCode = () => { drawn += 1; return `AAAAAA${DRAWN[Math.floor(drawn / 32)] ?? 'A'}${DRAWN[drawn % 32] ?? 'A'}`; };

type Kept = { heldUntil: Date; confirmedAt?: Date; releasedAt?: Date; payment?: 'open' | 'ended'; heads?: number };

/** A party's places at an entry time, as the commands leave them: `taken` moved with the visit. */
async function keep(openDayId: Id<'openDay'>, entryTimeId: Id<'entryTime'>, { heldUntil, confirmedAt, releasedAt, payment, heads = 3 }: Kept): Promise<void> {
  const db = getDb();
  const booking = only(await db.insert(bookings).values({ openDayId, code: aCode(), holderHash: newId(), madeAt: NOON, heldUntil, totalMinor: 2400, currency: 'USD', ...(confirmedAt ? { confirmedAt } : {}), ...(releasedAt ? { releasedAt } : {}) }).returning({ id: bookings.id }));
  await db.insert(visits).values({ bookingId: booking.id, openDayId, entryTimeId, adults: heads, children: 0, heads, adultMinor: 800, childMinor: 400, babeMinor: 0 });
  if (payment) {
    await db.insert(paymentAttempts).values({ bookingId: booking.id, idempotencyKey: newId(), amountMinor: 2400, currency: 'USD', openedAt: NOON, ...(payment === 'ended' ? { endedAt: NOON, outcome: 'expired' as const } : {}) });
  }
  if (releasedAt) return;
  const entry = only(await db.select({ taken: entryTimes.taken }).from(entryTimes).where(eq(entryTimes.id, entryTimeId)));
  await db.update(entryTimes).set({ taken: entry.taken + heads }).where(eq(entryTimes.id, entryTimeId));
}

beforeAll(() => aClub());

describe('places left', () => {
  test('count a hold that ran out as free, but not one that is still kept, confirmed, or being paid', async () => {
    const day = await anOpenDay();
    const stop = await aStop(day.id);
    const entry = await anEntryTime(stop, { capacity: 40 });
    const before = { heldUntil: addMinutes(NOON, -1) };
    await keep(day.id, entry.id, { ...before, heads: 1 }); // ran out: free again
    await keep(day.id, entry.id, { heldUntil: NOON, heads: 2 }); // ran out this minute: free again
    await keep(day.id, entry.id, { heldUntil: addMinutes(NOON, 1), heads: 4 }); // kept
    await keep(day.id, entry.id, { ...before, confirmedAt: NOON, heads: 5 });
    await keep(day.id, entry.id, { ...before, payment: 'open', heads: 6 });
    await keep(day.id, entry.id, { ...before, payment: 'ended', heads: 7 }); // its payment expired: free again
    await keep(day.id, entry.id, { ...before, releasedAt: NOON, heads: 3 }); // given back already

    const left = await findPlacesLeft(await ctxOf(stranger), day.id);

    expect(left).toEqual({ places: { [entry.id]: 40 - 4 - 5 - 6 } });
  });

  test('are null for a time that is closed or over, and there is no answer for a day that is not published', async () => {
    const day = await anOpenDay();
    const stop = await aStop(day.id);
    const [open, closed] = [await anEntryTime(stop, { capacity: 5 }), await anEntryTime(stop, { capacity: 5, atMinutes: 45, closedAt: NOON })];
    const secret = await anOpenDay({ publishedAt: null });

    expect(await findPlacesLeft(await ctxOf(stranger), day.id)).toEqual({ places: { [open.id]: 5, [closed.id]: null } });
    expect(await findPlacesLeft(await ctxOf(stranger, addMinutes(open.opensAt, 20)), day.id)).toEqual({ places: { [open.id]: null, [closed.id]: null } });
    expect(await findPlacesLeft(await ctxOf(stranger), secret.id)).toBeNull();
    expect(await findPlacesLeft(await ctxOf(stranger), newId<'openDay'>())).toBeNull();
  });

  test('are none, and no mistake, for a day without entry times', async () => {
    expect(await findPlacesLeft(await ctxOf(stranger), (await anOpenDay()).id)).toEqual({ places: {} });
  });
});

describe('the page of an open day', () => {
  test('has its board: stops by number, minutes between areas, own prices, figures in a sentence', async () => {
    const day = await anOpenDay();
    const [first, second] = [await aGarden({ powers: ['live-steam'], water: 'pond' }), await aGarden({ isStepFree: false })];
    await apart(first.id, second.id, 15);
    const two = await aStop(day.id, 2, { gardenId: second.id });
    const one = await aStop(day.id, 1, { gardenId: first.id });
    const entry = await anEntryTime(one, { capacity: 12, walkUps: 2, taken: 2 });
    await anEntryTime(two, { capacity: 10, atMinutes: 45 });
    await keep(day.id, entry.id, { heldUntil: NOON, confirmedAt: NOON });
    await getDb().insert(prices).values({ openDayId: day.id, stopId: two.id, kind: 'adult', amountMinor: 1200 });

    const page = await findOpenDay(await ctxOf(stranger), day.slug);

    expect(page?.board.stops.map((stop) => [stop.number, stop.notes, stop.minutesFromAbove, stop.prices.adultMinor])).toEqual([[1, ['s', 'w', 'p'], null, 800], [2, [], 15, 1200]]);
    expect(page?.board.rows.map((row) => row.map((cell) => cell?.places ?? null))).toEqual([[7, null], [null, 10]]);
    expect(page?.line).toBe('Saturday 15 May 2027, two gardens in the test valley, from 10:00 until 16:00');
    expect(page?.sums).toBe('3 of 20 places are taken, by 1 party. A visit is $8 for each adult and $4 for a child; babes in arms come free. One garden has a price of its own.');
    expect(page?.cautions[0]).toEqual({ sentence: 'There is a pond: keep hold of small children.', gardens: [1] });
  });

  test('tells nobody where a garden is', async () => {
    const day = await anOpenDay();
    await anEntryTime(await aStop(day.id));

    const page = JSON.stringify(await findOpenDay(await ctxOf(stranger), day.slug));

    expect(page).not.toMatch(/Secret Lane|green gate|41\.5|-40\.25/);
  });

  test('is not there before the day is published, and not there when nobody ever planned it', async () => {
    const secret = await anOpenDay({ publishedAt: null });
    const later = await anOpenDay({ publishedAt: addMinutes(NOON, 1) });

    expect(await findOpenDay(await ctxOf(stranger), secret.slug)).toBeNull();
    expect(await findOpenDay(await ctxOf(stranger), later.slug)).toBeNull();
    expect(await findOpenDay(await ctxOf(stranger), 'no-such-day')).toBeNull();
  });

  test('is past from the minute the gates shut, and called off for good', async () => {
    const day = await anOpenDay();
    const off = await anOpenDay({ calledOffAt: NOON, calledOffNote: 'Storms are forecast.' });

    expect((await findOpenDay(await ctxOf(stranger, addMinutes(MAY_15.closesAt, -1)), day.slug))?.phase).toBe('coming');
    expect((await findOpenDay(await ctxOf(stranger, MAY_15.closesAt), day.slug))?.phase).toBe('past');
    expect(await findOpenDay(await ctxOf(stranger, MAY_15.closesAt), off.slug)).toMatchObject({ phase: 'called-off', note: 'Storms are forecast.' });
  });

  test('has a board without rows when no garden has been put in', async () => {
    const day = await anOpenDay();

    expect((await findOpenDay(await ctxOf(stranger), day.slug))?.board).toMatchObject({ stops: [], columns: [], rows: [] });
  });
});

test('a browser finds the places it keeps at a day, with their heads, until the minute they run out', async () => {
  const day = await anOpenDay();
  const entry = await anEntryTime(await aStop(day.id));
  const browser = aBrowser();
  const until = addMinutes(NOON, 10);
  const booking = only(await getDb().insert(bookings).values({ openDayId: day.id, code: aCode(), holderHash: browser.holderHash, madeAt: NOON, heldUntil: until, totalMinor: 0, currency: 'USD' }).returning({ id: bookings.id }));
  await getDb().insert(visits).values({ bookingId: booking.id, openDayId: day.id, entryTimeId: entry.id, adults: 2, children: 1, heads: 3, adultMinor: 0, childMinor: 0, babeMinor: 0 });

  expect(await findOwnKept(await ctxOf(browser), day.slug)).toEqual({ keptUntil: '12:10', heads: { [entry.id]: 3 } });
  expect(await findOwnKept(await ctxOf(browser, until), day.slug)).toBeNull();
  expect(await findOwnKept(await ctxOf(aBrowser()), day.slug)).toBeNull();
});

test('the list has coming days soonest first, then past ones, and none that is not published', async () => {
  const at = (slug: string, days: number, publishedAt: Date | null = NOON) =>
    anOpenDay({ slug, heldOn: '2027-05-15', opensAt: addMinutes(NOON, days * 1440), closesAt: addMinutes(NOON, days * 1440 + 360), publishedAt });
  await at('listed-later', 300);
  await at('listed-sooner', 200);
  await at('listed-older', -300);
  await at('listed-newer', -200);
  await at('listed-never', 250, null);

  const slugs = (await listOpenDays(await ctxOf(stranger))).map((day) => day.slug).filter((slug) => slug.startsWith('listed'));

  expect(slugs).toEqual(['listed-sooner', 'listed-later', 'listed-newer', 'listed-older']);
});
