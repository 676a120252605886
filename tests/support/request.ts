import { encode } from 'next-auth/jwt';
import { vi } from 'vitest';
import type { Id } from '@/lib/core/ids';

type Jar = Map<string, string>;

/** The browser's side of a request that actions and handlers see through the framework: its cookies and headers. */
const now: { jar: Jar; headers: Headers } = { jar: new Map(), headers: new Headers() };

const cookieJar = {
  get: (name: string) => (now.jar.has(name) ? { name, value: now.jar.get(name) ?? '' } : undefined),
  set: (name: string, value: string) => void now.jar.set(name, value),
  delete: (name: string) => void now.jar.delete(name),
};

/** What the framework's own modules answer outside a server: the cookies and headers of the request set by `asBrowser`. */
export const frameworkHeaders = () => ({ cookies: async () => cookieJar, headers: async () => now.headers });
export const frameworkCache = () => ({ refresh: vi.fn(), revalidatePath: vi.fn() });

/** Runs `work` as a browser with these cookies; what it sets stays in `jar`. */
export async function asBrowser<T>(cookies: Record<string, string>, work: () => Promise<T>): Promise<T> {
  now.jar = new Map(Object.entries(cookies));
  now.headers = new Headers({ host: '127.0.0.1:3000', origin: 'http://127.0.0.1:3000' });
  return work();
}

/** The session cookie of a sign-in, as the sign-in page would set it. */
export async function sessionOf(signInId: Id<'signIn'>): Promise<Record<string, string>> {
  return { 'next-auth.session-token': await encode({ secret: process.env['NEXTAUTH_SECRET'] ?? '', token: { signInId } }) };
}
