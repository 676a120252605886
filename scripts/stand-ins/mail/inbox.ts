// The inbox in a browser, and the same as JSON for tests.
import { createServer, type IncomingMessage, type Server, type ServerResponse } from 'node:http';
import { answerSheet } from '../sheet';
import type { Letter, Letters } from './letters';
import type { Post } from './post';

const escape = (text: string) => text.replace(/[&<>"']/g, (c) => `&#${c.charCodeAt(0)};`);

/** Listens on 127.0.0.1: `/` the inbox, `/letters.json?to=` for tests, POST /_control {"answer": "take" | "later" | "none"}. */
export async function serveInbox(letters: Letters, post: Post, port: number): Promise<{ server: Server; origin: string }> {
  const server = createServer((request, response) => {
    answer(letters, post, request, response).catch(() => response.writeHead(400).end());
  });
  await new Promise<void>((resolve, reject) => server.once('error', reject).listen(port, '127.0.0.1', resolve));
  const address = server.address();
  return { server, origin: `http://127.0.0.1:${typeof address === 'object' && address ? address.port : port}` };
}

async function answer(letters: Letters, post: Post, request: IncomingMessage, response: ServerResponse) {
  const url = new URL(request.url ?? '/', 'http://127.0.0.1');
  if (answerSheet(url.pathname, response)) return;
  if (url.pathname === '/_control' && request.method === 'POST') {
    await post.answerWith(JSON.parse(await bodyOf(request)).answer);
    return json(response, { ok: true });
  }
  if (url.pathname === '/letters.json') {
    if (request.method === 'DELETE') letters.clear();
    const to = url.searchParams.get('to')?.toLowerCase();
    return json(response, letters.all().filter((letter) => !to || letter.to.some((address) => address.toLowerCase() === to)));
  }
  const [, id, what, index] = /^\/(\d+)(?:\/(html|raw|part)(?:\/(\d+))?)?$/.exec(url.pathname) ?? [];
  const letter = id ? letters.find(Number(id)) : null;
  if (url.pathname === '/') return page(response, 'Letters', list(letters.all()), true);
  if (!letter) return page(response, 'No such letter', '<p><a href="/">All letters</a></p>', false, 404);
  if (what === 'raw') return send(response, 'text/plain; charset=utf-8', letter.raw);
  if (what === 'html') return sealed(response, letter.html);
  const part = what === 'part' ? letter.parts[Number(index)] : undefined;
  if (part) return download(response, part.name, part.type, part.text);
  page(response, letter.subject, view(letter), true);
}

const json = (response: ServerResponse, body: unknown) => send(response, 'application/json', JSON.stringify(body));
const send = (response: ServerResponse, type: string, body: string) => void response.writeHead(200, { 'content-type': type, 'x-content-type-options': 'nosniff' }).end(body);

/** A letter's own HTML runs nothing and fetches nothing; its links open in a new tab. */
function sealed(response: ServerResponse, html: string) {
  const policy = "default-src 'none'; style-src 'unsafe-inline'; img-src data:; sandbox allow-popups allow-popups-to-escape-sandbox";
  response.writeHead(200, { 'content-type': 'text/html; charset=utf-8', 'content-security-policy': policy });
  response.end(`<base target="_blank">${html}`);
}

function download(response: ServerResponse, name: string, type: string, text: string) {
  response.writeHead(200, { 'content-type': type, 'content-disposition': `attachment; filename="${name.replace(/[^\w.-]/g, '_')}"` }).end(text);
}

function list(letters: Letter[]): string {
  if (letters.length === 0) return '<p>No letter has come yet. Book a visit, or ask for a sign-in code.</p>';
  const rows = letters.map((letter) => `<tr><td><time datetime="${letter.at}">${letter.at.slice(0, 16).replace('T', ' ')}</time></td>
    <td>${escape(letter.to.join(', '))}</td><td><a href="/${letter.id}">${escape(letter.subject)}</a></td></tr>`);
  return `<p class="note">${letters.length} ${letters.length === 1 ? 'letter' : 'letters'}, times in UTC. They went nowhere else.</p>
    <table><thead><tr><th>Sent</th><th>To</th><th>Subject</th></tr></thead><tbody>${rows.join('')}</tbody></table>`;
}

function view(letter: Letter): string {
  const parts = letter.parts.map((part, index) => `<li><a href="/${letter.id}/part/${index}">${escape(part.name)}</a> ${escape(part.type)}${part.method ? `, ${escape(part.method)}` : ''}</li>`);
  return `<p><a href="/">All letters</a></p>
    <p>To <strong>${escape(letter.to.join(', '))}</strong><br>From ${escape(letter.from)}, ${letter.at.slice(0, 16).replace('T', ' ')} UTC</p>
    ${parts.length > 0 ? `<h2>With it</h2><ul>${parts.join('')}</ul>` : ''}
    ${letter.html ? `<h2>As a letter</h2><iframe title="The letter" src="/${letter.id}/html"></iframe>` : ''}
    <h2>As plain text</h2><pre>${linked(escape(letter.text))}</pre><p><a href="/${letter.id}/raw">As it was sent</a></p>`;
}

const linked = (escaped: string) => escaped.replace(/https?:\/\/[^\s<>&]+(?:&#38;[^\s<>&]+)*/g, (url) => `<a href="${url}">${url}</a>`);

function page(response: ServerResponse, title: string, body: string, wide: boolean, status = 200) {
  response.writeHead(status, { 'content-type': 'text/html; charset=utf-8', 'content-security-policy': "default-src 'none'; style-src 'self'; font-src 'self'; frame-src 'self'" });
  response.end(`<!doctype html><html lang="en"><head><meta charset="utf-8"><meta name="viewport" content="width=device-width, initial-scale=1">
    <title>${escape(title)}</title><link rel="stylesheet" href="/sheet.css"></head>
    <body><main${wide ? ' class="wide"' : ''}><p class="bill">Inbox, stand-in</p><h1>${escape(title)}</h1>${body}</main></body></html>`);
}

async function bodyOf(request: IncomingMessage): Promise<string> {
  const parts: Buffer[] = [];
  for await (const part of request) parts.push(part);
  return Buffer.concat(parts).toString('utf8');
}
