import 'server-only';
import { cookies } from 'next/headers';
import { redirect } from 'next/navigation';
import type { Ctx } from '@/lib/infra/context';
import { CODE_MINUTES } from '@/lib/people/commands/sign-in';
import { findAccountActor } from '@/lib/people/queries';
import { homePathOf } from '@/lib/people/rules/home-path';
import type { Id } from '@/lib/core/ids';
import { env } from '@/lib/infra/env';
import { endSession, startSession } from '@/lib/web/auth';

/** Gives the browser its session, then leads to the account's own pages, in one step. */
export async function startSessionThen(signInId: Id<'signIn'>, { db }: Pick<Ctx, 'db'>): Promise<void> {
  await startSession(signInId);
  const account = await findAccountActor(db, signInId);
  redirect(account === null ? '/sign-in' : homePathOf(account));
}

/** Takes the session from the browser and leads home. */
export async function leaveSession(): Promise<void> {
  await endSession();
  redirect('/');
}

const ASKED = 'asked-code';

/** Leads to the box for the code; the address travels in a cookie, never in the page's own address. */
export async function askedThen({ email }: { email: string }): Promise<void> {
  (await cookies()).set(ASKED, email, { httpOnly: true, sameSite: 'lax', secure: env().SITE_URL.startsWith('https:'), path: '/sign-in', maxAge: CODE_MINUTES * 60 });
  redirect('/sign-in/code');
}

/** The address that this browser has just asked a code for, or an empty text. */
export async function askedAddress(): Promise<string> {
  return (await cookies()).get(ASKED)?.value ?? '';
}
