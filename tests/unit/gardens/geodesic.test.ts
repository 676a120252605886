import { existsSync, readFileSync } from 'node:fs';
import { resolve } from 'node:path';
import fc from 'fast-check';
import geodesicPackage from 'geographiclib-geodesic';
import { describe, expect, it } from 'vitest';
import { z } from 'zod';
import { distanceMeters } from '@/lib/gardens/rules/geodesic';

/** An independent solver: C. F. F. Karney's, in the geographiclib-geodesic package. */
const wgs84 = geodesicPackage.Geodesic.WGS84;
const karneyMeters = (lat1: number, lon1: number, lat2: number, lon2: number): number => wgs84.Inverse(lat1, lon1, lat2, lon2).s12 ?? NaN;
const metersOf = (lat1: number, lon1: number, lat2: number, lon2: number): number => distanceMeters({ lat: lat1, lon: lon1 }, { lat: lat2, lon: lon2 });
const dms = (degrees: number, minutes: number, seconds: number): number => Math.sign(degrees) * (Math.abs(degrees) + minutes / 60 + seconds / 3600);

describe('the distance between two places', () => {
  // The check values lie beside the project, in ../shared/data; where that folder is absent, the other tests of this file still stand.
  const file = resolve('..', 'shared', 'data', 'geodesic_karney_20.json');
  it.skipIf(!existsSync(file))(`agrees to a millimetre with the 20 published lines of ../shared/data (skipped when the folder is absent)`, () => {
    const { cases } = z.object({ cases: z.array(z.array(z.number())) }).parse(JSON.parse(readFileSync(file, 'utf8')));

    const worst = Math.max(...cases.map(([lat1 = 0, lon1 = 0, , lat2 = 0, lon2 = 0, , published = 0]) => Math.abs(metersOf(lat1, lon1, lat2, lon2) - published)));

    expect(cases).toHaveLength(20);
    expect(worst).toBeLessThan(1e-3);
  });

  it('from Flinders Peak to Buninyong is 54,972.271 m to a millimetre (Geoscience Australia, GDA technical manual)', () => {
    const meters = metersOf(dms(-37, 57, 3.7203), dms(144, 25, 29.5244), dms(-37, 39, 10.1561), dms(143, 55, 35.3839));

    expect(Math.abs(meters - 54972.271)).toBeLessThan(1e-3);
  });

  it.each([
    ["from Land's End to John o'Groats", [50.06632, -5.71475, 58.64402, -3.07009], 969954.1663],
    ['from New York to London airports', [40.6, -73.8, 51.6, -0.5], 5551759.4003],
    ['of one degree along the equator', [0, 0, 0, 1], 111319.4908],
    ['of one degree north of the equator', [0, 0, 1, 0], 110574.3886],
    ['from the equator to a pole', [0, 0, 90, 0], 10001965.7293],
    ['to a nearly opposite place, where the common formula does not settle', [0, 0, 0.5, 179.5], 19936288.579],
  ] as const)('%s is the published figure to a millimetre', (_line, [lat1, lon1, lat2, lon2], published) => {
    expect(Math.abs(metersOf(lat1, lon1, lat2, lon2) - published)).toBeLessThan(1e-3);
  });

  it('agrees with an independent solver to a millimetre anywhere on Earth', () => {
    const lat = fc.double({ min: -90, max: 90, noNaN: true });
    const lon = fc.double({ min: -180, max: 180, noNaN: true });

    fc.assert(
      fc.property(lat, lon, lat, lon, (lat1, lon1, lat2, lon2) => {
        expect(Math.abs(metersOf(lat1, lon1, lat2, lon2) - karneyMeters(lat1, lon1, lat2, lon2))).toBeLessThan(1e-3);
      }),
      { numRuns: 500 },
    );
  });

  it('agrees with an independent solver to a millimetre for nearly opposite places', () => {
    const lat = fc.double({ min: -60, max: 60, noNaN: true });
    const nudge = fc.double({ min: -1.2, max: 1.2, noNaN: true });

    fc.assert(
      fc.property(lat, nudge, nudge, (lat1, north, east) => {
        expect(Math.abs(metersOf(lat1, 10, -lat1 + north, -170 + east) - karneyMeters(lat1, 10, -lat1 + north, -170 + east))).toBeLessThan(1e-3);
      }),
      { numRuns: 40 },
    );
  });

  it('is nothing from a place to itself, and the same there and back over the date line', () => {
    expect(metersOf(40.2, -64, 40.2, -64)).toBe(0);
    expect(metersOf(-17, 179.9, -18, -179.9)).toBeCloseTo(metersOf(-18, -179.9, -17, 179.9), 6);
    expect(metersOf(-17, 179.9, -17, -179.9)).toBeLessThan(22_000);
  });
});
