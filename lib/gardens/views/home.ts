import { formatDay, formatTime, type ClubTime } from '@/lib/core/time';
import { whenAndWhere } from '@/lib/opendays/rules/day-words';
import { priceSentence } from '@/lib/opendays/rules/prices';
import { counted, inWords, inWordsFirst } from '@/lib/opendays/rules/words';
import { pricesOf, type PriceFacts } from '@/lib/opendays/views';
import { toFlowersOf, toListed, type FlowerView, type ListedGarden, type ListedRow } from '../views';

/** A coming open day as the home page is given it. */
export type HomeDayRow = {
  slug: string; title: string; placeLine: string; howToCome: string | null; heldOn: string; opensAt: Date; closesAt: Date; isCalledOff: boolean; calledOffNote: string | null;
  prices: readonly PriceFacts[];
};

/** Everything the home page shows. `day` is null when none is announced. Plain JSON. */
export type HomePage = {
  name: string; line: string; sums: string;
  day: { href: string; isCalledOff: boolean; note: string | null; lines: { label: string; words: string }[]; buttonWords: string } | null;
  first: ListedGarden | null;
  gardens: ListedGarden[]; gardensTitle: string; gardensSentence: string;
  later: { href: string; title: string; words: string }[];
  flowers: FlowerView[];
};

type HomeClub = ClubTime & { name: string; currency: string; addressReleaseHours: number };

function sumsOf(day: HomeDayRow, places: number, later: number): string {
  if (day.isCalledOff) return later === 0 ? 'Called off.' : `Called off. ${later === 1 ? 'The day after it stands' : 'The days after it stand'} below.`;
  return places === 0 ? 'No places are left to book. Some are given back; look again.' : `${counted(places, 'place is', 'places are')} still to be had. Book before you set out: each garden lets in only as many as it can carry.`;
}

const release = (hours: number): string => (hours % 24 === 0 ? counted(hours / 24, 'day', 'days') : counted(hours, 'hour', 'hours'));

const linesOf = (day: HomeDayRow, taking: number, club: HomeClub): { label: string; words: string }[] => [
  { label: 'what', words: `${inWordsFirst(taking)} private ${taking === 1 ? 'garden' : 'gardens'} with a railway in ${taking === 1 ? 'it' : 'each'}, trains running, hosts about.` },
  { label: 'when', words: `${formatDay(day.heldOn, club)}, from ${formatTime(day.opensAt, club)} until ${formatTime(day.closesAt, club)}. You choose a time at each garden.` },
  { label: 'where', words: `${day.placeLine.charAt(0).toUpperCase()}${day.placeLine.slice(1)}. Gardens are homes: the addresses come with your tickets, ${release(club.addressReleaseHours)} before.` },
  { label: 'for', words: priceSentence(pricesOf(day.prices, null), [...new Set(day.prices.flatMap(({ stopId }) => stopId ?? []))].map((stopId) => pricesOf(day.prices, stopId)), club) },
  ...(day.howToCome ? [{ label: 'how to come', words: day.howToCome }] : []),
];

/** Sets the home page as a handbill of the next open day; the later days stand below it. */
export function toHomePage(days: readonly HomeDayRow[], rows: readonly ListedRow[], today: string, club: HomeClub): HomePage {
  const day = days[0] ?? null;
  const all = toListed(rows, club);
  const taking = all.filter(({ takesPart }) => takesPart);
  const gardens = day ? taking : all;
  const numbered = all.flatMap((listed, i) => { const row = rows[i]; return row && gardens.includes(listed) ? [{ number: listed.number, plants: row.plants }] : []; });
  const places = rows.reduce((sum, row) => sum + row.allPlaces, 0);
  return {
    name: day?.title ?? 'No open day just now',
    line: day ? whenAndWhere({ ...day, gardens: taking.length }, club) : `${formatDay(today, club)}: the gardens are growing, and so are the timetables`,
    sums: day ? sumsOf(day, places, days.length - 1) : `${inWordsFirst(all.length)} ${all.length === 1 ? 'garden belongs' : 'gardens belong'} to the club.`,
    day: day ? { href: `/open-days/${day.slug}`, isCalledOff: day.isCalledOff, note: day.calledOffNote, lines: linesOf(day, taking.length, club), buttonWords: 'Choose gardens and times' } : null,
    first: firstOf(taking, day?.heldOn ?? today),
    gardens, gardensTitle: gardens.length === 1 ? 'The garden' : `${inWordsFirst(gardens.length)} gardens`,
    gardensSentence: day ? `Each plate is cut from what the host told us; one thing in each is life-sized.` : `None of the ${inWords(all.length)} is open to visitors today. Their plates are.`,
    later: days.slice(1).map((later) => ({
      href: `/open-days/${later.slug}`, title: later.title,
      words: later.isCalledOff ? `${formatDay(later.heldOn, club)}: called off` : `${formatDay(later.heldOn, club)}, ${later.placeLine}, from ${formatTime(later.opensAt, club)} until ${formatTime(later.closesAt, club)}`,
    })),
    flowers: toFlowersOf(numbered, day?.heldOn ?? today, 5),
  };
}

/** The garden whose plate stands largest: another for each open day, the same all the time that day is announced. */
function firstOf(gardens: readonly ListedGarden[], heldOn: string): ListedGarden | null {
  const turn = [...heldOn].reduce((sum, character) => sum * 31 + character.charCodeAt(0), 7) >>> 0;
  return gardens[turn % Math.max(1, gardens.length)] ?? null;
}
