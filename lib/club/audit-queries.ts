import 'server-only';
import { desc, eq, ilike, or, sql } from 'drizzle-orm';
import { auditTexts, auditTrail } from '@/db/schema/club';
import { accounts } from '@/db/schema/people';
import { likeOf, PAGE_ROWS, type Listing } from '@/lib/core/listing';
import type { AccountCtx } from '@/lib/infra/context';

/** One page of the audit trail, newest first, with how many lines there are in all. */
export async function auditPage({ db }: AccountCtx, { find, page }: Pick<Listing<string>, 'find' | 'page'>) {
  const like = likeOf(find);
  const rows = await db.select({
    id: auditTrail.id, at: auditTrail.at, actorKind: auditTrail.actorKind, email: accounts.email, action: auditTrail.action, subjectKind: auditTrail.subjectKind,
    subjectId: auditTrail.subjectId, before: auditTexts.before, after: auditTexts.after, total: sql<number>`count(*) over ()::int`,
  })
    .from(auditTrail)
    .leftJoin(auditTexts, eq(auditTexts.lineId, auditTrail.id))
    .leftJoin(accounts, eq(accounts.id, auditTrail.accountId))
    .where(like === null ? undefined : or(ilike(auditTrail.action, like), ilike(accounts.email, like), ilike(auditTrail.subjectKind, like)))
    .orderBy(desc(auditTrail.at), desc(auditTrail.id)).limit(PAGE_ROWS).offset((page - 1) * PAGE_ROWS);
  return { rows, total: rows[0]?.total ?? 0 };
}
