import 'server-only';
import { randomInt } from 'node:crypto';
import { verify } from '@node-rs/argon2';
import { and, desc, eq, gt, isNull, lt, sql } from 'drizzle-orm';
import type { z } from 'zod';
import type { Queryable } from '@/db/client';
import { accounts, passwords, signInCodes, signIns } from '@/db/schema/people';
import type { Id } from '@/lib/core/ids';
import { firstOrNull, only } from '@/lib/core/only';
import { Refusal } from '@/lib/core/refusal';
import { addMinutes } from '@/lib/core/time';
import type { AccountCtx, Ctx } from '@/lib/infra/context';
import { countTry } from '@/lib/infra/rate-limit';
import { hashSecret, newSecret, sameHash } from '@/lib/infra/secrets';
import { inTransaction } from '@/lib/infra/transaction';
import { queueLetter } from '@/lib/letters/commands';
import type { askForCodeInput, signInCodeInput, signInLinkInput, signInPasswordInput } from '../schema';

/** A code lives this long; so does its link. */
export const CODE_MINUTES = 15;
const CODE_TRIES = 5;
const ASKING = { tries: 5, minutes: 15 };
const GUESSING = { tries: 20, minutes: 15 };
const GUESSING_A_DAY = { tries: 100, minutes: 24 * 60 }; // no more than 100 wrong guesses in a row (NIST SP 800-63B-4, section 3.2.2)

const addressKey = (what: string, email: string) => `${what}:${hashSecret(email.toLowerCase()).slice(0, 22)}`;
const sameEmail = (email: string) => sql`lower(${accounts.email}) = lower(${email})`;

/** Counts a try at signing in, by address and by client; both in the database, so two servers share one count. */
async function countGuess({ db, now, client }: Ctx, email: string): Promise<void> {
  await countTry(db, addressKey('sign-in', email), GUESSING, now);
  await countTry(db, addressKey('sign-in-a-day', email), GUESSING_A_DAY, now);
  if (client !== null) await countTry(db, `sign-in-from:${client}`, { tries: 60, minutes: 15 }, now);
}

/** Sends a code and a link to an account's address. Says the same whether or not there is such an account. */
export async function askForCode(ctx: Ctx, { email }: z.output<typeof askForCodeInput>): Promise<{ email: string }> {
  const { db, now, client } = ctx;
  await countTry(db, addressKey('ask-code', email), ASKING, now);
  if (client !== null) await countTry(db, `ask-code-from:${client}`, { tries: 30, minutes: 15 }, now);
  const account = firstOrNull(await db.select({ email: accounts.email }).from(accounts).where(sameEmail(email)).limit(1));
  if (account) await sendCode(ctx, account.email);
  return { email };
}

/** Writes a new code and its letter; the code's digits live only in the letter. */
export async function sendCode({ db, now }: Ctx, address: string): Promise<void> {
  const code = String(randomInt(0, 1_000_000)).padStart(6, '0');
  const secret = newSecret();
  await inTransaction(db, async (tx) => {
    const row = only(await tx.insert(signInCodes).values({
      email: address, codeHash: codeHashOf(address, code), linkHash: hashSecret(secret), madeAt: now, expiresAt: addMinutes(now, CODE_MINUTES),
    }).returning({ id: signInCodes.id }));
    await queueLetter(tx, { key: `sign-in:${row.id}`, kind: 'sign-in', to: { name: null, address }, madeAt: now, dueAt: now, facts: { code, secret, minutes: CODE_MINUTES } });
  });
}

const codeHashOf = (email: string, code: string) => hashSecret(`${email.toLowerCase()}\n${code}`);

