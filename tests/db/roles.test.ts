import { sql } from 'drizzle-orm';
import { Client } from 'pg';
import { expect, it } from 'vitest';
import { getDb } from '@/db/client';
import { enqueue } from '@/lib/infra/queue';

it('the application can put a job into the queue inside its own transaction, and see nothing else of the queue', async () => {
  const db = getDb();
  await db.transaction((tx) => enqueue(tx, 'kept', { n: 1 }, { runAt: new Date('2027-05-15T08:00:00Z'), jobKey: 'k1' }));
  await db.transaction(async (tx) => {
    await enqueue(tx, 'undone', {}, { runAt: new Date('2027-05-15T08:00:00Z') });
    throw new Error('the change that caused it was undone');
  }).catch(() => undefined);

  const queue = new Client({ connectionString: process.env['QUEUE_DATABASE_URL'] });
  await queue.connect();
  const { rows } = await queue.query('select task_identifier, key, max_attempts, run_at from graphile_worker.jobs');
  await queue.end();

  expect(rows).toEqual([{ task_identifier: 'kept', key: 'k1', max_attempts: 8, run_at: new Date('2027-05-15T08:00:00Z') }]);
  await expect(db.execute(sql`select * from graphile_worker._private_jobs`)).rejects.toMatchObject({ cause: { code: '42501' } });
});

it('the application is no superuser, owns nothing, and cannot make tables', async () => {
  const db = getDb();

  const { rows } = await db.execute(sql`select current_user, (select rolsuper from pg_roles where rolname = current_user) as super, count(*)::int as owned from pg_class where relowner = current_user::regrole`);

  expect(rows).toEqual([{ current_user: 'leafhalt_app', super: false, owned: 0 }]);
  await expect(db.execute(sql`create table mine (id int)`)).rejects.toMatchObject({ cause: { code: '42501' } });
});
