// The job worker: does what was put into the queue, and looks every 15 seconds for rows that are due. Run one or more
// beside the server: `npm run worker`. SIGTERM lets the jobs under way finish.
import { EventEmitter } from 'node:events';
import { Logger, makeWorkerUtils, run, type Runner, type WorkerEvents } from 'graphile-worker';
import { Pool } from 'pg';
import { startHeartbeat } from './worker/heartbeat';
import { allSweeps, allTasks, type Work } from './worker/tasks';

const SWEEP_SECONDS = 15;
const CONCURRENCY = 4;

const queueUrl = process.env['QUEUE_DATABASE_URL'];
if (!queueUrl) {
  console.error('Set QUEUE_DATABASE_URL; .env.example explains it.');
  process.exit(1);
}

/** A failed query's message holds its parameters, so only what kind of failure it was is written down. */
function kindOf(error: unknown): string {
  if (!(error instanceof Error)) return typeof error;
  const code = [error.cause, error].map((e) => (e && typeof e === 'object' && 'code' in e ? String(e.code) : null)).find((c) => c);
  return [error.name, code].filter(Boolean).join(' ');
}

function say(event: string, facts: Record<string, unknown> = {}) {
  console.log(JSON.stringify({ at: new Date().toISOString(), event, ...facts }));
}

/** The same tasks, whose failures carry no one's data into the queue's table or the log. */
function discreet(tasks: Work['tasks']): Work['tasks'] {
  return Object.fromEntries(Object.entries(tasks).map(([name, task]) => [name, async (payload) => {
    try {
      await task(payload);
    } catch (error) {
      const frames = error instanceof Error ? error.stack?.split('\n').filter((line) => /^\s+at /.test(line)).slice(0, 8) : [];
      say('job failed', { task: name, kind: kindOf(error), frames });
      throw new Error(`${name}: ${kindOf(error)}`);
    }
  }]));
}

const quiet = new Logger(() => (level, message, meta) => {
  if ((level === 'error' || level === 'warning') && !meta?.['failure']) say(message);
});
const pool = new Pool({ connectionString: queueUrl, max: CONCURRENCY + 3 });
const lost = () => say('queue connection lost');
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
say('worker ready', { tasks: Object.keys(allTasks()).length, sweeps: allSweeps().length });

let sweeping: Promise<void> | null = null;
async function sweepOnce() {
  await heart.beat().catch((error: unknown) => say('heartbeat failed', { kind: kindOf(error) }));
  for (const sweep of allSweeps()) await sweep().catch((error: unknown) => say('sweep failed', { sweep: sweep.name, kind: kindOf(error) }));
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
  process.exit(0);
}
process.on('SIGTERM', () => void stop());
process.on('SIGINT', () => void stop());
