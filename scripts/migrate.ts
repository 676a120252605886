// Brings a database up to date, an empty one included; run it before every start (`npm run db:migrate`). It needs
// MIGRATE_DATABASE_URL (the owner) and QUEUE_DATABASE_URL (the job queue's role), prepared by scripts/setup/*.sql.
import { fileURLToPath, pathToFileURL } from 'node:url';
import { drizzle } from 'drizzle-orm/node-postgres';
import { migrate } from 'drizzle-orm/node-postgres/migrator';
import { Logger, runMigrations } from 'graphile-worker';
import { Pool } from 'pg';

const MIGRATIONS = fileURLToPath(new URL('../migrations', import.meta.url));

type Urls = { ownerUrl: string; queueUrl: string };

/** Runs the project's migrations as the owner and the queue's as its own role; safe to repeat. */
export async function migrateAll({ ownerUrl, queueUrl }: Urls): Promise<void> {
  await migrateTables(ownerUrl);
  await withPool(ownerUrl, (owner) => owner.query(whileQueueMayCreate('grant', 'to')));
  await migrateQueue(queueUrl);
  await withPool(ownerUrl, (owner) => owner.query(whileQueueMayCreate('revoke', 'from')));
}

async function migrateTables(ownerUrl: string) {
  await withPool(ownerUrl, async (pool) => {
    await pool.query(APP_RIGHTS); // before the tables: a migration that takes a right away has the last word
    await migrate(drizzle({ client: pool }), { migrationsFolder: MIGRATIONS });
  });
}

async function migrateQueue(queueUrl: string) {
  await withPool(queueUrl, async (pool) => {
    await runMigrations({ pgPool: pool, logger: new Logger(() => (level, message) => {
      if (level === 'error' || level === 'warning') console.error(message);
    }) });
    await pool.query(ENQUEUE);
    await pool.query(WORKERS);
  });
}

async function withPool(connectionString: string, run: (pool: Pool) => Promise<unknown>) {
  const pool = new Pool({ connectionString, max: 2 });
  const lost = () => undefined; // the next query says so
  pool.on('error', lost).on('connect', (client) => client.on('error', lost));
  try {
    await run(pool);
  } finally {
    await pool.end();
  }
}

/** The queue's first migration says "create schema if not exists", which asks for this right even where the schema is. */
const whileQueueMayCreate = (verb: string, preposition: string) =>
  `do $$ begin execute format('${verb} create on database %I ${preposition} leafhalt_queue', current_database()); end $$`;

const APP_RIGHTS = `
  grant usage on schema public to leafhalt_app;
  alter default privileges for role leafhalt_owner in schema public grant select, insert, update, delete on tables to leafhalt_app;
  alter default privileges for role leafhalt_owner in schema public grant usage, select on sequences to leafhalt_app;`;

/** What the application may do to the queue: add a job in its own transaction, and nothing else. */
const ENQUEUE = `
  create or replace function queue.enqueue(task text, payload json, run_at timestamptz, job_key text) returns void
    language sql security definer set search_path = pg_catalog, pg_temp
    as $$ select graphile_worker.add_job(task, payload := payload, run_at := run_at, max_attempts := 8, job_key := job_key) $$;
  revoke all on function queue.enqueue(text, json, timestamptz, text) from public;
  grant usage on schema queue to leafhalt_app;
  grant execute on function queue.enqueue(text, json, timestamptz, text) to leafhalt_app;`;

/** Which workers live: a row for each process, believed only while its advisory lock is held. */
const WORKERS = 'create table if not exists queue.workers (lock_key bigint primary key, names text[] not null, seen_at timestamptz not null)';

if (process.argv[1] && import.meta.url === pathToFileURL(process.argv[1]).href) {
  const { MIGRATE_DATABASE_URL: ownerUrl, QUEUE_DATABASE_URL: queueUrl } = process.env;
  if (!ownerUrl || !queueUrl) {
    console.error('Set MIGRATE_DATABASE_URL and QUEUE_DATABASE_URL; .env.example explains them.');
    process.exit(1);
  }
  await migrateAll({ ownerUrl, queueUrl });
}
