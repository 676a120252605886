import { addMinutes, formatDay, formatTime, wallTime, type ClubTime } from '@/lib/core/time';
import type { Id } from '@/lib/core/ids';
import { cautionsOf, type Hazards } from '@/lib/gardens/rules/cautions';
import { powersInWords, scaleInWords } from '@/lib/gardens/rules/particulars';
import { toFlowersOf, type FlowerView, type PlantRow } from '@/lib/gardens/views';
import { figuresSentence, phaseOf, whenAndWhere, type DayFigures, type DayPhase } from './rules/day-words';
import { priceSentence, type PersonPrices } from './rules/prices';
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
};
export type EntryFacts = { entryTimeId: Id<'entryTime'>; stopId: Id<'stop'>; opensAt: Date; graceUntil: Date; closedAt: Date | null; stopClosedAt: Date | null; places: number };
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

/** What a visit costs: a stop's own prices over the day's; `null` gives the day's. */
export function pricesOf(facts: readonly PriceFacts[], stopId: Id<'stop'> | null): PersonPrices {
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
      places: Math.max(0, entry.places), isOver: isOver(entry, entry.stopClosedAt, now),
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
export function toPlacesLeft(entries: readonly Pick<EntryFacts, 'entryTimeId' | 'graceUntil' | 'closedAt' | 'stopClosedAt' | 'places'>[], now: Date): PlacesLeft {
  return { places: Object.fromEntries(entries.map((entry) => [entry.entryTimeId, isOver(entry, entry.stopClosedAt, now) ? null : Math.max(0, entry.places)])) };
}

/** An open day as the database gives it to a list. */
export type OpenDayFacts = {
  id: Id<'openDay'>; slug: string; title: string; placeLine: string; howToCome: string | null; heldOn: string; opensAt: Date; closesAt: Date;
  calledOffAt: Date | null; calledOffNote: string | null; gardens: number; figures: DayFigures;
};
/** An open day in the list of them. */
export type OpenDayLine = { slug: string; title: string; line: string; sums: string; phase: DayPhase; note: string | null };

/** Sets one line of the list of open days. */
export const toOpenDayLine = (day: OpenDayFacts, club: ClubTime, now: Date): OpenDayLine => ({
  slug: day.slug, title: day.title, line: whenAndWhere(day, club), sums: figuresSentence(day.figures, phaseOf(day, now), club.locale), phase: phaseOf(day, now), note: day.calledOffNote,
});

/** A stop with what its garden is, for the board, the map, the margin and the cautions. */
export type OpenDayStop = Omit<StopFacts, 'subtitle' | 'isSteam' | 'hasWater'> & Hazards & { scaleOneTo: number; areaKey: string; areaName: string; plants: PlantRow[] };
export type OpenDayRow = OpenDayFacts & { partyPeopleMax: number | null; stops: OpenDayStop[]; prices: PriceFacts[]; minutes: MinutesFact[] };

/** Everything the page of an open day shows. Plain JSON. */
export type OpenDayPage = OpenDayLine & {
  caption: string;
  howToCome: string | null;
  board: BoardView;
  gardens: { number: number; slug: string; name: string; areaKey: string; areaName: string }[];
  flowers: FlowerView[];
  cautions: { sentence: string; gardens: number[] }[];
};

/** What can hurt someone on the day, each thing once, with the numbers of its gardens. Steps and hosts' own words stand on the garden's page. */
function cautionsOfDay(stops: readonly OpenDayStop[]): OpenDayPage['cautions'] {
  const found = new Map<string, number[]>();
  for (const stop of stops)
    for (const sentence of cautionsOf({ ...stop, isStepFree: true, stepsNote: null, cautions: [] })) found.set(sentence, [...(found.get(sentence) ?? []), stop.number]);
  return [...found].map(([sentence, gardens]) => ({ sentence, gardens }));
}

/** Sets the page of an open day. */
export function toOpenDayPage(day: OpenDayRow, entries: EntryFacts[], club: BoardClub, now: Date): OpenDayPage {
  const stops = day.stops.map((stop) => ({
    stopId: stop.stopId, gardenId: stop.gardenId, number: stop.number, slug: stop.slug, name: stop.name, shortName: stop.shortName, stayMinutes: stop.stayMinutes,
    subtitle: `${scaleInWords(stop.scaleOneTo)}, ${powersInWords(stop.powers.slice(0, 1))}`, isSteam: stop.powers.includes('live-steam'), isStepFree: stop.isStepFree, hasWater: stop.water !== 'none',
  }));
  const board = toBoard({ openDayId: day.id, stops, entries, prices: day.prices, minutes: day.minutes, partyPeopleMax: day.partyPeopleMax }, club, now);
  const line = toOpenDayLine(day, club, now);
  return {
    ...line,
    sums: line.phase === 'coming' ? `${line.sums} ${priceSentence(board.prices, board.stops.map((stop) => stop.prices), club)}` : line.sums,
    caption: `Places left at each garden and entry time on ${formatDay(day.heldOn, club)}`,
    howToCome: day.howToCome, board,
    gardens: day.stops.map(({ number, slug, name, areaKey, areaName }) => ({ number, slug, name, areaKey, areaName })),
    flowers: toFlowersOf(day.stops, day.heldOn, Math.max(2, Math.min(5, Math.ceil(day.stops.length / 2)))), // as many as stand beside the board
    cautions: cautionsOfDay(day.stops),
  };
}

/** What a browser keeps at an open day: until when, and heads by entry time. It may choose those again, for a new hold gives the old back. */
export type OwnKept = { keptUntil: string; heads: Record<string, number> };
