import { createHash } from 'node:crypto';
import { asId, type Id, type IdKind } from '@/lib/core/ids';

/** An id made from a name, the same on every planting: the name's SHA-256 in the custom form of RFC 9562 (section 5.8). */
export function seedId<K extends IdKind>(name: string): Id<K> {
  const digits = createHash('sha256').update(`alder fork demo: ${name}`).digest('hex');
  const variant = '89ab'.charAt(Number.parseInt(digits.charAt(16), 16) & 3);
  return asId<K>(`${digits.slice(0, 8)}-${digits.slice(8, 12)}-8${digits.slice(13, 16)}-${variant}${digits.slice(17, 20)}-${digits.slice(20, 32)}`);
}

/** A hash nobody knows the secret of: for passes and links that are only remembered. */
export const seedHash = (name: string): string => createHash('sha256').update(`alder fork demo, forgotten: ${name}`).digest('base64url');

/** Dice that fall alike on every planting (mulberry32, T. Ettinger 2017, public domain), from a name. */
export type Dice = { next: () => number; whole: (below: number) => number; pick: <T>(from: readonly [T, ...T[]]) => T; bytes: (count: number) => Uint8Array };

/** New dice for a purpose. */
export function diceFor(purpose: string): Dice {
  let state = createHash('sha256').update(purpose).digest().readUInt32LE(0);
  const next = (): number => {
    state = (state + 0x6d2b79f5) | 0;
    let mixed = Math.imul(state ^ (state >>> 15), 1 | state);
    mixed = (mixed + Math.imul(mixed ^ (mixed >>> 7), 61 | mixed)) ^ mixed;
    return ((mixed ^ (mixed >>> 14)) >>> 0) / 4_294_967_296;
  };
  const whole = (below: number): number => Math.floor(next() * below);
  return { next, whole, pick: (from) => from[whole(from.length)] ?? from[0], bytes: (count) => Uint8Array.from({ length: count }, () => whole(256)) };
}
