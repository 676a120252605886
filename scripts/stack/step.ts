// Long steps, with a line that shows they are running; and the sentence that ends a run when one cannot be done.
import { spawn } from 'node:child_process';
import { statfsSync, writeFileSync } from 'node:fs';
import { stripVTControlCharacters } from 'node:util';
import { root } from './places';

/** What is wrong and what to do next, in one sentence each; the run ends with it. */
export class Trouble extends Error {}

const HEARTBEAT_SECONDS = 15;

/** Does one step. A terminal sees the seconds go by, a log a line now and then; a step under a second says nothing. */
export async function step<T>(label: string, work: () => Promise<T>): Promise<T> {
  const began = Date.now();
  const seconds = () => Math.round((Date.now() - began) / 1000);
  const terminal = process.stdout.isTTY;
  let shown = 0;
  const timer = setInterval(() => {
    if (terminal) process.stdout.write(`\r  ${label} … ${seconds()} s`);
    else if (shown === 0 || seconds() >= shown + HEARTBEAT_SECONDS) process.stdout.write(`  ${label} … ${(shown = seconds())} s\n`);
  }, 1000);
  try {
    return await work();
  } finally {
    clearInterval(timer);
    if (terminal) process.stdout.write('\r\u001b[K');
    if (seconds() >= 1) process.stdout.write(`  ${label}: ${seconds()} s\n`);
  }
}

type Command = { cwd?: string; env?: NodeJS.ProcessEnv; signal?: AbortSignal };

/** Runs a command quietly and gives what it printed; a failure says what was being done and the command's last words. */
export async function command(doing: string, [file = '', ...args]: string[], options: Command = {}): Promise<string> {
  return new Promise((resolve, reject) => {
    // A group of its own: Ctrl-C in the terminal reaches us alone, and we end the group.
    const env = { ...(options.env ?? process.env), NO_COLOR: '1' };
    const child = spawn(file, args, { ...(options.cwd !== undefined && { cwd: options.cwd }), env, detached: true, stdio: ['ignore', 'pipe', 'pipe'] });
    const end = () => child.pid && endGroup(child.pid, 'SIGTERM');
    options.signal?.addEventListener('abort', end, { once: true });
    let out = '';
    let all = '';
    child.stdout.on('data', (part: Buffer) => { out += part.toString(); all += part.toString(); });
    child.stderr.on('data', (part: Buffer) => { all += part.toString(); });
    child.on('error', (error) => reject(new Trouble(`${doing} did not work: ${error.message}.`)));
    child.on('close', (code) => {
      options.signal?.removeEventListener('abort', end);
      if (code === 0) resolve(out);
      else reject(new Trouble(whyFailed(doing, all)));
    });
  });
}

/** A sentence for a failed command: a full disk is named as such, otherwise what it complained of is shown. */
export function whyFailed(doing: string, output: string): string {
  if (/ENOSPC|No space left on device/i.test(output)) return `${doing} did not work because the disk is full. Make room, then start again.`;
  const lines = stripVTControlCharacters(output).split('\n').filter((line) => line.trim() !== '');
  const complaint = lines.findIndex((line) => /error|failed|cannot|can't/i.test(line));
  const shown = complaint < 0 ? lines.slice(-12) : lines.slice(complaint, complaint + 12);
  writeFileSync(`${root}/.tmp/failed.log`, output);
  return `${doing} did not work; the whole output is in .tmp/failed.log:\n${shown.map((line) => `    ${line}`).join('\n')}`;
}

/** Sends a signal to a process and all its children; one that is gone already is fine. */
export function endGroup(pid: number, signal: NodeJS.Signals): void {
  try {
    process.kill(-pid, signal);
  } catch {
    return;
  }
}

/** Stops before a long step fails half-way: the disk must have this much room. */
export function needRoom(folder: string, megabytes: number): void {
  const { bavail, bsize } = statfsSync(folder);
  const free = Math.floor((bavail * bsize) / 1024 ** 2);
  if (free < megabytes) throw new Trouble(`The disk is nearly full: ${free} MB are free and ${megabytes} MB are needed. Make room, then start again.`);
}
