import { sql } from 'drizzle-orm';
import type { Queryable, Tx } from '@/db/client';
import { Refusal } from '@/lib/core/refusal';
import { sqlStateOf } from './sql-state';

const RETRIED = new Set(['40P01', '40001']); // deadlock_detected, serialization_failure: the other one went first
const NOT_AVAILABLE = '55P03'; // lock_not_available: it has waited long enough, so it is not tried again (PostgreSQL manual, appendix A)

/**
 * Runs `work` in one transaction with a lock_timeout of 2 s, and tries it up to three times when it lost a
 * deadlock or a serialization race; who loses them all, or waits in vain, is refused as `busy`. Inside another
 * transaction it simply joins it.
 */
export async function inTransaction<T>(db: Queryable, work: (tx: Tx) => Promise<T>): Promise<T> {
  if (!('$client' in db)) return work(db);
  for (let tries = 1; ; tries += 1) {
    try {
      return await db.transaction(async (tx) => {
        await tx.execute(sql`set local lock_timeout = '2s'`);
        return work(tx);
      });
    } catch (error) {
      const state = sqlStateOf(error) ?? '';
      if (state === NOT_AVAILABLE || (tries >= 3 && RETRIED.has(state))) throw new Refusal('busy');
      if (!RETRIED.has(state)) throw error;
    }
  }
}
