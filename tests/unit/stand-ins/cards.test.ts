import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import Stripe from 'stripe';
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import { sdkFor, startCards, WEBHOOK_SECRET, type CardsStandIn } from '../../support/cards-stand-in';

// The interface is the processor's published one; the SDK itself is the judge of its shapes and signatures.
let stand: CardsStandIn;
beforeEach(async () => { stand = await startCards(); });
afterEach(() => stand.stop());

const wanted = (over: Partial<Stripe.Checkout.SessionCreateParams> = {}): Stripe.Checkout.SessionCreateParams => ({
  mode: 'payment',
  line_items: [
    { quantity: 2, price_data: { currency: 'usd', unit_amount: 600, product_data: { name: 'Saltmarsh, 10:30, adult' } } },
    { quantity: 1, price_data: { currency: 'usd', unit_amount: 300, product_data: { name: 'Saltmarsh, 10:30, child' } } },
  ],
  success_url: 'http://127.0.0.1:9/back?session={CHECKOUT_SESSION_ID}',
  cancel_url: 'http://127.0.0.1:9/hold',
  metadata: { attempt: 'a-1' },
  payment_intent_data: { metadata: { attempt: 'a-1' } },
  ...over,
});
const make = (over: Partial<Stripe.Checkout.SessionCreateParams> = {}, options: Stripe.RequestOptions = {}) => stand.stripe.checkout.sessions.create(wanted(over), options);
const inMinutes = (minutes: number) => Math.floor(Date.now() / 1000) + minutes * 60;
const whyNot = async (act: Promise<unknown>): Promise<Stripe.errors.StripeError> => {
  const error: unknown = await act.then(() => null, (e: unknown) => e);
  if (!(error instanceof Stripe.errors.StripeError)) throw new Error('it was not refused', { cause: error });
  return error;
};
const typesReceived = () => stand.received.map((one) => JSON.parse(one.body).type);

