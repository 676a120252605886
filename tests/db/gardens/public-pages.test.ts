import { beforeAll, describe, expect, test } from 'vitest';
import { getDb } from '@/db/client';
import { gardenPlants, plants } from '@/db/schema/gardens';
import { prices } from '@/db/schema/opendays';
import { addMinutes } from '@/lib/core/time';
import { comingDays, findGarden, findNextDay, listGardens } from '@/lib/gardens/queries';
import { toListed } from '@/lib/gardens/views';
import { aClub, aGarden, anEntryTime, anOpenDay, apart, aStop, ctxOf, MAY_15, NOON } from '@/tests/support/cast';

const stranger = { kind: 'anyone' } as const;

beforeAll(async () => {
  await aClub();
  await getDb().insert(plants).values([
    { key: 'thyme', commonName: 'Mother-of-thyme', botanicalName: 'Thymus', colour: 'mauve', bloomMonths: [5, 6], drawing: 'thyme' },
    { key: 'spruce', commonName: 'Dwarf spruce', botanicalName: 'Picea', colour: 'green', bloomMonths: [], isEvergreen: true, drawing: 'dwarf-spruce' },
  ]);
});

describe('a garden’s page', () => {
  test('shows a published garden with its planting, tallest first', async () => {
    const garden = await aGarden();
    await getDb().insert(gardenPlants).values([{ gardenId: garden.id, plantKey: 'thyme', heightMm: 50 }, { gardenId: garden.id, plantKey: 'spruce', heightMm: 500 }]);

    const found = await findGarden(await ctxOf(stranger), garden.slug);

    expect(found?.railwayName).toBe(garden.railwayName);
    expect(found?.plants.map(({ key, heightMm }) => [key, heightMm])).toEqual([['spruce', 500], ['thyme', 50]]);
    expect(found?.plants[1]?.bloomMonths).toEqual([5, 6]);
  });

  test('is not there for a garden that is not published, was withdrawn, or never was', async () => {
    const [hidden, gone] = [await aGarden({ publishedAt: null }), await aGarden({ withdrawnAt: NOON })];
    const ctx = await ctxOf(stranger);

    expect([await findGarden(ctx, hidden.slug), await findGarden(ctx, gone.slug), await findGarden(ctx, 'never-was')]).toEqual([null, null, null]);
  });

  test('lists the times of the next open day in which the garden takes part, and says which are over', async () => {
    const garden = await aGarden();
    const later = await anOpenDay({ opensAt: addMinutes(MAY_15.opensAt, 50_000), closesAt: addMinutes(MAY_15.closesAt, 50_000) });
    const next = await anOpenDay();
    await aStop(later.id, 3, { gardenId: garden.id });
    const stop = await aStop(next.id, 5, { gardenId: garden.id });
    await anEntryTime(stop, { capacity: 12, taken: 9, atMinutes: 0 });
    await anEntryTime(stop, { capacity: 12, taken: 12, atMinutes: 45 });
    await anEntryTime(stop, { capacity: 12, closedAt: NOON, atMinutes: 90 });

    const day = await findNextDay(await ctxOf(stranger), garden.slug);

    expect(day).toMatchObject({ slug: next.slug, number: 5, isCalledOff: false, capacity: 36, taken: 21 });
    expect(day?.times.map(({ places, isOver }) => [places, isOver])).toEqual([[3, false], [0, false], [12, true]]);
  });

  test('calls a time over exactly when its grace ends', async () => {
    const garden = await aGarden();
    const entry = await anEntryTime(await aStop((await anOpenDay()).id, 1, { gardenId: garden.id }));

    const before = await findNextDay(await ctxOf(stranger, addMinutes(entry.opensAt, 19)), garden.slug);
    const after = await findNextDay(await ctxOf(stranger, addMinutes(entry.opensAt, 20)), garden.slug);

    expect([before?.times[0]?.isOver, after?.times[0]?.isOver]).toEqual([false, true]);
  });

  test('gives the minutes from the garden with the number before, between areas', async () => {
    const day = await anOpenDay();
    const [one, two] = [await aGarden(), await aGarden()];
    await aStop(day.id, 1, { gardenId: one.id });
    await aStop(day.id, 2, { gardenId: two.id });
    await apart(one.id, two.id, 15);
    const ctx = await ctxOf(stranger);

    expect((await findNextDay(ctx, two.slug))?.from).toMatchObject({ number: 1, minutes: 15 });
    expect((await findNextDay(ctx, one.slug))?.from).toBeNull();
  });

  test('knows no times after the gates are shut, and none of an open day that is not published', async () => {
    const garden = await aGarden();
    await aStop((await anOpenDay({ publishedAt: null })).id, 1, { gardenId: garden.id });
    const over = await anOpenDay();
    await aStop(over.id, 2, { gardenId: garden.id });

    expect((await findNextDay(await ctxOf(stranger, addMinutes(MAY_15.closesAt, -1)), garden.slug))?.slug).toBe(over.slug);
    expect(await findNextDay(await ctxOf(stranger, MAY_15.closesAt), garden.slug)).toBeNull();
  });
});

