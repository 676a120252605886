// The job worker: does what was put into the queue, and looks every 15 seconds for rows that are due. Run one or more
// beside the server: `npm run worker`. SIGTERM lets the jobs under way finish.
import { EventEmitter } from 'node:events';
import { Logger, makeWorkerUtils, run, type Runner, type WorkerEvents } from 'graphile-worker';
import { Pool } from 'pg';
import { getDb } from '../db/client';
import { env } from '../lib/infra/env';
import { causeOf, log } from '../lib/infra/log';
import { startHeartbeat } from './worker/heartbeat';
import { allSweeps, allTasks, type Work } from './worker/tasks';

const SWEEP_SECONDS = 15;
const CONCURRENCY = 4;

/** The settings, or one clear line and the end. */
function settings() {
  try {
    const { QUEUE_DATABASE_URL: queueUrl } = env();
    if (queueUrl === undefined) throw new Error('The environment is not right: QUEUE_DATABASE_URL is missing. See .env.example.');
    return { queueUrl };
  } catch (error) {
    console.error(error instanceof Error ? error.message : error);
    process.exit(1);
  }
}
const { queueUrl } = settings();

/** The same tasks, whose failures carry no one's data into the queue's table: only what kind of failure it was. */
function discreet(tasks: Work['tasks']): Work['tasks'] {
  return Object.fromEntries(Object.entries(tasks).map(([name, task]) => [name, async (payload) => {
    try {
      await task(payload);
    } catch (error) {
      log.error('job', error, { task: name });
      throw new Error(`${name}: ${causeOf(error).code ?? (error instanceof Error ? error.name : 'failed')}`);
    }
  }]));
}

const quiet = new Logger(() => (level, message, meta) => {
  if ((level === 'error' || level === 'warning') && !meta?.['failure']) log.warn('queue', { message });
});
const pool = new Pool({ connectionString: queueUrl, max: CONCURRENCY + 3 });
const lost = (error: Error) => log.error('queue connection lost', error);
pool.on('error', lost).on('connect', (client) => client.on('error', lost));

let runner: Runner | null = null;
const utils = await makeWorkerUtils({ pgPool: pool, logger: quiet });
const heart = await startHeartbeat(queueUrl, utils, async () => {
  const names: string[] = [];
  const events: WorkerEvents = new EventEmitter();
  events.on('worker:create', ({ worker }) => names.push(worker.workerId));
  runner = await run({ pgPool: pool, taskList: discreet(allTasks()), concurrency: CONCURRENCY, noHandleSignals: true, logger: quiet, events, pollInterval: 1000 });
  return names;
});
log.info('worker ready', { tasks: Object.keys(allTasks()).length, sweeps: allSweeps().length });

let sweeping: Promise<void> | null = null;
async function sweepOnce() {
  await heart.beat().catch((error: unknown) => log.error('heartbeat', error));
  for (const sweep of allSweeps()) await sweep().catch((error: unknown) => log.error('sweep', error, { sweep: sweep.name }));
}
const sweepNow = () => {
  sweeping ??= sweepOnce().finally(() => { sweeping = null; });
};
const timer = setInterval(sweepNow, SWEEP_SECONDS * 1000);
sweepNow();

let stopping = false;
async function stop() {
  if (stopping) return;
  stopping = true;
  clearInterval(timer);
  setTimeout(() => process.exit(1), 20_000).unref(); // a job that hangs must not keep the machine up; it will be freed
  await sweeping;
  await runner?.stop();
  await heart.end();
  await utils.release();
  await pool.end();
  await getDb().$client.end();
  process.exit(0);
}
process.on('SIGTERM', () => void stop());
process.on('SIGINT', () => void stop());
