import 'server-only';
import { and, eq, isNull, sql } from 'drizzle-orm';
import type { Queryable } from '@/db/client';
import { gardens } from '@/db/schema/gardens';
import { accounts, households, people, rolesHeld, signIns } from '@/db/schema/people';
import type { Id } from '@/lib/core/ids';
import type { AccountActor } from '@/lib/infra/context';
import { firstOrNull } from '@/lib/core/only';

const roles = sql<AccountActor['roles']>`coalesce((select array_agg(${rolesHeld.role} order by ${rolesHeld.role}) from ${rolesHeld}
  where ${rolesHeld.accountId} = ${accounts.id} and ${rolesHeld.takenAt} is null), '{}')`;
const hosts = sql<boolean>`exists (select from ${gardens} where ${gardens.householdId} = ${households.id} and ${gardens.withdrawnAt} is null)`;

/** Who a live sign-in belongs to, with the roles held now; null when it was ended. One query. */
export async function findAccountActor(db: Queryable, signInId: Id<'signIn'>): Promise<AccountActor | null> {
  const rows = await db
    .select({
      accountId: accounts.id, email: accounts.email, personId: people.id, givenName: people.givenName, familyName: people.familyName,
      householdId: households.id, leftOn: households.leftOn, roles, isHost: hosts,
    })
    .from(signIns)
    .innerJoin(accounts, eq(accounts.id, signIns.accountId))
    .leftJoin(people, sql`${people.id} = coalesce(${signIns.personId}, (select p.id from ${people} p where p.account_id = ${accounts.id} order by p.is_contact desc, p.given_name limit 1))`)
    .leftJoin(households, eq(households.id, people.householdId))
    .where(and(eq(signIns.id, signInId), isNull(signIns.endedAt)))
    .limit(1);
  const row = firstOrNull(rows);
  if (!row) return null;
  const name = row.givenName === null ? row.email : `${row.givenName} ${row.familyName}`;
  const householdId = row.leftOn === null ? row.householdId : null; // who left is a member no more
  return { kind: 'account', signInId, accountId: row.accountId, personId: row.personId, householdId, name, email: row.email, isHost: row.isHost, roles: row.roles };
}
