import 'server-only';
import { randomUUID } from 'node:crypto';
import { getDb, type Queryable } from '@/db/client';
import { readClock } from './clock';
import type { ClubSettings, SystemCtx } from './context';

/** The context of a job or a sweep: the clock is read once, and machines have no role. `getClub` reads the club's settings. */
export async function systemCtx(name: string, getClub: (db: Queryable) => Promise<ClubSettings>): Promise<SystemCtx> {
  const db = getDb();
  return { db, club: await getClub(db), now: readClock(), requestId: randomUUID(), client: null, actor: { kind: 'system', name } };
}
