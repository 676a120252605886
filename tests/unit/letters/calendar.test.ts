import fc from 'fast-check';
import ICAL from 'ical.js';
import { afterEach, describe, expect, it, vi } from 'vitest';
import { fold, mailtoUri, quotedParameter, unfold } from '@/lib/letters/rules/calendar-lines';
import { invitationFile, sequenceOf, uidOf, visitsFile, type CalendarVisit } from '@/lib/letters/rules/calendar';

const club = { name: 'Test Valley Garden Railway Society', email: 'club@testvalley.example', host: 'testvalley.example', timeZone: 'America/New_York' };
const now = new Date('2027-05-01T16:00:00Z');
const aVisit = (changes: Partial<CalendarVisit> = {}): CalendarVisit => ({
  visitId: 'f3c1b9a0-2d44-4c6e-8f5a-90ab12cd34ef', version: 1, startsAt: new Date('2027-05-15T14:00:00Z'), endsAt: new Date('2027-05-15T14:35:00Z'),
  stopNumber: 1, gardenName: 'Saltmarsh & Plover', area: 'by the river', address: null, notes: ['2 adults and 1 child.', 'Code at the gate: 7Q2M XK4D.'], ...changes,
});
const ben = { name: 'Ben Okonjo', email: 'ben+gardens@testvalley.example' };

const componentOf = (file: string) => new ICAL.Component(ICAL.parse(file));
const eventsOf = (file: string) => componentOf(file).getAllSubcomponents('vevent').map((event) => new ICAL.Event(event));
function onlyEvent(file: string) {
  const calendar = componentOf(file);
  ICAL.TimezoneService.reset();
  for (const zone of calendar.getAllSubcomponents('vtimezone')) ICAL.TimezoneService.register(zone);
  const event = calendar.getFirstSubcomponent('vevent');
  if (!event) throw new Error('no event');
  return { calendar, event, read: new ICAL.Event(event) };
}

afterEach(() => {
  vi.unstubAllEnvs();
  ICAL.TimezoneService.reset();
});

describe('a file of visits, read by another program', () => {
  it('holds one event a visit with its own lasting UID, place, times and words', () => {
    const file = visitsFile([aVisit(), aVisit({ visitId: '0b7a2f7e-5b0c-4a58-9d1c-6a1f7f2f0c11', stopNumber: 3, gardenName: 'Pine Barrow' })], club, now);
    const [first, second] = eventsOf(file);

    expect(first?.uid).toBe(uidOf('f3c1b9a0-2d44-4c6e-8f5a-90ab12cd34ef', 'testvalley.example'));
    expect(second?.uid).not.toBe(first?.uid);
    expect(first?.summary).toBe('Saltmarsh & Plover, garden 1');
    expect(first?.location).toBe('by the river');
    expect(first?.description).toBe('2 adults and 1 child.\nCode at the gate: 7Q2M XK4D.');
    expect(first?.startDate.toString()).toBe('2027-05-15T10:00:00');
    expect(first?.endDate.toString()).toBe('2027-05-15T10:35:00');
  });

  it('is a PUBLISH with an organizer and no attendee (RFC 5546 section 3.2.1)', () => {
    const { calendar, event } = onlyEvent(visitsFile([aVisit()], club, now));

    expect(calendar.getFirstPropertyValue('method')).toBe('PUBLISH');
    expect(event.getFirstProperty('organizer')).not.toBeNull();
    expect(event.getFirstProperty('attendee')).toBeNull();
  });

  it('can be empty, for a feed whose visits were all given back', () => {
    expect(eventsOf(visitsFile([], club, now))).toEqual([]);
  });

  it('says the area before the address is released and the address after, with a higher SEQUENCE', () => {
    const [before, after] = [aVisit(), aVisit({ address: '4 Marsh Lane' })];

    expect(onlyEvent(visitsFile([after], club, now)).read.location).toBe('4 Marsh Lane');
    expect(sequenceOf(after)).toBeGreaterThan(sequenceOf(before));
    expect(sequenceOf(aVisit({ version: 2 }))).toBeGreaterThan(sequenceOf(after));
  });
});

describe('an invitation', () => {
  it.each(['REQUEST', 'CANCEL'] as const)('to one visit as %s has what RFC 5546 section 3.2 requires', (method) => {
    const { calendar, event } = onlyEvent(invitationFile(aVisit({ version: 3 }), club, ben, method, now));

    expect(calendar.getFirstPropertyValue('method')).toBe(method);
    expect(calendar.getAllSubcomponents('vevent')).toHaveLength(1);
    for (const required of ['uid', 'dtstamp', 'dtstart', 'sequence', 'organizer', 'attendee', 'summary']) expect(event.getAllProperties(required), required).toHaveLength(1);
    expect(event.getFirstPropertyValue('organizer')).toBe('mailto:club@testvalley.example');
    expect(event.getFirstPropertyValue('attendee')).toBe('mailto:ben+gardens@testvalley.example');
    expect(event.getFirstPropertyValue('sequence')).toBe(6);
    expect(event.getFirstPropertyValue('status')).toBe(method === 'CANCEL' ? 'CANCELLED' : 'CONFIRMED');
    expect(String(event.getFirstPropertyValue('dtstamp'))).toBe('2027-05-01T16:00:00Z');
  });

  it('shows hostile names as text and lets none of them add a line', () => {
    const name = 'Eve "the <script>" \r\nATTENDEE:mailto:x@y.example ^ 🚂 שלום';
    const { event } = onlyEvent(invitationFile(aVisit({ gardenName: 'A,B;C\\D\r\nDTSTART:19700101' }), club, { name, email: '"odd name"@testvalley.example' }, 'REQUEST', now));

    expect(event.getAllProperties('attendee')).toHaveLength(1);
    expect(event.getAllProperties('dtstart')).toHaveLength(1);
    expect(event.getFirstPropertyValue('summary')).toBe('A,B;C\\D\nDTSTART:19700101, garden 1');
    expect(event.getFirstProperty('attendee')?.getParameter('cn')).toContain('🚂 שלום');
    expect(event.getFirstPropertyValue('attendee')).toBe('mailto:%22odd%20name%22@testvalley.example');
  });
});

