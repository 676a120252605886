import 'server-only';
import { sql } from 'drizzle-orm';
import { getDb } from '@/db/client';
import { env } from './env';

/** Whether this server may be measured: only one that the tests have started. */
export const isMeasured = (): boolean => env().LEAFHALT_MODE === 'test';

/** The least that the database can be asked, on the pool that everything uses. */
export async function selectOne(): Promise<void> {
  await getDb().execute(sql`select 1`);
}
