import type { Day } from '@/lib/core/time';

type Row = {
  garden: string; headsLimit: number; day: string; heldOn: Day; openDayId: string; entryTimeId: string; opensAt: Date; capacity: number;
  visitId: string | null; name: string | null; adults: number | null; children: number | null; babes: number | null;
};

/** One garden on one day: its entry times in order, each with its parties. */
export type ComingDay = {
  key: string; garden: string; day: string; heldOn: Day; headsLimit: number; people: number;
  times: { id: string; opensAt: Date; capacity: number; people: number; parties: { name: string; people: number }[] }[];
};

/** Rows of one party each (or an empty entry time), already in order, as days with their entry times. */
export function byEntryTime(rows: readonly Row[]): ComingDay[] {
  const days = new Map<string, ComingDay>();
  for (const row of rows) {
    const key = `${row.openDayId} ${row.garden}`;
    const day = days.get(key) ?? { key, garden: row.garden, day: row.day, heldOn: row.heldOn, headsLimit: row.headsLimit, people: 0, times: [] };
    days.set(key, day);
    const known = day.times.find((each) => each.id === row.entryTimeId);
    const time = known ?? { id: row.entryTimeId, opensAt: row.opensAt, capacity: row.capacity, people: 0, parties: [] };
    if (!known) day.times.push(time);
    if (row.visitId === null) continue;
    const people = (row.adults ?? 0) + (row.children ?? 0) + (row.babes ?? 0);
    time.people += people;
    day.people += people;
    time.parties.push({ name: row.name ?? 'a party', people });
  }
  return [...days.values()];
}
