import { addMinutes, formatTime, wallTime, type ClubTime } from '@/lib/core/time';
import type { Id } from '@/lib/core/ids';
import type { PersonPrices } from './rules/prices';
import { minutesFor, minutesTable, type MinutesFact } from './rules/reach';

/** The lettered notes of the board: live steam, step-free all the way round, a pond or pool. */
export type NoteLetter = 's' | 'w' | 'p';

/** One garden's row on the time board. */
export type BoardStop = {
  stopId: Id<'stop'>;
  number: number; // its card colour and its nip too
  slug: string;
  name: string;
  shortName: string;
  subtitle: string;
  notes: NoteLetter[];
  stayMinutes: number;
  prices: PersonPrices;
  minutesFromAbove: number | null;
};

/** One entry time on the board. Times carry their own text, so that the browser needs no time zones. */
export type BoardCell = {
  entryTimeId: Id<'entryTime'>;
  row: number;
  column: number;
  opens: number; // whole minutes since the epoch
  opensText: string;
  leavesText: string; // when a stay of the usual length ends
  places: number;
  isOver: boolean; // past its grace, or closed
};

export type BoardColumn = { opens: number; text: string };

/** The time board of one open day: gardens down, the union of their starts across. Plain JSON. */
export type BoardView = {
  openDayId: Id<'openDay'>;
  stops: BoardStop[];
  columns: BoardColumn[];
  hours: BoardColumn[]; // whole clock hours from the first start to the end of the last stay
  rows: (BoardCell | null)[][]; // by stop, then by column; null: no entry at that time
  minutes: number[][];
  prices: PersonPrices;
  currency: string;
  locale: string;
  limits: { people: number; visits: number };
  babesTakePlace: boolean;
  holdMinutes: number;
};

/** A stop as the database gives it. */
export type StopFacts = {
  stopId: Id<'stop'>;
  gardenId: Id<'garden'>;
  number: number;
  slug: string;
  name: string;
  shortName: string;
  subtitle: string;
  stayMinutes: number;
  isSteam: boolean;
  isStepFree: boolean;
  hasWater: boolean;
  closedAt: Date | null;
};
export type EntryFacts = { entryTimeId: Id<'entryTime'>; stopId: Id<'stop'>; opensAt: Date; graceUntil: Date; closedAt: Date | null; places: number };
export type PriceFacts = { stopId: Id<'stop'> | null; kind: 'adult' | 'child' | 'babe'; amountMinor: number };

export type BoardFacts = {
  openDayId: Id<'openDay'>;
  stops: StopFacts[];
  entries: EntryFacts[];
  prices: PriceFacts[];
  minutes: MinutesFact[];
  partyPeopleMax: number | null;
};

/** What the board needs of the club's settings. */
export type BoardClub = ClubTime & {
  currency: string;
  partyPeopleMax: number;
  partyVisitsMax: number;
  babesTakePlace: boolean;
  holdMinutes: number;
};

const minuteOf = (at: Date) => Math.round(at.getTime() / 60_000);

function pricesOf(facts: PriceFacts[], stopId: Id<'stop'> | null): PersonPrices {
  const priceOf = (kind: PriceFacts['kind']) =>
    (facts.find((each) => each.stopId === stopId && each.kind === kind) ?? facts.find((each) => each.stopId === null && each.kind === kind))?.amountMinor ?? 0;
  return { adultMinor: priceOf('adult'), childMinor: priceOf('child'), babeMinor: priceOf('babe') };
}

function notesOf(stop: StopFacts): NoteLetter[] {
  const notes: [boolean, NoteLetter][] = [[stop.isSteam, 's'], [stop.isStepFree, 'w'], [stop.hasWater, 'p']];
  return notes.flatMap(([isSo, letter]) => (isSo ? [letter] : []));
}

/** An entry time is half-open: [opensAt, graceUntil). Closed, or at a closed stop, it is over too. */
export const isOver = (entry: Pick<EntryFacts, 'closedAt' | 'graceUntil'>, stopClosedAt: Date | null, now: Date): boolean =>
  entry.closedAt !== null || stopClosedAt !== null || now >= entry.graceUntil;

/** The whole clock hours of a day, for the scale of the day graph. */
function hoursOf(facts: BoardFacts, club: ClubTime): BoardColumn[] {
  const starts = facts.entries.map((entry) => entry.opensAt.getTime());
  if (starts.length === 0) return [];
  const first = new Date(Math.min(...starts));
  const last = addMinutes(new Date(Math.max(...starts)), Math.max(0, ...facts.stops.map((stop) => stop.stayMinutes)));
  const toHour = (60 - Number(wallTime(first, club.timeZone).slice(3))) % 60;
  const hours: BoardColumn[] = [];
  for (let at = addMinutes(first, toHour); at <= last; at = addMinutes(at, 60)) hours.push({ opens: minuteOf(at), text: formatTime(at, club) });
  return hours;
}

/** Sets the board of one open day: stops by number, columns the union of starts. */
export function toBoard(facts: BoardFacts, club: BoardClub, now: Date): BoardView {
  const stops = [...facts.stops].sort((a, b) => a.number - b.number);
  const starts = [...new Map(facts.entries.map((entry) => [minuteOf(entry.opensAt), entry.opensAt])).entries()].sort(([a], [b]) => a - b);
  const columns = starts.map(([opens, at]) => ({ opens, text: formatTime(at, club) }));
  const minutes = minutesTable(stops.map((stop) => stop.gardenId), facts.minutes);
  const byPlace = new Map(facts.entries.map((entry) => [`${entry.stopId} ${minuteOf(entry.opensAt)}`, entry]));
  const toCell = (stop: StopFacts, row: number, column: BoardColumn, index: number): BoardCell | null => {
    const entry = byPlace.get(`${stop.stopId} ${column.opens}`);
    if (!entry) return null;
    return {
      entryTimeId: entry.entryTimeId, row, column: index, opens: column.opens, opensText: column.text,
      leavesText: formatTime(addMinutes(entry.opensAt, stop.stayMinutes), club),
      places: Math.max(0, entry.places), isOver: isOver(entry, stop.closedAt, now),
    };
  };
  return {
    openDayId: facts.openDayId,
    stops: stops.map((stop, row) => ({
      stopId: stop.stopId, number: stop.number, slug: stop.slug, name: stop.name, shortName: stop.shortName, subtitle: stop.subtitle,
      notes: notesOf(stop), stayMinutes: stop.stayMinutes, prices: pricesOf(facts.prices, stop.stopId),
      minutesFromAbove: row === 0 ? null : minutesFor(minutes, row - 1, row),
    })),
    columns,
    hours: hoursOf(facts, club),
    rows: stops.map((stop, row) => columns.map((column, index) => toCell(stop, row, column, index))),
    minutes,
    prices: pricesOf(facts.prices, null),
    currency: club.currency,
    locale: club.locale,
    limits: { people: facts.partyPeopleMax ?? club.partyPeopleMax, visits: club.partyVisitsMax },
    babesTakePlace: club.babesTakePlace,
    holdMinutes: club.holdMinutes,
  };
}

/** Places left by entry time, as `/api/board/[openDay]` answers; null: over. */
export type PlacesLeft = { places: Record<string, number | null> };

/** What the board fetches while someone looks: places left by entry time. */
export function toPlacesLeft(entries: (EntryFacts & { stopClosedAt: Date | null })[], now: Date): PlacesLeft {
  return { places: Object.fromEntries(entries.map((entry) => [entry.entryTimeId, isOver(entry, entry.stopClosedAt, now) ? null : Math.max(0, entry.places)])) };
}
