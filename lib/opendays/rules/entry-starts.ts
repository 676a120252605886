import { addMinutes, instantOf, type Day } from '@/lib/core/time';

/** The most entry times that are made at one go. */
export const STARTS_MOST = 60;

/**
 * The starts from `firstAt` to `lastAt` on a day, every so many minutes of real time: on the day the clocks change the
 * spacing stays, and the wall clock jumps. At most `STARTS_MOST`.
 */
export function entryStarts(on: Day, firstAt: string, lastAt: string, everyMinutes: number, timeZone: string): Date[] {
  const last = instantOf(on, lastAt, timeZone);
  const starts: Date[] = [];
  for (let at = instantOf(on, firstAt, timeZone); at <= last && starts.length < STARTS_MOST; at = addMinutes(at, everyMinutes)) starts.push(at);
  return starts;
}
