import { sql } from 'drizzle-orm';
import { check, date, foreignKey, index, integer, pgTable, primaryKey, smallint, text, unique, uniqueIndex } from 'drizzle-orm/pg-core';
import { PERSON_KINDS } from '../../lib/core/words'; // relative: the migration tool knows no aliases
import { idOf, instant, ownId } from './columns';
import { gardens } from './gardens';
import { accounts } from './people';


export const openDays = pgTable('open_days', {
  id: ownId<'openDay'>(),
  slug: text().notNull().unique(),
  title: text().notNull(),
  placeLine: text().notNull(), // "in and around Alder Fork"
  howToCome: text(),
  heldOn: date({ mode: 'string' }).notNull(),
  opensAt: instant().notNull(),
  closesAt: instant().notNull(),
  partyPeopleMax: integer(), // null: the club's
  publishedAt: instant(),
  calledOffAt: instant(),
  calledOffNote: text(),
}, (t) => [
  index('open_days_by_day').on(t.heldOn),
  check('open_days_hours', sql`${t.opensAt} < ${t.closesAt}`),
  check('open_days_slug_shape', sql`${t.slug} ~ '^[a-z0-9]+(-[a-z0-9]+)*$'`),
  check('open_days_party_range', sql`${t.partyPeopleMax} is null or ${t.partyPeopleMax} between 1 and 99`),
]);

/** One garden taking part in one open day. Its number is its card colour and its nip. */
export const stops = pgTable('stops', {
  id: ownId<'stop'>(),
  openDayId: idOf<'openDay'>().notNull().references(() => openDays.id),
  gardenId: idOf<'garden'>().notNull().references(() => gardens.id),
  number: smallint().notNull(),
  stayMinutes: integer().notNull(),
  headsLimit: integer().notNull(),
  closedAt: instant(),
}, (t) => [
  unique('stops_id_with_day').on(t.id, t.openDayId),
  uniqueIndex('stops_one_number').on(t.openDayId, t.number),
  uniqueIndex('stops_one_garden').on(t.openDayId, t.gardenId),
  index('stops_by_garden').on(t.gardenId),
  check('stops_number_range', sql`${t.number} between 1 and 14`),
  check('stops_stay_range', sql`${t.stayMinutes} between 5 and 240`),
  check('stops_heads_range', sql`${t.headsLimit} between 1 and 500`),
]);

/** A timed slot at a stop, half-open: people come in in [opens_at, grace_until). `taken` is moved only by the statement that decides. */
export const entryTimes = pgTable('entry_times', {
  id: ownId<'entryTime'>(),
  stopId: idOf<'stop'>().notNull(),
  openDayId: idOf<'openDay'>().notNull(),
  opensAt: instant().notNull(),
  graceUntil: instant().notNull(),
  capacity: integer().notNull(),
  walkUps: integer().notNull().default(0), // set aside for people without a ticket; counted in `taken`
  taken: integer().notNull().default(0),
  closedAt: instant(),
}, (t) => [
  unique('entry_times_id_with_day').on(t.id, t.openDayId),
  foreignKey({ name: 'entry_times_on_stops_day', columns: [t.stopId, t.openDayId], foreignColumns: [stops.id, stops.openDayId] }),
  uniqueIndex('entry_times_one_start').on(t.stopId, t.opensAt),
  index('entry_times_by_day').on(t.openDayId),
  check('entry_times_never_oversold', sql`0 <= ${t.taken} and ${t.taken} <= ${t.capacity}`),
  check('entry_times_walk_ups_counted', sql`0 <= ${t.walkUps} and ${t.walkUps} <= ${t.taken}`),
  check('entry_times_grace_after_start', sql`${t.opensAt} < ${t.graceUntil}`),
  check('entry_times_capacity_range', sql`${t.capacity} between 0 and 500`),
]);

/** What one person of a kind pays for one visit. A stop's own price overrides the open day's. */
export const prices = pgTable('prices', {
  id: ownId(),
  openDayId: idOf<'openDay'>().notNull().references(() => openDays.id),
  stopId: idOf<'stop'>().references(() => stops.id),
  kind: text({ enum: PERSON_KINDS }).notNull(),
  amountMinor: integer().notNull(),
}, (t) => [
  unique('prices_one_a_kind').on(t.openDayId, t.stopId, t.kind).nullsNotDistinct(),
  check('prices_not_negative', sql`${t.amountMinor} >= 0`),
]);

/** Minutes by road between the published areas of two gardens, to the next 5. What everyone may know. */
export const areaMinutes = pgTable('area_minutes', {
  fromGardenId: idOf<'garden'>().notNull().references(() => gardens.id),
  toGardenId: idOf<'garden'>().notNull().references(() => gardens.id),
  minutes: smallint().notNull(),
}, (t) => [
  primaryKey({ columns: [t.fromGardenId, t.toGardenId] }),
  check('area_minutes_by_fives', sql`${t.minutes} >= 0 and ${t.minutes} % 5 = 0`),
]);

/** Minutes by road between the gardens themselves. Officers and released tickets only. */
export const placeMinutes = pgTable('place_minutes', {
  fromGardenId: idOf<'garden'>().notNull().references(() => gardens.id),
  toGardenId: idOf<'garden'>().notNull().references(() => gardens.id),
  minutes: smallint().notNull(),
}, (t) => [primaryKey({ columns: [t.fromGardenId, t.toGardenId] }), check('place_minutes_not_negative', sql`${t.minutes} >= 0`)]);

/** Dated pencil notes in the margin of an open day's staff copy. */
export const planChanges = pgTable('plan_changes', {
  id: ownId(),
  openDayId: idOf<'openDay'>().notNull().references(() => openDays.id),
  stopId: idOf<'stop'>().references(() => stops.id),
  at: instant().notNull(),
  accountId: idOf<'account'>().references(() => accounts.id),
  initials: text().notNull(),
  note: text().notNull(),
}, (t) => [index('plan_changes_by_day').on(t.openDayId, t.at.desc())]);
