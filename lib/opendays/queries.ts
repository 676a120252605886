import 'server-only';
import { and, asc, desc, eq, gt, isNotNull, isNull, lte, sql, type SQL } from 'drizzle-orm';
import { bookings, visits } from '@/db/schema/bookings';
import { paymentAttempts } from '@/db/schema/books';
import { gardenAreas, gardenPlants, gardens, plants } from '@/db/schema/gardens';
import { areaMinutes, entryTimes, openDays, prices, stops } from '@/db/schema/opendays';
import type { Id } from '@/lib/core/ids';
import { firstOrNull } from '@/lib/core/only';
import { formatTime } from '@/lib/core/time';
import type { Ctx, HolderActor } from '@/lib/infra/context';
import type { DayFigures } from './rules/day-words';
import { toOpenDayLine, toOpenDayPage, toPlacesLeft, type OpenDayLine, type OpenDayPage, type OpenDayRow, type OwnKept, type PlacesLeft } from './views';

/**
 * A subselect as a column. Drizzle drops the table names of columns that stand directly in a selected `sql` when the query
 * has no join, which makes an outer `id` an inner one; one level deeper it keeps them (0.45, buildSelection).
 */
const scoped = <T>(inner: SQL<T>): SQL<T> => sql<T>`${inner}`;

/** Heads at an entry time on holds that ran out with no payment open: whoever comes next may have them at once. */
const heldOut = (now: Date): SQL<number> => sql<number>`coalesce((
  select sum(${visits.heads}) from ${visits} join ${bookings} on ${bookings.id} = ${visits.bookingId}
  where ${visits.entryTimeId} = ${entryTimes.id} and ${visits.givenBackAt} is null and ${bookings.confirmedAt} is null and ${bookings.releasedAt} is null
    and ${bookings.heldUntil} <= ${now.toISOString()}::timestamptz
    and not exists (select 1 from ${paymentAttempts} where ${paymentAttempts.bookingId} = ${bookings.id} and ${paymentAttempts.endedAt} is null)), 0)`;

/** Places left at an entry time: capacity − taken + heads of holds that ran out (and are not being paid). */
export const placesLeft = (now: Date): SQL<number> => sql<number>`(${entryTimes.capacity} - ${entryTimes.taken} + ${heldOut(now)})::int`;

/** What everyone may know is published; unpublished days are nobody's but the officers'. */
const isPublished = (now: Date) => and(isNotNull(openDays.publishedAt), lte(openDays.publishedAt, now));

/** Places, taken places, parties and people of the open day in the outer query. Walk-up places count on neither side. */
const figuresOf = (now: Date): SQL<DayFigures> => scoped(sql<DayFigures>`(
  select json_build_object(
    'places', coalesce(sum(${entryTimes.capacity} - ${entryTimes.walkUps}), 0),
    'taken', coalesce(sum(${entryTimes.taken} - ${entryTimes.walkUps} - ${heldOut(now)}), 0),
    'parties', (select count(*) from ${bookings} where ${bookings.openDayId} = ${openDays.id} and ${bookings.confirmedAt} is not null and ${bookings.cancelledAt} is null),
    'people', (select coalesce(sum(party.people), 0) from (
      select max(${visits.adults} + ${visits.children} + ${visits.babes}) as people from ${visits} join ${bookings} on ${bookings.id} = ${visits.bookingId}
      where ${visits.openDayId} = ${openDays.id} and ${visits.givenBackAt} is null and ${bookings.confirmedAt} is not null and ${bookings.cancelledAt} is null
      group by ${bookings.id}) party))
  from ${entryTimes} where ${entryTimes.openDayId} = ${openDays.id})`);

const gardenCount = scoped(sql<number>`(select count(*)::int from ${stops} where ${stops.openDayId} = ${openDays.id})`);

const dayColumns = {
  id: openDays.id, slug: openDays.slug, title: openDays.title, placeLine: openDays.placeLine, howToCome: openDays.howToCome, heldOn: openDays.heldOn,
  opensAt: openDays.opensAt, closesAt: openDays.closesAt, calledOffAt: openDays.calledOffAt, calledOffNote: openDays.calledOffNote, gardens: gardenCount,
};

/** Published open days: coming ones soonest first, then past ones, the latest first; at most 40. */
export async function listOpenDays({ db, now, club }: Ctx): Promise<OpenDayLine[]> {
  const isPast = sql`${openDays.closesAt} <= ${now.toISOString()}::timestamptz`;
  const rows = await db.select({ ...dayColumns, figures: figuresOf(now) }).from(openDays).where(isPublished(now))
    .orderBy(sql`${isPast}`, sql`case when ${isPast} then null else ${openDays.opensAt} end`, desc(openDays.opensAt), asc(openDays.id)).limit(40);
  return rows.map((row) => toOpenDayLine(row, club, now));
}

/** The planting list of a stop's garden, for what is in flower. */
const plantList = sql`(select coalesce(json_agg(json_build_object('key', ${plants.key}, 'commonName', ${plants.commonName}, 'colour', ${plants.colour}, 'drawing', ${plants.drawing},
  'bloomMonths', ${plants.bloomMonths}, 'isEvergreen', ${plants.isEvergreen}, 'heightMm', ${gardenPlants.heightMm}) order by ${gardenPlants.heightMm} desc, ${plants.key}), '[]')
  from ${gardenPlants} join ${plants} on ${plants.key} = ${gardenPlants.plantKey} where ${gardenPlants.gardenId} = ${gardens.id})`;

