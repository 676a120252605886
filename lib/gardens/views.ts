import type { Id } from '@/lib/core/ids';
import { formatDay, formatTime, type ClubTime } from '@/lib/core/time';
import { POWERS } from '@/lib/core/words';
import { counted, inWordsFirst } from '@/lib/opendays/rules/words';
import { bloomBars, bloomInWords, inFlower, isJustOpen, type BloomBar } from './rules/bloom';
import { cautionsOf } from './rules/cautions';
import { fits, isNarrowed, powersOf, scalesOf } from './rules/filters';
import { accessFacts, drawingInWords, oneLine, railwayFacts, trackSentence, type Fact, type Particulars } from './rules/particulars';
import { lengthSystemOf, shortLength, type LengthSystem } from './rules/particulars-lengths';
import { captionOf } from './rules/plate/caption';
import type { PlateParticulars } from './rules/plate/compose';
import { seedOf } from './rules/plate/cut';
import { cardOf } from './rules/plate/plate';
import type { GardenFilters } from './schema';

/** A plant of a garden as the database gives it. */
export type PlantRow = { key: string; commonName: string; colour: string; drawing: string; bloomMonths: number[]; isEvergreen: boolean; heightMm: number };

/** A garden as public queries give it: nothing here tells where it is but its neighbourhood. */
export type GardenRow = Particulars & {
  slug: string;
  railwayName: string;
  shortName: string;
  subtitle: string;
  about: string | null;
  hostsShownAs: string | null;
  powers: PlateParticulars['powers'][number][];
  bridge: PlateParticulars['bridge'];
  water: PlateParticulars['water'];
  waterNote: string | null;
  cautions: string[];
  plate: { stock?: string[]; joke?: string; sky?: string };
  areaKey: string;
  areaName: string;
  areaCaption: string;
  plants: PlantRow[];
};

/** One time at a stop, as a garden's own page lists it. */
export type TimeRow = { entryTimeId: Id<'entryTime'>; opensAt: Date; places: number; isOver: boolean };
/** The next open day in which a garden takes part. */
export type NextDayRow = {
  slug: string;
  title: string;
  heldOn: string;
  calledOffNote: string | null;
  isCalledOff: boolean;
  number: number;
  capacity: number;
  taken: number;
  from: { shortName: string; number: number; minutes: number } | null;
  times: TimeRow[];
};

export type PlateView = { href: string; alt: string; caption: string };
export type PlantView = { key: string; name: string; note: string; bars: BloomBar[]; isEvergreen: boolean; words: string };
/** A plant in flower, as the margin draws it; `gardens` by number, empty on a garden's own page. */
export type FlowerView = { plantKey: string; name: string; gardens: number[] };

const plateParts = (garden: GardenRow): PlateParticulars => ({
  slug: garden.slug, scaleOneTo: garden.scaleOneTo, powers: garden.powers, bridge: garden.bridge, water: garden.water, plants: garden.plants, notes: garden.plate,
});

/** What the plate's own address draws from. */
export const toPlateParticulars = plateParts;

/** A garden's plate: where it is served, what it shows, and the line under it. The version changes when a particular does. */
export function toPlate(garden: GardenRow, number: number): PlateView {
  const parts = plateParts(garden);
  const version = seedOf(JSON.stringify(parts)).toString(36);
  return {
    href: `/gardens/${garden.slug}/plate?card=${cardOf(number, garden.slug)}&v=${version}`,
    alt: `Linocut of ${garden.railwayName}`, // what it shows stands in its caption
    caption: captionOf(parts),
  };
}

const lowerFirst = (words: string): string => words.charAt(0).toLowerCase() + words.slice(1);

/** The plants of one garden that flower on a day, no drawing twice. */
export function toFlowers(plants: readonly PlantRow[], on: string, most: number): FlowerView[] {
  const distinct = inFlower(plants, on).filter((plant, i, all) => all.findIndex((other) => other.drawing === plant.drawing) === i);
  return distinct.slice(0, most).map((plant) => ({ plantKey: plant.drawing, name: `${lowerFirst(plant.commonName)}${isJustOpen(plant, on) ? ', just open' : ''}`, gardens: [] }));
}

