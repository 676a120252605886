// Refunds, in full or in part, of a charge that was paid; never more than is left of it.
import { z } from 'zod';
import { badParam, CardsError, missing } from './answer';
import type { Charge, Refund, Transaction } from './shapes';
import type { Cause, Events } from './events';
import { parse } from './sessions';
import { newId, type Store } from './store';

const createParams = z.strictObject({
  payment_intent: z.string().optional(),
  charge: z.string().optional(),
  amount: z.string().regex(/^\d+$/, 'is not a whole number').transform(Number).pipe(z.number().min(1)).optional(),
  reason: z.enum(['duplicate', 'fraudulent', 'requested_by_customer']).optional(),
  metadata: z.record(z.string().max(40), z.string().max(500)).default({}),
  instructions_email: z.email().optional(),
});

export class Refunds {
  constructor(private readonly store: Store, private readonly events: Events) {}

  create(raw: unknown, cause: Cause): Refund {
    const params = parse(createParams, raw);
    const charge = this.chargeOf(params.charge, params.payment_intent);
    if (charge.refunded) throw new CardsError(400, `Charge ${charge.id} has been refunded already.`, { code: 'charge_already_refunded' });
    const left = charge.amount - charge.amount_refunded;
    const amount = params.amount ?? left;
    if (amount > left) {
      throw new CardsError(400, `${amount} is more than the ${left} that is left of charge ${charge.id}.`, { param: 'amount' });
    }
    const refund: Refund = {
      id: newId('re_3'), object: 'refund', created: this.store.now(), amount, currency: charge.currency, charge: charge.id,
      payment_intent: charge.payment_intent, balance_transaction: null, status: 'succeeded', reason: params.reason ?? null, metadata: params.metadata,
      customer: null, customer_account: null, payment_method: null, receipt_number: null, source_transfer_reversal: null, transfer_reversal: null,
      destination_details: { type: 'card', card: { type: 'pending' } },
    };
    const kept = this.store.put('refund', { ...refund, balance_transaction: this.transaction(refund, 'refund').id });
    this.refundedBy(charge, amount, cause);
    this.events.happened('refund.created', kept, cause);
    const arrived = this.store.put('refund', { ...kept, destination_details: { type: 'card', card: { type: 'refund', reference_status: 'available' } } });
    this.events.happened('refund.updated', arrived, cause, { destination_details: kept['destination_details'] });
    return kept;
  }

  /** The payer's bank sends the money back: the refund has failed and the club's balance has it again. */
  fail(id: string, cause: Cause): Refund {
    const refund = this.store.find('refund', id);
    const charge = refund ? this.store.find('charge', refund.charge) : null;
    if (!refund || !charge) throw missing('refund', id);
    if (refund.status === 'failed') return refund;
    const failed = this.store.put('refund', {
      ...refund, status: 'failed', failure_reason: 'expired_or_canceled_card', failure_balance_transaction: this.transaction(refund, 'refund_failure').id,
    });
    this.store.put('charge', { ...charge, amount_refunded: charge.amount_refunded - refund.amount, refunded: false });
    this.events.happened('refund.failed', failed, cause);
    this.events.happened('refund.updated', failed, cause, { status: refund.status });
    return failed;
  }

  private chargeOf(chargeId: string | undefined, intentId: string | undefined): Charge {
    if (!chargeId && !intentId) throw badParam('charge', 'Say which charge or payment intent is refunded.', 'parameter_missing');
    const intent = intentId ? this.store.find('intent', intentId) : null;
    if (intentId && !intent) throw missing('payment_intent', intentId, 'payment_intent');
    const id = chargeId ?? intent?.latest_charge;
    const charge = id ? this.store.find('charge', id) : null;
    if (chargeId && !charge) throw missing('charge', chargeId, 'charge');
    if (!charge?.paid) throw new CardsError(400, 'Nothing was paid, so nothing can be refunded.', { param: chargeId ? 'charge' : 'payment_intent', code: 'charge_not_refundable' });
    return charge;
  }

  private refundedBy(charge: Charge, amount: number, cause: Cause) {
    const amountRefunded = charge.amount_refunded + amount;
    const refunded = this.store.put('charge', { ...charge, amount_refunded: amountRefunded, refunded: amountRefunded === charge.amount });
    this.events.happened('charge.refunded', refunded, cause, { amount_refunded: charge.amount_refunded, refunded: false });
  }

  private transaction(refund: Refund, type: 'refund' | 'refund_failure'): Transaction {
    const amount = type === 'refund' ? -refund.amount : refund.amount;
    return this.store.put('transaction', {
      id: newId('txn_3'), object: 'balance_transaction', created: this.store.now(), available_on: this.store.now(), amount, fee: 0, net: amount,
      currency: refund.currency, type, reporting_category: type, source: refund.id, status: 'available', fee_details: [],
      description: null, exchange_rate: null, balance_type: 'payments',
    });
  }
}
