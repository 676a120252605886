import 'server-only';
import { and, eq, ne, sql } from 'drizzle-orm';
import type { Queryable } from '@/db/client';
import { letters, letterTexts } from '@/db/schema/letters';
import { asId, type Id } from '@/lib/core/ids';
import { addMinutes } from '@/lib/core/time';
import type { SystemCtx } from '@/lib/infra/context';
import type { MailCalendar } from '@/lib/infra/mail';
import { newBookingLink, siteHost, siteUrl } from './links';
import { findBookingForLetter, type BookingForLetter } from './queries/booking-facts';
import { findReceiptForLetter } from './queries/receipt';
import { calendarLetter, calendarNotes, changeLetter, confirmationLetter, givenBackLetter, reminderLetter, type LetterVisit } from './rules/booking-letter';
import { invitationFile, sequenceOf, visitsFile, type CalendarVisit } from './rules/calendar';
import type { Letter } from './rules/letter';
import { duesReceiptLetter, invitationLetter, noticeLetter, placesLostLetter, refundLetter, signInLetter } from './rules/other-letters';
import { letterFacts } from './schema';

/** A letter as the outbox holds it. */
export type OutboxLetter = { id: Id<'letter'>; kind: string; bookingId: Id<'booking'> | null; madeAt: Date; to: { name: string; address: string }; facts: Record<string, unknown> };

/** A letter ready to be sent from the present state, or why it is not sent any more. `gone` is the SEQUENCE an invitation carries. */
export type Composed = { letter: Letter; calendar: MailCalendar | null; gone?: number; shown: Id<'garden'>[] } | { dropped: string };

/** Builds a letter from its facts and from how things stand now. A new private link is made for those that carry one. */
export async function composeLetter(ctx: SystemCtx, outbox: OutboxLetter): Promise<Composed> {
  const { db, club, now } = ctx;
  const plain = (letter: Letter): Composed => ({ letter, calendar: null, shown: [] });
  switch (outbox.kind) {
    case 'sign-in': {
      const { code, secret, minutes } = letterFacts['sign-in'].parse(outbox.facts);
      if (now >= addMinutes(outbox.madeAt, minutes)) return { dropped: 'The code had run out.' };
      return plain(signInLetter({ code, minutes, link: siteUrl(`/sign-in/link/${secret}`) }, club));
    }
    case 'invitation': return plain(invitationLetter({ ...letterFacts.invitation.parse(outbox.facts), link: siteUrl('/sign-in') }, club));
    case 'dues-receipt': {
      const receipt = await findReceiptForLetter(db, asId<'payment'>(letterFacts['dues-receipt'].parse(outbox.facts).paymentId));
      return receipt ? plain(duesReceiptLetter(receipt, club)) : { dropped: 'There is no such payment.' };
    }
    case 'refund': return plain(refundLetter(letterFacts.refund.parse(outbox.facts), club));
    case 'places-lost': return plain(placesLostLetter(letterFacts['places-lost'].parse(outbox.facts), club));
    case 'notice': return plain(noticeLetter(letterFacts.notice.parse(outbox.facts), club));
    default: return composeForBooking(ctx, outbox);
  }
}

