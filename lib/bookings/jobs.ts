import 'server-only';
import { z } from 'zod';
import { idField } from '@/lib/core/ids';

/** The job that asks the processor what became of one payment attempt; a nudge, the attempt's row is what survives. */
export const SETTLE_ATTEMPT = 'settleAttempt';
export const settleAttemptPayload = z.object({ attemptId: idField<'attempt'>() });

/** One job at most waits for an attempt. */
export const settleAttemptKey = (attemptId: string): string => `attempt:${attemptId}`;