describe('times over the clock changes of 2027', () => {
  // Offsets from tzdata; the two instants in each row are an hour before and an hour after the change.
  it.each([
    ['America/New_York', '2027-03-14T06:00:00Z', '2027-03-14T01:00:00'], ['America/New_York', '2027-03-14T08:00:00Z', '2027-03-14T04:00:00'],
    ['America/New_York', '2027-11-07T04:00:00Z', '2027-11-07T00:00:00'], ['America/New_York', '2027-11-07T08:00:00Z', '2027-11-07T03:00:00'],
    ['Europe/London', '2027-03-28T00:00:00Z', '2027-03-28T00:00:00'], ['Europe/London', '2027-03-28T02:00:00Z', '2027-03-28T03:00:00'],
    ['Europe/London', '2027-10-30T23:30:00Z', '2027-10-31T00:30:00'], ['Europe/London', '2027-10-31T03:00:00Z', '2027-10-31T03:00:00'],
  ])('%s: %s is read back as the same instant, shown as %s', (timeZone, instant, wall) => {
    const startsAt = new Date(instant);
    vi.stubEnv('TZ', 'America/Los_Angeles'); // the server's own zone must not matter

    const { read } = onlyEvent(visitsFile([aVisit({ startsAt, endsAt: new Date(startsAt.getTime() + 35 * 60_000) })], { ...club, timeZone }, now));

    expect(read.startDate.toString()).toBe(wall);
    expect(read.startDate.toUnixTime() * 1000).toBe(startsAt.getTime());
  });

  it.each(['2027-11-07T05:30:00Z', '2027-11-07T06:30:00Z'])('keeps the two half past ones of 7 November apart: %s', (instant) => {
    const startsAt = new Date(instant);

    const { read } = onlyEvent(visitsFile([aVisit({ startsAt, endsAt: new Date(startsAt.getTime() + 600_000) })], club, now));

    expect(read.startDate.toUnixTime() * 1000).toBe(startsAt.getTime());
  });

  it('gives each TZID its VTIMEZONE (RFC 5545 section 3.6.5)', () => {
    const { calendar, event } = onlyEvent(visitsFile([aVisit()], club, now));
    const zones = calendar.getAllSubcomponents('vtimezone').map((zone) => zone.getFirstPropertyValue('tzid'));

    expect(zones).toContain(event.getFirstProperty('dtstart')?.getParameter('tzid'));
    expect(zones).toHaveLength(1);
  });
});

describe('lines', () => {
  const words = fc.string({ unit: fc.constantFrom('a', 'é', '🚂', '\u0627', ' ', ',', ';', '\\', '\n', '"', ':'), minLength: 0, maxLength: 200 });

  it('are at most 75 octets, never cut inside a character, and come back whole (RFC 5545 section 3.1)', () => {
    fc.assert(
      fc.property(words, words, (name, note) => {
        const file = visitsFile([aVisit({ gardenName: `x${name}`, notes: [`y${note}`] })], club, now);
        const lines = file.split('\r\n');

        expect(lines.every((line) => Buffer.byteLength(line) <= 75)).toBe(true);
        expect(file.endsWith('\r\n')).toBe(true);
        expect(file).not.toMatch(/[^\r]\n|\uFFFD/);
        const [event] = eventsOf(file);
        expect(event?.summary).toBe(`x${name}, garden 1`);
        expect(event?.description).toBe(`y${note}`);
      }),
      { numRuns: 60 },
    );
  });

  it('fold and unfold the standard\'s own example', () => {
    expect(unfold('DESCRIPTION:This is a lo\r\n ng description\r\n  that exists on a long line.\r\n')).toEqual(['DESCRIPTION:This is a long description that exists on a long line.']);
    expect(fold(['A'.repeat(75), 'B'.repeat(76)])).toBe(`${'A'.repeat(75)}\r\n${'B'.repeat(75)}\r\n B\r\n`);
  });

  it('write parameters as RFC 6868 and addresses as RFC 6068 say', () => {
    expect(quotedParameter('Ann "Nan" ^ Fenn\nimore')).toBe('"Ann ^\'Nan^\' ^^ Fenn^nimore"');
    expect(mailtoUri('ben+gardens@testvalley.example')).toBe('mailto:ben+gardens@testvalley.example');
  });
});
