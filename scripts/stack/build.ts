// The production build, kept under the fingerprint of its sources: a changed source builds into a new folder, so a
// running server keeps its own, and the demo and the tests share a build whenever they mean the same source.
import { createHash } from 'node:crypto';
import { existsSync, mkdirSync, readdirSync, readFileSync, rmSync, statSync, utimesSync } from 'node:fs';
import { join } from 'node:path';
import { root } from './places';
import { keptSecret } from './secrets';
import { command, needRoom, step } from './step';

const FOLDERS = ['app', 'components', 'lib', 'db', 'public'];
const FILES = ['proxy.ts', 'instrumentation.ts', 'next.config.js', 'postcss.config.mjs', 'package-lock.json', 'tsconfig.json', 'scripts/setup/tsconfig.build.json'];
const KEPT = 3;

/** A fingerprint of everything that the build reads. */
export function sourceHash(): string {
  const hash = createHash('sha256').update(process.version);
  const inside = FOLDERS.flatMap((folder) => filesIn(folder)).filter((name) => !/^public\/(vendor|pictures)\//.test(name));
  for (const name of [...inside.sort(), ...FILES]) {
    const path = join(root, name);
    if (existsSync(path)) hash.update(name).update('\0').update(readFileSync(path)).update('\0');
  }
  return hash.digest('hex').slice(0, 16);
}

function filesIn(folder: string): string[] {
  const path = join(root, folder);
  if (!existsSync(path)) return [];
  return readdirSync(path, { recursive: true, withFileTypes: true })
    .filter((entry) => entry.isFile())
    .map((entry) => join(entry.parentPath, entry.name).slice(root.length + 1));
}

/** The settings that every build and every server on it must share, or forms of one are unknown to the other. */
export const buildEnv = (): Record<string, string> => ({ NEXT_SERVER_ACTIONS_ENCRYPTION_KEY: keptSecret('build', 'NEXT_SERVER_ACTIONS_ENCRYPTION_KEY', 'base64') });

/** Builds unless these very sources are built already; returns the folder for NEXT_DIST_DIR. */
export async function ensureBuild(signal?: AbortSignal): Promise<string> {
  const folder = `.tmp/build-${sourceHash()}`;
  const done = join(root, folder, 'leafhalt-done');
  if (existsSync(done)) {
    utimesSync(done, new Date(), new Date());
    return folder;
  }
  needRoom(root, 400);
  mkdirSync(join(root, folder), { recursive: true });
  const lock = join(root, `${folder}.lock`);
  await step('Building', () => command('Building', ['flock', lock, 'bash', '-c', `
    [ -e ${folder}/leafhalt-done ] && exit 0
    node --import tsx scripts/vendor.ts && node node_modules/next/dist/bin/next build && touch ${folder}/leafhalt-done`], {
    cwd: root, ...(signal && { signal }),
    env: { ...process.env, ...buildEnv(), NODE_ENV: 'production', NEXT_DIST_DIR: folder, NEXT_TELEMETRY_DISABLED: '1' },
  }));
  forgetOld(folder);
  return folder;
}

/** The newest few builds stay; an older one goes unless a running server was started on it. */
function forgetOld(current: string) {
  const inside = readdirSync(join(root, '.tmp'));
  const inUse = inside.map((name) => join(root, '.tmp', name, 'run.json')).filter(existsSync).map((file) => readFileSync(file, 'utf8'));
  const builds = inside
    .filter((name) => /^build-[0-9a-f]+$/.test(name) && existsSync(join(root, '.tmp', name, 'leafhalt-done')))
    .map((name) => ({ folder: `.tmp/${name}`, at: statSync(join(root, '.tmp', name, 'leafhalt-done')).mtimeMs }))
    .sort((a, b) => b.at - a.at);
  for (const { folder } of builds.slice(KEPT)) {
    if (folder === current || inUse.some((text) => text.includes(folder))) continue;
    rmSync(join(root, folder), { recursive: true, force: true });
    rmSync(join(root, `${folder}.lock`), { force: true });
  }
}
