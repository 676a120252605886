import { sumMinor } from '@/lib/core/money';

/** The accounts that the rules below post to; the migrations make them. */
export type AccountCode = 'bank' | 'cards-clearing' | 'cash-in-hand' | 'cheques-in-hand' | 'refunds-owed' | 'ticket-income' | 'dues-income' | 'card-fees';
export type FundKey = 'general' | 'open-days';
/** How money comes in. */
export type PayMethod = 'card' | 'cheque' | 'cash' | 'transfer';
/** What it is for: tickets go to the open days' fund, dues to the general one. */
export type MoneyFor = 'tickets' | 'dues';

/**
 * What can happen to money. `received`: a payment of any method. `refund-owed`: the club says it gives some back;
 * `refund-paid`: it has left; `refund-failed`: the processor sent it back to us, so it is owed again. `unplaced`: money
 * came for places that are gone, so it is owed back at once. `fee`: what the card service kept of a payment.
 */
export type BusinessEvent =
  | { kind: 'received'; method: PayMethod; for: MoneyFor; amountMinor: number }
  | { kind: 'unplaced'; amountMinor: number }
  | { kind: 'refund-owed'; for: MoneyFor; amountMinor: number }
  | { kind: 'refund-paid'; method: PayMethod; for: MoneyFor; amountMinor: number }
  | { kind: 'refund-failed'; method: PayMethod; for: MoneyFor; amountMinor: number }
  | { kind: 'fee'; for: MoneyFor; amountMinor: number };

/** One side of an entry: debits are positive, credits negative. */
export type PostingLine = { account: AccountCode; fund: FundKey; amountMinor: number };

const HELD_IN = { card: 'cards-clearing', cheque: 'cheques-in-hand', cash: 'cash-in-hand', transfer: 'bank' } as const satisfies Record<PayMethod, AccountCode>;
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
    case 'unplaced': return moved('refunds-owed', 'cards-clearing', 'open-days', event.amountMinor);
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
