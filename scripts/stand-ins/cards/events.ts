// Events: kept for asking, and sent signed to the club's webhook until it accepts them.
import { createHmac } from 'node:crypto';
import type { Event } from './shapes';
import { newId, type Store } from './store';

/** How the test at hand wants its webhooks; by itself: one copy of each, at once, in the order of happening. */
export type Manner = { copies: number; delayMs: number; hold: boolean };
export const plainly = (): Manner => ({ copies: 1, delayMs: 0, hold: false });

export type Cause = { requestId: string | null; key: string | null; apiVersion: string };

/** Seconds until the next try; after the last it is given up, and only asking finds the event. */
const RETRY_AFTER = [1, 2, 5, 10, 30, 60, 300, 1800, 3600, 3 * 3600, 6 * 3600, 12 * 3600, 24 * 3600, 24 * 3600];

export class Events {
  manner = plainly();
  private timer: NodeJS.Timeout | null = null;
  private busy = new Set<string>();
  private stopped = false;

  constructor(private readonly store: Store, private readonly hook: { url: string; secret: string } | null) {}

  /** Keeps an event about `object` as it is now, and puts its delivery in line. */
  happened(type: string, object: object, cause: Cause, previous?: object) {
    const event: Event = {
      id: newId('evt_1'), object: 'event', api_version: cause.apiVersion, created: this.store.now(), livemode: false,
      pending_webhooks: this.hook ? 1 : 0, type, request: { id: cause.requestId, idempotency_key: cause.key },
      data: { object: structuredClone(object), ...(previous && { previous_attributes: previous }) },
    };
    this.store.put('event', event);
    if (!this.hook) return;
    for (let copy = 0; copy < this.manner.copies; copy += 1) {
      const due = this.manner.hold ? Number.MAX_SAFE_INTEGER : Date.now() + this.manner.delayMs;
      this.store.put('delivery', { id: newId('dlv_'), event: event.id, tries: 0, due });
    }
    this.wake();
  }

  /** Sends what was held back, oldest or newest first, and waits until each was answered. */
  async release(order: 'made' | 'reversed', copies: number) {
    const held = this.store.all('delivery').filter((delivery) => delivery.due === Number.MAX_SAFE_INTEGER);
    for (const delivery of order === 'made' ? held : held.reverse()) {
      this.store.put('delivery', { ...delivery, due: Date.now() });
      for (let copy = 0; copy < copies; copy += 1) await this.send(delivery.event);
      await this.deliver(delivery.id);
    }
  }

  /** Lets what was held back be forgotten, as if it had been lost on the way. */
  lose() {
    for (const { id, due } of this.store.all('delivery')) if (due === Number.MAX_SAFE_INTEGER) this.store.drop('delivery', id);
  }

  /** Deliveries not accepted yet, those held back included. */
  waiting(): number {
    return this.store.all('delivery').length;
  }

  wake() {
    if (this.timer) clearTimeout(this.timer);
    const next = Math.min(...this.store.all('delivery').filter(({ id }) => !this.busy.has(id)).map((delivery) => delivery.due));
    if (this.stopped || next >= Number.MAX_SAFE_INTEGER) return;
    this.timer = setTimeout(() => void this.deliverDue(), Math.max(0, Math.min(next - Date.now(), 60_000)));
  }

  stop() {
    this.stopped = true;
    if (this.timer) clearTimeout(this.timer);
  }

  private async deliverDue() {
    const due = this.store.all('delivery').filter((delivery) => delivery.due <= Date.now() && !this.busy.has(delivery.id));
    await Promise.all(due.map((delivery) => this.deliver(delivery.id)));
    this.wake();
  }

  private async deliver(id: string) {
    const delivery = this.store.find('delivery', id);
    if (!delivery || this.busy.has(id)) return;
    this.busy.add(id);
    const accepted = await this.send(delivery.event);
    this.busy.delete(id);
    const wait = RETRY_AFTER[delivery.tries];
    if (accepted || wait === undefined) {
      this.store.drop('delivery', id);
      const event = this.store.find('event', delivery.event);
      if (event && accepted) this.store.put('event', { ...event, pending_webhooks: 0 });
    } else {
      this.store.put('delivery', { ...delivery, tries: delivery.tries + 1, due: Date.now() + wait * 1000 });
    }
    this.wake();
  }

  private async send(eventId: string): Promise<boolean> {
    const event = this.store.find('event', eventId);
    if (!event || !this.hook) return true;
    const payload = JSON.stringify(event, null, 2);
    const at = Math.floor(Date.now() / 1000); // the true time, whatever clock a test has set: the SDK compares it with its own
    const signature = createHmac('sha256', this.hook.secret).update(`${at}.${payload}`).digest('hex');
    try {
      const answer = await fetch(this.hook.url, {
        method: 'POST', body: payload, redirect: 'manual', signal: AbortSignal.timeout(20_000),
        headers: { 'content-type': 'application/json; charset=utf-8', 'stripe-signature': `t=${at},v1=${signature}`, 'user-agent': 'cards stand-in' },
      });
      await answer.arrayBuffer();
      return answer.status >= 200 && answer.status < 300;
    } catch {
      return false;
    }
  }
}
