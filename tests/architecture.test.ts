import { readdirSync, readFileSync, statSync } from 'node:fs';
import { dirname, join, normalize, relative } from 'node:path';
import { describe, expect, it } from 'vitest';

const ROOT = process.cwd();
const SOURCES = ['app', 'components', 'lib', 'db', 'scripts'].flatMap((folder) => filesUnder(folder)).filter((path) => /\.tsx?$/.test(path));

function filesUnder(folder: string): string[] {
  return readdirSync(join(ROOT, folder)).flatMap((name) => {
    const path = join(folder, name);
    return statSync(join(ROOT, path)).isDirectory() ? filesUnder(path) : [path];
  });
}

const textOf = (path: string) => readFileSync(join(ROOT, path), 'utf8');

/** What a file imports when it runs: our own files as paths from the root, packages by name. Types vanish, so they do not count. */
function importsOf(path: string): string[] {
  const text = textOf(path);
  const found = [...text.matchAll(/^(?:import|export)\s+(?!type\b)(?:[^'"]*?\sfrom\s+)?['"]([^'"]+)['"]/gm), ...text.matchAll(/\bimport\(\s*['"]([^'"]+)['"]/g)];
  return found.map((match) => match[1] ?? '').map((name) => {
    if (name.startsWith('@/')) return name.slice(2);
    if (name.startsWith('.')) return relative(ROOT, normalize(join(ROOT, dirname(path), name)));
    return name;
  });
}

const isDomainPart = (path: string, parts: string) => new RegExp(`^lib/(?!core/|infra/|web/)[^/]+/(${parts})(/|\\.|$)`).test(path);
const isPure = (path: string) => isDomainPart(path, 'rules|schema|views');
const isWorking = (path: string) => /^lib\/(?!core\/|infra\/|web\/)/.test(path) && !isPure(path);
const OURS = /^(app|components|lib|db|scripts|tests)\//;
const FRAMEWORK = /^(next|next-auth|react|react-dom|react-hook-form)(\/|$)/;
const DATABASE = /^(pg|drizzle-orm|drizzle-kit)(\/|$)|^db\//;

type Rule = { where: string; covers: (path: string) => boolean; mayNot: (name: string) => boolean };

const RULES: Rule[] = [
  { where: 'lib/core imports only itself and small pure libraries', covers: (path) => path.startsWith('lib/core/'),
    mayNot: (name) => (OURS.test(name) && !name.startsWith('lib/core/')) || DATABASE.test(name) || FRAMEWORK.test(name) || name.startsWith('node:') },
  { where: 'db knows no domain', covers: (path) => path.startsWith('db/'),
    mayNot: (name) => OURS.test(name) && !/^(db|lib\/core)\/|^lib\/infra\/env/.test(name) },
  { where: 'lib/infra knows no domain and no Next.js', covers: (path) => path.startsWith('lib/infra/'),
    mayNot: (name) => (OURS.test(name) && !/^(lib\/infra|lib\/core|db)\//.test(name)) || FRAMEWORK.test(name) },
  { where: 'rules, schemas and views are pure', covers: isPure,
    mayNot: (name) => (OURS.test(name) && !isPure(name) && !name.startsWith('lib/core/')) || DATABASE.test(name) || FRAMEWORK.test(name) || name.startsWith('node:') || name === 'server-only' },
  { where: 'queries, commands, jobs and work know no Next.js and no React', covers: isWorking,
    mayNot: (name) => FRAMEWORK.test(name) || /^(app|components|lib\/web)\//.test(name) },
  { where: 'only the worker imports work', covers: (path) => !path.startsWith('scripts/worker'),
    mayNot: (name) => isDomainPart(name, 'work') },
  { where: 'lib/web knows no pages and no components', covers: (path) => path.startsWith('lib/web/'),
    mayNot: (name) => /^(app|components)\//.test(name) },
  { where: 'components know only React, the core and pure files', covers: (path) => path.startsWith('components/'),
    mayNot: (name) => (OURS.test(name) && !name.startsWith('components/') && !name.startsWith('lib/core/') && !isPure(name)) || DATABASE.test(name) },
  { where: 'app holds no SQL', covers: (path) => path.startsWith('app/'),
    mayNot: (name) => DATABASE.test(name) || name.startsWith('tests/') || name.startsWith('scripts/') },
];

describe('who may import whom', () => {
  it.each(RULES)('$where', ({ covers, mayNot }) => {
    const broken = SOURCES.filter(covers).flatMap((path) => importsOf(path).filter(mayNot).map((name) => `${path} imports ${name}`));

    expect(broken).toEqual([]);
  });
});

describe('what is done in one place only', () => {
  it('reads the environment in lib/infra/env.ts and the named exceptions', () => {
    const readers = SOURCES.filter((path) => !path.startsWith('scripts/') && /process\.env\b/.test(textOf(path)));

    expect(readers.sort()).toEqual(['db/client.ts', 'lib/infra/env.ts']);
  });

  it('builds every server action by action(...)', () => {
    const files = SOURCES.filter((path) => /^['"]use server['"]/.test(textOf(path)));
    const loose = files.flatMap((path) => exportsOf(path).filter((line) => !/^export const \w+ = action\(/.test(line)).map((line) => `${path}: ${line}`));

    expect(files.length).toBeGreaterThan(0);
    expect(loose).toEqual([]);
  });

  it('builds every route handler by route(...), but for next-auth, the health answer and what benchmarks compare with', () => {
    const files = SOURCES.filter((path) => /^app\/.*\/route\.ts$/.test(path) && !/^app\/api\/(auth|health|bench)\//.test(path));
    const loose = files.flatMap((path) => exportsOf(path).filter((line) => !/^export const (GET|POST|PUT|DELETE|PATCH) = route\(/.test(line)).map((line) => `${path}: ${line}`));

    expect(loose).toEqual([]);
  });

  it('reads no clock in a rule, a view, a schema or the core', () => {
    const files = SOURCES.filter((path) => isPure(path) || path.startsWith('lib/core/'));
    const readers = files.filter((path) => /new Date\(\)|Date\.now\(\)/.test(textOf(path)));

    expect(readers).toEqual([]);
  });

  it('guards queries and commands from the browser', () => {
    const open = SOURCES.filter((path) => isDomainPart(path, 'queries|commands|work') && !/^import 'server-only';/m.test(textOf(path)));

    expect(open).toEqual([]);
  });

  it('silences nothing', () => {
    const silenced = SOURCES.filter((path) => /(:|as|<) *any\b|@ts-(ignore|nocheck|expect-error)|eslint-disable/.test(textOf(path)));

    expect(silenced).toEqual([]);
  });
});

const exportsOf = (path: string) => textOf(path).split('\n').filter((line) => /^export (?!type\b)/.test(line));
