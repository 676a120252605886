import 'server-only';
import type { NextAuthOptions } from 'next-auth';
import CredentialsProvider from 'next-auth/providers/credentials';
import { decode, encode } from 'next-auth/jwt';
import { cookies } from 'next/headers';
import { asId, type Id } from '@/lib/core/ids';
import { env } from '@/lib/infra/env';

const MAX_AGE_SECONDS = 30 * 24 * 3600;
const isHttps = () => env().SITE_URL.startsWith('https:');
const sessionCookie = () => (isHttps() ? '__Secure-next-auth.session-token' : 'next-auth.session-token');

/**
 * next-auth keeps the session: a signed, encrypted cookie that names one row of `sign_ins`, so that a sign-in can be
 * ended everywhere at once. Codes, links and passwords are judged by commands in lib/people before `startSession`.
 */
export function authOptions(): NextAuthOptions {
  return {
    secret: env().NEXTAUTH_SECRET,
    session: { strategy: 'jwt', maxAge: MAX_AGE_SECONDS },
    useSecureCookies: isHttps(),
    pages: { signIn: '/sign-in', error: '/sign-in' },
    providers: [CredentialsProvider({ id: 'none', name: 'None', credentials: {}, authorize: async () => null })], // sign-in goes through our own action
    callbacks: {
      session: async ({ session, token }) => Object.assign(session, { signInId: token['signInId'] }),
    },
  };
}

/**
 * The sign-in that this browser's cookie names, or null. Whether it still lives is the actor's query to say. The token is
 * read, not renewed: renewing it on every request would cost an encryption a page.
 */
export async function currentSignIn(): Promise<Id<'signIn'> | null> {
  const token = (await cookies()).get(sessionCookie())?.value;
  if (token === undefined) return null;
  const named = (await readToken(token))?.['signInId'];
  return typeof named === 'string' ? asId<'signIn'>(named) : null;
}

async function readToken(token: string) {
  try {
    return await decode({ token, secret: env().NEXTAUTH_SECRET });
  } catch {
    return null; // forged, from another secret, or too old: nobody is signed in
  }
}

/** Gives this browser the session of a sign-in that a command has just made. */
export async function startSession(signInId: Id<'signIn'>): Promise<void> {
  const token = await encode({ secret: env().NEXTAUTH_SECRET, token: { signInId }, maxAge: MAX_AGE_SECONDS });
  const jar = await cookies();
  jar.set(sessionCookie(), token, { httpOnly: true, sameSite: 'lax', secure: isHttps(), path: '/', maxAge: MAX_AGE_SECONDS });
}

/** Takes the session from this browser. */
export async function endSession(): Promise<void> {
  (await cookies()).delete(sessionCookie());
}
