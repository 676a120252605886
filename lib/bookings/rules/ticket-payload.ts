import { fromBase32, toBase32 } from '@/lib/core/base32';

/** What a ticket's QR says and signs: enough for a gate without signal to judge it. */
export type TicketFacts = {
  keyId: number;
  clubId: string;
  visitId: string;
  visitVersion: number;
  stopId: string;
  stopNumber: number;
  entryAt: Date;
  graceMinutes: number;
  adults: number;
  children: number;
  babes: number;
};

/** Makes the 64-byte Ed25519 signature of `bytes` (RFC 8032). */
export type TicketSigner = (bytes: Uint8Array) => Uint8Array;

/** Whether `signature` over `bytes` is the one of key `keyId`; false for a key it does not know. */
export type TicketVerifier = (bytes: Uint8Array, signature: Uint8Array, keyId: number) => boolean | Promise<boolean>;

const LAYOUT = 1;
const SIGNATURE_BYTES = 64;

/*
 * Layout 1, big-endian, 63 bytes, then the signature over them; in base 32 that is 204 characters, which a QR of
 * version 8 at level M holds in alphanumeric mode (221, ISO/IEC 18004).
 *   0 layout · 1 key id (2) · 3 club (16) · 19 visit (16) · 35 visit version (2) · 37 stop (16) · 53 stop number ·
 *   54 entry time in whole minutes since 1970 (4) · 58 grace in minutes (2) · 60 adults · 61 children · 62 babes
 */
const SIGNED_BYTES = 63;

/** The text of a ticket's QR code: upper-case letters and digits only. Throws RangeError for a fact that does not fit. */
export function encodeTicket(facts: TicketFacts, sign: TicketSigner): string {
  const signed = signedBytes(facts);
  const signature = sign(signed);
  if (signature.length !== SIGNATURE_BYTES) throw new RangeError('an Ed25519 signature has 64 bytes');
  const whole = new Uint8Array(SIGNED_BYTES + SIGNATURE_BYTES);
  whole.set(signed);
  whole.set(signature, SIGNED_BYTES);
  return toBase32(whole);
}

/** The facts a scanned text claims, with what to verify; null when it is not shaped like one of our tickets. */
export function decodeTicket(text: string): { facts: TicketFacts; signed: Uint8Array; signature: Uint8Array } | null {
  const bytes = fromBase32(text);
  if (bytes === null || bytes.length !== SIGNED_BYTES + SIGNATURE_BYTES || bytes[0] !== LAYOUT) return null;
  const view = new DataView(bytes.buffer);
  const facts = {
    keyId: view.getUint16(1),
    clubId: uuidAt(bytes, 3),
    visitId: uuidAt(bytes, 19),
    visitVersion: view.getUint16(35),
    stopId: uuidAt(bytes, 37),
    stopNumber: view.getUint8(53),
    entryAt: new Date(view.getUint32(54) * 60_000),
    graceMinutes: view.getUint16(58),
    adults: view.getUint8(60),
    children: view.getUint8(61),
    babes: view.getUint8(62),
  };
  return { facts, signed: bytes.subarray(0, SIGNED_BYTES), signature: bytes.subarray(SIGNED_BYTES) };
}

/** The facts of a scanned text when its signature holds; null when it is not one of ours. */
export async function verifyTicket(text: string, verify: TicketVerifier): Promise<TicketFacts | null> {
  const read = decodeTicket(text);
  if (read === null) return null;
  return (await verify(read.signed, read.signature, read.facts.keyId)) ? read.facts : null;
}

function signedBytes(facts: TicketFacts): Uint8Array {
  const bytes = new Uint8Array(SIGNED_BYTES);
  const view = new DataView(bytes.buffer);
  const minutes = facts.entryAt.getTime() / 60_000;
  view.setUint8(0, LAYOUT);
  view.setUint16(1, whole(facts.keyId, 0xffff));
  bytes.set(uuidBytes(facts.clubId), 3);
  bytes.set(uuidBytes(facts.visitId), 19);
  view.setUint16(35, whole(facts.visitVersion, 0xffff));
  bytes.set(uuidBytes(facts.stopId), 37);
  view.setUint8(53, whole(facts.stopNumber, 0xff));
  view.setUint32(54, whole(minutes, 0xffff_ffff));
  view.setUint16(58, whole(facts.graceMinutes, 0xffff));
  view.setUint8(60, whole(facts.adults, 0xff));
  view.setUint8(61, whole(facts.children, 0xff));
  view.setUint8(62, whole(facts.babes, 0xff));
  return bytes;
}

function whole(value: number, most: number): number {
  if (!Number.isInteger(value) || value < 0 || value > most) throw new RangeError(`${value} does not fit on a ticket`);
  return value;
}

function uuidBytes(id: string): Uint8Array {
  if (!/^[0-9a-f]{8}(-[0-9a-f]{4}){3}-[0-9a-f]{12}$/.test(id)) throw new RangeError('a ticket needs lower-case UUIDs');
  const digits = id.replaceAll('-', '');
  return Uint8Array.from({ length: 16 }, (_, at) => Number.parseInt(digits.slice(at * 2, at * 2 + 2), 16));
}

function uuidAt(bytes: Uint8Array, at: number): string {
  const digits = Array.from(bytes.subarray(at, at + 16), (byte) => byte.toString(16).padStart(2, '0')).join('');
  return digits.replace(/^(.{8})(.{4})(.{4})(.{4})/, '$1-$2-$3-$4-');
}
