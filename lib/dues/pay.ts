import 'server-only';
import { and, eq, isNull } from 'drizzle-orm';
import type { z } from 'zod';
import { charges, membershipClasses } from '@/db/schema/dues';
import { askForSession, keepSession, openAttempt } from '@/lib/books/commands/attempts';
import { firstOrNull } from '@/lib/core/only';
import { Refusal } from '@/lib/core/refusal';
import { formatDay } from '@/lib/core/time';
import type { MemberCtx } from '@/lib/infra/context';
import { inTransaction } from '@/lib/infra/transaction';
import { paidMinor } from './commands';
import type { payDuesInput } from './schema';

/**
 * Opens a card payment for what is still owed of one of the acting household's charges; answers the address of the
 * processor's page. A second press gets the same session. Locks the charge, so that a cheque recorded meanwhile counts.
 */
export async function startDuesPayment(ctx: MemberCtx, { chargeId }: z.output<typeof payDuesInput>): Promise<string> {
  const { db, actor, now, club } = ctx;
  const { attempt, checkout } = await inTransaction(db, async (tx) => {
    const charge = firstOrNull(await tx.select({ amountMinor: charges.amountMinor, currency: charges.currency, termTo: charges.termTo, className: membershipClasses.name })
      .from(charges).innerJoin(membershipClasses, eq(membershipClasses.key, charges.classKey))
      .where(and(eq(charges.id, chargeId), eq(charges.householdId, actor.householdId), isNull(charges.waivedAt))).for('no key update', { of: charges }));
    if (!charge) throw new Refusal('not_found');
    const outstanding = charge.amountMinor - (await paidMinor(tx, chargeId));
    if (outstanding <= 0) throw new Refusal('already_paid');
    const opened = await openAttempt(tx, now, { chargeId }, { amountMinor: outstanding, currency: charge.currency });
    if (opened.amountMinor !== outstanding) throw new Refusal('changed_meanwhile', { sentence: 'Some of it was paid another way since you began to pay by card. Wait half an hour until that payment ends, then pay the rest.' });
    const name = `${charge.className} dues to ${formatDay(charge.termTo, club, 'short')}`;
    return { attempt: opened, checkout: { lines: [{ name, amountMinor: outstanding }], email: actor.email, donePath: '/member/dues?paid=look', backPath: '/member/dues' } };
  });
  if (attempt.sessionUrl !== null) return attempt.sessionUrl;
  const session = await askForSession(attempt, checkout);
  await inTransaction(db, (tx) => keepSession(tx, attempt.id, session));
  if (session.url === null) throw new Refusal('changed_meanwhile');
  return session.url;
}
