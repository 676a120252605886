import type { LonLat } from '@/lib/gardens/rules/valley';

/** A drawn sheet: how degrees become points on it, and how many points a metre is. */
export interface Sheet {
  readonly width: number;
  readonly height: number;
  readonly pointsPerMeter: number;
  readonly at: (place: LonLat) => readonly [number, number];
}

type Bounds = readonly [west: number, south: number, east: number, north: number];

const METERS_PER_DEGREE = 111195; // mean radius 6371008.8 m; the drawing needs no better

/** A sheet `width` points wide that shows the bounds, north up, metres equal both ways. */
export function sheetOf([west, south, east, north]: Bounds, width: number): Sheet {
  const shrink = Math.cos((((south + north) / 2) * Math.PI) / 180);
  const perDegree = width / ((east - west) * shrink);
  return {
    width,
    height: Math.round((north - south) * perDegree),
    pointsPerMeter: perDegree / METERS_PER_DEGREE,
    at: ([lon, lat]) => [(lon - west) * shrink * perDegree, (north - lat) * perDegree],
  };
}

/** The bounds of some places with a margin in metres on every side, widened to the given proportion of width to height. */
export function boundsAround(places: readonly LonLat[], marginMeters: number, proportion: number): Bounds {
  const [lons, lats] = [places.map(([lon]) => lon), places.map(([, lat]) => lat)];
  const [west, east, south, north] = [Math.min(...lons), Math.max(...lons), Math.min(...lats), Math.max(...lats)];
  const shrink = Math.cos((((south + north) / 2) * Math.PI) / 180);
  const margin = marginMeters / METERS_PER_DEGREE;
  const high = Math.max(north - south + 2 * margin, ((east - west) * shrink + 2 * margin) / proportion);
  const [halfHigh, halfWide] = [high / 2, (high * proportion) / shrink / 2];
  const [lon, lat] = [(west + east) / 2, (south + north) / 2];
  return [lon - halfWide, lat - halfHigh, lon + halfWide, lat + halfHigh];
}

const tenth = (value: number): number => Math.round(value * 10) / 10;

/** An SVG path through places on the sheet. */
export function pathThrough(sheet: Sheet, places: readonly LonLat[], shift: (share: number) => number = () => 0): string {
  const last = Math.max(1, places.length - 1);
  return places
    .map((place, i) => {
      const [x, y] = sheet.at(place);
      return `${i === 0 ? 'M' : 'L'}${tenth(x)} ${tenth(y + shift(i / last))}`;
    })
    .join('');
}
