import 'server-only';
import { unstable_rethrow } from 'next/navigation';
import { NextResponse, type NextRequest } from 'next/server';
import { z } from 'zod';
import { isReadableAddress } from '@/lib/core/readable-address';
import { Refusal } from '@/lib/core/refusal';
import type { Ctx, GateActor, SystemActor } from '@/lib/infra/context';
import { readClock } from '@/lib/infra/clock';
import { env } from '@/lib/infra/env';
import { log } from '@/lib/infra/log';
import { findGateActor } from '@/lib/gate/access';
import { hashSecret } from '@/lib/infra/secrets';
import { groundContext, requestContext, systemContext } from './context';
import { fieldErrorsOf, statusOf } from './problems';
import type { ActorFor, Requires } from './requires';

/** Who a route handler answers: as an action does, or a `gate` phone by its key, or a `machine` that proves itself. */
export type RouteRequires = Requires | 'gate' | 'machine';
type RouteActor<R extends RouteRequires> = R extends 'gate' ? GateActor : R extends 'machine' ? SystemActor : R extends Requires ? ActorFor<R> : never;

/** What a handler is given to begin with: all of it, or the `ground` without the club's settings, which its command reads itself. */
type Given = 'club' | 'ground';
type GivenCtx<R extends RouteRequires, G extends Given> = G extends 'ground' ? Omit<Ctx<RouteActor<R>>, 'club'> : Ctx<RouteActor<R>>;

type Asked<R extends RouteRequires, S, G extends Given> = { ctx: GivenCtx<R, G>; input: S; params: Record<string, string>; request: NextRequest; body: string };

/** What a route is made of. `name` is its pattern, for the log; `input` parses the JSON body, or the query of a GET. */
export type RouteParts<R extends RouteRequires, S extends z.ZodType, G extends Given = 'club'> = {
  name: string;
  requires: R;
  input?: S;
  maxBytes?: number;
  raw?: boolean; // the body is handed over as text, for signatures
  keepMs?: number; // a GET without input that says the same to everyone: one answer a process and address for so long
  given?: G;
  run: (asked: Asked<R, z.output<S>, G>) => Promise<Response | object>;
};

const privately = { 'Cache-Control': 'private, no-store' };
const say = (status: number, body: object) => NextResponse.json(body, { status, headers: privately });

/** Builds a route handler, the one way there is: origin, size, actor, schema, command, status. */
export function route<R extends RouteRequires, S extends z.ZodType = z.ZodType<undefined>, G extends Given = 'club'>(parts: RouteParts<R, S, G>) {
  const kept = parts.keepMs === undefined ? null : keepingAnswers(parts.keepMs);
  return async function handle(request: NextRequest, segment: { params: Promise<Record<string, string> | undefined> }): Promise<Response> {
    if (kept === null) return answer(request, segment);
    const { status, bytes } = await kept(request.nextUrl.pathname, async () => {
      const made = await answer(request, segment);
      return { status: made.status, bytes: new Uint8Array(await made.arrayBuffer()) };
    });
    return new Response(bytes, { status, headers: keptHeaders });
  };

  async function answer(request: NextRequest, segment: { params: Promise<Record<string, string> | undefined> }): Promise<Response> {
    try {
      const asked = await readRequest(parts, request, (await segment.params) ?? {}); // a path without a variable part has none
      if (asked instanceof Response) return asked;
      const said = await parts.run(asked);
      return said instanceof Response ? said : NextResponse.json(said, { headers: privately });
    } catch (error) {
      unstable_rethrow(error);
      if (error instanceof Refusal) return say(statusOf(error.code), { refused: error.code, message: error.sentence, fields: error.detail.fields ?? {} });
      log.error('route failed', error, { route: parts.name });
      return say(500, { message: 'That did not work, and nothing was changed. Try again in a moment.' });
    }
  }
}

type KeptAnswer = { status: number; bytes: Uint8Array<ArrayBuffer> };
const keptHeaders = { ...privately, 'Content-Type': 'application/json' };
const ADDRESSES_KEPT = 50; // a club has a few open days; anything else is someone guessing

