import 'server-only';
import { and, asc, desc, eq, isNotNull, isNull, sql } from 'drizzle-orm';
import { bookingContacts, bookings, visits } from '@/db/schema/bookings';
import { gardens } from '@/db/schema/gardens';
import { entryTimes, openDays, stops } from '@/db/schema/opendays';
import type { MemberCtx } from '@/lib/infra/context';

const people = sql<number>`${visits.adults} + ${visits.children} + ${visits.babes}`;

/** The acting household's visits, those to come first, at most 60. */
export async function myVisits({ db, actor, now }: MemberCtx) {
  return db.select({
    id: visits.id, code: bookings.code, day: openDays.title, heldOn: openDays.heldOn, garden: gardens.railwayName, slug: gardens.slug, number: stops.number,
    opensAt: entryTimes.opensAt, people, givenBackAt: visits.givenBackAt, isToCome: sql<boolean>`${entryTimes.graceUntil} > ${now.toISOString()}::timestamptz`,
  })
    .from(visits)
    .innerJoin(bookings, eq(bookings.id, visits.bookingId))
    .innerJoin(entryTimes, eq(entryTimes.id, visits.entryTimeId))
    .innerJoin(stops, eq(stops.id, entryTimes.stopId))
    .innerJoin(gardens, eq(gardens.id, stops.gardenId))
    .innerJoin(openDays, eq(openDays.id, visits.openDayId))
    .where(and(eq(bookings.householdId, actor.householdId), isNotNull(bookings.confirmedAt)))
    .orderBy(desc(sql`${entryTimes.graceUntil} > ${now.toISOString()}::timestamptz`), asc(entryTimes.opensAt)).limit(60);
}

/** Who is coming to the acting host's gardens on open days not yet over: one row a party, by entry time, at most 500. Names and heads only. */
export async function comingToMyGardens({ db, actor, now }: MemberCtx) {
  return db.select({
    garden: gardens.railwayName, number: stops.number, headsLimit: stops.headsLimit, day: openDays.title, heldOn: openDays.heldOn, openDayId: openDays.id,
    entryTimeId: entryTimes.id, opensAt: entryTimes.opensAt, capacity: entryTimes.capacity, taken: entryTimes.taken,
    visitId: visits.id, name: bookingContacts.name, adults: visits.adults, children: visits.children, babes: visits.babes,
  })
    .from(gardens)
    .innerJoin(stops, eq(stops.gardenId, gardens.id))
    .innerJoin(openDays, eq(openDays.id, stops.openDayId))
    .innerJoin(entryTimes, eq(entryTimes.stopId, stops.id))
    .leftJoin(visits, and(eq(visits.entryTimeId, entryTimes.id), isNull(visits.givenBackAt), sql`exists (select from ${bookings} b where b.id = ${visits.bookingId} and b.confirmed_at is not null)`))
    .leftJoin(bookingContacts, eq(bookingContacts.bookingId, visits.bookingId))
    .where(and(eq(gardens.householdId, actor.householdId), sql`${openDays.closesAt} > ${now.toISOString()}::timestamptz`))
    .orderBy(asc(openDays.heldOn), asc(gardens.railwayName), asc(entryTimes.opensAt), asc(bookingContacts.name)).limit(500);
}
