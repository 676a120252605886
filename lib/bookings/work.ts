import 'server-only';
import { getDb } from '@/db/client';
import { workerContext } from '@/lib/club/queries';
import { readClock } from '@/lib/infra/clock';
import { endHolds } from './commands/places';
import { settleAttempt, settleAttempts } from './commands/settle';
import { SETTLE_ATTEMPT, settleAttemptPayload } from './jobs';

export const tasks: Record<string, (payload: unknown) => Promise<void>> = {
  [SETTLE_ATTEMPT]: async (payload) => {
    await settleAttempt(await workerContext('settle attempt'), settleAttemptPayload.parse(payload).attemptId);
  },
};

/** Open payments are asked about first, so that what they free can be given back in the same sweep. */
export const sweeps: (() => Promise<void>)[] = [
  async function openPayments() { await settleAttempts(await workerContext('open payments')); },
  async function endedHolds() { await endHolds(getDb(), readClock()); },
];
