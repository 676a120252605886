import { sql } from 'drizzle-orm';
import { bigint, check, date, index, integer, pgTable, primaryKey, smallint, text, uniqueIndex } from 'drizzle-orm/pg-core';
import { METHODS } from '../../lib/core/words'; // relative: the migration tool knows no aliases
import { idOf, instant, ownId } from './columns';
import { bookings } from './bookings';
import { charges } from './dues';
import { openDays } from './opendays';
import { accounts, households } from './people';


export const accountsOfBooks = pgTable('accounts_of_books', {
  code: text().primaryKey(), // "cards-clearing"
  name: text().notNull(),
  kind: text({ enum: ['asset', 'liability', 'income', 'expense', 'equity'] }).notNull(),
});

export const funds = pgTable('funds', { key: text().primaryKey(), name: text().notNull(), position: smallint().notNull() });

/** One business event in the books. Append-only; a mistake is answered by an entry that reverses it. */
export const journalEntries = pgTable('journal_entries', {
  id: ownId<'journalEntry'>(),
  kind: text().notNull(),
  sourceId: text().notNull(),
  happenedOn: date({ mode: 'string' }).notNull(),
  madeAt: instant().notNull(),
  madeBy: idOf<'account'>().references(() => accounts.id),
  reversesId: idOf<'journalEntry'>(),
  madeIn: text().notNull().default(sql`pg_current_xact_id()::text`), // postings join only in the transaction that made their entry
}, (t) => [uniqueIndex('journal_entries_once').on(t.kind, t.sourceId), index('journal_entries_by_day').on(t.happenedOn)]);

/** One side of an entry; the postings of an entry sum to zero per currency, checked at commit. Debits are positive. */
export const postings = pgTable('postings', {
  id: ownId(),
  entryId: idOf<'journalEntry'>().notNull().references(() => journalEntries.id),
  account: text().notNull().references(() => accountsOfBooks.code),
  fund: text().notNull().references(() => funds.key),
  openDayId: idOf<'openDay'>().references(() => openDays.id),
  householdId: idOf<'household'>().references(() => households.id),
  amountMinor: bigint({ mode: 'number' }).notNull(),
  currency: text().notNull(),
}, (t) => [
  index('postings_by_entry').on(t.entryId),
  index('postings_by_account').on(t.account),
  index('postings_by_day').on(t.openDayId),
  check('postings_not_nought', sql`${t.amountMinor} <> 0`),
]);

/** A try to pay by card: committed before the processor is called. One open each. */
export const paymentAttempts = pgTable('payment_attempts', {
  id: ownId<'attempt'>(),
  bookingId: idOf<'booking'>().references(() => bookings.id),
  chargeId: idOf<'charge'>().references(() => charges.id),
  idempotencyKey: text().notNull().unique(),
  amountMinor: integer().notNull(),
  currency: text().notNull(),
  openedAt: instant().notNull(),
  sessionId: text().unique(),
  sessionUrl: text(),
  sessionExpiresAt: instant(),
  paymentIntentId: text().unique(),
  endedAt: instant(),
  outcome: text({ enum: ['paid', 'expired', 'failed'] }),
}, (t) => [
  check('payment_attempts_for_one_thing', sql`num_nonnulls(${t.bookingId}, ${t.chargeId}) = 1`),
  check('payment_attempts_amount_positive', sql`${t.amountMinor} > 0`),
  check('payment_attempts_ended_with_outcome', sql`(${t.endedAt} is null) = (${t.outcome} is null)`),
  uniqueIndex('payment_attempts_one_open_booking').on(t.bookingId).where(sql`${t.endedAt} is null`),
  uniqueIndex('payment_attempts_one_open_charge').on(t.chargeId).where(sql`${t.endedAt} is null`),
  index('payment_attempts_by_booking').on(t.bookingId),
  index('payment_attempts_by_charge').on(t.chargeId),
]);

/** What the processor told us happened, once each however often it says so. */
export const cardPayments = pgTable('card_payments', {
  id: ownId(),
  objectId: text().notNull(), // payment intent, refund or dispute
  outcome: text().notNull(), // paid, refunded, refund-failed, fee …
  attemptId: idOf<'attempt'>().references(() => paymentAttempts.id),
  amountMinor: integer().notNull(),
  currency: text().notNull(),
  appliedAt: instant().notNull(),
}, (t) => [uniqueIndex('card_payments_once').on(t.objectId, t.outcome)]);

/** The processor's events as they arrived. Append-only; an event's own id only saves work. */
export const cardEvents = pgTable('card_events', {
  id: text().primaryKey(),
  kind: text().notNull(),
  objectId: text(),
  receivedAt: instant().notNull(),
});

/** Money received, whatever the way. Append-only. The receipt number is gapless per year. */
export const payments = pgTable('payments', {
  id: ownId<'payment'>(),
  bookingId: idOf<'booking'>().references(() => bookings.id),
  chargeId: idOf<'charge'>().references(() => charges.id),
  householdId: idOf<'household'>().references(() => households.id),
  method: text({ enum: METHODS }).notNull(),
  amountMinor: integer().notNull(),
  currency: text().notNull(),
  receivedOn: date({ mode: 'string' }).notNull(),
  reference: text(), // a cheque's number, a bank's words
  attemptId: idOf<'attempt'>().references(() => paymentAttempts.id),
  receiptYear: smallint().notNull(),
  receiptNumber: integer().notNull(),
  recordedAt: instant().notNull(),
  recordedBy: idOf<'account'>().references(() => accounts.id),
}, (t) => [
  uniqueIndex('payments_receipt_once').on(t.receiptYear, t.receiptNumber),
  uniqueIndex('payments_once_an_attempt').on(t.attemptId),
  index('payments_by_booking').on(t.bookingId),
  index('payments_by_charge').on(t.chargeId),
  index('payments_by_day').on(t.receivedOn),
  check('payments_for_one_thing', sql`num_nonnulls(${t.bookingId}, ${t.chargeId}) = 1`),
  check('payments_amount_positive', sql`${t.amountMinor} > 0`),
]);

/** The last receipt number of each year; its row is locked last, so the numbers have no gap. */
export const receiptCounters = pgTable('receipt_counters', { year: smallint().primaryKey(), last: integer().notNull() });

/** Money to give back. A row with a due time until `done_at`; the processor is asked with its own key. */
export const refunds = pgTable('refunds', {
  id: ownId(),
  paymentId: idOf<'payment'>().references(() => payments.id),
  attemptId: idOf<'attempt'>().references(() => paymentAttempts.id), // money that came without places has no payment
  amountMinor: integer().notNull(),
  currency: text().notNull(),
  reason: text().notNull(),
  askedAt: instant().notNull(),
  askedBy: idOf<'account'>().references(() => accounts.id),
  dueAt: instant().notNull(),
  tries: integer().notNull().default(0),
  processorId: text().unique(),
  doneAt: instant(),
  failedAt: instant(),
}, (t) => [
  index('refunds_due').on(t.dueAt).where(sql`${t.doneAt} is null and ${t.failedAt} is null`),
  index('refunds_by_payment').on(t.paymentId),
  check('refunds_of_something', sql`num_nonnulls(${t.paymentId}, ${t.attemptId}) >= 1`),
  check('refunds_amount_positive', sql`${t.amountMinor} > 0`),
]);

/** Which entry a household's money lies in, for statements. */
export const closedPeriods = pgTable('closed_periods', {
  month: date({ mode: 'string' }).notNull(),
  closedAt: instant().notNull(),
  closedBy: idOf<'account'>().references(() => accounts.id),
}, (t) => [primaryKey({ columns: [t.month] })]);
