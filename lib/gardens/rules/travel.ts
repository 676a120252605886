import { distanceMeters, type Place } from './geodesic';
import { minutesFor, type RoadGraph, snapToRoad } from './roads';
import { quickestWay } from './shortest-path';

/**
 * By road ÷ as the crow flies, where there is no road to follow: within the 1.3–1.4 usual for drive estimates
 * (Boscoe, Henry & Zdeb 2012 found a mean of 1.417 over 66,000 US trips; Ballou 2002 gives 1.20 for the US; short trips are worse).
 */
export const DETOUR_FACTOR = 1.35;

/** Km/h for a trip of which only the ends are known: 25 mph. Common practice, no source. */
export const CROW_SPEED_KMH = 40;

/** What minutes are published in: the next five. */
export const PUBLISHED_STEP_MINUTES = 5;

/** Minutes by car between two exact points: by road where both lie near one, else as the crow flies × the detour factor. Only for those who may know the points. */
export function minutesBetween(graph: RoadGraph, from: Place, to: Place): number {
  const [start, end] = [snapToRoad(graph, from), snapToRoad(graph, to)];
  const way = start && end ? quickestWay(graph, start, end) : null;
  return way ? way.minutes : minutesFor(distanceMeters(from, to) * DETOUR_FACTOR, CROW_SPEED_KMH);
}

/** Rounds minutes up to the next five, and never below five: two gardens are never no distance apart. */
export function publishedMinutes(minutes: number): number {
  const steps = Math.ceil(minutes / PUBLISHED_STEP_MINUTES - 1e-9); // a sum of stretches may stand a hair above its whole
  return Math.max(1, steps) * PUBLISHED_STEP_MINUTES;
}

/** An area as travel knows it: its key and the point where its post stands. */
export interface AreaPost {
  readonly key: string;
  readonly labelPoint: readonly [number, number];
}

export interface AreaMinutes {
  readonly fromKey: string;
  readonly toKey: string;
  readonly minutes: number;
}

/** Published minutes between every two areas, both ways alike, and within one area five. Computed from label points only, so it says nothing of any garden's place. */
export function areaMinutesTable(graph: RoadGraph, areas: readonly AreaPost[]): AreaMinutes[] {
  const place = ({ labelPoint: [lon, lat] }: AreaPost): Place => ({ lat, lon });
  return areas.flatMap((one, i) =>
    areas.slice(i).flatMap((other) => {
      const minutes = one.key === other.key ? PUBLISHED_STEP_MINUTES : publishedMinutes(minutesBetween(graph, place(one), place(other)));
      const there = { fromKey: one.key, toKey: other.key, minutes };
      return one.key === other.key ? [there] : [there, { fromKey: other.key, toKey: one.key, minutes }];
    }),
  );
}
