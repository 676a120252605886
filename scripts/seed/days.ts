import type { entryTimes, openDays, planChanges, prices, stops } from '@/db/schema/opendays';
import type { Id } from '@/lib/core/ids';
import { addDays, addMinutes, instantOf, type Day } from '@/lib/core/time';
import { seasonOf, type SeedCalendar, ZONE } from './calendar';
import { ALL_GARDENS, gardenId } from './garden-rows';
import { seedId } from './ids';

export type UnitPrices = { adultMinor: number; childMinor: number; babeMinor: number };

/** An entry time while the seed fills it. */
export type SeedTime = { id: Id<'entryTime'>; stopNumber: number; opensAt: Date; capacity: number; walkUps: number };
export type SeedStop = { id: Id<'stop'>; slug: string; number: number; stayMinutes: number; headsLimit: number; prices: UnitPrices; ownPrices: UnitPrices | null; times: SeedTime[] };
export type SeedDay = { key: 'past' | 'next' | 'later'; id: Id<'openDay'>; slug: string; title: string; placeLine: string; howToCome: string; heldOn: Day; opensAt: Date; closesAt: Date; publishedAt: Date; prices: UnitPrices; stops: SeedStop[] };

const GRACE_MINUTES = 20;
const EVERY_45 = ['10:00', '10:45', '11:30', '12:15', '13:00', '13:45', '14:30', '15:15'];
const HOURLY = ['10:00', '11:00', '12:00', '13:00', '14:00', '15:00'];
const FREE: UnitPrices = { adultMinor: 0, childMinor: 0, babeMinor: 0 };

/** A stop as it is told: the garden, places at a time, people set aside at the gate, times left out, and a price of its own. */
type Told = readonly [slug: string, capacity: number, walkUps: number, leftOut?: readonly string[], ownPrices?: UnitPrices];

const TOLD: Readonly<Record<SeedDay['key'], readonly Told[]>> = {
  past: [
    ['pine-barrow-light-railway', 14, 2], ['bellwether-street-tram', 12, 2], ['curlew-pier-railway', 12, 1], ['inchworm-and-vale', 14, 2], ['gorsefoot-timber-line', 10, 0, ['13:00']], ['thistledown-junction', 20, 4],
  ],
  next: [
    ['saltmarsh-and-plover', 12, 0], ['mossgill-quarry-tramway', 10, 0], ['pine-barrow-light-railway', 14, 1], ['thistledown-junction', 20, 2, [], FREE],
    ['copperkettle-and-western', 14, 0, [], { adultMinor: 1000, childMinor: 500, babeMinor: 0 }], ['tansy-bank-and-dunlin', 12, 0], ['old-orchard-line', 10, 0, ['10:00', '10:45']],
  ],
  later: [
    ['nightjar-mineral-railway', 10, 0, ['10:00', '11:00']], ['bellwether-street-tram', 14, 0], ['curlew-pier-railway', 12, 0, ['13:00']], ['inchworm-and-vale', 14, 0], ['gorsefoot-timber-line', 10, 0, [], { adultMinor: 600, childMinor: 0, babeMinor: 0 }],
  ],
};

function seedDay(key: SeedDay['key'], heldOn: Day, title: string, starts: readonly string[], unit: UnitPrices, more: Pick<SeedDay, 'placeLine' | 'howToCome'>): SeedDay {
  const id = seedId<'openDay'>(`open day ${key}`);
  const stopsOf = TOLD[key].map(([slug, capacity, walkUps, leftOut = [], ownPrices]): SeedStop => {
    const garden = ALL_GARDENS.find((each) => each.slug === slug);
    if (!garden) throw new Error(`no garden is called ${slug}`);
    const number = TOLD[key].findIndex(([each]) => each === slug) + 1;
    const times = starts.filter((start) => !leftOut.includes(start)).map((start): SeedTime => ({ id: seedId<'entryTime'>(`entry ${key} ${slug} ${start}`), stopNumber: number, opensAt: instantOf(heldOn, start, ZONE), capacity, walkUps }));
    return { id: seedId<'stop'>(`stop ${key} ${slug}`), slug, number, stayMinutes: garden.stayMinutes, headsLimit: garden.headsLimit, prices: ownPrices ?? unit, ownPrices: ownPrices ?? null, times };
  });
  return {
    key, id, slug: `${title.toLowerCase().replace(/[^a-z]+/g, '-')}-${heldOn}`, title, heldOn, opensAt: instantOf(heldOn, '10:00', ZONE), closesAt: instantOf(heldOn, '16:00', ZONE),
    publishedAt: instantOf(addDays(heldOn, -60), '09:00', ZONE), prices: unit, stops: stopsOf, ...more,
  };
}