/** Gives everyone who asks for an address within `ms` one answer: a hundred phones at once are one query. Failures are not kept. */
function keepingAnswers(ms: number) {
  const kept = new Map<string, { from: number; answer: Promise<KeptAnswer> }>();
  return async (address: string, ask: () => Promise<KeptAnswer>): Promise<KeptAnswer> => {
    const now = readClock().getTime();
    const known = kept.get(address);
    if (known && now >= known.from && now < known.from + ms) return known.answer;
    if (kept.size >= ADDRESSES_KEPT) kept.clear();
    const answer = ask();
    kept.set(address, { from: now, answer });
    const { status } = await answer;
    if (status !== 200) kept.delete(address);
    return answer;
  };
}

async function readRequest<R extends RouteRequires, S extends z.ZodType, G extends Given>(parts: RouteParts<R, S, G>, request: NextRequest, params: Record<string, string>) {
  const writes = request.method !== 'GET' && request.method !== 'HEAD';
  if (writes && parts.requires !== 'machine' && parts.requires !== 'gate' && !isSameOrigin(request)) throw new Refusal('wrong_origin');
  if (!isReadableAddress(request.nextUrl)) return say(400, { message: 'That is not an address of ours.' });
  const body = writes ? await readBody(request, parts.maxBytes ?? 64 * 1024) : '';
  if (body === null) return say(413, { message: 'That is more than this address takes.' });
  const ctx = (await contextFor(parts, request, params)) as GivenCtx<R, G>; // contextFor answers with what R and G ask for
  if (!parts.input) return { ctx, input: undefined as z.output<S>, params, request, body }; // no schema: nothing is read
  const plain = writes && parts.raw !== true ? parseJson(body) : Object.fromEntries(request.nextUrl.searchParams);
  if (plain === BROKEN) return say(400, { message: 'That is not JSON.' });
  const parsed = parts.input.safeParse(plain);
  if (!parsed.success) return say(400, { message: 'Some of that is not right.', fields: fieldErrorsOf(parsed.error) });
  return { ctx, input: parsed.data, params, request, body };
}

/** The body as text, or null as soon as it is longer than `limit` bytes: what says nothing of its length is not kept either. */
async function readBody(request: NextRequest, limit: number): Promise<string | null> {
  const length = request.headers.get('content-length');
  if (length !== null) return Number(length) > limit ? null : request.text(); // the server takes no more than was announced
  const pieces: Uint8Array[] = [];
  let bytes = 0;
  for await (const piece of request.body ?? []) {
    bytes += piece.byteLength;
    if (bytes > limit) return null; // leaving the loop gives the stream up
    pieces.push(piece);
  }
  return new TextDecoder().decode(Buffer.concat(pieces));
}

const BROKEN = Symbol('broken JSON');
function parseJson(body: string): unknown {
  try {
    return JSON.parse(body);
  } catch {
    return BROKEN;
  }
}

async function contextFor({ requires, given }: { requires: RouteRequires; given?: Given }, request: NextRequest, params: Record<string, string>): Promise<Omit<Ctx, 'club'>> {
  if (requires === 'machine') return systemContext('handler');
  if (requires !== 'gate' && given === 'ground') return groundContext(requires);
  if (requires !== 'gate') return requestContext(requires, params['code'] === undefined ? {} : { code: params['code'] });
  const system = await systemContext('gate');
  const key = /^Bearer (.{40,100})$/.exec(request.headers.get('authorization') ?? '')?.[1];
  if (key === undefined) throw new Refusal('pass_unknown');
  return { ...system, actor: await findGateActor(system.db, hashSecret(key), system.now) };
}

/** Whether a writing request comes from our own pages (Origin, which browsers always send with it). */
export function isSameOrigin(request: NextRequest): boolean {
  const origin = request.headers.get('origin');
  return origin !== null && (origin === new URL(env().SITE_URL).origin || origin === `${request.nextUrl.protocol}//${request.headers.get('host')}`);
}
