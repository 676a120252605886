// Measures: `npm run bench` lists the benchmarks, `npm run bench -- NAME` runs one. Each starts and stops what it needs,
// ends with one line of JSON, and the exit status is 1 when a bar is missed.
import { readdirSync } from 'node:fs';
import { cpus, totalmem } from 'node:os';
import { join } from 'node:path';
import type { Bench } from '../tests/bench/bench';
import { root } from './stack/places';

const folder = join(root, 'tests/bench');
const [wanted] = process.argv.slice(2);

async function load(file: string): Promise<Bench | null> {
  const found: Partial<Bench> = await import(join(folder, file));
  return found.describe && found.run ? { describe: found.describe, run: found.run } : null;
}

const benches = new Map<string, Bench>();
for (const file of readdirSync(folder).filter((name) => name.endsWith('.ts')).sort()) {
  const bench = await load(file);
  if (bench) benches.set(file.slice(0, -3), bench);
}

if (wanted === undefined) {
  for (const [name, { describe }] of benches) console.log(`${name.padEnd(12)} ${describe}`);
  process.exit(0);
}
const bench = benches.get(wanted);
if (!bench) {
  console.error(`There is no benchmark called ${wanted}. There are: ${[...benches.keys()].join(', ')}.`);
  process.exit(2);
}
const { figures, bars } = await bench.run();
const machine = `${cpus().length} × ${cpus()[0]?.model ?? 'unknown'}, ${Math.round(totalmem() / 1024 ** 3)} GB, Node.js ${process.versions.node}`;
console.log(JSON.stringify({ bench: wanted, machine, figures, bars }));
const missed = bars.filter((bar) => !(bar.value >= (bar.min ?? -Infinity) && bar.value <= (bar.max ?? Infinity)));
process.exit(missed.length > 0 ? 1 : 0);
