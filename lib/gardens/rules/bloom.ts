import type { Day } from '@/lib/core/time';

/** A plant as far as its flowering goes. Months are 1 to 12. */
export type Blooming = { readonly bloomMonths: readonly number[] };

/** A stretch of flowering months, both ends included. */
export type BloomBar = { readonly from: number; readonly to: number };

/** The month of a day, 1 to 12. */
export const monthOf = (on: Day): number => Number(on.slice(5, 7));

/** The plants that flower in the month of a day, in the order of the list. Hosts give months, not dates. */
export const inFlower = <P extends Blooming>(plants: readonly P[], on: Day): P[] => plants.filter((plant) => plant.bloomMonths.includes(monthOf(on)));

/** Whether this is the first month of a plant's flowering: "the first of the thyme". */
export const isJustOpen = ({ bloomMonths }: Blooming, on: Day): boolean => {
  const month = monthOf(on);
  return bloomMonths.includes(month) && !bloomMonths.includes(month === 1 ? 12 : month - 1);
};

/** The bars of a chart from January to December. A plant that flowers over the new year has one at each end. */
export function bloomBars(bloomMonths: readonly number[]): BloomBar[] {
  const months = [...new Set(bloomMonths)].filter((month) => month >= 1 && month <= 12).sort((a, b) => a - b);
  const bars: { from: number; to: number }[] = [];
  for (const month of months) {
    const last = bars.at(-1);
    if (last && last.to === month - 1) last.to = month;
    else bars.push({ from: month, to: month });
  }
  return bars;
}

/** Where a day stands across a chart of twelve equal months, from 0 to 1: the first of May at four twelfths. */
export function shareOfYear(on: Day): number {
  const [year = 2000, month = 1, day = 1] = on.split('-').map(Number);
  const daysInMonth = new Date(Date.UTC(year, month, 0)).getUTCDate();
  return (month - 1 + (day - 0.5) / daysInMonth) / 12;
}

const MONTHS = ['January', 'February', 'March', 'April', 'May', 'June', 'July', 'August', 'September', 'October', 'November', 'December'];

/** Flowering in words: "May to July", "November to February", "all year"; nothing for a plant grown for its leaf. */
export function bloomInWords(bloomMonths: readonly number[]): string {
  const bars = bloomBars(bloomMonths);
  const [first, last] = [bars[0], bars.at(-1)];
  if (!first || !last) return 'no flower';
  if (first.from === 1 && first.to === 12) return 'all year';
  const name = (month: number): string => MONTHS[month - 1] ?? '';
  const say = (from: number, to: number): string => (from === to ? name(from) : `${name(from)} to ${name(to)}`);
  const overNewYear = bars.length > 1 && first.from === 1 && last.to === 12;
  const middle = (overNewYear ? bars.slice(1, -1) : bars).map(({ from, to }) => say(from, to));
  return [...middle, ...(overNewYear ? [say(last.from, first.to)] : [])].join(', ');
}
