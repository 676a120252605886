/**
 * Run `tsx scripts/seed/draw-valley.ts` after changing valley-drawing.ts: it writes public/valley/valley.json, the GeoJSON
 * that the map, the travel minutes and the seed read. The valley lies on the open Atlantic, where there is no street to find.
 */
import { writeFileSync } from 'node:fs';
import { fileURLToPath } from 'node:url';
import { areaDrawings, fieldDrawings, haltPoint, hedgeDrawings, railwayDrawing, ridgeDrawing, riverDrawings, roadDrawings, woodDrawings, type Pen } from './valley-drawing';

type Point = readonly [number, number];

/** Where the sheet's north-west corner lies: open ocean, hundreds of kilometres from any coast. */
const NORTH_WEST = { lat: 40.25, lon: -64.1 };
const METERS_PER_UNIT = 10;
/** Metres in a degree at 40.2° N on WGS84, to the metre: M·π/180 and N·cos φ·π/180. */
const METERS_PER_DEGREE = { lat: 111038, lon: 85145 };
const STEPS = 5;

const rounded = (value: number): number => Math.round(value * 1e5) / 1e5;

export function toLonLat([x, y]: Point): [number, number] {
  return [
    rounded(NORTH_WEST.lon + (x * METERS_PER_UNIT) / METERS_PER_DEGREE.lon),
    rounded(NORTH_WEST.lat - (y * METERS_PER_UNIT) / METERS_PER_DEGREE.lat),
  ];
}

function bend(p0: Point, p1: Point, p2: Point, p3: Point, t: number): Point {
  const at = (a: number, b: number, c: number, d: number): number =>
    0.5 * (2 * b + (c - a) * t + (2 * a - 5 * b + 4 * c - d) * t * t + (3 * b - a - 3 * c + d) * t * t * t);
  return [at(p0[0], p1[0], p2[0], p3[0]), at(p0[1], p1[1], p2[1], p3[1])];
}

function nth(points: readonly Point[], index: number): Point {
  const point = points[index];
  if (!point) throw new Error(`a line of ${points.length} points has no point ${index}`);
  return point;
}

/** A Catmull-Rom curve through the pen's points, which it keeps exactly, so that crossing lines share them. */
function smooth(pen: Pen): Point[] {
  const last = pen.length - 1;
  const curve: Point[] = [];
  for (let i = 0; i < last; i++) {
    const [p0, p1, p2, p3] = [nth(pen, Math.max(0, i - 1)), nth(pen, i), nth(pen, i + 1), nth(pen, Math.min(last, i + 2))];
    curve.push(p1);
    for (let step = 1; step < STEPS; step++) curve.push(bend(p0, p1, p2, p3, step / STEPS));
  }
  return [...curve, nth(pen, last)];
}

/** Where two lines first meet: the distance along each in vertices (3.5 is halfway from vertex 3 to 4), and the point. */
function meeting(a: readonly Point[], b: readonly Point[], names: string): { onA: number; onB: number; point: Point } {
  for (let i = 0; i + 1 < a.length; i++) {
    for (let j = 0; j + 1 < b.length; j++) {
      const [a0, a1, b0, b1] = [nth(a, i), nth(a, i + 1), nth(b, j), nth(b, j + 1)];
      const [ux, uy, vx, vy] = [a1[0] - a0[0], a1[1] - a0[1], b1[0] - b0[0], b1[1] - b0[1]];
      const cross = ux * vy - uy * vx;
      if (cross === 0) continue;
      const [wx, wy] = [b0[0] - a0[0], b0[1] - a0[1]];
      const [t, u] = [(wx * vy - wy * vx) / cross, (wx * uy - wy * ux) / cross];
      if (t >= -1e-9 && t <= 1 + 1e-9 && u >= -1e-9 && u <= 1 + 1e-9) return { onA: i + t, onB: j + u, point: [a0[0] + ux * t, a0[1] + uy * t] };
    }
  }
  throw new Error(`these lines never meet: ${names}`);
}

function between(line: readonly Point[], from: number, to: number): Point[] {
  const inner = line.map((point, index) => ({ point, index }));
  const kept = from < to ? inner.filter(({ index }) => index > from + 0.05 && index < to - 0.05) : inner.filter(({ index }) => index < from - 0.05 && index > to + 0.05).reverse();
  return kept.map(({ point }) => point);
}

