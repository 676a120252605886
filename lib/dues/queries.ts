import 'server-only';
import { and, asc, desc, eq, isNotNull, isNull, sql } from 'drizzle-orm';
import type { Queryable } from '@/db/client';
import { paymentAttempts, payments } from '@/db/schema/books';
import { charges, membershipClasses } from '@/db/schema/dues';
import { gardens } from '@/db/schema/gardens';
import { openDays, stops } from '@/db/schema/opendays';
import { households } from '@/db/schema/people';
import type { Id } from '@/lib/core/ids';
import { firstOrNull } from '@/lib/core/only';
import { Refusal } from '@/lib/core/refusal';
import { dayOf } from '@/lib/core/time';
import type { Ctx, MemberCtx } from '@/lib/infra/context';
import { lineOf, type LineFacts, type Station } from './rules/line';
import { standingOf } from './rules/standing';
import { classKey, owedMinor, termEnd } from './standing-sql';
import { receiptNumber, type ChargeView, type DuesView, type ReceiptView } from './views';

/** The acting household's dues: standing, charges newest first, receipts of dues alone (tickets have their booking's page). */
export async function memberDues(ctx: MemberCtx): Promise<DuesView> {
  const dues = await householdDues(ctx, ctx.actor.householdId);
  return { ...dues, receipts: dues.receipts.filter((receipt) => receipt.termTo !== null) };
}

/** The acting household's line: its dated facts and how it stands. */
export async function memberLine(ctx: MemberCtx, { joinedOn, standing }: DuesView): Promise<Station[]> {
  return lineOf({ joinedOn, standing, ...(await lineFacts(ctx, ctx.actor.householdId)) }, dayOf(ctx.now, ctx.club.timeZone), ctx.club);
}

/** One household's dues, for an officer or for itself. Three queries. */
export async function householdDues({ db, now, club }: Ctx, householdId: Id<'household'>): Promise<DuesView> {
  const facts = firstOrNull(await db.select({
    joinedOn: households.joinedOn, leftOn: households.leftOn, termEnd, owedMinor, isForLife: sql<boolean>`coalesce(${membershipClasses.isForLife}, false)`,
  }).from(households).leftJoin(membershipClasses, sql`${membershipClasses.key} = ${classKey}`).where(eq(households.id, householdId)));
  if (!facts) throw new Refusal('not_found');
  const standing = standingOf(facts, dayOf(now, club.timeZone), club.duesKeptOnDays);
  return { joinedOn: facts.joinedOn, standing, charges: await chargesOf(db, householdId), receipts: await receiptsOf(db, householdId) };
}

/** What a household's line on the roll is drawn from; its standing is the caller's. Two queries. */
export async function lineFacts({ db }: Pick<Ctx, 'db'>, householdId: Id<'household'>): Promise<Omit<LineFacts, 'joinedOn' | 'standing'>> {
  const paid = await db.select({ on: payments.receivedOn, amountMinor: payments.amountMinor, method: payments.method, reference: payments.reference })
    .from(payments).where(and(eq(payments.householdId, householdId), isNotNull(payments.chargeId))).orderBy(desc(payments.receivedOn)).limit(10);
  const hosted = firstOrNull(await db.select({ on: openDays.heldOn, railway: gardens.railwayName })
    .from(gardens).innerJoin(stops, eq(stops.gardenId, gardens.id)).innerJoin(openDays, eq(openDays.id, stops.openDayId))
    .where(and(eq(gardens.householdId, householdId), isNotNull(openDays.publishedAt))).orderBy(asc(openDays.heldOn)).limit(1));
  return { payments: paid, firstHosted: hosted };
}

async function chargesOf(db: Queryable, householdId: Id<'household'>): Promise<ChargeView[]> {
  return db.select({
    id: charges.id, className: membershipClasses.name, termFrom: charges.termFrom, termTo: charges.termTo, amountMinor: charges.amountMinor, dueOn: charges.dueOn,
    paidMinor: sql<number>`coalesce((select sum(p.amount_minor) from ${payments} p where p.charge_id = ${charges.id}), 0)::int`,
    isPaying: sql<boolean>`exists (select from ${paymentAttempts} a where a.charge_id = ${charges.id} and a.ended_at is null)`,
  })
    .from(charges).innerJoin(membershipClasses, eq(membershipClasses.key, charges.classKey))
    .where(and(eq(charges.householdId, householdId), isNull(charges.waivedAt))).orderBy(desc(charges.termFrom)).limit(30);
}

async function receiptsOf(db: Queryable, householdId: Id<'household'>): Promise<ReceiptView[]> {
  const rows = await db.select({
    id: payments.id, year: payments.receiptYear, number: payments.receiptNumber, method: payments.method, amountMinor: payments.amountMinor, receivedOn: payments.receivedOn, termTo: charges.termTo,
  })
    .from(payments).leftJoin(charges, eq(charges.id, payments.chargeId))
    .where(eq(payments.householdId, householdId)).orderBy(desc(payments.receivedOn), desc(payments.receiptNumber)).limit(50);
  return rows.map(({ year, number, ...row }) => ({ ...row, number: receiptNumber(year, number) }));
}

/** One receipt of a household, with what it was for; null when it is not theirs. */
export async function findReceipt({ db, actor }: MemberCtx, paymentId: Id<'payment'>) {
  const rows = await db.select({
    id: payments.id, year: payments.receiptYear, number: payments.receiptNumber, method: payments.method, amountMinor: payments.amountMinor, currency: payments.currency,
    receivedOn: payments.receivedOn, reference: payments.reference, className: membershipClasses.name, termFrom: charges.termFrom, termTo: charges.termTo, household: households.name, memberNumber: households.memberNumber,
  })
    .from(payments)
    .innerJoin(charges, eq(charges.id, payments.chargeId))
    .innerJoin(membershipClasses, eq(membershipClasses.key, charges.classKey))
    .innerJoin(households, eq(households.id, charges.householdId))
    .where(and(eq(payments.id, paymentId), eq(charges.householdId, actor.householdId))).limit(1);
  const row = firstOrNull(rows);
  return row === null ? null : { ...row, number: receiptNumber(row.year, row.number) };
}
