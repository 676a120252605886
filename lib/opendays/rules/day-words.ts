import { formatDay, formatTime, type ClubTime } from '@/lib/core/time';
import { counted, inWords, inWordsFirst } from './words';

/** How many places, parties and people an open day has. Places set aside for walk-ups are not counted. */
export type DayFigures = { places: number; taken: number; parties: number; people: number };

/** Where an open day stands: `past` once its gates are shut. */
export type DayPhase = 'coming' | 'past' | 'called-off';

type DayHours = { heldOn: string; opensAt: Date; closesAt: Date; placeLine: string; gardens: number };

/** Where an open day stands at a moment. Called off stays called off. */
export const phaseOf = (day: { closesAt: Date; calledOffAt: Date | null }, now: Date): DayPhase =>
  day.calledOffAt !== null ? 'called-off' : now >= day.closesAt ? 'past' : 'coming';

/** The italic line of the bill: "Saturday 15 May 2027, seven gardens in and around Alder Fork, from 10:00 until 16:00". */
export function whenAndWhere({ heldOn, opensAt, closesAt, placeLine, gardens }: DayHours, club: ClubTime): string {
  const count = gardens === 0 ? '' : `${inWords(gardens)} ${gardens === 1 ? 'garden' : 'gardens'} `;
  return `${formatDay(heldOn, club)}, ${count}${placeLine}, from ${formatTime(opensAt, club)} until ${formatTime(closesAt, club)}`;
}

/** The figures inside a sentence: "200 of 640 places are taken, by 69 parties." */
export function figuresSentence({ places, taken, parties, people }: DayFigures, phase: DayPhase, locale: string): string {
  const figure = (count: number) => new Intl.NumberFormat(locale).format(count);
  if (places === 0) return phase === 'past' ? 'No places were given out.' : 'Its times are not set yet.';
  const by = parties === 0 ? '' : `, by ${parties === 1 ? '1 party' : `${figure(parties)} parties`}`;
  if (phase === 'past') return `${figure(taken)} of ${figure(places)} places were taken${by}${people === 0 ? '' : `, ${people === 1 ? '1 person' : `${figure(people)} people`}`}.`;
  if (taken === 0) return `All ${counted(places, 'place is', 'places are')} still to be had.`;
  if (taken >= places) return `All ${figure(places)} places are taken${by}.`;
  return `${figure(taken)} of ${figure(places)} places are taken${by}.`;
}

/** The italic line over the list of days: "Two days to come, and one that was". */
export function daysInWords(coming: number, past: number): string {
  const days = (count: number) => `${inWords(count)} ${count === 1 ? 'day' : 'days'}`;
  const first = coming === 0 ? 'No day is set yet' : `${inWordsFirst(coming)} ${coming === 1 ? 'day' : 'days'} to come`;
  return past === 0 ? first : `${first}, and ${days(past)} that ${past === 1 ? 'was' : 'were'}`;
}
