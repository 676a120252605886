import { refundRuleForAll, type RefundRule } from '@/lib/bookings/rules/refund';
import { showSpokenCode } from '@/lib/bookings/rules/spoken-code';
import { formatMoney } from '@/lib/core/money';
import { dayOf, formatDay, formatTime, wallTime, type ClubTime } from '@/lib/core/time';
import { counted, inWords, listed } from '@/lib/opendays/rules/words';
import type { Block, DayVisit, Inline, Letter, TimetableRow } from './letter';

/** The club as its letters need it. */
export type LetterClub = ClubTime & RefundRule & { name: string; footLine: string; email: string; currency: string; addressReleaseHours: number };

/** One visit of a letter. `address` is there only when this letter may say it. */
export type LetterVisit = {
  visitId: string; version: number; stopNumber: number; gardenName: string; shortName: string; area: string; address: string | null; directions: string | null;
  arrivesAt: Date; leavesAt: Date; graceUntil: Date; adults: number; children: number; babes: number; isGivenBack: boolean;
  isSteam: boolean; hasWater: boolean; isStepFree: boolean; stepsNote: string | null; cautions: string[];
  /** Minutes by road from the visit before, as this party may know them. */
  minutesFromLast: number | null;
};

/** A booking as its letters need it, as it stands when the letter is sent. `link` opens the booking's own page. */
export type BookingFacts = {
  code: string; madeAt: Date; totalMinor: number; heldOn: string; title: string; placeLine: string; releasesAt: Date;
  isCancelled: boolean; emailIsConfirmed: boolean; wantsInvitations: boolean; visits: LetterVisit[]; link: string;
};

/** "2 adults, 1 child and 1 babe in arms". */
export function peopleWords({ adults, children, babes }: Pick<LetterVisit, 'adults' | 'children' | 'babes'>): string {
  const parts = [adults && counted(adults, 'adult', 'adults'), children && counted(children, 'child', 'children'), babes && counted(babes, 'babe in arms', 'babes in arms')];
  return listed(parts.filter((part) => typeof part === 'string'));
}

const alive = (booking: BookingFacts) => booking.visits.filter((visit) => !visit.isGivenBack);
const gardensWords = (visits: readonly LetterVisit[]) => `${inWords(visits.length)} ${visits.length === 1 ? 'garden' : 'gardens'}`;
const dayLine = (booking: BookingFacts, club: LetterClub) => `${formatDay(booking.heldOn, club)}, ${booking.placeLine}`;
const spoken = (booking: BookingFacts): Inline => ({ code: showSpokenCode(booking.code) });

/** The places are theirs: the day at a glance, the code, what to do if it rains or plans change. */
export function confirmationLetter(booking: BookingFacts, club: LetterClub): Letter {
  const visits = alive(booking);
  const cost = booking.totalMinor === 0 ? 'They cost nothing.' : `${formatMoney({ amountMinor: booking.totalMinor, currency: club.currency }, club.locale)} is paid.`;
  return {
    clubName: club.name, subject: `Your day in ${gardensWords(visits)}, ${formatDay(booking.heldOn, club)}`,
    title: `Your day in\n${gardensWords(visits)}`, line: dayLine(booking, club),
    preview: `${spanWords(visits, club)}. Your tickets open without a signal once you have looked at them.`,
    lead: [{ kind: 'paragraph', parts: [`Places are yours: ${everyoneWords(visits)}. ${cost} If a phone fails, say this at the gate: `, spoken(booking), '.'] }],
    body: [...dayBlocks(visits, club), ...ticketBlocks(booking, visits, club), ...lastWords(booking, visits, club)],
    foot: `Sent because you booked on ${formatDay(dayOf(booking.madeAt, club.timeZone), club, 'bare')}${booking.madeAt < booking.releasesAt ? '; one reminder follows' : ''}. Leafhalt`,
  };
}

/** A time or the people of a visit changed. */
export function changeLetter(booking: BookingFacts, facts: { was: readonly string[]; refundMinor: number; reason?: string | undefined }, club: LetterClub): Letter {
  const visits = alive(booking);
  return {
    clubName: club.name, subject: `Changed: your day on ${formatDay(booking.heldOn, club)}`, title: 'Your day has changed', line: dayLine(booking, club),
    preview: `${spanWords(visits, club)}. The new times are inside.`,
    lead: [{ kind: 'paragraph', parts: [...wasParts(facts.was), 'The table says how it stands now. Your code stays the same: ', spoken(booking), '.', ...reasonParts(facts.reason), ...moneyParts(facts.refundMinor, club)] }],
    body: [...dayBlocks(visits, club), ...ticketBlocks(booking, visits, club), ...lastWords(booking, visits, club)],
    foot: 'Sent because a visit of yours was changed. Leafhalt',
  };
}

