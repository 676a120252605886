import { addDays, dayOf, type Day } from '@/lib/core/time';

export const ZONE = 'America/New_York';

/** The days everything hangs on, counted from the moment of planting in the club's zone. */
export type SeedCalendar = { now: Date; today: Day; year: number; past: Day; next: Day; later: Day };

const weekday = (on: Day): number => new Date(`${on}T12:00:00Z`).getUTCDay();

/** The first Saturday a week or more ahead, the one four weeks before it (so two to three weeks ago), and the one five weeks after it. */
export function seedCalendar(now: Date): SeedCalendar {
  const today = dayOf(now, ZONE);
  const next = addDays(today, 7 + ((6 - weekday(addDays(today, 7)) + 7) % 7));
  return { now, today, year: Number(today.slice(0, 4)), past: addDays(next, -28), next, later: addDays(next, 35) };
}

/** The season's name for an open day, by the months of the north. */
export function seasonOf(on: Day): string {
  const month = Number(on.slice(5, 7));
  return month < 3 || month === 12 ? 'Winter' : month < 6 ? 'Spring' : month < 9 ? 'Summer' : 'Autumn';
}
