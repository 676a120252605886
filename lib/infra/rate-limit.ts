import 'server-only';
import { sql, type SQL } from 'drizzle-orm';
import type { Queryable } from '@/db/client';
import { Refusal } from '@/lib/core/refusal';

/** How often something may be tried in a window. */
export type Limit = { tries: number; minutes: number };

/** The statement that counts one try under `key` and returns `tries`, for a command that asks more in the same round trip. */
export function tryCounted(key: string, limit: Limit, now: Date): SQL {
  const windowStart = new Date(now.getTime() - limit.minutes * 60_000).toISOString();
  const at = now.toISOString();
  return sql`
    insert into rate_limits as r (key, window_started_at, tries) values (${key}, ${at}::timestamptz, 1)
    on conflict (key) do update set
      tries = case when r.window_started_at <= ${windowStart}::timestamptz then 1 else r.tries + 1 end,
      window_started_at = case when r.window_started_at <= ${windowStart}::timestamptz then ${at}::timestamptz else r.window_started_at end
    returning tries`;
}

/** Throws `too_many_tries` past the limit. */
export function refuseTries(tries: number, limit: Limit): void {
  if (tries > limit.tries) throw new Refusal('too_many_tries');
}

/**
 * Counts one try under `key` and throws `too_many_tries` past the limit. One upsert both counts and judges, so two
 * servers share one count. Keys are short words and hashes, never addresses.
 */
export async function countTry(db: Queryable, key: string, limit: Limit, now: Date): Promise<void> {
  const { rows } = await db.execute<{ tries: number }>(tryCounted(key, limit, now));
  refuseTries(rows[0]?.tries ?? 0, limit);
}
