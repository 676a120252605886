import type { BoardView } from '../views';
import { journeyInWords, type DayLine } from './day-line';

/** One party's day as a drawing: x as a share of the board's columns, y in px. */
export type Graph = {
  height: number;
  ys: number[];
  hours: { x: number; text: string }[];
  quarters: number[];
  stays: { y: number; arrives: number; leaves: number; arrivesText: string; leavesText: string; isLate: boolean }[];
  ways: { y1: number; y2: number; leaves: number; arrives: number; starts: number; words: string; isLate: boolean }[];
};

const FIRST_Y = 62;
const FOOT = 54;
/** Gardens down are spaced by travel minutes, between what its words need and what a page can give. */
const spaceFor = (minutes: number) => Math.min(180, 92 + minutes * 4);
/** Past this share of the scale words stand to the left of what they name. */
const LATE = 0.48;

/** The scale across: the first start under the middle of the first column, the last under that of the last. */
function scaleOf({ columns }: BoardView): (minute: number) => number {
  const [first, last] = [columns[0]?.opens ?? 0, columns.at(-1)?.opens ?? 0];
  const half = 0.5 / Math.max(1, columns.length);
  const span = last - first || 120; // one single start: two hours fill the measure
  const width = last === first ? 1 - 2 * half || 0.5 : 1 - 2 * half;
  return (minute) => half + ((minute - first) / span) * width;
}

/** Draws a party's day on the board's own scale. */
export function graphOf(board: BoardView, { stays, journeys }: DayLine): Graph {
  const x = scaleOf(board);
  const within = (minute: number) => Math.min(1, Math.max(0, x(minute)));
  const ys = stays.map((_, index) => FIRST_Y + journeys.slice(0, index).reduce((sum, journey) => sum + spaceFor(journey.minutes), 0));
  const hours = board.hours.map((hour) => ({ x: x(hour.opens), text: hour.text })).filter((hour) => hour.x <= 1);
  return {
    ys,
    hours,
    quarters: board.hours.flatMap((hour) => [15, 30, 45].map((minutes) => x(hour.opens + minutes))).filter((share) => share <= 1),
    height: (ys.at(-1) ?? FIRST_Y) + FOOT,
    stays: stays.map((stay, index) => ({
      y: ys[index] ?? 0, arrives: within(stay.opens), leaves: within(stay.leaves), arrivesText: stay.arrivesText, leavesText: stay.leavesText, isLate: x(stay.leaves) > 0.88,
    })),
    ways: journeys.flatMap((journey, index) => {
      const [from, to] = [stays[index], stays[index + 1]];
      if (!from || !to) return [];
      const arrives = from.leaves + journey.minutes;
      return [{ y1: ys[index] ?? 0, y2: ys[index + 1] ?? 0, leaves: within(from.leaves), arrives: within(arrives), starts: within(to.opens), words: journeyInWords(journey), isLate: x(arrives) > LATE }];
    }),
  };
}
