// Ports on 127.0.0.1: a free one, and the same ones again at the next start.
import { existsSync, mkdirSync, readFileSync, writeFileSync } from 'node:fs';
import { createServer } from 'node:net';
import { dirname, join } from 'node:path';
import { root } from './places';

/** Whether nobody listens on this port of 127.0.0.1. */
export async function isFree(port: number): Promise<boolean> {
  return new Promise((resolve) => {
    const probe = createServer().once('error', () => resolve(false));
    probe.listen(port, '127.0.0.1', () => probe.close(() => resolve(true)));
  });
}

/** A port that is free now. */
export async function freePort(): Promise<number> {
  return new Promise((resolve, reject) => {
    const probe = createServer().once('error', reject);
    probe.listen(0, '127.0.0.1', () => {
      const address = probe.address();
      probe.close(() => (typeof address === 'object' && address ? resolve(address.port) : reject(new Error('no port'))));
    });
  });
}

/** Ports for the stand-ins: those of last time if they are still free, noted in `<folder>/ports.json`. */
export async function keptPorts(folder: string): Promise<{ cards: number; smtp: number; inbox: number }> {
  const file = join(root, folder, 'ports.json');
  const old: Record<string, number> = existsSync(file) ? JSON.parse(readFileSync(file, 'utf8')) : {};
  const again = async (port: number | undefined) => (port !== undefined && (await isFree(port)) ? port : freePort());
  const ports = { cards: await again(old['cards']), smtp: await again(old['smtp']), inbox: await again(old['inbox']) };
  mkdirSync(dirname(file), { recursive: true });
  writeFileSync(file, JSON.stringify(ports));
  return ports;
}
