import 'server-only';
import { and, asc, eq, isNotNull, isNull, lte, sql } from 'drizzle-orm';
import type { Tx } from '@/db/client';
import { bookings } from '@/db/schema/bookings';
import { cardPayments, paymentAttempts, payments, refunds } from '@/db/schema/books';
import { charges } from '@/db/schema/dues';
import type { Id } from '@/lib/core/ids';
import { firstOrNull, only } from '@/lib/core/only';
import { Refusal } from '@/lib/core/refusal';
import { addMinutes } from '@/lib/core/time';
import { CardsProblem, createRefund, findRefund, type RefundSnapshot } from '@/lib/infra/cards';
import { findParty } from '@/lib/bookings/commands/confirm';
import type { Ctx, SystemCtx } from '@/lib/infra/context';
import { log } from '@/lib/infra/log';
import { inTransaction } from '@/lib/infra/transaction';
import { queueLetter } from '@/lib/letters/commands';
import { nextTryMinutes, type MoneyFor } from '../rules';
import { postEntry } from '../commands';

/** Money to give back of one payment, and why. */
export type RefundWish = { paymentId: Id<'payment'>; amountMinor: number; reason: string };

/** Owes a payer some of a payment back, in the caller's transaction: never more than was paid and not yet given back. Locks what was paid for: payments themselves never change. */
export async function oweRefund(tx: Tx, ctx: Ctx, wish: RefundWish): Promise<RefundId> {
  const payment = firstOrNull(await tx.select({ amountMinor: payments.amountMinor, currency: payments.currency, chargeId: payments.chargeId, householdId: payments.householdId, bookingId: payments.bookingId })
    .from(payments).where(eq(payments.id, wish.paymentId)));
  if (!payment) throw new Refusal('not_found');
  if (payment.bookingId !== null) await tx.select({ id: bookings.id }).from(bookings).where(eq(bookings.id, payment.bookingId)).for('no key update');
  if (payment.chargeId !== null) await tx.select({ id: charges.id }).from(charges).where(eq(charges.id, payment.chargeId)).for('no key update');
  if (wish.amountMinor > (await leftOfPayment(tx, wish.paymentId))) throw new Refusal('refund_too_large');
  const refund = only(await tx.insert(refunds).values({
    paymentId: wish.paymentId, amountMinor: wish.amountMinor, currency: payment.currency, reason: wish.reason, askedAt: ctx.now, dueAt: ctx.now,
    askedBy: ctx.actor.kind === 'account' ? ctx.actor.accountId : null,
  }).returning({ id: refunds.id }));
  const openDayId = payment.bookingId === null ? null : only(await tx.select({ id: bookings.openDayId }).from(bookings).where(eq(bookings.id, payment.bookingId))).id;
  await postEntry(tx, ctx, { kind: 'refund-owed', for: payment.chargeId === null ? 'tickets' : 'dues', amountMinor: wish.amountMinor },
    { sourceId: refund.id, currency: payment.currency, householdId: payment.householdId, openDayId });
  return refund.id;
}

/** What of a payment is not given back or owed back yet, in minor units. Whoever acts on it has locked what was paid for. */
export async function leftOfPayment(tx: Tx, paymentId: Id<'payment'>): Promise<number> {
  const back = sql<number>`coalesce((select sum(${refunds.amountMinor}) from ${refunds} where ${refunds.paymentId} = ${payments.id}), 0)::int`;
  const row = only(await tx.select({ amountMinor: payments.amountMinor, backMinor: sql<number>`${back}` }).from(payments).where(eq(payments.id, paymentId)));
  return row.amountMinor - row.backMinor;
}

type RefundId = (typeof refunds.$inferSelect)['id'];

const due = {
  id: refunds.id, paymentId: refunds.paymentId, amountMinor: refunds.amountMinor, currency: refunds.currency, tries: refunds.tries, processorId: refunds.processorId, doneAt: refunds.doneAt, failedAt: refunds.failedAt,
  paymentIntentId: paymentAttempts.paymentIntentId, attemptId: paymentAttempts.id, chargeId: paymentAttempts.chargeId, bookingId: paymentAttempts.bookingId,
};
const fromCards = sql`${paymentAttempts.id} = coalesce(${refunds.attemptId}, ${payments.attemptId})`;

/** Sends every card refund that is due to the processor, oldest first, at most 50 a call; stops when it does not answer. Back-off is in the row, with no last try. */
export async function sendRefunds(ctx: SystemCtx): Promise<void> {
  const rows = await ctx.db.select({ id: refunds.id }).from(refunds)
    .leftJoin(payments, eq(payments.id, refunds.paymentId)).innerJoin(paymentAttempts, fromCards)
    .where(and(isNull(refunds.doneAt), isNull(refunds.failedAt), lte(refunds.dueAt, ctx.now), isNotNull(paymentAttempts.paymentIntentId)))
    .orderBy(asc(refunds.dueAt)).limit(50);
  for (const { id } of rows) if ((await sendRefund(ctx, id)) === 'silent') return; // the other sweeps must not wait for it
}

