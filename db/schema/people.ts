import { sql } from 'drizzle-orm';
import { boolean, check, date, index, integer, pgTable, text, uniqueIndex } from 'drizzle-orm/pg-core';
import { ROLES } from '../../lib/core/words'; // relative: the migration tool knows no aliases
import { idOf, instant, ownId } from './columns';
import { stops } from './opendays';


export const households = pgTable('households', {
  id: ownId<'household'>(),
  name: text().notNull(), // as the roll lists it: "Abara, Ife & Tobin"
  memberNumber: integer().notNull().unique(),
  joinedOn: date({ mode: 'string' }).notNull(),
  leftOn: date({ mode: 'string' }),
}, (t) => [check('households_left_after_joining', sql`${t.leftOn} is null or ${t.leftOn} >= ${t.joinedOn}`)]);

export const people = pgTable('people', {
  id: ownId<'person'>(),
  householdId: idOf<'household'>().notNull().references(() => households.id),
  accountId: idOf<'account'>().references(() => accounts.id),
  givenName: text().notNull(),
  familyName: text().notNull(),
  age: text({ enum: ['adult', 'junior'] }).notNull().default('adult'),
  isContact: boolean().notNull().default(false),
}, (t) => [
  index('people_by_household').on(t.householdId),
  index('people_by_account').on(t.accountId),
  uniqueIndex('people_one_contact').on(t.householdId).where(sql`${t.isContact}`),
]);

/** Where a person is reached. Apart, so that an ordinary query cannot fetch it by accident. */
export const contactDetails = pgTable('contact_details', {
  personId: idOf<'person'>().primaryKey().references(() => people.id),
  email: text(),
  phone: text(),
  street: text(),
  town: text(),
  postcode: text(),
});

/** Someone who can sign in. Several people of a household may share one. */
export const accounts = pgTable('accounts', {
  id: ownId<'account'>(),
  email: text().notNull(),
  madeAt: instant().notNull(),
}, (t) => [uniqueIndex('accounts_one_email').on(sql`lower(${t.email})`)]);

export const passwords = pgTable('passwords', {
  accountId: idOf<'account'>().primaryKey().references(() => accounts.id),
  hash: text().notNull(),
  setAt: instant().notNull(),
});

export const signIns = pgTable('sign_ins', {
  id: ownId<'signIn'>(),
  accountId: idOf<'account'>().notNull().references(() => accounts.id),
  personId: idOf<'person'>().references(() => people.id),
  method: text({ enum: ['code', 'link', 'password'] }).notNull(),
  signedInAt: instant().notNull(),
  endedAt: instant(),
}, (t) => [index('sign_ins_by_account').on(t.accountId, t.signedInAt.desc())]);

export const signInCodes = pgTable('sign_in_codes', {
  id: ownId(),
  email: text().notNull(),
  codeHash: text().notNull(),
  linkHash: text().notNull().unique(),
  madeAt: instant().notNull(),
  expiresAt: instant().notNull(),
  usedAt: instant(),
  tries: integer().notNull().default(0),
}, (t) => [index('sign_in_codes_by_email').on(sql`lower(${t.email})`, t.madeAt.desc())]);

export const rolesHeld = pgTable('roles_held', {
  id: ownId(),
  accountId: idOf<'account'>().notNull().references(() => accounts.id),
  role: text({ enum: ROLES }).notNull(),
  givenAt: instant().notNull(),
  givenBy: idOf<'account'>().references(() => accounts.id),
  takenAt: instant(),
  takenBy: idOf<'account'>().references(() => accounts.id),
}, (t) => [uniqueIndex('roles_held_once').on(t.accountId, t.role).where(sql`${t.takenAt} is null`)]);

/** A helper's way to one gate on one day. The secret itself is never stored. */
export const gatePasses = pgTable('gate_passes', {
  id: ownId<'gatePass'>(),
  stopId: idOf<'stop'>().notNull().references(() => stops.id),
  helper: text().notNull(),
  secretHash: text().notNull().unique(),
  devicesAllowed: integer().notNull().default(2),
  madeAt: instant().notNull(),
  madeBy: idOf<'account'>().references(() => accounts.id),
  revokedAt: instant(),
}, (t) => [index('gate_passes_by_stop').on(t.stopId), check('gate_passes_devices_range', sql`${t.devicesAllowed} between 1 and 20`)]);

export const gateDevices = pgTable('gate_devices', {
  id: ownId<'device'>(),
  passId: idOf<'gatePass'>().notNull().references(() => gatePasses.id),
  number: integer().notNull(), // "the other phone": phones of a pass are numbered
  keyHash: text().notNull().unique(),
  openedAt: instant().notNull(),
  seenAt: instant().notNull(),
}, (t) => [uniqueIndex('gate_devices_numbered').on(t.passId, t.number)]);

export const LINK_KINDS = ['booking', 'browser', 'calendar'] as const; // from a letter; from the browser that paid; a calendar's feed

/** A link that is itself the permission. Hashed, expiring, revocable. */
export const bearerLinks = pgTable('bearer_links', {
  id: ownId<'bearerLink'>(),
  kind: text({ enum: LINK_KINDS }).notNull(),
  subjectId: text().notNull(),
  secretHash: text().notNull().unique(),
  madeAt: instant().notNull(),
  expiresAt: instant().notNull(),
  revokedAt: instant(),
}, (t) => [index('bearer_links_by_subject').on(t.kind, t.subjectId)]);
