import 'server-only';
import { and, eq, isNull, sql } from 'drizzle-orm';
import type { z } from 'zod';
import type { Tx } from '@/db/client';
import { bookingContacts, bookings } from '@/db/schema/bookings';
import { paymentAttempts, payments, refunds } from '@/db/schema/books';
import { contactDetails, households, people } from '@/db/schema/people';
import { recordChange } from '@/lib/club/commands';
import type { Id } from '@/lib/core/ids';
import { parseMoney } from '@/lib/core/money';
import { firstOrNull, only } from '@/lib/core/only';
import { Refusal } from '@/lib/core/refusal';
import type { Method } from '@/lib/core/words';
import type { AccountCtx } from '@/lib/infra/context';
import { inTransaction } from '@/lib/infra/transaction';
import { queueLetter } from '@/lib/letters/commands';
import { postEntry } from '../commands';
import type { giveBackPaymentInput, paidByHandInput } from '../schema';
import { oweRefund } from './refunds';

/** How a refund goes: by the card service, which is asked by the worker, or by hand and so at once. */
export type RefundWay = 'card' | 'by-hand';

/**
 * Gives some or all of a payment back, with why. A card payment goes back through the card service; a cheque, cash or a
 * transfer is paid out by hand and booked as gone. The payer is written to. Locks the payment.
 */
export async function giveBackPayment(ctx: AccountCtx, input: z.output<typeof giveBackPaymentInput>): Promise<RefundWay> {
  const amountMinor = parseMoney(input.amount, ctx.club.currency);
  if (amountMinor === null || amountMinor === 0) throw new Refusal('wrong_amount', { fields: { amount: 'Type an amount like 62.00.' } });
  return inTransaction(ctx.db, async (tx) => {
    const refundId = await oweRefund(tx, ctx, { paymentId: input.paymentId, amountMinor, reason: input.reason });
    const payment = only(await tx.select({ method: payments.method }).from(payments).where(eq(payments.id, input.paymentId)));
    if (payment.method !== 'card') await payOut(tx, ctx, refundId, payment.method);
    await queueRefundLetter(tx, ctx, { refundId, paymentId: input.paymentId, amountMinor, reason: input.reason });
    await recordChange(tx, ctx, { action: 'gave money back', subjectKind: 'payment', subjectId: input.paymentId, after: { amountMinor, method: payment.method, reason: input.reason } });
    return payment.method === 'card' ? 'card' : 'by-hand';
  });
}

/** Records that a refund was paid out by hand: one that never came by card, or that the card service would not make. Locks the refund. */
export async function paidByHand(ctx: AccountCtx, input: z.output<typeof paidByHandInput>): Promise<void> {
  await inTransaction(ctx.db, async (tx) => {
    const refund = firstOrNull(await tx.select({ failedAt: refunds.failedAt, cameAs: payments.method }).from(refunds).leftJoin(payments, eq(payments.id, refunds.paymentId))
      .where(sql`${refunds.id} = ${input.refundId}::uuid`).for('no key update', { of: refunds }));
    if (!refund || (refund.failedAt === null && (refund.cameAs ?? 'card') === 'card')) throw new Refusal('not_found');
    const isNews = await payOut(tx, ctx, input.refundId, input.method);
    if (!isNews) throw new Refusal('already_given_back', { sentence: 'That refund is paid out already.' });
    await recordChange(tx, ctx, { action: 'paid a refund by hand', subjectKind: 'refund', subjectId: input.refundId, after: { method: input.method } });
  });
}

/* The card service may have paid it and taken it back, so an entry by hand has a source of its own. */
const handSource = (refundId: string) => `${refundId}:by-hand`;

/** Books that what was owed has left by this way, and that the refund is done; false when it was booked before. */
async function payOut(tx: Tx, ctx: AccountCtx, refundId: string, method: Method): Promise<boolean> {
  const owed = only(await tx.select({
    amountMinor: refunds.amountMinor, currency: refunds.currency, openDayId: bookings.openDayId, householdId: payments.householdId,
    isDues: sql<boolean>`coalesce(${payments.chargeId}, ${paymentAttempts.chargeId}) is not null`,
  })
    .from(refunds).leftJoin(payments, eq(payments.id, refunds.paymentId)).leftJoin(paymentAttempts, eq(paymentAttempts.id, refunds.attemptId))
    .leftJoin(bookings, eq(bookings.id, sql`coalesce(${payments.bookingId}, ${paymentAttempts.bookingId})`))
    .where(sql`${refunds.id} = ${refundId}::uuid`));
  const entry = await postEntry(tx, ctx, { kind: 'refund-paid', method, for: owed.isDues ? 'dues' : 'tickets', amountMinor: owed.amountMinor },
    { sourceId: handSource(refundId), currency: owed.currency, openDayId: owed.openDayId, householdId: owed.householdId });
  await tx.update(refunds).set({ doneAt: ctx.now }).where(and(sql`${refunds.id} = ${refundId}::uuid`, isNull(refunds.doneAt)));
  return entry !== null;
}

type Told = { refundId: string; paymentId: Id<'payment'>; amountMinor: number; reason: string };

async function queueRefundLetter(tx: Tx, ctx: AccountCtx, { refundId, paymentId, amountMinor, reason }: Told): Promise<void> {
  const payer = firstOrNull(await tx.select({
    bookingId: payments.bookingId, openDayId: bookings.openDayId, householdId: payments.householdId,
    name: sql<string | null>`coalesce(${bookingContacts.name}, ${households.name})`, email: sql<string | null>`coalesce(${bookingContacts.email}, ${contactDetails.email})`,
  })
    .from(payments)
    .leftJoin(bookings, eq(bookings.id, payments.bookingId)).leftJoin(bookingContacts, eq(bookingContacts.bookingId, payments.bookingId))
    .leftJoin(households, eq(households.id, payments.householdId))
    .leftJoin(people, and(eq(people.householdId, payments.householdId), eq(people.isContact, true))).leftJoin(contactDetails, eq(contactDetails.personId, people.id))
    .where(eq(payments.id, paymentId)));
  if (!payer?.email) return; // no address: the officer who gives it back tells them
  const about = payer.bookingId === null ? (payer.householdId === null ? {} : { householdId: payer.householdId }) : { bookingId: payer.bookingId, ...(payer.openDayId === null ? {} : { openDayId: payer.openDayId }) };
  await queueLetter(tx, { key: `refund:${refundId}`, kind: 'refund', to: { name: payer.name, address: payer.email }, madeAt: ctx.now, dueAt: ctx.now, ...about, facts: { amountMinor, reason } });
}
