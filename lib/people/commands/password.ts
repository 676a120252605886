import 'server-only';
import { hash } from '@node-rs/argon2';
import { eq } from 'drizzle-orm';
import type { z } from 'zod';
import { passwords } from '@/db/schema/people';
import { recordChange } from '@/lib/club/commands';
import type { AccountCtx } from '@/lib/infra/context';
import { inTransaction } from '@/lib/infra/transaction';
import type { newPasswordInput } from '../schema';

// argon2id with the parameters of RFC 9106's second choice scaled to OWASP's minimum: 19 MiB, two passes, one lane.
const COST = { memoryCost: 19_456, timeCost: 2, parallelism: 1 };

/** An argon2id hash of a password, as stored. */
export const hashPassword = (password: string): Promise<string> => hash(password.normalize('NFKC'), COST);

/** Sets or replaces the account's password. */
export async function setPassword(ctx: AccountCtx, { password }: z.output<typeof newPasswordInput>): Promise<void> {
  const hashed = await hashPassword(password); // outside the transaction: it takes a while on purpose
  await inTransaction(ctx.db, async (tx) => {
    await tx.insert(passwords).values({ accountId: ctx.actor.accountId, hash: hashed, setAt: ctx.now })
      .onConflictDoUpdate({ target: passwords.accountId, set: { hash: hashed, setAt: ctx.now } });
    await recordChange(tx, ctx, { action: 'set a password', subjectKind: 'account', subjectId: ctx.actor.accountId });
  });
}

/** Takes the account's password away; codes by letter remain. */
export async function dropPassword(ctx: AccountCtx): Promise<void> {
  await inTransaction(ctx.db, async (tx) => {
    await tx.delete(passwords).where(eq(passwords.accountId, ctx.actor.accountId));
    await recordChange(tx, ctx, { action: 'dropped the password', subjectKind: 'account', subjectId: ctx.actor.accountId });
  });
}
