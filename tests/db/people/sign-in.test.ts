import { eq, sql } from 'drizzle-orm';
import { beforeAll, describe, expect, it } from 'vitest';
import { getDb } from '@/db/client';
import { letterTexts, letters } from '@/db/schema/letters';
import { signIns } from '@/db/schema/people';
import { addMinutes } from '@/lib/core/time';
import { setPassword } from '@/lib/people/commands/password';
import { askForCode, endAllSignIns, signInWithCode, signInWithLink, signInWithPassword } from '@/lib/people/commands/sign-in';
import { findAccountActor } from '@/lib/people/queries';
import { aClub, anAccount, ctxOf, NOON } from '@/tests/support/cast';

const stranger = { kind: 'anyone' as const };

/** What the newest letter to an address says: its code and its link's secret. */
async function newestCode(address: string) {
  const rows = await getDb().select({ facts: letterTexts.facts }).from(letterTexts).innerJoin(letters, eq(letters.id, letterTexts.letterId))
    .where(sql`${letterTexts.toAddress} = ${address} and ${letters.kind} = 'sign-in'`).orderBy(sql`${letters.madeAt} desc`);
  return { code: String(rows[0]?.facts?.['code']), secret: String(rows[0]?.facts?.['secret']), letters: rows.length };
}

describe('signing in', () => {
  beforeAll(() => aClub());

  it('writes a code to an account and takes it once', async () => {
    const ada = await anAccount('Ada Signs');
    const ctx = await ctxOf(stranger);
    await askForCode(ctx, { email: ada.email.toUpperCase() });
    const { code } = await newestCode(ada.email);

    const signIn = await signInWithCode(ctx, { email: ada.email, code });

    expect(await findAccountActor(getDb(), signIn)).toMatchObject({ accountId: ada.accountId, name: 'Ada Signs' });
    await expect(signInWithCode(ctx, { email: ada.email, code })).rejects.toMatchObject({ code: 'wrong_code' });
  });

  it('says the same to an address without an account, and writes nothing', async () => {
    const ctx = await ctxOf(stranger);

    const answer = await askForCode(ctx, { email: 'nobody@testvalley.example' });

    expect(answer).toEqual({ email: 'nobody@testvalley.example' });
    expect((await newestCode('nobody@testvalley.example')).letters).toBe(0);
  });

  it('uses a code up after five wrong tries, though the sixth is right', async () => {
    const ben = await anAccount('Ben Guesses');
    const ctx = await ctxOf(stranger);
    await askForCode(ctx, { email: ben.email });
    const { code } = await newestCode(ben.email);
    const wrong = code === '000000' ? '000001' : '000000';
    for (let tries = 0; tries < 5; tries += 1) await expect(signInWithCode(ctx, { email: ben.email, code: wrong })).rejects.toMatchObject({ code: 'wrong_code' });

    await expect(signInWithCode(ctx, { email: ben.email, code })).rejects.toMatchObject({ code: 'wrong_code' });
  });

  it('lets a code go stale after a quarter of an hour', async () => {
    const ada = await anAccount('Ada Late');
    await askForCode(await ctxOf(stranger), { email: ada.email });
    const { code } = await newestCode(ada.email);

    await expect(signInWithCode(await ctxOf(stranger, addMinutes(NOON, 15)), { email: ada.email, code })).rejects.toMatchObject({ code: 'wrong_code' });
  });

  it('takes the letter’s link once, and of two presses at the same moment only one', async () => {
    const ada = await anAccount('Ada Links');
    const ctx = await ctxOf(stranger);
    await askForCode(ctx, { email: ada.email });
    const { secret } = await newestCode(ada.email);

    const presses = await Promise.allSettled([signInWithLink(ctx, { secret }), signInWithLink(ctx, { secret })]);

    expect(presses.filter((press) => press.status === 'fulfilled')).toHaveLength(1);
  });

  it('asks for patience after five letters in a quarter of an hour', async () => {
    const ada = await anAccount('Ada Asks');
    const ctx = await ctxOf(stranger);
    for (let tries = 0; tries < 5; tries += 1) await askForCode(ctx, { email: ada.email });

    await expect(askForCode(ctx, { email: ada.email })).rejects.toMatchObject({ code: 'too_many_tries' });
    await expect(askForCode(await ctxOf(stranger, addMinutes(NOON, 15)), { email: ada.email })).resolves.toBeDefined();
  });

  it('takes a password, and tells a wrong one from nothing at all', async () => {
    const ada = await anAccount('Ada Words');
    await setPassword(await ctxOf(ada), { password: 'four words are good' });
    const ctx = await ctxOf(stranger);

    const signIn = await signInWithPassword(ctx, { email: ada.email, password: 'four words are good' });

    expect(await findAccountActor(getDb(), signIn)).toMatchObject({ accountId: ada.accountId });
    await expect(signInWithPassword(ctx, { email: ada.email, password: 'four words are bad!' })).rejects.toMatchObject({ code: 'wrong_password' });
    await expect(signInWithPassword(ctx, { email: 'nobody@testvalley.example', password: 'four words are good' })).rejects.toMatchObject({ code: 'wrong_password' });
  });

  it('takes no more than a hundred guesses a day, however slowly they come; the letter’s link still works', async () => {
    const ada = await anAccount('Ada Guessed');
    for (let guess = 0; guess < 100; guess += 1) {
      const ctx = await ctxOf(stranger, addMinutes(NOON, guess * 10));
      await expect(signInWithCode(ctx, { email: ada.email, code: '000000' })).rejects.toMatchObject({ code: 'wrong_code' });
    }
    const late = await ctxOf(stranger, addMinutes(NOON, 1000));
    await askForCode(late, { email: ada.email });
    const { code, secret } = await newestCode(ada.email);

    await expect(signInWithCode(late, { email: ada.email, code })).rejects.toMatchObject({ code: 'too_many_tries' });

    await expect(signInWithLink(late, { secret })).resolves.toBeDefined();
    await expect(signInWithPassword(await ctxOf(stranger, addMinutes(NOON, 1440)), { email: ada.email, password: 'x' })).rejects.toMatchObject({ code: 'wrong_password' });
  });

  it('ends every sign-in at once', async () => {
    const ada = await anAccount('Ada Leaves');
    const other = await getDb().insert(signIns).values({ accountId: ada.accountId, method: 'link', signedInAt: NOON }).returning({ id: signIns.id });

    await endAllSignIns(await ctxOf(ada));

    for (const signIn of [ada.signInId, ...other.map((row) => row.id)]) expect(await findAccountActor(getDb(), signIn)).toBeNull();
  });
});