/** Signs in with the newest code sent to an address; five wrong tries use it up. Returns the new sign-in. */
export async function signInWithCode(ctx: Ctx, { email, code }: z.output<typeof signInCodeInput>): Promise<Id<'signIn'>> {
  await countGuess(ctx, email);
  const { db, now } = ctx;
  const newest = firstOrNull(await db.select({ id: signInCodes.id }).from(signInCodes)
    .where(and(sql`lower(${signInCodes.email}) = lower(${email})`, isNull(signInCodes.usedAt), gt(signInCodes.expiresAt, now)))
    .orderBy(desc(signInCodes.madeAt)).limit(1));
  if (!newest) throw new Refusal('wrong_code', { fields: { code: 'That code is used up or too old. Ask for a new one.' } });
  const tried = firstOrNull(await db.update(signInCodes).set({ tries: sql`${signInCodes.tries} + 1` })
    .where(and(eq(signInCodes.id, newest.id), isNull(signInCodes.usedAt), lt(signInCodes.tries, CODE_TRIES)))
    .returning({ hash: signInCodes.codeHash, email: signInCodes.email })); // counted before it is judged: two guesses at once are two tries
  if (!tried || !sameHash(tried.hash, codeHashOf(tried.email, code))) throw new Refusal('wrong_code', { fields: { code: 'That is not the code. Look at the newest letter.' } });
  return spendCode(ctx, newest.id, 'code');
}

/** Signs in with the secret of a letter's link, when its button is pressed. Returns the new sign-in. */
export async function signInWithLink(ctx: Ctx, { secret }: z.output<typeof signInLinkInput>): Promise<Id<'signIn'>> {
  const { db, now, client } = ctx;
  if (client !== null) await countTry(db, `sign-in-from:${client}`, { tries: 60, minutes: 15 }, now);
  const row = firstOrNull(await db.select({ id: signInCodes.id }).from(signInCodes)
    .where(and(eq(signInCodes.linkHash, hashSecret(secret)), isNull(signInCodes.usedAt), gt(signInCodes.expiresAt, now))).limit(1));
  if (!row) throw new Refusal('wrong_code');
  return spendCode(ctx, row.id, 'link');
}

/** Uses a code up, once: of two presses at the same moment one finds it used. */
async function spendCode(ctx: Ctx, codeId: string, method: 'code' | 'link'): Promise<Id<'signIn'>> {
  return inTransaction(ctx.db, async (tx) => {
    const used = firstOrNull(await tx.update(signInCodes).set({ usedAt: ctx.now })
      .where(and(sql`${signInCodes.id} = ${codeId}::uuid`, isNull(signInCodes.usedAt))).returning({ email: signInCodes.email }));
    if (!used) throw new Refusal('wrong_code');
    const account = firstOrNull(await tx.select({ id: accounts.id }).from(accounts).where(sameEmail(used.email)).limit(1));
    if (!account) throw new Refusal('wrong_code');
    return openSignIn(tx, account.id, method, ctx.now);
  });
}

// A hash of nothing in particular, so that an unknown address takes as long as a wrong password.
const DECOY = '$argon2id$v=19$m=19456,t=2,p=1$tOXLFevOuOC5EvQxSuykag$jYFDElZNKe+0nySzBReItyliiPKspWfJAxK9wH0JlNI';

/** Signs in with a password. Returns the new sign-in. */
export async function signInWithPassword(ctx: Ctx, { email, password }: z.output<typeof signInPasswordInput>): Promise<Id<'signIn'>> {
  await countGuess(ctx, email);
  const row = firstOrNull(await ctx.db.select({ id: accounts.id, hash: passwords.hash }).from(accounts)
    .innerJoin(passwords, eq(passwords.accountId, accounts.id)).where(sameEmail(email)).limit(1));
  const fits = await verify(row?.hash ?? DECOY, password.normalize('NFKC'));
  if (!row || !fits) throw new Refusal('wrong_password');
  return openSignIn(ctx.db, row.id, 'password', ctx.now);
}

async function openSignIn(db: Queryable, accountId: Id<'account'>, method: 'code' | 'link' | 'password', now: Date): Promise<Id<'signIn'>> {
  return only(await db.insert(signIns).values({ accountId, method, signedInAt: now }).returning({ id: signIns.id })).id;
}

/** Ends this browser's sign-in. */
export async function endSignIn({ db, actor, now }: AccountCtx): Promise<void> {
  await db.update(signIns).set({ endedAt: now }).where(and(eq(signIns.id, actor.signInId), isNull(signIns.endedAt)));
}

/** Ends every sign-in of the account, this one too. */
export async function endAllSignIns({ db, actor, now }: AccountCtx): Promise<void> {
  await db.update(signIns).set({ endedAt: now }).where(and(eq(signIns.accountId, actor.accountId), isNull(signIns.endedAt)));
}
