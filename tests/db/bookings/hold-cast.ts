import { and, eq, isNull, sql } from 'drizzle-orm';
import { getDb } from '@/db/client';
import { bookings, visits } from '@/db/schema/bookings';
import { entryTimes } from '@/db/schema/opendays';
import { holdPlaces } from '@/lib/bookings/commands/hold';
import type { Id } from '@/lib/core/ids';
import { only } from '@/lib/core/only';
import { Refusal } from '@/lib/core/refusal';
import type { HolderActor } from '@/lib/infra/context';
import { aBrowser, ctxOf, NOON } from '../../support/cast';

export const TWO = { adults: 2, children: 0, babes: 0 };

/** Has a browser keep the same people at these entry times; answers the booking's id. */
export async function keep(openDayId: Id<'openDay'>, ids: readonly Id<'entryTime'>[], who: HolderActor = aBrowser(), { now = NOON, people = TWO, insists = true } = {}) {
  return holdPlaces(await ctxOf(who, now), { openDayId, insists, wanted: ids.map((entryTimeId) => ({ entryTimeId, ...people })) });
}

/** The code of the refusal that a promise ends in, or "done". Anything unexpected is thrown on. */
export async function refusalOf(done: Promise<unknown>): Promise<string> {
  try {
    await done;
    return 'done';
  } catch (error) {
    if (error instanceof Refusal) return error.code;
    throw error;
  }
}

/** How many places of an entry time are taken. */
export async function takenAt(id: Id<'entryTime'>): Promise<number> {
  return only(await getDb().select({ taken: entryTimes.taken }).from(entryTimes).where(eq(entryTimes.id, id))).taken;
}

/** Heads of live visits at an entry time: what `taken` must agree with. */
export async function liveHeadsAt(id: Id<'entryTime'>): Promise<number> {
  const rows = await getDb().select({ heads: sql<number>`coalesce(sum(${visits.heads}), 0)::int` }).from(visits)
    .innerJoin(bookings, eq(bookings.id, visits.bookingId))
    .where(and(eq(visits.entryTimeId, id), isNull(visits.givenBackAt), isNull(bookings.releasedAt)));
  return only(rows).heads;
}

/** How many deadlocks PostgreSQL has broken in this test's own database; every connection hands in its count first. */
export async function deadlocksSoFar(): Promise<number> {
  const pool = getDb().$client;
  const clients = await Promise.all(Array.from({ length: pool.options.max }, () => pool.connect()));
  for (const client of clients) await client.query('select pg_stat_force_next_flush()');
  for (const client of clients) client.release();
  const { rows } = await pool.query<{ deadlocks: string }>('select deadlocks from pg_stat_database where datname = current_database()');
  return Number(rows[0]?.deadlocks ?? 0);
}

/** Runs many at once, no more than the pool lets through, and counts how they ended by refusal. */
export async function outcomes(parties: readonly (() => Promise<unknown>)[]): Promise<Record<string, number>> {
  const ends = await Promise.all(parties.map((party) => refusalOf(party())));
  const counts: Record<string, number> = {};
  for (const end of ends) counts[end] = (counts[end] ?? 0) + 1;
  return counts;
}
