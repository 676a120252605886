import 'server-only';
import type { QueryResultRow } from 'pg';
import type { Queryable } from '@/db/client';

/**
 * Runs a statement that is parsed and planned once a connection, under its name. For the few statements of a rush; the
 * text of a name never changes, and it is a transaction of its own.
 */
export async function runNamed<T extends QueryResultRow>(db: Queryable, name: string, text: string, values: readonly unknown[]): Promise<T[]> {
  if (!('$client' in db)) throw new Error(`${name} is a transaction of its own and joins no other`);
  return (await db.$client.query<T>({ name, text, values: [...values] })).rows;
}
