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

/** A party's way from garden to garden, between the neighbourhoods' own points. */
export function VisitLine({ valley, areas, sheet }: { readonly valley: Valley; readonly areas: readonly Neighbourhood[]; readonly sheet: Sheet }) {
  const d = pathThrough(sheet, placesBetweenAreas(valley, areas));
  return (
    <g fill="none" strokeLinejoin="round" strokeLinecap="round">
      <path d={d} className="stroke-paper" strokeWidth="8" />
      <path d={d} className="stroke-damson" strokeWidth="4" />
    </g>
  );
}
