import { describe, expect, it } from 'vitest';
import { degreeOfCurve, gradientInWords, modelFeetPerMinute, prototypeRadiusFeet, scaleMiles, scaleMph, standsFor } from '@/lib/gardens/rules/scale-sums';

const MM_PER_FOOT = 304.8;

describe('what a gauge stands for', () => {
  // Prototype gauge ÷ scale = model gauge, exact division; pairings in use as in NEM 010 (2011) and NMRA usage.
  it.each([
    [45, 20.32, '3 ft gauge', 'exact'],
    [45, 20.3, '3 ft gauge', 'exact'],
    [45, 22.5, 'metre gauge', 'exact'],
    [45, 24, '3 ft 6 in gauge', 'exact'],
    [45, 32, 'standard gauge', 'exact'],
    [44.45, 32, 'standard gauge', 'exact'], // gauge 1 is 1.75 in or 45 mm: both are one gauge (the 1909 and metric definitions)
    [45, 29, 'standard gauge', 'near'], // 1305 mm: run on 45 by custom, a tenth narrow
    [45, 13.7, '2 ft gauge', 'exact'],
    [32, 19.05, '2 ft gauge', 'exact'],
    [63.5, 22.5, 'standard gauge', 'exact'],
  ] as const)('%s mm at 1:%s stands for %s, %s', (gaugeMm, scale, name, fit) => {
    expect(standsFor(gaugeMm, scale)).toMatchObject({ name, fit });
  });

  it('names nothing when no full-size gauge is within a tenth', () => {
    expect(standsFor(32, 16)).toBeNull(); // 512 mm
  });
});

describe('scale miles', () => {
  // 5280 ft ÷ scale: 1:32 165.00 ft, 1:24 220.00 ft, 1:22.5 234.67 ft (exact division).
  it.each([[165, 32], [220, 24], [5280 / 22.5, 22.5]])('%s ft of track is one scale mile at 1:%s', (feet, scale) => {
    expect(scaleMiles(feet * MM_PER_FOOT, scale)).toBeCloseTo(1, 6);
  });

  it('makes a 330 ft main line two scale miles at 1:32', () => {
    expect(scaleMiles(330 * MM_PER_FOOT, 32)).toBeCloseTo(2, 6);
  });
});

describe('curves', () => {
  // NMRA S-8, prototype radii by degree: 5° 1146, 10° 574, 15° 383, 20° 288, 25° 231, 30° 193, 35° 166, 40° 146, 45° 131 ft.
  it.each([[5, 1146.28], [10, 573.69], [15, 383.06], [20, 287.94], [25, 231.01], [30, 193.19], [35, 166.28], [40, 146.19], [45, 130.66]])(
    'a %s° curve has a radius of %s ft by the chord', (degrees, feet) => {
      expect(degreeOfCurve(feet)).toBeCloseTo(degrees, 2);
    });

  it('a 250 ft radius is 23.07°', () => {
    expect(degreeOfCurve(250)).toBeCloseTo(23.07, 2);
  });

  // Model radius in feet, scale, degree at full size (computed from R = 50 ÷ sin(D ÷ 2)).
  it.each([[5, 20.3, 59.0], [5, 32, 36.4], [10, 20.3, 28.5], [10, 32, 18.0], [20, 20.3, 14.1], [20, 32, 9.0]])(
    'a %s ft garden curve at 1:%s is %s° at full size', (feet, scale, degrees) => {
      expect(degreeOfCurve(prototypeRadiusFeet(feet * MM_PER_FOOT, scale))).toBeCloseTo(degrees, 1);
    });

  it('has no degree under a radius of 50 ft, and 180° at exactly 50', () => {
    expect(degreeOfCurve(prototypeRadiusFeet(2 * MM_PER_FOOT, 20.3))).toBeUndefined(); // 40.6 ft
    expect(degreeOfCurve(49.99)).toBeUndefined();
    expect(degreeOfCurve(50)).toBeCloseTo(180, 6);
  });
});

describe('gradients', () => {
  it.each([[2, '1 in 50'], [2.5, '1 in 40'], [3, '1 in 33'], [4, '1 in 25'], [2.38, '1 in 42'], [0, 'level']])('%s % is posted as %s', (percent, words) => {
    expect(gradientInWords(percent)).toBe(words);
  });
});

describe('scale speed', () => {
  // ft/min = mph × 88 ÷ scale.
  it.each([[30, 20.3, 130.05], [30, 22.5, 117.33], [30, 24, 110], [30, 29, 91.03], [30, 32, 82.5], [60, 32, 165]])('%s mph at 1:%s runs %s ft a minute', (mph, scale, feet) => {
    expect(modelFeetPerMinute(mph, scale)).toBeCloseTo(feet, 2);
    expect(scaleMph(feet, scale)).toBeCloseTo(mph, 1);
  });
});
