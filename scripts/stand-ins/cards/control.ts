// What tests may ask of the stand-in beside the processor's interface: trouble, payment without a browser, a look inside.
import { z } from 'zod';
import type { Cards } from './cards';
import { plainly } from './events';

const cause = { requestId: null, key: null, apiVersion: '2026-10-28.endive' };

const orders = z.discriminatedUnion('do', [
  /** How webhooks go out from now on: copies of each, after a delay, or held back until released. */
  z.object({ do: z.literal('webhooks'), copies: z.int().min(0).max(20).default(1), delayMs: z.int().min(0).default(0), hold: z.boolean().default(false) }),
  /** Sends what was held back, and answers when it has been delivered. */
  z.object({ do: z.literal('release'), order: z.enum(['made', 'reversed']).default('made'), extraCopies: z.int().min(0).max(20).default(0) }),
  /** Forgets what was held back: those webhooks never come. */
  z.object({ do: z.literal('lose') }),
  /** Trouble: slow answers, 500s, or answers lost after the work was done, perhaps only for paths that contain a text. */
  z.object({ do: z.literal('trouble'), slowMs: z.int().min(0).default(0), failNext: z.int().min(0).default(0), dropNext: z.int().min(0).default(0), onlyPath: z.string().nullable().default(null) }),
  z.object({ do: z.literal('clock'), offsetMs: z.int() }),
  z.object({ do: z.literal('fees'), delayMs: z.int().min(0) }),
  /** Pays a session as the pay page would, with one of the trial cards; `bank` answers the bank's question. */
  z.object({ do: z.literal('pay'), session: z.string(), number: z.string().default('4242424242424242'), email: z.string().default('payer@example.example'), bank: z.enum(['yes', 'no']).default('yes') }),
  z.object({ do: z.literal('failRefund'), refund: z.string() }),
  z.object({ do: z.literal('reset') }),
]);

/** An order as a test writes it. */
export type Order = z.input<typeof orders>;

/** Carries out one order, or answers what is kept when there is none. */
export async function answerControl(cards: Cards, method: string, body: string): Promise<object> {
  if (method !== 'POST') return look(cards);
  const order = orders.parse(JSON.parse(body));
  switch (order.do) {
    case 'webhooks':
      cards.events.manner = { copies: order.copies, delayMs: order.delayMs, hold: order.hold };
      break;
    case 'release':
      await cards.events.release(order.order, order.extraCopies);
      break;
    case 'lose':
      cards.events.lose();
      break;
    case 'trouble':
      cards.faults.plan = { slowMs: order.slowMs, failNext: order.failNext, dropNext: order.dropNext, onlyPath: order.onlyPath };
      break;
    case 'clock':
      cards.store.clockOffsetMs = order.offsetMs;
      cards.catchUp();
      break;
    case 'fees':
      cards.payments.feeDelayMs = order.delayMs;
      break;
    case 'pay':
      return pay(cards, order);
    case 'failRefund':
      return cards.refunds.fail(order.refund, cause);
    case 'reset':
      cards.store.clear();
      cards.faults.clear();
      cards.events.manner = plainly();
      cards.payments.feeDelayMs = 0;
      cards.store.clockOffsetMs = 0;
  }
  return look(cards);
}

function pay(cards: Cards, order: { session: string; number: string; email: string; bank: 'yes' | 'no' }) {
  cards.catchUp();
  const session = cards.sessions.get(order.session);
  if (session.status !== 'open') return { outcome: session.status, says: null };
  const first = cards.payments.pay(session, order.number, { email: order.email, name: null }, cause);
  return first.outcome === 'asks' ? cards.payments.answerBank(cards.sessions.get(order.session), order.bank === 'yes', cause) : first;
}

const look = (cards: Cards) => ({
  sessions: cards.store.all('session'), intents: cards.store.all('intent'), charges: cards.store.all('charge'), refunds: cards.store.all('refund'),
  events: cards.store.all('event').map(({ id, type, pending_webhooks }) => ({ id, type, pending_webhooks })), webhooksWaiting: cards.events.waiting(),
});
