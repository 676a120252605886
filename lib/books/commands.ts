import 'server-only';
import { sql } from 'drizzle-orm';
import type { Tx } from '@/db/client';
import { journalEntries, postings, receiptCounters } from '@/db/schema/books';
import type { Id } from '@/lib/core/ids';
import { firstOrNull, only } from '@/lib/core/only';
import { dayOf, type Day } from '@/lib/core/time';
import type { Ctx } from '@/lib/infra/context';
import { postingsFor, type BusinessEvent } from './rules';

/** Where an entry comes from and what it belongs to. `sourceId` with the event's kind is unique: the same thing is never booked twice. */
export type EntrySource = {
  sourceId: string;
  happenedOn?: Day; // today in the club's zone unless said
  openDayId?: Id<'openDay'> | null;
  householdId?: Id<'household'> | null;
  currency?: string;
};

/** Books one business event as a balanced entry; null when it was booked before. Runs in the caller's transaction. */
export async function postEntry(tx: Tx, ctx: Ctx, event: BusinessEvent, source: EntrySource): Promise<Id<'journalEntry'> | null> {
  const entry = firstOrNull(await tx.insert(journalEntries).values({
    kind: event.kind,
    sourceId: source.sourceId,
    happenedOn: source.happenedOn ?? dayOf(ctx.now, ctx.club.timeZone),
    madeAt: ctx.now,
    madeBy: accountOf(ctx),
  }).onConflictDoNothing().returning({ id: journalEntries.id }));
  if (!entry) return null;
  await tx.insert(postings).values(postingsFor(event).map((line) => ({
    entryId: entry.id, account: line.account, fund: line.fund, amountMinor: line.amountMinor,
    currency: source.currency ?? ctx.club.currency, openDayId: source.openDayId ?? null, householdId: source.householdId ?? null,
  })));
  return entry.id;
}

const accountOf = ({ actor }: Ctx) => (actor.kind === 'account' ? actor.accountId : null);

/** The next receipt number of a year. Locks the year's counter until the transaction ends, so take it last: no number is ever left out. */
export async function nextReceipt(tx: Tx, year: number): Promise<{ year: number; number: number }> {
  const row = only(await tx.insert(receiptCounters).values({ year, last: 1 })
    .onConflictDoUpdate({ target: receiptCounters.year, set: { last: sql`${receiptCounters.last} + 1` } })
    .returning({ number: receiptCounters.last }));
  return { year, number: row.number };
}
