import { eq, sql } from 'drizzle-orm';
import { beforeAll, describe, expect, it } from 'vitest';
import { getDb } from '@/db/client';
import { journalEntries, payments, postings } from '@/db/schema/books';
import { charges, terms } from '@/db/schema/dues';
import { letters } from '@/db/schema/letters';
import { only } from '@/lib/core/only';
import type { AccountActor } from '@/lib/infra/context';
import { recordPayment } from '@/lib/dues/commands';
import { findReceipt, householdDues } from '@/lib/dues/queries';
import { ada, aClub, ben, ctxOf, dov, NOON } from '@/tests/support/cast';

async function owing(member: AccountActor, year = 2027) {
  if (member.householdId === null) throw new Error('a member has a household');
  return only(await getDb().insert(charges).values({ householdId: member.householdId, classKey: 'household', termFrom: `${year}-01-01`, termTo: `${year}-12-31`, amountMinor: 6200, currency: 'USD', dueOn: `${year}-01-01`, madeAt: NOON }).returning({ id: charges.id })).id;
}

const cheque = { method: 'cheque' as const, amount: '62.00', receivedOn: '2027-04-30', reference: 'no. 204' };

describe('dues that come on paper', () => {
  beforeAll(() => aClub());

  it('makes the payment, the term, a balanced entry, a numbered receipt and its letter', async () => {
    const member = await ada();
    const chargeId = await owing(member);

    const receipt = await recordPayment(await ctxOf(await dov()), { ...cheque, chargeId });

    expect(receipt).toMatchObject({ year: 2027 });
    const [payment] = await getDb().select({ id: payments.id, method: payments.method }).from(payments).where(eq(payments.chargeId, chargeId));
    expect(payment).toEqual({ id: receipt.paymentId, method: 'cheque' });
    const lines = await getDb().select({ account: postings.account, amountMinor: postings.amountMinor }).from(postings)
      .innerJoin(journalEntries, eq(journalEntries.id, postings.entryId)).where(eq(journalEntries.sourceId, receipt.paymentId));
    expect(lines.sort((a, b) => b.amountMinor - a.amountMinor)).toEqual([{ account: 'cheques-in-hand', amountMinor: 6200 }, { account: 'dues-income', amountMinor: -6200 }]);
    expect(await getDb().select({ during: terms.during }).from(terms).where(sql`${terms.householdId} = ${member.householdId}`)).toEqual([{ during: '[2027-01-01,2028-01-01)' }]);
    expect(await getDb().select({ kind: letters.kind }).from(letters).where(sql`${letters.householdId} = ${member.householdId}`)).toEqual([{ kind: 'dues-receipt' }]);
  });

  it('numbers receipts without a gap, though one in between is refused', async () => {
    const ctx = await ctxOf(await dov());
    const [first, second] = [await owing(await ada()), await owing(await ben())];
    const before = await recordPayment(ctx, { ...cheque, chargeId: first });
    await expect(recordPayment(ctx, { ...cheque, chargeId: first })).rejects.toMatchObject({ code: 'already_paid' });

    const after = await recordPayment(ctx, { ...cheque, chargeId: second });

    expect(after.number).toBe(before.number + 1);
  });

  it('takes a cheque once, though two officers record it at the same moment', async () => {
    const member = await ada();
    const chargeId = await owing(member);
    const ctx = await ctxOf(await dov());

    const tries = await Promise.allSettled([recordPayment(ctx, { ...cheque, chargeId }), recordPayment(ctx, { ...cheque, chargeId })]);

    expect(tries.filter((each) => each.status === 'fulfilled')).toHaveLength(1);
    expect((await householdDues(ctx, member.householdId ?? expect.fail())).receipts).toHaveLength(1);
  });

  it('keeps a part payment, and gives the term only when all has come', async () => {
    const member = await ada();
    const chargeId = await owing(member);
    const ctx = await ctxOf(await dov());
    const household = member.householdId ?? expect.fail();

    await recordPayment(ctx, { ...cheque, chargeId, amount: '40' });
    const half = await householdDues(ctx, household);
    await recordPayment(ctx, { ...cheque, chargeId, amount: '$22.00', method: 'cash' });
    const whole = await householdDues(ctx, household);

    expect(half.standing).toEqual({ kind: 'new', owedMinor: 2200 });
    expect(whole.standing).toEqual({ kind: 'paid', to: '2027-12-31' });
  });

  it.each([['0', 'nothing'], ['62.005', 'half a cent'], ['-62', 'a debt'], ['1e9', 'a power'], ['sixty', 'words'], ['62.01', 'a cent too much']])('refuses %s (%s) beside the amount', async (amount) => {
    const chargeId = await owing(await ada());

    await expect(recordPayment(await ctxOf(await dov()), { ...cheque, chargeId, amount })).rejects.toMatchObject({ code: 'wrong_amount', detail: { fields: { amount: expect.any(String) } } });
  });

  it('shows a receipt to its own household only', async () => {
    const [member, stranger] = [await ada(), await ben()];
    const receipt = await recordPayment(await ctxOf(await dov()), { ...cheque, chargeId: await owing(member) });
    const asMember = { ...(await ctxOf(member)), actor: { ...member, householdId: member.householdId ?? expect.fail() } };
    const asStranger = { ...asMember, actor: { ...stranger, householdId: stranger.householdId ?? expect.fail() } };

    expect(await findReceipt(asMember, receipt.paymentId)).toMatchObject({ amountMinor: 6200, method: 'cheque' });
    expect(await findReceipt(asStranger, receipt.paymentId)).toBeNull();
  });

  it('never lets a term overlap another of the same household', async () => {
    const member = await ada();
    const ctx = await ctxOf(await dov());
    await recordPayment(ctx, { ...cheque, chargeId: await owing(member) });

    const overlap = getDb().insert(terms).values({ householdId: member.householdId ?? expect.fail(), classKey: 'household', during: '[2027-06-01,2028-06-01)', madeAt: NOON });

    await expect(overlap).rejects.toMatchObject({ cause: { constraint: 'terms_never_overlap' } });
  });
});
