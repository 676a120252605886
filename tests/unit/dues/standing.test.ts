import { describe, expect, it } from 'vitest';
import { duesOn, standingOf, standingSentence, standingTone, type DuesFacts } from '@/lib/dues/rules/standing';

const club = { locale: 'en-US', currency: 'USD' };
const household: DuesFacts = { isForLife: false, joinedOn: '2016-03-24', leftOn: null, termEnd: '2026-12-31', owedMinor: 6200 };
const sentenceOn = (today: string, facts: Partial<DuesFacts> = {}) => standingSentence(standingOf({ ...household, ...facts }, today, 45), club);

describe('how a household stands', () => {
  // Hand-worked: a calendar-year term to 31 December, kept on for 45 days. CHECKS.md section K, "kept on 45 d".
  it.each([
    ['2026-12-31', 'paid to 31 Dec 2026', 'the last day paid for'],
    ['2027-01-01', 'owing $62.00 since 1 Jan 2027, kept on to 15 Feb 2027', 'the first day owing'],
    ['2027-02-15', 'owing $62.00 since 1 Jan 2027, kept on to 15 Feb 2027', 'the last day kept on'],
    ['2027-02-16', 'owing $62.00 since 1 Jan 2027, lapsed 15 Feb 2027', 'the day after'],
  ])('on %s it says "%s": %s', (today, sentence) => {
    expect(sentenceOn(today)).toBe(sentence);
  });

  it('keeps on over the 29th of February of a leap year by counting days', () => {
    expect(sentenceOn('2028-02-15', { termEnd: '2027-12-31' })).toContain('kept on to 15 Feb 2028');
    expect(standingOf({ ...household, termEnd: '2028-01-31' }, '2028-03-01', 45)).toMatchObject({ kind: 'kept', keptOnTo: '2028-03-17' });
  });

  it('says that a household is a member for life, whatever its terms', () => {
    expect(sentenceOn('2030-06-01', { isForLife: true, termEnd: null })).toBe('for life, since 24 Mar 2016');
  });

  it('says when a household left, from that day on and not before', () => {
    expect(sentenceOn('2026-03-02', { leftOn: '2026-03-03' })).toBe('paid to 31 Dec 2026');
    expect(sentenceOn('2026-03-03', { leftOn: '2026-03-03' })).toBe('left 3 Mar 2026');
  });

  it('says what a household that is joining has to pay', () => {
    expect(sentenceOn('2027-05-01', { termEnd: null })).toBe('joining, $62.00 to pay');
  });

  it('gives the kept and the lapsed their own signs', () => {
    expect(standingTone(standingOf(household, '2027-01-10', 45))).toBe('caution');
    expect(standingTone(standingOf(household, '2027-03-10', 45))).toBe('danger');
    expect(standingTone(standingOf(household, '2026-06-10', 45))).toBe('plain');
  });
});

describe('what a class pays', () => {
  const amounts = [{ fromOn: '2026-01-01', amountMinor: 6200 }, { fromOn: '2020-01-01', amountMinor: 5000 }];

  it.each([['2019-12-31', null], ['2020-01-01', 5000], ['2025-12-31', 5000], ['2026-01-01', 6200]])('on %s it is %s', (on, expected) => {
    expect(duesOn(amounts, on)).toBe(expected);
  });
});
