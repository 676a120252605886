import 'server-only';
import { and, asc, desc, eq, ilike, isNotNull, or, sql, type SQL } from 'drizzle-orm';
import { bookingContacts, bookings, visits } from '@/db/schema/bookings';
import { payments, refunds } from '@/db/schema/books';
import { gardens } from '@/db/schema/gardens';
import { gateFacts } from '@/db/schema/gate';
import { entryTimes, openDays, stops } from '@/db/schema/opendays';
import type { Id } from '@/lib/core/ids';
import { likeOf, PAGE_ROWS, type Listing } from '@/lib/core/listing';
import { firstOrNull } from '@/lib/core/only';
import type { AccountCtx } from '@/lib/infra/context';
import { full } from '@/lib/infra/sql-column';
import type { BookingSort } from '@/lib/opendays/schema';
import { readSpokenCode } from './rules/spoken-code';

type Asked = Listing<BookingSort> & { day: string };

/** The most lines that one file of bookings holds. */
export const BOOKING_FILE_ROWS = 20_000;

const people = sql<number>`coalesce((select max(v.adults + v.children + v.babes) from ${visits} v where v.booking_id = ${bookings.id} and v.given_back_at is null), 0)::int`;
const visitCount = sql<number>`(select count(*) from ${visits} v where v.booking_id = ${bookings.id} and v.given_back_at is null)::int`;
const paidMinor = sql<number>`coalesce((select sum(p.amount_minor) from ${payments} p where p.booking_id = ${bookings.id}), 0)::int`;
const backMinor = sql<number>`coalesce((select sum(r.amount_minor) from ${refunds} r join ${payments} p on p.id = r.payment_id where p.booking_id = ${bookings.id}), 0)::int`;

const SORTS: Record<BookingSort, SQL> = { made: sql`${bookings.madeAt}`, name: sql`lower(${bookingContacts.name})`, people, paid: paidMinor };

/** One page of the confirmed bookings (or all, for a file), of one open day or of every one. One query. */
export async function bookingLines({ db }: AccountCtx, asked: Asked, extent: 'page' | 'all' = 'page') {
  const order = SORTS[asked.sort];
  const rows = await db.select({
    code: bookings.code, name: bookingContacts.name, email: bookingContacts.email, phone: bookingContacts.phone, madeAt: bookings.madeAt, cancelledAt: bookings.cancelledAt,
    day: openDays.title, heldOn: openDays.heldOn, people, visits: visitCount, paidMinor, backMinor, currency: bookings.currency, total: sql<number>`count(*) over ()::int`,
  })
    .from(bookings).innerJoin(bookingContacts, eq(bookingContacts.bookingId, bookings.id)).innerJoin(openDays, eq(openDays.id, bookings.openDayId))
    .where(and(isNotNull(bookings.confirmedAt), asked.day === '' ? undefined : eq(openDays.slug, asked.day), matching(asked.find)))
    .orderBy(asked.order === 'asc' ? asc(order) : desc(order), asc(bookings.code))
    .limit(extent === 'page' ? PAGE_ROWS : BOOKING_FILE_ROWS).offset(extent === 'page' ? (asked.page - 1) * PAGE_ROWS : 0);
  return { lines: rows, total: rows[0]?.total ?? 0 };
}

/* By name, e-mail, or a whole or begun spoken code however it was typed. */
function matching(find: string): SQL | undefined {
  const like = likeOf(find);
  if (like === null) return undefined;
  const read = readSpokenCode(find);
  const begun = find.toUpperCase().replace(/[^0-9A-Z]/g, '');
  return or(
    ilike(bookingContacts.name, like), ilike(bookingContacts.email, like),
    'code' in read ? eq(bookings.code, read.code) : begun.length >= 3 ? sql`starts_with(${bookings.code}, ${begun})` : undefined,
  );
}

/** The open days that have bookings, the latest first, for the filter; at most 60. */
export async function daysWithBookings({ db }: AccountCtx) {
  return db.select({ slug: openDays.slug, title: openDays.title, heldOn: openDays.heldOn }).from(openDays)
    .where(sql`exists (select from ${bookings} b where b.open_day_id = ${openDays.id} and b.confirmed_at is not null)`).orderBy(desc(openDays.heldOn)).limit(60);
}

/** One confirmed booking for the office, by its code; null when there is none. */
export async function findOfficeBooking({ db }: AccountCtx, code: string) {
  return firstOrNull(await db.select({
    id: bookings.id, code: bookings.code, openDayId: bookings.openDayId, day: openDays.title, slug: openDays.slug, heldOn: openDays.heldOn, name: bookingContacts.name, email: bookingContacts.email,
    phone: bookingContacts.phone, emailConfirmedAt: bookingContacts.emailConfirmedAt, madeAt: bookings.madeAt, cancelledAt: bookings.cancelledAt, totalMinor: bookings.totalMinor, currency: bookings.currency,
  })
    .from(bookings).innerJoin(bookingContacts, eq(bookingContacts.bookingId, bookings.id)).innerJoin(openDays, eq(openDays.id, bookings.openDayId))
    .where(and(eq(bookings.code, code), isNotNull(bookings.confirmedAt))).limit(1));
}

const cameIn = sql<number>`coalesce((select sum(f.adults + f.children + f.babes) from ${gateFacts} f where f.visit_id = ${visits.id} and f.kind = 'admit'
  and not exists (select from ${gateFacts} u where u.undoes_id = f.id and u.kind = 'undo')), 0)::int`;

/** The visits of a booking in the order of their times, given back ones too. */
export async function visitsOfBooking({ db }: AccountCtx, bookingId: Id<'booking'>) {
  return db.select({
    id: visits.id, entryTimeId: visits.entryTimeId, garden: gardens.railwayName, number: stops.number, opensAt: entryTimes.opensAt, adults: visits.adults, children: visits.children, babes: visits.babes,
    heads: visits.heads, adultMinor: visits.adultMinor, childMinor: visits.childMinor, babeMinor: visits.babeMinor, version: visits.version, givenBackAt: visits.givenBackAt, cameIn,
  })
    .from(visits).innerJoin(entryTimes, eq(entryTimes.id, visits.entryTimeId)).innerJoin(stops, eq(stops.id, entryTimes.stopId)).innerJoin(gardens, eq(gardens.id, stops.gardenId))
    .where(eq(visits.bookingId, bookingId)).orderBy(asc(entryTimes.opensAt)).limit(40);
}

/** What was paid for a booking, oldest first. */
export async function paymentsOfBooking({ db }: AccountCtx, bookingId: Id<'booking'>) {
  return db.select({
    id: payments.id, year: payments.receiptYear, number: payments.receiptNumber, method: payments.method, amountMinor: payments.amountMinor, receivedOn: payments.receivedOn,
    backMinor: sql<number>`coalesce((select sum(r.amount_minor) from ${refunds} r where r.payment_id = ${full(payments.id)}), 0)::int`,
  }).from(payments).where(eq(payments.bookingId, bookingId)).orderBy(asc(payments.recordedAt)).limit(20);
}
