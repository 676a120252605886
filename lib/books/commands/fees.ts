import 'server-only';
import { and, asc, eq, gt, notExists, sql } from 'drizzle-orm';
import { alias } from 'drizzle-orm/pg-core';
import { bookings } from '@/db/schema/bookings';
import { cardPayments, paymentAttempts } from '@/db/schema/books';
import { addMinutes } from '@/lib/core/time';
import { CardsProblem, retrieveFee } from '@/lib/infra/cards';
import type { SystemCtx } from '@/lib/infra/context';
import { inTransaction } from '@/lib/infra/transaction';
import { postEntry } from '../commands';

const WEEKS_LOOKED_BACK = 8;

/** Books what the processor kept of each card payment once its balance transaction exists, each once; at most 20 a call. */
export async function bookFees(ctx: SystemCtx): Promise<void> {
  const fee = alias(cardPayments, 'fee');
  const paid = await ctx.db.select({ paymentIntentId: cardPayments.objectId, attemptId: paymentAttempts.id, chargeId: paymentAttempts.chargeId, openDayId: bookings.openDayId, currency: cardPayments.currency })
    .from(cardPayments).innerJoin(paymentAttempts, eq(paymentAttempts.id, cardPayments.attemptId)).leftJoin(bookings, eq(bookings.id, paymentAttempts.bookingId))
    .where(and(eq(cardPayments.outcome, 'paid'), gt(cardPayments.appliedAt, addMinutes(ctx.now, -WEEKS_LOOKED_BACK * 7 * 24 * 60)),
      notExists(ctx.db.select({ one: sql`1` }).from(fee).where(and(eq(fee.objectId, cardPayments.objectId), eq(fee.outcome, 'fee'))))))
    .orderBy(asc(cardPayments.appliedAt)).limit(20);
  for (const payment of paid) {
    if (!(await bookFee(ctx, payment))) return; // the processor does not answer: the next sweep asks again
  }
}

type Paid = { paymentIntentId: string; attemptId: string; chargeId: string | null; openDayId: (typeof bookings.$inferSelect)['openDayId'] | null; currency: string };

async function bookFee(ctx: SystemCtx, paid: Paid): Promise<boolean> {
  const kept = await ask(paid.paymentIntentId);
  if (kept === 'silent') return false;
  if (kept === null) return true;
  await inTransaction(ctx.db, async (tx) => {
    const isNews = await tx.insert(cardPayments).values({ objectId: paid.paymentIntentId, outcome: 'fee', amountMinor: kept.feeMinor, currency: paid.currency, appliedAt: ctx.now })
      .onConflictDoNothing().returning({ id: cardPayments.id });
    if (isNews.length === 0 || kept.feeMinor === 0) return;
    await postEntry(tx, ctx, { kind: 'fee', for: paid.chargeId === null ? 'tickets' : 'dues', amountMinor: kept.feeMinor },
      { sourceId: paid.paymentIntentId, currency: paid.currency, openDayId: paid.openDayId });
  });
  return true;
}

async function ask(paymentIntentId: string) {
  try {
    return await retrieveFee(paymentIntentId);
  } catch (error) {
    if (error instanceof CardsProblem) return error.isAnswer ? null : 'silent' as const;
    throw error;
  }
}
