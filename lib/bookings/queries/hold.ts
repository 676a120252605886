import 'server-only';
import { and, asc, desc, eq, gt, isNull, sql } from 'drizzle-orm';
import { bookingContacts, bookings, visits } from '@/db/schema/bookings';
import { paymentAttempts } from '@/db/schema/books';
import { gardens } from '@/db/schema/gardens';
import { entryTimes, openDays, stops } from '@/db/schema/opendays';
import { firstOrNull } from '@/lib/core/only';
import { addMinutes } from '@/lib/core/time';
import type { Ctx, HolderActor } from '@/lib/infra/context';
import { toHoldView, type HoldView } from '../views';

/** How long a browser is still told what became of its last hold. */
const REMEMBERED_HOURS = 48;

const attempt = (condition: ReturnType<typeof sql>) => sql<boolean>`exists (select 1 from ${paymentAttempts} where ${paymentAttempts.bookingId} = ${bookings.id} and ${condition})`;

/** The places this browser kept last, in whatever state they are; of one open day if `slug` names it. Null when it kept none lately. */
export async function findHold({ db, actor, now, club }: Ctx<HolderActor>, slug?: string): Promise<HoldView | null> {
  const facts = firstOrNull(await db.select({
    bookingId: bookings.id, code: bookings.code, madeAt: bookings.madeAt, heldUntil: bookings.heldUntil, confirmedAt: bookings.confirmedAt, releasedAt: bookings.releasedAt,
    totalMinor: bookings.totalMinor, currency: bookings.currency, wantsInvitations: bookings.wantsInvitations,
    title: openDays.title, slug: openDays.slug, heldOn: openDays.heldOn, placeLine: openDays.placeLine,
    name: bookingContacts.name, email: bookingContacts.email, phone: bookingContacts.phone,
    hasOpenAttempt: attempt(sql`${paymentAttempts.endedAt} is null`), wasPaid: attempt(sql`${paymentAttempts.outcome} = 'paid'`),
  }).from(bookings)
    .innerJoin(openDays, eq(openDays.id, bookings.openDayId))
    .leftJoin(bookingContacts, eq(bookingContacts.bookingId, bookings.id))
    .where(and(eq(bookings.holderHash, actor.holderHash), gt(bookings.madeAt, addMinutes(now, -REMEMBERED_HOURS * 60)), slug === undefined ? undefined : eq(openDays.slug, slug)))
    .orderBy(desc(sql`${bookings.confirmedAt} is null and ${bookings.releasedAt} is null`), desc(bookings.madeAt)).limit(1));
  if (!facts) return null;
  const rows = await db.select({
    visitId: visits.id, stopNumber: stops.number, garden: gardens.railwayName, opensAt: entryTimes.opensAt, adults: visits.adults, children: visits.children, babes: visits.babes,
    adultMinor: visits.adultMinor, childMinor: visits.childMinor, babeMinor: visits.babeMinor,
  }).from(visits)
    .innerJoin(entryTimes, eq(entryTimes.id, visits.entryTimeId))
    .innerJoin(stops, eq(stops.id, entryTimes.stopId))
    .innerJoin(gardens, eq(gardens.id, stops.gardenId))
    .where(and(eq(visits.bookingId, facts.bookingId), facts.confirmedAt === null ? undefined : isNull(visits.givenBackAt)))
    .orderBy(asc(entryTimes.opensAt)).limit(14);
  return toHoldView(facts, rows, club, now);
}
