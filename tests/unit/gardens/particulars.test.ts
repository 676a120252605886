import { describe, expect, it } from 'vitest';
import { cautionsOf } from '@/lib/gardens/rules/cautions';
import { accessFacts, curveInWords, drawingInWords, oneLine, powersInWords, railwayFacts, trackSentence, type Particulars } from '@/lib/gardens/rules/particulars';
import { lengthSystemOf, longLength, shortLength } from '@/lib/gardens/rules/particulars-lengths';

const garden: Particulars = {
  scaleOneTo: 22.5, gaugeMm: 45, trackLengthMm: 64_618, minRadiusMm: 1219, steepestGradePercent: 2.38, powers: ['live-steam', 'battery'], setIn: 'a branch line, about 1928',
  begunYear: 1997, isStepFree: true, pathWidthMm: 965, pathSurface: 'gravel, level', stepsNote: null, trackHeightMm: 457, seats: 6, hasToilet: false, dogsNote: null, parkingNote: null,
  water: 'pond', stayMinutes: 35, headsLimit: 28,
};

describe('lengths', () => {
  it.each([[965, 'feet', '38 in'], [965, 'metres', '97 cm'], [457, 'feet', '18 in']] as const)('%s mm in %s is %s', (mm, system, words) => {
    expect(shortLength(mm, system)).toBe(words);
  });

  it.each([[1219, 'feet', '4 ft'], [1372, 'feet', '4 ft 6 in'], [3048, 'feet', '10 ft'], [1219, 'metres', '1.2 m'], [27_000, 'metres', '27 m']] as const)('%s mm along in %s is %s', (mm, system, words) => {
    expect(longLength(mm, system)).toBe(words);
  });

  it('measures in feet where readers do, and in metres elsewhere', () => {
    expect(['en-US', 'en-GB', 'de-DE'].map(lengthSystemOf)).toEqual(['feet', 'metres', 'metres']);
  });
});

describe('particulars in words', () => {
  it('says how long the line is, and what that is in scale miles', () => {
    expect(trackSentence(garden, 'feet')).toBe('212 feet of track, which is 0.9 of a scale mile.');
  });

  it('gives the curve at full size, with its degree only where a chord fits', () => {
    expect(curveInWords(1219, 22.5, 'feet')).toBe('90 ft full size, or 68°');
    expect(curveInWords(600, 20.3, 'feet')).toBe('40 ft full size');
  });

  it('names the usual power first', () => {
    expect(powersInWords(['live-steam', 'battery', 'clockwork'])).toBe('live steam, some battery and clockwork');
    expect(oneLine(garden, 'feet')).toBe('1:22.5, live steam, some battery, 212 feet');
  });

  it('says what the gauge stands for beside the scale', () => {
    expect(railwayFacts(garden)[0]).toEqual({ label: 'scale', words: '1:22.5 on 45 mm track: metre gauge' });
  });

  it('leaves out what a host did not say', () => {
    const labels = accessFacts({ ...garden, pathWidthMm: null, seats: null, trackHeightMm: null }, 'feet').map((fact) => fact.label);

    expect(labels).toEqual(['steps', 'loo']);
  });

  it('tells the drawing to those who cannot see it', () => {
    expect(drawingInWords(garden, 'feet')).toBe('Tightest curve 4 ft radius; steepest climb 1 in 42; path 38 in wide; track 18 in above it; a pond beyond; a grown-up and a child drawn for scale.');
  });

  it('never promises that a garden meets a law', () => {
    const words = accessFacts(garden, 'feet').map((fact) => fact.words).join(' ');

    expect(words).not.toMatch(/compliant|complies|accessible/i);
  });
});

describe('cautions', () => {
  const safe = { powers: ['battery'], water: 'none', waterNote: null, trackHeightMm: 457, isStepFree: true, stepsNote: null, cautions: [] };

  it('always minds children and moving trains', () => {
    expect(cautionsOf(safe)).toEqual([expect.stringContaining('Trains do not see children')]);
  });

  it.each([
    ['a pond', { water: 'pond', waterNote: 'the pond is railed on one side only' }, /^The pond is railed on one side only: keep hold of small children\.$/],
    ['a pond nobody wrote about', { water: 'pond' }, /^There is a pond: keep hold of small children\.$/],
    ['live steam', { powers: ['battery', 'live-steam'] }, /stays hot for an hour/],
    ['power in the rails', { powers: ['track'] }, /low-voltage power/],
    ['a line at ankle height', { trackHeightMm: 200 }, /ankle height/],
    ['steps', { isStepFree: false, stepsNote: 'Two at the gate' }, /^Mind the step: two at the gate\.$/],
  ] as const)('warns of %s', (_, change, words) => {
    expect(cautionsOf({ ...safe, ...change }).some((caution) => words.test(caution))).toBe(true);
  });

  it('keeps the line at exactly a quarter of a metre out of the ankle warning', () => {
    expect(cautionsOf({ ...safe, trackHeightMm: 250 }).some((caution) => /ankle/.test(caution))).toBe(false);
  });

  it('ends with what the host adds, as sentences', () => {
    expect(cautionsOf({ ...safe, cautions: ['the bees are at home'] }).at(-1)).toBe('The bees are at home.');
  });
});