async function composeForBooking({ db, club, now }: SystemCtx, outbox: OutboxLetter): Promise<Composed> {
  const booking = outbox.bookingId === null ? null : await findBookingForLetter(db, outbox.bookingId, club, now);
  if (!booking) return { dropped: 'There is no such booking any more.' };
  if (outbox.kind === 'calendar') return composeInvitation({ db, club, now }, outbox, booking);
  const isOver = booking.isCancelled || booking.visits.every((visit) => visit.isGivenBack);
  if (isOver && outbox.kind !== 'given-back') return { dropped: 'All its places were given back.' };
  if (booking.isCalledOff && outbox.kind === 'reminder') return { dropped: 'The open day is called off.' };
  const facts = { ...booking, link: await newBookingLink(db, booking.code, now, booking.linkEndsAt) };
  const keep = booking.visits.filter((visit) => !visit.isGivenBack).map((visit) => toCalendar(visit, booking, club));
  const mailbox = { name: club.name, email: club.email, host: siteHost(), timeZone: club.timeZone };
  const file = (): MailCalendar => ({ method: 'PUBLISH', fileName: 'visits.ics', content: visitsFile(keep, mailbox, now) });
  switch (outbox.kind) {
    case 'confirmation': return { letter: confirmationLetter(facts, club), calendar: file(), shown: booking.shown };
    case 'change': return { letter: changeLetter(facts, letterFacts.change.parse(outbox.facts), club), calendar: file(), shown: booking.shown };
    case 'given-back': return { letter: givenBackLetter(facts, letterFacts['given-back'].parse(outbox.facts), club), calendar: keep.length > 0 ? file() : null, shown: booking.shown };
    case 'reminder': return { letter: reminderLetter(facts, club), calendar: booking.emailIsConfirmed ? file() : null, shown: booking.shown };
    default: return { dropped: `No letter is known as ${outbox.kind}.` };
  }
}

/** One visit's REQUEST, or its CANCEL when it was given back; nothing when as much has gone already. */
async function composeInvitation({ db, club, now }: Pick<SystemCtx, 'db' | 'club' | 'now'>, outbox: OutboxLetter, booking: BookingForLetter): Promise<Composed> {
  const { visitId } = letterFacts.calendar.parse(outbox.facts);
  const visit = booking.visits.find((each) => each.visitId === visitId);
  if (!visit || !booking.wantsInvitations) return { dropped: 'The party wants no invitations.' };
  const isOff = visit.isGivenBack || booking.isCancelled || booking.isCalledOff;
  const event = toCalendar(visit, booking, club);
  const sequence = sequenceOf(event) + (booking.isCalledOff && !visit.isGivenBack ? 2 : 0);
  const before = await sequenceGone(db, outbox, visitId);
  if (before !== null && before >= sequence) return { dropped: 'A newer invitation has gone.' };
  if (isOff && before === null) return { dropped: 'No invitation had gone, so there is nothing to take back.' };
  const mailbox = { name: club.name, email: club.email, host: siteHost(), timeZone: club.timeZone };
  const method = isOff ? 'CANCEL' : 'REQUEST';
  const content = invitationFile({ ...event, version: event.version + (sequence - sequenceOf(event)) / 2 }, mailbox, { name: outbox.to.name, email: outbox.to.address }, method, now);
  const letter = calendarLetter({ ...booking, link: '' }, { ...visit, isGivenBack: isOff }, club);
  return { letter, calendar: { method, fileName: 'visit.ics', content }, gone: sequence, shown: visit.address === null ? [] : booking.shown };
}

/** The highest SEQUENCE that other letters have carried to the party for this visit; null when none has gone. */
async function sequenceGone(db: Queryable, outbox: OutboxLetter, visitId: string): Promise<number | null> {
  if (outbox.bookingId === null) return null;
  const rows = await db.select({ gone: sql<number | null>`max((${letterTexts.facts}->>'sentSequence')::int)` }).from(letters)
    .innerJoin(letterTexts, eq(letterTexts.letterId, letters.id))
    .where(and(eq(letters.bookingId, outbox.bookingId), eq(letters.kind, 'calendar'), ne(letters.id, outbox.id), sql`${letterTexts.facts}->>'visitId' = ${visitId}`));
  return rows[0]?.gone ?? null;
}

/** A visit as calendars show it. */
export const toCalendar = (visit: LetterVisit, booking: Pick<BookingForLetter, 'code'>, club: SystemCtx['club']): CalendarVisit => ({
  visitId: visit.visitId, version: visit.version, startsAt: visit.arrivesAt, endsAt: visit.leavesAt, stopNumber: visit.stopNumber, gardenName: visit.gardenName,
  area: visit.area, address: visit.address, notes: calendarNotes(visit, booking.code, club),
});
