import { distanceMeters, type Place } from './geodesic';

/** A ring of longitude, latitude pairs; whether the last repeats the first does not matter. */
export type Ring = readonly (readonly [number, number])[];

/** What the club asks of a patch before it may stand for a garden. */
export interface AreaLimits {
  readonly minimumReachMeters: number;
  readonly minimumHomes: number;
}

/** Starting values: a reach that holds 25 homes at 500 homes/km² (r = √(25/(π·500)) km = 126 m), doubled for uneven streets (Allshouse et al. 2010 triple the least area). */
export const DEFAULT_AREA_LIMITS: AreaLimits = { minimumReachMeters: 250, minimumHomes: 25 };

/** Why a patch may not stand for a garden. */
export type AreaFault = 'area_not_a_patch' | 'area_crosses_itself' | 'area_misses_place' | 'area_too_narrow' | 'area_too_few_homes' | 'area_centred_on_place';

type Flat = readonly [number, number];

/** Metres east and north of `origin`, by the ellipsoid's radii of curvature there; good to about 1 in 10,000 over a few kilometres. */
function flatten(ring: Ring, [lon0, lat0]: Flat): Flat[] {
  const e2 = (2 - 1 / 298.257223563) / 298.257223563;
  const lat = (lat0 * Math.PI) / 180;
  const bend = 1 - e2 * Math.sin(lat) ** 2;
  const perLon = ((6378137 / Math.sqrt(bend)) * Math.cos(lat) * Math.PI) / 180;
  const perLat = ((6378137 * (1 - e2)) / bend ** 1.5) * (Math.PI / 180);
  const open = ring.length > 1 && same(ring[0], ring.at(-1)) ? ring.slice(0, -1) : ring;
  return open.map(([lon, point]) => [(lon - lon0) * perLon, (point - lat0) * perLat]);
}

const same = (a: Flat | undefined, b: Flat | undefined): boolean => a !== undefined && b !== undefined && a[0] === b[0] && a[1] === b[1];

function sides(corners: readonly Flat[]): [Flat, Flat][] {
  return corners.map((corner, i) => [corner, corners[(i + 1) % corners.length] ?? corner]);
}

function middleOfBounds(ring: Ring): Flat {
  const [lons, lats] = [ring.map(([lon]) => lon), ring.map(([, lat]) => lat)];
  return [(Math.min(...lons) + Math.max(...lons)) / 2, (Math.min(...lats) + Math.max(...lats)) / 2];
}

/** Whether a ring holds a point (even-odd rule, on longitudes and latitudes as they stand). */
export function ringHolds(ring: Ring, { lon, lat }: Place): boolean {
  return sides(ring).reduce((inside, [[ax, ay], [bx, by]]) => {
    const crosses = ay > lat !== by > lat && lon < ((bx - ax) * (lat - ay)) / (by - ay) + ax;
    return crosses ? !inside : inside;
  }, false);
}

/** The ring's area in square metres, whichever way round it runs. */
export function ringAreaSquareMeters(ring: Ring): number {
  return Math.abs(doubleArea(flatten(ring, middleOfBounds(ring)))) / 2;
}

function doubleArea(corners: readonly Flat[]): number {
  return sides(corners).reduce((sum, [[ax, ay], [bx, by]]) => sum + ax * by - bx * ay, 0);
}

/** How far a patch reaches, in metres: twice its area ÷ its edge. A circle's is its radius, a square's half its side, a thin strip's its breadth however it bends. */
export function reachMeters(ring: Ring): number {
  const corners = flatten(ring, middleOfBounds(ring));
  const edge = sides(corners).reduce((sum, [a, b]) => sum + Math.hypot(b[0] - a[0], b[1] - a[1]), 0);
  return edge === 0 ? 0 : Math.abs(doubleArea(corners)) / edge;
}

/** The points that someone would guess a garden at: the centre of the patch's surface, of its corners and of its bounds. */
export function guessablePoints(ring: Ring): Place[] {
  const middle = middleOfBounds(ring);
  const corners = flatten(ring, middle);
  const [ax, ay] = sides(corners).reduce(([x, y], [p, q]) => {
    const piece = p[0] * q[1] - q[0] * p[1];
    return [x + (p[0] + q[0]) * piece, y + (p[1] + q[1]) * piece];
  }, [0, 0]);
  const [east, north] = flatten([[middle[0] + 1, middle[1] + 1]], middle)[0] ?? [1, 1];
  const mean = (axis: 0 | 1): number => corners.reduce((sum, corner) => sum + corner[axis], 0) / corners.length;
  const surface = 3 * doubleArea(corners);
  const offsets: Flat[] = [[ax / surface, ay / surface], [mean(0), mean(1)], [0, 0]];
  return offsets.map(([x, y]) => ({ lon: middle[0] + x / east, lat: middle[1] + y / north }));
}

function crossesItself(corners: readonly Flat[]): boolean {
  const turn = (a: Flat, b: Flat, c: Flat): number => Math.sign((b[0] - a[0]) * (c[1] - a[1]) - (b[1] - a[1]) * (c[0] - a[0]));
  const all = sides(corners);
  return all.some(([a, b], i) =>
    all.some(([c, d], j) => {
      const apart = Math.abs(i - j);
      if (apart < 2 || apart === all.length - 1) return false;
      return turn(a, b, c) * turn(a, b, d) < 0 && turn(c, d, a) * turn(c, d, b) < 0;
    }),
  );
}

/** Everything that keeps `ring` from standing for a garden at `place`; empty when the host may publish it. The place must lie a quarter of the patch's reach from each guessable point. */
export function areaFaults(ring: Ring, place: Place, homes: number, limits: AreaLimits = DEFAULT_AREA_LIMITS): AreaFault[] {
  const corners = flatten(ring, middleOfBounds(ring));
  if (crossesItself(corners)) return ['area_crosses_itself'];
  if (corners.length < 3 || doubleArea(corners) === 0) return ['area_not_a_patch'];
  const reach = reachMeters(ring);
  const faults: AreaFault[] = [];
  if (!ringHolds(ring, place)) faults.push('area_misses_place');
  if (reach < limits.minimumReachMeters) faults.push('area_too_narrow');
  if (homes < limits.minimumHomes) faults.push('area_too_few_homes');
  if (guessablePoints(ring).some((guess) => distanceMeters(guess, place) < reach / 4)) faults.push('area_centred_on_place');
  return faults;
}
