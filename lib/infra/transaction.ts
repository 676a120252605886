import { sql } from 'drizzle-orm';
import type { Queryable, Tx } from '@/db/client';
import { sqlStateOf } from './sql-state';

const RETRIED = new Set(['40P01', '40001']); // deadlock_detected, serialization_failure: the other one went first

/**
 * Runs `work` in one transaction with a lock_timeout of 2 s, and tries it up to three times when it lost a
 * deadlock or a serialization race. Inside another transaction it simply joins it.
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
      if (tries >= 3 || !RETRIED.has(sqlStateOf(error) ?? '')) throw error;
    }
  }
}