describe('a payment session', () => {
  it('adds up its items, is open and unpaid, and has a page', async () => {
    const session = await make();

    expect(session).toMatchObject({ amount_total: 1500, currency: 'usd', status: 'open', payment_status: 'unpaid', payment_intent: null, metadata: { attempt: 'a-1' } });
    expect(session.id).toMatch(/^cs_test_/);
    expect(session.url).toBe(`${stand.origin}/pay/${session.id}`);
    expect(await stand.stripe.checkout.sessions.retrieve(session.id)).toMatchObject({ id: session.id, expires_at: session.created + 86_400 });
  });

  it.each([
    ['29 minutes is too soon', 29, false], ['30 minutes and a little is soon enough', 30.1, true],
    ['nearly 24 hours is late enough', 24 * 60 - 0.1, true], ['24 hours and a minute is too late', 24 * 60 + 1, false],
  ])('ends between 30 minutes and 24 hours after it is made: %s', async (_sentence, minutes, works) => {
    const attempt = make({ expires_at: Math.ceil(Date.now() / 1000 + minutes * 60) });

    if (works) expect((await attempt).status).toBe('open');
    else expect(await whyNot(attempt)).toMatchObject({ statusCode: 400, rawType: 'invalid_request_error', param: 'expires_at' });
  });

  it.each([
    ['a quantity of nought', { line_items: [{ quantity: 0, price_data: { currency: 'usd', unit_amount: 100, product_data: { name: 'x' } } }] }, 'line_items[0][quantity]'],
    ['less than a card payment can be', { line_items: [{ quantity: 1, price_data: { currency: 'usd', unit_amount: 49, product_data: { name: 'x' } } }] }, 'line_items'],
    ['no items', { line_items: [] }, 'line_items'],
    ['an address that is none', { success_url: 'nowhere' }, 'success_url'],
  ])('is refused with %s, naming the parameter', async (_sentence, over, param) => {
    expect(await whyNot(make(over))).toMatchObject({ statusCode: 400, param });
  });

  it('is refused with a parameter that does not exist', async () => {
    const answer = await fetch(`${stand.origin}/v1/checkout/sessions`, { method: 'POST', headers: { authorization: 'Bearer sk_test_abc' }, body: 'mode=payment&colour=green' });

    expect(answer.status).toBe(400);
  });

  it('can be ended while it is open, and only then', async () => {
    const session = await make();

    expect(await stand.stripe.checkout.sessions.expire(session.id)).toMatchObject({ status: 'expired', url: null });
    expect(await whyNot(stand.stripe.checkout.sessions.expire(session.id))).toMatchObject({ statusCode: 400 });
    await vi.waitFor(() => expect(typesReceived()).toEqual(['checkout.session.expired']));
  });

  it('ends by itself when its time is over, and cannot be paid then', async () => {
    const session = await make({ expires_at: inMinutes(31) });

    await stand.order({ do: 'clock', offsetMs: 32 * 60_000 });

    expect((await stand.stripe.checkout.sessions.retrieve(session.id)).status).toBe('expired');
    expect(await stand.order({ do: 'pay', session: session.id })).toMatchObject({ outcome: 'expired' });
    expect((await fetch(session.url ?? '')).status).toBe(410);
  });

  it('is found in lists by what it holds, a page at a time, newest first', async () => {
    const ids: string[] = [];
    for (let n = 0; n < 5; n += 1) ids.push((await make({ metadata: { attempt: String(n) } })).id);
    await stand.order({ do: 'pay', session: ids[2] ?? '' });

    const all: string[] = [];
    for await (const session of stand.stripe.checkout.sessions.list({ limit: 2 })) all.push(session.id);
    const paid = await stand.stripe.checkout.sessions.retrieve(ids[2] ?? '');
    const byIntent = await stand.stripe.checkout.sessions.list({ payment_intent: String(paid.payment_intent) });

    expect(all).toEqual(ids.toReversed());
    expect(byIntent.data.map((session) => session.id)).toEqual([ids[2]]);
  });

  it('is unknown by another id, and answers nothing to a wrong key', async () => {
    expect(await whyNot(stand.stripe.checkout.sessions.retrieve('cs_test_nothing'))).toMatchObject({ statusCode: 404, code: 'resource_missing' });
    const stranger = new Stripe('pk_live_wrong', { host: '127.0.0.1', port: new URL(stand.origin).port, protocol: 'http', telemetry: false, maxNetworkRetries: 0 });
    expect(await whyNot(stranger.checkout.sessions.list())).toMatchObject({ statusCode: 401 });
  });
});

