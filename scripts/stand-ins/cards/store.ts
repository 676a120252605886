// Everything the stand-in knows, in memory, and in a file of one line a change so that a restart forgets nothing.
import { appendFileSync, existsSync, mkdirSync, readFileSync, renameSync, writeFileSync } from 'node:fs';
import { dirname } from 'node:path';
import { randomInt } from 'node:crypto';
import type { Kinds } from './shapes';

type Kind = keyof Kinds;
type Kept = { [K in Kind]: Map<string, Kinds[K]> };

const LETTERS = '0123456789ABCDEFGHIJKLMNOPQRSTUVWXYZabcdefghijklmnopqrstuvwxyz';

/** A new id with the processor's prefix. */
export const newId = (prefix: string, length = 24): string =>
  prefix + Array.from({ length }, () => LETTERS[randomInt(LETTERS.length)]).join('');

const empty = (): Kept => ({
  session: new Map(), details: new Map(), intent: new Map(), charge: new Map(), refund: new Map(), transaction: new Map(),
  event: new Map(), key: new Map(), delivery: new Map(),
});

export class Store {
  private kept = empty();
  /** Added to the machine's clock, in milliseconds; tests move it. */
  clockOffsetMs = 0;

  constructor(private readonly file: string | null) {
    if (!file) return;
    mkdirSync(dirname(file), { recursive: true });
    if (existsSync(file)) this.read(readFileSync(file, 'utf8'));
    this.rewrite();
  }

  /** Now, in whole seconds, as the processor counts. */
  now(): number {
    return Math.floor(this.nowMs() / 1000);
  }

  nowMs(): number {
    return Date.now() + this.clockOffsetMs;
  }

  find<K extends Kind>(kind: K, id: string): Kinds[K] | null {
    return this.kept[kind].get(id) ?? null;
  }

  /** All of a kind, oldest first. */
  all<K extends Kind>(kind: K): Kinds[K][] {
    return [...this.kept[kind].values()];
  }

  put<K extends Kind>(kind: K, value: Kinds[K]): Kinds[K] {
    this.kept[kind].set(value.id, value);
    this.append(`${JSON.stringify([kind, value])}\n`);
    return value;
  }

  drop(kind: Kind, id: string) {
    this.kept[kind].delete(id);
    this.append(`${JSON.stringify([kind, null, id])}\n`);
  }

  clear() {
    this.kept = empty();
    this.rewrite();
  }

  private append(line: string) {
    if (this.file) appendFileSync(this.file, line);
  }

  private read(text: string) {
    for (const line of text.split('\n')) {
      try {
        const [kind, value, id]: [Kind, { id: string } | null, string?] = JSON.parse(line);
        const map: Map<string, unknown> = this.kept[kind];
        if (value) map.set(value.id, value);
        else if (id) map.delete(id);
      } catch {
        continue; // the last line of a process that was killed while writing
      }
    }
  }

  /** One line for each thing that is still kept, put in place at once. */
  private rewrite() {
    if (!this.file) return;
    const lines = Object.entries(this.kept).flatMap(([kind, map]) => [...map.values()].map((value) => `${JSON.stringify([kind, value])}\n`));
    writeFileSync(`${this.file}.new`, lines.join(''));
    renameSync(`${this.file}.new`, this.file);
  }
}
