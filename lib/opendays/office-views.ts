import type { Id } from '@/lib/core/ids';

type Row = {
  stopId: Id<'stop'>; number: number; garden: string; shortName: string; stayMinutes: number; headsLimit: number; hostLimit: number;
  entryTimeId: Id<'entryTime'> | null; opensAt: Date | null; graceUntil: Date | null; capacity: number | null; taken: number | null; closedAt: Date | null;
  confirmedHeads: number; expectedPeople: number;
};

export type OfficeTime = { id: Id<'entryTime'>; opensAt: Date; graceUntil: Date; capacity: number; taken: number; held: number; people: number; closedAt: Date | null };
export type OfficeStop = { id: Id<'stop'>; number: number; garden: string; shortName: string; stayMinutes: number; headsLimit: number; hostLimit: number; capacity: number; taken: number; people: number; times: OfficeTime[] };

/** Rows of one entry time each, already in order, as stops with their times and sums. `held` is what is kept and not yet confirmed. */
export function toOfficeStops(rows: readonly Row[]): OfficeStop[] {
  const stops = new Map<string, OfficeStop>();
  for (const row of rows) {
    const stop = stops.get(row.stopId) ?? { id: row.stopId, number: row.number, garden: row.garden, shortName: row.shortName, stayMinutes: row.stayMinutes, headsLimit: row.headsLimit, hostLimit: row.hostLimit, capacity: 0, taken: 0, people: 0, times: [] };
    stops.set(row.stopId, stop);
    const { entryTimeId, opensAt, graceUntil, capacity, taken } = row;
    if (entryTimeId === null || opensAt === null || graceUntil === null || capacity === null || taken === null) continue;
    stop.times.push({ id: entryTimeId, opensAt, graceUntil, capacity, taken, held: taken - row.confirmedHeads, people: row.expectedPeople, closedAt: row.closedAt });
    stop.capacity += capacity;
    stop.taken += taken;
    stop.people += row.expectedPeople;
  }
  return [...stops.values()];
}
