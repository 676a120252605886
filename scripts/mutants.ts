// Takes each lock and constraint out in turn, in a copy of the project, and shows the test that fails without it:
// `npm run mutants`, or `npm run mutants -- WORD` for those whose description holds the word. Run it after changing a
// lock, a constraint or a race test. Exit status 1 when a test passes without what it is there to prove.
import { execFileSync, spawnSync } from 'node:child_process';
import { cpSync, existsSync, mkdirSync, readFileSync, rmSync, symlinkSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { mutants, type Mutant } from './mutants/list';

const root = fileURLToPath(new URL('..', import.meta.url));
const copy = join(root, '.tmp/mutants');
const COPIED = ['db', 'lib', 'migrations', 'scripts', 'tests', 'components', 'app', 'public/valley', 'package.json', 'tsconfig.json', 'vitest.config.ts'];

const [word = ''] = process.argv.slice(2);
const wanted = mutants.filter((mutant) => mutant.what.includes(word));
if (wanted.length === 0) {
  console.error(`Nothing that is taken out is called ${word}. There are: ${mutants.map((mutant) => mutant.what).join('; ')}.`);
  process.exit(2);
}

function makeCopy() {
  for (const name of COPIED) rmSync(join(copy, name), { recursive: true, force: true });
  mkdirSync(copy, { recursive: true });
  for (const name of COPIED) if (existsSync(join(root, name))) cpSync(join(root, name), join(copy, name), { recursive: true });
  if (!existsSync(join(copy, 'node_modules'))) symlinkSync(join(root, 'node_modules'), join(copy, 'node_modules'));
}

/** Runs one named test in the copy. */
function runTest({ test, named }: Mutant): { passed: boolean; said: string } {
  const ran = spawnSync(process.execPath, ['node_modules/vitest/vitest.mjs', 'run', '--project', 'db', test, '-t', named.replace(/[.*+?^${}()|[\]\\]/g, '\\$&'), '--reporter', 'json'], {
    cwd: copy, encoding: 'utf8', env: { ...process.env, NO_COLOR: '1', FORCE_COLOR: '0' }, maxBuffer: 64 * 1024 * 1024,
  });
  const begins = ran.stdout.indexOf('{"num');
  if (begins < 0) throw new Error(`The test could not be run: ${ran.stderr.slice(-600)}`);
  const report: { numPassedTests: number; numFailedTests: number; testResults: { assertionResults: { status: string; fullName: string; failureMessages: string[] }[] }[] } = JSON.parse(ran.stdout.slice(begins));
  const failed = report.testResults.flatMap((file) => file.assertionResults).filter((one) => one.status === 'failed');
  if (report.numPassedTests + report.numFailedTests === 0) throw new Error(`No test is called ${named}.`);
  return { passed: failed.length === 0, said: failed.map((one) => `${one.fullName}\n      ${one.failureMessages[0]?.split('\n')[0] ?? ''}`).join('\n    ') };
}

function take(mutant: Mutant): boolean {
  const file = join(copy, mutant.file);
  const whole = readFileSync(file, 'utf8');
  if (whole.split(mutant.from).length !== 2) throw new Error(`${mutant.file} does not hold this exactly once: ${mutant.from}`);
  if (!runTest(mutant).passed) throw new Error(`The test fails with everything in place: ${mutant.named}`);
  writeFileSync(file, whole.replace(mutant.from, () => mutant.to));
  const { passed, said } = runTest(mutant);
  writeFileSync(file, whole);
  console.log(passed ? `STILL PASSES without ${mutant.what}: ${mutant.named}` : `fails without ${mutant.what}:\n    ${said}`);
  return !passed;
}

makeCopy();
let missed = 0;
try {
  for (const mutant of wanted) if (!take(mutant)) missed += 1;
} finally {
  execFileSync(join(copy, 'scripts/postgres'), ['test', 'stop']);
}
console.log(`${wanted.length - missed} of ${wanted.length} tests fail without what they prove`);
process.exit(missed > 0 ? 1 : 0);
