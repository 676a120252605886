// Copies to public/vendor what the browser fetches by URL and no bundler sees; run before every build and `npm run dev`.
import { copyFileSync, mkdirSync } from 'node:fs';
import { createRequire } from 'node:module';
import { basename } from 'node:path';
import { fileURLToPath } from 'node:url';

const here = createRequire(import.meta.url);
const scanner = createRequire(here.resolve('barcode-detector')); // it brings its own zxing-wasm
const folder = fileURLToPath(new URL('../public/vendor', import.meta.url));

mkdirSync(folder, { recursive: true });
for (const file of [
  here.resolve('maplibre-gl/dist/maplibre-gl-worker.mjs'),
  scanner.resolve('zxing-wasm/reader/zxing_reader.wasm'),
  here.resolve('@fontsource-variable/besley/files/besley-latin-wght-normal.woff2'),
  here.resolve('@fontsource-variable/besley/files/besley-latin-wght-italic.woff2'),
]) {
  copyFileSync(file, `${folder}/${basename(file)}`);
}
