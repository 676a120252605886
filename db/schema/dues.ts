import { sql } from 'drizzle-orm';
import { boolean, check, date, index, integer, pgTable, primaryKey, smallint, text, uniqueIndex } from 'drizzle-orm/pg-core';
import { dayRange, idOf, instant, ownId } from './columns';
import { accounts, households } from './people';

export const membershipClasses = pgTable('membership_classes', {
  key: text().primaryKey(), // "household"
  name: text().notNull(),
  about: text().notNull(),
  isForLife: boolean().notNull().default(false),
  position: smallint().notNull(),
});

/** What a class pays for a year, from a day on. */
export const classDues = pgTable('class_dues', {
  classKey: text().notNull().references(() => membershipClasses.key),
  fromOn: date({ mode: 'string' }).notNull(),
  amountMinor: integer().notNull(),
}, (t) => [primaryKey({ columns: [t.classKey, t.fromOn] }), check('class_dues_not_negative', sql`${t.amountMinor} >= 0`)]);

/** The dated span that dues pay for. No two of a household overlap (an exclusion constraint in the migrations). */
export const terms = pgTable('terms', {
  id: ownId(),
  householdId: idOf<'household'>().notNull().references(() => households.id),
  classKey: text().notNull().references(() => membershipClasses.key),
  during: dayRange().notNull(),
  madeAt: instant().notNull(),
}, (t) => [index('terms_by_household').on(t.householdId)]);

/** What a household owes, and for what. Paid when its payments, less what was given back, reach the amount. */
export const charges = pgTable('charges', {
  id: ownId<'charge'>(),
  householdId: idOf<'household'>().notNull().references(() => households.id),
  classKey: text().notNull().references(() => membershipClasses.key),
  termFrom: date({ mode: 'string' }).notNull(),
  termTo: date({ mode: 'string' }).notNull(), // the last day paid for
  amountMinor: integer().notNull(),
  currency: text().notNull(),
  dueOn: date({ mode: 'string' }).notNull(),
  madeAt: instant().notNull(),
  waivedAt: instant(),
  waivedBy: idOf<'account'>().references(() => accounts.id),
}, (t) => [
  uniqueIndex('charges_one_a_term').on(t.householdId, t.termFrom).where(sql`${t.waivedAt} is null`),
  check('charges_amount_positive', sql`${t.amountMinor} > 0`),
  check('charges_term_order', sql`${t.termFrom} <= ${t.termTo}`),
]);
