// The stylesheet and the two faces that the stand-ins' own pages use.
import { readFileSync } from 'node:fs';
import { createRequire } from 'node:module';
import type { ServerResponse } from 'node:http';
import { fileURLToPath } from 'node:url';

const { resolve } = createRequire(import.meta.url);
const FILES: Record<string, [file: () => string, type: string]> = {
  '/sheet.css': [() => fileURLToPath(new URL('sheet.css', import.meta.url)), 'text/css; charset=utf-8'],
  '/besley.woff2': [() => resolve('@fontsource-variable/besley/files/besley-latin-wght-normal.woff2'), 'font/woff2'],
  '/atkinson.woff2': [() => resolve('@fontsource-variable/atkinson-hyperlegible-next/files/atkinson-hyperlegible-next-latin-wght-normal.woff2'), 'font/woff2'],
};

/** Sends one of them; false when the path is none of them. */
export function answerSheet(path: string, response: ServerResponse): boolean {
  const found = FILES[path];
  if (!found) return false;
  response.writeHead(200, { 'content-type': found[1], 'cache-control': 'max-age=3600' }).end(readFileSync(found[0]()));
  return true;
}
