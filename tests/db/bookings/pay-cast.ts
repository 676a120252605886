import { eq } from 'drizzle-orm';
import { getDb } from '@/db/client';
import { bookings } from '@/db/schema/bookings';
import { paymentAttempts } from '@/db/schema/books';
import { saveDetails } from '@/lib/bookings/commands/keeping';
import { startPayment } from '@/lib/bookings/commands/pay';
import type { Id } from '@/lib/core/ids';
import { only } from '@/lib/core/only';
import { retrieveSession, type SessionSnapshot } from '@/lib/infra/cards';
import type { HolderActor } from '@/lib/infra/context';
import { forgetEnv } from '@/lib/infra/env';
import { aBrowser, anEntryTime, anOpenDay, aStop, ctxOf, NOON } from '../../support/cast';
import { startCards, type CardsStandIn } from '../../support/cards-stand-in';
import { keep, TWO } from './hold-cast';

export const machine = { kind: 'system' as const, name: 'test' };

/** A card processor of this file's own, whose clock says noon on 1 May 2027 as the tests do. */
export async function cardsAt(): Promise<CardsStandIn> {
  const cards = await startCards();
  await cards.order({ do: 'clock', offsetMs: NOON.getTime() - Date.now() });
  process.env['STRIPE_API_URL'] = cards.origin;
  forgetEnv();
  return cards;
}

/** An open day with one entry time. */
export async function aDayAhead({ capacity = 12, price = { adult: 800, child: 400, babe: 0 } } = {}) {
  const day = await anOpenDay({}, price);
  const stop = await aStop(day.id);
  return { day, stop, time: await anEntryTime(stop, { capacity }) };
}

/** Eve keeps two places, says who she is and agrees. */
export async function eveHolds(dayId: Id<'openDay'>, ids: readonly Id<'entryTime'>[], now: Date, who: HolderActor = aBrowser(), people = TWO) {
  const bookingId = await keep(dayId, ids, who, { now, people });
  await saveDetails(await ctxOf(who, now), { bookingId, name: 'Eve Marlow', email: 'eve@visitors.example', phone: null, rulesAgreed: true, wantsInvitations: true });
  return { who, bookingId };
}

/** Eve presses Pay; answers the attempt and its session. */
export async function evePays(hold: { who: HolderActor; bookingId: Id<'booking'> }, now: Date) {
  const url = await startPayment(await ctxOf(hold.who, now), { bookingId: hold.bookingId });
  const attempt = await attemptOf(hold.bookingId);
  if (attempt.sessionId === null) throw new Error('the session was written down');
  return { url, attemptId: attempt.id, sessionId: attempt.sessionId };
}

export const attemptOf = async (bookingId: Id<'booking'>) =>
  only(await getDb().select().from(paymentAttempts).where(eq(paymentAttempts.bookingId, bookingId)));

export const bookingOf = async (id: Id<'booking'>) => only(await getDb().select().from(bookings).where(eq(bookings.id, id)));

/** What the processor says of a session after its card was charged. */
export async function paidSnapshot(cards: CardsStandIn, sessionId: string): Promise<SessionSnapshot> {
  await cards.order({ do: 'pay', session: sessionId });
  return retrieveSession(sessionId);
}
