import { sumMinor } from '@/lib/core/money';
import type { Method } from '@/lib/core/words';

/** The accounts that the rules below post to; the migrations make them. */
export const ACCOUNTS = [
  { code: 'bank', name: 'Bank', kind: 'asset' },
  { code: 'cards-clearing', name: 'Card payments on their way to the bank', kind: 'asset' },
  { code: 'cash-in-hand', name: 'Cash in hand', kind: 'asset' },
  { code: 'cheques-in-hand', name: 'Cheques in hand', kind: 'asset' },
  { code: 'refunds-owed', name: 'Money to give back', kind: 'liability' },
  { code: 'ticket-income', name: 'Open-day tickets', kind: 'income' },
  { code: 'dues-income', name: "Members' dues", kind: 'income' },
  { code: 'card-fees', name: 'Card fees', kind: 'expense' },
] as const;
export type AccountCode = (typeof ACCOUNTS)[number]['code'];

/** The funds that money lies in. */
export const FUNDS = [
  { key: 'general', name: 'General fund', position: 1 },
  { key: 'open-days', name: 'Open days', position: 2 },
] as const;
export type FundKey = (typeof FUNDS)[number]['key'];

/** What it is for: tickets go to the open days' fund, dues to the general one. */
export type MoneyFor = 'tickets' | 'dues';

/**
 * What can happen to money. `received`: a payment of any method. `refund-owed`: the club says it gives some back;
 * `refund-paid`: it has left; `refund-failed`: the processor sent it back to us, so it is owed again. `unplaced`: money
 * came for places that are gone, so it is owed back at once. `fee`: what the card service kept of a payment.
 */
export type BusinessEvent =
  | { kind: 'received'; method: Method; for: MoneyFor; amountMinor: number }
  | { kind: 'unplaced'; for: MoneyFor; amountMinor: number }
  | { kind: 'refund-owed'; for: MoneyFor; amountMinor: number }
  | { kind: 'refund-paid'; method: Method; for: MoneyFor; amountMinor: number }
  | { kind: 'refund-failed'; method: Method; for: MoneyFor; amountMinor: number }
  | { kind: 'fee'; for: MoneyFor; amountMinor: number };

/** One side of an entry: debits are positive, credits negative. */
export type PostingLine = { account: AccountCode; fund: FundKey; amountMinor: number };

const HELD_IN = { card: 'cards-clearing', cheque: 'cheques-in-hand', cash: 'cash-in-hand', transfer: 'bank' } as const satisfies Record<Method, AccountCode>;
const INCOME = { tickets: 'ticket-income', dues: 'dues-income' } as const satisfies Record<MoneyFor, AccountCode>;
const FUND = { tickets: 'open-days', dues: 'general' } as const satisfies Record<MoneyFor, FundKey>;

/** `amountMinor` from one account to another: the one shape of every entry, so that it cannot fail to balance. */
function moved(from: AccountCode, to: AccountCode, fund: FundKey, amountMinor: number): PostingLine[] {
  if (!Number.isSafeInteger(amountMinor) || amountMinor <= 0) throw new RangeError('an entry moves a positive whole amount');
  return [{ account: to, fund, amountMinor }, { account: from, fund, amountMinor: -amountMinor }];
}

/** The postings of a business event: the table that every movement of money goes through. */
export function postingsFor(event: BusinessEvent): PostingLine[] {
  switch (event.kind) {
    case 'received': return moved(INCOME[event.for], HELD_IN[event.method], FUND[event.for], event.amountMinor);
    case 'unplaced': return moved('refunds-owed', 'cards-clearing', FUND[event.for], event.amountMinor);
    case 'refund-owed': return moved('refunds-owed', INCOME[event.for], FUND[event.for], event.amountMinor);
    case 'refund-paid': return moved(HELD_IN[event.method], 'refunds-owed', FUND[event.for], event.amountMinor);
    case 'refund-failed': return moved('refunds-owed', HELD_IN[event.method], FUND[event.for], event.amountMinor);
    case 'fee': return moved('cards-clearing', 'card-fees', FUND[event.for], event.amountMinor);
  }
}

/** The postings that undo others exactly. */
export const reversalOf = (lines: readonly PostingLine[]): PostingLine[] => lines.map((line) => ({ ...line, amountMinor: -line.amountMinor }));

/** What an account holds after these postings. */
export const balanceOf = (account: AccountCode, lines: readonly PostingLine[]): number =>
  sumMinor(lines.filter((line) => line.account === account).map((line) => line.amountMinor));

/** Minutes until the next try after `tries` earlier ones: 1, 2, 4 … at most 12 hours, without a last try. */
export const nextTryMinutes = (tries: number): number => Math.min(2 ** Math.min(tries, 10), 720);
