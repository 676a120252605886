import { describe, expect, it } from 'vitest';
import { addDays, addMinutes, addMonths, dayOf, daysBetween, formatDay, formatInstant, formatTime, instantOf, isDay, minutesBetween, startOfDay, wallTime } from '@/lib/core/time';

const NEW_YORK = 'America/New_York';
const LONDON = 'Europe/London';

describe('the clock changes of 2027', () => {
  // RFC 5545 section 3.3.5: the first of two, and in a gap the offset before it. Offsets of 2027: tzdata 2025c, CHECKS.md section E.
  it.each([
    ['2027-11-07', '01:30', NEW_YORK, '2027-11-07T05:30:00.000Z', 'the first of two half past ones'],
    ['2027-03-14', '02:30', NEW_YORK, '2027-03-14T07:30:00.000Z', 'a half past two that never was: half past three'],
    ['2027-03-14', '01:59', NEW_YORK, '2027-03-14T06:59:00.000Z', 'the minute before the gap'],
    ['2027-03-14', '03:00', NEW_YORK, '2027-03-14T07:00:00.000Z', 'the minute after it'],
    ['2027-03-28', '01:30', LONDON, '2027-03-28T01:30:00.000Z', 'London’s gap, on Easter Sunday'],
    ['2027-10-31', '01:30', LONDON, '2027-10-31T00:30:00.000Z', 'London’s first of two'],
    ['2027-05-15', '10:00', NEW_YORK, '2027-05-15T14:00:00.000Z', 'an ordinary morning'],
  ])('%s %s in %s is %s: %s', (on, time, zone, expected) => {
    expect(instantOf(on, time, zone).toISOString()).toBe(expected);
  });

  it('makes a day of 23 hours in March and one of 25 in November', () => {
    const hours = (on: string) => minutesBetween(startOfDay(on, NEW_YORK), startOfDay(addDays(on, 1), NEW_YORK)) / 60;

    expect([hours('2027-03-14'), hours('2027-11-07'), hours('2027-05-15')]).toEqual([23, 25, 24]);
  });

  it('tells the two half past ones of November by their instants, and writes both alike', () => {
    const first = instantOf('2027-11-07', '01:30', NEW_YORK);
    const second = addMinutes(first, 60);

    expect([wallTime(first, NEW_YORK), wallTime(second, NEW_YORK)]).toEqual(['01:30', '01:30']);
    expect(dayOf(second, NEW_YORK)).toBe('2027-11-07');
  });
});

describe('days', () => {
  it('belong to the club’s zone, not to Greenwich', () => {
    expect(dayOf(new Date('2027-05-16T03:59:00Z'), NEW_YORK)).toBe('2027-05-15');
    expect(dayOf(new Date('2027-05-16T04:00:00Z'), NEW_YORK)).toBe('2027-05-16');
  });

  it.each([['2028-02-29', true], ['2027-02-29', false], ['2027-13-01', false], ['15 May', false], ['2027-5-1', false], ['', false]])('%j is a day: %s', (text, expected) => {
    expect(isDay(text)).toBe(expected);
  });

  it('step by calendar months to the last day there is', () => {
    expect(addMonths('2028-01-31', 1)).toBe('2028-02-29');
    expect(addMonths('2028-02-29', 12)).toBe('2029-02-28');
    expect(daysBetween('2028-02-28', '2028-03-01')).toBe(2);
  });
});

describe('how the club writes', () => {
  const club = { timeZone: NEW_YORK, locale: 'en-US', hourCycle: 'h23' as const };

  it('puts the day before the month in every locale', () => {
    expect(formatDay('2027-05-15', club)).toBe('Saturday 15 May 2027');
    expect(formatDay('2027-05-15', club, 'bare')).toBe('15 May');
    expect(formatDay('2027-12-31', { locale: 'en-GB' }, 'short')).toBe('31 Dec 2027');
  });

  it('writes 24 hours or 12 as the club does', () => {
    const at = new Date('2027-05-15T17:05:00Z');

    expect(formatTime(at, club)).toBe('13:05');
    expect(formatTime(at, { ...club, hourCycle: 'h12' })).toBe('1:05 pm');
    expect(formatInstant(at, club)).toBe('Saturday 15 May 2027, 13:05');
  });

  it('writes midnight as 00:00', () => {
    expect(formatTime(new Date('2027-05-15T04:00:00Z'), club)).toBe('00:00');
  });
});
