import type Stripe from 'stripe';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { startCards, wanted, type CardsStandIn } from '../../support/cards-stand-in';

// The interface is the processor's published one; the SDK itself is the judge of its shapes and signatures.
let stand: CardsStandIn;
beforeEach(async () => { stand = await startCards(); });
afterEach(() => stand.stop());

const make = (over: Partial<Stripe.Checkout.SessionCreateParams> = {}, options: Stripe.RequestOptions = {}) => stand.stripe.checkout.sessions.create(wanted(over), options);

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
