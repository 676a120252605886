import 'server-only';
import { and, eq, sql } from 'drizzle-orm';
import type { z } from 'zod';
import type { Tx } from '@/db/client';
import { payments } from '@/db/schema/books';
import { charges, terms } from '@/db/schema/dues';
import { contactDetails, households, people } from '@/db/schema/people';
import { nextReceipt, postEntry } from '@/lib/books/commands';
import { recordChange } from '@/lib/club/commands';
import type { Id } from '@/lib/core/ids';
import { firstOrNull, only } from '@/lib/core/only';
import { parseMoney } from '@/lib/core/money';
import { Refusal } from '@/lib/core/refusal';
import { addDays, dayOf, type Day } from '@/lib/core/time';
import type { Method } from '@/lib/core/words';
import type { AccountCtx, Ctx } from '@/lib/infra/context';
import { inTransaction } from '@/lib/infra/transaction';
import { queueLetter } from '@/lib/letters/commands';
import type { recordPaymentInput } from './schema';

/** A receipt: which payment it is for, and its number in its year. */
export type Receipt = { paymentId: Id<'payment'>; year: number; number: number };

type Settling = {
  chargeId: Id<'charge'>;
  method: Method;
  amountMinor: number;
  receivedOn: Day;
  reference?: string | null;
  attemptId?: Id<'attempt'>;
  recordedBy?: Id<'account'>;
};

/**
 * Takes money for a charge: the payment, its entry in the books, the term when all is paid, and the receipt's letter,
 * in the caller's transaction. Locks the charge, then the receipt counter last.
 */
export async function settleCharge(tx: Tx, ctx: Ctx, settling: Settling): Promise<Receipt> {
  const charge = await lockCharge(tx, settling.chargeId);
  const outstanding = charge.amountMinor - charge.paidMinor;
  if (outstanding <= 0) throw new Refusal('already_paid');
  if (settling.amountMinor > outstanding) throw new Refusal('wrong_amount', { fields: { amount: 'That is more than is owed for this term.' } });
  if (settling.amountMinor === outstanding) await makeTerm(tx, ctx, charge);
  const receipt = await nextReceipt(tx, Number(settling.receivedOn.slice(0, 4)));
  const payment = only(await tx.insert(payments).values({
    chargeId: settling.chargeId, householdId: charge.householdId, method: settling.method, amountMinor: settling.amountMinor, currency: charge.currency,
    receivedOn: settling.receivedOn, reference: settling.reference ?? null, attemptId: settling.attemptId ?? null,
    receiptYear: receipt.year, receiptNumber: receipt.number, recordedAt: ctx.now, recordedBy: settling.recordedBy ?? null,
  }).returning({ id: payments.id }));
  await postEntry(tx, ctx, { kind: 'received', method: settling.method, for: 'dues', amountMinor: settling.amountMinor },
    { sourceId: payment.id, happenedOn: settling.receivedOn, householdId: charge.householdId, currency: charge.currency });
  await queueReceipt(tx, ctx, { paymentId: payment.id, householdId: charge.householdId });
  return { paymentId: payment.id, ...receipt };
}

async function lockCharge(tx: Tx, chargeId: Id<'charge'>) {
  const charge = firstOrNull(await tx.select({
    householdId: charges.householdId, classKey: charges.classKey, termFrom: charges.termFrom, termTo: charges.termTo,
    amountMinor: charges.amountMinor, currency: charges.currency, waivedAt: charges.waivedAt,
  }).from(charges).where(eq(charges.id, chargeId)).for('no key update'));
  if (!charge || charge.waivedAt !== null) throw new Refusal('not_found');
  return { ...charge, paidMinor: await paidMinor(tx, chargeId) };
}

/** What has come for a charge so far, in minor units. */
export async function paidMinor(tx: Tx, chargeId: Id<'charge'>): Promise<number> {
  return only(await tx.select({ sum: sql<number>`coalesce(sum(${payments.amountMinor}), 0)::int` }).from(payments).where(eq(payments.chargeId, chargeId))).sum;
}

/* The constraint against overlapping terms decides; it writes nothing when it refuses. */
async function makeTerm(tx: Tx, ctx: Ctx, charge: { householdId: Id<'household'>; classKey: string; termFrom: Day; termTo: Day }): Promise<void> {
  const made = await tx.insert(terms).values({ householdId: charge.householdId, classKey: charge.classKey, during: `[${charge.termFrom},${addDays(charge.termTo, 1)})`, madeAt: ctx.now })
    .onConflictDoNothing().returning({ id: terms.id });
  if (made.length === 0) throw new Refusal('already_paid', { sentence: 'Some of those days are paid for already, by another term of this household.' });
}

async function queueReceipt(tx: Tx, ctx: Ctx, { paymentId, householdId }: { paymentId: Id<'payment'>; householdId: Id<'household'> }): Promise<void> {
  const contact = firstOrNull(await tx.select({ name: households.name, email: contactDetails.email })
    .from(people).innerJoin(households, eq(households.id, people.householdId)).leftJoin(contactDetails, eq(contactDetails.personId, people.id))
    .where(and(eq(people.householdId, householdId), eq(people.isContact, true))));
  if (!contact?.email) return; // no address: the receipt is on the page and can be printed
  await queueLetter(tx, { key: `dues-receipt:${paymentId}`, kind: 'dues-receipt', to: { name: contact.name, address: contact.email }, madeAt: ctx.now, dueAt: ctx.now, householdId, facts: { paymentId } });
}

/** Records a cheque, cash or a transfer for a charge; the receipt is numbered and written to the household. */
export async function recordPayment(ctx: AccountCtx, input: z.output<typeof recordPaymentInput>): Promise<Receipt> {
  const amountMinor = parseMoney(input.amount, ctx.club.currency);
  if (amountMinor === null || amountMinor === 0) throw new Refusal('wrong_amount', { fields: { amount: 'Type an amount like 62.00.' } });
  if (input.receivedOn > dayOf(ctx.now, ctx.club.timeZone)) throw new Refusal('wrong_amount', { sentence: 'Money cannot have come on a day that is still to come.', fields: { receivedOn: 'Choose today or an earlier day.' } });
  return inTransaction(ctx.db, async (tx) => {
    const receipt = await settleCharge(tx, ctx, { chargeId: input.chargeId, method: input.method, amountMinor, receivedOn: input.receivedOn, reference: input.reference, recordedBy: ctx.actor.accountId });
    await recordChange(tx, ctx, { action: 'recorded a payment', subjectKind: 'charge', subjectId: input.chargeId, after: { method: input.method, amountMinor, receipt: `${receipt.year}/${receipt.number}` } });
    return receipt;
  });
}
