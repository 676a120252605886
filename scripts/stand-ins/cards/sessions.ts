// Payment sessions: made, asked for, ended early, ended by time.
import { z } from 'zod';
import { badParam, CardsError, missing } from './answer';
import { asList } from './form';
import type { LineItem, Session } from './shapes';
import type { Cause, Events } from './events';
import { newId, type Store } from './store';

const MINUTE = 60;
const DAY = 24 * 60 * MINUTE;

const whole = z.string().regex(/^-?\d+$/, 'is not a whole number').transform(Number);
const metadata = z.record(z.string().max(40), z.string().max(500)).default({});
const url = z.url({ protocol: /^https?$/ });

const createParams = z.strictObject({
  mode: z.literal('payment'),
  line_items: z.preprocess(asList, z.array(z.strictObject({
    quantity: whole.pipe(z.number().min(1).max(999_999)),
    price_data: z.strictObject({
      currency: z.string().regex(/^[a-zA-Z]{3}$/).transform((code) => code.toLowerCase()),
      unit_amount: whole.pipe(z.number().min(0).max(99_999_999)),
      product_data: z.strictObject({ name: z.string().min(1).max(250), description: z.string().min(1).max(500).optional(), metadata }),
    }),
  })).min(1).max(100)),
  success_url: url,
  cancel_url: url.optional(),
  expires_at: whole.optional(),
  client_reference_id: z.string().max(200).optional(),
  customer_email: z.email().optional(),
  metadata,
  payment_method_types: z.preprocess(asList, z.array(z.literal('card'))).optional(),
  allowed_payment_method_types: z.preprocess(asList, z.array(z.literal('card'))).optional(),
  payment_intent_data: z.strictObject({
    metadata, description: z.string().max(1000).optional(), receipt_email: z.email().optional(),
    statement_descriptor_suffix: z.string().max(22).optional(), capture_method: z.literal('automatic').optional(),
  }).optional(),
  locale: z.string().max(6).optional(),
  submit_type: z.enum(['auto', 'book', 'donate', 'pay']).optional(),
  ui_mode: z.literal('hosted_page').optional(),
  customer_creation: z.literal('if_required').optional(),
});

const NULLS = {
  adaptive_pricing: null, after_expiration: null, allow_promotion_codes: null, billing_address_collection: null,
  client_secret: null, collected_information: null, consent: null, consent_collection: null, currency_conversion: null, customer: null,
  customer_account: null, integration_identifier: null, invoice: null, invoice_creation: null, managed_payments: null, origin_context: null,
  payment_link: null, payment_method_configuration_details: null, permissions: null, recovered_from: null, saved_payment_method_options: null,
  setup_intent: null, shipping_address_collection: null, shipping_cost: null, subscription: null, wallet_options: null,
};

export class Sessions {
  constructor(private readonly store: Store, private readonly events: Events, private readonly origin: () => string) {}

  create(raw: unknown): Session {
    const params = parse(createParams, raw);
    const now = this.store.now();
    const expiresAt = params.expires_at ?? now + DAY;
    if (expiresAt - now < 30 * MINUTE || expiresAt - now > DAY) {
      throw badParam('expires_at', 'A session ends at least 30 minutes and at most 24 hours after it is made.');
    }
    const currencies = new Set(params.line_items.map((item) => item.price_data.currency));
    const [currency] = currencies;
    if (!currency || currencies.size > 1) throw badParam('line_items', 'All items of a session are in one currency.');
    const items = params.line_items.map(toLine);
    const total = items.reduce((sum, item) => sum + item.amount_total, 0);
    if (total < 50) throw badParam('line_items', 'A card payment is at least 50 of the smallest unit.', 'amount_too_small');
    const id = newId('cs_test_a1', 56);
    this.store.put('details', {
      id, items, intentMetadata: params.payment_intent_data?.metadata ?? {},
      description: params.payment_intent_data?.description ?? null, receiptEmail: params.payment_intent_data?.receipt_email ?? null,
    });
    return this.store.put('session', {
      ...NULLS, id, object: 'checkout.session', created: now, expires_at: expiresAt, livemode: false, mode: 'payment', ui_mode: 'hosted_page',
      status: 'open', payment_status: 'unpaid', amount_total: total, amount_subtotal: total, currency, payment_intent: null,
      url: `${this.origin()}/pay/${id}`, success_url: params.success_url, cancel_url: params.cancel_url ?? null,
      client_reference_id: params.client_reference_id ?? null, customer_email: params.customer_email ?? null,
      customer_details: params.customer_email ? customerDetails(params.customer_email, null) : null, customer_creation: 'if_required',
      metadata: params.metadata, payment_method_types: ['card'], allowed_payment_method_types: params.allowed_payment_method_types ?? null, payment_method_collection: 'if_required', payment_method_options: {},
      locale: params.locale ?? null, submit_type: params.submit_type ?? null, custom_fields: [], shipping_options: [], discounts: [],
      custom_text: { after_submit: null, shipping_address: null, submit: null, terms_of_service_acceptance: null },
      phone_number_collection: { enabled: false }, total_details: { amount_discount: 0, amount_shipping: 0, amount_tax: 0 },
      automatic_tax: { enabled: false, liability: null, provider: null, status: null },
    });
  }