/** The three open days of the demo: one two to three weeks ago, one a week or two ahead, one in six or seven weeks. */
export function seedDays({ past, next, later }: SeedCalendar): { past: SeedDay; next: SeedDay; later: SeedDay } {
  return {
    past: seedDay('past', past, 'Friends and Neighbours Day', HOURLY, { adultMinor: 700, childMinor: 300, babeMinor: 0 }, { placeLine: 'on both banks', howToCome: 'By car along Valley Road; there is a bus to the halt on the hour.' }),
    next: seedDay('next', next, `${seasonOf(next)} Open Gardens`, EVERY_45, { adultMinor: 800, childMinor: 400, babeMinor: 0 }, { placeLine: 'in and around Alder Fork', howToCome: 'By car along Valley Road or Quarry Road; the bus stops at the halt on the hour. Tea at the chapel hall all day.' }),
    later: seedDay('later', later, 'Five Gardens and Tea', HOURLY, { adultMinor: 500, childMinor: 200, babeMinor: 0 }, { placeLine: 'up and down the valley', howToCome: 'By car; the lanes at the long meadows are narrow, and soft after rain.' }),
  };
}

export type DayRows = {
  days: (typeof openDays.$inferInsert)[]; stops: (typeof stops.$inferInsert)[]; times: (typeof entryTimes.$inferInsert)[]; prices: (typeof prices.$inferInsert)[]; notes: (typeof planChanges.$inferInsert)[];
};

/** The rows of the open days. `takenAt` says how many heads lie on each entry time, walk-ups not counted. */
export function dayRows(all: readonly SeedDay[], takenAt: ReadonlyMap<string, number>, cleo: Id<'account'>, now: Date): DayRows {
  const priceRows = (openDayId: Id<'openDay'>, stopId: Id<'stop'> | null, name: string, unit: UnitPrices) =>
    ([['adult', unit.adultMinor], ['child', unit.childMinor], ['babe', unit.babeMinor]] as const).map(([kind, amountMinor]) => ({ id: seedId(`price ${name} ${kind}`), openDayId, stopId, kind, amountMinor }));
  return {
    days: all.map(({ id, slug, title, placeLine, howToCome, heldOn, opensAt, closesAt, publishedAt }) => ({ id, slug, title, placeLine, howToCome, heldOn, opensAt, closesAt, publishedAt: publishedAt < now ? publishedAt : now })),
    stops: all.flatMap((day) => day.stops.map(({ id, slug, number, stayMinutes, headsLimit }) => ({ id, openDayId: day.id, gardenId: gardenId(slug), number, stayMinutes, headsLimit }))),
    times: all.flatMap((day) => day.stops.flatMap((stop) => stop.times.map(({ id, opensAt, capacity, walkUps }) => ({
      id, stopId: stop.id, openDayId: day.id, opensAt, graceUntil: addMinutes(opensAt, GRACE_MINUTES), capacity, walkUps, taken: (takenAt.get(id) ?? 0) + walkUps,
    })))),
    prices: all.flatMap((day) => [
      ...priceRows(day.id, null, day.key, day.prices),
      ...day.stops.flatMap((stop) => (stop.ownPrices ? priceRows(day.id, stop.id, `${day.key} ${stop.number}`, stop.ownPrices) : [])),
    ]),
    notes: all.filter(({ key }) => key === 'next').flatMap((day) => ([
      [-24, 3, 'Ada asks for one place at each time to be kept back for callers.'], [-16, 7, 'Lorcan plays the organ until noon: first entry at 11:30.'],
      [-9, 5, 'The log rail is mended. Rosalind says fourteen, not twelve.'], [-4, null, 'Tea at the chapel hall is settled with Agnes.'],
    ] as const).map(([days, stopNumber, note], i) => ({
      id: seedId(`note ${i}`), openDayId: day.id, stopId: day.stops.find(({ number }) => number === stopNumber)?.id ?? null, at: addMinutes(now, days * 1440), accountId: cleo, initials: 'C. H.', note,
    }))),
  };
}
