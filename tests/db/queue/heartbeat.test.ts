import { makeWorkerUtils, type WorkerUtils } from 'graphile-worker';
import { Client } from 'pg';
import { afterEach, beforeEach, expect, it } from 'vitest';
import { startHeartbeat, type Heartbeat } from '../../../scripts/worker/heartbeat';

const url = () => process.env['QUEUE_DATABASE_URL'] ?? '';
let queue: Client;
let utils: WorkerUtils;
const beating: Heartbeat[] = [];

beforeEach(async () => {
  queue = new Client({ connectionString: url() });
  await queue.connect();
  utils = await makeWorkerUtils({ connectionString: url() });
  await queue.query('delete from graphile_worker._private_jobs');
});
afterEach(async () => {
  for (const heart of beating.splice(0)) await heart.end();
  await utils.release();
  await queue.end();
});

async function start(name: string) {
  const heart = await startHeartbeat(url(), utils, async () => [name]);
  beating.push(heart);
  return heart;
}

/** A job that this worker has taken and not finished. */
async function jobTakenBy(worker: string) {
  await queue.query("select queue.enqueue('letter', '{}', now(), $1)", [`job of ${worker}`]);
  await queue.query('update graphile_worker._private_jobs set locked_by = $1, locked_at = now() where key = $2', [worker, `job of ${worker}`]);
}
const takers = async () => (await queue.query('select locked_by from graphile_worker._private_jobs order by id')).rows.map((row) => row.locked_by);

/** Ends every connection that holds a heartbeat's lock, as the death of its process or of the network would. */
const cutConnections = () => queue.query(`
  select pg_terminate_backend(pid) from pg_locks where locktype = 'advisory' and database = (select oid from pg_database where datname = current_database())`);

it('a job whose worker nobody knows any more is free as soon as another worker starts', async () => {
  await jobTakenBy('worker-gone');

  await start('worker-new');

  expect(await takers()).toEqual([null]);
});

it('a job of a living worker stays with it, however many others start', async () => {
  await start('worker-one');
  await jobTakenBy('worker-one');

  const two = await start('worker-two');
  await two.beat();

  expect(await takers()).toEqual(['worker-one']);
});

it('a worker that dies while others run loses its jobs at their next beat', async () => {
  const survivor = await start('worker-survivor');
  await startHeartbeat(url(), utils, async () => ['worker-victim']);
  await jobTakenBy('worker-victim');
  await jobTakenBy('worker-survivor');

  await cutConnections();
  await survivor.beat();

  expect(await takers()).toEqual([null, 'worker-survivor']);
});

it('a worker that has lost its connection for a moment is believed again', async () => {
  const heart = await start('worker-steady');
  await cutConnections();
  await heart.beat();
  await jobTakenBy('worker-steady');

  await start('worker-new');

  expect(await takers()).toEqual(['worker-steady']);
});
