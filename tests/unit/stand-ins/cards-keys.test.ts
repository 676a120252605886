import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import Stripe from 'stripe';
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import { sdkFor, startCards, wanted, WEBHOOK_SECRET, whyNot, type CardsStandIn } from '../../support/cards-stand-in';

// The interface is the processor's published one; the SDK itself is the judge of its shapes and signatures.
let stand: CardsStandIn;
beforeEach(async () => { stand = await startCards(); });
afterEach(() => stand.stop());

const make = (over: Partial<Stripe.Checkout.SessionCreateParams> = {}, options: Stripe.RequestOptions = {}) => stand.stripe.checkout.sessions.create(wanted(over), options);
const typesReceived = () => stand.received.map((one) => JSON.parse(one.body).type);
const inMinutes = (minutes: number) => Math.floor(Date.now() / 1000) + minutes * 60;

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
