import { eq } from 'drizzle-orm';
import { beforeAll, describe, expect, it } from 'vitest';
import { getDb } from '@/db/client';
import { journalEntries, paymentAttempts, postings, refunds } from '@/db/schema/books';
import { auditTrail } from '@/db/schema/club';
import { charges } from '@/db/schema/dues';
import { letters } from '@/db/schema/letters';
import { giveBackPayment, paidByHand } from '@/lib/books/commands/give-back-payment';
import { refundsOf, refundsOpen } from '@/lib/books/queries';
import { newId, type Id } from '@/lib/core/ids';
import { only } from '@/lib/core/only';
import { recordPayment, settleCharge } from '@/lib/dues/commands';
import type { AccountActor } from '@/lib/infra/context';
import { inTransaction } from '@/lib/infra/transaction';
import { ada, aClub, ctxOf, dov, NOON } from '@/tests/support/cast';
import { refusalOf } from '../bookings/hold-cast';

async function aCharge(member: AccountActor) {
  return only(await getDb().insert(charges).values({ householdId: member.householdId ?? expect.fail(), classKey: 'household', termFrom: '2027-01-01', termTo: '2027-12-31', amountMinor: 6200, currency: 'USD', dueOn: '2027-01-01', madeAt: NOON }).returning({ id: charges.id })).id;
}

async function aCheque() {
  const ctx = await ctxOf(await dov());
  const member = await ada();
  const { paymentId } = await recordPayment(ctx, { chargeId: await aCharge(member), method: 'cheque', amount: '62.00', receivedOn: '2027-04-30', reference: null });
  return { ctx, member, paymentId };
}

async function aCardPayment() {
  const ctx = await ctxOf(await dov());
  const chargeId = await aCharge(await ada());
  const attempt = only(await getDb().insert(paymentAttempts).values({ chargeId, idempotencyKey: newId(), amountMinor: 6200, currency: 'USD', openedAt: NOON, endedAt: NOON, outcome: 'paid', paymentIntentId: `pi_${newId()}` }).returning({ id: paymentAttempts.id }));
  const { paymentId } = await inTransaction(getDb(), (tx) => settleCharge(tx, ctx, { chargeId, method: 'card', amountMinor: 6200, receivedOn: '2027-05-01', attemptId: attempt.id }));
  return { ctx, paymentId };
}

/** What one account holds after the refunds of a payment alone. */
async function movedBy(paymentId: Id<'payment'>, account: string) {
  const ids = (await getDb().select({ id: refunds.id }).from(refunds).where(eq(refunds.paymentId, paymentId))).flatMap(({ id }) => [id, `${id}:by-hand`]);
  const lines = await getDb().select({ sourceId: journalEntries.sourceId, amountMinor: postings.amountMinor }).from(postings).innerJoin(journalEntries, eq(journalEntries.id, postings.entryId)).where(eq(postings.account, account));
  return lines.filter((line) => ids.includes(line.sourceId)).reduce((sum, line) => sum + line.amountMinor, 0);
}

describe('money that a treasurer gives back', () => {
  beforeAll(() => aClub());

  it('leaves by hand at once when it came as a cheque: booked, written to the household, kept in the audit trail', async () => {
    const { ctx, member, paymentId } = await aCheque();

    expect(await giveBackPayment(ctx, { paymentId, amount: '12.40', reason: 'they moved away' })).toBe('by-hand');

    expect([await movedBy(paymentId, 'dues-income'), await movedBy(paymentId, 'refunds-owed'), await movedBy(paymentId, 'cheques-in-hand')]).toEqual([1240, 0, -1240]);
    expect(await refundsOf(ctx, paymentId)).toMatchObject([{ amountMinor: 1240, reason: 'they moved away', byHand: true, doneAt: NOON }]);
    expect((await getDb().select({ kind: letters.kind }).from(letters).where(eq(letters.householdId, member.householdId ?? expect.fail()))).map(({ kind }) => kind).sort()).toEqual(['dues-receipt', 'refund']);
    expect(await getDb().select({ by: auditTrail.accountId, what: auditTrail.action }).from(auditTrail).where(eq(auditTrail.subjectId, paymentId))).toEqual([{ by: ctx.actor.accountId, what: 'gave money back' }]);
  });

  it('is owed until the card service has sent it when it came by card', async () => {
    const { ctx, paymentId } = await aCardPayment();

    expect(await giveBackPayment(ctx, { paymentId, amount: '62', reason: 'paid twice' })).toBe('card');

    expect([await movedBy(paymentId, 'refunds-owed'), await movedBy(paymentId, 'cards-clearing')]).toEqual([-6200, 0]);
    expect(await refundsOf(ctx, paymentId)).toMatchObject([{ doneAt: null, failedAt: null, byHand: false }]);
  });

  it.each([
    { amount: '62.01', ends: 'refund_too_large' },
    { amount: '0', ends: 'wrong_amount' },
    { amount: '-5', ends: 'wrong_amount' },
    { amount: 'all of it', ends: 'wrong_amount' },
    { amount: '62.00', ends: 'done' },
  ])('answers $ends to $amount of 62.00', async ({ amount, ends }) => {
    const { ctx, paymentId } = await aCheque();

    expect(await refusalOf(giveBackPayment(ctx, { paymentId, amount, reason: 'asked' }))).toBe(ends);
  });

  it('leaves once, though two treasurers give all of it back at the same moment', async () => {
    const { ctx, paymentId } = await aCheque();

    const ends = await Promise.all([0, 1].map(() => refusalOf(giveBackPayment(ctx, { paymentId, amount: '62.00', reason: 'asked' }))));

    expect(ends.sort()).toEqual(['done', 'refund_too_large']);
    expect(await movedBy(paymentId, 'cheques-in-hand')).toBe(-6200);
  });

  it('is paid out another way, once, when the card service would not', async () => {
    const { ctx, paymentId } = await aCardPayment();
    await giveBackPayment(ctx, { paymentId, amount: '20.00', reason: 'asked' });
    const { id: refundId } = only(await refundsOf(ctx, paymentId));
    expect(await refusalOf(paidByHand(ctx, { refundId, method: 'transfer' }))).toBe('not_found');
    await getDb().update(refunds).set({ failedAt: NOON }).where(eq(refunds.id, refundId));
    expect((await refundsOpen(ctx)).map((refund) => refund.id)).toContain(refundId);

    const ends = await Promise.all([0, 1].map(() => refusalOf(paidByHand(ctx, { refundId, method: 'transfer' }))));

    expect(ends.sort()).toEqual(['already_given_back', 'done']);
    expect([await movedBy(paymentId, 'refunds-owed'), await movedBy(paymentId, 'bank')]).toEqual([0, -2000]);
    expect((await refundsOpen(ctx)).map((refund) => refund.id)).not.toContain(refundId);
    expect(await refusalOf(giveBackPayment(ctx, { paymentId, amount: '42.01', reason: 'asked' }))).toBe('refund_too_large');
  });
});
