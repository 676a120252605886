import { eq } from 'drizzle-orm';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { getDb } from '@/db/client';
import { paymentAttempts, payments, refunds } from '@/db/schema/books';
import { charges, terms } from '@/db/schema/dues';
import { applyPayment } from '@/lib/bookings/commands/apply-payment';
import { recordPayment } from '@/lib/dues/commands';
import { startDuesPayment } from '@/lib/dues/pay';
import { only } from '@/lib/core/only';
import type { AccountActor } from '@/lib/infra/context';
import { ada, aClub, ben, ctxOf, dov, NOON } from '@/tests/support/cast';
import type { CardsStandIn } from '../../support/cards-stand-in';
import { cardsAt, machine, paidSnapshot } from '../bookings/pay-cast';
import { refusalOf } from '../bookings/hold-cast';

let cards: CardsStandIn;
beforeAll(async () => {
  cards = await cardsAt();
  await aClub();
});
afterAll(() => cards.stop());

/** A member who owes $62. */
async function owing(account: AccountActor) {
  const { householdId } = account;
  if (householdId === null) throw new Error('a member has a household');
  const { id } = only(await getDb().insert(charges).values({ householdId, classKey: 'household', termFrom: '2027-01-01', termTo: '2027-12-31', amountMinor: 6200, currency: 'USD', dueOn: '2027-01-01', madeAt: NOON }).returning({ id: charges.id }));
  return { chargeId: id, member: await ctxOf({ ...account, householdId }) };
}
const sessions = async () => (await cards.stripe.checkout.sessions.list()).data;

describe('dues paid by card', () => {
  it('are asked for once, however often the button is pressed; a stranger’s are not there', async () => {
    const { chargeId, member } = await owing(await ada());
    const { member: stranger } = await owing(await ben());

    const first = await startDuesPayment(member, { chargeId });

    expect(await startDuesPayment(member, { chargeId })).toBe(first);
    expect(await refusalOf(startDuesPayment(stranger, { chargeId }))).toBe('not_found');
    expect((await sessions()).map((session) => session.amount_total)).toEqual([6200]);
  });

  it('are not asked for again in full while a cheque for some of them came in between', async () => {
    const { chargeId, member } = await owing(await ada());
    await startDuesPayment(member, { chargeId });
    await recordPayment(await ctxOf(await dov()), { chargeId, method: 'cheque', amount: '30.00', receivedOn: '2027-04-30', reference: null });

    expect(await refusalOf(startDuesPayment(member, { chargeId }))).toBe('changed_meanwhile');
  });

  it('are never asked for in another amount than the attempt says, though the first answer was lost', async () => {
    const { chargeId, member } = await owing(await ada());
    await getDb().insert(paymentAttempts).values({ chargeId, idempotencyKey: 'lost', amountMinor: 6200, currency: 'USD', openedAt: NOON });
    await recordPayment(await ctxOf(await dov()), { chargeId, method: 'cheque', amount: '30.00', receivedOn: '2027-04-30', reference: null });
    const before = (await sessions()).length;

    expect(await refusalOf(startDuesPayment(member, { chargeId }))).toBe('changed_meanwhile');

    expect(await sessions()).toHaveLength(before);
    expect(await getDb().select({ amount: paymentAttempts.amountMinor }).from(paymentAttempts).where(eq(paymentAttempts.chargeId, chargeId))).toEqual([{ amount: 6200 }]);
  });
});

describe('dues for days that a term covers already', () => {
  const covered = async (householdId: AccountActor['householdId']) => {
    if (householdId === null) throw new Error('a member has a household');
    await getDb().insert(terms).values({ householdId, classKey: 'household', during: '[2026-07-01,2027-07-01)', madeAt: NOON });
  };

  it('are refused in words when they come as a cheque', async () => {
    const account = await ada();
    const { chargeId } = await owing(account);
    await covered(account.householdId);

    expect(await refusalOf(recordPayment(await ctxOf(await dov()), { chargeId, method: 'cheque', amount: '62.00', receivedOn: '2027-04-30', reference: null }))).toBe('already_paid');

    expect(await getDb().select({ id: payments.id }).from(payments).where(eq(payments.chargeId, chargeId))).toEqual([]);
  });

  it('go back in full when they come by card', async () => {
    const account = await ada();
    const { chargeId, member } = await owing(account);
    await startDuesPayment(member, { chargeId });
    await covered(account.householdId);
    const { id, sessionId } = only(await getDb().select({ id: paymentAttempts.id, sessionId: paymentAttempts.sessionId }).from(paymentAttempts).where(eq(paymentAttempts.chargeId, chargeId)));

    expect(await applyPayment(await ctxOf(machine), await paidSnapshot(cards, sessionId ?? ''))).toBe('refunded');

    expect(await getDb().select({ amount: refunds.amountMinor }).from(refunds).where(eq(refunds.attemptId, id))).toEqual([{ amount: 6200 }]);
  });
});
