import type { journalEntries, payments, postings, receiptCounters } from '@/db/schema/books';
import type { Id } from '@/lib/core/ids';
import type { Day } from '@/lib/core/time';
import { type BusinessEvent, postingsFor } from '@/lib/books/rules';
import { CLUB } from './club';
import { seedId } from './ids';

/** Something that happened to money, on its way into the books. */
export type SeedEvent = { event: BusinessEvent; sourceId: string; happenedOn: Day; at: Date; openDayId?: Id<'openDay'>; householdId?: Id<'household'>; madeBy?: Id<'account'> };

/** A payment that has no receipt number yet. */
export type SeedPayment = Omit<typeof payments.$inferInsert, 'receiptYear' | 'receiptNumber'> & { id: Id<'payment'>; recordedAt: Date };

/** Entries and postings for every event, by the same rules as the running club's. */
export function bookedRows(events: readonly SeedEvent[]): { entries: (typeof journalEntries.$inferInsert)[]; lines: (typeof postings.$inferInsert)[] } {
  const inOrder = [...events].sort((a, b) => a.at.getTime() - b.at.getTime());
  const entries = inOrder.map(({ event, sourceId, happenedOn, at, madeBy }) => ({ id: seedId<'journalEntry'>(`entry ${event.kind} ${sourceId}`), kind: event.kind, sourceId, happenedOn, madeAt: at, madeBy: madeBy ?? null }));
  const lines = inOrder.flatMap(({ event, sourceId, openDayId, householdId }) => postingsFor(event).map((line, i) => ({
    id: seedId(`posting ${event.kind} ${sourceId} ${i}`), entryId: seedId<'journalEntry'>(`entry ${event.kind} ${sourceId}`), ...line,
    openDayId: openDayId ?? null, householdId: householdId ?? null, currency: CLUB.currency,
  })));
  return { entries, lines };
}

/** Numbers the receipts of each year without a gap, in the order in which the money was recorded. */
export function numberedReceipts(unnumbered: readonly SeedPayment[]): { rows: (typeof payments.$inferInsert)[]; counters: (typeof receiptCounters.$inferInsert)[] } {
  const last = new Map<number, number>();
  const rows = [...unnumbered].sort((a, b) => a.recordedAt.getTime() - b.recordedAt.getTime() || (a.id < b.id ? -1 : 1)).map((payment) => {
    const receiptYear = Number(payment.receivedOn.slice(0, 4));
    const receiptNumber = (last.get(receiptYear) ?? 0) + 1;
    last.set(receiptYear, receiptNumber);
    return { ...payment, receiptYear, receiptNumber };
  });
  return { rows, counters: [...last].map(([year, number]) => ({ year, last: number })) };
}

/** What the card processor keeps of a payment: 2.9 % and 30 cents, its usual published rate. */
export const cardFeeMinor = (amountMinor: number): number => Math.round((amountMinor * 29) / 1000) + 30;
