import { NextRequest } from 'next/server';
import { beforeAll, describe, expect, test, vi } from 'vitest';
import { GET as plate } from '@/app/(public)/gardens/[slug]/plate/route';
import { GET as largePrint } from '@/app/(public)/large-print/route';
import { aClub, aGarden } from '@/tests/support/cast';
import { asBrowser } from '@/tests/support/request';

vi.mock('next/headers', async () => (await import('@/tests/support/request')).frameworkHeaders());

const HERE = 'http://127.0.0.1:3000';
const press = (query: string, cookies: Record<string, string> = {}, referer?: string) =>
  asBrowser(cookies, () => largePrint(new NextRequest(`${HERE}/large-print${query}`, { headers: { host: '127.0.0.1:3000', ...(referer ? { referer } : {}) } }), { params: Promise.resolve({}) }));

beforeAll(() => aClub());

describe('large print', () => {
  test('goes back to the page that was asked for', async () => {
    const answer = await press('?to=/gardens%3Fscale=29%23index');

    expect([answer.status, answer.headers.get('location')]).toEqual([303, '/gardens?scale=29#index']);
  });

  test('goes back to the page the reader came from, when it is one of ours', async () => {
    expect((await press('', {}, `${HERE}/visiting#dogs`)).headers.get('location')).toBe('/visiting#dogs');
    expect((await press('', {}, 'https://elsewhere.example/visiting')).headers.get('location')).toBe('/');
  });

  test.each(['//elsewhere.example/x', '/\\elsewhere.example', 'https://elsewhere.example/', 'javascript:alert(1)', '/large-print', '\t//elsewhere.example', ''])('never sends anybody to %j', async (to) => {
    const answer = await press(`?to=${encodeURIComponent(to)}`);

    expect([answer.status, answer.headers.get('location')]).toEqual([303, '/']);
  });
});

describe('a plate’s own address', () => {
  const ask = (slug: string, query = '') => asBrowser({}, () => plate(new NextRequest(`${HERE}/gardens/${slug}/plate${query}`), { params: Promise.resolve({ slug }) }));

  test('answers with a picture that may be kept for good when its version is named', async () => {
    const { slug } = await aGarden();

    const [named, bare] = [await ask(slug, '?card=rose&v=abc'), await ask(slug)];

    expect(named.headers.get('content-type')).toBe('image/svg+xml; charset=utf-8');
    expect(named.headers.get('cache-control')).toContain('immutable');
    expect(bare.headers.get('cache-control')).not.toContain('immutable');
    expect(await named.text()).toContain('#f6d3d6');
  });

  test('is not there for a garden that is not published', async () => {
    const { slug } = await aGarden({ publishedAt: null });

    expect((await ask(slug)).status).toBe(404);
  });
});
