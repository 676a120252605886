import type { Id } from '@/lib/core/ids';
import type { Role } from '@/lib/core/words';
import { may, type Capability } from '@/lib/people/rules/capabilities';

/** What a stop charges instead of the open day's prices, by kind, in minor units; a kind that is not there pays the day's. */
export type OwnPrices = { adult?: number; child?: number; babe?: number };

type Row = {
  stopId: Id<'stop'>; number: number; garden: string; shortName: string; stayMinutes: number; headsLimit: number; hostLimit: number;
  entryTimeId: Id<'entryTime'> | null; opensAt: Date | null; graceUntil: Date | null; capacity: number | null; taken: number | null; walkUps: number | null; closedAt: Date | null;
  confirmedHeads: number; expectedPeople: number; ownPrices: OwnPrices;
};

export type OfficeTime = { id: Id<'entryTime'>; opensAt: Date; graceUntil: Date; capacity: number; taken: number; held: number; walkUps: number; people: number; closedAt: Date | null };
export type OfficeStop = { id: Id<'stop'>; number: number; garden: string; shortName: string; stayMinutes: number; headsLimit: number; hostLimit: number; ownPrices: OwnPrices; capacity: number; taken: number; people: number; times: OfficeTime[] };

/** Rows of one entry time each, already in order, as stops with their times and sums. `held` is what is kept and not yet confirmed; `walkUps` what is set aside for people without a ticket. */
export function toOfficeStops(rows: readonly Row[]): OfficeStop[] {
  const stops = new Map<string, OfficeStop>();
  for (const row of rows) {
    const stop = stops.get(row.stopId) ?? { id: row.stopId, number: row.number, garden: row.garden, shortName: row.shortName, stayMinutes: row.stayMinutes, headsLimit: row.headsLimit, hostLimit: row.hostLimit, ownPrices: row.ownPrices, capacity: 0, taken: 0, people: 0, times: [] };
    stops.set(row.stopId, stop);
    const { entryTimeId, opensAt, graceUntil, capacity, taken, walkUps } = row;
    if (entryTimeId === null || opensAt === null || graceUntil === null || capacity === null || taken === null || walkUps === null) continue;
    stop.times.push({ id: entryTimeId, opensAt, graceUntil, capacity, taken, held: taken - row.confirmedHeads - walkUps, walkUps, people: row.expectedPeople, closedAt: row.closedAt });
    stop.capacity += capacity;
    stop.taken += taken;
    stop.people += row.expectedPeople;
  }
  return [...stops.values()];
}

/** What one garden has at one moment of the day; null where it has no entry time then. */
export type PlaceCell = { number: number; time: OfficeTime | null };
export type PlaceRow = { at: Date; cells: PlaceCell[]; taken: number; people: number };

/** The union of all starts down, the stops across: the timetable of places and people. */
export function placesByTime(stops: readonly OfficeStop[]): PlaceRow[] {
  const starts = [...new Set(stops.flatMap((stop) => stop.times.map((time) => time.opensAt.getTime())))].sort((a, b) => a - b);
  return starts.map((start) => {
    const cells = stops.map((stop): PlaceCell => ({ number: stop.number, time: stop.times.find((time) => time.opensAt.getTime() === start) ?? null }));
    const times = cells.flatMap(({ time }) => (time === null ? [] : [time]));
    return { at: new Date(start), cells, taken: times.reduce((sum, time) => sum + time.taken, 0), people: times.reduce((sum, time) => sum + time.people, 0) };
  });
}

/** All the stops' figures in one. */
export function sumsOf(stops: readonly OfficeStop[]) {
  const times = stops.flatMap((stop) => stop.times);
  const sum = (of: (time: OfficeTime) => number) => times.reduce((total, time) => total + of(time), 0);
  return { capacity: sum((time) => time.capacity), taken: sum((time) => time.taken), held: sum((time) => time.held), walkUps: sum((time) => time.walkUps) };
}

type DayLine = { slug: string; parties: number; passes: number; lettersWritten: number };
type ContentsLine = { href: string; label: string; count?: number };

/** The contents of one open day that someone with these roles may open: the day, its stops, its gates, its letters, its bookings. */
export function dayContents(day: DayLine, stops: readonly { number: number; shortName: string; times: readonly unknown[] }[], roles: readonly Role[]): ContentsLine[] {
  const path = `/office/open-days/${day.slug}`;
  const lines: (ContentsLine & { needs: Capability })[] = [
    { href: path, label: 'The day', needs: 'openDays.see' },
    { href: `${path}/plan`, label: 'Words, hours, prices', needs: 'openDays.edit' },
    ...stops.map((stop) => ({ href: `${path}/stops/${stop.number}`, label: `${stop.number} ${stop.shortName}`, count: stop.times.length, needs: 'openDays.see' as const })),
    { href: `${path}/gates`, label: 'Gates', count: day.passes, needs: 'gates.edit' },
    { href: `${path}/letter`, label: 'Letters to parties', count: day.lettersWritten, needs: 'letters.send' },
    { href: `/office/bookings?day=${day.slug}`, label: 'Bookings', count: day.parties, needs: 'bookings.see' },
  ];
  return lines.filter((line) => may(roles, line.needs)).map(({ href, label, count }) => ({ href, label, ...(count === undefined ? {} : { count }) }));
}

type Moving = { entryTimeId: Id<'entryTime'>; heads: number };

/** Where an officer may move a visit: every other open entry time with room for its heads, by garden and start. `say` writes the time. */
export const moveChoices = (stops: readonly OfficeStop[], visit: Moving, now: Date, say: (at: Date) => string) =>
  stops.flatMap((stop) => stop.times
    .filter((time) => time.id !== visit.entryTimeId && time.closedAt === null && time.graceUntil > now && time.capacity - time.taken >= visit.heads)
    .map((time) => ({ value: time.id, label: `${stop.number} ${stop.shortName}, ${say(time.opensAt)} (${time.capacity - time.taken} places left)` })));
