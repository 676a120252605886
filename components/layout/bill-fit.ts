import { besleyBlackEm } from './besley-black';

export type BillFit = {
  /** The lines on a wide sheet: one, unless the name would then be set too small to be a bill. */
  lines: string[];
  /** Font sizes in percent of the measure (cqw): for those lines, and for a phone, where every word must fit. */
  fit: number;
  fitWords: number;
  /** The largest size on a phone, in rem: a long name is set smaller rather than fill the screen. */
  phoneRem: number;
};

/* At the drawn measure of 1,184 px this is 45 px: below it a name no longer reads as a bill. */
const WIDEST_LINE_EM = 26;
/* Kerning, a fallback face before the font arrives, a rounding: nothing may stick out. */
const AIR = 0.97;

/** How a name of any length fills its measure: on one line if it can, else on two or three of even length. */
export function billFit(name: string): BillFit {
  const words = name.split(/\s+/).filter((word) => word !== '');
  const lines = linesOf(words);
  const widest = Math.max(...lines.map(besleyBlackEm), 1);
  const longestWord = Math.max(...words.map(besleyBlackEm), 1);
  return { lines, fit: percent(widest), fitWords: percent(longestWord), phoneRem: phoneRem(besleyBlackEm(words.join(' '))) };
}

const percent = (em: number) => Math.floor((100 / em) * AIR * 100) / 100;

const phoneRem = (em: number) => (em <= 17 ? 3.4 : em <= 30 ? 2.7 : 2.1);

function linesOf(words: string[]): string[] {
  for (const count of [1, 2, 3]) {
    const lines = evenLines(words, count);
    if (Math.max(...lines.map(besleyBlackEm)) <= WIDEST_LINE_EM) return lines;
  }
  return evenLines(words, 3);
}

/** The words on at most `count` lines, the widest line as narrow as can be. */
function evenLines(words: string[], count: number): string[] {
  if (count === 1 || words.length < 2) return [words.join(' ')];
  const breaks = words.slice(1).map((_, index) => {
    const first = words.slice(0, index + 1).join(' ');
    return [first, ...evenLines(words.slice(index + 1), count - 1)];
  });
  const widths = breaks.map((lines) => Math.max(...lines.map(besleyBlackEm)));
  return breaks[widths.indexOf(Math.min(...widths))] ?? [words.join(' ')];
}
