import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { createTransport } from 'nodemailer';
import { afterEach, beforeEach, expect, it } from 'vitest';
import { serveInbox } from '../../../scripts/stand-ins/mail/inbox';
import { Letters } from '../../../scripts/stand-ins/mail/letters';
import { Post } from '../../../scripts/stand-ins/mail/post';

const folder = mkdtempSync(join(tmpdir(), 'mail-'));

async function start() {
  const letters = await Letters.open(folder);
  const post = new Post(letters, 0);
  const transport = createTransport({ host: '127.0.0.1', port: await post.open(), secure: false, ignoreTLS: true });
  const { server, origin } = await serveInbox(letters, post, 0);
  const control = (answer: string) => fetch(`${origin}/_control`, { method: 'POST', body: JSON.stringify({ answer }) });
  const stop = async () => {
    transport.close();
    server.closeAllConnections();
    await post.close();
    await new Promise((resolve) => server.close(resolve));
  };
  return { transport, origin, control, stop, letters };
}

let mail: Awaited<ReturnType<typeof start>>;
beforeEach(async () => { mail = await start(); });
afterEach(async () => {
  mail.letters.clear();
  await mail.stop();
  rmSync(folder, { recursive: true, force: true });
});

const invitation = {
  from: '"Alder Fork" <post@alderfork.example>', to: 'eve+open@visitor.example', subject: 'Łódź garden <b>15 May</b>',
  text: 'Your page: http://127.0.0.1:1/b?c=1&d=2', html: '<p onclick="alert(1)">Hello</p><script>alert(1)</script>',
  icalEvent: { method: 'REQUEST', content: 'BEGIN:VCALENDAR\r\nMETHOD:REQUEST\r\nEND:VCALENDAR\r\n' },
};

it('shows a letter with its calendar part, as JSON and as a page that runs nothing of the letter', async () => {
  await mail.transport.sendMail(invitation);

  const [letter] = await (await fetch(`${mail.origin}/letters.json?to=EVE%2Bopen@visitor.example`)).json();
  const page = await (await fetch(`${mail.origin}/${letter.id}`)).text();
  const html = await fetch(`${mail.origin}/${letter.id}/html`);

  expect(letter).toMatchObject({ subject: invitation.subject, to: ['eve+open@visitor.example'], text: expect.stringContaining('c=1&d=2') });
  expect(letter.parts[0]).toMatchObject({ method: 'REQUEST', text: expect.stringContaining('BEGIN:VCALENDAR') });
  expect(page).toContain('href="http://127.0.0.1:1/b?c=1&#38;d=2"');
  expect(page).not.toContain('<b>15 May</b>');
  expect(html.headers.get('content-security-policy')).toMatch(/default-src 'none'.*sandbox/);
  expect(await (await fetch(`${mail.origin}/letters.json?to=other@visitor.example`)).json()).toEqual([]);
});

it('can put letters off, and be away, as a mail server sometimes is', async () => {
  await mail.control('later');
  await expect(mail.transport.sendMail(invitation)).rejects.toMatchObject({ responseCode: 451 });
  await mail.control('none');
  await expect(mail.transport.sendMail(invitation)).rejects.toMatchObject({ code: expect.stringMatching(/ECONNREFUSED|ESOCKET/) });

  await mail.control('take');
  await mail.transport.sendMail(invitation);

  expect(mail.letters.all()).toHaveLength(1);
});

it('still has its letters after a restart', async () => {
  await mail.transport.sendMail(invitation);
  await mail.stop();

  mail = await start();

  expect(mail.letters.all().map((letter) => letter.subject)).toEqual([invitation.subject]);
});
