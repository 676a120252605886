import { rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { eq } from 'drizzle-orm';
import { NextRequest } from 'next/server';
import Stripe from 'stripe';
import { afterAll, beforeAll, describe, expect, it, vi } from 'vitest';
import { asBrowser, frameworkHeaders } from '@/tests/support/request';
import { POST as receiveWebhook } from '@/app/api/stripe/route';
import { POST as postHold } from '@/app/api/holds/route';
import { getDb } from '@/db/client';
import { bookings } from '@/db/schema/bookings';
import { cardEvents, payments } from '@/db/schema/books';
import { aClub } from '../../support/cast';
import { WEBHOOK_SECRET, type CardsStandIn } from '../../support/cards-stand-in';
import { aDayAhead, cardsAt, eveHolds, evePays, bookingOf } from './pay-cast';
import { NOON } from '../../support/cast';
import { takenAt } from './hold-cast';

vi.mock('next/headers', () => frameworkHeaders());

/** Handlers read the clock themselves: here it says noon on 1 May 2027, as the tests do. */
const clock = join(tmpdir(), `leafhalt-clock-${process.pid}`);

let cards: CardsStandIn;
beforeAll(async () => {
  writeFileSync(clock, String(NOON.getTime() - Date.now()));
  process.env['CLOCK_OFFSET_FILE'] = clock;
  cards = await cardsAt();
  await aClub();
});
afterAll(async () => {
  rmSync(clock, { force: true });
  await cards.stop();
});

const SITE = 'http://127.0.0.1:3000';
const none = { params: Promise.resolve({}) };
const post = (path: string, body: string, headers: Record<string, string> = {}) => new NextRequest(`${SITE}${path}`, { method: 'POST', body, headers: { origin: SITE, host: '127.0.0.1:3000', ...headers } });
const webhook = (payload: string, header?: string) => receiveWebhook(post('/api/stripe', payload, header === undefined ? {} : { 'stripe-signature': header }), none);

/** Runs `work` and answers the log lines that it wrote, which must not reach the test's own output. */
async function logged<T>(work: () => Promise<T>): Promise<{ answer: T; lines: string[] }> {
  const said = console.warn;
  const lines: string[] = [];
  console.warn = (line: string) => lines.push(line);
  const answer = await work().finally(() => { console.warn = said; });
  return { answer, lines };
}

describe('the card service’s webhook', () => {
  it.each([
    ['no signature', undefined],
    ['a signature of another secret', Stripe.webhooks.generateTestHeaderString({ payload: '{}', secret: 'whsec_somebody_else' })],
    ['an old signature', Stripe.webhooks.generateTestHeaderString({ payload: '{}', secret: WEBHOOK_SECRET, timestamp: 1_600_000_000 })],
    ['nonsense', 't=1,v1=zz'],
  ])('answers 400 to %s, and writes a line', async (_what, header) => {
    const { answer, lines } = await logged(() => webhook('{}', header));

    expect(answer.status).toBe(400);
    expect(lines).toHaveLength(1);
  });

  it('confirms by the processor’s own signed event, once however often it comes', async () => {
    const { day, time } = await aDayAhead();
    const eve = await eveHolds(day.id, [time.id], NOON);
    const { sessionId } = await evePays(eve, NOON);
    await cards.order({ do: 'webhooks', hold: true });
    await cards.order({ do: 'pay', session: sessionId });
    await cards.order({ do: 'release', order: 'reversed', extraCopies: 2 });

    const answers = await Promise.all(cards.received.map(({ body, signature }) => webhook(body, signature)));

    expect(new Set(answers.map((answer) => answer.status))).toEqual(new Set([200]));
    expect(cards.received.length).toBeGreaterThan(3);
    expect((await bookingOf(eve.bookingId)).confirmedAt).not.toBeNull();
    expect(await getDb().select().from(payments).where(eq(payments.bookingId, eve.bookingId))).toHaveLength(1);
    const kinds = (await getDb().select({ kind: cardEvents.kind }).from(cardEvents)).map((event) => event.kind);
    expect(kinds.filter((kind) => kind === 'checkout.session.completed')).toHaveLength(1);
  });
});

describe('keeping places by the route', () => {
  const hold = (body: string, headers: Record<string, string> = {}) => asBrowser({}, () => postHold(post('/api/holds', body, headers), none));

  it('keeps them and says where to go next', async () => {
    const { day, time } = await aDayAhead();

    const answer = await hold(JSON.stringify({ openDayId: day.id, wanted: [{ entryTimeId: time.id, adults: 2 }] }));

    expect([answer.status, await answer.json()]).toEqual([200, { next: '/hold' }]);
    expect(await takenAt(time.id)).toBe(2);
  });

  it.each([
    ['what is not JSON', '{"openDayId":', 400], ['an empty body', '', 400], ['a list', '[]', 400], ['null', 'null', 400], ['a forged id', '{"openDayId":"1 or 1=1","wanted":[]}', 400],
    ['a body over the limit', JSON.stringify({ openDayId: 'x'.repeat(20_000) }), 413],
  ])('answers %s with a sentence, never with a failure', async (_what, body, status) => {
    const answer = await hold(body);

    expect(answer.status).toBe(status);
    expect(await answer.json()).toMatchObject({ message: expect.stringMatching(/\w/) });
  });

  it('turns away what comes from another website', async () => {
    const { day, time } = await aDayAhead();

    const answer = await hold(JSON.stringify({ openDayId: day.id, wanted: [{ entryTimeId: time.id, adults: 2 }] }), { origin: 'https://elsewhere.example' });

    expect(answer.status).toBe(403);
    expect(await getDb().select({ id: bookings.id }).from(bookings).where(eq(bookings.openDayId, day.id))).toEqual([]);
  });

  it('says in words why not', async () => {
    const { day, time } = await aDayAhead({ capacity: 1 });

    const answer = await hold(JSON.stringify({ openDayId: day.id, wanted: [{ entryTimeId: time.id, adults: 2 }] }));

    expect([answer.status, await answer.json()]).toEqual([409, expect.objectContaining({ refused: 'places_gone', message: expect.stringContaining('went to someone else') })]);
  });
});
