// Secrets of this machine alone, drawn once and kept readable to their owner only.
import { randomBytes } from 'node:crypto';
import { linkSync, mkdirSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { root } from './places';

/** The secret `name` of `.tmp/secrets/<owner>`, drawn at random the first time, also when two ask at once. */
export function keptSecret(owner: string, name: string, encoding: 'base64' | 'base64url' = 'base64url', prefix = ''): string {
  const folder = join(root, '.tmp/secrets', owner);
  const file = join(folder, name);
  const fresh = `${file}.${process.pid}`;
  mkdirSync(folder, { recursive: true, mode: 0o700 });
  try {
    return readFileSync(file, 'utf8');
  } catch {
    writeFileSync(fresh, prefix + randomBytes(32).toString(encoding), { mode: 0o600 });
  }
  try {
    linkSync(fresh, file); // fails when another process was first; then its secret is the one
  } catch {
    return readFileSync(file, 'utf8');
  } finally {
    rmSync(fresh);
  }
  return readFileSync(file, 'utf8');
}