describe('a payment', () => {
  it('completes the session, with a charge and the fee of 2.9 % and 30 cents', async () => {
    const { id } = await make();
    await stand.order({ do: 'pay', session: id, email: 'eve@visitor.example' });

    const session = await stand.stripe.checkout.sessions.retrieve(id, { expand: ['payment_intent.latest_charge.balance_transaction'] });

    expect(session).toMatchObject({
      status: 'complete', payment_status: 'paid', url: null, customer_details: { email: 'eve@visitor.example' },
      payment_intent: { status: 'succeeded', amount_received: 1500, metadata: { attempt: 'a-1' },
        latest_charge: { paid: true, amount: 1500, balance_transaction: { amount: 1500, fee: 74, net: 1426, type: 'charge' } } }, // 43.5 half up is 44, and 30
    });
    await vi.waitFor(() => expect(typesReceived().toSorted()).toEqual(['charge.succeeded', 'checkout.session.completed', 'payment_intent.created', 'payment_intent.succeeded']));
  });

  it.each([
    ['4000000000000002', 'generic_decline'], ['4000000000009995', 'insufficient_funds'],
  ])('with the card %s is refused as %s, and the session stays open for another card', async (number, declineCode) => {
    const { id } = await make();
    expect(await stand.order({ do: 'pay', session: id, number })).toMatchObject({ outcome: 'refused' });

    const session = await stand.stripe.checkout.sessions.retrieve(id, { expand: ['payment_intent'] });
    expect(session).toMatchObject({ status: 'open', payment_intent: { status: 'requires_payment_method', last_payment_error: { code: 'card_declined', decline_code: declineCode } } });
    expect(await stand.order({ do: 'pay', session: id })).toMatchObject({ outcome: 'paid' });
    const charges = await stand.stripe.charges.list({ payment_intent: typeof session.payment_intent === 'object' ? (session.payment_intent?.id ?? '') : '' });
    expect(charges.data.map((charge) => charge.status)).toEqual(['succeeded', 'failed']);
  });

  it.each([['yes', 'complete'], ['no', 'open']] as const)('that the bank asks about: answer %s, and the session is %s', async (bank, status) => {
    const { id } = await make();

    await stand.order({ do: 'pay', session: id, number: '4000002500003155', bank });

    expect((await stand.stripe.checkout.sessions.retrieve(id)).status).toBe(status);
  });

  it('may learn its fee later, as an update of the charge', async () => {
    await stand.order({ do: 'fees', delayMs: 60_000 });
    const { id } = await make();
    await stand.order({ do: 'pay', session: id });
    const before = await stand.stripe.charges.list();

    await stand.order({ do: 'clock', offsetMs: 61_000 });

    expect(before.data[0]?.balance_transaction).toBeNull();
    expect((await stand.stripe.charges.list()).data[0]?.balance_transaction).toMatch(/^txn_/);
    await vi.waitFor(() => expect(typesReceived()).toContain('charge.updated'));
  });
});

describe('a refund', () => {
  const paid = async () => {
    const { id } = await make();
    await stand.order({ do: 'pay', session: id });
    return String((await stand.stripe.checkout.sessions.retrieve(id)).payment_intent);
  };

  it('in part and then of the rest leaves nothing to give back', async () => {
    const intent = await paid();

    const part = await stand.stripe.refunds.create({ payment_intent: intent, amount: 400, metadata: { cause: 'gave back 1' } });
    const rest = await stand.stripe.refunds.create({ payment_intent: intent });

    expect([part.amount, rest.amount, part.status]).toEqual([400, 1100, 'succeeded']);
    expect((await stand.stripe.charges.list({ payment_intent: intent })).data[0]).toMatchObject({ amount_refunded: 1500, refunded: true });
    expect(await whyNot(stand.stripe.refunds.create({ payment_intent: intent, amount: 1 }))).toMatchObject({ statusCode: 400, code: 'charge_already_refunded' });
    const moved = await stand.stripe.balanceTransactions.list({ type: 'refund' });
    expect(moved.data.map((one) => [one.amount, one.fee, one.net])).toEqual([[-1100, 0, -1100], [-400, 0, -400]]);
    expect(await stand.stripe.refunds.retrieve(part.id)).toMatchObject({ metadata: { cause: 'gave back 1' }, payment_intent: intent });
    expect((await stand.stripe.refunds.list({ payment_intent: intent })).data).toHaveLength(2);
  });

  it('is never more than what is left', async () => {
    const intent = await paid();
    await stand.stripe.refunds.create({ payment_intent: intent, amount: 1000 });

    expect(await whyNot(stand.stripe.refunds.create({ payment_intent: intent, amount: 501 }))).toMatchObject({ statusCode: 400, param: 'amount' });
  });

  it('can fail later, and then the money is back', async () => {
    const intent = await paid();
    const refund = await stand.stripe.refunds.create({ payment_intent: intent });

    await stand.order({ do: 'failRefund', refund: refund.id });

    expect(await stand.stripe.refunds.retrieve(refund.id)).toMatchObject({ status: 'failed', failure_balance_transaction: expect.stringMatching(/^txn_/) });
    expect((await stand.stripe.charges.list({ payment_intent: intent })).data[0]).toMatchObject({ amount_refunded: 0, refunded: false });
  });

  it('of an unpaid session is refused', async () => {
    const { id } = await make();
    await stand.order({ do: 'pay', session: id, number: '4000000000000002' });
    const intent = String((await stand.stripe.checkout.sessions.retrieve(id)).payment_intent);

    expect(await whyNot(stand.stripe.refunds.create({ payment_intent: intent }))).toMatchObject({ statusCode: 400 });
  });
});

