import { sql } from 'drizzle-orm';
import { type AnyPgColumn, check, index, integer, pgTable, smallint, text, uniqueIndex } from 'drizzle-orm/pg-core';
import { FACT_KINDS } from '../../lib/core/words'; // relative: the migration tool knows no aliases
import { idOf, instant } from './columns';
import { visits } from './bookings';
import { openDays, stops } from './opendays';
import { gateDevices, gatePasses } from './people';


/** What a phone did at a gate. Append-only, with ids made on the phone; what it means is a fold of these. */
export const gateFacts = pgTable('gate_facts', {
  id: idOf<'gateFact'>().primaryKey(),
  openDayId: idOf<'openDay'>().notNull().references(() => openDays.id),
  stopId: idOf<'stop'>().notNull().references(() => stops.id),
  visitId: idOf<'visit'>().references(() => visits.id),
  kind: text({ enum: FACT_KINDS }).notNull(),
  adults: smallint().notNull().default(0),
  children: smallint().notNull().default(0),
  babes: smallint().notNull().default(0),
  undoesId: idOf<'gateFact'>().references((): AnyPgColumn => gateFacts.id),
  atPhone: instant().notNull(),
  clockOffsetMs: integer().notNull().default(0),
  receivedAt: instant().notNull(),
  listVersion: text(),
  passId: idOf<'gatePass'>().references(() => gatePasses.id),
  deviceId: idOf<'device'>().references(() => gateDevices.id),
  verdict: text(), // what the phone was shown
  reason: text(), // what the helper said when overruling
}, (t) => [
  index('gate_facts_by_stop').on(t.stopId, t.receivedAt),
  index('gate_facts_by_visit').on(t.visitId),
  uniqueIndex('gate_facts_undone_once').on(t.undoesId).where(sql`${t.kind} = 'undo'`),
  check('gate_facts_counts', sql`${t.adults} >= 0 and ${t.children} >= 0 and ${t.babes} >= 0`),
  check('gate_facts_undo_names_one', sql`(${t.kind} = 'undo') = (${t.undoesId} is not null)`),
  check('gate_facts_admit_names_visit', sql`${t.kind} <> 'admit' or ${t.visitId} is not null`),
]);
