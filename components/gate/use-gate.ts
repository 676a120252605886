import { useQuery, useQueryClient } from '@tanstack/react-query';
import { useEffect, useMemo, useState, useSyncExternalStore } from 'react';
import { foldFacts, type GateFold } from '@/lib/gate/rules/fold';
import type { GateList } from '@/lib/gate/schema';
import type { Keep } from './device';
import { gateApi, GateRefused } from './gate-api';
import { openOutbox, toGateFact, type NewFact } from './outbox';

const EVERY_MS = 10_000;

/** What the phone and the server know together, and how to add to it. */
export type Gate = {
  list: GateList;
  fold: GateFold;
  /** Now by the server's clock: the phone's may be wrong. */
  now: Date;
  hasSignal: boolean;
  /** How many facts wait here for a signal. */
  keptHere: number;
  /** Writes a fact down: shown at once, sent at once, kept here until the server has it. */
  record: (fact: Omit<NewFact, 'at'>) => void;
  readTicket: (text: string) => ReturnType<typeof gateApi.readTicket>;
  place: () => ReturnType<typeof gateApi.place>;
};

/** What the gate can show: its screen, why it is refused, or that it waits for its first list. */
export type GateState = { at: 'open'; gate: Gate } | { at: 'refused'; sentence: string } | { at: 'waiting'; hasSignal: boolean };

/** Keeps the gate's list fresh and its outbox empty. */
export function useGate(key: string, keep: Keep): GateState {
  const client = useQueryClient();
  const [queryKey] = useState(() => ['gate-list', key]);
  const listed = () => client.getQueryData<{ list: GateList; offsetMs: number }>(queryKey)?.list;
  const [outbox] = useState(() =>
    openOutbox(keep, `leafhalt-gate-facts-${key.slice(0, 8)}`, (facts) => gateApi.send(key, { phoneTime: new Date().toISOString(), listVersion: listed()?.version ?? '', facts })));
  const query = useQuery({
    queryKey,
    queryFn: async () => {
      outbox.drop(new Set(listed()?.facts.map(({ id }) => id)));
      await outbox.flush();
      const list = await gateApi.list(key);
      return { list, offsetMs: list.madeAt.getTime() - Date.now() };
    },
    refetchInterval: EVERY_MS,
    retry: false,
    networkMode: 'always',
  });
  const mine = useSyncExternalStore(outbox.subscribe, outbox.facts, outbox.facts);
  const phoneNow = useTicking();
  const fold = useMemo(() => {
    const { list, offsetMs } = query.data ?? { list: null, offsetMs: 0 };
    return foldFacts([...(list?.facts ?? []), ...mine.map((fact) => toGateFact(fact, list?.deviceId ?? '', offsetMs))]);
  }, [query.data, mine]);
  if (query.error instanceof GateRefused) return { at: 'refused', sentence: query.error.message };
  if (query.data === undefined) return { at: 'waiting', hasSignal: !query.isError };
  const { list, offsetMs } = query.data;
  const record = (fact: Omit<NewFact, 'at'>) => {
    outbox.add({ ...fact, at: new Date().toISOString() });
    void query.refetch();
  };
  return {
    at: 'open',
    gate: {
      list, fold, record, now: new Date(phoneNow + offsetMs), hasSignal: !query.isError, keptHere: mine.filter(({ isSent }) => !isSent).length,
      readTicket: (text) => gateApi.readTicket(key, text), place: () => gateApi.place(key),
    },
  };
}

/** The phone's clock, looked at every few seconds, so that "not yet" turns into "let in" by itself. */
function useTicking(): number {
  const [at, setAt] = useState(() => Date.now());
  useEffect(() => {
    const timer = setInterval(() => setAt(Date.now()), 2_000);
    return () => clearInterval(timer);
  }, []);
  return at;
}
