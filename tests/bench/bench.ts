/** A figure that must be at least, or at most, so much. */
export type Bar = { name: string; value: number; min?: number; max?: number };

export type Figures = Record<string, number>;

/** What each file of this folder exports under its own name; scripts/bench.ts runs it. */
export type Bench = { describe: string; run(): Promise<{ figures: Figures; bars: Bar[] }> };

/** The middle of some measurements; of an even number, the mean of the middle two. */
export function median(values: number[]): number {
  const sorted = values.toSorted((a, b) => a - b);
  const half = sorted.length / 2;
  return ((sorted[Math.floor(half)] ?? NaN) + (sorted[Math.ceil(half) - 1] ?? NaN)) / 2;
}

/** So many digits after the point and no more. */
export const rounded = (value: number, digits = 2): number => Number(value.toFixed(digits));
