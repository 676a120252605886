import { drizzle, type NodePgDatabase } from 'drizzle-orm/node-postgres';
import { Pool } from 'pg';

export type Db = NodePgDatabase & { $client: Pool };

const keep = globalThis as { leafhaltDb?: Db };

function makePool(): Pool {
  const pool = new Pool({ connectionString: process.env.DATABASE_URL, max: 10, application_name: 'leafhalt' });
  const lost = (error: Error) => console.error(JSON.stringify({ level: 'error', operation: 'database connection lost', cause: error.message }));
  pool.on('error', lost).on('connect', (client) => client.on('error', lost)); // else the process dies with the connection
  return pool;
}

/** The database, connected on first use: `next build` needs none, and a test can set DATABASE_URL first. */
export const getDb = (): Db => (keep.leafhaltDb ??= drizzle({ client: makePool(), casing: 'snake_case' }));

export type Tx = Parameters<Parameters<Db['transaction']>[0]>[0];

/** Anything that can run a query: the database or a transaction. */
export type Queryable = Db | Tx;
