import { z } from 'zod';

/** Where the phone keeps its own key and what it has not sent yet. The browser's storage, or a test's. */
export type Keep = Pick<Storage, 'getItem' | 'setItem' | 'removeItem'>;

const KEY = 'leafhalt-gate-device';
const kept = z.object({ key: z.string(), isOpened: z.boolean() });

/** This phone's device key, once its pass was exchanged; null before. */
export function openedKey(keep: Keep): string | null {
  const device = read(keep);
  return device?.isOpened ? device.key : null;
}

/**
 * The key to exchange a pass with. A key whose exchange was cut off is used again, so a lost answer does not cost
 * one of the pass's phones; a new pass gets a new key.
 */
export function keyForExchange(keep: Keep): string {
  const device = read(keep);
  if (device && !device.isOpened) return device.key;
  const key = base64url(crypto.getRandomValues(new Uint8Array(32)));
  keep.setItem(KEY, JSON.stringify({ key, isOpened: false }));
  return key;
}

/** Notes that the pass was exchanged for `key`. */
export const rememberOpened = (keep: Keep, key: string): void => keep.setItem(KEY, JSON.stringify({ key, isOpened: true }));

function read(keep: Keep): z.output<typeof kept> | null {
  try {
    return kept.parse(JSON.parse(keep.getItem(KEY) ?? ''));
  } catch {
    return null; // nothing kept, or not ours
  }
}

const base64url = (bytes: Uint8Array): string => btoa(String.fromCharCode(...bytes)).replaceAll('+', '-').replaceAll('/', '_').replace(/=+$/, '');
