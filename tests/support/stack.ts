import { rmSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { ensureBuild } from '../../scripts/stack/build';
import { root } from '../../scripts/stack/places';
import { plant, type Planted } from '../../scripts/stack/plant';
import { freePort } from '../../scripts/stack/ports';
import { lastRun, type Processes } from '../../scripts/stack/processes';
import { portalEnv, startStack, type StackSettings } from '../../scripts/stack/stack';
import type { Order } from '../../scripts/stand-ins/cards/control';
import { asAdmin, clusterRuns, makeDatabase, startCluster, stopIdleCluster, type DatabaseUrls } from './cluster';

/** Where a test finds the running portal and what surrounds it; plain text, so that it travels in a variable. */
export type Addresses = { site: string; cards: string; inbox: string; clockFile: string; database: DatabaseUrls; planted: Planted | null };

export type TestStack = Addresses & { processes: Processes; settings: StackSettings; stop(): Promise<void> };

type Wishes = {
  /** Its folder is .tmp/stack-<name>, its database stack_<name>. */
  name: string;
  seeded: boolean;
  serverPort?: number;
  more?: Record<string, string>;
  /** Another cluster than the fast one, for tests that need a disk that keeps its word. */
  cluster?: string;
};

/** A complete portal on free ports with a database of its own, and everything that belongs to it stopped by `stop`. */
export async function startTestStack({ name, seeded, serverPort, more, cluster: clusterName = 'test' }: Wishes): Promise<TestStack> {
  const folder = `.tmp/stack-${name}`;
  const { living } = await lastRun(folder);
  if (living !== null) throw new Error(`Another run (process ${living}) uses ${folder}.`);
  rmSync(join(root, folder), { recursive: true, force: true });
  const build = await ensureBuild();
  const ranBefore = clusterRuns(clusterName);
  const cluster = startCluster(clusterName);
  const database = await makeDatabase(cluster, `stack_${name.replaceAll('-', '_')}`);
  const ports = { server: serverPort ?? (await freePort()), cards: await freePort(), smtp: await freePort(), inbox: await freePort() };
  const settings: StackSettings = { mode: 'test', folder, build, database, ports, remembers: false, ...(more && { more }) };
  const planted = seeded ? await plant(portalEnv(settings), database.MIGRATE_DATABASE_URL) : null;
  const processes = await startStack(settings, (why) => console.error(why.message));
  return {
    site: `http://127.0.0.1:${ports.server}`, cards: `http://127.0.0.1:${ports.cards}`, inbox: `http://127.0.0.1:${ports.inbox}`,
    clockFile: join(root, folder, 'clock-offset'), database, planted, processes, settings,
    async stop() {
      await processes.stop();
      await asAdmin(cluster.ADMIN_DATABASE_URL, `drop database if exists ${database.DATABASE_URL.split('/').at(-1)} with (force)`);
      if (!ranBefore) await stopIdleCluster(clusterName, cluster.ADMIN_DATABASE_URL);
    },
  };
}

const VARIABLE = 'LEAFHALT_TEST_STACK';

/** Tells this process's children where the stack is. */
export function announce({ site, cards, inbox, clockFile, database, planted }: Addresses): void {
  process.env[VARIABLE] = JSON.stringify({ site, cards, inbox, clockFile, database, planted });
}

/** The stack that the browser tests' setup has started. */
export function theStack(): Addresses {
  const text = process.env[VARIABLE];
  if (text === undefined) throw new Error('No stack runs: browser tests are started with `npm run e2e` or scripts/test.');
  return JSON.parse(text);
}

export type LetterRead = { id: number; to: string[]; subject: string; text: string; html: string; parts: { name: string; type: string; method: string | null; text: string }[] };

/** The letters that came to an address, newest first. */
export async function lettersTo(address: string): Promise<LetterRead[]> {
  return (await fetch(`${theStack().inbox}/letters.json?to=${encodeURIComponent(address)}`)).json();
}

/** Gives the card stand-in an order. */
export async function orderCards(order: Order): Promise<unknown> {
  return (await fetch(`${theStack().cards}/_control`, { method: 'POST', body: JSON.stringify(order) })).json();
}

/** Gives the mail stand-in an order: take letters, say "later", or be away. */
export async function orderMail(answer: 'take' | 'later' | 'none'): Promise<void> {
  await fetch(`${theStack().inbox}/_control`, { method: 'POST', body: JSON.stringify({ answer }) });
}

/** Sets the clock that server, worker and card stand-in share forward (or back) by so many minutes from true time. */
export function setClock(minutes: number): void {
  writeFileSync(theStack().clockFile, String(minutes * 60_000));
}
