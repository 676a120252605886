// What the processor answers when it says no. The words are ours; type, code, param and status are what the SDK reads.

type Facts = { type?: string; code?: string; param?: string; declineCode?: string; stored?: boolean; more?: Record<string, unknown> };

/** A refusal with its HTTP status. `stored` is false when nothing was begun, so that the same key may be used again. */
export class CardsError extends Error {
  readonly stored: boolean;
  readonly body: Record<string, unknown>;

  constructor(readonly status: number, message: string, facts: Facts = {}) {
    super(message);
    this.stored = facts.stored ?? true;
    const { type = 'invalid_request_error', code, param, declineCode, more } = facts;
    this.body = { error: { type, message, ...(code && { code }), ...(param && { param }), ...(declineCode && { decline_code: declineCode }), ...more } };
  }
}

/** The object is not there: 404, as for any id the processor does not know. */
export const missing = (kind: string, id: string, param = 'id') =>
  new CardsError(404, `There is no ${kind} with the id ${id}.`, { code: 'resource_missing', param });

/** A parameter is wrong before anything was done: 400, and the answer is not kept under the key. */
export const badParam = (param: string, message: string, code?: string) =>
  new CardsError(400, message, { param, stored: false, ...(code && { code }) });
