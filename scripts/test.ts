// The second half of scripts/test: runs each kind of check, shows the clock, and adds up what passed and what failed.
import { spawn } from 'node:child_process';
import { existsSync, mkdirSync, readFileSync, rmSync } from 'node:fs';
import { join } from 'node:path';
import { createInterface } from 'node:readline';
import { z } from 'zod';
import { ensureBuild } from './stack/build';
import { root } from './stack/places';
import { command, endGroup } from './stack/step';

const FOLDER = '.tmp/test';
const began = Date.now();
const bin = (name: string) => join('node_modules/.bin', name);
const running = new Set<number>();
let passed = 0;
let failed = 0;

function say(line: string) {
  const seconds = Math.floor((Date.now() - began) / 1000);
  console.log(`${String(Math.floor(seconds / 60)).padStart(2)}:${String(seconds % 60).padStart(2, '0')}  ${line}`);
}

/** Runs a command with each line of its output behind the clock; true when it ended well. */
async function run(label: string, [file = '', ...args]: string[], env: Record<string, string> = {}): Promise<boolean> {
  say(label);
  const heartbeat = setInterval(() => say(`${label} …`), 30_000);
  const child = spawn(file, args, { cwd: root, detached: true, stdio: ['ignore', 'pipe', 'pipe'], env: { ...process.env, ...env, NO_COLOR: '1' } });
  if (child.pid) running.add(child.pid);
  for (const stream of [child.stdout, child.stderr]) {
    createInterface({ input: stream }).on('line', (line) => {
      heartbeat.refresh();
      if (line.trim() !== '') say(`    ${line}`);
    });
  }
  const code = await new Promise((resolve) => child.on('close', resolve).on('error', () => resolve(null)));
  clearInterval(heartbeat);
  if (child.pid) running.delete(child.pid);
  return code === 0;
}

function check(label: string, ok: boolean) {
  if (!ok) {
    failed += 1;
    say(`${label}: not right`);
  }
}

const vitestReport = z.object({
  numPassedTests: z.number(), numFailedTests: z.number(), numPendingTests: z.number(), numTodoTests: z.number(),
  testResults: z.array(z.object({ status: z.string(), assertionResults: z.array(z.object({ status: z.string() })) })),
});
const browserReport = z.object({ stats: z.object({ expected: z.number(), unexpected: z.number(), flaky: z.number(), skipped: z.number() }), errors: z.array(z.unknown()) });

/** Checks against published tables are left out where the folder of tables is not there, and only there. */
const hasTables = existsSync(join(root, '..', 'shared', 'data'));

/** Adds a report up. A test left out without that reason, or one that passed only at the second try, counts as failed. */
function add(label: string, ok: boolean, report: { good: number; bad: number; leftOut: number } | null) {
  passed += report?.good ?? 0;
  const leftOut = report?.leftOut ?? 0;
  const bad = (report?.bad ?? 0) + (hasTables ? leftOut : 0);
  failed += bad > 0 || ok ? bad : 1; // it ended badly without saying which test
  say(`${label}: ${report?.good ?? 0} passed, ${bad > 0 || ok ? bad : 1} failed${leftOut > 0 ? `, ${leftOut} left out` : ''}`);
}

function readReport<T>(file: string, schema: z.ZodType<T>): T | null {
  return existsSync(join(root, file)) ? schema.parse(JSON.parse(readFileSync(join(root, file), 'utf8'))) : null;
}

async function vitest() {
  const file = `${FOLDER}/vitest.json`;
  const ok = await run('Unit, database and page tests', [bin('vitest'), 'run', '--reporter=default', '--reporter=json', `--outputFile.json=${file}`]);
  const report = readReport(file, vitestReport);
  const unread = report?.testResults.filter((one) => one.status === 'failed' && one.assertionResults.every((test) => test.status !== 'failed')).length ?? 0;
  add('Unit, database and page tests', ok, report && { good: report.numPassedTests, bad: report.numFailedTests + unread, leftOut: report.numPendingTests + report.numTodoTests });
}

async function browser() {
  const file = `${FOLDER}/browser.json`;
  const ok = await run('Browser tests', [bin('playwright'), 'test'], { LEAFHALT_E2E_REPORT: file });
  const report = readReport(file, browserReport);
  add('Browser tests', ok, report && { good: report.stats.expected, bad: report.stats.unexpected + report.stats.flaky + (report.stats.unexpected === 0 ? report.errors.length : 0), leftOut: report.stats.skipped });
}

async function build() {
  say('Production build');
  const problem: unknown = await ensureBuild().then(() => null, (error: unknown) => error);
  if (problem instanceof Error) say(problem.message);
  check('Production build', problem === null);
  return problem === null;
}

async function postgresRuns(): Promise<boolean> {
  return command('Looking for PostgreSQL', [join(root, 'scripts/postgres'), 'test', 'status']).then(() => true, () => false);
}

let stopping = false;
async function stop(signal: NodeJS.Signals) {
  if (stopping) return;
  stopping = true;
  for (const pid of running) endGroup(pid, 'SIGINT'); // the browser tests then stop their portal
  const end = Date.now() + 15_000;
  while (running.size > 0 && Date.now() < end) await new Promise((resolve) => setTimeout(resolve, 100));
  for (const pid of running) endGroup(pid, 'SIGKILL');
  process.exit(signal === 'SIGINT' ? 130 : 143);
}
process.on('SIGINT', () => void stop('SIGINT'));
process.on('SIGTERM', () => void stop('SIGTERM'));

rmSync(join(root, FOLDER), { recursive: true, force: true });
mkdirSync(join(root, FOLDER), { recursive: true });
const ranBefore = await postgresRuns();
check('Vendor files', await run('Vendor files', [process.execPath, '--import', 'tsx', 'scripts/vendor.ts']));
check('Lint', await run('Lint', [bin('eslint'), '.', '--max-warnings=0']));
check('Types', await run('Types of the routes', [bin('next'), 'typegen']) && await run('Types', [bin('tsc'), '--noEmit']));
if (!stopping) await vitest();
if (!stopping && (await build())) await browser();
if (!ranBefore) await command('Stopping PostgreSQL', [join(root, 'scripts/postgres'), 'test', 'stop']).catch(() => undefined);
if (!stopping) {
  say(failed === 0 ? 'All is well.' : 'Not all is well.');
  console.log(`${passed} passed, ${failed} failed`);
  process.exit(failed === 0 && passed > 0 ? 0 : 1);
}
