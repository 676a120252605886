import { asId } from '@/lib/core/ids';
import { instantOf } from '@/lib/core/time';
import { toBoard, type BoardClub, type BoardFacts, type BoardView, type StopFacts } from '@/lib/opendays/views';

/** An invented open day for rules and screens: seven gardens, eight starts, 45 minutes apart. */

const uuid = (kind: number, number: number) => `0000000${kind}-0000-4000-8000-${String(number).padStart(12, '0')}`;
export const entryIdAt = (row: number, time: string) => asId<'entryTime'>(uuid(3, row * 10_000 + Number(time.replace(':', ''))));
export const stopIdAt = (row: number) => asId<'stop'>(uuid(1, row));
const gardenIdAt = (row: number) => asId<'garden'>(uuid(2, row));

export const boardClub: BoardClub = {
  timeZone: 'America/New_York', locale: 'en-US', hourCycle: 'h23', currency: 'USD',
  partyPeopleMax: 9, partyVisitsMax: 7, babesTakePlace: false, holdMinutes: 10,
};

const GARDENS: [string, string, string, string][] = [
  ['Saltmarsh & Plover', 'Saltmarsh', '1:20.3, battery railcars', 'wp'],
  ['Mossgill Quarry Tramway', 'Mossgill', '1:13.7, quarry engines', 's'],
  ['Pine Barrow Light Railway', 'Pine Barrow', '1:22.5, narrow gauge', 'swp'],
  ['Thistledown Junction', 'Thistledown', '1:29, track power, 640 ft', 'w'],
  ['Copperkettle & Western', 'Copperkettle', '1:20.3, logging', 'sp'],
  ['Tansy Bank & Dunlin', 'Tansy Bank', '1:24, railbus and herbs', 'w'],
  ['Old Orchard Line', 'Old Orchard', '1:32, orchard branch', 's'],
];

const MINUTES = [
  [0, 5, 10, 15, 20, 15, 10],
  [5, 0, 10, 10, 15, 15, 15],
  [10, 10, 0, 5, 10, 10, 10],
  [15, 10, 5, 0, 10, 15, 15],
  [20, 15, 10, 10, 0, 10, 15],
  [15, 15, 10, 15, 10, 0, 10],
  [10, 15, 10, 15, 15, 10, 0],
];

export const STARTS = ['10:00', '10:45', '11:30', '12:15', '13:00', '13:45', '14:30', '15:15'];

const PLACES: (number | null)[][] = [
  [14, 12, 10, 9, 8, 12, 9, 11],
  [6, 7, 9, 3, 7, 8, 4, 12],
  [8, 9, 6, 0, 5, 7, 8, 9],
  [12, 14, 9, 16, 1, 15, 20, 17],
  [9, 8, 4, 4, 2, 5, 14, 12],
  [7, 4, 6, 0, 4, 8, 6, 6],
  [null, null, 5, 3, 6, 9, 4, 0],
];

const stopAt = (row: number): StopFacts => {
  const [name, shortName, subtitle, notes] = GARDENS[row % GARDENS.length] ?? ['', '', '', ''];
  return {
    stopId: stopIdAt(row), gardenId: gardenIdAt(row), number: row + 1, slug: `garden-${row + 1}`, name, shortName, subtitle,
    stayMinutes: 35, isSteam: notes.includes('s'), isStepFree: notes.includes('w'), hasWater: notes.includes('p'),
  };
};

type Day = { on?: string; gardens?: number; starts?: readonly string[]; placesAt?: (row: number, column: number) => number | null };

/** What the database would give for such a day. */
export function boardFacts({ on = '2027-05-15', gardens = 7, starts = STARTS, placesAt = (row, column) => PLACES[row]?.[column] ?? null }: Day = {}): BoardFacts {
  const rows = Array.from({ length: gardens }, (_, row) => row);
  return {
    openDayId: asId<'openDay'>(uuid(4, 1)),
    stops: rows.map(stopAt),
    entries: rows.flatMap((row) => starts.flatMap((time, column) => {
      const places = placesAt(row, column);
      const opensAt = instantOf(on, time, boardClub.timeZone);
      return places === null ? [] : [{ entryTimeId: entryIdAt(row, time), stopId: stopIdAt(row), opensAt, graceUntil: new Date(opensAt.getTime() + 20 * 60_000), closedAt: null, stopClosedAt: null, places }];
    })),
    prices: [{ stopId: null, kind: 'adult', amountMinor: 800 }, { stopId: null, kind: 'child', amountMinor: 400 }, { stopId: null, kind: 'babe', amountMinor: 0 }],
    minutes: rows.flatMap((from) => rows.map((to) => ({ fromGardenId: gardenIdAt(from), toGardenId: gardenIdAt(to), minutes: MINUTES[from % 7]?.[to % 7] ?? 15 }))),
    partyPeopleMax: null,
  };
}

/** A moment long before the invented day. */
export const longBefore = new Date('2027-04-01T12:00:00Z');

/** The board of the invented day. */
export const aBoard = (day: Day = {}, now = longBefore, club = boardClub): BoardView => toBoard(boardFacts(day), club, now);
