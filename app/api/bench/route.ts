import { isMeasured, selectOne } from '@/lib/infra/bench';

const NOT_HERE = { status: 404, headers: { 'Cache-Control': 'no-store' } };

/** What the benchmarks compare with: a handler that does nothing. Outside the tests there is no such address. */
export async function GET(): Promise<Response> {
  return isMeasured() ? Response.json({ ok: true }) : new Response(null, NOT_HERE);
}

/** The same for writing: the body is read, and the database is asked the least it can be. */
export async function POST(request: Request): Promise<Response> {
  if (!isMeasured()) return new Response(null, NOT_HERE);
  const body: unknown = await request.json();
  await selectOne();
  return Response.json({ ok: body !== null });
}
