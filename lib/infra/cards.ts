import 'server-only';
import Stripe from 'stripe';
import { env } from './env';

/** What the processor says of one payment session, in our words. */
export type SessionSnapshot = {
  sessionId: string;
  attemptId: string | null; // our id, carried in its metadata
  status: 'open' | 'complete' | 'expired';
  isPaid: boolean;
  paymentIntentId: string | null;
  amountMinor: number;
  currency: string; // ISO 4217, upper case
  expiresAt: Date;
  url: string | null;
};

/** What the processor says of one refund. */
export type RefundSnapshot = { refundId: string; ourId: string | null; state: 'done' | 'waiting' | 'failed'; amountMinor: number };

/** A payment session to be made. Amounts and lines come from our tables, never from a browser. */
export type NewSession = {
  attemptId: string;
  idempotencyKey: string;
  lines: { name: string; amountMinor: number }[];
  currency: string;
  email: string | null;
  expiresAt: Date;
  doneUrl: string;
  backUrl: string;
};

/** An event as it arrived, its signature checked. */
export type CardEvent = { id: string; kind: string; objectId: string | null; session: SessionSnapshot | null; refund: RefundSnapshot | null };

/** The processor did not answer, or answered no. `isAnswer` says that it did answer, so the same key would get the same answer. */
export class CardsProblem extends Error {
  constructor(readonly isAnswer: boolean, readonly code: string | null, cause: unknown) {
    super('the card service said no', { cause });
    this.name = 'CardsProblem';
  }
}

let made: { key: string; stripe: Stripe } | undefined;

function stripe(): Stripe {
  const { STRIPE_SECRET_KEY, STRIPE_API_URL } = env();
  const key = `${STRIPE_SECRET_KEY} ${STRIPE_API_URL ?? ''}`;
  if (made?.key !== key) {
    const at = STRIPE_API_URL === undefined ? null : new URL(STRIPE_API_URL);
    const where = at === null ? {} : { host: at.hostname, port: at.port || (at.protocol === 'https:' ? 443 : 80), protocol: at.protocol === 'https:' ? 'https' as const : 'http' as const };
    made = { key, stripe: new Stripe(STRIPE_SECRET_KEY, { ...where, telemetry: false, maxNetworkRetries: 1, timeout: 10_000 }) };
  }
  return made.stripe;
}

async function asked<T>(call: () => Promise<T>): Promise<T> {
  try {
    return await call();
  } catch (error) {
    if (error instanceof Stripe.errors.StripeConnectionError) throw new CardsProblem(false, null, error);
    if (error instanceof Stripe.errors.StripeError) throw new CardsProblem(true, error.code ?? null, error);
    throw error;
  }
}

const idOf = (object: string | { id: string } | null | undefined): string | null => (typeof object === 'string' ? object : object?.id ?? null);

const OVER = ['complete', 'expired'] as const;

function snapshotOf(session: Stripe.Checkout.Session): SessionSnapshot {
  const status = OVER.find((over) => over === session.status) ?? 'open';
  return {
    sessionId: session.id, attemptId: session.metadata?.['attempt'] ?? null, status, isPaid: session.payment_status === 'paid',
    paymentIntentId: idOf(session.payment_intent), amountMinor: session.amount_total ?? 0, currency: (session.currency ?? '').toUpperCase(),
    expiresAt: new Date(session.expires_at * 1000), url: session.url,
  };
}

function refundOf(refund: Stripe.Refund): RefundSnapshot {
  const state = refund.status === 'succeeded' ? 'done' : refund.status === 'failed' || refund.status === 'canceled' ? 'failed' : 'waiting';
  return { refundId: refund.id, ourId: refund.metadata?.['refund'] ?? null, state, amountMinor: refund.amount };
}

/** An address that every processor takes; a rarer one (a quoted local part is legal) is not worth a payment that fails. The payer types it there. */
const PLAIN_EMAIL = /^[A-Za-z0-9_+-]+(?:\.[A-Za-z0-9_+-]+)*@[A-Za-z0-9.-]+$/;

