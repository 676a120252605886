import type Stripe from 'stripe';
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import { startCards, wanted, whyNot, type CardsStandIn } from '../../support/cards-stand-in';

// The interface is the processor's published one; the SDK itself is the judge of its shapes and signatures.
let stand: CardsStandIn;
beforeEach(async () => { stand = await startCards(); });
afterEach(() => stand.stop());

const make = (over: Partial<Stripe.Checkout.SessionCreateParams> = {}, options: Stripe.RequestOptions = {}) => stand.stripe.checkout.sessions.create(wanted(over), options);
const typesReceived = () => stand.received.map((one) => JSON.parse(one.body).type);

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
