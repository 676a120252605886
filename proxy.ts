import { NextResponse, type NextRequest } from 'next/server';
import { isReadableAddress } from '@/lib/core/readable-address';

const MAX_FORM_BYTES = 1024 * 1024;

/** Gives each page its nonce and its Content-Security-Policy, and turns away forms from other websites. */
export function proxy(request: NextRequest) {
  if (!isReadableAddress(request.nextUrl)) return new Response('That is not an address of ours. Begin at the first page.', { status: 400 });
  if (request.method === 'POST') {
    const refused = refusePost(request);
    if (refused) return refused;
  }
  const nonce = Buffer.from(crypto.randomUUID()).toString('base64');
  const policy = contentSecurityPolicy(nonce);
  const headers = new Headers(request.headers);
  headers.set('x-nonce', nonce);
  headers.set('x-request-id', crypto.randomUUID());
  headers.set('x-path', request.nextUrl.pathname);
  headers.set('content-security-policy', policy);
  const response = NextResponse.next({ request: { headers } });
  response.headers.set('content-security-policy', policy);
  if (siteOrigin()?.startsWith('https:')) response.headers.set('strict-transport-security', 'max-age=31536000'); // a year (RFC 6797 section 6.1)
  return response;
}

/** The site's own origin; its address may be set with a path or a slash at the end. */
const siteOrigin = (): string | null => (process.env.SITE_URL === undefined ? null : new URL(process.env.SITE_URL).origin);

function refusePost(request: NextRequest): Response | null {
  const origin = request.headers.get('origin');
  if (origin !== null && origin !== `${request.nextUrl.protocol}//${request.headers.get('host')}` && origin !== siteOrigin()) {
    return new Response('That came from another website, so it was not done. Open the page again and try from there.', { status: 403 });
  }
  if (Number(request.headers.get('content-length') ?? 0) > MAX_FORM_BYTES) {
    return new Response('That is more than this page takes. Shorten it and send it again.', { status: 413 });
  }
  return null;
}

function contentSecurityPolicy(nonce: string): string {
  const dev = process.env.NODE_ENV === 'development';
  return [
    "default-src 'self'",
    `script-src 'self' 'nonce-${nonce}' 'strict-dynamic' 'wasm-unsafe-eval'${dev ? " 'unsafe-eval'" : ''}`, // wasm: the scanner
    `style-src 'self' ${dev ? "'unsafe-inline'" : `'nonce-${nonce}'`}`,
    "style-src-attr 'unsafe-inline'", // style={{…}} and the map set style attributes
    "img-src 'self' blob: data:", "font-src 'self'", "worker-src 'self'", `connect-src 'self'${dev ? ' ws:' : ''}`,
    "object-src 'none'", "base-uri 'self'", "frame-ancestors 'none'",
    `form-action 'self' ${process.env.PAY_ORIGIN ?? 'https://checkout.stripe.com'}`, // a form post may end on the pay page
  ].join('; ');
}

export const config = {
  matcher: [{
    source: '/((?!api|_next/static|_next/image|vendor|valley|icons|favicon.ico|sw.js).*)',
    missing: [{ type: 'header', key: 'next-router-prefetch' }, { type: 'header', key: 'purpose', value: 'prefetch' }],
  }],
};