/** What flowers on a day in any of several gardens, the most widely grown first, with the gardens' numbers. */
export function toFlowersOf(gardens: readonly { number: number; plants: readonly PlantRow[] }[], on: string, most: number): FlowerView[] {
  const found = new Map<string, FlowerView>();
  for (const { number, plants } of gardens)
    for (const plant of inFlower(plants, on)) {
      const known = found.get(plant.key);
      if (!known) found.set(plant.key, { plantKey: plant.drawing, name: lowerFirst(plant.commonName), gardens: [number] });
      else if (!known.gardens.includes(number)) known.gardens.push(number);
    }
  return [...found.values()].sort((a, b) => b.gardens.length - a.gardens.length || a.name.localeCompare(b.name)).slice(0, most);
}

const toPlant = (plant: PlantRow, system: LengthSystem): PlantView => ({
  key: `${plant.key}-${plant.heightMm}`,
  name: plant.commonName,
  note: `${plant.isEvergreen && plant.bloomMonths.length === 0 ? 'evergreen' : plant.colour}, ${shortLength(plant.heightMm, system)}`,
  bars: bloomBars(plant.bloomMonths),
  isEvergreen: plant.isEvergreen,
  words: plant.bloomMonths.length === 0 ? (plant.isEvergreen ? 'green all year' : 'no flower') : bloomInWords(plant.bloomMonths),
});

export type TimeView = { entryTimeId: Id<'entryTime'>; text: string; spoken: string; kind: 'open' | 'few' | 'full' | 'over'; places: number; href: string };
export type TimesView = { title: string; dayTitle: string; href: string; heldOn: string; isCalledOff: boolean; note: string | null; times: TimeView[] };

function toTime(time: TimeRow, day: NextDayRow, club: ClubTime): TimeView {
  const text = formatTime(time.opensAt, club);
  const kind = time.isOver ? 'over' : time.places <= 0 ? 'full' : time.places <= 5 ? 'few' : 'open';
  return {
    entryTimeId: time.entryTimeId, text, kind, places: Math.max(0, time.places), href: `/open-days/${day.slug}?with=${time.entryTimeId}`,
    spoken: kind === 'over' ? `${text}, over` : kind === 'full' ? `${text}, full` : `Choose ${text}, ${counted(time.places, 'place', 'places')} left`,
  };
}

const toTimes = (day: NextDayRow, club: ClubTime): TimesView => ({
  title: `Times on ${formatDay(day.heldOn, club, 'bare')}`, dayTitle: day.title, href: `/open-days/${day.slug}`, heldOn: day.heldOn,
  isCalledOff: day.isCalledOff, note: day.calledOffNote, times: day.times.map((time) => toTime(time, day, club)),
});

/** Which of the fourteen cards a number has; the fifteenth garden begins again. */
export const cardNumber = (number: number): number => ((number - 1) % 14) + 1;

/** Everything a garden's page shows. Plain JSON. */
export type GardenPage = {
  name: string; line: string; sums: string; number: number; card: number; about: string | null; hosts: string | null; plate: PlateView; drawing: { particulars: Particulars; system: LengthSystem; words: string };
  railway: Fact[]; access: Fact[]; planting: { on: string; title: string; plants: PlantView[]; dayText: string }; flowers: FlowerView[]; cautions: string[];
  whereabouts: { areaKey: string; areaName: string; caption: string }; times: TimesView | null;
};

/** Sets a garden's page. `today` is the day in view when the garden takes part in no coming open day. */
export function toGardenPage(garden: GardenRow & { restNumber: number }, day: NextDayRow | null, today: string, club: ClubTime & { addressReleaseHours: number }): GardenPage {
  const system = lengthSystemOf(club.locale);
  const on = day?.heldOn ?? today;
  const number = day?.number ?? garden.restNumber;
  const places = day && !day.isCalledOff && day.capacity > 0 ? `; ${day.taken} of ${counted(day.capacity, 'place is', 'places are')} taken` : '';
  const travel: Fact[] = day?.from ? [{ label: `from ${day.from.shortName}, garden ${day.from.number}`, words: `${day.from.minutes} minutes by car` }] : [];
  const released = club.addressReleaseHours % 24 === 0 ? counted(club.addressReleaseHours / 24, 'day', 'days') : counted(club.addressReleaseHours, 'hour', 'hours');
  return {
    name: garden.railwayName, number, card: cardNumber(number), about: garden.about, hosts: garden.hostsShownAs,
    line: day ? `Garden ${day.number} on ${formatDay(day.heldOn, club)}, ${lowerFirst(garden.subtitle)}` : `${garden.subtitle.charAt(0).toUpperCase()}${garden.subtitle.slice(1)}`,
    sums: `${trackSentence(garden, system)} ${garden.headsLimit} people are comfortable here at once${places}.`,
    plate: toPlate(garden, number),
    drawing: { particulars: garden, system, words: drawingInWords(garden, system) },
    railway: [...railwayFacts(garden), ...travel],
    access: accessFacts(garden, system),
    planting: { on, title: `${inFlower(garden.plants, on).length > 0 ? 'In flower' : 'Growing'} on ${formatDay(on, club, 'bare')}`, plants: garden.plants.map((plant) => toPlant(plant, system)), dayText: formatDay(on, club, 'bare') },
    flowers: toFlowers(garden.plants, on, 4),
    cautions: cautionsOf(garden),
    whereabouts: { areaKey: garden.areaKey, areaName: garden.areaName, caption: `${garden.areaCaption} The address comes with your tickets, from ${released} before.` },
    times: day ? toTimes(day, club) : null,
  };
}

