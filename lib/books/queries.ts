import 'server-only';
import { asc, desc, eq, ilike, or, sql, type SQL } from 'drizzle-orm';
import { accountsOfBooks, funds, journalEntries, payments, postings, refunds } from '@/db/schema/books';
import { bookingContacts, bookings } from '@/db/schema/bookings';
import { charges } from '@/db/schema/dues';
import { openDays } from '@/db/schema/opendays';
import { households } from '@/db/schema/people';
import type { Id } from '@/lib/core/ids';
import { likeOf, PAGE_ROWS, type Listing } from '@/lib/core/listing';
import { firstOrNull } from '@/lib/core/only';
import type { AccountCtx } from '@/lib/infra/context';
import { full } from '@/lib/infra/sql-column';
import type { ReceiptSort } from './schema';

/** The figure of postings that credit an income account: money that came in, less what was given back. */
const cameIn = sql<number>`(-sum(${postings.amountMinor}) filter (where ${accountsOfBooks.kind} = 'income'))::bigint::int`;
const fees = sql<number>`coalesce(sum(${postings.amountMinor}) filter (where ${accountsOfBooks.kind} = 'expense'), 0)::int`;

/** What each open day has brought in and cost in card fees, the latest first, at most 60. */
export async function incomeByOpenDay({ db }: AccountCtx) {
  return db.select({ id: openDays.id, title: openDays.title, slug: openDays.slug, heldOn: openDays.heldOn, cameInMinor: sql<number>`coalesce(${cameIn}, 0)`, feesMinor: fees })
    .from(openDays).leftJoin(postings, eq(postings.openDayId, openDays.id)).leftJoin(accountsOfBooks, eq(accountsOfBooks.code, postings.account))
    .groupBy(openDays.id).orderBy(desc(openDays.heldOn)).limit(60);
}

/** What each fund has taken in and spent. */
export async function incomeByFund({ db }: AccountCtx) {
  return db.select({ key: funds.key, name: funds.name, cameInMinor: sql<number>`coalesce(${cameIn}, 0)`, feesMinor: fees })
    .from(funds).leftJoin(postings, eq(postings.fund, funds.key)).leftJoin(accountsOfBooks, eq(accountsOfBooks.code, postings.account))
    .groupBy(funds.key).orderBy(asc(funds.position)).limit(40);
}

/** What each account of the books holds now. Debits are positive. */
export async function accountBalances({ db }: AccountCtx) {
  return db.select({ code: accountsOfBooks.code, name: accountsOfBooks.name, kind: accountsOfBooks.kind, balanceMinor: sql<number>`coalesce(sum(${postings.amountMinor}), 0)::int` })
    .from(accountsOfBooks).leftJoin(postings, eq(postings.account, accountsOfBooks.code)).groupBy(accountsOfBooks.code).orderBy(asc(accountsOfBooks.kind), asc(accountsOfBooks.name)).limit(100);
}

const SORTS: Record<ReceiptSort, SQL> = { received: sql`${payments.receivedOn}`, amount: sql`${payments.amountMinor}`, number: sql`${payments.receiptYear} * 1000000 + ${payments.receiptNumber}` };

/** One page of the money that came in (or all of it, for a file): receipt, payer, what for, how. */
export async function receiptLines({ db }: AccountCtx, asked: Listing<ReceiptSort>, extent: 'page' | 'all' = 'page') {
  const like = likeOf(asked.find);
  const payer = sql<string>`coalesce(${households.name}, ${bookingContacts.name}, '')`;
  const order = SORTS[asked.sort];
  const rows = await db.select({
    id: payments.id, year: payments.receiptYear, number: payments.receiptNumber, method: payments.method, amountMinor: payments.amountMinor, receivedOn: payments.receivedOn, reference: payments.reference,
    payer, isDues: sql<boolean>`${payments.chargeId} is not null`, total: sql<number>`count(*) over ()::int`,
    givenBackMinor: sql<number>`coalesce((select sum(r.amount_minor) from ${refunds} r where r.payment_id = ${payments.id}), 0)::int`,
  })
    .from(payments).leftJoin(households, eq(households.id, payments.householdId)).leftJoin(bookingContacts, eq(bookingContacts.bookingId, payments.bookingId))
    .where(like === null ? undefined : or(ilike(households.name, like), ilike(bookingContacts.name, like), ilike(payments.reference, like), sql`${payments.receiptYear} || '/' || lpad(${payments.receiptNumber}::text, 4, '0') ilike ${like}`))
    .orderBy(asked.order === 'asc' ? asc(order) : desc(order), desc(payments.receiptNumber))
    .limit(extent === 'page' ? PAGE_ROWS : 20_000).offset(extent === 'page' ? (asked.page - 1) * PAGE_ROWS : 0);
  return { rows, total: rows[0]?.total ?? 0 };
}

