import 'server-only';
import { and, eq, gt, isNotNull, isNull } from 'drizzle-orm';
import type { Queryable } from '@/db/client';
import { bookings } from '@/db/schema/bookings';
import { bearerLinks } from '@/db/schema/people';
import type { Id } from '@/lib/core/ids';
import { firstOrNull } from '@/lib/core/only';
import { sameHash } from '@/lib/infra/secrets';

/** The confirmed booking that a private link's hash opens under this code, or null. */
export async function findBookingByLink(db: Queryable, code: string, secretHash: string, now: Date): Promise<Id<'booking'> | null> {
  const rows = await db.select({ id: bookings.id, hash: bearerLinks.secretHash })
    .from(bearerLinks)
    .innerJoin(bookings, eq(bookings.code, code))
    .where(and(eq(bearerLinks.kind, 'booking'), eq(bearerLinks.secretHash, secretHash), isNull(bearerLinks.revokedAt), gt(bearerLinks.expiresAt, now), eq(bearerLinks.subjectId, code)))
    .limit(1);
  const row = firstOrNull(rows);
  return row && sameHash(row.hash, secretHash) ? row.id : null;
}

/** The confirmed booking of a household under this code, or null. */
export async function findOwnBooking(db: Queryable, code: string, householdId: Id<'household'>): Promise<Id<'booking'> | null> {
  const rows = await db.select({ id: bookings.id }).from(bookings)
    .where(and(eq(bookings.code, code), eq(bookings.householdId, householdId), isNotNull(bookings.confirmedAt))).limit(1);
  return firstOrNull(rows)?.id ?? null;
}
