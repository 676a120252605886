// The stand-in's one HTTP server: the interface under /v1, the pay page under /pay, the tests' orders under /_control.
import { createServer, type IncomingMessage, type Server, type ServerResponse } from 'node:http';
import { ZodError } from 'zod';
import { CardsError } from './answer';
import { answerApi } from './api';
import type { Cards } from './cards';
import { answerControl } from './control';
import { parseForm } from './form';
import { answerPay } from './pay-page';
import { answerSheet } from '../sheet';
import { newId } from './store';

const BODY_LIMIT = 1024 * 1024;

/** Listens on 127.0.0.1 and tells the address. */
export async function serveCards(cards: Cards, port: number): Promise<{ server: Server; origin: string }> {
  const server = createServer((request, response) => {
    answer(cards, request, response).catch((error: unknown) => {
      const known = error instanceof CardsError || error instanceof ZodError || error instanceof SyntaxError;
      if (!known) console.error('cards stand-in', error);
      sendJson(response, error instanceof CardsError ? error.status : known ? 400 : 500, { error: { type: 'api_error', message: error instanceof Error ? error.message : 'unknown' } });
    });
  });
  server.keepAliveTimeout = 65_000;
  await new Promise<void>((resolve, reject) => server.once('error', reject).listen(port, '127.0.0.1', resolve));
  const address = server.address();
  const origin = `http://127.0.0.1:${typeof address === 'object' && address ? address.port : port}`;
  cards.origin = origin;
  return { server, origin };
}

async function answer(cards: Cards, request: IncomingMessage, response: ServerResponse) {
  const { pathname: path, search } = new URL(request.url ?? '/', cards.origin);
  const method = request.method ?? 'GET';
  const body = await bodyOf(request);
  if (answerSheet(path, response)) return;
  if (path === '/_health') return sendJson(response, 200, { ok: true });
  if (path === '/_control') return sendJson(response, 200, await answerControl(cards, method, body));
  if (path.startsWith('/v1/')) return api(cards, { request, response, method, path, search, body });
  cards.catchUp();
  const shown = answerPay(cards, method, path, body);
  if (!shown) return sendJson(response, 404, { error: { message: 'Nothing is here.' } });
  const headers = { 'content-type': 'text/html; charset=utf-8', 'cache-control': 'no-store', 'referrer-policy': 'no-referrer' };
  response.writeHead(shown.status, shown.location ? { location: shown.location } : headers).end(shown.html);
}

type Call = { request: IncomingMessage; response: ServerResponse; method: string; path: string; search: string; body: string };

async function api(cards: Cards, { request, response, method, path, search, body }: Call) {
  const headers = Object.fromEntries(Object.entries(request.headers).map(([name, value]) => [name, Array.isArray(value) ? value[0] : value]));
  const result = await answerApi(cards, { method, path, query: parseForm(search.slice(1)), body, headers, requestId: newId('req_', 14) });
  if (cards.faults.isLost(path)) {
    response.destroy();
    return;
  }
  sendJson(response, result.status, result.body, result.headers);
}

function sendJson(response: ServerResponse, status: number, body: unknown, headers: Record<string, string> = {}) {
  if (response.headersSent) return;
  response.writeHead(status, { 'content-type': 'application/json', ...headers }).end(JSON.stringify(body));
}

async function bodyOf(request: IncomingMessage): Promise<string> {
  const parts: Buffer[] = [];
  let size = 0;
  for await (const part of request) {
    size += part.length;
    if (size > BODY_LIMIT) throw new CardsError(413, 'The body is too large.', { stored: false });
    parts.push(part);
  }
  return Buffer.concat(parts).toString('utf8');
}
