// The whole stand-in, put together: what is kept, what happens, and what time brings.
import { readFileSync } from 'node:fs';
import { Events, type Cause } from './events';
import { Faults } from './faults';
import { Idempotency } from './idempotency';
import { Payments } from './payments';
import { Refunds } from './refunds';
import { Sessions } from './sessions';
import { Store } from './store';

export type CardsSettings = {
  /** Where everything is kept; null for memory alone. */
  file: string | null;
  /** The club's webhook, and the secret that signs for it; null when nobody listens. */
  hook: { url: string; secret: string } | null;
  /** A file with an offset in milliseconds that a test shares with the server and the worker. */
  clockOffsetFile: string | null;
};

export class Cards {
  readonly store: Store;
  readonly events: Events;
  readonly sessions: Sessions;
  readonly payments: Payments;
  readonly refunds: Refunds;
  readonly keys: Idempotency;
  readonly faults = new Faults();
  /** Where this stand-in itself is found; known once it listens. */
  origin = '';
  private readonly ticker: NodeJS.Timeout;

  constructor(private readonly settings: CardsSettings) {
    this.store = new Store(settings.file);
    this.events = new Events(this.store, settings.hook);
    this.sessions = new Sessions(this.store, this.events, () => this.origin);
    this.payments = new Payments(this.store, this.events);
    this.refunds = new Refunds(this.store, this.events);
    this.keys = new Idempotency(this.store);
    this.ticker = setInterval(() => this.catchUp(), 1000);
    this.events.wake();
  }

  /** What time has brought: sessions that ended, fees that are known now. */
  catchUp() {
    if (this.settings.clockOffsetFile) this.store.clockOffsetMs = offsetIn(this.settings.clockOffsetFile);
    const cause: Cause = { requestId: null, key: null, apiVersion: '2026-10-28.endive' };
    this.sessions.expireDue(cause);
    this.payments.settleDue(cause);
  }

  stop() {
    clearInterval(this.ticker);
    this.events.stop();
  }
}

function offsetIn(file: string): number {
  try {
    return Number(readFileSync(file, 'utf8')) || 0;
  } catch {
    return 0; // no file yet: no offset
  }
}
