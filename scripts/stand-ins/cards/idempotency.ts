// A repeated key gets the stored answer, failures included, for 24 hours; with other parameters it is refused.
import { createHash } from 'node:crypto';
import { CardsError } from './answer';
import type { Store } from './store';

const KEPT_SECONDS = 24 * 3600;

export type Answered = { status: number; body: unknown; replayed: boolean };

export class Idempotency {
  private underWay = new Set<string>();

  constructor(private readonly store: Store) {}

  /** Runs `act` at most once for a key, however often and however concurrently the request comes. */
  async once(key: string | null, path: string, body: string, act: () => Promise<object>): Promise<Answered> {
    if (key === null) return settle(act);
    if (key.length > 255) throw new CardsError(400, 'A key has at most 255 characters.', { stored: false });
    const request = createHash('sha256').update(`${path}\n${sorted(body)}`).digest('hex');
    const kept = this.store.find('key', key);
    if (kept && this.store.now() - kept.created < KEPT_SECONDS) {
      if (kept.request !== request) {
        throw new CardsError(400, `The key ${key} was first used with another request.`, { type: 'idempotency_error', stored: false });
      }
      return { status: kept.status, body: kept.body, replayed: true };
    }
    if (this.underWay.has(key)) {
      throw new CardsError(409, `A request with the key ${key} is still under way.`, { code: 'idempotency_key_in_use', type: 'idempotency_error', stored: false });
    }
    this.underWay.add(key);
    try {
      const answer = await settle(act);
      this.store.put('key', { id: key, created: this.store.now(), request, status: answer.status, body: answer.body });
      return answer;
    } finally {
      this.underWay.delete(key);
    }
  }
}

/** Failures that count as answers become one; those before anything was begun are thrown on. */
async function settle(act: () => Promise<object>): Promise<Answered> {
  try {
    return { status: 200, body: await act(), replayed: false };
  } catch (error) {
    if (error instanceof CardsError && error.stored) return { status: error.status, body: error.body, replayed: false };
    throw error;
  }
}

const sorted = (body: string) => body.split('&').sort().join('&');
