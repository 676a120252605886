import 'server-only';
import type { Queryable } from '@/db/client';
import { bearerLinks } from '@/db/schema/people';
import { addMinutes } from '@/lib/core/time';
import { env } from '@/lib/infra/env';
import { hashSecret, newSecret } from '@/lib/infra/secrets';

/** An address of our own site. */
export const siteUrl = (path: string): string => new URL(path, env().SITE_URL).toString();

/** When the private links of a booking end: for the receipt and what was left behind, 60 days after the gates close. */
export const linksEndAt = (closesAt: Date): Date => addMinutes(closesAt, 60 * 1440);

/** The host that message ids and calendar UIDs end with. */
export const siteHost = (): string => new URL(env().SITE_URL).hostname;

/**
 * A new private link to a booking's page. It is made when a letter goes out, so that the secret lies in no table:
 * only its hash is kept, and every letter has a link of its own.
 */
export async function newBookingLink(db: Queryable, code: string, now: Date, expiresAt: Date): Promise<string> {
  const secret = newSecret();
  await db.insert(bearerLinks).values({ kind: 'booking', subjectId: code, secretHash: hashSecret(secret), madeAt: now, expiresAt });
  return siteUrl(`/bookings/${code}/link/${secret}`);
}