/** A garden in the index. `number` is its stop's; null when it takes no part in the day in view. */
export type ListedRow = Pick<GardenRow, keyof GardenRow> & { number: number | null; placesLeft: number | null; allPlaces: number };
export type ListedGarden = {
  slug: string; href: string; name: string; number: number; card: number; takesPart: boolean; line: string; subtitle: string; area: string; areaKey: string; plate: PlateView;
  isSteam: boolean; isStepFree: boolean; hasWater: boolean; places: string | null;
};

/** Sets the index. Gardens that take part keep their stop's number; the others are numbered on after them, by name. */
export function toListed(rows: readonly ListedRow[], club: ClubTime): ListedGarden[] {
  const system = lengthSystemOf(club.locale);
  const last = Math.max(0, ...rows.map((row) => row.number ?? 0));
  const resting = rows.filter((row) => row.number === null);
  return rows.map((row) => {
    const number = row.number ?? last + 1 + resting.indexOf(row);
    return {
      slug: row.slug, href: `/gardens/${row.slug}`, name: row.railwayName, number, card: cardNumber(number), takesPart: row.number !== null, subtitle: row.subtitle, area: row.areaName, areaKey: row.areaKey,
      line: oneLine(row, system), plate: toPlate(row, number), isSteam: row.powers.includes('live-steam'), isStepFree: row.isStepFree, hasWater: row.water !== 'none',
      places: row.placesLeft === null ? null : row.allPlaces === 0 ? 'full' : `${counted(row.allPlaces, 'place', 'places')} left`,
    };
  });
}


/** A coming open day as far as the public pages list it. */
export type DayRow = { slug: string; title: string; heldOn: string };
export type GardensPage = {
  name: string; line: string; sums: string; platesTitle: string; shown: ListedGarden[]; flowers: FlowerView[]; isNarrowed: boolean;
  choices: { scales: number[]; powers: string[]; days: { slug: string; words: string }[] };
};

/** Sets the gardens page: which gardens the filters leave, and the sentences of its bill. */
export function toGardensPage(rows: readonly ListedRow[], days: readonly DayRow[], filters: GardenFilters, today: string, club: ClubTime): GardensPage {
  const all = toListed(rows, club);
  const left = rows.flatMap((row, i) => (fits(row, filters) ? [{ row, listed: all[i] }] : []));
  const shown = left.flatMap(({ listed }) => (listed ? [listed] : []));
  const day = days.find(({ slug }) => slug === filters.day) ?? days[0];
  const on = day?.heldOn ?? today;
  const taking = rows.filter((row) => row.number !== null).length;
  const narrowed = isNarrowed(filters);
  return {
    name: rows.length === 1 ? 'One garden' : `${inWordsFirst(rows.length)} gardens`,
    line: 'Small railways in real gardens, and the people who water them',
    sums: `${day ? `${inWordsFirst(taking)} of them ${taking === 1 ? 'opens' : 'open'} on ${formatDay(day.heldOn, club)}, with ${counted(rows.reduce((sum, row) => sum + row.allPlaces, 0), 'place', 'places')} left.` : 'No open day is announced just now.'}${narrowed ? ` ${inWordsFirst(shown.length)} of ${rows.length} shown.` : ''}`,
    platesTitle: shown.length === 1 ? 'One block' : `${inWordsFirst(shown.length)} blocks`, shown, isNarrowed: narrowed,
    flowers: toFlowersOf(left.flatMap(({ row, listed }) => (listed ? [{ number: listed.number, plants: row.plants }] : [])), on, 4),
    choices: {
      scales: scalesOf(rows), powers: powersOf(rows, POWERS),
      days: days.map(({ slug, title, heldOn }) => ({ slug, words: `${title}, ${formatDay(heldOn, club, 'bare')}` })),
    },
  };
}
