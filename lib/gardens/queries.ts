import 'server-only';
import { and, asc, desc, eq, gt, isNotNull, isNull, lte, sql, type SQL } from 'drizzle-orm';
import { alias } from 'drizzle-orm/pg-core';
import { gardenAreas, gardenPlants, gardens, plants } from '@/db/schema/gardens';
import { areaMinutes, entryTimes, openDays, prices, stops } from '@/db/schema/opendays';
import { firstOrNull } from '@/lib/core/only';
import type { Ctx } from '@/lib/infra/context';
import { placesLeft } from '@/lib/opendays/queries';
import { isOver, type PriceFacts } from '@/lib/opendays/views';
import type { GardenRow, ListedRow, NextDayRow, PlantRow } from './views';

const isPublic = and(isNotNull(gardens.publishedAt), isNull(gardens.withdrawnAt));

/** The planting list of the garden in the outer query, tallest first. */
const plantList = sql<PlantRow[]>`(
  select coalesce(json_agg(json_build_object('key', ${plants.key}, 'commonName', ${plants.commonName}, 'colour', ${plants.colour}, 'drawing', ${plants.drawing},
    'bloomMonths', ${plants.bloomMonths}, 'isEvergreen', ${plants.isEvergreen}, 'heightMm', ${gardenPlants.heightMm}) order by ${gardenPlants.heightMm} desc, ${plants.key}), '[]')
  from ${gardenPlants} join ${plants} on ${plants.key} = ${gardenPlants.plantKey} where ${gardenPlants.gardenId} = ${gardens.id})`;

/** Columns everyone may know. The exact place lies in a table of its own, which no query in this file names. */
const publicColumns = {
  slug: gardens.slug, railwayName: gardens.railwayName, shortName: gardens.shortName, subtitle: gardens.subtitle, about: gardens.about, hostsShownAs: gardens.hostsShownAs,
  scaleOneTo: gardens.scaleOneTo, gaugeMm: gardens.gaugeMm, trackLengthMm: gardens.trackLengthMm, minRadiusMm: gardens.minRadiusMm, steepestGradePercent: gardens.steepestGradePercent,
  powers: gardens.powers, bridge: gardens.bridge, setIn: gardens.setIn, begunYear: gardens.begunYear, plate: gardens.plate, isStepFree: gardens.isStepFree, pathWidthMm: gardens.pathWidthMm,
  pathSurface: gardens.pathSurface, stepsNote: gardens.stepsNote, trackHeightMm: gardens.trackHeightMm, seats: gardens.seats, hasToilet: gardens.hasToilet, dogsNote: gardens.dogsNote,
  parkingNote: gardens.parkingNote, water: gardens.water, waterNote: gardens.waterNote, cautions: gardens.cautions, stayMinutes: gardens.stayMinutes, headsLimit: gardens.headsLimit,
  areaKey: gardenAreas.areaKey, areaName: gardenAreas.name, areaCaption: gardenAreas.caption, plants: plantList,
};

/** Published, and its gates are not shut for good. */
const isComing = (now: Date): SQL | undefined => and(isNotNull(openDays.publishedAt), lte(openDays.publishedAt, now), gt(openDays.closesAt, now));

/** The number of a garden that takes no part in the next open day: after its stops, by name, as the index numbers it. */
const restNumber = (now: Date): SQL<number> => sql<number>`(
  with next as (select ${openDays.id} as id from ${openDays} where ${isComing(now)} order by ${openDays.opensAt}, ${openDays.id} limit 1)
  select (select coalesce(max(s.number), 0) from stops s join next on s.open_day_id = next.id) + (
    select count(*) from gardens other where other.published_at is not null and other.withdrawn_at is null and other.railway_name <= ${gardens.railwayName}
      and not exists (select 1 from stops s join next on s.open_day_id = next.id where s.garden_id = other.id)))::int`;

/** One published garden with its planting, or null. */
export async function findGarden({ db, now }: Ctx, slug: string): Promise<(GardenRow & { restNumber: number }) | null> {
  const rows = await db.select({ ...publicColumns, restNumber: restNumber(now) }).from(gardens)
    .innerJoin(gardenAreas, eq(gardenAreas.gardenId, gardens.id))
    .where(and(eq(gardens.slug, slug), isPublic)).limit(1);
  return firstOrNull(rows);
}

