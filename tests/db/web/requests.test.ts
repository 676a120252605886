import { NextRequest } from 'next/server';
import { afterEach, beforeAll, describe, expect, it, vi } from 'vitest';
import { asBrowser, frameworkHeaders, sessionOf } from '@/tests/support/request';
import { POST as postHold } from '@/app/api/holds/route';
import { GET as getPlate } from '@/app/(public)/gardens/[slug]/plate/route';
import { GET as getCalendar } from '@/app/(public)/bookings/[code]/calendar.ics/route';
import { GET as getRollFile } from '@/app/(office)/office/roll/csv/route';
import { proxy } from '@/proxy';
import { aClub, ben, wren } from '../../support/cast';

vi.mock('next/headers', () => frameworkHeaders());
beforeAll(() => aClub());

const SITE = 'http://127.0.0.1:3000';
const params = (values: Record<string, string>) => ({ params: Promise.resolve(values) });
const ask = (path: string) => new NextRequest(`${SITE}${path}`, { headers: { host: '127.0.0.1:3000' } });

/** A body that says nothing of its length and never ends; `sent` counts what was asked of it. */
function endless() {
  const count = { sent: 0 };
  const body = new ReadableStream<Uint8Array>({
    pull(controller) {
      count.sent += 8192;
      if (count.sent > 4 * 1024 * 1024) controller.close();
      else controller.enqueue(new Uint8Array(8192).fill(0x20));
    },
  });
  return { body, count };
}

describe('a request that is not one of ours', () => {
  it('with a body that never ends is answered 413 as soon as it is over the limit', async () => {
    const { body, count } = endless();
    const request = new NextRequest(`${SITE}/api/holds`, { method: 'POST', body, duplex: 'half', headers: { origin: SITE, host: '127.0.0.1:3000' } });

    const answer = await asBrowser({}, () => postHold(request, params({})));

    expect(answer.status).toBe(413);
    expect(count.sent).toBeLessThan(64 * 1024);
  });

  it('for a page whose address holds what no text may hold, or cannot be read, is answered 400', () => {
    for (const path of ['/hold?day=%00', '/gardens/a%00b', '/office/roll?find=x%00', '/gardens/%E0%A4%A']) expect(proxy(ask(path)).status, path).toBe(400);
    for (const path of ['/hold?day=spring', '/gardens/caf%C3%A9', '/gardens?scale=%zz']) expect(proxy(ask(path)).status, path).toBe(200);
  });

  it('for a file whose address holds what no text may hold is answered 400', async () => {
    const secretary = await sessionOf((await wren()).signInId);

    expect((await asBrowser({}, () => getPlate(ask('/gardens/%00/plate'), params({ slug: '\0' })))).status).toBe(400);
    expect((await asBrowser(secretary, () => getRollFile(ask('/office/roll/csv?find=%00'), params({})))).status).toBe(400);
  });

  it('for a booking under a code that is none is answered 404 to a member too', async () => {
    const member = await sessionOf((await ben()).signInId);

    for (const code of ['x', 'AAAA\u0000AAA', 'a'.repeat(500)]) expect((await asBrowser(member, () => getCalendar(ask('/bookings/x/calendar.ics'), params({ code })))).status, code).toBe(404);
  });
});

describe('a page of a site on https', () => {
  const site = process.env['SITE_URL'];
  afterEach(() => { process.env['SITE_URL'] = site; });

  it('tells browsers to stay on https, and takes forms from its own pages though its address is set with a path', () => {
    const form = new NextRequest('http://10.0.0.7:3000/sign-in', { method: 'POST', headers: { host: '10.0.0.7:3000', origin: 'https://club.example' } });
    expect(proxy(ask('/')).headers.get('strict-transport-security')).toBeNull();

    process.env['SITE_URL'] = 'https://club.example/';

    expect(proxy(ask('/')).headers.get('strict-transport-security')).toBe('max-age=31536000');
    expect(proxy(form).status).toBe(200);
  });
});
