import 'server-only';
import { sql, type SQL } from 'drizzle-orm';
import type { Queryable } from '@/db/client';
import { Refusal } from '@/lib/core/refusal';

/** How often something may be tried in a window. */
export type Limit = { tries: number; minutes: number };

/**
 * Counts one try and returns `tries`: $1 the key, $2 the moment, $3 when a window that still counts began. As text, so
 * that a command in a rush can ask more in the same round trip.
 */
export const TRY_COUNTED = `
  insert into rate_limits as r (key, window_started_at, tries) values ($1::text, $2::timestamptz, 1)
  on conflict (key) do update set
    tries = case when r.window_started_at <= $3::timestamptz then 1 else r.tries + 1 end,
    window_started_at = case when r.window_started_at <= $3::timestamptz then $2::timestamptz else r.window_started_at end
  returning tries`;

/** When a window that still counts began at the earliest. */
export const windowStart = ({ limit, now }: { limit: Limit; now: Date }): Date => new Date(now.getTime() - limit.minutes * 60_000);

const withValues = (text: string, values: readonly string[]): SQL =>
  sql.join(text.split(/(\$\d)/).map((part) => (part.startsWith('$') ? sql`${values[Number(part.slice(1)) - 1]}` : sql.raw(part))));

/** Throws `too_many_tries` past the limit. */
export function refuseTries(tries: number, limit: Limit): void {
  if (tries > limit.tries) throw new Refusal('too_many_tries');
}

/**
 * Counts one try under `key` and throws `too_many_tries` past the limit. One upsert both counts and judges, so two
 * servers share one count. Keys are short words and hashes, never addresses.
 */
export async function countTry(db: Queryable, key: string, limit: Limit, now: Date): Promise<void> {
  const { rows } = await db.execute<{ tries: number }>(withValues(TRY_COUNTED, [key, now.toISOString(), windowStart({ limit, now }).toISOString()]));
  refuseTries(rows[0]?.tries ?? 0, limit);
}
