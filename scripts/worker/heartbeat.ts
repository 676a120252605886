// How a worker shows that it lives: it holds an advisory lock for as long as its connection lasts. Whoever finds a
// lock free frees the jobs of that worker at once; the queue by itself would wait four hours.
import { randomInt } from 'node:crypto';
import type { WorkerUtils } from 'graphile-worker';
import { Client } from 'pg';

/** Held by one process at a time, from looking for dead workers until its own names are written down. */
const REGISTRY = 4_118_027;

export type Heartbeat = Awaited<ReturnType<typeof startHeartbeat>>;

/** Takes this process's lock, frees what dead workers hold, then runs `start`, which tells the names of its own workers. */
export async function startHeartbeat(url: string, utils: WorkerUtils, start: () => Promise<string[]>) {
  const key = randomInt(1, 2 ** 31 - 1);
  let names: string[] = [];
  let client = await connect(url, key);

  async function register() {
    await client.query('select pg_advisory_lock($1)', [REGISTRY]);
    try {
      await freeDead(client, utils, key);
      if (names.length === 0) names = await start();
      await client.query('insert into queue.workers (lock_key, names, seen_at) values ($1, $2, now()) on conflict (lock_key) do update set seen_at = now()', [key, names]);
    } finally {
      await client.query('select pg_advisory_unlock($1)', [REGISTRY]);
    }
  }
  await register();

  return {
    /** Says again that this worker lives, with a new connection if the old one was lost, and looks for dead ones. */
    async beat() {
      try {
        await register();
      } catch {
        await client.end().catch(() => undefined);
        client = await connect(url, key);
        await register();
      }
    },
    async end() {
      await client.query('delete from queue.workers where lock_key = $1', [key]).catch(() => undefined);
      await client.end().catch(() => undefined);
    },
  };
}

async function connect(url: string, key: number): Promise<Client> {
  const client = new Client({ connectionString: url });
  client.on('error', () => undefined); // the next beat finds out and connects again
  await client.connect();
  await client.query('select pg_advisory_lock($1)', [key]);
  return client;
}

/** Jobs held under a name that belongs to no living worker are freed. The caller holds the registry. */
async function freeDead(client: Client, utils: WorkerUtils, ownKey: number) {
  const { rows } = await client.query<{ lock_key: number; names: string[] }>('select lock_key::int, names from queue.workers');
  const living: string[] = [];
  for (const row of rows) {
    if (row.lock_key === ownKey || !(await isFree(client, row.lock_key))) living.push(...row.names);
    else await client.query('delete from queue.workers where lock_key = $1', [row.lock_key]);
  }
  const held = await client.query<{ name: string }>(`
    select distinct locked_by as name from graphile_worker._private_jobs where locked_by is not null and locked_by <> all($1)
    union select locked_by from graphile_worker._private_job_queues where locked_by is not null and locked_by <> all($1)`, [living]);
  if (held.rows.length > 0) await utils.forceUnlockWorkers(held.rows.map((row) => row.name));
}

async function isFree(client: Client, key: number): Promise<boolean> {
  const { rows } = await client.query<{ free: boolean }>('select pg_try_advisory_lock($1) as free', [key]);
  if (rows[0]?.free) await client.query('select pg_advisory_unlock($1)', [key]);
  return rows[0]?.free === true;
}
