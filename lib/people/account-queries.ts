import 'server-only';
import { and, desc, eq, isNull, sql } from 'drizzle-orm';
import { passwords, signIns } from '@/db/schema/people';
import type { AccountCtx } from '@/lib/infra/context';
import { full } from '@/lib/infra/sql-column';

/** The acting account's live sign-ins, newest first, at most 30, and whether it has a password. */
export async function accountPage({ db, actor }: AccountCtx) {
  const rows = await db.select({
    id: signIns.id, method: signIns.method, signedInAt: signIns.signedInAt,
    hasPassword: sql<boolean>`exists (select from ${passwords} where ${full(passwords.accountId)} = ${full(signIns.accountId)})`,
  })
    .from(signIns).where(and(eq(signIns.accountId, actor.accountId), isNull(signIns.endedAt))).orderBy(desc(signIns.signedInAt)).limit(30);
  return { hasPassword: rows[0]?.hasPassword ?? false, signIns: rows.map(({ id, method, signedInAt }) => ({ id, method, signedInAt })) };
}
