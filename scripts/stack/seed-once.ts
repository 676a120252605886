// The demo club, planted once: the comment on the database says when it was complete, so a broken-off planting shows.
import { existsSync } from 'node:fs';
import { join } from 'node:path';
import { Client } from 'pg';
import { root } from './places';

/** Plants the demo club unless it is there; returns the day from which its dates count. */
export async function seedOnce(ownerUrl: string): Promise<string> {
  const client = new Client({ connectionString: ownerUrl });
  await client.connect();
  try {
    const { rows } = await client.query<{ note: string | null }>("select shobj_description(oid, 'pg_database') as note from pg_database where datname = current_database()");
    const planted = /^planted (\S+)/.exec(rows[0]?.note ?? '')?.[1];
    if (planted) return planted;
    if (existsSync(join(root, 'scripts/seed/run.ts'))) {
      const { seed } = await import(join(root, 'scripts/seed/run.ts'));
      await seed();
    }
    const today = new Date().toISOString().slice(0, 10);
    await client.query(`do $$ begin execute format('comment on database %I is %L', current_database(), 'planted ${today}'); end $$`);
    return today;
  } finally {
    await client.end();
  }
}

/** The demo sign-ins, one a line. */
export async function signInsText(): Promise<string> {
  return '';
}
