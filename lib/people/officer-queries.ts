import 'server-only';
import { asc, eq, isNull, sql } from 'drizzle-orm';
import { accounts, people, rolesHeld } from '@/db/schema/people';
import type { AccountCtx } from '@/lib/infra/context';

/** Who holds which role, by name, at most 200 rows of one role each. */
export async function rolesNow({ db }: AccountCtx) {
  return db.select({
    accountId: accounts.id, email: accounts.email, role: rolesHeld.role, givenAt: rolesHeld.givenAt,
    name: sql<string>`coalesce((select p.given_name || ' ' || p.family_name from ${people} p where p.account_id = ${accounts.id} order by p.is_contact desc limit 1), ${accounts.email})`,
  })
    .from(rolesHeld).innerJoin(accounts, eq(accounts.id, rolesHeld.accountId))
    .where(isNull(rolesHeld.takenAt)).orderBy(asc(rolesHeld.role), asc(accounts.email)).limit(200);
}
