import Stripe from 'stripe';
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import { startCards, wanted, whyNot, type CardsStandIn } from '../../support/cards-stand-in';

// The interface is the processor's published one; the SDK itself is the judge of its shapes and signatures.
let stand: CardsStandIn;
beforeEach(async () => { stand = await startCards(); });
afterEach(() => stand.stop());

const make = (over: Partial<Stripe.Checkout.SessionCreateParams> = {}, options: Stripe.RequestOptions = {}) => stand.stripe.checkout.sessions.create(wanted(over), options);
const typesReceived = () => stand.received.map((one) => JSON.parse(one.body).type);
const inMinutes = (minutes: number) => Math.floor(Date.now() / 1000) + minutes * 60;

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
