import 'server-only';
import { and, asc, desc, eq, isNull, sql } from 'drizzle-orm';
import { bookings, visits } from '@/db/schema/bookings';
import { postings } from '@/db/schema/books';
import { gardens } from '@/db/schema/gardens';
import { letters, lettersDue } from '@/db/schema/letters';
import { entryTimes, openDays, planChanges, prices, stops } from '@/db/schema/opendays';
import { gatePasses } from '@/db/schema/people';
import type { Id } from '@/lib/core/ids';
import { firstOrNull } from '@/lib/core/only';
import type { AccountCtx } from '@/lib/infra/context';
import { full } from '@/lib/infra/sql-column';

/* Raw SQL below names its tables: a subquery's own columns and the outer query's never mix. */
const confirmedHeads = sql<number>`coalesce((select sum(v.heads) from ${visits} v join ${bookings} b on b.id = v.booking_id
  where v.entry_time_id = ${entryTimes.id} and v.given_back_at is null and b.confirmed_at is not null), 0)::int`;
const expectedPeople = sql<number>`coalesce((select sum(v.adults + v.children + v.babes) from ${visits} v join ${bookings} b on b.id = v.booking_id
  where v.entry_time_id = ${entryTimes.id} and v.given_back_at is null and b.confirmed_at is not null), 0)::int`;

const ownPrices = sql<{ adult?: number; child?: number; babe?: number }>`coalesce((select json_object_agg(p.kind, p.amount_minor) from ${prices} p where p.stop_id = ${stops.id}), '{}')`;

const cameIn = sql<number>`coalesce((select -sum(p.amount_minor) from ${postings} p where p.open_day_id = ${full(openDays.id)} and p.account = 'ticket-income'), 0)::int`;

/** All open days, the latest first, with their places and what they brought in, at most 60. */
export async function officeOpenDays({ db }: AccountCtx) {
  return db.select({
    id: openDays.id, slug: openDays.slug, title: openDays.title, heldOn: openDays.heldOn, publishedAt: openDays.publishedAt, calledOffAt: openDays.calledOffAt,
    stops: sql<number>`(select count(*) from ${stops} s where s.open_day_id = ${full(openDays.id)})::int`,
    capacity: sql<number>`coalesce((select sum(e.capacity) from ${entryTimes} e where e.open_day_id = ${full(openDays.id)}), 0)::int`,
    taken: sql<number>`coalesce((select sum(e.taken) from ${entryTimes} e where e.open_day_id = ${full(openDays.id)}), 0)::int`,
    cameInMinor: cameIn,
  }).from(openDays).orderBy(desc(openDays.heldOn)).limit(60);
}

/** One open day for the office with its figures and usual prices; null when there is none. */
export async function findOfficeDay({ db }: AccountCtx, slug: string) {
  const price = (kind: 'adult' | 'child' | 'babe') => sql<number>`coalesce((select p.amount_minor from ${prices} p where p.open_day_id = ${full(openDays.id)} and p.stop_id is null and p.kind = ${kind}), 0)::int`;
  const live = sql`from ${bookings} b where b.open_day_id = ${full(openDays.id)} and b.confirmed_at is not null and b.cancelled_at is null`;
  return firstOrNull(await db.select({
    id: openDays.id, slug: openDays.slug, title: openDays.title, placeLine: openDays.placeLine, howToCome: openDays.howToCome, heldOn: openDays.heldOn, opensAt: openDays.opensAt, closesAt: openDays.closesAt,
    publishedAt: openDays.publishedAt, calledOffAt: openDays.calledOffAt, partyPeopleMax: openDays.partyPeopleMax,
    adultMinor: price('adult'), childMinor: price('child'), babeMinor: price('babe'),
    parties: sql<number>`(select count(*) ${live})::int`,
    people: sql<number>`coalesce((select sum(m.heads) from (select max(v.adults + v.children + v.babes) as heads from ${visits} v join ${bookings} b on b.id = v.booking_id
      where v.open_day_id = ${full(openDays.id)} and v.given_back_at is null and b.confirmed_at is not null group by b.id) m), 0)::int`,
    cameInMinor: cameIn,
    lettersFailing: sql<number>`(select count(*) from ${letters} l join ${lettersDue} d on d.letter_id = l.id where l.open_day_id = ${full(openDays.id)} and d.tries > 0)::int`,
    lettersWritten: sql<number>`(select count(*) from ${letters} l where l.open_day_id = ${full(openDays.id)})::int`,
    passes: sql<number>`(select count(*) from ${gatePasses} g join ${stops} s on s.id = g.stop_id where s.open_day_id = ${full(openDays.id)} and g.revoked_at is null)::int`,
  }).from(openDays).where(eq(openDays.slug, slug)).limit(1));
}

/** The stops of an open day with their entry times, both in order; one row an entry time, or one empty for a stop without. */
export async function officeTimes({ db }: AccountCtx, openDayId: Id<'openDay'>) {
  return db.select({
    stopId: stops.id, number: stops.number, garden: gardens.railwayName, shortName: gardens.shortName, stayMinutes: stops.stayMinutes, headsLimit: stops.headsLimit, hostLimit: gardens.headsLimit,
    entryTimeId: entryTimes.id, opensAt: entryTimes.opensAt, graceUntil: entryTimes.graceUntil, capacity: entryTimes.capacity, taken: entryTimes.taken, walkUps: entryTimes.walkUps, closedAt: entryTimes.closedAt,
    confirmedHeads, expectedPeople, ownPrices,
  })
    .from(stops).innerJoin(gardens, eq(gardens.id, stops.gardenId)).leftJoin(entryTimes, eq(entryTimes.stopId, stops.id))
    .where(eq(stops.openDayId, openDayId)).orderBy(asc(stops.number), asc(entryTimes.opensAt)).limit(500);
}

/** Gardens that could become a stop of an open day: published ones that are none yet. */
export async function gardensToAdd({ db }: AccountCtx, openDayId: Id<'openDay'>) {
  return db.select({ id: gardens.id, name: gardens.railwayName, stayMinutes: gardens.stayMinutes, headsLimit: gardens.headsLimit }).from(gardens)
    .where(and(isNull(gardens.withdrawnAt), sql`not exists (select from ${stops} s where s.garden_id = ${gardens.id} and s.open_day_id = ${openDayId}::uuid)`))
    .orderBy(asc(gardens.railwayName)).limit(200);
}

/** The pencil notes of an open day, the newest first, at most 12. */
export async function planNotes({ db }: AccountCtx, openDayId: Id<'openDay'>) {
  return db.select({ id: planChanges.id, at: planChanges.at, initials: planChanges.initials, note: planChanges.note, stopNumber: stops.number }).from(planChanges).leftJoin(stops, eq(stops.id, planChanges.stopId))
    .where(eq(planChanges.openDayId, openDayId)).orderBy(desc(planChanges.at)).limit(12);
}
