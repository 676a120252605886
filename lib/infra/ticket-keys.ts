import 'server-only';
import { createCipheriv, createDecipheriv, createHash, createPrivateKey, generateKeyPairSync, hkdfSync, randomBytes, sign, type KeyObject } from 'node:crypto';
import { asc, desc, isNull, sql } from 'drizzle-orm';
import type { Queryable } from '@/db/client';
import { ticketKeys } from '@/db/schema/bookings';
import { firstOrNull } from '@/lib/core/only';
import { env } from './env';
import { inTransaction } from './transaction';

/** What signs the club's tickets now: the key's number for the QR, the club's own mark, and the signature itself. */
export type TicketSigning = { keyId: number; clubId: string; sign: (bytes: Uint8Array) => Uint8Array };

const NONCE_BYTES = 12; // AES-GCM's own length (NIST SP 800-38D section 5.2.1.1)
const TAG_BYTES = 16;
const MAKING_A_KEY = 7_305_041; // an advisory lock's number: two servers at their first ticket make one key

/** The club's signing key, made at the first need. Opening it costs one unsealing; a page of tickets asks once. */
export async function ticketSigning(db: Queryable, now: Date): Promise<TicketSigning> {
  const key = (await currentKey(db)) ?? (await makeKey(db, now));
  const secret = createPrivateKey({ key: unseal(key.sealed, key.id), format: 'der', type: 'pkcs8' });
  return { keyId: key.id, clubId: await clubMark(db), sign: (bytes) => sign(null, bytes, secret) };
}

/** Every public key the club has had (32 bytes, RFC 8032), newest first: tickets outlive a key. */
export async function ticketPublicKeys(db: Queryable): Promise<{ keyId: number; publicKey: Buffer }[]> {
  return db.select({ keyId: ticketKeys.id, publicKey: ticketKeys.publicKey }).from(ticketKeys).orderBy(desc(ticketKeys.id)).limit(50);
}

async function currentKey(db: Queryable) {
  return firstOrNull(await db.select({ id: ticketKeys.id, sealed: ticketKeys.sealedPrivateKey }).from(ticketKeys)
    .where(isNull(ticketKeys.retiredAt)).orderBy(desc(ticketKeys.id)).limit(1));
}

async function makeKey(db: Queryable, now: Date) {
  return inTransaction(db, async (tx) => {
    await tx.execute(sql`select pg_advisory_xact_lock(${MAKING_A_KEY})`);
    const made = await currentKey(tx);
    if (made) return made; // another server was quicker
    const last = firstOrNull(await tx.select({ id: ticketKeys.id }).from(ticketKeys).orderBy(desc(ticketKeys.id)).limit(1));
    const { privateKey, publicKey } = generateKeyPairSync('ed25519');
    const id = (last?.id ?? 0) + 1;
    const sealed = seal(privateKey, id);
    await tx.insert(ticketKeys).values({ id, publicKey: rawPublicKey(publicKey), sealedPrivateKey: sealed, madeAt: now });
    return { id, sealed };
  });
}

/** The club as a ticket names it: a UUID made from its very first public key (RFC 9562 section 5.8), the same for ever. */
async function clubMark(db: Queryable): Promise<string> {
  const first = firstOrNull(await db.select({ publicKey: ticketKeys.publicKey }).from(ticketKeys).orderBy(asc(ticketKeys.id)).limit(1));
  if (!first) throw new Error('no ticket key was made');
  const digits = createHash('sha256').update(first.publicKey).digest('hex');
  const variant = '89ab'.charAt(Number.parseInt(digits.charAt(16), 16) & 3);
  return `${digits.slice(0, 8)}-${digits.slice(8, 12)}-8${digits.slice(13, 16)}-${variant}${digits.slice(17, 20)}-${digits.slice(20, 32)}`;
}

/** The 32 bytes of an Ed25519 public key (RFC 8032 section 5.1.5). */
export function rawPublicKey(key: KeyObject): Buffer {
  return Buffer.from(key.export({ format: 'jwk' }).x ?? '', 'base64url');
}

/** A private key as it lies in the database: nonce, AES-256-GCM ciphertext, tag; bound to its number. */
function seal(key: KeyObject, id: number): Buffer {
  const nonce = randomBytes(NONCE_BYTES);
  const cipher = createCipheriv('aes-256-gcm', sealingKey(), nonce).setAAD(Buffer.from(`ticket key ${id}`));
  const hidden = Buffer.concat([cipher.update(key.export({ format: 'der', type: 'pkcs8' })), cipher.final()]);
  return Buffer.concat([nonce, hidden, cipher.getAuthTag()]);
}

function unseal(sealed: Buffer, id: number): Buffer {
  const decipher = createDecipheriv('aes-256-gcm', sealingKey(), sealed.subarray(0, NONCE_BYTES)).setAAD(Buffer.from(`ticket key ${id}`));
  decipher.setAuthTag(sealed.subarray(-TAG_BYTES));
  try {
    return Buffer.concat([decipher.update(sealed.subarray(NONCE_BYTES, -TAG_BYTES)), decipher.final()]);
  } catch (cause) {
    throw new Error('The ticket key cannot be opened: TICKET_KEY_SECRET is not the one it was sealed with.', { cause });
  }
}

const sealingKey = (): Uint8Array => new Uint8Array(hkdfSync('sha256', env().TICKET_KEY_SECRET, '', 'leafhalt ticket keys', 32));
