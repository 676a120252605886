import { sql } from 'drizzle-orm';
import { check, index, integer, jsonb, pgTable, text } from 'drizzle-orm/pg-core';
import { idOf, instant, ownId } from './columns';
import { bookings } from './bookings';
import { openDays } from './opendays';
import { households } from './people';

/** A letter the club owes someone, written in the transaction of its cause. Append-only; its words lie in `letter_texts`. */
export const letters = pgTable('letters', {
  id: ownId<'letter'>(),
  key: text().notNull().unique(), // what happened; the same cause never makes two letters
  kind: text().notNull(), // confirmation, change, given-back, refund, reminder, sign-in, dues-receipt, notice …
  openDayId: idOf<'openDay'>().references(() => openDays.id),
  bookingId: idOf<'booking'>().references(() => bookings.id),
  householdId: idOf<'household'>().references(() => households.id),
  madeAt: instant().notNull(),
  hash: text().notNull(),
}, (t) => [index('letters_by_time').on(t.madeAt.desc()), index('letters_by_booking').on(t.bookingId), index('letters_by_day').on(t.openDayId)]);

/** What a letter says, or the facts it is built from when it is sent. Retention and erasure may empty it. */
export const letterTexts = pgTable('letter_texts', {
  letterId: idOf<'letter'>().primaryKey().references(() => letters.id),
  toName: text(),
  toAddress: text(),
  facts: jsonb().$type<Record<string, unknown>>(),
  subject: text(),
  html: text(),
  text: text(),
});

/** The one changeable row of a letter: when it is due and how often it was tried. Deleted when it was sent. */
export const lettersDue = pgTable('letters_due', {
  letterId: idOf<'letter'>().primaryKey().references(() => letters.id),
  dueAt: instant().notNull(),
  tries: integer().notNull().default(0),
}, (t) => [index('letters_due_by_time').on(t.dueAt)]);

/** Each try to send a letter and how it ended. Append-only. */
export const sendings = pgTable('sendings', {
  id: ownId(),
  letterId: idOf<'letter'>().notNull().references(() => letters.id),
  triedAt: instant().notNull(),
  outcome: text({ enum: ['sent', 'failed', 'dropped'] }).notNull(),
  detail: text(), // the server's words, without addresses
}, (t) => [index('sendings_by_letter').on(t.letterId, t.triedAt.desc()), check('sendings_detail_short', sql`length(${t.detail}) <= 500`)]);
