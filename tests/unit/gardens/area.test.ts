import fc from 'fast-check';
import geodesicPackage from 'geographiclib-geodesic';
import { describe, expect, it } from 'vitest';
import { areaFaults, guessablePoints, reachMeters, type Ring, ringAreaSquareMeters, ringHolds } from '@/lib/gardens/rules/area';
import { distanceMeters } from '@/lib/gardens/rules/geodesic';
import { neighbourhoodsOf } from '@/lib/gardens/rules/valley';
import { builtInValley } from '@/lib/gardens/rules/valley-data';

const areas = neighbourhoodsOf(builtInValley);

/** The independent figure: the area on the ellipsoid, by C. F. F. Karney's geographiclib-geodesic. */
function karneySquareMeters(ring: Ring): number {
  const polygon = geodesicPackage.Geodesic.WGS84.Polygon(false);
  ring.slice(0, -1).forEach(([lon, lat]) => polygon.AddPoint(lat, lon));
  return Math.abs(polygon.Compute(false, true).area ?? NaN);
}

/** About a kilometre by a kilometre at 40° N. */
const square: Ring = [[-64, 40], [-63.9883, 40], [-63.9883, 40.009], [-64, 40.009], [-64, 40]];
const inSquare = { lat: 40.002, lon: -63.9975 };

describe('a neighbourhood on the valley’s map', () => {
  it.each(areas.map((area) => [area.name, area] as const))('%s is a closed patch that runs counterclockwise, holds its own label point and is wide enough for any garden', (_name, { ring, labelPoint: [lon, lat], homes }) => {
    const doubleArea = ring.slice(1).reduce((sum, [x, y], i) => sum + (ring[i]?.[0] ?? 0) * y - x * (ring[i]?.[1] ?? 0), 0);

    expect(ring.at(-1)).toEqual(ring[0]);
    expect(doubleArea).toBeGreaterThan(0);
    expect(ringHolds(ring, { lat, lon })).toBe(true);
    expect(reachMeters(ring)).toBeGreaterThan(500);
    expect(homes).toBeGreaterThanOrEqual(25);
  });

  it('overlaps no other: no label point lies in two patches', () => {
    for (const { labelPoint: [lon, lat] } of areas) expect(areas.filter(({ ring }) => ringHolds(ring, { lat, lon }))).toHaveLength(1);
  });

  it.each(areas.map((area) => [area.name, area] as const))('%s has the area that an independent package finds, within 1 in 1,000', (_name, { ring }) => {
    expect(ringAreaSquareMeters(ring) / karneySquareMeters(ring)).toBeCloseTo(1, 3);
  });
});

describe('a patch that may stand for a garden', () => {
  it('is accepted when it holds the garden off its centres, is wide enough and has enough homes', () => {
    expect(areaFaults(square, inSquare, 25)).toEqual([]);
  });

  it.each([
    ['leaves the garden outside', square, { lat: 40.02, lon: -64 }, 40, ['area_misses_place']],
    ['has 24 homes where 25 are asked', square, inSquare, 24, ['area_too_few_homes']],
    ['has the garden at its very centre', square, { lat: 40.0045, lon: -63.99415 }, 40, ['area_centred_on_place']],
    ['is one street long and thin', [[-64, 40], [-63.9, 40], [-63.9, 40.002], [-64, 40.002]], { lat: 40.001, lon: -63.98 }, 40, ['area_too_narrow']],
    ['is a bow tie', [[-64, 40], [-63.98, 40.02], [-63.98, 40], [-64, 40.02]], inSquare, 40, ['area_crosses_itself']],
    ['is a line', [[-64, 40], [-63.9, 40]], inSquare, 40, ['area_not_a_patch']],
  ] as const)('is refused, with the reason, when it %s', (_what, ring, place, homes, faults) => {
    expect(areaFaults(ring, place, homes)).toEqual(faults);
  });

  it('bent round a corner is still as narrow as its street', () => {
    const bent: Ring = [[-64, 40], [-63.95, 40], [-63.95, 40.05], [-63.952, 40.05], [-63.952, 40.0015], [-64, 40.0015]];

    expect(areaFaults(bent, { lat: 40.001, lon: -63.99 }, 400)).toContain('area_too_narrow');
  });

  it('gives the garden away to none of the guesses an onlooker can make from the patch', () => {
    const corner = fc.tuple(fc.double({ min: 0.5, max: 1, noNaN: true }), fc.double({ min: 0, max: 1, noNaN: true }));

    fc.assert(
      fc.property(fc.array(corner, { minLength: 4, maxLength: 12 }), fc.double({ min: 0, max: 1, noNaN: true }), fc.double({ min: 0, max: 1, noNaN: true }), (corners, x, y) => {
        const ring: Ring = corners.map(([far, jitter], i): [number, number] => {
          const angle = ((i + jitter * 0.5) / corners.length) * 2 * Math.PI;
          return [-64 + 0.012 * far * Math.cos(angle), 40 + 0.01 * far * Math.sin(angle)];
        });
        const place = { lat: 39.99 + 0.02 * y, lon: -64.012 + 0.024 * x };
        if (areaFaults(ring, place, 30).length > 0) return;

        for (const guess of guessablePoints(ring)) expect(distanceMeters(guess, place)).toBeGreaterThan(60);
        expect(ringHolds(ring, place)).toBe(true);
      }),
      { numRuns: 500 },
    );
  });

  it('has the reach of a circle that is its radius', () => {
    const circle: Ring = Array.from({ length: 180 }, (_, i): [number, number] => [-64 + (500 / 85394) * Math.cos((i * Math.PI) / 90), 40 + (500 / 111035) * Math.sin((i * Math.PI) / 90)]);

    expect(reachMeters(circle)).toBeGreaterThan(499);
    expect(reachMeters(circle)).toBeLessThan(501);
  });
});
