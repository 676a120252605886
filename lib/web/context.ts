import 'server-only';
import { randomUUID } from 'node:crypto';
import { headers } from 'next/headers';
import { notFound, redirect } from 'next/navigation';
import { cache } from 'react';
import { getDb } from '@/db/client';
import { findBookingByLink, findOwnBooking } from '@/lib/bookings/access';
import { isSpokenCode } from '@/lib/bookings/rules/spoken-code';
import { getClub } from '@/lib/club/queries';
import { Refusal } from '@/lib/core/refusal';
import { readClock } from '@/lib/infra/clock';
import type { Actor, BookingActor, Ctx, HolderActor, SystemActor } from '@/lib/infra/context';
import { env } from '@/lib/infra/env';
import { hashSecret } from '@/lib/infra/secrets';
import { findAccountActor } from '@/lib/people/queries';
import { isOfficer, may, type Capability } from '@/lib/people/rules/capabilities';
import { currentSignIn } from './auth';
import { ensureHolder, readBookingLink, readHolder } from './cookies';
import type { ActorFor, Requires } from './requires';

/** What every request has before the club is asked for. */
const ground = cache(async () => {
  const db = getDb();
  const incoming = await headers();
  const address = await clientAddress();
  const client = address === null ? null : hashSecret(address).slice(0, 22);
  return { db, now: readClock(), requestId: incoming.get('x-request-id') ?? randomUUID(), client };
});

const base = cache(async () => {
  const here = await ground();
  return { ...here, club: await getClub(here.db) };
});

const account = cache(async () => {
  const signInId = await currentSignIn();
  return signInId === null ? null : findAccountActor(getDb(), signInId);
});

/** The acting account of this request, or null: for a page's header. */
export const currentAccount = account;

/** The actor that `requires` asks for, or a refusal. The one place where a request becomes somebody. */
async function actorFor(requires: Requires, options: { code?: string; mayMakeCookie: boolean }): Promise<Actor> {
  switch (requires) {
    case 'anyone': return (await account()) ?? { kind: 'anyone' };
    case 'browser': return holder(options.mayMakeCookie);
    case 'booking': return booking(options.code ?? '');
    case 'account': {
      const actor = await account();
      if (!actor) throw new Refusal('not_allowed');
      return actor;
    }
    case 'member': {
      const actor = await account();
      if (!actor || actor.householdId === null) throw new Refusal('not_allowed');
      return actor;
    }
    case 'officer': {
      const actor = await account();
      if (!actor || !isOfficer(actor.roles)) throw new Refusal('not_allowed');
      return actor;
    }
    default: return officer(requires);
  }
}

async function holder(mayMakeCookie: boolean): Promise<HolderActor> {
  const holderHash = mayMakeCookie ? await ensureHolder() : await readHolder();
  if (holderHash === null) throw new Refusal('hold_over');
  return { kind: 'holder', holderHash, householdId: (await account())?.householdId ?? null };
}

async function booking(code: string): Promise<BookingActor> {
  if (!isSpokenCode(code)) throw new Refusal('not_found'); // it names a cookie and a row
  const hash = await readBookingLink(code);
  const { db, now } = await ground();
  const byLink = hash === null ? null : await findBookingByLink(db, code, hash, now);
  if (byLink) return byLink;
  const actor = await account();
  const own = actor?.householdId ? await findOwnBooking(db, code, actor.householdId) : null;
  if (!own) throw new Refusal('not_found');
  return { kind: 'booking', bookingId: own };
}

async function officer(capability: Capability): Promise<Actor> {
  const actor = await account();
  if (!actor || !may(actor.roles, capability)) throw new Refusal('not_allowed');
  return actor;
}

/** The context of an action or handler; throws a `Refusal` when the actor may not. */
export async function requestContext<R extends Requires>(requires: R, options: { code?: string } = {}): Promise<Ctx<ActorFor<R>>> {
  const actor = await actorFor(requires, { ...options, mayMakeCookie: true });
  return { ...(await base()), actor: actor as ActorFor<R> }; // actorFor answers with the actor that R asks for
}

/** As `requestContext`, for a handler whose command reads the club's settings together with its own facts. */
export async function groundContext<R extends Requires>(requires: R): Promise<Omit<Ctx<ActorFor<R>>, 'club'>> {
  const actor = await actorFor(requires, { mayMakeCookie: true });
  return { ...(await ground()), actor: actor as ActorFor<R> }; // actorFor answers with the actor that R asks for
}

/** The context of a page. A stranger is sent to sign in; whoever may not see it is told it is not there. */
export async function pageContext<R extends Requires>(requires: R, options: { code?: string } = {}): Promise<Ctx<ActorFor<R>>> {
  try {
    const actor = await actorFor(requires, { ...options, mayMakeCookie: false });
    return { ...(await base()), actor: actor as ActorFor<R> }; // as above
  } catch (error) {
    if (!(error instanceof Refusal)) throw error;
    if (error.code === 'not_allowed' && (await account()) === null) redirect('/sign-in');
    notFound();
  }
}

/** The context of a page for a browser that may have kept places: null when it never did, since a page may not make the cookie. */
export async function holderContext(): Promise<Ctx<HolderActor> | null> {
  const holderHash = await readHolder();
  if (holderHash === null) return null;
  return { ...(await base()), actor: { kind: 'holder', holderHash, householdId: (await account())?.householdId ?? null } };
}

/** The context of a machine: a webhook, a job, a script. Machines have no role. */
export async function systemContext(name: string): Promise<Ctx<SystemActor>> {
  const db = getDb();
  return { db, club: await getClub(db), now: readClock(), requestId: randomUUID(), client: null, actor: { kind: 'system', name } };
}

/** The client's address, taken from the set number of trusted proxies and no further; null when there is none. */
async function clientAddress(): Promise<string | null> {
  const hops = env().TRUSTED_PROXY_HOPS;
  if (hops === 0) return null;
  const chain = ((await headers()).get('x-forwarded-for') ?? '').split(',').map((part) => part.trim()).filter(Boolean);
  return chain.at(-hops) ?? null;
}
