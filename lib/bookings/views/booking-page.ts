import { formatMoney, type Money } from '@/lib/core/money';
import { dayOf, formatDay, formatTime, type ClubTime } from '@/lib/core/time';
import type { Id } from '@/lib/core/ids';
import { chosenCells } from '@/lib/opendays/rules/board';
import { dayLine, type DayLine } from '@/lib/opendays/rules/day-line';
import { partyInWords } from '@/lib/opendays/rules/prices';
import type { BoardView } from '@/lib/opendays/views';
import { changeRefusal, refundMinor, refundRuleWords, refundWords, type RefundRule } from '../rules/refund';
import { costMinor } from '../rules/party';
import { otherTimes } from '../rules/other-times';
import { sheetTitle, toTicketView, type DirectionsView, type TicketSheetView, type TicketView } from '../rules/ticket-view';

/** A visit as the database and the letters give it; `payload` is the signed text of its QR, null once it is no ticket. */
export type PageVisitFacts = {
  visitId: string; version: number; entryTimeId: Id<'entryTime'>; stopNumber: number; gardenName: string; shortName: string; area: string; address: string | null; directions: string | null;
  arrivesAt: Date; leavesAt: Date; graceUntil: Date; adults: number; children: number; babes: number; heads: number; ticketNumber: number;
  adultMinor: number; childMinor: number; babeMinor: number; givenBackAt: Date | null; cameInAt: Date | null; payload: string | null;
  minutesFromLast: number | null; cautions: string[]; isSteam: boolean; hasWater: boolean; stepsNote: string | null;
};

/** An entry time a visit may be moved to. */
export type OtherTime = { entryTimeId: string; label: string };

/** One visit on the party's page. */
export type PageVisit = {
  visitId: string;
  version: number;
  ticket: TicketView;
  shortName: string;
  at: string;
  /** The address once it may be said, else the area. */
  place: string;
  directions: string | null;
  cautions: string[];
  /** What may still be changed; null when it is given back, used, or changes have ended (`ended` says so). */
  change: { people: { adults: number; children: number; babes: number }; rule: string; now: string; others: OtherTime[] } | null;
  ended: string | null;
};

/** The party's own page: plain JSON, times as text. */
export type BookingPage = {
  code: string;
  title: string;
  line: string;
  sums: string;
  state: 'live' | 'cancelled' | 'called-off';
  visits: PageVisit[];
  day: { board: BoardView; line: DayLine } | null;
  email: { address: string | null; isConfirmed: boolean; mayConfirm: boolean };
  addresses: string;
  hasFeed: boolean;
  sheet: TicketSheetView;
};

type Facts = {
  booking: { code: string; heldOn: string; title: string; placeLine: string; totalMinor: number; releasesAt: Date; isCancelled: boolean; isCalledOff: boolean; emailIsConfirmed: boolean; name: string; shown: readonly unknown[] };
  visits: readonly PageVisitFacts[];
  day: { board: BoardView } | null;
  more: { email: string | null; hasFeed: boolean; receipt: string | null; paidMinor: number; backMinor: number; leftMinor: number };
  mayConfirmEmail: boolean;
};
type PageClub = ClubTime & RefundRule & { name: string; currency: string };

/** Sets the party's own page. */
export function toBookingPage({ booking, visits, day, more, mayConfirmEmail }: Facts, club: PageClub, now: Date): BookingPage {
  const live = visits.filter((visit) => visit.givenBackAt === null);
  const state = booking.isCalledOff ? 'called-off' : booking.isCancelled ? 'cancelled' : 'live';
  const board = state === 'live' ? (day?.board ?? null) : null;
  const pageVisits = visits.map((visit) => toPageVisit(visit, { booking, live, board, isLive: state === 'live', leftMinor: more.leftMinor }, club, now));
  const sums = sumsOf(live, more, club);
  return {
    code: booking.code, title: live.length === 0 ? booking.title : sheetTitle(live.length, booking.heldOn, club), line: `${booking.title}, ${formatDay(booking.heldOn, club)}, ${booking.placeLine}`,
    sums, state, visits: pageVisits, day: board && live.length > 0 ? { board, line: dayLine(board, chosenCells(board, live.map((visit) => visit.entryTimeId))) } : null,
    email: { address: more.email, isConfirmed: booking.emailIsConfirmed, mayConfirm: mayConfirmEmail && !booking.emailIsConfirmed },
    addresses: addressWords(booking, club, now), hasFeed: more.hasFeed,
    sheet: {
      clubName: club.name, to: booking.name, title: live.length === 0 ? booking.title : sheetTitle(live.length, booking.heldOn, club), letter: `${sums} Bring this sheet, the letter on your telephone, or just the code in your head.`,
      directions: live.map((visit) => toDirections(visit, club)), tickets: pageVisits.map((visit) => visit.ticket).filter((ticket) => ticket.state.kind !== 'given-back'),
    },
  };
}

