import 'server-only';
import { and, asc, eq, inArray } from 'drizzle-orm';
import type { Queryable } from '@/db/client';
import { bookingContacts, bookings, visits } from '@/db/schema/bookings';
import { gardenAreas, gardenPlaces, gardens } from '@/db/schema/gardens';
import { areaMinutes, entryTimes, openDays, stops } from '@/db/schema/opendays';
import type { Id } from '@/lib/core/ids';
import { firstOrNull } from '@/lib/core/only';
import { addMinutes } from '@/lib/core/time';
import type { ClubSettings } from '@/lib/infra/context';
import { linksEndAt } from '../links';
import type { BookingFacts, LetterVisit } from '../rules/booking-letter';

/** A booking for a letter, but for its private link; `shown` are the gardens whose address it says. */
export type BookingForLetter = Omit<BookingFacts, 'link'> & { openDayId: Id<'openDay'>; linkEndsAt: Date; isCalledOff: boolean; name: string; email: string | null; shown: Id<'garden'>[] };

/** A booking as it stands now, for whoever its letters go to; null when it is not confirmed. */
export async function findBookingForLetter(db: Queryable, bookingId: Id<'booking'>, club: ClubSettings, now: Date): Promise<BookingForLetter | null> {
  const row = firstOrNull(await db.select({
    code: bookings.code, madeAt: bookings.madeAt, totalMinor: bookings.totalMinor, confirmedAt: bookings.confirmedAt, cancelledAt: bookings.cancelledAt, wantsInvitations: bookings.wantsInvitations,
    name: bookingContacts.name, email: bookingContacts.email, emailConfirmedAt: bookingContacts.emailConfirmedAt, madeBy: bookingContacts.madeBy,
    openDayId: openDays.id, heldOn: openDays.heldOn, title: openDays.title, placeLine: openDays.placeLine, opensAt: openDays.opensAt, closesAt: openDays.closesAt, calledOffAt: openDays.calledOffAt,
  }).from(bookings)
    .innerJoin(bookingContacts, eq(bookingContacts.bookingId, bookings.id))
    .innerJoin(openDays, eq(openDays.id, bookings.openDayId))
    .where(eq(bookings.id, bookingId)).limit(1));
  if (!row?.confirmedAt) return null;
  const releasesAt = addMinutes(row.opensAt, -club.addressReleaseHours * 60);
  const emailIsConfirmed = row.emailConfirmedAt !== null || row.madeBy !== null;
  const mayKnow = emailIsConfirmed && now >= releasesAt && row.cancelledAt === null && row.calledOffAt === null;
  const { visits: its, shown } = await visitsOf(db, bookingId, mayKnow);
  return {
    code: row.code, madeAt: row.madeAt, totalMinor: row.totalMinor, heldOn: row.heldOn, title: row.title, placeLine: row.placeLine, releasesAt,
    isCancelled: row.cancelledAt !== null, emailIsConfirmed, wantsInvitations: row.wantsInvitations, visits: its, openDayId: row.openDayId,
    linkEndsAt: linksEndAt(row.closesAt), isCalledOff: row.calledOffAt !== null, name: row.name, email: row.email, shown,
  };
}

async function visitsOf(db: Queryable, bookingId: Id<'booking'>, mayKnow: boolean): Promise<{ visits: LetterVisit[]; shown: Id<'garden'>[] }> {
  const rows = await db.select({
    visitId: visits.id, version: visits.version, gardenId: gardens.id, stopNumber: stops.number, gardenName: gardens.railwayName, shortName: gardens.shortName, area: gardenAreas.name,
    arrivesAt: entryTimes.opensAt, graceUntil: entryTimes.graceUntil, stayMinutes: stops.stayMinutes, adults: visits.adults, children: visits.children, babes: visits.babes,
    givenBackAt: visits.givenBackAt, powers: gardens.powers, water: gardens.water, isStepFree: gardens.isStepFree, stepsNote: gardens.stepsNote, cautions: gardens.cautions,
  }).from(visits)
    .innerJoin(entryTimes, eq(entryTimes.id, visits.entryTimeId))
    .innerJoin(stops, eq(stops.id, entryTimes.stopId))
    .innerJoin(gardens, eq(gardens.id, stops.gardenId))
    .leftJoin(gardenAreas, eq(gardenAreas.gardenId, gardens.id))
    .where(eq(visits.bookingId, bookingId)).orderBy(asc(entryTimes.opensAt)).limit(60);
  const alive = rows.filter((row) => row.givenBackAt === null);
  const gardenIds = alive.map((row) => row.gardenId);
  const places = mayKnow ? await placesOf(db, gardenIds) : new Map<string, { address: string; directions: string | null }>();
  const minutes = await minutesBetweenGardens(db, gardenIds);
  const its = rows.map(({ gardenId, stayMinutes, givenBackAt, powers, water, area, ...row }): LetterVisit => {
    const place = givenBackAt === null ? places.get(gardenId) : undefined;
    const last = alive[alive.findIndex((each) => each.visitId === row.visitId) - 1];
    return {
      ...row, area: area ?? 'in the valley', leavesAt: addMinutes(row.arrivesAt, stayMinutes), isGivenBack: givenBackAt !== null, isSteam: powers.includes('live-steam'), hasWater: water !== 'none',
      address: place?.address ?? null, directions: place?.directions ?? null, minutesFromLast: last ? (minutes.get(`${last.gardenId} ${gardenId}`) ?? null) : null,
    };
  });
  return { visits: its, shown: gardenIds.filter((id) => places.has(id)) };
}

async function placesOf(db: Queryable, gardenIds: Id<'garden'>[]) {
  if (gardenIds.length === 0) return new Map<string, { address: string; directions: string | null }>();
  const rows = await db.select({ gardenId: gardenPlaces.gardenId, address: gardenPlaces.address, directions: gardenPlaces.directions })
    .from(gardenPlaces).where(inArray(gardenPlaces.gardenId, gardenIds)).limit(60);
  return new Map<string, { address: string; directions: string | null }>(rows.map((row) => [row.gardenId, row]));
}

/** Minutes by road between the gardens' areas: what everyone may know. */
async function minutesBetweenGardens(db: Queryable, gardenIds: Id<'garden'>[]): Promise<Map<string, number>> {
  if (gardenIds.length < 2) return new Map();
  const rows = await db.select({ from: areaMinutes.fromGardenId, to: areaMinutes.toGardenId, minutes: areaMinutes.minutes }).from(areaMinutes)
    .where(and(inArray(areaMinutes.fromGardenId, gardenIds), inArray(areaMinutes.toGardenId, gardenIds))).limit(400);
  return new Map(rows.map((row) => [`${row.from} ${row.to}`, row.minutes]));
}
