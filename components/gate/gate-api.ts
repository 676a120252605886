import type { z } from 'zod';
import { deviceNumber, factAnswers, gateList, gatePlace, ticketReading, type FactAnswers, type GateList, type GatePlace } from '@/lib/gate/schema';

/** The server's clear no, with its sentence. Anything else that goes wrong is an ordinary error: no signal, most likely. */
export class GateRefused extends Error {
  constructor(readonly code: string, sentence: string) {
    super(sentence);
  }
}

type Ask = { path: string; key?: string; body?: unknown; method: 'GET' | 'POST' };

async function ask<S extends z.ZodType>({ path, key, body, method }: Ask, schema: S): Promise<z.output<S>> {
  const response = await fetch(`/api/gate/${path}`, {
    method,
    cache: 'no-store',
    headers: { ...(key ? { Authorization: `Bearer ${key}` } : {}), ...(body === undefined ? {} : { 'Content-Type': 'application/json' }) },
    ...(body === undefined ? {} : { body: JSON.stringify(body) }),
    signal: AbortSignal.timeout(12_000),
  });
  const answer: unknown = await response.json();
  if (response.ok) return schema.parse(answer);
  if (isRefusal(answer)) throw new GateRefused(answer.refused, answer.message);
  throw new Error(`the gate was answered ${response.status}`);
}

const isRefusal = (answer: unknown): answer is { refused: string; message: string } =>
  typeof answer === 'object' && answer !== null && 'refused' in answer && typeof answer.refused === 'string' && 'message' in answer && typeof answer.message === 'string';

type Batch = { phoneTime: string; listVersion: string; facts: readonly unknown[] };

/** What the gate asks the server, each answer checked against the wire format. */
export const gateApi = {
  exchange: async (secret: string, key: string): Promise<void> => void (await ask({ method: 'POST', path: 'device', body: { secret, deviceKey: key } }, deviceNumber)),
  list: (key: string): Promise<GateList> => ask({ method: 'GET', path: 'list', key }, gateList),
  send: (key: string, batch: Batch): Promise<FactAnswers> => ask({ method: 'POST', path: 'facts', key, body: batch }, factAnswers),
  readTicket: (key: string, text: string): Promise<z.output<typeof ticketReading>> => ask({ method: 'POST', path: 'ticket', key, body: { text } }, ticketReading),
  place: (key: string): Promise<GatePlace> => ask({ method: 'POST', path: 'place', key, body: {} }, gatePlace),
};
