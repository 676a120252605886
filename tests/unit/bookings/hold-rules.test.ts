import { describe, expect, it } from 'vitest';
import { dayRefusal, entryRefusal, holdRefusal, keptLonger, keptUntil, priced, type EntryFacts } from '@/lib/bookings/rules/hold';
import { headsOf, partyRefusal, peopleLeft } from '@/lib/bookings/rules/party';
import { priceChange, standingRefusal } from '@/lib/bookings/rules/change';
import { holdStateOf } from '@/lib/bookings/views';
import { newId } from '@/lib/core/ids';
import { addMinutes } from '@/lib/core/time';

const noon = new Date('2027-05-15T16:00:00Z');
const openDayId = newId<'openDay'>();
const entry = (changes: Partial<EntryFacts> = {}): EntryFacts => ({
  entryTimeId: newId<'entryTime'>(), openDayId, gardenId: newId<'garden'>(), gardenName: 'Pine Barrow', opensAt: noon, graceUntil: addMinutes(noon, 20), closedAt: null, stopClosedAt: null,
  stayMinutes: 35, adultMinor: 800, childMinor: 400, babeMinor: 0, ...changes,
});
const day = { openDayId, publishedAt: addMinutes(noon, -1000), calledOffAt: null, partyPeopleMax: null };
const limits = { partyPeopleMax: 9, partyVisitsMax: 2 };
const two = { adults: 2, children: 0, babes: 0 };

describe('a party', () => {
  it.each([
    [{ adults: 1, children: 0, babes: 0 }, null], [{ adults: 9, children: 0, babes: 0 }, null], [{ adults: 8, children: 1, babes: 1 }, 'party_too_large'],
    [{ adults: 0, children: 0, babes: 0 }, 'nobody_in_party'], [{ adults: 0, children: 1, babes: 0 }, 'child_needs_adult'], [{ adults: 0, children: 0, babes: 1 }, 'child_needs_adult'],
  ])('of %o may come: %s', (people, refusal) => {
    expect(partyRefusal(people, 9)).toBe(refusal);
  });

  it('takes a place for a babe in arms only where the club says so', () => {
    expect([headsOf({ adults: 2, children: 1, babes: 1 }, false), headsOf({ adults: 2, children: 1, babes: 1 }, true)]).toEqual([3, 4]);
  });

  it.each([
    [{ adults: 1, children: 0, babes: 0 }, { left: { adults: 1, children: 1, babes: 0 } }],
    [{ adults: 2, children: 1, babes: 0 }, { left: { adults: 0, children: 0, babes: 0 } }],
    [{ adults: 2, children: 0, babes: 0 }, { refusal: 'child_needs_adult' }],
    [{ adults: 3, children: 0, babes: 0 }, { refusal: 'more_than_booked' }],
    [{ adults: 0, children: 0, babes: 0 }, { refusal: 'nobody_in_party' }],
  ])('of two adults and a child gives back %o', (back, answer) => {
    expect(peopleLeft({ adults: 2, children: 1, babes: 0 }, back)).toEqual(answer);
  });
});

describe('an entry time', () => {
  it('may be asked for until its grace ends, which is too late', () => {
    expect(entryRefusal(entry(), addMinutes(noon, 19))).toBeNull();
    expect(entryRefusal(entry(), addMinutes(noon, 20))).toBe('entry_time_over');
  });

  it('is closed with its stop', () => {
    expect(entryRefusal(entry({ stopClosedAt: noon }), noon)).toBe('entry_time_closed');
    expect(entryRefusal(entry({ closedAt: noon }), noon)).toBe('entry_time_closed');
  });

  it('belongs to a day that is published and not called off', () => {
    expect(dayRefusal({ publishedAt: noon, calledOffAt: null }, noon)).toBeNull();
    expect(dayRefusal({ publishedAt: addMinutes(noon, 1), calledOffAt: null }, noon)).toBe('open_day_not_open');
    expect(dayRefusal({ publishedAt: null, calledOffAt: null }, noon)).toBe('open_day_not_open');
    expect(dayRefusal({ publishedAt: noon, calledOffAt: noon }, noon)).toBe('called_off');
  });
});

