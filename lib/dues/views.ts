import type { Id } from '@/lib/core/ids';
import type { Day } from '@/lib/core/time';
import type { Method } from '@/lib/core/words';
import type { Standing } from './rules/standing';

/** One term that a household was asked to pay, and what has come for it. */
export type ChargeView = {
  id: Id<'charge'>;
  className: string;
  termFrom: Day;
  termTo: Day;
  amountMinor: number;
  paidMinor: number;
  dueOn: Day;
  isPaying: boolean; // a card payment is open
};

/** One payment with its receipt's number. */
export type ReceiptView = { id: Id<'payment'>; number: string; method: Method; amountMinor: number; receivedOn: Day; termTo: Day | null };

/** A household's dues: how it stands, what it was asked, what it paid. */
export type DuesView = { joinedOn: Day; standing: Standing; charges: ChargeView[]; receipts: ReceiptView[] };

/** One line of the roll. */
export type RollLine = {
  id: Id<'household'>;
  name: string;
  memberNumber: number;
  className: string;
  standing: Standing;
  railways: string[];
  joinedOn: Day;
  since: number;
  owedMinor: number;
};

/** `2027/0318`, as receipts are numbered in letters and on pages. */
export const receiptNumber = (year: number, number: number): string => `${year}/${String(number).padStart(4, '0')}`;
