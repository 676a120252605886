import { sql } from 'drizzle-orm';
import { boolean, check, foreignKey, index, integer, pgTable, smallint, text, unique, uniqueIndex } from 'drizzle-orm/pg-core';
import { bytes, idOf, instant, ownId } from './columns';
import { entryTimes, openDays } from './opendays';
import { accounts, households } from './people';

/** One party's places. A hold is a booking that is not confirmed yet. */
export const bookings = pgTable('bookings', {
  id: ownId<'booking'>(),
  openDayId: idOf<'openDay'>().notNull().references(() => openDays.id),
  householdId: idOf<'household'>().references(() => households.id),
  code: text().notNull().unique(), // the spoken code, without its space
  holderHash: text(), // the browser that holds: one live hold each and open day
  madeAt: instant().notNull(),
  heldUntil: instant().notNull(),
  paymentMovedAt: instant(), // pressing Pay moved held_until to the session's end, once
  confirmedAt: instant(),
  releasedAt: instant(), // a hold given back
  cancelledAt: instant(), // a confirmed booking given back whole
  insistsAt: instant(), // the party chose a clash all the same
  totalMinor: integer().notNull(), // what all its visits cost when they were kept
  currency: text().notNull(),
  rulesAgreedAt: instant(),
  wantsInvitations: boolean().notNull().default(true),
  ticketNumber: integer().generatedAlwaysAsIdentity(), // the printed number on the pasteboard
}, (t) => [
  unique('bookings_id_with_day').on(t.id, t.openDayId),
  uniqueIndex('bookings_one_hold_a_browser').on(t.holderHash, t.openDayId).where(sql`${t.confirmedAt} is null and ${t.releasedAt} is null`),
  index('bookings_by_day').on(t.openDayId, t.confirmedAt),
  index('bookings_by_household').on(t.householdId),
  index('bookings_holds_by_end').on(t.heldUntil).where(sql`${t.confirmedAt} is null and ${t.releasedAt} is null`),
  check('bookings_confirmed_or_released', sql`${t.confirmedAt} is null or ${t.releasedAt} is null`),
  check('bookings_cancelled_after_confirmed', sql`${t.cancelledAt} is null or ${t.confirmedAt} is not null`),
  check('bookings_total_not_negative', sql`${t.totalMinor} >= 0`),
  check('bookings_code_shape', sql`${t.code} ~ '^[0-9A-HJKMNP-TV-Z]{8}$'`),
]);

/** Who a booking is for and how they are reached. Apart, so that gate lists and boards cannot fetch it by accident. */
export const bookingContacts = pgTable('booking_contacts', {
  bookingId: idOf<'booking'>().primaryKey().references(() => bookings.id),
  name: text().notNull(),
  email: text(),
  phone: text(),
  emailConfirmedAt: instant(),
  madeBy: idOf<'account'>().references(() => accounts.id), // an officer made it
}, (t) => [index('booking_contacts_by_email').on(sql`lower(${t.email})`)]);

/** One party at one entry time. `heads` is what counts against capacity. */
export const visits = pgTable('visits', {
  id: ownId<'visit'>(),
  bookingId: idOf<'booking'>().notNull(),
  openDayId: idOf<'openDay'>().notNull(),
  entryTimeId: idOf<'entryTime'>().notNull(),
  adults: smallint().notNull(),
  children: smallint().notNull(),
  babes: smallint().notNull().default(0),
  heads: smallint().notNull(),
  adultMinor: integer().notNull(), // what one of each kind cost when it was kept
  childMinor: integer().notNull(),
  babeMinor: integer().notNull(),
  version: integer().notNull().default(1), // rises with each change; the calendar's SEQUENCE
  movedAt: instant(),
  givenBackAt: instant(),
}, (t) => [
  // With its day in the key, a visit cannot be on another day than its booking and its entry time.
  foreignKey({ name: 'visits_on_bookings_day', columns: [t.bookingId, t.openDayId], foreignColumns: [bookings.id, bookings.openDayId] }),
  foreignKey({ name: 'visits_on_times_day', columns: [t.entryTimeId, t.openDayId], foreignColumns: [entryTimes.id, entryTimes.openDayId] }),
  index('visits_by_booking').on(t.bookingId),
  index('visits_by_entry_time').on(t.entryTimeId).where(sql`${t.givenBackAt} is null`),
  index('visits_by_day').on(t.openDayId),
  uniqueIndex('visits_once_a_time').on(t.bookingId, t.entryTimeId).where(sql`${t.givenBackAt} is null`),
  check('visits_counts', sql`${t.adults} >= 0 and ${t.children} >= 0 and ${t.babes} >= 0 and ${t.heads} >= 0`),
  check('visits_heads_of_people', sql`${t.heads} in (${t.adults} + ${t.children}, ${t.adults} + ${t.children} + ${t.babes})`),
  check('visits_somebody', sql`${t.givenBackAt} is not null or ${t.adults} + ${t.children} + ${t.babes} > 0`),
]);

/** The club's ticket-signing keys: the public halves with their days, the private ones sealed under the environment's key. */
export const ticketKeys = pgTable('ticket_keys', {
  id: smallint().primaryKey(), // the key id in every QR
  publicKey: bytes().notNull(),
  sealedPrivateKey: bytes().notNull(),
  madeAt: instant().notNull(),
  retiredAt: instant(),
});
