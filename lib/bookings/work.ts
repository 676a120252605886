import 'server-only';
import { getDb } from '@/db/client';
import { dayOf, type Day } from '@/lib/core/time';
import { log } from '@/lib/infra/log';
import { getClub } from '@/lib/club/queries';
import { systemCtx } from '@/lib/infra/system';
import { readClock } from '@/lib/infra/clock';
import { endHolds } from './commands/places';
import { settleAttempt, settleAttempts } from './commands/settle';
import { compareTaken } from './queries/taken';
import { SETTLE_ATTEMPT, settleAttemptPayload } from './jobs';

export const tasks: Record<string, (payload: unknown) => Promise<void>> = {
  [SETTLE_ATTEMPT]: async (payload) => {
    await settleAttempt(await systemCtx('settle attempt', getClub), settleAttemptPayload.parse(payload).attemptId);
  },
};

/** The club's day on which this worker last compared `taken` with what it stands for; once a day is enough. */
let comparedOn: Day | null = null;

/** Open payments are asked about first, so that what they free can be given back in the same sweep. */
export const sweeps: (() => Promise<void>)[] = [
  async function openPayments() { await settleAttempts(await systemCtx('open payments', getClub)); },
  async function endedHolds() { await endHolds(getDb(), readClock()); },
  async function takenCompared() {
    const { db, now, club } = await systemCtx('taken compared', getClub);
    const today = dayOf(now, club.timeZone);
    if (comparedOn === today) return;
    comparedOn = today;
    for (const { entryTimeId, taken, live } of await compareTaken(db)) log.error('taken differs from live visits', new Error('places do not add up'), { entryTimeId, taken, live });
  },
];
