import { z } from 'zod';
import { readsLargePrint, setLargePrint, setUsualPrint } from '@/lib/web/cookies';
import { route } from '@/lib/web/route';

const HERE = 'http://here.example';

/** The path of an address on this site, or null for any other: `//elsewhere` and `/\elsewhere` are other sites to a browser. */
function ownPath(address: string | null | undefined, origin: string): string | null {
  if (!address || !URL.canParse(address, origin)) return null;
  const { origin: found, pathname, search, hash } = new URL(address, origin);
  return found !== origin || pathname === '/large-print' ? null : `${pathname}${search}${hash}`;
}

/** The page the reader came from, when their browser says so and it is one of ours. */
function cameFrom(request: Request): string | null {
  const referer = request.headers.get('referer');
  if (!referer || !URL.canParse(referer)) return null;
  const from = new URL(referer);
  return from.host === request.headers.get('host') ? ownPath(referer, from.origin) : null;
}

/** Turns large print on or off for this browser, and goes back. */
export const GET = route({
  name: '/large-print',
  requires: 'anyone',
  input: z.object({ to: z.string().max(2000).optional() }),
  run: async ({ input, request }) => {
    await ((await readsLargePrint()) ? setUsualPrint() : setLargePrint());
    const back = ownPath(input.to, HERE) ?? cameFrom(request) ?? '/';
    return new Response(null, { status: 303, headers: { Location: back, 'Cache-Control': 'private, no-store' } }); // a path: no proxy can bend it
  },
});
