import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { distanceMeters } from '@/lib/gardens/rules/geodesic';
import { graphOf, type RoadEdge, type RoadGraph, roadGraph, snapToRoad, SPEED_KMH } from '@/lib/gardens/rules/roads';
import { quickestWay, reachFrom } from '@/lib/gardens/rules/shortest-path';
import { areaMinutesTable, CROW_SPEED_KMH, DETOUR_FACTOR, minutesBetween, publishedMinutes } from '@/lib/gardens/rules/travel';
import { featuresOf, neighbourhoodsOf } from '@/lib/gardens/rules/valley';
import { builtInValley } from '@/lib/gardens/rules/valley-data';

const graph = roadGraph(builtInValley);
const areas = neighbourhoodsOf(builtInValley);
const table = areaMinutesTable(graph, areas);
const minutesOf = (fromKey: string, toKey: string): number => table.find((row) => row.fromKey === fromKey && row.toKey === toKey)?.minutes ?? NaN;

/** Every way without going twice through a node, added up one by one. */
function bruteForceMinutes({ exits }: RoadGraph, from: number, to: number, passed: readonly number[] = []): number {
  if (from === to) return 0;
  return Math.min(Infinity, ...(exits[from] ?? []).filter((exit) => !passed.includes(exit.to)).map((exit) => exit.minutes + bruteForceMinutes({ ...graph, exits }, exit.to, to, [...passed, from])));
}

const smallNetwork = fc.integer({ min: 2, max: 6 }).chain((size) => {
  const node = fc.integer({ min: 0, max: size - 1 });
  const edge: fc.Arbitrary<RoadEdge> = fc.record({ from: node, to: node, minutes: fc.integer({ min: 0, max: 30 }) });
  return fc.record({ size: fc.constant(size), edges: fc.array(edge, { maxLength: 10 }), from: node, to: node });
});

describe('the quickest way by road', () => {
  it('is never longer and never shorter than the best of all ways, on small random networks', () => {
    fc.assert(
      fc.property(smallNetwork, ({ size, edges, from, to }) => {
        const network = graphOf(Array.from({ length: size }, (_, i) => ({ lat: 40, lon: i / 100 })), edges);

        const { minutes } = reachFrom(network, [{ node: from, minutes: 0 }]);

        expect(minutes[to]).toBe(bruteForceMinutes(network, from, to));
      }),
      { numRuns: 400 },
    );
  });

  it('between two points of one road is the stretch between them', () => {
    const places = [{ lat: 40, lon: 0 }, { lat: 40, lon: 0.1 }];
    const road = graphOf(places, [{ from: 0, to: 1, minutes: 10 }]);
    const [start, end] = [snapToRoad(road, { lat: 40, lon: 0.02 }), snapToRoad(road, { lat: 40, lon: 0.07 })];
    if (!start || !end) throw new Error('both lie on the road');

    expect(quickestWay(road, start, end)?.minutes).toBeCloseTo(5, 6);
  });

  it('does not exist between two roads that never meet', () => {
    const places = [{ lat: 40, lon: 0 }, { lat: 40, lon: 0.01 }, { lat: 40.1, lon: 0 }, { lat: 40.1, lon: 0.01 }];
    const roads = graphOf(places, [{ from: 0, to: 1, minutes: 1 }, { from: 2, to: 3, minutes: 1 }]);
    const [start, end] = [snapToRoad(roads, { lat: 40, lon: 0.005 }), snapToRoad(roads, { lat: 40.1, lon: 0.005 })];
    if (!start || !end) throw new Error('both lie on a road');

    expect(quickestWay(roads, start, end)).toBeNull();
  });

  it('starts from the nearest point of the nearest road, and from none when every road is too far', () => {
    const road = graphOf([{ lat: 40, lon: 0 }, { lat: 40, lon: 0.1 }], [{ from: 0, to: 1, minutes: 10 }]);

    expect(snapToRoad(road, { lat: 40.001, lon: 0.05 })).toMatchObject({ along: expect.closeTo(0.5, 6), offMeters: expect.closeTo(111.04, 0) });
    expect(snapToRoad(road, { lat: 40.001, lon: 0.05 }, 111)).toBeNull();
  });
});

describe('the valley’s roads', () => {
  it('all hang together: every crossing can be reached from every other', () => {
    const { minutes } = reachFrom(graph, [{ node: 0, minutes: 0 }]);

    expect([...minutes].filter((one) => one === Infinity)).toHaveLength(0);
    expect(featuresOf(builtInValley, 'road').map((road) => road.properties.roadClass)).toEqual(expect.arrayContaining(['main', 'road', 'lane']));
  });

  it('are never quicker than the straight line at the quickest road’s speed', () => {
    for (const one of areas) {
      for (const other of areas) {
        const [from, to] = [one, other].map(({ labelPoint: [lon, lat] }) => ({ lat, lon }));
        if (!from || !to) throw new Error('two areas');
        expect(minutesBetween(graph, from, to)).toBeGreaterThanOrEqual(((distanceMeters(from, to) / 1000) * 60) / SPEED_KMH.main - 1e-6);
      }
    }
  });
});

describe('minutes between places without a road', () => {
  it('are the straight line × 1.35 at 40 km/h', () => {
    const [from, to] = [{ lat: 10, lon: 10 }, { lat: 10, lon: 10.1 }];

    expect(minutesBetween(graph, from, to)).toBeCloseTo(((distanceMeters(from, to) * DETOUR_FACTOR) / 1000 / CROW_SPEED_KMH) * 60, 9);
  });
});

describe('published minutes between areas', () => {
  it.each([[0, 5], [0.1, 5], [5, 5], [5.01, 10], [10, 10], [14.999, 15], [15, 15], [34.2, 35]])('%d minutes are published as %d', (minutes, published) => {
    expect(publishedMinutes(minutes)).toBe(published);
  });

  it('are whole fives from 5 to 40, the same there and back, for every two areas', () => {
    expect(table).toHaveLength(areas.length ** 2);
    for (const { fromKey, toKey, minutes } of table) {
      expect(minutes % 5).toBe(0);
      expect(minutes).toBeGreaterThanOrEqual(5);
      expect(minutes).toBeLessThanOrEqual(40);
      expect(minutesOf(toKey, fromKey)).toBe(minutes);
    }
  });

  it('do not change when a garden does: they know only the areas’ own label points', () => {
    const labelsOnly = areas.map(({ key, labelPoint }) => ({ key, labelPoint }));

    expect(areaMinutesTable(graph, labelsOnly)).toEqual(table);
  });
});