/** Sends one refund if it is still due. The next try is written down before the processor is asked, so that two workers do not both ask. */
async function sendRefund(ctx: SystemCtx, refundId: RefundId): Promise<'asked' | 'silent'> {
  const refund = await inTransaction(ctx.db, async (tx) => {
    const locked = await tx.select({ id: refunds.id }).from(refunds).where(and(eq(refunds.id, refundId), isNull(refunds.doneAt), isNull(refunds.failedAt), lte(refunds.dueAt, ctx.now))).for('no key update');
    if (locked.length === 0) return null;
    const row = await findDue(tx, refundId);
    if (row) await tx.update(refunds).set({ tries: row.tries + 1, dueAt: addMinutes(ctx.now, nextTryMinutes(row.tries)) }).where(eq(refunds.id, refundId));
    return row;
  });
  if (!refund || refund.paymentIntentId === null) return 'asked';
  const { id, paymentIntentId, amountMinor, tries } = refund;
  try {
    // A key replays its answer for a day, failures included: so look first whether an earlier try was done after all.
    const known = tries === 0 ? null : await findRefund(id, paymentIntentId);
    await applyRefund(ctx, known ?? await createRefund({ refundId: id, paymentIntentId, amountMinor, idempotencyKey: `refund-${id}-${tries}` }));
    return 'asked';
  } catch (error) {
    if (!(error instanceof CardsProblem)) throw error;
    log.warn('refund not made yet', { refund: id, tries: tries + 1, answered: error.isAnswer, code: error.code });
    return error.isAnswer ? 'asked' : 'silent';
  }
}

const findDue = async (tx: Tx, refundId: RefundId) => firstOrNull(await tx.select(due).from(refunds)
  .leftJoin(payments, eq(payments.id, refunds.paymentId)).innerJoin(paymentAttempts, fromCards).where(eq(refunds.id, refundId)));

/** Applies what the processor says of a refund, for the job and the webhook: done once, and failed once even after it was done. */
export async function applyRefund(ctx: SystemCtx, snapshot: RefundSnapshot): Promise<void> {
  if (snapshot.ourId === null || snapshot.state === 'waiting') return;
  const ourId = snapshot.ourId;
  await inTransaction(ctx.db, async (tx) => {
    const locked = await tx.select({ id: refunds.id }).from(refunds).where(sql`${refunds.id}::text = ${ourId}`).for('no key update');
    const found = firstOrNull(locked);
    const refund = found && await findDue(tx, found.id);
    if (!refund || snapshot.amountMinor !== refund.amountMinor) return;
    if (snapshot.state === 'failed' && refund.doneAt === null) return failBeforeDone(tx, ctx, refund.id, snapshot);
    const outcome = snapshot.state === 'done' ? 'refunded' : 'refund-failed';
    const isNews = await tx.insert(cardPayments).values({ objectId: snapshot.refundId, outcome, attemptId: refund.attemptId, amountMinor: refund.amountMinor, currency: refund.currency, appliedAt: ctx.now })
      .onConflictDoNothing().returning({ id: cardPayments.id });
    if (isNews.length === 0 || (snapshot.state === 'done' && refund.failedAt !== null)) return;
    await tx.update(refunds).set(snapshot.state === 'done' ? { doneAt: ctx.now, processorId: snapshot.refundId } : { failedAt: ctx.now }).where(eq(refunds.id, refund.id));
    const purpose: MoneyFor = refund.chargeId === null ? 'tickets' : 'dues';
    const openDayId = refund.bookingId === null ? null : only(await tx.select({ id: bookings.openDayId }).from(bookings).where(eq(bookings.id, refund.bookingId))).id;
    await postEntry(tx, ctx, { kind: snapshot.state === 'done' ? 'refund-paid' : 'refund-failed', method: 'card', for: purpose, amountMinor: refund.amountMinor },
      { sourceId: refund.id, currency: refund.currency, openDayId });
    const party = snapshot.state === 'done' && refund.bookingId !== null && refund.paymentId !== null ? await findParty(tx, refund.bookingId) : null;
    if (party) await queueLetter(tx, { key: `refund:${refund.id}`, kind: 'refund', to: party.to, madeAt: ctx.now, dueAt: ctx.now, openDayId: party.openDayId, bookingId: party.bookingId, facts: { amountMinor: refund.amountMinor } });
  });
}

/** The processor refused before any money left: nothing to book, but an officer must see it. */
async function failBeforeDone(tx: Tx, ctx: Ctx, refundId: RefundId, snapshot: RefundSnapshot): Promise<void> {
  await tx.update(refunds).set({ failedAt: ctx.now, processorId: snapshot.refundId }).where(and(eq(refunds.id, refundId), isNull(refunds.failedAt)));
}
