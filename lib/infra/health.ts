import 'server-only';
import { sql } from 'drizzle-orm';
import { getDb } from '@/db/client';
import { log } from './log';

/** Whether the database answers and the club is in it. */
export async function isDatabaseThere(): Promise<boolean> {
  try {
    await getDb().execute(sql`select 1 from club`);
    return true;
  } catch (error) {
    log.error('health', error);
    return false;
  }
}