/** The next open day in which a garden takes part, with its times there; null when there is none. At most 60 times. */
export async function findNextDay({ db, now }: Ctx, slug: string): Promise<NextDayRow | null> {
  const before = alias(stops, 'before');
  const beforeGarden = alias(gardens, 'before_garden');
  const rows = await db.select({
    slug: openDays.slug, title: openDays.title, heldOn: openDays.heldOn, calledOffAt: openDays.calledOffAt, calledOffNote: openDays.calledOffNote, number: stops.number, stopClosedAt: stops.closedAt,
    fromName: beforeGarden.shortName, fromNumber: before.number, fromMinutes: areaMinutes.minutes,
    entryTimeId: entryTimes.id, opensAt: entryTimes.opensAt, graceUntil: entryTimes.graceUntil, closedAt: entryTimes.closedAt, capacity: entryTimes.capacity, places: placesLeft(now),
  }).from(stops)
    .innerJoin(openDays, eq(openDays.id, stops.openDayId))
    .innerJoin(gardens, eq(gardens.id, stops.gardenId))
    .leftJoin(entryTimes, eq(entryTimes.stopId, stops.id))
    .leftJoin(before, and(eq(before.openDayId, openDays.id), eq(before.number, sql`${stops.number} - 1`)))
    .leftJoin(beforeGarden, eq(beforeGarden.id, before.gardenId))
    .leftJoin(areaMinutes, and(eq(areaMinutes.fromGardenId, before.gardenId), eq(areaMinutes.toGardenId, gardens.id)))
    .where(and(eq(gardens.slug, slug), isComing(now)))
    .orderBy(asc(openDays.opensAt), asc(openDays.id), asc(entryTimes.opensAt)).limit(60);
  const first = rows[0];
  if (!first) return null;
  const times = rows.filter((row) => row.slug === first.slug).flatMap((row) => (row.entryTimeId === null || row.opensAt === null || row.graceUntil === null ? [] : [{
    entryTimeId: row.entryTimeId, opensAt: row.opensAt, places: row.places, capacity: row.capacity ?? 0, isOver: isOver({ closedAt: row.closedAt, graceUntil: row.graceUntil }, row.stopClosedAt, now),
  }]));
  const capacity = times.reduce((sum, time) => sum + time.capacity, 0);
  return {
    slug: first.slug, title: first.title, heldOn: first.heldOn, isCalledOff: first.calledOffAt !== null, calledOffNote: first.calledOffNote, number: first.number,
    capacity, taken: capacity - times.reduce((sum, time) => sum + time.places, 0),
    from: first.fromName === null || first.fromNumber === null || first.fromMinutes === null ? null : { shortName: first.fromName, number: first.fromNumber, minutes: first.fromMinutes },
    times: times.map(({ entryTimeId, opensAt, places, isOver: over }) => ({ entryTimeId, opensAt, places, isOver: over })),
  };
}

/** A coming open day as the public pages name it. */
export type ComingDay = {
  slug: string; title: string; placeLine: string; howToCome: string | null; heldOn: string; opensAt: Date; closesAt: Date; isCalledOff: boolean; calledOffNote: string | null;
  prices: PriceFacts[];
};

/** Published open days that are not over, soonest first, with their prices; at most 12. */
export async function comingDays({ db, now }: Ctx): Promise<ComingDay[]> {
  const inner = sql`(select coalesce(json_agg(json_build_object('stopId', ${prices.stopId}, 'kind', ${prices.kind}, 'amountMinor', ${prices.amountMinor})), '[]') from ${prices} where ${prices.openDayId} = ${openDays.id})`;
  const priceList = sql<PriceFacts[]>`${inner}`; // one level down, or drizzle drops the table names of a query without a join (0.45, buildSelection)
  const rows = await db.select({
    slug: openDays.slug, title: openDays.title, placeLine: openDays.placeLine, howToCome: openDays.howToCome, heldOn: openDays.heldOn, opensAt: openDays.opensAt, closesAt: openDays.closesAt,
    calledOffAt: openDays.calledOffAt, calledOffNote: openDays.calledOffNote, prices: priceList,
  }).from(openDays).where(isComing(now)).orderBy(asc(openDays.opensAt), asc(openDays.id)).limit(12);
  return rows.map(({ calledOffAt, ...day }) => ({ ...day, isCalledOff: calledOffAt !== null }));
}

/** All published gardens, those of the given open day first and by number, with the places left there; at most 200. */
export async function listGardens({ db, now }: Ctx, daySlug: string | null): Promise<ListedRow[]> {
  const live = and(eq(entryTimes.stopId, stops.id), isNull(entryTimes.closedAt), gt(entryTimes.graceUntil, now));
  const left = (fold: SQL): SQL<number | null> => sql<number | null>`(select ${fold} from ${entryTimes} where ${live})`;
  const rows = await db.select({
    ...publicColumns, number: stops.number, stopClosedAt: stops.closedAt,
    best: left(sql`max(${placesLeft(now)})`), all: left(sql`sum(greatest(0, ${placesLeft(now)}))::int`),
  }).from(gardens)
    .innerJoin(gardenAreas, eq(gardenAreas.gardenId, gardens.id))
    .leftJoin(openDays, daySlug === null ? sql`false` : and(eq(openDays.slug, daySlug), isComing(now)))
    .leftJoin(stops, and(eq(stops.gardenId, gardens.id), eq(stops.openDayId, openDays.id)))
    .where(isPublic).orderBy(sql`${stops.number} asc nulls last`, asc(gardens.railwayName), desc(gardens.id)).limit(200);
  return rows.map(({ best, all, stopClosedAt, ...row }) => ({
    ...row, placesLeft: row.number === null ? null : stopClosedAt === null ? Math.max(0, best ?? 0) : 0, allPlaces: stopClosedAt === null ? (all ?? 0) : 0,
  }));
}
