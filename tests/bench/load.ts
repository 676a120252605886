import { Agent, request } from 'node:http';
import { median } from './bench';

export type Answer = { status: number; body: string };
export type Send = { method?: 'GET' | 'POST'; path: string; headers?: Record<string, string>; body?: string };

/** A client that keeps `connections` connections to one server open. */
export function clientOf(site: string, connections: number) {
  const { hostname, port } = new URL(site);
  const agent = new Agent({ keepAlive: true, maxSockets: connections, maxFreeSockets: connections, scheduling: 'fifo' });
  return {
    async send({ method = 'GET', path, headers = {}, body }: Send): Promise<Answer> {
      return new Promise((resolve, reject) => {
        const length: Record<string, string> = body === undefined ? {} : { 'content-length': String(Buffer.byteLength(body)) };
        const call = request({ agent, hostname, port, method, path, headers: { ...length, ...headers } }, (response) => {
          const parts: Buffer[] = [];
          response.on('data', (part: Buffer) => parts.push(part));
          response.on('end', () => resolve({ status: response.statusCode ?? 0, body: Buffer.concat(parts).toString('utf8') }));
          response.on('error', reject);
        });
        call.on('error', reject);
        call.end(body);
      });
    },
    close: () => agent.destroy(),
  };
}

/** `act` again and again on so many connections at once for `ms`; returns how many ended each second. */
export async function rateOf(connections: number, ms: number, act: (connection: number) => Promise<void>): Promise<number> {
  const began = performance.now();
  let done = 0;
  await Promise.all(Array.from({ length: connections }, async (_none, connection) => {
    while (performance.now() - began < ms) {
      await act(connection);
      done += 1;
    }
  }));
  return (done * 1000) / (performance.now() - began);
}

export type Compared = { ratio: number; subject: number; bare: number };

/**
 * The rate of `subject` over that of `bare`, each in turn for `slices` slices, so that a busier minute of the machine
 * meets both; the median of the slices' ratios, and the median rates. One short slice of each goes before, uncounted.
 */
export async function compare(slices: number, subject: () => Promise<number>, bare: () => Promise<number>): Promise<Compared> {
  await bare();
  await subject();
  const pairs: { subject: number; bare: number }[] = [];
  for (let slice = 0; slice < slices; slice += 1) {
    const first = slice % 2 === 0;
    const bareFirst = first ? await bare() : null;
    const subjectRate = await subject();
    pairs.push({ subject: subjectRate, bare: bareFirst ?? (await bare()) });
  }
  return {
    ratio: median(pairs.map((pair) => pair.subject / pair.bare)),
    subject: median(pairs.map((pair) => pair.subject)),
    bare: median(pairs.map((pair) => pair.bare)),
  };
}