describe('the index', () => {
  test('puts the gardens of a day first, by number, with the most places left at one time', async () => {
    const day = await anOpenDay();
    const [second, first] = [await aStop(day.id, 2), await aStop(day.id, 1)];
    await anEntryTime(first, { capacity: 12, taken: 10, atMinutes: 0 });
    await anEntryTime(first, { capacity: 12, taken: 7, atMinutes: 45 });
    await anEntryTime(second, { capacity: 12, taken: 12, atMinutes: 0 });

    const rows = await listGardens(await ctxOf(stranger), day.slug);

    expect(rows.slice(0, 2).map(({ number, placesLeft, allPlaces }) => [number, placesLeft, allPlaces])).toEqual([[1, 5, 7], [2, 0, 0]]);
    expect(rows.slice(2).every(({ number, placesLeft }) => number === null && placesLeft === null)).toBe(true);
  });

  test('numbers a resting garden as its own page does', async () => {
    const ctx = await ctxOf(stranger);
    const [next] = await comingDays(ctx);
    const listed = toListed(await listGardens(ctx, next?.slug ?? null), ctx.club).filter(({ takesPart }) => !takesPart);

    for (const { slug, number } of listed.slice(0, 5)) expect((await findGarden(ctx, slug))?.restNumber).toBe(number);
  });

  test('shows no garden twice, whatever number of open days are coming', async () => {
    const slugs = (await listGardens(await ctxOf(stranger), null)).map(({ slug }) => slug);

    expect(new Set(slugs).size).toBe(slugs.length);
  });
});

describe('the coming days', () => {
  test('stand soonest first, each with its own prices only', async () => {
    const dear = await anOpenDay({ opensAt: addMinutes(MAY_15.opensAt, -5000), closesAt: addMinutes(MAY_15.closesAt, -5000) }, { adult: 1200, child: 500, babe: 0 });
    const stop = await aStop(dear.id);
    await getDb().insert(prices).values({ openDayId: dear.id, stopId: stop.id, kind: 'adult', amountMinor: 900 });

    const days = await comingDays(await ctxOf(stranger));

    expect(days[0]?.slug).toBe(dear.slug);
    expect(days[0]?.prices.map(({ stopId, kind, amountMinor }) => [stopId === null, kind, amountMinor]).sort()).toEqual([[false, 'adult', 900], [true, 'adult', 1200], [true, 'babe', 0], [true, 'child', 500]]);
    expect(days.slice(1).every(({ prices: each }) => each.length === 3)).toBe(true);
  });
});

describe('where a garden is', () => {
  test('is in nothing that the public pages read: no address, no directions, no point', async () => {
    const garden = await aGarden();
    const day = await anOpenDay();
    await anEntryTime(await aStop(day.id, 1, { gardenId: garden.id }));
    const ctx = await ctxOf(stranger);

    const read = JSON.stringify([await findGarden(ctx, garden.slug), await findNextDay(ctx, garden.slug), await listGardens(ctx, day.slug), await comingDays(ctx)]);

    expect(read).not.toMatch(/Secret Lane|Hidden End|green gate|41\.5\d|-40\.25|"lat|"lon|address/i);
  });
});
