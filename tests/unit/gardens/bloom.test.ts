import { describe, expect, it } from 'vitest';
import { bloomBars, bloomInWords, inFlower, isJustOpen, shareOfYear } from '@/lib/gardens/rules/bloom';

// Flowering months as northern garden books give them (common practice, no single source).
const thyme = { name: 'thyme', bloomMonths: [5, 6, 7] };
const thrift = { name: 'thrift', bloomMonths: [4, 5, 6] };
const heather = { name: 'winter heath', bloomMonths: [11, 12, 1, 2, 3] };
const spruce = { name: 'spruce', bloomMonths: [] };
const garden = [thyme, thrift, heather, spruce];

describe('what is in flower', () => {
  it.each([
    ['2027-05-15', ['thyme', 'thrift']],
    ['2027-04-30', ['thrift']],
    ['2027-07-31', ['thyme']],
    ['2027-08-01', []],
    ['2027-12-31', ['winter heath']],
    ['2027-01-01', ['winter heath']],
  ])('on %s: %j', (on, names) => {
    expect(inFlower(garden, on).map((plant) => plant.name)).toEqual(names);
  });

  it('calls a plant just open only in the first month of its flowering, also over the new year', () => {
    expect(isJustOpen(thyme, '2027-05-02')).toBe(true);
    expect(isJustOpen(thyme, '2027-06-02')).toBe(false);
    expect(isJustOpen(heather, '2027-11-20')).toBe(true);
    expect(isJustOpen(heather, '2027-01-20')).toBe(false);
  });
});

describe('the chart', () => {
  it('draws one bar for months in a row and two for a flowering over the new year', () => {
    expect(bloomBars([7, 5, 6])).toEqual([{ from: 5, to: 7 }]);
    expect(bloomBars(heather.bloomMonths)).toEqual([{ from: 1, to: 3 }, { from: 11, to: 12 }]);
  });

  it('draws nothing for a plant without flowers, and ignores months that do not exist', () => {
    expect(bloomBars([])).toEqual([]);
    expect(bloomBars([0, 13])).toEqual([]);
  });

  it('puts the middle of May in the middle of the fifth column', () => {
    expect(shareOfYear('2027-05-16')).toBeCloseTo(4.5 / 12, 3);
  });

  it('stays inside the chart on the first and the last day of the year', () => {
    expect(shareOfYear('2027-01-01')).toBeGreaterThan(0);
    expect(shareOfYear('2027-12-31')).toBeLessThan(1);
  });

  it.each([
    [[5, 6, 7], 'May to July'],
    [[10], 'October'],
    [[4, 5, 9, 10], 'April to May, September to October'],
    [[11, 12, 1, 2, 3], 'November to March'],
    [[1, 2, 3, 4, 5, 6, 7, 8, 9, 10, 11, 12], 'all year'],
    [[], 'no flower'],
  ])('says %j as "%s"', (months, words) => {
    expect(bloomInWords(months)).toBe(words);
  });
});
