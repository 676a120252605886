import 'server-only';
import { sql } from 'drizzle-orm';
import type { Queryable } from '@/db/client';
import type { Id } from '@/lib/core/ids';
import type { MinutesFact } from '@/lib/opendays/rules/reach';
import type { DayFacts, EntryFacts } from '@/lib/bookings/rules/hold';

export type WishFacts = { day: DayFacts; entries: EntryFacts[]; minutes: MinutesFact[] };

/** The same as JSON tells it: instants are text. */
type AsText<T> = { [K in keyof T]: T[K] extends Date ? string : T[K] extends Date | null ? string | null : T[K] };
type TextFacts = { day: AsText<DayFacts>; entries: AsText<EntryFacts>[]; minutes: MinutesFact[] };

const instant = (text: string | null) => (text === null ? null : new Date(text));

/**
 * All that the rules must know of these entry times, their open day and the minutes between their areas; null when there
 * is no such day. One call of a function whose plan is kept: this is the way of every hold.
 */
export async function findWishFacts(db: Queryable, openDayId: Id<'openDay'>, ids: readonly Id<'entryTime'>[]): Promise<WishFacts | null> {
  const { rows } = await db.execute<{ facts: TextFacts | null }>(sql`select wish_facts(${openDayId}::uuid, ${`{${ids.join(',')}}`}::uuid[]) as facts`);
  const facts = rows[0]?.facts;
  if (!facts) return null;
  const { day, entries, minutes } = facts;
  return {
    day: { ...day, publishedAt: instant(day.publishedAt), calledOffAt: instant(day.calledOffAt) },
    entries: entries.map((entry) => ({
      ...entry, opensAt: new Date(entry.opensAt), graceUntil: new Date(entry.graceUntil), closedAt: instant(entry.closedAt), stopClosedAt: instant(entry.stopClosedAt),
    })),
    minutes,
  };
}
