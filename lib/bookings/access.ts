import 'server-only';
import { and, eq, gt, inArray, isNotNull, isNull } from 'drizzle-orm';
import type { Queryable } from '@/db/client';
import { bookings } from '@/db/schema/bookings';
import { bearerLinks } from '@/db/schema/people';
import type { Id } from '@/lib/core/ids';
import { firstOrNull } from '@/lib/core/only';
import type { BookingActor, Ctx } from '@/lib/infra/context';
import { countTry } from '@/lib/infra/rate-limit';
import { sameHash } from '@/lib/infra/secrets';

/** Whoever a private link's hash lets in under this code: from a letter it also proves the mailbox, from the paying browser it does not. */
export async function findBookingByLink(db: Queryable, code: string, secretHash: string, now: Date): Promise<BookingActor | null> {
  const rows = await db.select({ id: bookings.id, hash: bearerLinks.secretHash, kind: bearerLinks.kind })
    .from(bearerLinks)
    .innerJoin(bookings, eq(bookings.code, code))
    .where(and(
      inArray(bearerLinks.kind, ['booking', 'browser']), eq(bearerLinks.secretHash, secretHash), eq(bearerLinks.subjectId, code),
      isNull(bearerLinks.revokedAt), gt(bearerLinks.expiresAt, now), isNotNull(bookings.confirmedAt),
    )).limit(1);
  const row = firstOrNull(rows);
  if (!row || !sameHash(row.hash, secretHash)) return null;
  return { kind: 'booking', bookingId: row.id, ...(row.kind === 'booking' ? { provesMailbox: true as const } : {}) };
}

/** The booking whose private calendar feed a secret opens, or null once it was taken back or has ended. */
export async function findBookingByFeed(db: Queryable, secretHash: string, now: Date): Promise<Id<'booking'> | null> {
  const rows = await db.select({ id: bookings.id, hash: bearerLinks.secretHash })
    .from(bearerLinks).innerJoin(bookings, eq(bookings.code, bearerLinks.subjectId))
    .where(and(eq(bearerLinks.kind, 'calendar'), eq(bearerLinks.secretHash, secretHash), isNull(bearerLinks.revokedAt), gt(bearerLinks.expiresAt, now), isNotNull(bookings.confirmedAt))).limit(1);
  const row = firstOrNull(rows);
  return row && sameHash(row.hash, secretHash) ? row.id : null;
}

/** The confirmed booking of a household under this code, or null. */
export async function findOwnBooking(db: Queryable, code: string, householdId: Id<'household'>): Promise<Id<'booking'> | null> {
  const rows = await db.select({ id: bookings.id }).from(bookings)
    .where(and(eq(bookings.code, code), eq(bookings.householdId, householdId), isNotNull(bookings.confirmedAt))).limit(1);
  return firstOrNull(rows)?.id ?? null;
}

/** A link has 256 random bits, so nobody finds one by trying; this keeps whoever tries from costing much. */
const LOOK_UPS = { tries: 120, minutes: 10 };

/** Counts one look-up of a private link, by client; refuses past the limit. */
export async function countLookUp({ db, client, now }: Pick<Ctx, 'db' | 'client' | 'now'>): Promise<void> {
  if (client !== null) await countTry(db, `look-up:${client}`, LOOK_UPS, now);
}
