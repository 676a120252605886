import { readdirSync } from 'node:fs';
import { resolve } from 'node:path';
import { eq } from 'drizzle-orm';
import { NextRequest } from 'next/server';
import { beforeAll, describe, expect, it, vi } from 'vitest';
import { getDb } from '@/db/client';
import { bookingContacts, bookings } from '@/db/schema/bookings';
import { bearerLinks, gateDevices, gatePasses, signIns } from '@/db/schema/people';
import { idleForm, type FormState } from '@/lib/core/form-state';
import { newId } from '@/lib/core/ids';
import { only } from '@/lib/core/only';
import { addMinutes, dayOf } from '@/lib/core/time';
import type { AccountActor } from '@/lib/infra/context';
import { hashSecret, newSecret } from '@/lib/infra/secrets';
import { ada, aClub, anAccount, anOpenDay, aStop, cleo, dov, nell, wren } from '@/tests/support/cast';
import { asBrowser, frameworkCache, frameworkHeaders, sessionOf } from '@/tests/support/request';
import { ACTIONS, ACTORS, ROUTES, type ActorName, type Who } from '@/tests/support/who-may';

vi.mock('next/headers', () => frameworkHeaders());
vi.mock('next/cache', () => frameworkCache());

const CODE = '7Q2MXK4D';
type Browser = { cookies: Record<string, string>; gateKey?: string };
const browsers = new Map<ActorName, Browser>();

/** A new sign-in each time: an action may end it. */
async function signedIn(actor: AccountActor): Promise<Record<string, string>> {
  const row = only(await getDb().insert(signIns).values({ accountId: actor.accountId, personId: actor.personId, method: 'code', signedInAt: new Date() }).returning({ id: signIns.id }));
  return sessionOf(row.id);
}

const people = new Map<ActorName, AccountActor>();

beforeAll(async () => {
  await aClub();
  const now = new Date();
  const day = await anOpenDay({ slug: 'today', heldOn: dayOf(now, 'America/New_York'), opensAt: addMinutes(now, -60), closesAt: addMinutes(now, 240) }); // going on: the gate's phone may see its place
  const stop = await aStop(day.id);
  const booking = only(await getDb().insert(bookings).values({ openDayId: day.id, code: CODE, madeAt: now, heldUntil: now, confirmedAt: now, totalMinor: 0, currency: 'USD' }).returning({ id: bookings.id }));
  await getDb().insert(bookingContacts).values({ bookingId: booking.id, name: 'Eve Marlow', email: 'eve@visitors.example' });
  const link = newSecret();
  await getDb().insert(bearerLinks).values({ kind: 'booking', subjectId: CODE, secretHash: hashSecret(link), madeAt: now, expiresAt: addMinutes(now, 600) });
  const gateKey = newSecret();
  const pass = only(await getDb().insert(gatePasses).values({ stopId: stop.id, helper: 'Gus', secretHash: hashSecret(newSecret()), madeAt: now }).returning({ id: gatePasses.id }));
  await getDb().insert(gateDevices).values({ passId: pass.id, number: 1, keyHash: hashSecret(gateKey), openedAt: now, seenAt: now });
  browsers.set('visitor', { cookies: {} });
  browsers.set('holder', { cookies: { hold: newSecret() } });
  browsers.set('booking link', { cookies: { [`booking-${CODE}`]: link } });
  browsers.set('gate phone', { cookies: {}, gateKey });
  for (const [name, make] of [['coordinator', cleo], ['secretary', wren], ['treasurer', dov], ['administrator', nell]] as const) people.set(name, await make());
  people.set('member', await ada());
  const own = people.get('member');
  await getDb().update(bookings).set({ householdId: own?.householdId ?? null }).where(eq(bookings.id, booking.id));
  const stranger = await anAccount('Eve Alone');
  people.set('other member', stranger);
});

async function browserOf(name: ActorName): Promise<Browser> {
  const person = people.get(name);
  return person ? { cookies: await signedIn(person) } : (browsers.get(name) ?? expect.fail());
}

const NO = new Set(['not_allowed', 'not_found', 'hold_over', 'pass_unknown']);
const mayBe = (who: Who, name: ActorName) => (who === 'everyone' ? true : who.includes(name));

const inApp = readdirSync('app', { recursive: true, encoding: 'utf8' }).map((path) => `app/${path}`);
const actionFiles = inApp.filter((path) => path.endsWith('/actions.ts')).map((path) => resolve(path));
const routeFiles = inApp.filter((path) => path.endsWith('/route.ts') && !/^app\/api\/(auth|health|bench)\//.test(path)).map((path) => resolve(path));

async function namesIn(files: string[]): Promise<Map<string, unknown>> {
  const found = new Map<string, unknown>();
  for (const file of files) {
    const exported: Record<string, unknown> = await import(file);
    for (const [name, value] of Object.entries(exported)) found.set(file.endsWith('route.ts') ? `${name} ${addressOf(file)}` : name, value);
  }
  return found;
}

const addressOf = (file: string) => file.replace(/^.*?\/app/, '').replace(/\/\([^)]+\)/g, '').replace(/\/route\.ts$/, '');

describe('who may do what', () => {
  it('names every action and every route, and no other', async () => {
    expect([...(await namesIn(actionFiles)).keys()].sort()).toEqual(Object.keys(ACTIONS).sort());
    expect([...(await namesIn(routeFiles)).keys()].sort()).toEqual(Object.keys(ROUTES).sort());
  });

  it.each(Object.entries(ACTIONS).flatMap(([action, who]) => ACTORS.map((name) => [action, name, mayBe(who, name)] as const)))('%s by a %s: %s', async (action, name, expected) => {
    const run = (await namesIn(actionFiles)).get(action);
    const form = new FormData();
    form.set('code', CODE);
    const { cookies } = await browserOf(name);

    const isLetThrough = await asBrowser(cookies, async () => {
      try {
        const state: FormState = await (run as (state: FormState, form: FormData) => Promise<FormState>)(idleForm, form); // namesIn has found an action
        return state.status !== 'refused' || !NO.has(state.code ?? '');
      } catch (error) {
        return isRedirect(error);
      }
    });

    expect(isLetThrough).toBe(expected);
  });

  it.each(Object.entries(ROUTES).flatMap(([address, who]) => ACTORS.map((name) => [address, name, mayBe(who, name)] as const)))('%s by a %s: %s', async (address, name, expected) => {
    const handle = (await namesIn(routeFiles)).get(address);
    const { cookies, gateKey } = await browserOf(name);
    const [method = 'GET', path = '/'] = address.split(' ');
    const request = new NextRequest(`http://127.0.0.1:3000${path}`, {
      method, headers: { origin: 'http://127.0.0.1:3000', host: '127.0.0.1:3000', ...(gateKey === undefined ? {} : { authorization: `Bearer ${gateKey}` }) }, ...(method === 'GET' ? {} : { body: '{}' }),
    });
    const params = Promise.resolve({ code: CODE, slug: 'today', openDay: newId<'openDay'>(), secret: newSecret() });

    const response = await asBrowser(cookies, () => (handle as (request: NextRequest, segment: { params: Promise<Record<string, string>> }) => Promise<Response>)(request, { params })); // namesIn has found a handler

    expect(response.status < 500).toBe(true);
    if (who(address) === 'everyone') return;
    expect(![401, 403, 404].includes(response.status)).toBe(expected);
  });
});

const who = (address: string): Who => ROUTES[address] ?? [];
const isRedirect = (error: unknown) => error instanceof Error && error.message === 'NEXT_REDIRECT';
