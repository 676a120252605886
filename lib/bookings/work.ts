import 'server-only';
import { getDb } from '@/db/client';
import { getClub } from '@/lib/club/queries';
import { systemCtx } from '@/lib/infra/system';
import { readClock } from '@/lib/infra/clock';
import { endHolds } from './commands/places';
import { settleAttempt, settleAttempts } from './commands/settle';
import { SETTLE_ATTEMPT, settleAttemptPayload } from './jobs';

export const tasks: Record<string, (payload: unknown) => Promise<void>> = {
  [SETTLE_ATTEMPT]: async (payload) => {
    await settleAttempt(await systemCtx('settle attempt', getClub), settleAttemptPayload.parse(payload).attemptId);
  },
};

/** Open payments are asked about first, so that what they free can be given back in the same sweep. */
export const sweeps: (() => Promise<void>)[] = [
  async function openPayments() { await settleAttempts(await systemCtx('open payments', getClub)); },
  async function endedHolds() { await endHolds(getDb(), readClock()); },
];