/** Roads and water run on past the sheet's edge, so that a map of an outer neighbourhood shows no end of them. */
function beyond(pen: Pen): Pen {
  const isOff = ([x, y]: Point): boolean => x < 0 || x > 1600 || y < 0 || y > 1100;
  const onward = (end: Point, before: Point): Point => [end[0] + 4 * (end[0] - before[0]), end[1] + 4 * (end[1] - before[1])];
  const last = pen.length - 1;
  return [...(isOff(nth(pen, 0)) ? [onward(nth(pen, 0), nth(pen, 1))] : []), ...pen, ...(isOff(nth(pen, last)) ? [onward(nth(pen, last), nth(pen, last - 1))] : [])];
}

const linesByKey = new Map<string, Point[]>([
  ...[...roadDrawings, ...riverDrawings].map(({ key, pen }): [string, Point[]] => [key, smooth(beyond(pen))]),
  ['railway', smooth(beyond(railwayDrawing))],
  ...Object.entries(hedgeDrawings).map(([key, pen]): [string, Point[]] => [key, [...pen]]),
]);

function lineOf(key: string): Point[] {
  const line = linesByKey.get(key);
  if (!line) throw new Error(`no line is called ${key}`);
  return line;
}

/** The patch that the named lines enclose, as a closed ring. */
function ringOf(bounds: readonly string[]): Point[] {
  const corners = bounds.map((key, i) => {
    const next = bounds[(i + 1) % bounds.length] ?? key;
    return meeting(lineOf(key), lineOf(next), `${key} and ${next}`);
  });
  const ring = bounds.flatMap((key, i) => {
    const from = corners[(i + bounds.length - 1) % bounds.length], to = corners[i];
    if (!from || !to) throw new Error(`${key} has no corners`);
    return [from.point, ...between(lineOf(key), from.onB, to.onA)];
  });
  return [...ring, nth(ring, 0)];
}

type Geometry = { type: 'LineString' | 'MultiPoint'; coordinates: number[][] } | { type: 'Polygon'; coordinates: number[][][] } | { type: 'Point'; coordinates: number[] };
const feature = (properties: object, geometry: Geometry) => ({ type: 'Feature', properties, geometry });
const lineString = (points: readonly Point[]): Geometry => ({ type: 'LineString', coordinates: points.map(toLonLat) });
/** Outer rings run counterclockwise on the ground (RFC 7946, section 3.1.6). */
function polygon(ring: readonly Point[]): Geometry {
  const onGround = ring.map(toLonLat);
  const doubleArea = onGround.reduce((sum, [x, y], i) => {
    const [nextX, nextY] = onGround[(i + 1) % onGround.length] ?? [x, y];
    return sum + x * nextY - y * nextX;
  }, 0);
  return { type: 'Polygon', coordinates: [doubleArea < 0 ? onGround.reverse() : onGround] };
}

const [west, north] = toLonLat([0, 0]);
const [east, south] = toLonLat([1600, 1100]);

export const valley = {
  type: 'FeatureCollection',
  note: 'All geometry and every name in this file is invented and drawn by hand. It lies on the open Atlantic, where there is no street.',
  sheet: [west, south, east, north],
  features: [
    ...riverDrawings.map(({ key, name, widthMeters }) => feature({ kind: 'river', key, name, widthMeters }, lineString(lineOf(key)))),
    ...roadDrawings.map(({ key, name, roadClass }) => feature({ kind: 'road', key, name, roadClass }, lineString(lineOf(key)))),
    feature({ kind: 'railway', key: 'valley-line', name: 'the old valley line' }, lineString(lineOf('railway'))),
    feature({ kind: 'halt', key: 'alder-fork-halt', name: 'Alder Fork Halt' }, { type: 'Point', coordinates: toLonLat(haltPoint) }),
    ...areaDrawings.map(({ key, name, inWords, homes, label, bounds }) => feature({ kind: 'area', key, name, inWords, homes, labelPoint: toLonLat(label) }, polygon(ringOf(bounds)))),
    ...woodDrawings.map(({ name, trees }) => feature({ kind: 'wood', name }, { type: 'MultiPoint', coordinates: trees.map(toLonLat) })),
    ...fieldDrawings.map(({ name, ring }) => feature({ kind: 'field', name }, polygon([...ring, nth(ring, 0)]))),
    feature({ kind: 'ridge', name: 'Gorse Ridge' }, lineString(smooth(ridgeDrawing))),
  ],
};

if (process.argv[1] === fileURLToPath(import.meta.url)) {
  const text = `${JSON.stringify({ ...valley, features: [] }).replace('[]}', '[')}\n${valley.features.map((one) => JSON.stringify(one)).join(',\n')}\n]}\n`;
  writeFileSync(fileURLToPath(new URL('../../public/valley/valley.json', import.meta.url)), text);
}