const stopList = scoped(sql<OpenDayRow['stops']>`(select coalesce(json_agg(json_build_object(
    'stopId', ${stops.id}, 'gardenId', ${gardens.id}, 'number', ${stops.number}, 'slug', ${gardens.slug}, 'name', ${gardens.railwayName}, 'shortName', ${gardens.shortName},
    'scaleOneTo', ${gardens.scaleOneTo}::float8, 'stayMinutes', ${stops.stayMinutes}, 'powers', ${gardens.powers}, 'water', ${gardens.water}, 'waterNote', ${gardens.waterNote},
    'trackHeightMm', ${gardens.trackHeightMm}, 'isStepFree', ${gardens.isStepFree}, 'stepsNote', ${gardens.stepsNote}, 'cautions', ${gardens.cautions},
    'areaKey', ${gardenAreas.areaKey}, 'areaName', ${gardenAreas.name}, 'plants', ${plantList}) order by ${stops.number}), '[]')
  from ${stops} join ${gardens} on ${gardens.id} = ${stops.gardenId} join ${gardenAreas} on ${gardenAreas.gardenId} = ${gardens.id} where ${stops.openDayId} = ${openDays.id})`);

const priceList = scoped(sql<OpenDayRow['prices']>`(select coalesce(json_agg(json_build_object('stopId', ${prices.stopId}, 'kind', ${prices.kind}, 'amountMinor', ${prices.amountMinor})), '[]')
  from ${prices} where ${prices.openDayId} = ${openDays.id})`);

const minuteList = scoped(sql<OpenDayRow['minutes']>`(select coalesce(json_agg(json_build_object('fromGardenId', ${areaMinutes.fromGardenId}, 'toGardenId', ${areaMinutes.toGardenId}, 'minutes', ${areaMinutes.minutes})), '[]')
  from ${areaMinutes} where ${areaMinutes.fromGardenId} in (select ${stops.gardenId} from ${stops} where ${stops.openDayId} = ${openDays.id})
    and ${areaMinutes.toGardenId} in (select ${stops.gardenId} from ${stops} where ${stops.openDayId} = ${openDays.id}))`);

const entryColumns = (now: Date) => ({
  entryTimeId: entryTimes.id, stopId: entryTimes.stopId, opensAt: entryTimes.opensAt, graceUntil: entryTimes.graceUntil, closedAt: entryTimes.closedAt, stopClosedAt: stops.closedAt, places: placesLeft(now),
});

/** One published open day with its board, or null. Two queries; at most 14 × 60 entry times. */
export async function findOpenDay({ db, now, club }: Ctx, slug: string): Promise<OpenDayPage | null> {
  const [days, entries] = await Promise.all([
    db.select({ ...dayColumns, partyPeopleMax: openDays.partyPeopleMax, figures: figuresOf(now), stops: stopList, prices: priceList, minutes: minuteList })
      .from(openDays).where(and(eq(openDays.slug, slug), isPublished(now))).limit(1),
    db.select(entryColumns(now)).from(entryTimes).innerJoin(stops, eq(stops.id, entryTimes.stopId)).innerJoin(openDays, eq(openDays.id, entryTimes.openDayId))
      .where(and(eq(openDays.slug, slug), isPublished(now))).orderBy(asc(entryTimes.opensAt), asc(entryTimes.id)).limit(840),
  ]);
  const day = firstOrNull(days);
  return day && toOpenDayPage(day, entries, club, now);
}

/** Places left at every entry time of a published open day, or null when there is no such day. One query. */
export async function findPlacesLeft({ db, now }: Pick<Ctx, 'db' | 'now'>, openDayId: Id<'openDay'>): Promise<PlacesLeft | null> {
  const rows = await db.select({ ...entryColumns(now), dayId: openDays.id }).from(openDays)
    .leftJoin(entryTimes, eq(entryTimes.openDayId, openDays.id)).leftJoin(stops, eq(stops.id, entryTimes.stopId))
    .where(and(eq(openDays.id, openDayId), isPublished(now))).limit(840);
  if (rows.length === 0) return null;
  return toPlacesLeft(rows.flatMap(({ entryTimeId, graceUntil, closedAt, stopClosedAt, places }) =>
    (entryTimeId === null || graceUntil === null ? [] : [{ entryTimeId, graceUntil, closedAt, stopClosedAt, places }])), now);
}

/** The places of an open day that this browser keeps now, or null. One query. */
export async function findOwnKept({ db, now, club, actor }: Ctx<HolderActor>, slug: string): Promise<OwnKept | null> {
  const rows = await db.select({ heldUntil: bookings.heldUntil, entryTimeId: visits.entryTimeId, heads: visits.heads }).from(bookings)
    .innerJoin(openDays, eq(openDays.id, bookings.openDayId)).innerJoin(visits, eq(visits.bookingId, bookings.id))
    .where(and(eq(openDays.slug, slug), eq(bookings.holderHash, actor.holderHash), isNull(bookings.confirmedAt), isNull(bookings.releasedAt), isNull(visits.givenBackAt), gt(bookings.heldUntil, now))).limit(14);
  const first = firstOrNull(rows);
  return first && { keptUntil: formatTime(first.heldUntil, club), heads: Object.fromEntries(rows.map((row) => [row.entryTimeId, row.heads])) };
}
