import { eq } from 'drizzle-orm';
import { beforeAll, describe, expect, it } from 'vitest';
import { getDb } from '@/db/client';
import { bookings, visits } from '@/db/schema/bookings';
import type { Id } from '@/lib/core/ids';
import { aBrowser, aClub, anEntryTime, anOpenDay, aStop } from '../../support/cast';
import { deadlocksSoFar, keep, liveHeadsAt, outcomes, takenAt } from './hold-cast';

beforeAll(() => aClub());

describe('races for places', () => {
  it('gives 40 places to 20 of 400 parties of two at once, and tells the others so', async () => {
    const day = await anOpenDay();
    const hot = await anEntryTime(await aStop(day.id), { capacity: 40 });

    const ends = await outcomes(Array.from({ length: 400 }, () => () => keep(day.id, [hot.id])));

    expect(ends).toEqual({ done: 20, places_gone: 380 });
    expect(await takenAt(hot.id)).toBe(40);
    expect(await liveHeadsAt(hot.id)).toBe(40);
  });

  it('serves 200 parties that want three times each, in orders of their own, without one deadlock', async () => {
    const day = await anOpenDay();
    const times: { id: Id<'entryTime'> }[] = [];
    for (const number of [1, 2, 3]) times.push(await anEntryTime(await aStop(day.id, number), { capacity: 150, atMinutes: number * 90 }));
    const [a, b, c] = times.map((time) => time.id);
    if (!a || !b || !c) throw new Error('three times were made');
    const orders = [[a, b, c], [a, c, b], [b, a, c], [b, c, a], [c, a, b], [c, b, a]];
    const before = await deadlocksSoFar();

    const ends = await outcomes(Array.from({ length: 200 }, (_, party) => () => keep(day.id, orders[party % 6] ?? [])));

    expect(ends).toEqual({ done: 75, places_gone: 125 });
    for (const { id } of times) expect([await takenAt(id), await liveHeadsAt(id)]).toEqual([150, 150]);
    expect(await deadlocksSoFar()).toBe(before);
  });

  it('gives the two tabs of one browser one hold between them', async () => {
    const day = await anOpenDay();
    const time = await anEntryTime(await aStop(day.id), { capacity: 40 });
    const eve = aBrowser();

    const ends = await outcomes(Array.from({ length: 8 }, () => () => keep(day.id, [time.id], eve)));

    expect(ends).toEqual({ done: 8 });
    const live = (await getDb().select({ releasedAt: bookings.releasedAt }).from(bookings).where(eq(bookings.holderHash, eve.holderHash))).filter((row) => row.releasedAt === null);
    expect(live).toHaveLength(1);
    expect(await takenAt(time.id)).toBe(2);
    expect(await getDb().select({ id: visits.id }).from(visits).where(eq(visits.entryTimeId, time.id))).toHaveLength(8);
  });
});
