import 'server-only';
import { and, eq, gt, isNotNull, isNull, lte, or, sql } from 'drizzle-orm';
import { bookingContacts, bookings, visits } from '@/db/schema/bookings';
import { letters } from '@/db/schema/letters';
import { openDays } from '@/db/schema/opendays';
import { addMinutes } from '@/lib/core/time';
import type { SystemCtx } from '@/lib/infra/context';
import { inTransaction } from '@/lib/infra/transaction';
import { queueLetter } from './commands';

const AT_ONCE = 500;

/** Bookings of days whose addresses are released and which have not begun. */
const isNear = ({ now, club }: SystemCtx) => and(lte(openDays.opensAt, addMinutes(now, club.addressReleaseHours * 60)), gt(openDays.opensAt, now), isNull(openDays.calledOffAt));
const isLive = and(isNotNull(bookings.confirmedAt), isNull(bookings.cancelledAt), isNotNull(bookingContacts.email));

/**
 * Owes each party that booked before the release its one reminder. The letter's key is the booking's, so it is owed once
 * however often the sweep comes by; who books later has its confirmation in the same days.
 */
export async function queueReminders(ctx: SystemCtx): Promise<number> {
  const releasedAfter = sql`${openDays.opensAt} - make_interval(hours => ${ctx.club.addressReleaseHours}::int)`;
  const rows = await ctx.db.select({ bookingId: bookings.id, openDayId: bookings.openDayId, name: bookingContacts.name, email: bookingContacts.email }).from(bookings)
    .innerJoin(openDays, eq(openDays.id, bookings.openDayId))
    .innerJoin(bookingContacts, eq(bookingContacts.bookingId, bookings.id))
    .leftJoin(letters, eq(letters.key, sql`'reminder:' || ${bookings.id}`))
    .where(and(isNear(ctx), isLive, isNull(letters.id), sql`${bookings.confirmedAt} < ${releasedAfter}`)).limit(AT_ONCE);
  for (const { bookingId, openDayId, name, email } of rows) {
    if (email === null) continue;
    await inTransaction(ctx.db, (tx) => queueLetter(tx, { key: `reminder:${bookingId}`, kind: 'reminder', to: { name, address: email }, madeAt: ctx.now, dueAt: ctx.now, openDayId, bookingId, facts: {} }));
  }
  return rows.length;
}

/**
 * Owes each visit's invitation once more when its address may be said: at the release for a confirmed e-mail, or when it
 * is confirmed after that. Sending drops it when the calendar has as much already.
 */
export async function queueAddressInvitations(ctx: SystemCtx): Promise<number> {
  const key = sql<string>`'calendar:' || ${visits.id} || ':' || ${visits.version} || ':address'`;
  const rows = await ctx.db.select({ visitId: visits.id, key, bookingId: bookings.id, openDayId: bookings.openDayId, name: bookingContacts.name, email: bookingContacts.email }).from(visits)
    .innerJoin(bookings, eq(bookings.id, visits.bookingId))
    .innerJoin(openDays, eq(openDays.id, bookings.openDayId))
    .innerJoin(bookingContacts, eq(bookingContacts.bookingId, bookings.id))
    .leftJoin(letters, eq(letters.key, key))
    .where(and(isNear(ctx), isLive, isNull(letters.id), isNull(visits.givenBackAt), bookings.wantsInvitations, or(isNotNull(bookingContacts.emailConfirmedAt), isNotNull(bookingContacts.madeBy)))).limit(AT_ONCE);
  for (const row of rows) {
    if (row.email === null) continue;
    const to = { name: row.name, address: row.email };
    await inTransaction(ctx.db, (tx) => queueLetter(tx, { key: row.key, kind: 'calendar', to, madeAt: ctx.now, dueAt: ctx.now, openDayId: row.openDayId, bookingId: row.bookingId, facts: { visitId: row.visitId } }));
  }
  return rows.length;
}
