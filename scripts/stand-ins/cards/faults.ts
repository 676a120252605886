// Trouble on demand, for tests: slow answers, one 500 before anything was done, one answer lost after it was done.
import { CardsError } from './answer';

export type FaultPlan = { slowMs: number; failNext: number; dropNext: number; onlyPath: string | null };
const none = (): FaultPlan => ({ slowMs: 0, failNext: 0, dropNext: 0, onlyPath: null });

export class Faults {
  plan = none();

  clear() {
    this.plan = none();
  }

  /** Before a request is carried out: waits, or fails in the processor's own way. */
  async before(path: string) {
    if (!this.concerns(path)) return;
    if (this.plan.slowMs > 0) await new Promise((resolve) => setTimeout(resolve, this.plan.slowMs));
    if (this.plan.failNext > 0) {
      this.plan.failNext -= 1;
      throw new CardsError(500, 'Something is wrong on our side.', { type: 'api_error' });
    }
  }

  /** After it was carried out: true when the answer is to be lost on the way. */
  isLost(path: string): boolean {
    if (!this.concerns(path) || this.plan.dropNext <= 0) return false;
    this.plan.dropNext -= 1;
    return true;
  }

  private concerns(path: string): boolean {
    return this.plan.onlyPath === null || path.includes(this.plan.onlyPath);
  }
}
