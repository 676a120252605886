import 'server-only';
import { and, eq, isNull, sql } from 'drizzle-orm';
import type { z } from 'zod';
import type { Tx } from '@/db/client';
import { accounts, rolesHeld } from '@/db/schema/people';
import { type Role } from '@/lib/core/words';
import { recordChange } from '@/lib/club/commands';
import type { Id } from '@/lib/core/ids';
import { firstOrNull } from '@/lib/core/only';
import { Refusal } from '@/lib/core/refusal';
import type { AccountCtx } from '@/lib/infra/context';
import { inTransaction } from '@/lib/infra/transaction';
import { queueLetter } from '@/lib/letters/commands';
import type { giveRoleInput, inviteOfficerInput, takeRoleInput } from '../schema';

/** Gives a role to whoever has this address, making an account if there is none, and writes to them. Returns the account. */
export async function inviteOfficer(ctx: AccountCtx, { name, email, role }: z.output<typeof inviteOfficerInput>): Promise<Id<'account'>> {
  return inTransaction(ctx.db, async (tx) => {
    await tx.insert(accounts).values({ email, madeAt: ctx.now }).onConflictDoNothing();
    const account = firstOrNull(await tx.select({ id: accounts.id, email: accounts.email }).from(accounts).where(sql`lower(${accounts.email}) = lower(${email})`));
    if (!account) throw new Error('an account was neither made nor found');
    await give(tx, ctx, account.id, role);
    await queueLetter(tx, { key: `invited:${account.id}:${role}:${ctx.now.toISOString()}`, kind: 'invitation', to: { name, address: account.email }, madeAt: ctx.now, dueAt: ctx.now, facts: { role, invitedBy: ctx.actor.name } });
    return account.id;
  });
}

/** Gives a role to an account that does not hold it. */
export async function giveRole(ctx: AccountCtx, { accountId, role }: z.output<typeof giveRoleInput>): Promise<void> {
  await inTransaction(ctx.db, async (tx) => {
    const account = firstOrNull(await tx.select({ id: accounts.id }).from(accounts).where(eq(accounts.id, accountId)));
    if (!account) throw new Refusal('not_found');
    await give(tx, ctx, accountId, role);
  });
}

async function give(tx: Tx, ctx: AccountCtx, accountId: Id<'account'>, role: Role): Promise<void> {
  const given = await tx.insert(rolesHeld).values({ accountId, role, givenAt: ctx.now, givenBy: ctx.actor.accountId }).onConflictDoNothing().returning({ id: rolesHeld.id });
  if (given.length === 0) throw new Refusal('role_held');
  await recordChange(tx, ctx, { action: 'gave a role', subjectKind: 'account', subjectId: accountId, after: { role } });
}

/** Takes a role from an account. The last administrator keeps it: the holders are locked before they are counted. */
export async function takeRole(ctx: AccountCtx, { accountId, role }: z.output<typeof takeRoleInput>): Promise<void> {
  await inTransaction(ctx.db, async (tx) => {
    const holders = await tx.select({ accountId: rolesHeld.accountId }).from(rolesHeld)
      .where(and(eq(rolesHeld.role, role), isNull(rolesHeld.takenAt))).orderBy(rolesHeld.id).for('no key update');
    if (!holders.some((holder) => holder.accountId === accountId)) throw new Refusal('not_found');
    if (role === 'administrator' && holders.length === 1) throw new Refusal('last_administrator');
    await tx.update(rolesHeld).set({ takenAt: ctx.now, takenBy: ctx.actor.accountId })
      .where(and(eq(rolesHeld.accountId, accountId), eq(rolesHeld.role, role), isNull(rolesHeld.takenAt)));
    await recordChange(tx, ctx, { action: 'took a role', subjectKind: 'account', subjectId: accountId, before: { role } });
  });
}
