import { distanceMeters, type Place } from './geodesic';
import { type LonLat, type RoadClass, type Valley, featuresOf } from './valley';

/** Kilometres an hour, stops and bends included, on the demo valley's three classes of road. Common practice, no source. */
export const SPEED_KMH: Readonly<Record<RoadClass, number>> = { main: 55, road: 42, lane: 30 };

/** How far from a road a place may lie and still be driven to, in metres; beyond it the road network says nothing. */
export const SNAP_REACH_METERS = 2000;

export interface RoadEdge {
  readonly from: number;
  readonly to: number;
  readonly minutes: number;
}

/** A road network: places that roads share are one node; every edge may be driven both ways. */
export interface RoadGraph {
  readonly places: readonly Place[];
  readonly edges: readonly RoadEdge[];
  readonly exits: readonly (readonly { readonly to: number; readonly minutes: number }[])[];
}

/** Minutes for a stretch in metres at a speed in km/h. */
export const minutesFor = (meters: number, kmh: number): number => (meters / 1000 / kmh) * 60;

/** Puts nodes and edges together; edges name nodes by their place in `places`. */
export function graphOf(places: readonly Place[], edges: readonly RoadEdge[]): RoadGraph {
  const exits: { to: number; minutes: number }[][] = places.map(() => []);
  for (const { from, to, minutes } of edges) {
    exits[from]?.push({ to, minutes });
    exits[to]?.push({ to: from, minutes });
  }
  return { places, edges, exits };
}

/** The road network of a valley: vertices with equal coordinates are one crossing. */
export function roadGraph(valley: Valley): RoadGraph {
  const numbers = new Map<string, number>();
  const places: Place[] = [];
  const numberOf = ([lon, lat]: LonLat): number => {
    const key = `${lon},${lat}`;
    const known = numbers.get(key);
    if (known !== undefined) return known;
    numbers.set(key, places.push({ lat, lon }) - 1);
    return places.length - 1;
  };
  const edges = featuresOf(valley, 'road').flatMap(({ properties, geometry: { coordinates } }) =>
    coordinates.slice(1).map((point, i) => {
      const [from, to] = [numberOf(coordinates[i] ?? point), numberOf(point)];
      const meters = distanceMeters(places[from] ?? placeOf(point), placeOf(point));
      return { from, to, minutes: minutesFor(meters, SPEED_KMH[properties.roadClass]) };
    }),
  );
  return graphOf(places, edges);
}

const placeOf = ([lon, lat]: LonLat): Place => ({ lat, lon });

/** Where a place joins the network: the edge, how far along it (0 to 1), the point on the road, and how far off it lies. */
export interface Snap {
  readonly edge: RoadEdge;
  readonly along: number;
  readonly at: Place;
  readonly offMeters: number;
}

/** The nearest point of any road, or null when none lies within `reachMeters`. The earth is flat enough at this distance. */
export function snapToRoad(graph: RoadGraph, place: Place, reachMeters = SNAP_REACH_METERS): Snap | null {
  const shrink = Math.cos((place.lat * Math.PI) / 180);
  const plane = (p: Place): [number, number] => [(p.lon - place.lon) * shrink, p.lat - place.lat];
  let best: Snap | null = null;
  let bestSquare = Infinity;
  for (const edge of graph.edges) {
    const [from, to] = [graph.places[edge.from], graph.places[edge.to]];
    if (!from || !to) continue;
    const [[ax, ay], [bx, by]] = [plane(from), plane(to)];
    const square = (bx - ax) ** 2 + (by - ay) ** 2;
    const along = square === 0 ? 0 : Math.min(1, Math.max(0, -(ax * (bx - ax) + ay * (by - ay)) / square));
    const off = (ax + (bx - ax) * along) ** 2 + (ay + (by - ay) * along) ** 2;
    if (off >= bestSquare) continue;
    bestSquare = off;
    best = { edge, along, at: { lat: from.lat + (to.lat - from.lat) * along, lon: from.lon + (to.lon - from.lon) * along }, offMeters: 0 };
  }
  if (!best) return null;
  const offMeters = distanceMeters(place, best.at);
  return offMeters <= reachMeters ? { ...best, offMeters } : null;
}
