// The processes of one running copy of the portal: started in groups of their own, watched, and ended all together.
import { spawn } from 'node:child_process';
import { existsSync, mkdirSync, openSync, closeSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { root } from './places';
import { endGroup, Trouble } from './step';

type Child = { name: string; pid: number; ended: Promise<number | null> };
type Note = { pid: number; run: string; groups: number[]; build: string };

/** Node's own arguments for a script in TypeScript, without a compiler in between that would have to pass on signals. */
export const script = (path: string): string[] => [process.execPath, '--conditions=react-server', '--import', 'tsx', path];

export class Processes {
  private children: Child[] = [];
  private stopping = false;
  private readonly run = `${process.pid}-${Date.now()}`;
  /** Told when one ends by itself. */
  onDeath: (why: Trouble) => void = () => undefined;

  /** `folder` (under .tmp) gets a log for each process and a note of what runs. `build` is kept while it is in use. */
  constructor(private readonly folder: string, private readonly build: string) {
    mkdirSync(join(root, folder), { recursive: true });
  }

  start(name: string, [file = '', ...args]: string[], env: Record<string, string>): void {
    const log = openSync(this.logOf(name), 'w');
    const child = spawn(file, args, { cwd: root, detached: true, stdio: ['ignore', log, log], env: { NODE_ENV: 'production', ...inherited(), ...env, LEAFHALT_RUN: this.run } });
    closeSync(log);
    const ended = new Promise<number | null>((resolve) => {
      child.on('error', () => resolve(null));
      child.on('exit', (code) => resolve(code));
    });
    if (child.pid === undefined) throw new Trouble(`The ${name} could not be started: ${file} is not there.`);
    this.children.push({ name, pid: child.pid, ended });
    this.writeNote();
    void ended.then(() => {
      if (!this.stopping) this.onDeath(new Trouble(`The ${name} has stopped by itself.${this.lastWords(name)}`));
    });
  }

  /** Ends a single process and waits; for tests that look at what happens then. */
  async end(name: string, signal: NodeJS.Signals = 'SIGTERM'): Promise<void> {
    const child = this.children.find((one) => one.name === name);
    if (!child) return;
    this.children = this.children.filter((one) => one !== child);
    const quiet = this.onDeath;
    this.onDeath = () => undefined;
    endGroup(child.pid, signal);
    await child.ended;
    this.onDeath = quiet;
  }

  /** Asks all to end, last started first asked, and does not wait for ever. */
  async stop(patienceMs = 20_000): Promise<void> {
    this.stopping = true;
    for (const { pid } of this.children.toReversed()) endGroup(pid, 'SIGTERM');
    const all = Promise.all(this.children.map((child) => child.ended));
    const late = setTimeout(() => this.kill(), patienceMs);
    await all;
    clearTimeout(late);
    this.kill(); // grandchildren that outlived their parent
    rmSync(join(root, this.folder, 'run.json'), { force: true });
  }

  kill(): void {
    this.stopping = true;
    for (const { pid } of this.children) endGroup(pid, 'SIGKILL');
  }

  lastWords(name: string): string {
    const log = this.logOf(name);
    const lines = existsSync(log) ? readFileSync(log, 'utf8').trim().split('\n').slice(-8) : [];
    return `${lines.length > 0 ? ` Its last words:\n${lines.map((line) => `    ${line}`).join('\n')}\n` : ''} The whole log is ${log.slice(root.length + 1)}.`;
  }

  private logOf = (name: string) => join(root, this.folder, `${name.replaceAll(' ', '-')}.log`);

  private writeNote() {
    const note: Note = { pid: process.pid, run: this.run, groups: this.children.map((child) => child.pid), build: this.build };
    writeFileSync(join(root, this.folder, 'run.json'), JSON.stringify(note));
  }
}

/**
 * What `folder` notes of a run: the process that leads it, if it lives. What a killed run has left behind is ended
 * first, and then `leftovers` is true: its PostgreSQL may be running too.
 */
export async function lastRun(folder: string): Promise<{ living: number | null; leftovers: boolean }> {
  const file = join(root, folder, 'run.json');
  if (!existsSync(file)) return { living: null, leftovers: false };
  const note: Note = JSON.parse(readFileSync(file, 'utf8'));
  const ours = note.groups.filter((pid) => belongs(pid, note.run));
  if (environmentOf(note.pid) !== null && note.pid !== process.pid && ours.length > 0) return { living: note.pid, leftovers: false };
  for (const pid of ours) endGroup(pid, 'SIGKILL');
  for (let waits = 0; waits < 50 && ours.some((pid) => belongs(pid, note.run)); waits += 1) await new Promise((resolve) => setTimeout(resolve, 50));
  rmSync(file, { force: true });
  return { living: null, leftovers: true };
}

/** Whether a process is one of that run: numbers are used again, so its environment is asked. */
const belongs = (pid: number, run: string) => environmentOf(pid)?.includes(`LEAFHALT_RUN=${run}\0`) ?? false;

function environmentOf(pid: number): string | null {
  try {
    return readFileSync(`/proc/${pid}/environ`, 'utf8');
  } catch {
    return null;
  }
}

/** Settings of this shell that have nothing to do with the portal; its own come from the stack alone. */
function inherited(): Record<string, string> {
  const names = ['PATH', 'HOME', 'USER', 'LANG', 'LC_ALL', 'TMPDIR', 'NODE_OPTIONS', 'SSL_CERT_FILE', 'NODE_EXTRA_CA_CERTS'];
  return Object.fromEntries(names.flatMap((name) => (process.env[name] === undefined ? [] : [[name, process.env[name] ?? '']])));
}
