import 'server-only';
import { and, count, desc, eq, exists, ilike, isNotNull, isNull, or, sql, type SQL } from 'drizzle-orm';
import { letters, lettersDue, letterTexts, sendings } from '@/db/schema/letters';
import type { Id } from '@/lib/core/ids';
import { firstOrNull } from '@/lib/core/only';
import type { AccountCtx } from '@/lib/infra/context';
import type { LetterListInput } from '../schema';
import { LETTER_PAGE_ROWS, toLetterRow, type LetterPage, type LetterView } from '../views';

const lastOutcome = sql<'sent' | 'failed' | 'dropped' | null>`(select s.outcome from ${sendings} s where s.letter_id = ${letters.id} order by s.tried_at desc, s.id limit 1)`;
const lastTriedAt = sql<string | null>`(select max(s.tried_at) from ${sendings} s where s.letter_id = ${letters.id})`;
const lastDetail = sql<string | null>`(select s.detail from ${sendings} s where s.letter_id = ${letters.id} order by s.tried_at desc, s.id limit 1)`;

const rowColumns = {
  id: letters.id, kind: letters.kind, madeAt: letters.madeAt, toName: letterTexts.toName, toAddress: letterTexts.toAddress, subject: letterTexts.subject,
  dueAt: lettersDue.dueAt, tries: lettersDue.tries, outcome: lastOutcome, triedAt: lastTriedAt, detail: lastDetail,
};

/** One page of the office's letters, newest first, and how many there are. Codes, links and addresses are in none of them. */
export async function letterPage({ db }: AccountCtx, input: LetterListInput): Promise<LetterPage> {
  const where = and(...conditions(db, input));
  const joined = db.select(rowColumns).from(letters).leftJoin(letterTexts, eq(letterTexts.letterId, letters.id)).leftJoin(lettersDue, eq(lettersDue.letterId, letters.id));
  const rows = await joined.where(where).orderBy(desc(letters.madeAt), desc(letters.id)).limit(LETTER_PAGE_ROWS).offset((input.page - 1) * LETTER_PAGE_ROWS);
  const all = firstOrNull(await db.select({ n: count() }).from(letters).leftJoin(letterTexts, eq(letterTexts.letterId, letters.id)).leftJoin(lettersDue, eq(lettersDue.letterId, letters.id)).where(where));
  return { rows: rows.map(toLetterRow), total: all?.n ?? 0, page: input.page, pages: Math.max(1, Math.ceil((all?.n ?? 0) / LETTER_PAGE_ROWS)) };
}

function conditions(db: AccountCtx['db'], { state, kind, find }: LetterListInput): (SQL | undefined)[] {
  const ended = (outcome: 'sent' | 'dropped') => and(isNull(lettersDue.letterId), exists(db.select({ one: sql`1` }).from(sendings).where(and(eq(sendings.letterId, letters.id), eq(sendings.outcome, outcome)))));
  const like = `%${find.replace(/[\\%_]/g, (sign) => `\\${sign}`)}%`;
  return [
    kind === 'all' ? undefined : eq(letters.kind, kind),
    state === 'sent' || state === 'dropped' ? ended(state) : undefined,
    state === 'waiting' ? isNotNull(lettersDue.letterId) : undefined,
    state === 'failing' ? and(isNotNull(lettersDue.letterId), sql`${lettersDue.tries} > 0`) : undefined,
    find.trim() === '' ? undefined : or(ilike(letterTexts.toName, like), ilike(letterTexts.toAddress, like), ilike(letterTexts.subject, like)),
  ];
}

/** One letter as the office may read it, with each try to send it; null when there is none. */
export async function findLetter({ db }: AccountCtx, letterId: Id<'letter'>): Promise<LetterView | null> {
  const row = firstOrNull(await db.select({ ...rowColumns, text: letterTexts.text }).from(letters)
    .leftJoin(letterTexts, eq(letterTexts.letterId, letters.id)).leftJoin(lettersDue, eq(lettersDue.letterId, letters.id)).where(eq(letters.id, letterId)));
  if (!row) return null;
  const tries = await db.select({ triedAt: sendings.triedAt, outcome: sendings.outcome, detail: sendings.detail }).from(sendings)
    .where(eq(sendings.letterId, letterId)).orderBy(desc(sendings.triedAt)).limit(100);
  return { ...toLetterRow(row), text: row.text, tries };
}
