// The processor's objects, as far as a club's card payments meet them. Field names are those of its public interface.

type Metadata = Record<string, string>;

export type LineItem = { id: string; object: 'item'; amount_total: number; amount_subtotal: number; amount_discount: 0; amount_tax: 0; currency: string; description: string; quantity: number; price: Record<string, unknown> };

export type Session = {
  id: string; object: 'checkout.session'; created: number; expires_at: number; livemode: false; mode: 'payment'; ui_mode: 'hosted_page';
  status: 'open' | 'complete' | 'expired'; payment_status: 'paid' | 'unpaid' | 'no_payment_required';
  amount_total: number; amount_subtotal: number; currency: string; payment_intent: string | null; url: string | null;
  success_url: string; cancel_url: string | null; client_reference_id: string | null; customer_email: string | null;
  customer_details: { email: string | null; name: string | null; phone: null; address: null; tax_exempt: 'none'; tax_ids: [] } | null;
  metadata: Metadata; payment_method_types: string[]; locale: string | null; submit_type: string | null;
  [nullField: string]: unknown;
};

/** What the session's page needs and the processor's answer does not show. */
export type SessionDetails = { id: string; items: LineItem[]; intentMetadata: Metadata; description: string | null; receiptEmail: string | null };

export type Intent = {
  id: string; object: 'payment_intent'; created: number; livemode: false; amount: number; amount_received: number; amount_capturable: 0; currency: string;
  status: 'requires_payment_method' | 'requires_action' | 'processing' | 'succeeded' | 'canceled';
  latest_charge: string | null; metadata: Metadata; last_payment_error: Record<string, unknown> | null; next_action: Record<string, unknown> | null;
  canceled_at: number | null; cancellation_reason: string | null; description: string | null; receipt_email: string | null;
  [nullField: string]: unknown;
};

export type Charge = {
  id: string; object: 'charge'; created: number; livemode: false; amount: number; amount_captured: number; amount_refunded: number; currency: string;
  status: 'succeeded' | 'failed'; paid: boolean; captured: boolean; refunded: boolean; disputed: boolean; payment_intent: string;
  balance_transaction: string | null; failure_code: string | null; failure_message: string | null; metadata: Metadata;
  [nullField: string]: unknown;
};

export type Refund = {
  id: string; object: 'refund'; created: number; amount: number; currency: string; charge: string; payment_intent: string;
  balance_transaction: string | null; status: 'succeeded' | 'pending' | 'failed'; reason: string | null; metadata: Metadata;
  failure_reason?: string; failure_balance_transaction?: string;
  [nullField: string]: unknown;
};

export type Transaction = {
  id: string; object: 'balance_transaction'; created: number; available_on: number; amount: number; fee: number; net: number; currency: string;
  type: 'charge' | 'refund' | 'refund_failure'; reporting_category: string; source: string; status: 'available' | 'pending';
  fee_details: Record<string, unknown>[]; description: string | null; exchange_rate: null; balance_type: 'payments';
};

export type Event = {
  id: string; object: 'event'; api_version: string; created: number; livemode: false; pending_webhooks: number; type: string;
  data: { object: unknown; previous_attributes?: unknown }; request: { id: string | null; idempotency_key: string | null };
};

export type KeptAnswer = { id: string; created: number; request: string; status: number; body: unknown };

/** A letter to the club's webhook that has not been accepted yet. */
export type Delivery = { id: string; event: string; tries: number; due: number };

/** Everything kept, by kind; the file on disk has one line for each change. */
export type Kinds = {
  session: Session; details: SessionDetails; intent: Intent; charge: Charge; refund: Refund; transaction: Transaction;
  event: Event; key: KeptAnswer; delivery: Delivery;
};
