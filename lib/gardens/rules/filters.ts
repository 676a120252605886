import type { GardenFilters } from '../schema';

/** What of a garden the filters look at. `placesLeft` is the most places left at one entry time of the day in view; null when it takes no part. */
export type Filterable = {
  readonly scaleOneTo: number;
  readonly powers: readonly string[];
  readonly isStepFree: boolean;
  readonly placesLeft: number | null;
};

/** Whether a garden is shown. A day that is asked for hides gardens that take no part; places asked for want that many at one time. */
export function fits(garden: Filterable, { scale, runs, access, day, places }: GardenFilters): boolean {
  return (scale === null || Math.abs(garden.scaleOneTo - scale) < 0.005)
    && (runs === null || garden.powers.includes(runs))
    && (access === null || garden.isStepFree)
    && (day === null || garden.placesLeft !== null)
    && (places === null || (garden.placesLeft ?? 0) >= places);
}

/** The scales that a filter can offer, smallest train last. */
export const scalesOf = (gardens: readonly { readonly scaleOneTo: number }[]): number[] =>
  [...new Set(gardens.map(({ scaleOneTo }) => Number(scaleOneTo.toFixed(2))))].sort((a, b) => a - b);

/** The ways of running that a filter can offer, in the order of the list of powers. */
export const powersOf = (gardens: readonly { readonly powers: readonly string[] }[], all: readonly string[]): string[] =>
  all.filter((power) => gardens.some(({ powers }) => powers.includes(power)));

/** Whether anything at all was asked. */
export const isNarrowed = (filters: GardenFilters): boolean => Object.values(filters).some((value) => value !== null);
