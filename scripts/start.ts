// The second half of scripts/start, once Node.js and its packages are there: database, demo club, build, processes.
import { mkdirSync, rmSync } from 'node:fs';
import { join } from 'node:path';
import { Client } from 'pg';
import { migrateAll } from './migrate';
import { ensureBuild } from './stack/build';
import { root } from './stack/places';
import { plant, type Planted } from './stack/plant';
import { isFree, keptPorts } from './stack/ports';
import { lastRun, type Processes } from './stack/processes';
import { portalEnv, startStack, type StackSettings } from './stack/stack';
import { command, step, Trouble } from './stack/step';

const FOLDER = '.tmp/start';
const fresh = process.argv.includes('--fresh');
const stopped = new AbortController();
let processes: Processes | null = null;
let postgresRuns = false;

async function main() {
  mkdirSync(join(root, FOLDER), { recursive: true });
  const port = portFrom(process.env['PORT']);
  const { living, leftovers } = await lastRun(FOLDER);
  if (living !== null) throw new Trouble(`It is running already (process ${living}). Stop it there with Ctrl-C first.`);
  postgresRuns = leftovers;
  if (!(await isFree(port))) throw new Trouble(`Port ${port} is taken by another program. Stop that one, or choose another port: PORT=${port + 1} scripts/start`);
  if (fresh) for (const name of ['cards.jsonl', 'letters', 'ports.json']) rmSync(join(root, FOLDER, name), { recursive: true, force: true });

  postgresRuns = true;
  const database = await step('Starting PostgreSQL', () => startPostgres());
  const ports = { server: port, ...(await keptPorts(FOLDER)) };
  const settings: Omit<StackSettings, 'build'> = { mode: 'demo', folder: FOLDER, database, ports, remembers: true };
  await step('Bringing the database up to date', () => prepare(database));
  const env = portalEnv({ ...settings, build: '.next' });
  const planted = await step('Planting the demo club', () => plant({ ...env, CARDS_FILE: join(root, FOLDER, 'cards.jsonl') }, database.MIGRATE_DATABASE_URL, stopped.signal));
  const build = await ensureBuild(stopped.signal);
  stopped.signal.throwIfAborted();
  processes = await step('Starting', () => startStack({ ...settings, build }, (why) => void stop(1, why.message)));
  stopped.signal.throwIfAborted();
  console.log(welcome(ports, planted));
}

function portFrom(text: string | undefined): number {
  if (text === undefined || text === '') return 3000;
  const port = Number(text);
  if (!/^\d+$/.test(text) || port < 1024 || port > 65_535) throw new Trouble(`PORT is "${text}", and must be a number from 1024 to 65535. Say for example: PORT=3100 scripts/start`);
  return port;
}

async function startPostgres() {
  const lines = (await command('Starting PostgreSQL', [join(root, 'scripts/postgres'), 'start'], { signal: stopped.signal })).trim().split('\n');
  const read = (key: string) => lines.find((line) => line.startsWith(`${key}=`))?.slice(key.length + 1) ?? '';
  return {
    DATABASE_URL: read('DATABASE_URL'), MIGRATE_DATABASE_URL: read('MIGRATE_DATABASE_URL'),
    QUEUE_DATABASE_URL: read('QUEUE_DATABASE_URL'), ADMIN_DATABASE_URL: read('ADMIN_DATABASE_URL'),
  };
}

/** Empties the database for `--fresh`, or when the last planting was broken off; then migrates. */
async function prepare(database: Awaited<ReturnType<typeof startPostgres>>) {
  if (fresh || !(await hasClub(database.MIGRATE_DATABASE_URL))) {
    const admin = new Client({ connectionString: database.ADMIN_DATABASE_URL.replace(/[^/]*$/, 'postgres') });
    await admin.connect();
    await admin.query('drop database if exists leafhalt with (force)');
    await admin.end();
    await startPostgres(); // makes the database that is missing
  }
  await migrateAll({ ownerUrl: database.MIGRATE_DATABASE_URL, queueUrl: database.QUEUE_DATABASE_URL });
}

/** The comment on the database says when its demo club was complete; an empty table says that it has gone since. */
async function hasClub(url: string): Promise<boolean> {
  const client = new Client({ connectionString: url });
  await client.connect();
  const { rows } = await client.query<{ note: string | null }>("select shobj_description(oid, 'pg_database') as note from pg_database where datname = current_database()");
  const isPlanted = rows[0]?.note?.startsWith('planted ') ?? false;
  const isThere = isPlanted && (await client.query('select 1 from club')).rows.length > 0;
  await client.end();
  return isThere;
}

function welcome(ports: StackSettings['ports'], { plantedOn, signIns }: Planted): string {
  const today = new Date().toISOString().slice(0, 10);
  const wide = (field: 'email' | 'password') => Math.max(...signIns.map((one) => one[field].length));
  return `
  The club is open:   http://127.0.0.1:${ports.server}
  Letters it sends:   http://127.0.0.1:${ports.inbox}
  Card for trying:    4242 4242 4242 4242 (others stand on the pay page)

  Sign in as one of these, with the code that comes as a letter or with the password:
${signIns.map((one) => `    ${one.email.padEnd(wide('email'))}  ${one.password.padEnd(wide('password'))}  ${one.does}`).join('\n')}
${plantedOn === today ? '' : `\n  The demo club's days count from ${plantedOn}. For days from today: scripts/start --fresh\n`}
  Ctrl-C stops all of it.
`;
}

let stopping = false;
async function stop(code: number, says = '') {
  if (stopping) {
    processes?.kill(); // asked twice: do not wait for jobs
    return;
  }
  stopping = true;
  stopped.abort();
  if (says) console.error(`\n${says}`);
  if (process.stdout.isTTY) process.stdout.write('\r  Stopping …\n');
  await processes?.stop();
  if (postgresRuns) await command('Stopping PostgreSQL', [join(root, 'scripts/postgres'), 'start', 'stop']).catch(() => undefined);
  process.exit(code);
}
for (const signal of ['SIGINT', 'SIGTERM', 'SIGHUP'] as const) process.on(signal, () => void stop(signal === 'SIGINT' ? 130 : 143));

main().catch((error: unknown) => {
  if (stopped.signal.aborted) return;
  void stop(1, error instanceof Trouble ? error.message : `This did not work: ${error instanceof Error ? (error.stack ?? error.message) : String(error)}`);
});
