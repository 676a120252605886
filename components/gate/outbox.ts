import { z } from 'zod';
import type { FactAnswers } from '@/lib/gate/schema';
import { FACT_KINDS } from '@/lib/core/words';
import type { GateFact } from '@/lib/gate/rules/facts';
import type { Keep } from './device';

const heads = z.number().int();
const keptFact = z.object({
  id: z.string(), kind: z.enum(FACT_KINDS), undoesId: z.string().nullable(), visitId: z.string().nullable(), adults: heads, children: heads, babes: heads,
  at: z.iso.datetime(), verdict: z.string().nullable(), reason: z.string().nullable(), isSent: z.boolean(),
});
/** A fact as this phone keeps it until the list holds it. `at` is by the phone's own clock. */
export type KeptFact = z.output<typeof keptFact>;
export type NewFact = Omit<KeptFact, 'isSent'>;

/** What this phone did and the server's list does not show yet. Facts leave it only when the list holds them. */
export type Outbox = {
  subscribe(listener: () => void): () => void;
  facts(): readonly KeptFact[];
  add(fact: NewFact): void;
  flush(): Promise<void>;
  drop(listed: ReadonlySet<string>): void;
};

type Send = (facts: readonly NewFact[]) => Promise<FactAnswers>;

/** Opens the outbox kept under `name`. `send` posts a batch; what fails to go stays, in the order it was done. */
export function openOutbox(keep: Keep, name: string, send: Send): Outbox {
  let facts = readKept(keep, name);
  let flushing: Promise<void> | null = null;
  const listeners = new Set<() => void>();
  const set = (next: readonly KeptFact[]) => {
    facts = next;
    keep.setItem(name, JSON.stringify(next));
    listeners.forEach((listener) => listener());
  };
  const sendAll = async () => {
    for (let batch = unsent(facts); batch.length > 0; batch = unsent(facts)) {
      const { answers } = await send(batch.map(toWire));
      const byId = new Map(answers.map((answer) => [answer.id, answer]));
      set(facts.map((fact) => answered(fact, byId.get(fact.id))));
      if (answers.length === 0) return;
    }
  };
  return {
    subscribe: (listener) => {
      listeners.add(listener);
      return () => listeners.delete(listener);
    },
    facts: () => facts,
    add: (fact) => {
      if (!facts.some(({ id }) => id === fact.id)) set([...facts, { ...fact, isSent: false }]); // a double tap is one fact
    },
    flush: () => (flushing ??= sendAll().finally(() => (flushing = null))),
    drop: (listed) => {
      const rest = facts.filter((fact) => !fact.isSent || !listed.has(fact.id));
      if (rest.length < facts.length) set(rest);
    },
  };
}

const BATCH = 100;
const unsent = (facts: readonly KeptFact[]) => facts.filter(({ isSent }) => !isSent).slice(0, BATCH);

/** What the server turned down is a refusal from now on, here too. */
const answered = (fact: KeptFact, answer: FactAnswers['answers'][number] | undefined): KeptFact =>
  answer === undefined ? fact : { ...fact, isSent: true, kind: answer.outcome === 'refused' ? 'refuse' : fact.kind, verdict: answer.outcome === 'refused' ? answer.reason : fact.verdict };

function readKept(keep: Keep, name: string): readonly KeptFact[] {
  try {
    return z.array(keptFact).parse(JSON.parse(keep.getItem(name) ?? '[]'));
  } catch {
    return []; // not ours
  }
}

const toWire = ({ id, kind, undoesId, visitId, adults, children, babes, at, verdict, reason }: KeptFact): NewFact =>
  ({ id, kind, undoesId, visitId, adults, children, babes, at, verdict, reason });

/** A kept fact as the fold reads it; `offsetMs` sets the phone's clock right. */
export function toGateFact(kept: KeptFact, deviceId: string, offsetMs: number): GateFact {
  const { id, kind, visitId, adults, children, babes, reason } = kept;
  const undoesId = kind === 'undo' ? kept.undoesId : null;
  return { id, kind, undoesId, visitId, adults, children, babes, reason, deviceId, at: new Date(Date.parse(kept.at) + offsetMs) };
}