/* A refund is settled when the card service made it, or when an officer paid it out by hand: one of a cheque, cash or a transfer, or one that the service would not make. */
const byHand = sql<boolean>`exists (select from journal_entries j where j.kind = 'refund-paid' and j.source_id = refunds.id || ':by-hand')`;
const isByHandDue = sql<boolean>`not ${byHand} and (${full(refunds.failedAt)} is not null or exists (select from ${payments} p where p.id = ${full(refunds.paymentId)} and p.method <> 'card'))`;
const openRefund = sql`(${refunds.doneAt} is null or ${refunds.failedAt} is not null) and not ${byHand}`;
const refundFacts = { id: refunds.id, amountMinor: refunds.amountMinor, reason: refunds.reason, askedAt: refunds.askedAt, tries: refunds.tries, doneAt: refunds.doneAt, failedAt: refunds.failedAt, byHand, isByHandDue };

/** Refunds that are on their way or failed, oldest first, at most 100. */
export async function refundsOpen({ db }: AccountCtx) {
  return db.select(refundFacts).from(refunds).where(openRefund).orderBy(asc(refunds.askedAt)).limit(100);
}

/** One payment with who made it and what for; null when there is none. */
export async function findPayment({ db }: AccountCtx, paymentId: Id<'payment'>) {
  return firstOrNull(await db.select({
    id: payments.id, year: payments.receiptYear, number: payments.receiptNumber, method: payments.method, amountMinor: payments.amountMinor, currency: payments.currency, receivedOn: payments.receivedOn, reference: payments.reference,
    householdId: payments.householdId, household: households.name, code: bookings.code, party: bookingContacts.name, day: openDays.title, termFrom: charges.termFrom, termTo: charges.termTo,
  })
    .from(payments)
    .leftJoin(households, eq(households.id, payments.householdId)).leftJoin(charges, eq(charges.id, payments.chargeId))
    .leftJoin(bookings, eq(bookings.id, payments.bookingId)).leftJoin(bookingContacts, eq(bookingContacts.bookingId, payments.bookingId)).leftJoin(openDays, eq(openDays.id, bookings.openDayId))
    .where(eq(payments.id, paymentId)).limit(1));
}

/** What was given back of one payment, oldest first. */
export async function refundsOf({ db }: AccountCtx, paymentId: Id<'payment'>) {
  return db.select(refundFacts).from(refunds).where(eq(refunds.paymentId, paymentId)).orderBy(asc(refunds.askedAt)).limit(50);
}

/** The journal's newest entries, each with its sides, at most 30 entries. */
export async function journalLines({ db }: AccountCtx) {
  const side = sql<string[]>`array_agg(${accountsOfBooks.name} order by ${accountsOfBooks.name}) filter (where ${postings.amountMinor} > 0)`;
  const other = sql<string[]>`array_agg(${accountsOfBooks.name} order by ${accountsOfBooks.name}) filter (where ${postings.amountMinor} < 0)`;
  return db.select({
    id: journalEntries.id, kind: journalEntries.kind, happenedOn: journalEntries.happenedOn, to: side, from: other,
    amountMinor: sql<number>`(sum(${postings.amountMinor}) filter (where ${postings.amountMinor} > 0))::int`,
  })
    .from(journalEntries).innerJoin(postings, eq(postings.entryId, journalEntries.id)).innerJoin(accountsOfBooks, eq(accountsOfBooks.code, postings.account))
    .groupBy(journalEntries.id).orderBy(desc(journalEntries.madeAt), asc(journalEntries.id)).limit(30);
}
