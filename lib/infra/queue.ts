import { sql } from 'drizzle-orm';
import type { Queryable } from '@/db/client';

/**
 * Puts a job on the queue inside the caller's transaction: both are kept, or neither. A job is only a nudge and may
 * run twice; what must survive is a row with a due time.
 */
export async function enqueue(tx: Queryable, task: string, payload: object, options: { runAt: Date; jobKey?: string }): Promise<void> {
  await tx.execute(sql`select queue.enqueue(${task}, ${JSON.stringify(payload)}::json, ${options.runAt.toISOString()}::timestamptz, ${options.jobKey ?? null}::text)`);
}
