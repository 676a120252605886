import { existsSync, readFileSync } from 'node:fs';
import { resolve } from 'node:path';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { decimalText, formatMoney, formatPrice, minorDigits, parseMoney, percentOfMinor, splitMinor, sumMinor } from '@/lib/core/money';

const LIST = resolve('..', 'shared', 'data', 'iso4217_codes-all.csv');

describe('minor units', () => {
  it.skipIf(!existsSync(LIST))('are those of ISO 4217 for every current code (list of 2026-02; skipped where the shared data folder is absent)', () => {
    const [head = '', ...lines] = readFileSync(LIST, 'utf8').trim().split(/\r?\n/);
    const columns = head.split(',');
    const [codeAt, unitAt, goneAt] = [columns.indexOf('AlphabeticCode'), columns.indexOf('MinorUnit'), columns.indexOf('WithdrawalDate')];
    const current = lines.map(cells).filter((row) => row[codeAt] !== '' && row[goneAt] === '' && /^\d$/.test(row[unitAt] ?? ''));

    const wrong = current.filter((row) => minorDigits(row[codeAt] ?? '') !== Number(row[unitAt]));

    expect(current.length).toBeGreaterThan(150);
    expect(wrong).toEqual([]);
  });
});

/** The cells of one CSV line, quotes taken off. */
const cells = (line: string): string[] => [...line.matchAll(/("([^"]*)"|[^,]*)(,|$)/g)].map((match) => match[2] ?? match[1] ?? '');

describe('rounding and splitting', () => {
  it.each([[1250, 50, 625], [1255, 50, 628], [1, 50, 1], [1, 49, 0], [333, 100, 333], [800, 0, 0]])('%d at %d percent is %d, a half going to the payer', (amount, percent, expected) => {
    expect(percentOfMinor(amount, percent)).toBe(expected);
  });

  // CHECKS.md section G, "Largest remainder": computed independently.
  it.each([
    [10000, [1, 1, 1], [3334, 3333, 3333]],
    [7, [50, 30, 20], [4, 2, 1]],
    [1000, [1, 2, 3, 5], [91, 182, 273, 454]],
    [100, [1, 1, 1, 1, 1, 1, 1], [15, 15, 14, 14, 14, 14, 14]],
    [2500, [180, 70, 45], [1526, 593, 381]],
  ])('%d by %j is %j', (amount, weights, expected) => {
    expect(splitMinor(amount, weights)).toEqual(expected);
  });

  it('splits without losing or making a cent', () => {
    fc.assert(fc.property(fc.integer({ min: 0, max: 10_000_000 }), fc.array(fc.integer({ min: 1, max: 5000 }), { minLength: 1, maxLength: 12 }), (amount, weights) => {
      expect(sumMinor(splitMinor(amount, weights))).toBe(amount);
    }));
  });
});

describe('writing and reading amounts', () => {
  it.each([
    [6000, 'USD', 'en-US', '$60.00'], [1200, 'JPY', 'en-US', '¥1,200'], [100500, 'USD', 'en-US', '$1,005.00'], [-1250, 'USD', 'en-US', '-$12.50'],
    [1500, 'ISK', 'en-US', 'ISK 1,500'], [12345, 'KWD', 'en-US', 'KWD 12.345'], [500, 'HUF', 'en-US', 'HUF 5.00'],
  ])('%d %s in %s is %s', (amountMinor, currency, locale, expected) => {
    expect(formatMoney({ amountMinor, currency }, locale).replace(/\u00a0/g, ' ')).toBe(expected);
  });

  it('leaves out a fraction of nought in a sentence, and no other', () => {
    expect(formatPrice({ amountMinor: 800, currency: 'USD' }, 'en-US')).toBe('$8');
    expect(formatPrice({ amountMinor: 450, currency: 'USD' }, 'en-US')).toBe('$4.50');
  });

  it.each([['62', 6200], ['62.5', 6250], [' $1,062.50 ', 106250], ['0', 0], ['1.005', null], ['-5', null], ['1e3', null], ['', null], ['five', null], ['1,2', null], ['62.', null]])('reads %j as %j', (typed, expected) => {
    expect(parseMoney(typed, 'USD')).toBe(expected);
  });

  it('reads back every amount that it writes', () => {
    fc.assert(fc.property(fc.integer({ min: 0, max: 99_999_999 }), fc.constantFrom('USD', 'JPY', 'KWD'), (amountMinor, currency) => {
      expect(parseMoney(decimalText(amountMinor, minorDigits(currency)), currency)).toBe(amountMinor);
    }));
  });
});