  /** The session as it is now: one whose time is over has ended. */
  get(id: string): Session {
    const session = this.store.find('session', id);
    if (!session) throw missing('checkout.session', id, 'session');
    return session;
  }

  expire(id: string, cause: Cause): Session {
    const session = this.get(id);
    if (session.status !== 'open') {
      throw new CardsError(400, `Only an open session can be ended; ${id} is ${session.status}.`, { param: 'session' });
    }
    return this.end(session, cause);
  }

  /** Ends every open session whose time is over. */
  expireDue(cause: Cause) {
    const now = this.store.now();
    for (const session of this.store.all('session')) {
      if (session.status === 'open' && session.expires_at <= now) this.end(session, cause);
    }
  }

  lines(id: string): LineItem[] {
    return this.store.find('details', this.get(id).id)?.items ?? [];
  }

  private end(session: Session, cause: Cause): Session {
    const ended = this.store.put('session', { ...session, status: 'expired', url: null });
    const intent = session.payment_intent ? this.store.find('intent', session.payment_intent) : null;
    if (intent && intent.status !== 'succeeded') {
      const canceled = this.store.put('intent', { ...intent, status: 'canceled', canceled_at: this.store.now(), cancellation_reason: 'automatic', next_action: null });
      this.events.happened('payment_intent.canceled', canceled, cause);
    }
    this.events.happened('checkout.session.expired', ended, cause);
    return ended;
  }
}

export const customerDetails = (email: string | null, name: string | null) =>
  ({ email, name, phone: null, address: null, tax_exempt: 'none' as const, tax_ids: [] as [] });

type Item = z.output<typeof createParams>['line_items'][number];

function toLine({ quantity, price_data: price }: Item): LineItem {
  const amount = quantity * price.unit_amount;
  return {
    id: newId('li_1'), object: 'item', amount_total: amount, amount_subtotal: amount, amount_discount: 0, amount_tax: 0,
    currency: price.currency, description: price.product_data.name, quantity,
    price: {
      id: newId('price_1'), object: 'price', active: false, currency: price.currency, unit_amount: price.unit_amount,
      unit_amount_decimal: String(price.unit_amount), product: newId('prod_'), type: 'one_time', recurring: null, livemode: false, metadata: {},
    },
  };
}

/** Parses parameters, or says which one is wrong in the processor's way of naming it: line_items[0][quantity]. */
export function parse<S extends z.ZodType>(schema: S, raw: unknown): z.output<S> {
  const result = schema.safeParse(raw);
  if (result.success) return result.data;
  const issue = result.error.issues[0];
  const [head = '', ...rest] = [...(issue?.path ?? []), ...(issue?.code === 'unrecognized_keys' ? issue.keys.slice(0, 1) : [])].map(String);
  const param = head + rest.map((part) => `[${part}]`).join('');
  if (issue?.code === 'unrecognized_keys') throw badParam(param, `There is no parameter called ${param}.`, 'parameter_unknown');
  if (issue?.code === 'invalid_type' && issue.input === undefined) throw badParam(param, `The parameter ${param} is needed.`, 'parameter_missing');
  throw badParam(param, `The parameter ${param} cannot be used: ${issue?.message ?? 'it is not of the right kind'}.`);
}
