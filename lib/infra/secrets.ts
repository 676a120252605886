import { createHash, randomBytes, timingSafeEqual } from 'node:crypto';

/** A new bearer secret: 256 random bits, safe in an address. */
export const newSecret = (): string => randomBytes(32).toString('base64url');

/** What is stored of a bearer secret. Plain SHA-256 will do: the secret itself is 256 random bits. */
export const hashSecret = (secret: string): string => createHash('sha256').update(secret).digest('base64url');

/** Compares two hashes in constant time. */
export function sameHash(a: string, b: string): boolean {
  const left = Buffer.from(a);
  const right = Buffer.from(b);
  return left.length === right.length && timingSafeEqual(left, right);
}
