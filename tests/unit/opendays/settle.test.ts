import { describe, expect, it } from 'vitest';
import { toSettle } from '@/lib/opendays/rules/settle';

const NOW = new Date('2027-05-01T16:00:00Z');
const day = { slug: 'spring', heldOn: '2027-05-15', closesAt: new Date('2027-05-15T20:00:00Z'), publishedAt: NOW, calledOffAt: null, lettersFailing: 0 };
const time = (taken: number, closedAt: Date | null = null) => ({ capacity: 10, taken, people: taken, closedAt, opensAt: new Date('2027-05-15T14:00:00Z') });
const stop = (...times: ReturnType<typeof time>[]) => ({ number: 3, garden: 'Mossgill', times });
const said = (...args: Parameters<typeof toSettle>) => toSettle(...args).map((each) => each.sentence);

describe('what waits on an open day', () => {
  it('is nothing when it is published and every garden has entry times with room', () => {
    expect(said(day, [stop(time(0), time(8))], NOW)).toEqual([]);
  });

  it('is publishing it, and a first garden', () => {
    expect(said({ ...day, publishedAt: null }, [], NOW)).toEqual(['The day is not published: nobody can see it or book', 'No garden takes part yet']);
  });

  it('is a garden without entry times, with the link to make them', () => {
    expect(toSettle(day, [stop()], NOW)).toMatchObject([{ by: '2027-05-15', sentence: 'Mossgill has no entry times', href: '/office/open-days/spring/stops/3' }]);
  });

  it.each([
    { taken: 8, waits: [], because: 'eight of ten is not nearly full' },
    { taken: 9, waits: ['Mossgill: 1 entry time is full or nearly so'], because: 'nine of ten is' },
    { taken: 10, waits: ['Mossgill: 1 entry time is full or nearly so'], because: 'ten of ten is full' },
  ])('counts a time as nearly full from nine in ten on: $because', ({ taken, waits }) => {
    expect(said(day, [stop(time(taken))], NOW)).toEqual(waits);
  });

  it('is a closed time, which is not counted as full too', () => {
    expect(said(day, [stop(time(10, NOW), time(2, NOW))], NOW)).toEqual(['Mossgill: 2 entry times are closed to new parties']);
  });

  it('is letters that fail, first of all and even when the day is over or called off', () => {
    const failing = { ...day, lettersFailing: 1 };

    expect(toSettle(failing, [stop()], NOW)[0]).toMatchObject({ by: null, sentence: '1 letter has not been delivered yet' });
    expect(said(failing, [stop()], new Date('2027-05-15T20:00:00Z'))).toEqual(['1 letter has not been delivered yet']);
    expect(said({ ...failing, calledOffAt: NOW }, [stop()], NOW)).toEqual(['1 letter has not been delivered yet']);
  });
});
