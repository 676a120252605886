import 'server-only';
import { lt } from 'drizzle-orm';
import { getDb } from '@/db/client';
import { rateLimits } from '@/db/schema/club';
import { signInCodes } from '@/db/schema/people';
import { addMinutes } from '@/lib/core/time';
import { readClock } from '@/lib/infra/clock';

/** The longest window of any rate limit, and the longest life of a code, are far shorter than this. */
const KEPT_MINUTES = 24 * 60;

export const tasks: Record<string, (payload: unknown) => Promise<void>> = {};

export const sweeps: (() => Promise<void>)[] = [
  async function oldCountersAndCodes() {
    const before = addMinutes(readClock(), -KEPT_MINUTES);
    await getDb().delete(rateLimits).where(lt(rateLimits.windowStartedAt, before));
    await getDb().delete(signInCodes).where(lt(signInCodes.expiresAt, before));
  },
];
