import { appendFileSync, mkdirSync } from 'node:fs';
import { dirname } from 'node:path';
import { createHash } from 'node:crypto';
import type { cardPayments, paymentAttempts } from '@/db/schema/books';
import type { Charge, Intent, Transaction } from '../stand-ins/cards/shapes';

type Attempt = typeof paymentAttempts.$inferInsert;
type Card = typeof cardPayments.$inferInsert;
/** One line of the card stand-in's file: the kind of thing and the thing. */
export type MemoryLine = ['intent', Intent] | ['charge', Charge] | ['transaction', Transaction];

const named = (prefix: string, intent: string): string => `${prefix}_demo_${createHash('sha256').update(`${prefix} ${intent}`).digest('hex').slice(0, 24)}`;

function linesOf({ paymentIntentId, amountMinor: amount, currency, openedAt }: Attempt, feeMinor: number, amountRefunded: number): MemoryLine[] {
  if (!paymentIntentId) return [];
  const made = Math.floor(openedAt.getTime() / 1000);
  const [chargeId, transactionId] = [named('ch', paymentIntentId), named('txn', paymentIntentId)];
  const common = { created: made, currency: currency.toLowerCase(), livemode: false as const, metadata: {}, description: null };
  return [
    ['intent', { ...common, id: paymentIntentId, object: 'payment_intent', amount, amount_received: amount, amount_capturable: 0, status: 'succeeded', latest_charge: chargeId, last_payment_error: null, next_action: null, canceled_at: null, cancellation_reason: null, receipt_email: null }],
    ['charge', {
      ...common, id: chargeId, object: 'charge', amount, amount_captured: amount, amount_refunded: amountRefunded, status: 'succeeded', paid: true, captured: true, refunded: amountRefunded === amount, disputed: false,
      payment_intent: paymentIntentId, balance_transaction: transactionId, failure_code: null, failure_message: null,
    }],
    ['transaction', {
      id: transactionId, object: 'balance_transaction', created: made, available_on: made + 2 * 86_400, amount, fee: feeMinor, net: amount - feeMinor, currency: common.currency, type: 'charge', reporting_category: 'charge',
      source: chargeId, status: 'available', fee_details: [], description: null, exchange_rate: null, balance_type: 'payments',
    }],
  ];
}

/** What the card stand-in must know of the demo's payments, so that they can be refunded like any other. `refunded` is what went back, by payment intent. */
export function cardMemory(attempts: readonly Attempt[], cards: readonly Card[], refunded: ReadonlyMap<string, number>): MemoryLine[] {
  const fees = new Map(cards.filter(({ outcome }) => outcome === 'fee').map(({ objectId, amountMinor }) => [objectId, amountMinor]));
  return attempts.flatMap((attempt) => linesOf(attempt, fees.get(attempt.paymentIntentId ?? '') ?? 0, refunded.get(attempt.paymentIntentId ?? '') ?? 0));
}

/** Adds the lines to the stand-in's file, which it reads when it starts. */
export function rememberCards(file: string, lines: readonly MemoryLine[]): void {
  mkdirSync(dirname(file), { recursive: true });
  appendFileSync(file, lines.map((line) => `${JSON.stringify(line)}\n`).join(''));
}
