import 'server-only';
import { sql } from 'drizzle-orm';
import type { Queryable } from '@/db/client';

/** An entry time whose `taken` is not the heads of its live visits and walk-up places. */
export type TakenDifference = { entryTimeId: string; taken: number; live: number };

/** Every entry time where the one kept figure differs from what it stands for; none in a sound database. At most 100. */
export async function compareTaken(db: Queryable): Promise<TakenDifference[]> {
  const { rows } = await db.execute<TakenDifference>(sql`
    select e.id as "entryTimeId", e.taken, (e.walk_ups + coalesce(v.heads, 0))::int as live
    from entry_times e
    left join (select v.entry_time_id, sum(v.heads) as heads from visits v join bookings b on b.id = v.booking_id
      where v.given_back_at is null and b.released_at is null group by v.entry_time_id) v on v.entry_time_id = e.id
    where e.taken <> e.walk_ups + coalesce(v.heads, 0) limit 100`);
  return rows;
}
