import 'server-only';
import { and, asc, eq, isNull } from 'drizzle-orm';
import { bookings } from '@/db/schema/bookings';
import { paymentAttempts } from '@/db/schema/books';
import { keepSession, sessionEnd } from '@/lib/books/commands/attempts';
import type { Id } from '@/lib/core/ids';
import { firstOrNull } from '@/lib/core/only';
import { addMinutes } from '@/lib/core/time';
import { CardsProblem, createSession, expireSession, findSession, retrieveSession, type SessionSnapshot } from '@/lib/infra/cards';
import { env } from '@/lib/infra/env';
import type { SystemCtx } from '@/lib/infra/context';
import { log } from '@/lib/infra/log';
import { applyPayment } from './apply-payment';

/** A call to the processor that has not come back after this long has failed. */
const CALL_MINUTES = 1;

const facts = {
  id: paymentAttempts.id, bookingId: paymentAttempts.bookingId, idempotencyKey: paymentAttempts.idempotencyKey, amountMinor: paymentAttempts.amountMinor, currency: paymentAttempts.currency,
  openedAt: paymentAttempts.openedAt, sessionId: paymentAttempts.sessionId, sessionExpiresAt: paymentAttempts.sessionExpiresAt, heldUntil: bookings.heldUntil,
};
type OpenAttempt = { id: Id<'attempt'>; idempotencyKey: string; amountMinor: number; currency: string; openedAt: Date; sessionId: string | null; sessionExpiresAt: Date | null; heldUntil: Date | null };

/** Asks the processor about every open attempt, oldest first; stops when it does not answer, the next sweep goes on. One that breaks does not keep the others waiting. */
export async function settleAttempts(ctx: SystemCtx): Promise<void> {
  const open = await ctx.db.select({ id: paymentAttempts.id }).from(paymentAttempts).where(isNull(paymentAttempts.endedAt)).orderBy(asc(paymentAttempts.openedAt)).limit(100);
  for (const { id } of open) {
    const outcome = await settleAttempt(ctx, id).catch((error: unknown) => {
      log.error('payment attempt', error, { attempt: id });
      return 'asked' as const;
    });
    if (outcome === 'silent') return;
  }
}

/**
 * Asks what became of one open attempt and applies the answer. When the party's time is up its session is ended first,
 * and the places are freed only by the processor's own word.
 */
export async function settleAttempt(ctx: SystemCtx, attemptId: Id<'attempt'>): Promise<'asked' | 'silent'> {
  const attempt = firstOrNull(await ctx.db.select({ ...facts, endedAt: paymentAttempts.endedAt }).from(paymentAttempts)
    .leftJoin(bookings, eq(bookings.id, paymentAttempts.bookingId)).where(eq(paymentAttempts.id, attemptId)));
  if (!attempt || attempt.endedAt !== null) return 'asked';
  try {
    const snapshot = attempt.sessionId === null ? await settleUnanswered(ctx, attempt) : await askAbout(ctx, attempt, attempt.sessionId);
    if (snapshot) await applyPayment(ctx, snapshot);
    return 'asked';
  } catch (error) {
    if (!(error instanceof CardsProblem)) throw error;
    log.warn('payment attempt not settled yet', { attempt: attemptId, answered: error.isAnswer, code: error.code });
    return error.isAnswer ? 'asked' : 'silent';
  }
}

const askAbout = (ctx: SystemCtx, attempt: OpenAttempt, sessionId: string): Promise<SessionSnapshot> =>
  attempt.heldUntil !== null && attempt.heldUntil <= ctx.now ? expireSession(sessionId) : retrieveSession(sessionId);

/**
 * The processor's answer was lost. Repeating the call with its own key answers with the same session, or uses the key
 * up, so that the first call can do nothing any more; then the session is ended, since nobody was sent to it.
 */
async function settleUnanswered(ctx: SystemCtx, attempt: OpenAttempt): Promise<SessionSnapshot | null> {
  if (addMinutes(attempt.openedAt, CALL_MINUTES) > ctx.now) return null; // the call may still be on its way
  const session = await repeatCall(attempt);
  if (session) {
    await keepSession(ctx.db, attempt.id, session);
    return expireSession(session.sessionId);
  }
  await ctx.db.update(paymentAttempts).set({ endedAt: ctx.now, outcome: 'failed' })
    .where(and(eq(paymentAttempts.id, attempt.id), isNull(paymentAttempts.endedAt), isNull(paymentAttempts.sessionId)));
  return null;
}

async function repeatCall(attempt: OpenAttempt): Promise<SessionSnapshot | null> {
  const site = env().SITE_URL;
  try {
    return await createSession({
      attemptId: attempt.id, idempotencyKey: attempt.idempotencyKey, currency: attempt.currency, email: null, expiresAt: sessionEnd(attempt),
      lines: [{ name: 'A payment that was not begun', amountMinor: attempt.amountMinor }], doneUrl: site, backUrl: site,
    });
  } catch (error) {
    if (!(error instanceof CardsProblem) || !error.isAnswer) throw error;
    return findSession(attempt.id, attempt.openedAt); // the key holds another answer: what exists is what counts
  }
}