function sumsOf(live: readonly PageVisitFacts[], { paidMinor, backMinor, receipt }: Facts['more'], club: PageClub): string {
  const money = (amountMinor: number) => formatMoney({ amountMinor, currency: club.currency }, club.locale);
  const first = live[0];
  const isSame = first !== undefined && live.every((visit) => partyInWords(visit) === partyInWords(first));
  const who = first === undefined ? 'All places are given back' : isSame ? `Places for ${partyInWords(first)} are kept` : 'Your places are kept';
  const paid = paidMinor === 0 ? '.' : first === undefined ? `. ${money(paidMinor)} was paid${receipt === null ? '' : `, receipt ${receipt}`}.` : ` and paid for: ${money(paidMinor)}${receipt === null ? '' : `, receipt ${receipt}`}.`;
  return `${who}${paid}${backMinor === 0 ? '' : ` ${money(backMinor)} goes back the way you paid.`}`;
}

function addressWords(booking: Facts['booking'], club: PageClub, now: Date): string {
  if (booking.isCancelled || booking.isCalledOff) return '';
  const when = `${formatTime(booking.releasesAt, club)} on ${formatDay(dayOf(booking.releasesAt, club.timeZone), club, 'weekday')} ${formatDay(dayOf(booking.releasesAt, club.timeZone), club, 'bare')}`;
  if (!booking.emailIsConfirmed) return `The gardens are people’s homes. Their addresses stand here from ${when}, once you have confirmed your e-mail.`;
  return now < booking.releasesAt ? `The gardens are people’s homes. Their addresses come by letter and stand here from ${when}.` : 'The addresses are for your party only. Please do not pass them on.';
}

/* A neighbourhood is named as a place ("the ridge") or as a whereabouts ("above the weir"). */
const areaInWords = (area: string) => (area.startsWith('the ') ? `In ${area}` : area.replace(/^./u, (letter) => letter.toUpperCase()));

function toPageVisit(visit: PageVisitFacts, around: { booking: Facts['booking']; live: readonly PageVisitFacts[]; board: BoardView | null; isLive: boolean; leftMinor: number }, club: PageClub, now: Date): PageVisit {
  const { adults, children, babes, arrivesAt } = visit;
  const refusal = visit.givenBackAt !== null || !around.isLive ? 'already_given_back' : visit.cameInAt !== null ? 'already_came_in' : changeRefusal(arrivesAt, club, now);
  const paid = { amountMinor: costMinor(visit, visit), currency: club.currency };
  return {
    visitId: visit.visitId, version: visit.version, shortName: visit.shortName, at: formatTime(arrivesAt, club), place: visit.address ?? areaInWords(visit.area), directions: visit.directions,
    ticket: toTicketView({ ...visit, entryAt: arrivesAt, code: around.booking.code, state: stateOf(visit, club) }, club), cautions: cautionsOf(visit),
    change: refusal === null ? { people: { adults, children, babes }, rule: refundRuleWords(arrivesAt, club, club), now: returnWords(paid, around.leftMinor, arrivesAt, club, now), others: around.board ? otherTimes(around.board, visit, around.live) : [] } : null,
    ended: refusal === 'changes_over' ? 'Changes ended before this entry time. Ask the coordinator.' : null,
  };
}

/* An officer may have given money back before: then no more than what is left of the payment is promised. */
function returnWords(paid: Money, leftMinor: number, entryAt: Date, club: PageClub, now: Date): string {
  if (refundMinor(paid.amountMinor, entryAt, club, now) <= leftMinor) return refundWords(paid, entryAt, club, club, now);
  if (leftMinor === 0) return 'Nothing comes back any more: your payment went back before. Someone else can come.';
  return `${formatMoney({ amountMinor: leftMinor, currency: paid.currency }, club.locale)} comes back the way you paid: the rest of your payment went back before.`;
}

function stateOf(visit: PageVisitFacts, club: PageClub): TicketView['state'] {
  if (visit.givenBackAt !== null) return { kind: 'given-back', words: `Given back on ${formatDay(dayOf(visit.givenBackAt, club.timeZone), club, 'bare')}` };
  return visit.cameInAt === null ? { kind: 'live' } : { kind: 'used', words: `Came in at ${formatTime(visit.cameInAt, club)}` };
}

function cautionsOf(visit: PageVisitFacts): string[] {
  return [...(visit.hasWater ? ['There is water: hold small hands.'] : []), ...(visit.isSteam ? ['Live steam is hot: look, do not touch.'] : []), ...(visit.stepsNote === null ? [] : [visit.stepsNote]), ...visit.cautions].map(asSentence);
}

/** A host's note as a sentence of its own: "three steps up" becomes "Three steps up." */
const asSentence = (note: string) => `${note.charAt(0).toUpperCase()}${note.slice(1)}${/[.!?]$/.test(note) ? '' : '.'}`;

function toDirections(visit: PageVisitFacts, club: PageClub): DirectionsView {
  return {
    time: formatTime(visit.arrivesAt, club), shortName: visit.shortName, place: visit.address ?? areaInWords(visit.area), note: [visit.directions, ...cautionsOf(visit)].filter((part) => part !== null).join(' ') || null,
    journey: [visit.minutesFromLast === null ? '' : `${visit.minutesFromLast} min on the way`, `leave by ${formatTime(visit.leavesAt, club)}`].filter(Boolean).join('; '),
  };
}
