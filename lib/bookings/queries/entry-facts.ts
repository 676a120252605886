import 'server-only';
import { sql } from 'drizzle-orm';
import type { Queryable } from '@/db/client';
import type { Id } from '@/lib/core/ids';
import type { ClubSettings } from '@/lib/infra/context';
import { runNamed } from '@/lib/infra/named-query';
import { refuseTries, TRY_COUNTED, windowStart, type Limit } from '@/lib/infra/rate-limit';
import type { PersonPrices } from '@/lib/opendays/rules/prices';
import type { MinutesFact } from '@/lib/opendays/rules/reach';
import { pricesOf, type PriceFacts } from '@/lib/opendays/views';
import type { DayFacts, EntryFacts } from '@/lib/bookings/rules/hold';

/** The club's settings that a hold goes by, read with its facts: a hold asks for nothing else. */
export type HoldClub = Pick<ClubSettings, 'timeZone' | 'locale' | 'hourCycle' | 'currency' | 'holdMinutes' | 'partyPeopleMax' | 'partyVisitsMax' | 'babesTakePlace'>;
export type WishFacts = { club: HoldClub; day: DayFacts; entries: EntryFacts[]; minutes: MinutesFact[] };

/** The same as JSON tells it: instants are text. */
type AsText<T> = { [K in keyof T]: T[K] extends Date ? string : T[K] extends Date | null ? string | null : T[K] };
type TextFacts = { club: HoldClub; day: AsText<DayFacts>; entries: (AsText<Omit<EntryFacts, keyof PersonPrices>> & { stopId: Id<'stop'> })[]; prices: PriceFacts[]; minutes: MinutesFact[] };

const instant = (text: string | null) => (text === null ? null : new Date(text));

const factsOf = (openDayId: Id<'openDay'>, ids: readonly Id<'entryTime'>[]) => sql`wish_facts(${openDayId}::uuid, ${`{${ids.join(',')}}`}::uuid[])`;

/**
 * All that the rules must know of these entry times, their open day and the minutes between their areas; null when there
 * is no such day. One call of a function whose plan is kept: this is the way of every hold.
 */
export async function findWishFacts(db: Queryable, openDayId: Id<'openDay'>, ids: readonly Id<'entryTime'>[]): Promise<WishFacts | null> {
  const { rows } = await db.execute<{ facts: TextFacts | null }>(sql`select ${factsOf(openDayId, ids)} as facts`);
  return toFacts(rows[0]?.facts ?? null);
}

const COUNT_AND_FIND = `with tried as (${TRY_COUNTED}) select tried.tries, wish_facts($4::uuid, $5::uuid[]) as facts from tried`;

/** The same after the limiter has counted this try under `key`, in one round trip; refuses past the limit. */
export async function countTryAndFindFacts(db: Queryable, tried: { key: string; limit: Limit; now: Date }, openDayId: Id<'openDay'>, ids: readonly Id<'entryTime'>[]): Promise<WishFacts | null> {
  const rows = await runNamed<{ tries: number; facts: TextFacts | null }>(db, 'count try and find facts', COUNT_AND_FIND,
    [tried.key, tried.now.toISOString(), windowStart(tried).toISOString(), openDayId, ids]);
  refuseTries(rows[0]?.tries ?? 0, tried.limit);
  return toFacts(rows[0]?.facts ?? null);
}

function toFacts(facts: TextFacts | null): WishFacts | null {
  if (!facts) return null;
  const { club, day, entries, prices, minutes } = facts;
  return {
    club,
    day: { ...day, publishedAt: instant(day.publishedAt), calledOffAt: instant(day.calledOffAt) },
    entries: entries.map(({ stopId, ...entry }) => ({
      ...entry, ...pricesOf(prices, stopId), opensAt: new Date(entry.opensAt), graceUntil: new Date(entry.graceUntil), closedAt: instant(entry.closedAt), stopClosedAt: instant(entry.stopClosedAt),
    })),
    minutes,
  };
}
