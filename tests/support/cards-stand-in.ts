import { createServer } from 'node:http';
import Stripe from 'stripe';
import { Cards } from '../../scripts/stand-ins/cards/cards';
import type { Order } from '../../scripts/stand-ins/cards/control';
import { serveCards } from '../../scripts/stand-ins/cards/server';

export const WEBHOOK_SECRET = 'whsec_only_for_tests_0123456789abcdef';

/** The processor's SDK, pointed at a stand-in as a club's settings would. */
export function sdkFor(origin: string, retries = 0): Stripe {
  const url = new URL(origin);
  return new Stripe('sk_test_onlyForTests', { host: url.hostname, port: url.port, protocol: 'http', telemetry: false, maxNetworkRetries: retries });
}

export type Received = { body: string; signature: string };

/** A card stand-in in this process with a webhook that keeps what it gets; `refuseNext` makes it answer 500 first. */
export async function startCards(settings: { file?: string } = {}) {
  const received: Received[] = [];
  const club = { refuseNext: 0 };
  const listener = createServer((request, response) => {
    let body = '';
    request.on('data', (part: Buffer) => (body += part.toString()));
    request.on('end', () => {
      received.push({ body, signature: String(request.headers['stripe-signature']) });
      response.writeHead(club.refuseNext-- > 0 ? 500 : 200).end();
    });
  });
  await new Promise<void>((resolve) => listener.listen(0, '127.0.0.1', resolve));
  const address = listener.address();
  const port = typeof address === 'object' && address ? address.port : 0;
  const cards = new Cards({ file: settings.file ?? null, hook: { url: `http://127.0.0.1:${port}/`, secret: WEBHOOK_SECRET }, clockOffsetFile: null });
  const { server, origin } = await serveCards(cards, 0);
  const order = async (wish: Order) => {
    const answer = await fetch(`${origin}/_control`, { method: 'POST', body: JSON.stringify(wish) });
    return answer.json();
  };
  const stop = async () => {
    cards.stop();
    server.closeAllConnections();
    listener.closeAllConnections();
    await Promise.all([server, listener].map((one) => new Promise((resolve) => one.close(resolve))));
  };
  return { cards, origin, stripe: sdkFor(origin), received, club, order, stop };
}

export type CardsStandIn = Awaited<ReturnType<typeof startCards>>;

/** A session's parameters as a club sends them: two adults and a child, 15 dollars. */
export const wanted = (over: Partial<Stripe.Checkout.SessionCreateParams> = {}): Stripe.Checkout.SessionCreateParams => ({
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

/** The processor's refusal, as the SDK throws it. */
export async function whyNot(act: Promise<unknown>): Promise<Stripe.errors.StripeError> {
  const error: unknown = await act.then(() => null, (thrown: unknown) => thrown);
  if (!(error instanceof Stripe.errors.StripeError)) throw new Error('it was not refused', { cause: error });
  return error;
}
