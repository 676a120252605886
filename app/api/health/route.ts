import { isDatabaseThere } from '@/lib/infra/health';

/** Answers before anyone is known: no actor, no club, only whether the database does. */
export async function GET(): Promise<Response> {
  const ok = await isDatabaseThere();
  return Response.json({ ok, database: ok ? 'ok' : 'down' }, { status: ok ? 200 : 503, headers: { 'Cache-Control': 'no-store' } });
}
