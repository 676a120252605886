import { sql } from 'drizzle-orm';
import { beforeAll, describe, expect, it } from 'vitest';
import { getDb } from '@/db/client';
import { inTransaction } from '@/lib/infra/transaction';
import { aClub } from '../../support/cast';

describe('a change that somebody else stands in the way of', () => {
  beforeAll(() => aClub());

  it('is refused in words when the other one does not finish in time, and changes nothing', async () => {
    const other = await getDb().$client.connect();
    await other.query('begin');
    await other.query('select 1 from club for update');

    const change = inTransaction(getDb(), (tx) => tx.execute(sql`update club set hold_minutes = 59`));

    await expect(change).rejects.toMatchObject({ name: 'Refusal', code: 'busy' });
    await other.query('rollback');
    other.release();
    expect((await getDb().execute(sql`select 1 from club where hold_minutes = 59`)).rows).toEqual([]);
  });

  it('is refused in words when it loses every race', async () => {
    let tries = 0;
    const change = inTransaction(getDb(), async (tx) => {
      tries += 1;
      await tx.execute(sql`do $$ begin raise exception 'lost' using errcode = 'deadlock_detected'; end $$`);
    });

    await expect(change).rejects.toMatchObject({ name: 'Refusal', code: 'busy' });
    expect(tries).toBe(3);
  });
});
