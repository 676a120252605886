import 'server-only';
import { getClub } from '@/lib/club/queries';
import { systemCtx } from '@/lib/infra/system';
import { bookFees } from './commands/fees';
import { sendRefunds } from './commands/refunds';

export const tasks: Record<string, (payload: unknown) => Promise<void>> = {};

/** Refunds that are due go to the processor; what it kept of each payment is booked. */
export const sweeps: (() => Promise<void>)[] = [
  async function refundsDue() { await sendRefunds(await systemCtx('refunds', getClub)); },
  async function cardFees() { await bookFees(await systemCtx('card fees', getClub)); },
];
