// The processor's HTTP interface: which address does what.
import { CardsError, missing } from './answer';
import type { Cards } from './cards';
import { parseForm, type Params } from './form';
import { expand, page, sameField } from './lists';
import type { Cause } from './events';

export type ApiRequest = { method: string; path: string; query: Params; body: string; headers: Record<string, string | undefined>; requestId: string };
export type ApiAnswer = { status: number; body: unknown; headers: Record<string, string> };

type Act = (cards: Cards, id: string, params: Params, cause: Cause, path: string) => object;

const ROUTES: [method: string, pattern: RegExp, act: Act][] = [
  ['POST', /^\/v1\/checkout\/sessions$/, (cards, _id, params) => cards.sessions.create(params)],
  ['GET', /^\/v1\/checkout\/sessions$/, (cards, _id, query, _cause, path) => page(cards.store.all('session'), query, path, (row, wanted) =>
    sameField('payment_intent', 'status')(row, wanted) && (typeof wanted['customer_details'] !== 'object' || row.customer_details?.email === wanted['customer_details']['email']))],
  ['GET', /^\/v1\/checkout\/sessions\/([^/]+)$/, (cards, id) => cards.sessions.get(id)],
  ['POST', /^\/v1\/checkout\/sessions\/([^/]+)\/expire$/, (cards, id, _params, cause) => cards.sessions.expire(id, cause)],
  ['GET', /^\/v1\/checkout\/sessions\/([^/]+)\/line_items$/, (cards, id, _query, _cause, path) =>
    ({ object: 'list', url: path, has_more: false, data: cards.sessions.lines(id) })],
  ['GET', /^\/v1\/payment_intents$/, (cards, _id, query, _cause, path) => page(cards.store.all('intent'), query, path, sameField('customer'))],
  ['GET', /^\/v1\/payment_intents\/([^/]+)$/, (cards, id) => cards.store.find('intent', id) ?? lacking('payment_intent', id)],
  ['GET', /^\/v1\/charges$/, (cards, _id, query, _cause, path) => page(cards.store.all('charge'), query, path, sameField('payment_intent'))],
  ['GET', /^\/v1\/charges\/([^/]+)$/, (cards, id) => cards.store.find('charge', id) ?? lacking('charge', id)],
  ['POST', /^\/v1\/refunds$/, (cards, _id, params, cause) => cards.refunds.create(params, cause)],
  ['GET', /^\/v1\/refunds$/, (cards, _id, query, _cause, path) => page(cards.store.all('refund'), query, path, sameField('payment_intent', 'charge'))],
  ['GET', /^\/v1\/refunds\/([^/]+)$/, (cards, id) => cards.store.find('refund', id) ?? lacking('refund', id)],
  ['GET', /^\/v1\/balance_transactions$/, (cards, _id, query, _cause, path) => page(cards.store.all('transaction'), query, path, sameField('type', 'source', 'currency'))],
  ['GET', /^\/v1\/balance_transactions\/([^/]+)$/, (cards, id) => cards.store.find('transaction', id) ?? lacking('balance_transaction', id)],
  ['GET', /^\/v1\/events$/, (cards, _id, query, _cause, path) => page(cards.store.all('event'), query, path, (row, wanted) => sameField('type')(row, wanted) && isOneOf(row.type, wanted['types']))],
  ['GET', /^\/v1\/events\/([^/]+)$/, (cards, id) => cards.store.find('event', id) ?? lacking('event', id)],
];

function lacking(kind: string, id: string): never {
  throw missing(kind, id);
}

const isOneOf = (type: string, types: Params[string] | undefined) => typeof types !== 'object' || Object.values(types).includes(type);

/** Answers one request to the interface. */
export async function answerApi(cards: Cards, request: ApiRequest): Promise<ApiAnswer> {
  const headers: Record<string, string> = { 'request-id': request.requestId, 'stripe-version': versionOf(request) };
  try {
    checkKey(request.headers['authorization']);
    const [route, match] = find(request);
    const key = request.method === 'POST' ? (request.headers['idempotency-key'] ?? null) : null;
    if (key) headers['idempotency-key'] = key;
    const params = request.method === 'POST' ? parseForm(request.body) : request.query;
    const cause: Cause = { requestId: request.requestId, key, apiVersion: versionOf(request) };
    const { expand: wanted, ...rest } = params;
    const answer = await cards.keys.once(key, request.path, request.body, async () => {
      await cards.faults.before(request.path);
      cards.catchUp();
      const made = route[2](cards, decodeURIComponent(match[1] ?? ''), request.method === 'POST' ? rest : params, cause, request.path);
      return expand(made, wanted === undefined ? {} : { expand: wanted }, cards.store);
    });
    if (answer.replayed) headers['idempotent-replayed'] = 'true';
    if (answer.status >= 500) headers['stripe-should-retry'] = 'false'; // the same key would get the same answer
    return { status: answer.status, body: answer.body, headers };
  } catch (error) {
    if (!(error instanceof CardsError)) throw error;
    return { status: error.status, body: error.body, headers };
  }
}

function find(request: ApiRequest) {
  for (const route of ROUTES) {
    const match = route[0] === request.method ? route[1].exec(request.path) : null;
    if (match) return [route, match] as const;
  }
  throw new CardsError(404, `Nothing is done at ${request.method} ${request.path}.`, { stored: false });
}

function checkKey(authorization: string | undefined) {
  if (!/^Bearer (sk|rk)_test_\w{3,}$/.test(authorization ?? '')) {
    throw new CardsError(401, 'The key must be a test key, sk_test_ and some letters.', { stored: false });
  }
}

const versionOf = (request: ApiRequest) => request.headers['stripe-version'] ?? '2026-10-28.endive';
