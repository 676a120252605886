import 'server-only';
import { asc, eq, sql } from 'drizzle-orm';
import type { Queryable } from '@/db/client';
import { bookingContacts, bookings, visits } from '@/db/schema/bookings';
import { payments, refunds } from '@/db/schema/books';
import { gateFacts } from '@/db/schema/gate';
import { placeShowings } from '@/db/schema/gardens';
import { entryTimes, openDays, stops } from '@/db/schema/opendays';
import { bearerLinks } from '@/db/schema/people';
import type { Id } from '@/lib/core/ids';
import { only } from '@/lib/core/only';
import { Refusal } from '@/lib/core/refusal';
import type { BookingActor, Ctx } from '@/lib/infra/context';
import { ticketSigning } from '@/lib/infra/ticket-keys';
import { toCalendar } from '@/lib/letters/compose';
import { siteHost } from '@/lib/letters/links';
import { findBookingForLetter, type BookingForLetter } from '@/lib/letters/queries/booking-facts';
import { visitsFile } from '@/lib/letters/rules/calendar';
import { findOpenDay } from '@/lib/opendays/queries';
import { toBookingPage, type BookingPage, type PageVisitFacts } from '../views/booking-page';
import { encodeTicket } from '../rules/ticket-payload';

/** How an exact place was shown: on the party's page, or in the calendar that reads its feed. */
type Showing = 'booking' | 'feed';

/** A booking as it stands, for whoever may see it. Every exact place in it is recorded as shown. */
async function show(ctx: Ctx, bookingId: Id<'booking'>, by: Showing): Promise<BookingForLetter> {
  const booking = await findBookingForLetter(ctx.db, bookingId, ctx.club, ctx.now);
  if (!booking) throw new Refusal('not_found');
  if (booking.shown.length > 0) await ctx.db.insert(placeShowings).values(booking.shown.map((gardenId) => ({ gardenId, at: ctx.now, viewerKind: by, viewerId: bookingId })));
  return booking;
}

const lastAdmission = sql<string | null>`(select min(f.at_phone) from ${gateFacts} f where f.visit_id = ${visits.id} and f.kind = 'admit'
  and not exists (select 1 from ${gateFacts} u where u.undoes_id = f.id and u.kind = 'undo'))`;

/** The party's own page: tickets, the way, what may still be changed and what that gives back. */
export async function showBooking(ctx: Ctx<BookingActor>): Promise<BookingPage> {
  const { db, actor, club, now } = ctx;
  const booking = await show(ctx, actor.bookingId, 'booking');
  const rows = await db.select({
    visitId: visits.id, version: visits.version, entryTimeId: visits.entryTimeId, stopId: entryTimes.stopId, heads: visits.heads, ticketNumber: bookings.ticketNumber, slug: openDays.slug,
    adultMinor: visits.adultMinor, childMinor: visits.childMinor, babeMinor: visits.babeMinor, givenBackAt: visits.givenBackAt, stopNumber: stops.number, cameInAt: lastAdmission,
  }).from(visits)
    .innerJoin(bookings, eq(bookings.id, visits.bookingId))
    .innerJoin(openDays, eq(openDays.id, visits.openDayId))
    .innerJoin(entryTimes, eq(entryTimes.id, visits.entryTimeId))
    .innerJoin(stops, eq(stops.id, entryTimes.stopId))
    .where(eq(visits.bookingId, actor.bookingId)).orderBy(asc(entryTimes.opensAt)).limit(60);
  const signing = await ticketSigning(db, now);
  const facts = rows.map((row): PageVisitFacts => {
    const said = only(booking.visits.filter((visit) => visit.visitId === row.visitId));
    const { adults, children, babes, arrivesAt, graceUntil } = said;
    const isLive = row.givenBackAt === null && !booking.isCalledOff;
    const payload = isLive ? encodeTicket({
      keyId: signing.keyId, clubId: signing.clubId, visitId: row.visitId, visitVersion: row.version, stopId: row.stopId, stopNumber: row.stopNumber, entryAt: arrivesAt,
      graceMinutes: (graceUntil.getTime() - arrivesAt.getTime()) / 60_000, adults, children, babes,
    }, signing.sign) : null;
    return { ...row, ...said, payload, cameInAt: row.cameInAt === null ? null : new Date(row.cameInAt) };
  });
  const [day, more] = await Promise.all([findOpenDay(ctx, rows[0]?.slug ?? ''), findMore(db, actor.bookingId)]);
  return toBookingPage({ booking, visits: facts, day, more, mayConfirmEmail: actor.provesMailbox === true }, club, now);
}

/** What the page says beside the visits: whose mailbox, which receipt, what comes back, whether a feed is out. */
async function findMore(db: Queryable, bookingId: Id<'booking'>) {
  return only(await db.select({
    email: bookingContacts.email, emailConfirmedAt: bookingContacts.emailConfirmedAt, madeBy: bookingContacts.madeBy,
    hasFeed: sql<boolean>`exists (select 1 from ${bearerLinks} where ${bearerLinks.kind} = 'calendar' and ${bearerLinks.subjectId} = ${bookings.code} and ${bearerLinks.revokedAt} is null)`,
    receipt: sql<string | null>`(select ${payments.receiptYear} || '/' || lpad(${payments.receiptNumber}::text, 4, '0') from ${payments} where ${payments.bookingId} = ${bookings.id} order by ${payments.recordedAt} limit 1)`,
    paidMinor: sql<number>`coalesce((select sum(${payments.amountMinor})::int from ${payments} where ${payments.bookingId} = ${bookings.id}), 0)`,
    backMinor: sql<number>`coalesce((select sum(${refunds.amountMinor})::int from ${refunds} join ${payments} on ${payments.id} = ${refunds.paymentId} where ${payments.bookingId} = ${bookings.id} and ${refunds.failedAt} is null), 0)`,
    leftMinor: sql<number>`coalesce((select sum(${payments.amountMinor} - coalesce((select sum(${refunds.amountMinor}) from ${refunds} where ${refunds.paymentId} = ${payments.id}), 0))::int from ${payments} where ${payments.bookingId} = ${bookings.id}), 0)`,
  }).from(bookings).innerJoin(bookingContacts, eq(bookingContacts.bookingId, bookings.id)).where(eq(bookings.id, bookingId)));
}

/** All live visits of a booking as one calendar file: the download and the private feed. */
export async function showCalendar(ctx: Ctx, bookingId: Id<'booking'>, by: Showing): Promise<string> {
  const booking = await show(ctx, bookingId, by);
  const live = booking.isCancelled || booking.isCalledOff ? [] : booking.visits.filter((visit) => !visit.isGivenBack);
  const { name, email, timeZone } = ctx.club;
  return visitsFile(live.map((visit) => toCalendar(visit, booking, ctx.club)), { name, email, timeZone, host: siteHost() }, ctx.now);
}