describe('what a party wants', () => {
  const wanting = (...entries: EntryFacts[]) => holdRefusal(day, entries, entries.map(({ entryTimeId }) => ({ entryTimeId, ...two })), limits, noon);

  it('is granted up to the club’s limit of visits', () => {
    expect(wanting(entry(), entry())).toBeNull();
    expect(wanting(entry(), entry(), entry())).toBe('too_many_for_day');
  });

  it('is refused when a time was not found or is another day’s', () => {
    expect(holdRefusal(day, [], [{ entryTimeId: newId(), ...two }], limits, noon)).toBe('not_found');
    expect(wanting(entry({ openDayId: newId() }))).toBe('wrong_open_day');
  });

  it('obeys the open day’s own limit of people before the club’s', () => {
    const asked = entry();
    expect(holdRefusal({ ...day, partyPeopleMax: 1 }, [asked], [{ entryTimeId: asked.entryTimeId, ...two }], limits, noon)).toBe('party_too_large');
  });

  it('costs what the entry times say and nothing else', () => {
    const [a, b] = [entry(), entry({ adultMinor: 1000 })];
    const { visits, totalMinor } = priced([a, b].map(({ entryTimeId }) => ({ entryTimeId, adults: 2, children: 1, babes: 1 })), [a, b], false);

    expect(totalMinor).toBe(2 * 800 + 400 + 2 * 1000 + 400);
    expect(visits.map((visit) => visit.heads)).toEqual([3, 3]);
  });
});

describe('how long places are kept', () => {
  const hold = { madeAt: noon, heldUntil: keptUntil(noon, 10) };

  it('is the club’s time, and that again when asked, up to half an hour', () => {
    expect(keptLonger(hold, addMinutes(noon, 3), 10)).toEqual(addMinutes(noon, 20));
    expect(keptLonger({ madeAt: noon, heldUntil: addMinutes(noon, 25) }, addMinutes(noon, 20), 10)).toEqual(addMinutes(noon, 30));
    expect(keptLonger({ madeAt: noon, heldUntil: addMinutes(noon, 30) }, addMinutes(noon, 20), 10)).toBeNull();
  });

  const facts = { confirmedAt: null, releasedAt: null, heldUntil: addMinutes(noon, 10), hasOpenAttempt: false, wasPaid: false };
  it.each([
    ['kept a moment before its end', facts, 9.99, 'kept'], ['over at its end', facts, 10, 'over'], ['paying while a payment is open', { ...facts, hasOpenAttempt: true }, 5, 'paying'],
    ['over while a payment is being ended', { ...facts, hasOpenAttempt: true }, 10, 'over'], ['confirmed whatever else is so', { ...facts, confirmedAt: noon, wasPaid: true }, 99, 'confirmed'],
    ['too late when money came and the places were gone', { ...facts, releasedAt: noon, wasPaid: true }, 99, 'too-late'], ['over when given back', { ...facts, releasedAt: noon }, 1, 'over'],
  ] as const)('is %s', (_what, hold, minutes, state) => {
    expect(holdStateOf(hold, addMinutes(noon, minutes))).toBe(state);
  });
});

describe('a visit that someone would change', () => {
  const visit = { ...two, adultMinor: 800, childMinor: 400, babeMinor: 0, version: 3, givenBackAt: null, cameIn: false };

  it('must be as the party saw it, live and not used at the gate', () => {
    expect(standingRefusal(visit, 3)).toBeNull();
    expect(standingRefusal(visit, 2)).toBe('changed_meanwhile');
    expect(standingRefusal({ ...visit, cameIn: true }, 3)).toBe('already_came_in');
    expect(standingRefusal({ ...visit, givenBackAt: noon }, 3)).toBe('already_given_back');
  });

  it('moves to the same or a lower price, and what it costs less is told', () => {
    expect(priceChange(two, visit, { ...visit, adultMinor: 800 })).toEqual({ lessMinor: 0 });
    expect(priceChange(two, visit, { ...visit, adultMinor: 500 })).toEqual({ lessMinor: 600 });
    expect(priceChange(two, visit, { ...visit, adultMinor: 801 })).toEqual({ refusal: 'dearer' });
  });
});
