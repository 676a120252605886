import { createEvents, type EventAttributes } from 'ics';
import { tzlib_get_ical_block } from 'timezones-ical-library';
import { addMinutes, dayOf, wallTime } from '@/lib/core/time';
import { calendarText, fold, mailtoUri, quotedParameter, unfold } from './calendar-lines';

/** One visit as a calendar shows it. `address` is set only for someone who may know it; `version` rises with each change. */
export type CalendarVisit = {
  visitId: string;
  version: number;
  startsAt: Date;
  endsAt: Date;
  stopNumber: number;
  gardenName: string;
  area: string;
  address: string | null;
  /** Plain sentences: people, spoken code, cautions. Each becomes a line. */
  notes: readonly string[];
};

/** Who the calendar comes from: the club's mailbox is the organizer; `host` is the right half of each UID. */
export type CalendarClub = { name: string; email: string; host: string; timeZone: string };

/** The party that an invitation is addressed to. */
export type CalendarGuest = { name: string; email: string };

/** PUBLISH is a plain file to keep; REQUEST and CANCEL are invitations (RFC 5546 section 3.2). */
export type CalendarMethod = 'PUBLISH' | 'REQUEST' | 'CANCEL';

/** A visit's SEQUENCE: it rises with each version, and once more when the address takes the area's place. */
export function sequenceOf({ version, address }: Pick<CalendarVisit, 'version' | 'address'>): number {
  return version * 2 + (address === null ? 0 : 1);
}

/** A visit's UID: the visit's own random id, so that it names nobody (RFC 7986 section 5.3), at the club's host. */
export const uidOf = (visitId: string, host: string): string => `${visitId}@${host}`;

/** One plain file of visits (METHOD PUBLISH): the confirmation's attachment, the download and the private feed. */
export function visitsFile(visits: readonly CalendarVisit[], club: CalendarClub, now: Date): string {
  return calendarFile(visits, club, now, 'PUBLISH', null);
}

/** An invitation to one visit, or its withdrawal: one UID a message (RFC 5546). */
export function invitationFile(visit: CalendarVisit, club: CalendarClub, guest: CalendarGuest, method: 'REQUEST' | 'CANCEL', now: Date): string {
  return calendarFile([visit], club, now, method, guest);
}

function calendarFile(visits: readonly CalendarVisit[], club: CalendarClub, now: Date, method: CalendarMethod, guest: CalendarGuest | null) {
  const zone = zoneBlock(club.timeZone);
  const events = visits.map((visit) => eventOf(visit, club, method));
  const header = { productId: `-//Leafhalt//${club.host}//EN`, method, ...(method === 'PUBLISH' && { calName: calendarText(club.name) }) };
  const { value, error } = createEvents(events, header);
  if (value === null) throw new Error('a calendar could not be written', { cause: error });
  return fold(finish(unfold(value), zone, club, guest, now));
}

function eventOf(visit: CalendarVisit, club: CalendarClub, method: CalendarMethod): EventAttributes {
  return {
    uid: uidOf(visit.visitId, club.host),
    sequence: sequenceOf(visit),
    // Text goes through as it stands; an array would pass through the server's own zone and its clock changes.
    start: wallOrUtc(visit.startsAt, club.timeZone),
    end: wallOrUtc(visit.endsAt, club.timeZone),
    title: calendarText(`${visit.gardenName}, garden ${visit.stopNumber}`),
    location: calendarText(visit.address ?? visit.area),
    description: calendarText(visit.notes.join('\n')),
    status: method === 'CANCEL' ? 'CANCELLED' : 'CONFIRMED',
    classification: 'PRIVATE', // an address is nobody else's business, even in a shared calendar
    transp: 'OPAQUE',
  };
}

/**
 * A wall-clock time, `20270515T103000`. When clocks go back one reading stands for two instants; the standard means
 * the first (RFC 5545 section 3.3.5), but readers differ, so both are written in UTC. Clocks move by 60 or 30 minutes.
 */
function wallOrUtc(at: Date, timeZone: string): string {
  const wall = wallStamp(at, timeZone);
  const isTwice = [-60, -30, 30, 60].some((minutes) => wallStamp(addMinutes(at, minutes), timeZone) === wall);
  return isTwice ? utcStamp(at) : wall;
}

const wallStamp = (at: Date, timeZone: string): string => `${dayOf(at, timeZone).replaceAll('-', '')}T${wallTime(at, timeZone).replace(':', '')}00`;

const utcStamp = (at: Date): string => at.toISOString().replace(/\.\d+/, '').replace(/[-:]/g, '');

/** What the library leaves out: TZID and VTIMEZONE, the stamp of `now`, organizer and attendee with rightly quoted names. */
function finish(lines: readonly string[], zone: { id: string; lines: string[] }, club: CalendarClub, guest: CalendarGuest | null, now: Date): string[] {
  const people = [`ORGANIZER;CN=${quotedParameter(club.name)}:${mailtoUri(club.email)}`];
  if (guest) {
    const name = quotedParameter(guest.name || guest.email);
    people.push(`ATTENDEE;CUTYPE=INDIVIDUAL;ROLE=REQ-PARTICIPANT;PARTSTAT=ACCEPTED;RSVP=FALSE;CN=${name}:${mailtoUri(guest.email)}`);
  }
  const firstEvent = lines.indexOf('BEGIN:VEVENT');
  const before = firstEvent < 0 ? lines.length - 1 : firstEvent;
  return lines.flatMap((line, at) => {
    const head = at === before ? zone.lines : [];
    const local = /^(DTSTART|DTEND):(\d{8}T\d{6})$/.exec(line);
    if (local) return [`${local[1]};TZID=${zone.id}:${local[2]}`];
    if (line.startsWith('DTSTAMP:')) return [`DTSTAMP:${utcStamp(now)}`];
    return line === 'END:VEVENT' ? [...people, line] : [...head, line];
  });
}

/** The zone's VTIMEZONE with the id it goes by; an unknown zone is a setting no club can have saved. */
function zoneBlock(timeZone: string): { id: string; lines: string[] } {
  const block = tzlib_get_ical_block(timeZone)[0];
  const id = /^TZID:(.+)$/m.exec(block ?? '')?.[1]?.trim();
  if (!block || !id) throw new Error(`no calendar time zone is known for ${timeZone}`);
  return { id, lines: unfold(block) };
}
