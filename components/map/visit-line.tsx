import { roadGraph, snapToRoad } from '@/lib/gardens/rules/roads';
import { quickestWay } from '@/lib/gardens/rules/shortest-path';
import type { LonLat, Neighbourhood, Valley } from '@/lib/gardens/rules/valley';
import { pathThrough, type Sheet } from './sheet';

/** The places along the quickest road from one neighbourhood's post to the next; straight where no road leads. */
export function placesBetweenAreas(valley: Valley, areas: readonly Neighbourhood[]): LonLat[] {
  const graph = roadGraph(valley);
  return areas.flatMap((area, i) => {
    const next = areas[i + 1];
    if (!next) return [area.labelPoint];
    const [from, to] = [area, next].map(({ labelPoint: [lon, lat] }) => snapToRoad(graph, { lat, lon }));
    const way = from && to ? quickestWay(graph, from, to) : null;
    return [area.labelPoint, ...(way?.places ?? []).map(({ lon, lat }): LonLat => [lon, lat])];
  });
}

/** Rounds the corners of a line by cutting them off (G. Chaikin 1974), keeping its ends. */
function rounded(places: readonly LonLat[], times: number): LonLat[] {
  if (times === 0) return [...places];
  const between = (a: LonLat, b: LonLat, share: number): LonLat => [a[0] + (b[0] - a[0]) * share, a[1] + (b[1] - a[1]) * share];
  const cut = places.slice(1).flatMap((place, i) => [between(places[i] ?? place, place, 0.25), between(places[i] ?? place, place, 0.75)]);
  const [first, last] = [places[0], places.at(-1)];
  return rounded(first && last ? [first, ...cut, last] : cut, times - 1);
}

/** A party's way from garden to garden, between the neighbourhoods' own points. */
export function VisitLine({ valley, areas, sheet }: { readonly valley: Valley; readonly areas: readonly Neighbourhood[]; readonly sheet: Sheet }) {
  const d = areas.slice(1).map((area, i) => pathThrough(sheet, rounded(placesBetweenAreas(valley, [areas[i] ?? area, area]), 2))).join('');
  return (
    <g fill="none" strokeLinejoin="round" strokeLinecap="round">
      <path d={d} className="stroke-paper" strokeWidth="8" />
      <path d={d} className="stroke-damson" strokeWidth="4" />
    </g>
  );
}
