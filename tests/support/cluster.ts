import { execFileSync, spawnSync } from 'node:child_process';
import { readFileSync } from 'node:fs';
import { fileURLToPath } from 'node:url';
import { Client } from 'pg';
import { migrateAll } from '../../scripts/migrate';

const at = (path: string) => fileURLToPath(new URL(`../../${path}`, import.meta.url));

/** The addresses of one database under each role, by the names that the program reads. */
export type DatabaseUrls = { DATABASE_URL: string; MIGRATE_DATABASE_URL: string; QUEUE_DATABASE_URL: string; ADMIN_DATABASE_URL: string };

/** Starts (or finds running) a cluster of this project; returns the addresses of its first database. */
export function startCluster(name: string): DatabaseUrls {
  const lines = execFileSync(at('scripts/postgres'), [name], { encoding: 'utf8' }).trim().split('\n');
  const read = (key: string) => lines.find((line) => line.startsWith(`${key}=`))?.slice(key.length + 1) ?? '';
  return { DATABASE_URL: read('DATABASE_URL'), MIGRATE_DATABASE_URL: read('MIGRATE_DATABASE_URL'), QUEUE_DATABASE_URL: read('QUEUE_DATABASE_URL'), ADMIN_DATABASE_URL: read('ADMIN_DATABASE_URL') };
}

/** Whether a cluster of this project runs now. */
export function clusterRuns(name: string): boolean {
  return spawnSync(at('scripts/postgres'), [name, 'status']).status === 0;
}

/** Stops a cluster, unless somebody else has begun to use it meanwhile. */
export async function stopIdleCluster(name: string, adminUrl: string): Promise<void> {
  const client = new Client({ connectionString: moved(adminUrl, 'postgres') });
  await client.connect();
  const { rows } = await client.query("select 1 from pg_stat_activity where backend_type = 'client backend' and pid <> pg_backend_pid()");
  await client.end();
  if (rows.length === 0) spawnSync(at('scripts/postgres'), [name, 'stop']);
}

const moved = (url: string, database: string) => url.replace(/[^/]*$/, database);

/** The same addresses in another database of the same cluster. */
export function inDatabase(urls: DatabaseUrls, name: string): DatabaseUrls {
  return { DATABASE_URL: moved(urls.DATABASE_URL, name), MIGRATE_DATABASE_URL: moved(urls.MIGRATE_DATABASE_URL, name), QUEUE_DATABASE_URL: moved(urls.QUEUE_DATABASE_URL, name), ADMIN_DATABASE_URL: moved(urls.ADMIN_DATABASE_URL, name) };
}

/** Runs statements as the cluster's administrator. */
export async function asAdmin(adminUrl: string, ...statements: string[]): Promise<void> {
  const client = new Client({ connectionString: adminUrl });
  await client.connect();
  try {
    for (const statement of statements) await client.query(statement);
  } finally {
    await client.end();
  }
}

/** Makes a database of this name, empty but migrated. */
export async function makeDatabase(urls: DatabaseUrls, name: string): Promise<DatabaseUrls> {
  const own = inDatabase(urls, name);
  await asAdmin(urls.ADMIN_DATABASE_URL, `drop database if exists ${name} with (force)`, `create database ${name} owner leafhalt_owner`);
  await asAdmin(own.ADMIN_DATABASE_URL, readFileSync(at('scripts/setup/database.sql'), 'utf8'));
  await migrateAll({ ownerUrl: own.MIGRATE_DATABASE_URL, queueUrl: own.QUEUE_DATABASE_URL });
  return own;
}

/** Drops databases that a run which was killed has left: `<prefix>_<pid>…` whose process is gone. */
export async function dropLeftOver(urls: DatabaseUrls, prefix: string): Promise<void> {
  const client = new Client({ connectionString: urls.ADMIN_DATABASE_URL });
  await client.connect();
  const { rows } = await client.query<{ datname: string }>('select datname from pg_database where datname ~ $1', [`^${prefix}_\\d+`]);
  for (const { datname } of rows) {
    if (!isAlive(Number(datname.split('_')[1]))) await client.query(`drop database if exists ${datname} with (force)`);
  }
  await client.end();
}

function isAlive(pid: number): boolean {
  try {
    process.kill(pid, 0);
    return true;
  } catch {
    return false;
  }
}