/** People or whole visits were given back. */
export function givenBackLetter(booking: BookingFacts, facts: { was: readonly string[]; refundMinor: number; reason?: string | undefined }, club: LetterClub): Letter {
  const visits = alive(booking);
  const isWhole = visits.length === 0;
  const rest: Block[] = isWhole ? [] : [...dayBlocks(visits, club), ...ticketBlocks(booking, visits, club), ...lastWords(booking, visits, club)];
  return {
    clubName: club.name, subject: `Given back: ${formatDay(booking.heldOn, club)}`, title: isWhole ? 'Your places are given back' : 'Places given back', line: dayLine(booking, club),
    preview: isWhole ? 'Someone else can come. Thank you for telling us.' : 'What you keep is inside.',
    lead: [{ kind: 'paragraph', parts: [`Given back: ${listed(facts.was) || 'your places'}. Thank you for telling us: someone else can come.`, ...reasonParts(facts.reason), ...moneyParts(facts.refundMinor, club)] }],
    body: isWhole ? [{ kind: 'paragraph', parts: [`If that was not you, answer this letter and we will look at once.`] }] : rest,
    foot: 'Sent because places of yours were given back. Leafhalt',
  };
}

/** The day is near. A confirmed e-mail is told the addresses; another only gets the link that confirms it. */
export function reminderLetter(booking: BookingFacts, club: LetterClub): Letter {
  const visits = alive(booking);
  const mayKnow = booking.emailIsConfirmed;
  const link: Block[] = [
    { kind: 'paragraph', parts: ['The gardens’ addresses are ready for you. Open this link and press the button there, so that we know this letter reached you.'] },
    { kind: 'button', label: 'Open your tickets and addresses', href: booking.link },
  ];
  return {
    clubName: club.name, subject: `Your day in ${gardensWords(visits)} is near: ${formatDay(booking.heldOn, club)}`, title: `See you on ${formatDay(booking.heldOn, club, 'weekday')}`,
    line: dayLine(booking, club), preview: mayKnow ? `${spanWords(visits, club)}. Addresses are inside.` : 'Open the link for your tickets and the addresses.',
    lead: mayKnow ? [{ kind: 'paragraph', parts: [`${everyoneWords(visits)}. Say this at the gate if a phone fails: `, spoken(booking), '. Please keep the addresses to yourselves.'] }] : [],
    body: mayKnow ? [...dayBlocks(visits, club), ...ticketBlocks(booking, visits, club), ...lastWords(booking, visits, club)] : link,
    foot: 'The one reminder we send. Leafhalt',
  };
}

/** One visit for the party's calendar, or taken out of it. */
export function calendarLetter(booking: BookingFacts, visit: LetterVisit, club: LetterClub): Letter {
  const when = `${formatDay(booking.heldOn, club)}, ${formatTime(visit.arrivesAt, club)}`;
  const isOff = visit.isGivenBack || booking.isCancelled;
  const words = isOff ? 'This visit is given back. Your calendar can take it out.' : 'For your calendar: accept it there, or simply keep this letter.';
  return {
    clubName: club.name, subject: `${isOff ? 'Given back: ' : ''}${visit.gardenName}, ${when}`, title: visit.gardenName, line: when,
    preview: words, lead: [{ kind: 'paragraph', parts: [words] }],
    body: isOff ? [] : [{ kind: 'timetable', rows: [rowOf(visit, null, club)] }],
    foot: 'Sent because you asked for invitations to your calendar. Leafhalt',
  };
}

/** The lines under an event in a calendar: people, code, what to mind. */
export function calendarNotes(visit: LetterVisit, code: string, club: LetterClub): string[] {
  const address = visit.address === null ? `The address comes ${releaseWords(club)} before.` : visit.directions;
  const notes = [`${peopleWords(visit)}. In by ${formatTime(visit.graceUntil, club)}.`, `Code at the gate: ${showSpokenCode(code)}.`, address, careSentence([visit])];
  return notes.flatMap((note) => (note ? [note] : []));
}

const everyoneWords = (visits: readonly LetterVisit[]) => {
  const each = [...new Set(visits.map(peopleWords))];
  return each.length === 1 ? (each[0] ?? '') : listed(visits.map((visit) => `${peopleWords(visit)} at ${visit.shortName}`));
};

function spanWords(visits: readonly LetterVisit[], club: ClubTime): string {
  const [first, last] = [visits[0], visits.at(-1)];
  return first && last ? `${gardensWords(visits)}, ${formatTime(first.arrivesAt, club)} to ${formatTime(last.leavesAt, club)}`.replace(/^./, (letter) => letter.toUpperCase()) : '';
}

const wasParts = (was: readonly string[]): Inline[] => (was.length === 0 ? [] : [`Before: ${listed(was)}. `]);
const reasonParts = (reason: string | undefined): Inline[] => (reason ? [` The coordinator writes: ${reason}`] : []);
const moneyParts = (minor: number, club: LetterClub): Inline[] =>
  minor === 0 ? [] : [` ${formatMoney({ amountMinor: minor, currency: club.currency }, club.locale)} is on its way back the way you paid.`];

