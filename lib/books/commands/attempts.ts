import 'server-only';
import { and, eq, isNull } from 'drizzle-orm';
import type { Db, Tx } from '@/db/client';
import { paymentAttempts } from '@/db/schema/books';
import { newId, type Id } from '@/lib/core/ids';
import { firstOrNull } from '@/lib/core/only';
import { Refusal } from '@/lib/core/refusal';
import { addMinutes } from '@/lib/core/time';
import { CardsProblem, createSession, type NewSession, type SessionSnapshot } from '@/lib/infra/cards';
import { env } from '@/lib/infra/env';
import { log } from '@/lib/infra/log';

/** What an attempt pays for: one booking or one charge. */
export type PaidThing = { bookingId: Id<'booking'> } | { chargeId: Id<'charge'> };

/** How the processor's page names what is bought, and where it sends the payer afterwards (paths under the site's address). */
export type Checkout = { lines: NewSession['lines']; email: string | null; donePath: string; backPath: string };

export type OpenAttempt = { id: Id<'attempt'>; idempotencyKey: string; amountMinor: number; currency: string; openedAt: Date; sessionId: string | null; sessionUrl: string | null };

/** 30 minutes is the processor's least; one more keeps a slow call or a clock that is a little off from being refused. */
const SESSION_MINUTES = 31;

const attemptFacts = {
  id: paymentAttempts.id, idempotencyKey: paymentAttempts.idempotencyKey, amountMinor: paymentAttempts.amountMinor, currency: paymentAttempts.currency, openedAt: paymentAttempts.openedAt,
  sessionId: paymentAttempts.sessionId, sessionUrl: paymentAttempts.sessionUrl,
};
const ofThing = (thing: PaidThing) => ('bookingId' in thing ? eq(paymentAttempts.bookingId, thing.bookingId) : eq(paymentAttempts.chargeId, thing.chargeId));

/** The open attempt for a thing, or a new one; the caller has locked the thing, so that there is one. */
export async function openAttempt(tx: Tx, now: Date, thing: PaidThing, amount: { amountMinor: number; currency: string }): Promise<OpenAttempt> {
  const open = firstOrNull(await tx.select(attemptFacts).from(paymentAttempts).where(and(ofThing(thing), isNull(paymentAttempts.endedAt))));
  if (open) return open;
  const id = newId<'attempt'>();
  const made = { id, idempotencyKey: `attempt-${id}`, openedAt: now, amountMinor: amount.amountMinor, currency: amount.currency };
  await tx.insert(paymentAttempts).values({ ...made, ...('bookingId' in thing ? { bookingId: thing.bookingId } : { chargeId: thing.chargeId }) });
  return { ...made, sessionId: null, sessionUrl: null };
}

/**
 * Asks the processor for the session of a committed attempt; the same attempt gets the same session. When it does not
 * answer, the attempt stays open for the reconciler and the payer is told that no money has moved.
 */
export async function askForSession(attempt: OpenAttempt, checkout: Checkout): Promise<SessionSnapshot> {
  const site = env().SITE_URL.replace(/\/$/, '');
  try {
    return await createSession({
      attemptId: attempt.id, idempotencyKey: attempt.idempotencyKey, currency: attempt.currency, lines: checkout.lines, email: checkout.email,
      expiresAt: sessionEnd(attempt), doneUrl: site + checkout.donePath, backUrl: site + checkout.backPath,
    });
  } catch (error) {
    if (!(error instanceof CardsProblem)) throw error;
    log.warn('card session not made', { attempt: attempt.id, answered: error.isAnswer, code: error.code });
    throw new Refusal('cards_unavailable');
  }
}

/** When the session of an attempt ends: counted from its opening, so that a repeated call says the same. */
export const sessionEnd = (attempt: Pick<OpenAttempt, 'openedAt'>): Date => addMinutes(attempt.openedAt, SESSION_MINUTES);

/** Writes down the session that the processor made for an attempt. */
export async function keepSession(db: Db | Tx, attemptId: Id<'attempt'>, session: SessionSnapshot): Promise<void> {
  await db.update(paymentAttempts).set({ sessionId: session.sessionId, sessionUrl: session.url, sessionExpiresAt: session.expiresAt })
    .where(and(eq(paymentAttempts.id, attemptId), isNull(paymentAttempts.sessionId)));
}
