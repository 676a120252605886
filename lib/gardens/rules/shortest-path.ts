import type { Place } from './geodesic';
import { minutesFor, type RoadGraph, type Snap, SPEED_KMH } from './roads';

/** A way by road: minutes in all, and the places passed from the first to the last. */
export interface Way {
  readonly minutes: number;
  readonly places: readonly Place[];
}

interface Reached {
  readonly minutes: Float64Array;
  readonly before: Int32Array;
}

/** Dijkstra from several starts at once, each with the minutes already spent; unreachable nodes stay at infinity. */
export function reachFrom(graph: RoadGraph, starts: readonly { readonly node: number; readonly minutes: number }[]): Reached {
  const minutes = new Float64Array(graph.places.length).fill(Infinity);
  const before = new Int32Array(graph.places.length).fill(-1);
  const queue: { node: number; minutes: number }[] = [];
  for (const start of starts) {
    if (start.minutes >= (minutes[start.node] ?? 0)) continue;
    minutes[start.node] = start.minutes;
    push(queue, { ...start });
  }
  for (let next = pop(queue); next; next = pop(queue)) {
    if (next.minutes > (minutes[next.node] ?? 0)) continue; // a quicker way was found since
    for (const exit of graph.exits[next.node] ?? []) {
      const total = next.minutes + exit.minutes;
      if (total >= (minutes[exit.to] ?? 0)) continue;
      minutes[exit.to] = total;
      before[exit.to] = next.node;
      push(queue, { node: exit.to, minutes: total });
    }
  }
  return { minutes, before };
}

/** The quickest way between two joined places; null when no road leads there. Off the drawn roads lie streets like any other road. */
export function quickestWay(graph: RoadGraph, from: Snap, to: Snap): Way | null {
  const off = minutesFor(from.offMeters + to.offMeters, SPEED_KMH.road);
  const reached = reachFrom(graph, [
    { node: from.edge.from, minutes: from.along * from.edge.minutes },
    { node: from.edge.to, minutes: (1 - from.along) * from.edge.minutes },
  ]);
  const ends = [
    { node: to.edge.from, minutes: (reached.minutes[to.edge.from] ?? Infinity) + to.along * to.edge.minutes },
    { node: to.edge.to, minutes: (reached.minutes[to.edge.to] ?? Infinity) + (1 - to.along) * to.edge.minutes },
  ];
  const end = ends.reduce((best, one) => (one.minutes < best.minutes ? one : best));
  const straight = from.edge === to.edge ? Math.abs(from.along - to.along) * from.edge.minutes : Infinity;
  if (straight <= end.minutes) return straight === Infinity ? null : { minutes: off + straight, places: [from.at, to.at] };
  return { minutes: off + end.minutes, places: [from.at, ...placesTo(graph, reached, end.node), to.at] };
}

function placesTo(graph: RoadGraph, { before }: Reached, node: number): Place[] {
  const places: Place[] = [];
  for (let at = node; at >= 0; at = before[at] ?? -1) {
    const place = graph.places[at];
    if (place) places.unshift(place);
  }
  return places;
}

interface Waiting {
  node: number;
  minutes: number;
}

/** A binary heap with the least minutes at its top. */
function push(heap: Waiting[], item: Waiting): void {
  let at = heap.push(item) - 1;
  while (at > 0) {
    const parent = (at - 1) >> 1;
    const above = heap[parent];
    if (!above || above.minutes <= item.minutes) break;
    heap[at] = above;
    at = parent;
  }
  heap[at] = item;
}

function pop(heap: Waiting[]): Waiting | undefined {
  const top = heap[0];
  const last = heap.pop();
  if (!last || heap.length === 0) return last;
  let at = 0;
  for (;;) {
    const left = 2 * at + 1;
    const child = (heap[left + 1]?.minutes ?? Infinity) < (heap[left]?.minutes ?? Infinity) ? left + 1 : left;
    const below = heap[child];
    if (!below || below.minutes >= last.minutes) break;
    heap[at] = below;
    at = child;
  }
  heap[at] = last;
  return top;
}
