import 'server-only';
import { and, eq, inArray, sql, type SQL } from 'drizzle-orm';
import type { Queryable } from '@/db/client';
import { gardens } from '@/db/schema/gardens';
import { areaMinutes, entryTimes, openDays, prices, stops } from '@/db/schema/opendays';
import type { Id } from '@/lib/core/ids';
import type { PersonKind } from '@/lib/core/words';
import type { MinutesFact } from '@/lib/opendays/rules/reach';
import type { DayFacts, EntryFacts } from '@/lib/bookings/rules/hold';

/** What one person of a kind pays at a stop: the stop's own price, else the open day's, else nothing. */
const priceOf = (kind: PersonKind): SQL<number> => sql<number>`coalesce(
  (select ${prices.amountMinor} from ${prices} where ${prices.openDayId} = ${stops.openDayId} and ${prices.kind} = ${kind}
    and (${prices.stopId} = ${stops.id} or ${prices.stopId} is null) order by ${prices.stopId} nulls last limit 1), 0)`;

export type WishFacts = { day: DayFacts; entries: EntryFacts[]; minutes: MinutesFact[] };

/** All that the rules must know of these entry times, their open day and the minutes between their areas. One query. */
export async function findWishFacts(db: Queryable, openDayId: Id<'openDay'>, ids: readonly Id<'entryTime'>[]): Promise<WishFacts | null> {
  const asked = sql.join(ids.map((id) => sql`${id}::uuid`), sql`, `);
  const minutes = sql<MinutesFact[]>`coalesce((
    select json_agg(json_build_object('fromGardenId', m.from_garden_id, 'toGardenId', m.to_garden_id, 'minutes', m.minutes)) from ${areaMinutes} m
    where m.from_garden_id in (select s.garden_id from ${stops} s join ${entryTimes} e on e.stop_id = s.id where e.id in (${asked}))
      and m.to_garden_id in (select s.garden_id from ${stops} s join ${entryTimes} e on e.stop_id = s.id where e.id in (${asked}))), '[]'::json)`;
  const rows = await db.select({
    day: { openDayId: openDays.id, publishedAt: openDays.publishedAt, calledOffAt: openDays.calledOffAt, partyPeopleMax: openDays.partyPeopleMax },
    entry: {
      entryTimeId: entryTimes.id, openDayId: entryTimes.openDayId, gardenId: stops.gardenId, gardenName: gardens.shortName,
      opensAt: entryTimes.opensAt, graceUntil: entryTimes.graceUntil, closedAt: entryTimes.closedAt, stopClosedAt: stops.closedAt, stayMinutes: stops.stayMinutes,
      adultMinor: priceOf('adult'), childMinor: priceOf('child'), babeMinor: priceOf('babe'),
    },
    minutes: ids.length > 1 ? minutes : sql<MinutesFact[]>`'[]'::json`,
  })
    .from(openDays)
    .innerJoin(entryTimes, inArray(entryTimes.id, [...ids]))
    .innerJoin(stops, eq(stops.id, entryTimes.stopId))
    .innerJoin(gardens, eq(gardens.id, stops.gardenId))
    .where(and(eq(openDays.id, openDayId)));
  const first = rows[0];
  return first ? { day: first.day, entries: rows.map((row) => row.entry), minutes: first.minutes } : null;
}
