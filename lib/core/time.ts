import { Temporal } from 'temporal-polyfill';

/** How a club reads a clock: its IANA zone, its locale, and 12- or 24-hour times. */
export type ClubTime = { timeZone: string; locale: string; hourCycle: 'h12' | 'h23' };

/** A calendar day, `2027-05-15`. Never an instant. */
export type Day = string;

const zoned = (at: Date, timeZone: string) => Temporal.Instant.fromEpochMilliseconds(at.getTime()).toZonedDateTimeISO(timeZone);

/** The club's calendar day on which an instant falls. */
export const dayOf = (at: Date, timeZone: string): Day => zoned(at, timeZone).toPlainDate().toString();

/** The wall-clock time of an instant in a zone, `HH:MM`, always 24-hour: for columns, codes and comparison. */
export const wallTime = (at: Date, timeZone: string): string => zoned(at, timeZone).toPlainTime().toString({ smallestUnit: 'minute' });

/**
 * The instant of a wall-clock time on a day. At a clock change RFC 5545 section 3.3.5 decides: the first of two,
 * and in a gap the offset before it (Temporal's "compatible").
 */
export function instantOf(on: Day, time: string, timeZone: string): Date {
  const local = Temporal.PlainDateTime.from(`${on}T${time}`);
  return new Date(local.toZonedDateTime(timeZone, { disambiguation: 'compatible' }).epochMilliseconds);
}

/** The instant at which a day begins in a zone. */
export const startOfDay = (on: Day, timeZone: string): Date =>
  new Date(Temporal.PlainDate.from(on).toZonedDateTime({ timeZone }).epochMilliseconds);

/** A day moved by whole calendar days. */
export const addDays = (on: Day, days: number): Day => Temporal.PlainDate.from(on).add({ days }).toString();

/** A day moved by whole calendar months; 31 January plus one month is the last of February. */
export const addMonths = (on: Day, months: number): Day => Temporal.PlainDate.from(on).add({ months }).toString();

/** Whole days from `from` to `to`; negative when `to` is earlier. */
export const daysBetween = (from: Day, to: Day): number => Temporal.PlainDate.from(from).until(to, { largestUnit: 'days' }).days;

/** Whether a text is a real calendar day, `2027-02-29` is not. */
export function isDay(text: string): boolean {
  if (!/^\d{4}-\d{2}-\d{2}$/.test(text)) return false;
  try {
    return Temporal.PlainDate.from(text, { overflow: 'reject' }).toString() === text;
  } catch {
    return false;
  }
}

export const addMinutes = (at: Date, minutes: number): Date => new Date(at.getTime() + minutes * 60_000);
export const minutesBetween = (from: Date, to: Date): number => (to.getTime() - from.getTime()) / 60_000;

const format = (at: Date, { locale }: Pick<ClubTime, 'locale'>, options: Intl.DateTimeFormatOptions) =>
  new Intl.DateTimeFormat(locale, options).formatToParts(at);

const LONG = { weekday: 'long', day: 'numeric', month: 'long', year: 'numeric' } as const;
const SHORT = { day: 'numeric', month: 'short', year: 'numeric' } as const;
const DAY_STYLES = { long: LONG, short: SHORT, bare: { day: 'numeric', month: 'long' } as const, weekday: { weekday: 'long' } as const };

/** How a day is written: `long` Saturday 15 May 2027, `short` 15 May 2027 (month abbreviated), `bare` 15 May, `weekday` Saturday. */
export type DayStyle = keyof typeof DAY_STYLES;

/** A calendar day as the club writes it: day before month in every locale, since the printed matter does so. */
export function formatDay(on: Day, club: Pick<ClubTime, 'locale'>, style: DayStyle = 'long'): string {
  const parts = format(new Date(`${on}T12:00:00Z`), club, { ...DAY_STYLES[style], timeZone: 'UTC' });
  const part = (type: Intl.DateTimeFormatPartTypes) => parts.find((each) => each.type === type)?.value;
  return [part('weekday'), part('day'), part('month'), part('year')].filter((each) => each !== undefined).join(' ');
}

/** An instant's time in the club's zone: `11:30`, or `11:30 am` for a 12-hour club. */
export function formatTime(at: Date, { timeZone, locale, hourCycle }: ClubTime): string {
  const hour = hourCycle === 'h12' ? 'numeric' : '2-digit';
  const parts = format(at, { locale }, { hour, minute: '2-digit', hourCycle, timeZone });
  return parts.map((part) => (part.type === 'dayPeriod' ? part.value.toLowerCase().replaceAll('.', '') : part.value)).join('').replace(/\u202f/g, ' ');
}

/** An instant as day and time: `Saturday 15 May 2027, 11:30`. */
export const formatInstant = (at: Date, club: ClubTime, style: DayStyle = 'long'): string =>
  `${formatDay(dayOf(at, club.timeZone), club, style)}, ${formatTime(at, club)}`;
