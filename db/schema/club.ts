import { sql } from 'drizzle-orm';
import { boolean, check, index, integer, jsonb, pgTable, smallint, text } from 'drizzle-orm/pg-core';
import { idOf, instant, ownId } from './columns';
import { accounts } from './people';

/** One step of a refund rule: given back at least this many hours before the entry time, this percent is returned. */
export type RefundStep = { hoursBefore: number; percent: number };

/** The club itself: one row. */
export const club = pgTable('club', {
  id: smallint().primaryKey().default(1),
  name: text().notNull(),
  footLine: text().notNull(),
  email: text().notNull(),
  timeZone: text().notNull(),
  currency: text().notNull(),
  locale: text().notNull(),
  hourCycle: text({ enum: ['h12', 'h23'] }).notNull(),
  holdMinutes: integer().notNull().default(10),
  holdsMayBeExtended: boolean().notNull().default(true),
  partyPeopleMax: integer().notNull().default(9),
  partyVisitsMax: integer().notNull().default(7),
  babesTakePlace: boolean().notNull().default(false),
  addressReleaseHours: integer().notNull().default(72),
  changesEndMinutes: integer().notNull().default(60),
  refundRules: jsonb().$type<RefundStep[]>().notNull(),
  duesKeptOnDays: integer().notNull().default(45),
  visitRules: text().notNull(),
  coniferInk: text(),
}, (t) => [
  check('club_is_one_row', sql`${t.id} = 1`),
  check('club_currency_is_iso', sql`${t.currency} ~ '^[A-Z]{3}$'`),
  check('club_hold_minutes_range', sql`${t.holdMinutes} between 1 and 60`),
  check('club_party_people_range', sql`${t.partyPeopleMax} between 1 and 99`),
  check('club_party_visits_range', sql`${t.partyVisitsMax} between 1 and 14`),
  check('club_release_range', sql`${t.addressReleaseHours} between 0 and 720`),
  check('club_changes_end_range', sql`${t.changesEndMinutes} between 0 and 10080`),
]);

/** Who changed what, when. Append-only; what was written lies in `audit_texts`, which erasure may empty. */
export const auditTrail = pgTable('audit_trail', {
  id: ownId<'auditLine'>(),
  at: instant().notNull(),
  actorKind: text().notNull(),
  accountId: idOf<'account'>().references(() => accounts.id),
  action: text().notNull(),
  subjectKind: text().notNull(),
  subjectId: text(),
}, (t) => [index('audit_trail_by_time').on(t.at.desc()), index('audit_trail_by_subject').on(t.subjectKind, t.subjectId)]);

/** What an audit line says was so before and after. */
export const auditTexts = pgTable('audit_texts', {
  lineId: idOf<'auditLine'>().primaryKey().references(() => auditTrail.id),
  before: jsonb().$type<Record<string, unknown>>(),
  after: jsonb().$type<Record<string, unknown>>(),
});

/** One counter a key and window; a single upsert both counts and judges. */
export const rateLimits = pgTable('rate_limits', {
  key: text().primaryKey(),
  windowStartedAt: instant().notNull(),
  tries: integer().notNull(),
});