describe('a key', () => {
  it('gets the same answer again, and nothing is done twice', async () => {
    const first = await make({}, { idempotencyKey: 'attempt-1' });
    const again = await make({}, { idempotencyKey: 'attempt-1' });

    expect(again.id).toBe(first.id);
    expect(again.lastResponse.headers['idempotent-replayed']).toBe('true');
    expect((await stand.stripe.checkout.sessions.list()).data).toHaveLength(1);
  });

  it('with other parameters is refused', async () => {
    await make({}, { idempotencyKey: 'attempt-1' });

    const error = await whyNot(make({ metadata: { attempt: 'other' } }, { idempotencyKey: 'attempt-1' }));

    expect(error).toBeInstanceOf(Stripe.errors.StripeIdempotencyError);
    expect(error.statusCode).toBe(400);
  });

  it('gets a stored failure again for 24 hours, and is new after that', async () => {
    await stand.order({ do: 'trouble', failNext: 1 });
    const first = await whyNot(make({}, { idempotencyKey: 'attempt-1' }));
    const again = await whyNot(make({}, { idempotencyKey: 'attempt-1' }));
    await stand.order({ do: 'clock', offsetMs: 24 * 3600_000 });
    const later = await make({}, { idempotencyKey: 'attempt-1' });

    expect([first.statusCode, again.statusCode]).toEqual([500, 500]);
    expect(later.status).toBe('open');
  });

  it('is not used up by parameters that were wrong', async () => {
    await whyNot(make({ expires_at: inMinutes(5) }, { idempotencyKey: 'attempt-1' }));

    expect((await make({}, { idempotencyKey: 'attempt-1' })).status).toBe('open');
  });

  it('may be sent again at once after an answer was lost: the SDK does, and one session exists', async () => {
    await stand.order({ do: 'trouble', dropNext: 1, onlyPath: '/v1/checkout/sessions' });

    const session = await sdkFor(stand.origin, 1).checkout.sessions.create(wanted());

    expect((await stand.stripe.checkout.sessions.list()).data.map((one) => one.id)).toEqual([session.id]);
  });

  it('is refused while its first request is still under way', async () => {
    await stand.order({ do: 'trouble', slowMs: 300 });
    const first = make({}, { idempotencyKey: 'attempt-1' });
    await vi.waitFor(async () => expect(await whyNot(make({}, { idempotencyKey: 'attempt-1' }))).toMatchObject({ statusCode: 409 }), { interval: 10 });

    expect((await first).status).toBe('open');
  });
});

describe('webhooks', () => {
  it('are signed so that the SDK accepts them, and only with the right secret', async () => {
    await stand.order({ do: 'pay', session: (await make()).id });
    await vi.waitFor(() => expect(stand.received).toHaveLength(4));
    const [{ body, signature } = { body: '', signature: '' }] = stand.received;

    expect(stand.stripe.webhooks.constructEvent(body, signature, WEBHOOK_SECRET)).toMatchObject({ object: 'event', livemode: false });
    expect(() => stand.stripe.webhooks.constructEvent(`${body} `, signature, WEBHOOK_SECRET)).toThrow(Stripe.errors.StripeSignatureVerificationError);
    expect(() => stand.stripe.webhooks.constructEvent(body, signature, 'whsec_other')).toThrow(Stripe.errors.StripeSignatureVerificationError);
  });

  it('come again until they are accepted', async () => {
    stand.club.refuseNext = 1;
    await stand.stripe.checkout.sessions.expire((await make()).id);

    await vi.waitFor(() => expect(typesReceived()).toEqual(['checkout.session.expired', 'checkout.session.expired']), { timeout: 5000 });
    await vi.waitFor(async () => expect((await stand.stripe.events.list()).data[0]?.pending_webhooks).toBe(0));
  });

  it('can be made to come twice, backwards, late, or never', async () => {
    await stand.order({ do: 'webhooks', hold: true });
    await stand.order({ do: 'pay', session: (await make()).id });
    expect(stand.received).toHaveLength(0);

    await stand.order({ do: 'release', order: 'reversed', extraCopies: 1 });
    const order = ['checkout.session.completed', 'payment_intent.succeeded', 'charge.succeeded', 'payment_intent.created'];
    expect(typesReceived()).toEqual(order.flatMap((type) => [type, type]));

    await stand.order({ do: 'pay', session: (await make()).id });
    await stand.order({ do: 'lose' });
    await stand.order({ do: 'release' });
    expect(stand.received).toHaveLength(8);
    expect((await stand.stripe.events.list({ types: ['checkout.session.completed'] })).data).toHaveLength(2);
  });
});