/** The timetable, and from two gardens on the day as a line. */
function dayBlocks(visits: readonly LetterVisit[], club: LetterClub): Block[] {
  if (visits.length === 0) return [];
  const rows = visits.map((visit, at) => rowOf(visit, visits[at + 1] ?? null, club));
  const drawn: DayVisit[] = visits.map((visit) => ({ stopNumber: visit.stopNumber, name: visit.shortName, arrives: minutesOfDay(visit.arrivesAt, club), leaves: minutesOfDay(visit.leavesAt, club) }));
  const hour = (minutes: number) => (club.hourCycle === 'h23' ? `${minutes / 60}:00` : `${((minutes / 60 + 11) % 12) + 1}${minutes < 720 ? 'am' : 'pm'}`);
  return [{ kind: 'timetable', rows }, ...(visits.length > 1 ? [{ kind: 'day' as const, visits: drawn, hour }] : [])];
}

function minutesOfDay(at: Date, club: ClubTime): number {
  const [hours = 0, minutes = 0] = wallTime(at, club.timeZone).split(':').map(Number);
  return hours * 60 + minutes;
}

function rowOf(visit: LetterVisit, next: LetterVisit | null, club: LetterClub): TimetableRow {
  const way = visit.isStepFree ? 'path all level' : (visit.stepsNote ?? '');
  const place: Inline[] = visit.address === null ? [[visit.area, way].filter(Boolean).join('; ')] : [{ address: [visit.address, visit.directions].filter(Boolean).join('. ').replaceAll('..', '.') }, way === '' ? '' : `\n${way}`];
  const notes = [place, warningOf(visit)].filter((note) => note.length > 0);
  return { arrives: formatTime(visit.arrivesAt, club), leaves: formatTime(visit.leavesAt, club), stopNumber: visit.stopNumber, name: visit.gardenName, notes, journey: next ? journeyWords(visit, next) : null };
}

function warningOf(visit: LetterVisit): Inline[] {
  if (visit.isSteam && visit.hasWater) return ['live steam, and water: hold small hands'];
  if (visit.hasWater) return ['water: hold small hands'];
  return visit.isSteam ? ['live steam: hot after it has stopped'] : [];
}

function journeyWords(visit: LetterVisit, next: LetterVisit): string | null {
  if (next.minutesFromLast === null) return null;
  const spare = (next.arrivesAt.getTime() - visit.leavesAt.getTime()) / 60_000 - next.minutesFromLast;
  return `${next.minutesFromLast} minutes by road${spare > 0 && spare <= 20 ? `, ${spare} to spare` : ''}`;
}

function ticketBlocks(booking: BookingFacts, visits: readonly LetterVisit[], club: LetterClub): Block[] {
  const tickets = visits.length === 1 ? 'Open your ticket' : `Open your ${inWords(visits.length)} tickets`;
  const isReleased = visits.some((visit) => visit.address !== null);
  const address = isReleased ? '' : ` Each shows its garden’s address from ${formatDay(dayOf(booking.releasesAt, club.timeZone), club, 'weekday')} ${formatDay(dayOf(booking.releasesAt, club.timeZone), club, 'bare')}, once you have pressed the button there.`;
  const calendar = booking.wantsInvitations ? ' Your calendar’s copy of the day is attached, and an invitation to each visit follows.' : ' Your calendar’s copy of the day is attached.';
  return [
    { kind: 'button', label: tickets, href: booking.link },
    { kind: 'paragraph', parts: [`They open without a signal once you have looked at them.${address}${calendar}`] },
    { kind: 'rule' },
  ];
}

function lastWords(booking: BookingFacts, visits: readonly LetterVisit[], club: LetterClub): Block[] {
  return [
    { kind: 'section', title: 'If it rains', parts: ['Trains run in rain; bring a coat for the path. If a garden or the day is called off, we write to you, and everything for it is given back without asking.'] },
    { kind: 'section', title: 'If your plans change', parts: [`${refundRuleForAll(club)} `, { link: 'Change or give back places', href: booking.link }, '.'] },
    { kind: 'section', title: 'Take care', parts: [[careSentence(visits), ...new Set(visits.flatMap((visit) => visit.cautions))].join(' ')] },
    { kind: 'paragraph', parts: ['Questions: answer this letter, and whoever runs the day will read it. ', { link: 'This letter in large print', href: `${booking.link}?print=large` }, '.'] },
  ];
}

function careSentence(visits: readonly LetterVisit[]): string {
  const steam = visits.some((visit) => visit.isSteam) ? ['Live steam stays hot after it has stopped.'] : [];
  const water = visits.some((visit) => visit.hasWater) ? ['Ponds and pools are not fenced.'] : [];
  return [...steam, ...water, 'Please keep children within reach, stay off the track, and do as the hosts and local rules say. Trains stop for lightning.'].join(' ');
}

const releaseWords = ({ addressReleaseHours: hours }: LetterClub) => (hours % 24 === 0 ? counted(hours / 24, 'day', 'days') : counted(hours, 'hour', 'hours'));
