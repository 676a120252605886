// Paying a session: the payment intent, each try as a charge, and what the club's balance gains.
import { customerDetails } from './sessions';
import type { Charge, Intent, Session, Transaction } from './shapes';
import type { Cause, Events } from './events';
import { newId, type Store } from './store';

/** Card numbers for trying things out, each with what it does. The numbers are the processor's published test numbers. */
export const TRIAL_CARDS = [
  { number: '4242424242424242', does: 'succeeds', label: 'pays' },
  { number: '4000000000000002', does: 'declined', label: 'is declined' },
  { number: '4000000000009995', does: 'insufficient', label: 'has too little on it' },
  { number: '4000002500003155', does: 'asks', label: 'is asked about by the bank' },
] as const;

export type Outcome = 'paid' | 'asks' | 'refused';
export type Payer = { email: string | null; name: string | null };

type Refusal = { code: string; declineCode?: string; message: string };
const REFUSALS: Record<'declined' | 'insufficient' | 'notYou', Refusal> = {
  declined: { code: 'card_declined', declineCode: 'generic_decline', message: 'The card was declined.' },
  insufficient: { code: 'card_declined', declineCode: 'insufficient_funds', message: 'There is too little money on the card.' },
  notYou: { code: 'payment_intent_authentication_failure', message: 'The bank could not make sure that it is you.' },
};

/** 2.9 % and 30 minor units, half up: a common published price for a card payment, and the one this stand-in charges. */
export const feeOf = (amount: number): number => Math.floor((amount * 29 + 500) / 1000) + 30;

export class Payments {
  /** How long after a charge its balance transaction exists, in milliseconds; with the processor it can be a while. */
  feeDelayMs = 0;

  constructor(private readonly store: Store, private readonly events: Events) {}

  /** Tries a card. The session must be open; the caller has looked. */
  pay(session: Session, number: string, payer: Payer, cause: Cause): { outcome: Outcome; says: string | null } {
    const card = TRIAL_CARDS.find((trial) => trial.number === number.replace(/\s/g, ''));
    const intent = this.intentOf(session, cause);
    if (card?.does === 'succeeds') return this.succeed(session, intent, payer, number, cause);
    if (card?.does === 'asks') {
      const waiting: Intent = { ...intent, status: 'requires_action', next_action: { type: 'use_stripe_sdk' } };
      this.events.happened('payment_intent.requires_action', this.store.put('intent', waiting), cause);
      this.store.put('session', { ...session, payment_intent: intent.id, customer_details: customerDetails(payer.email, payer.name) });
      return { outcome: 'asks', says: null };
    }
    return this.refuse(session, intent, REFUSALS[card?.does === 'insufficient' ? 'insufficient' : 'declined'], number, cause);
  }

  /** The bank asked "is this you?" and got an answer. Nothing happens when it had not asked. */
  answerBank(session: Session, isThem: boolean, cause: Cause): { outcome: Outcome; says: string | null } {
    const intent = this.intentOf(session, cause);
    if (intent.status !== 'requires_action') return { outcome: 'refused', says: null };
    const number = '4000002500003155';
    const { email = null, name = null } = session.customer_details ?? {};
    return isThem ? this.succeed(session, intent, { email, name }, number, cause) : this.refuse(session, intent, REFUSALS.notYou, number, cause);
  }

  /** Balance transactions that were not there yet and are due now. */
  settleDue(cause: Cause) {
    for (const charge of this.store.all('charge')) {
      if (charge.paid && charge.balance_transaction === null && this.store.nowMs() >= charge.created * 1000 + this.feeDelayMs) {
        const settled = this.store.put('charge', { ...charge, balance_transaction: this.transactionFor(charge).id });
        this.events.happened('charge.updated', settled, cause, { balance_transaction: null });
      }
    }
  }

  private intentOf(session: Session, cause: Cause): Intent {
    const old = session.payment_intent ? this.store.find('intent', session.payment_intent) : null;
    if (old) return old;
    const details = this.store.find('details', session.id);
    const id = newId('pi_3');
    const intent = this.store.put('intent', {
      id, object: 'payment_intent', created: this.store.now(), livemode: false, amount: session.amount_total, amount_received: 0, amount_capturable: 0,
      currency: session.currency, status: 'requires_payment_method', latest_charge: null, metadata: details?.intentMetadata ?? {},
      description: details?.description ?? null, receipt_email: details?.receiptEmail ?? null, last_payment_error: null, next_action: null,
      canceled_at: null, cancellation_reason: null, capture_method: 'automatic_async', confirmation_method: 'automatic', client_secret: newId(`${id}_secret_`),
      payment_method_types: ['card'], payment_method: null, payment_method_options: {}, customer: null, customer_account: null, application: null,
      application_fee_amount: null, automatic_payment_methods: null, on_behalf_of: null, processing: null, review: null, setup_future_usage: null,
      shipping: null, source: null, statement_descriptor: null, statement_descriptor_suffix: null, transfer_data: null, transfer_group: null,
      payment_method_configuration_details: null, payment_record: null, managed_payments: null, excluded_payment_method_types: null, allowed_payment_method_types: null,
    });
    this.store.put('session', { ...session, payment_intent: id });
    this.events.happened('payment_intent.created', intent, cause);
    return intent;
  }

