import 'server-only';
import { and, asc, eq, gt, isNotNull, isNull, lte, notExists, sql } from 'drizzle-orm';
import { bookings } from '@/db/schema/bookings';
import { letters } from '@/db/schema/letters';
import { openDays } from '@/db/schema/opendays';
import { addMinutes } from '@/lib/core/time';
import type { SystemCtx } from '@/lib/infra/context';
import { inTransaction } from '@/lib/infra/transaction';
import { queueBookingLetter } from './confirm';

/** Owes every confirmed party of a day whose addresses are released its reminder, once; at most 200 a call. */
export async function queueReminders(ctx: SystemCtx): Promise<number> {
  const { db, now, club } = ctx;
  const reminded = db.select({ one: sql`1` }).from(letters).where(and(eq(letters.bookingId, bookings.id), eq(letters.kind, 'reminder')));
  const due = await db.select({ id: bookings.id }).from(bookings).innerJoin(openDays, eq(openDays.id, bookings.openDayId))
    .where(and(
      isNotNull(bookings.confirmedAt), isNull(bookings.cancelledAt), isNull(openDays.calledOffAt),
      gt(openDays.opensAt, now), lte(openDays.opensAt, addMinutes(now, club.addressReleaseHours * 60)), notExists(reminded),
      sql`exists (select 1 from booking_contacts c where c.booking_id = ${bookings.id} and c.email is not null)`,
    )).orderBy(asc(bookings.confirmedAt)).limit(200);
  for (const { id } of due) await inTransaction(db, (tx) => queueBookingLetter(tx, ctx, id, 'reminder', id));
  return due.length;
}