/** Makes a payment session for cards only: nothing that settles days later. The same key gets the same session. */
export async function createSession(wish: NewSession): Promise<SessionSnapshot> {
  const currency = wish.currency.toLowerCase();
  return asked(async () => snapshotOf(await stripe().checkout.sessions.create({
    mode: 'payment',
    allowed_payment_method_types: ['card'],
    line_items: wish.lines.map((line) => ({ quantity: 1, price_data: { currency, unit_amount: line.amountMinor, product_data: { name: line.name.slice(0, 250) } } })),
    client_reference_id: wish.attemptId,
    metadata: { attempt: wish.attemptId },
    payment_intent_data: { metadata: { attempt: wish.attemptId } },
    ...(wish.email !== null && PLAIN_EMAIL.test(wish.email) ? { customer_email: wish.email } : {}),
    expires_at: Math.ceil(wish.expiresAt.getTime() / 1000),
    success_url: wish.doneUrl,
    cancel_url: wish.backUrl,
  }, { idempotencyKey: wish.idempotencyKey })));
}

/** What became of a session. */
export const retrieveSession = (sessionId: string): Promise<SessionSnapshot> =>
  asked(async () => snapshotOf(await stripe().checkout.sessions.retrieve(sessionId)));

/** Ends a session early; if it is over already, answers what became of it. */
export async function expireSession(sessionId: string): Promise<SessionSnapshot> {
  try {
    return await asked(async () => snapshotOf(await stripe().checkout.sessions.expire(sessionId)));
  } catch (error) {
    if (error instanceof CardsProblem && error.isAnswer) return retrieveSession(sessionId); // paid or expired a moment ago
    throw error;
  }
}

/** The session that was made for an attempt, found by our id in its metadata; null when there is none. Looks back no further than the attempt. */
export async function findSession(attemptId: string, openedAt: Date): Promise<SessionSnapshot | null> {
  const since = Math.floor(openedAt.getTime() / 1000) - 300;
  return asked(async () => {
    for await (const session of stripe().checkout.sessions.list({ created: { gte: since }, limit: 100 })) {
      if (session.metadata?.['attempt'] === attemptId) return snapshotOf(session);
    }
    return null;
  });
}

/** Gives money back for a payment. */
export const createRefund = (wish: { refundId: string; paymentIntentId: string; amountMinor: number; idempotencyKey: string }): Promise<RefundSnapshot> =>
  asked(async () => refundOf(await stripe().refunds.create(
    { payment_intent: wish.paymentIntentId, amount: wish.amountMinor, metadata: { refund: wish.refundId } }, { idempotencyKey: wish.idempotencyKey })));

/** The refund that was made for one of ours, found by our id in its metadata; null when there is none. */
export const findRefund = (refundId: string, paymentIntentId: string): Promise<RefundSnapshot | null> => asked(async () => {
  for await (const refund of stripe().refunds.list({ payment_intent: paymentIntentId, limit: 100 })) {
    if (refund.metadata?.['refund'] === refundId) return refundOf(refund);
  }
  return null;
});

/** What the processor kept of a payment, in minor units, once its balance transaction exists; null before. */
export const retrieveFee = (paymentIntentId: string): Promise<{ feeMinor: number; transactionId: string } | null> => asked(async () => {
  const intent = await stripe().paymentIntents.retrieve(paymentIntentId, { expand: ['latest_charge.balance_transaction'] });
  const charge = intent.latest_charge;
  const transaction = typeof charge === 'object' ? charge?.balance_transaction : null;
  return transaction && typeof transaction === 'object' ? { feeMinor: transaction.fee, transactionId: transaction.id } : null;
});

/** Reads a webhook's body if its signature is the processor's own and fresh; null if not. */
export function verifyEvent(body: string, signature: string): CardEvent | null {
  try {
    return eventOf(stripe().webhooks.constructEvent(body, signature, env().STRIPE_WEBHOOK_SECRET));
  } catch (error) {
    if (error instanceof Stripe.errors.StripeSignatureVerificationError || error instanceof SyntaxError) return null;
    throw error;
  }
}

function eventOf(event: Stripe.Event): CardEvent {
  const { object } = event.data;
  const objectId = 'id' in object && typeof object.id === 'string' ? object.id : null;
  const session = event.type.startsWith('checkout.session.') && object.object === 'checkout.session' ? snapshotOf(object) : null;
  const refund = object.object === 'refund' ? refundOf(object) : null;
  return { id: event.id, kind: event.type, objectId, session, refund };
}
