import 'server-only';
import { desc, eq, sql } from 'drizzle-orm';
import { letters, lettersDue, letterTexts, sendings } from '@/db/schema/letters';
import type { Id } from '@/lib/core/ids';
import type { AccountCtx } from '@/lib/infra/context';
import { toLetterRow, type LetterRow } from '../views';

/** The letters written to one party, the newest first, at most 60; without codes, links and addresses. */
export async function lettersOfBooking({ db }: AccountCtx, bookingId: Id<'booking'>): Promise<LetterRow[]> {
  const last = <T>(column: 'outcome' | 'tried_at' | 'detail') => sql<T>`(select ${sql.raw(`s.${column}`)} from ${sendings} s where s.letter_id = ${letters.id} order by s.tried_at desc, s.id limit 1)`;
  const rows = await db.select({
    id: letters.id, kind: letters.kind, madeAt: letters.madeAt, toName: letterTexts.toName, toAddress: letterTexts.toAddress, subject: letterTexts.subject,
    dueAt: lettersDue.dueAt, tries: lettersDue.tries, outcome: last<'sent' | 'failed' | 'dropped' | null>('outcome'), triedAt: last<string | null>('tried_at'), detail: last<string | null>('detail'),
  })
    .from(letters).leftJoin(letterTexts, eq(letterTexts.letterId, letters.id)).leftJoin(lettersDue, eq(lettersDue.letterId, letters.id))
    .where(eq(letters.bookingId, bookingId)).orderBy(desc(letters.madeAt), desc(letters.id)).limit(60);
  return rows.map(toLetterRow);
}