  private succeed(session: Session, intent: Intent, payer: Payer, number: string, cause: Cause): { outcome: Outcome; says: null } {
    const made = this.chargeOf(session, intent, payer, number, null);
    const charge = this.feeDelayMs > 0 ? made : { ...made, balance_transaction: this.transactionFor(made).id };
    this.store.put('charge', charge);
    const paid = this.store.put('intent', {
      ...intent, status: 'succeeded', amount_received: intent.amount, latest_charge: charge.id, last_payment_error: null, next_action: null,
      payment_method: String(charge['payment_method']),
    });
    const complete = this.store.put('session', {
      ...session, payment_intent: intent.id, status: 'complete', payment_status: 'paid', url: null, customer_details: customerDetails(payer.email, payer.name),
    });
    this.events.happened('charge.succeeded', charge, cause);
    this.events.happened('payment_intent.succeeded', paid, cause);
    this.events.happened('checkout.session.completed', complete, cause);
    return { outcome: 'paid', says: null };
  }

  private refuse(session: Session, intent: Intent, why: Refusal, number: string, cause: Cause): { outcome: Outcome; says: string } {
    const asked = why.code === 'payment_intent_authentication_failure'; // the bank was asked first, so no charge was tried
    const charge = asked ? null : this.store.put('charge', this.chargeOf(session, intent, { email: session.customer_email, name: null }, number, why));
    const failed = this.store.put('intent', {
      ...intent, status: 'requires_payment_method', latest_charge: charge?.id ?? intent.latest_charge, next_action: null,
      last_payment_error: { type: asked ? 'invalid_request_error' : 'card_error', code: why.code, message: why.message,
        ...(why.declineCode && { decline_code: why.declineCode }), ...(charge && { charge: charge.id }) },
    });
    if (charge) this.events.happened('charge.failed', charge, cause);
    this.events.happened('payment_intent.payment_failed', failed, cause);
    return { outcome: 'refused', says: why.message };
  }

  private chargeOf(session: Session, intent: Intent, payer: Payer, number: string, why: Refusal | null): Charge {
    const amount = intent.amount;
    return {
      id: newId('ch_3'), object: 'charge', created: this.store.now(), livemode: false, amount, amount_captured: why ? 0 : amount, amount_refunded: 0,
      currency: session.currency, status: why ? 'failed' : 'succeeded', paid: !why, captured: !why, refunded: false, disputed: false,
      payment_intent: intent.id, balance_transaction: null, failure_code: why?.code ?? null, failure_message: why?.message ?? null,
      metadata: intent.metadata, description: intent.description, receipt_email: intent.receipt_email, payment_method: newId('pm_1'),
      billing_details: { email: payer.email, name: payer.name, phone: null, tax_id: null, address: { city: null, country: null, line1: null, line2: null, postal_code: null, state: null } },
      payment_method_details: { type: 'card', card: { brand: 'visa', last4: number.replace(/\D/g, '').slice(-4), exp_month: 12, exp_year: 2034, funding: 'credit', network: 'visa', country: 'US' } },
      outcome: why ? { type: 'issuer_declined', network_status: 'declined_by_network', reason: why.declineCode ?? null, risk_level: 'normal', seller_message: why.message }
        : { type: 'authorized', network_status: 'approved_by_network', reason: null, risk_level: 'normal', seller_message: 'Paid.' },
      application: null, application_fee: null, application_fee_amount: null, calculated_statement_descriptor: null, customer: null,
      failure_balance_transaction: null, fraud_details: {}, on_behalf_of: null, receipt_number: null, receipt_url: null, review: null, shipping: null,
      source: null, source_transfer: null, statement_descriptor: null, statement_descriptor_suffix: null, transfer_data: null, transfer_group: null,
    };
  }

  private transactionFor(charge: Charge): Transaction {
    const fee = feeOf(charge.amount);
    return this.store.put('transaction', {
      id: newId('txn_3'), object: 'balance_transaction', created: this.store.now(), available_on: this.store.now() + 2 * 86_400, amount: charge.amount, fee,
      net: charge.amount - fee, currency: charge.currency, type: 'charge', reporting_category: 'charge', source: charge.id, status: 'pending',
      fee_details: [{ amount: fee, application: null, currency: charge.currency, description: 'Card processing', type: 'stripe_fee' }],
      description: null, exchange_rate: null, balance_type: 'payments',
    });
  }
}