describe('the pay page', () => {
  const send = (address: string, fields: Record<string, string>) => fetch(address, { method: 'POST', body: new URLSearchParams(fields), redirect: 'manual' });
  const good = { number: '4242 4242 4242 4242', until: '12/34', check: '123', email: 'eve@visitor.example' };

  it('pays, and leads back with the session in the address', async () => {
    const session = await make();
    const answer = await send(session.url ?? '', good);

    expect(answer.status).toBe(303);
    expect(answer.headers.get('location')).toBe(`http://127.0.0.1:9/back?session=${session.id}`);
    expect((await send(session.url ?? `${stand.origin}/pay/${session.id}`, good)).headers.get('location')).toBe(`http://127.0.0.1:9/back?session=${session.id}`);
    expect((await stand.stripe.charges.list()).data).toHaveLength(1);
  });

  it('keeps what was typed and says what is wrong beside it', async () => {
    const answer = await send((await make()).url ?? '', { ...good, number: '4242 4242 4242 4241', email: '"><script>' });
    const html = await answer.text();

    expect(answer.status).toBe(422);
    expect(html).toContain('Check the number');
    expect(html).toContain('value="4242 4242 4242 4241"');
    expect(html).not.toContain('<script>');
  });

  it('says that a card was declined and that nothing was taken', async () => {
    const answer = await send((await make()).url ?? '', { ...good, number: '4000000000000002' });

    expect(answer.status).toBe(402);
    expect(await answer.text()).toContain('Nothing was taken');
  });

  it('asks as the bank would, and pays after yes', async () => {
    const session = await make();
    const asked = await send(session.url ?? '', { ...good, number: '4000002500003155' });
    const question = new URL(asked.headers.get('location') ?? '', stand.origin).href;
    expect(await (await fetch(question)).text()).toContain('is this you?');

    expect((await send(question, { answer: 'yes' })).headers.get('location')).toContain(session.id);
    expect((await stand.stripe.checkout.sessions.retrieve(session.id)).customer_details?.email).toBe('eve@visitor.example');
  });
});

it('forgets nothing when it is started again', async () => {
  const folder = mkdtempSync(join(tmpdir(), 'cards-'));
  const before = await startCards({ file: join(folder, 'cards.jsonl') });
  before.club.refuseNext = 100;
  const session = await before.stripe.checkout.sessions.create(wanted(), { idempotencyKey: 'attempt-1' });
  await before.order({ do: 'pay', session: session.id });
  await before.stop();

  const after = await startCards({ file: join(folder, 'cards.jsonl') });

  expect(await after.stripe.checkout.sessions.retrieve(session.id)).toMatchObject({ status: 'complete', payment_status: 'paid' });
  expect((await after.stripe.checkout.sessions.create(wanted(), { idempotencyKey: 'attempt-1' })).id).toBe(session.id);
  await vi.waitFor(() => expect(after.received).toHaveLength(4), { timeout: 8000 }); // what was refused before comes now
  await after.stop();
  rmSync(folder, { recursive: true });
});
