import 'server-only';
import { eq } from 'drizzle-orm';
import type { Queryable } from '@/db/client';
import { payments } from '@/db/schema/books';
import { charges, membershipClasses } from '@/db/schema/dues';
import { households } from '@/db/schema/people';
import type { Id } from '@/lib/core/ids';
import { firstOrNull } from '@/lib/core/only';
import { receiptNumber } from '@/lib/dues/views';
import type { ReceiptFacts } from '../rules/other-letters';

/** A dues payment as its receipt says it; null when there is no such payment of a household. */
export async function findReceiptForLetter(db: Queryable, paymentId: Id<'payment'>): Promise<ReceiptFacts | null> {
  const row = firstOrNull(await db.select({
    year: payments.receiptYear, number: payments.receiptNumber, amountMinor: payments.amountMinor, receivedOn: payments.receivedOn, method: payments.method,
    className: membershipClasses.name, termFrom: charges.termFrom, termTo: charges.termTo, household: households.name,
  }).from(payments)
    .innerJoin(households, eq(households.id, payments.householdId))
    .leftJoin(charges, eq(charges.id, payments.chargeId))
    .leftJoin(membershipClasses, eq(membershipClasses.key, charges.classKey))
    .where(eq(payments.id, paymentId)).limit(1));
  if (!row) return null;
  const { year, number, ...facts } = row;
  return { ...facts, number: receiptNumber(year, number) };
}
