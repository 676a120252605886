import 'server-only';
import { asc, desc, eq, ilike, or, sql } from 'drizzle-orm';
import { auditTexts, auditTrail } from '@/db/schema/club';
import { accounts } from '@/db/schema/people';
import { likeOf, PAGE_ROWS, type Listing } from '@/lib/core/listing';
import type { AccountCtx } from '@/lib/infra/context';

/** The most lines that one file of the audit trail holds. */
const AUDIT_FILE_ROWS = 20_000;

/** One page of the audit trail (or all of it, for a file), with how many lines there are in all. */
export async function auditPage({ db }: AccountCtx, { find, page, order }: Listing<'at'>, extent: 'page' | 'all' = 'page') {
  const like = likeOf(find);
  const by = order === 'asc' ? asc : desc;
  const rows = await db.select({
    id: auditTrail.id, at: auditTrail.at, actorKind: auditTrail.actorKind, email: accounts.email, action: auditTrail.action, subjectKind: auditTrail.subjectKind,
    subjectId: auditTrail.subjectId, before: auditTexts.before, after: auditTexts.after, total: sql<number>`count(*) over ()::int`,
  })
    .from(auditTrail)
    .leftJoin(auditTexts, eq(auditTexts.lineId, auditTrail.id))
    .leftJoin(accounts, eq(accounts.id, auditTrail.accountId))
    .where(like === null ? undefined : or(ilike(auditTrail.action, like), ilike(accounts.email, like), ilike(auditTrail.subjectKind, like)))
    .orderBy(by(auditTrail.at), by(auditTrail.id)).limit(extent === 'page' ? PAGE_ROWS : AUDIT_FILE_ROWS).offset(extent === 'page' ? (page - 1) * PAGE_ROWS : 0);
  return { rows, total: rows[0]?.total ?? 0 };
}
