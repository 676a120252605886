import { readFileSync } from 'node:fs';
import { env } from './env';

/**
 * The instant a request or job begins. Under test an offset in milliseconds, kept in a file that the server and
 * the worker share, is added; in demo and live there is no such file.
 */
export function readClock(): Date {
  const file = env().LEAFHALT_MODE === 'test' ? env().CLOCK_OFFSET_FILE : undefined;
  return new Date(Date.now() + (file === undefined ? 0 : offsetIn(file)));
}

function offsetIn(file: string): number {
  try {
    return Number(readFileSync(file, 'utf8')) || 0;
  } catch {
    return 0; // no file yet: no offset
  }
}
