import { describe, expect, it } from 'vitest';
import { fits, isNarrowed, powersOf, scalesOf } from '@/lib/gardens/rules/filters';
import { gardenFilters } from '@/lib/gardens/schema';
import { POWERS } from '@/lib/core/words';

const read = (query: Record<string, string | string[]>) => gardenFilters.parse(query);
const garden = { scaleOneTo: 22.5, powers: ['live-steam', 'battery'], isStepFree: true, placesLeft: 5 };

describe('the address of the gardens page', () => {
  it('asks for nothing when it is bare, or its boxes are empty', () => {
    const nothing = { scale: null, runs: null, access: null, day: null, places: null };

    expect(read({})).toEqual(nothing);
    expect(read({ scale: '', runs: '', day: '', places: '' })).toEqual(nothing);
  });

  it('reads what the form sends', () => {
    expect(read({ scale: '22.5', runs: 'live-steam', access: 'step-free', day: 'spring-2027', places: '3' })).toEqual({ scale: 22.5, runs: 'live-steam', access: 'step-free', day: 'spring-2027', places: 3 });
  });

  it.each([
    [{ scale: 'G' }], [{ runs: 'nuclear' }], [{ access: 'yes' }], [{ day: '../office' }], [{ places: '0' }], [{ places: '-1' }], [{ places: '1e9' }], [{ places: '3.5' }], [{ day: '<script>' }],
  ])('leaves out what makes no sense: %j', (query) => {
    expect(isNarrowed(read(query))).toBe(false);
  });

  it('takes the first of a value that is given twice', () => {
    expect(read({ places: ['4', '9'] }).places).toBe(4);
  });
});

describe('which gardens are shown', () => {
  it.each([
    ['everything', {}, true],
    ['its scale', { scale: '22.5' }, true],
    ['another scale', { scale: '20.3' }, false],
    ['its second power', { runs: 'battery' }, true],
    ['a power it has not', { runs: 'overhead' }, false],
    ['step-free', { access: 'step-free' }, true],
    ['exactly as many places as it has', { places: '5' }, true],
    ['one place more', { places: '6' }, false],
    ['a day in which it takes part', { day: 'spring-2027' }, true],
  ] as const)('a garden with 5 places, asked for %s', (_, query, isShown) => {
    expect(fits(garden, read({ ...query }))).toBe(isShown);
  });

  it('hides a resting garden when a day or places are asked for, and only then', () => {
    const resting = { ...garden, placesLeft: null };

    expect([{}, { day: 'spring-2027' }, { places: '1' }].map((query) => fits(resting, read(query)))).toEqual([true, false, false]);
  });

  it('hides a garden with steps when step-free is asked for', () => {
    expect(fits({ ...garden, isStepFree: false }, read({ access: 'step-free' }))).toBe(false);
  });

  it('offers each scale once, in order, and only powers that somebody runs', () => {
    expect(scalesOf([{ scaleOneTo: 29 }, { scaleOneTo: 20.3 }, { scaleOneTo: 29 }])).toEqual([20.3, 29]);
    expect(powersOf([garden], POWERS)).toEqual(['live-steam', 'battery']);
  });
});
