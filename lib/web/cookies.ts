import 'server-only';
import { cookies } from 'next/headers';
import { env } from '@/lib/infra/env';
import { hashSecret, newSecret } from '@/lib/infra/secrets';

const isHttps = () => env().SITE_URL.startsWith('https:');
const options = (path: string, maxAge: number) => ({ httpOnly: true, sameSite: 'lax' as const, secure: isHttps(), path, maxAge });

const holdCookie = () => (isHttps() ? '__Host-hold' : 'hold');

/** The hash of this browser's hold secret, or null when it holds nothing. */
export async function readHolder(): Promise<string | null> {
  const secret = (await cookies()).get(holdCookie())?.value;
  return secret === undefined || secret.length < 40 ? null : hashSecret(secret);
}

/** The hash of this browser's hold secret, made now if it has none. Only actions and handlers may set a cookie. */
export async function ensureHolder(): Promise<string> {
  const known = await readHolder();
  if (known !== null) return known;
  const secret = newSecret();
  (await cookies()).set(holdCookie(), secret, options('/', 180 * 24 * 3600));
  return hashSecret(secret);
}

const bookingCookie = (code: string) => `booking-${code}`;

/** Keeps a booking's link secret for its own pages only. */
export async function keepBookingLink(code: string, secret: string): Promise<void> {
  (await cookies()).set(bookingCookie(code), secret, options(`/bookings/${code}`, 400 * 24 * 3600));
}

/** The hash of the booking link this browser followed, or null. */
export async function readBookingLink(code: string): Promise<string | null> {
  const secret = (await cookies()).get(bookingCookie(code))?.value;
  return secret === undefined ? null : hashSecret(secret);
}

const PRINT = 'print';

/** Whether this browser reads large print. */
export const readsLargePrint = async (): Promise<boolean> => (await cookies()).get(PRINT)?.value === 'large';

/** Turns large print on for this browser. */
export async function setLargePrint(): Promise<void> {
  (await cookies()).set(PRINT, 'large', options('/', 400 * 24 * 3600));
}

/** Turns large print off for this browser. */
export async function setUsualPrint(): Promise<void> {
  (await cookies()).delete(PRINT);
}
