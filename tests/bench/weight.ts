import { chromium, type Browser } from '@playwright/test';
import { startTestStack } from '../support/stack';
import { median, rounded, type Bench } from './bench';

export const describe: Bench['describe'] = 'Compressed JavaScript and first-load timings of the public pages without a map, on a slow phone';

const TIMES = 3;

// "Slow 4G" and the fourfold slower processor are the mobile settings of Lighthouse (throttling constants "mobileSlow4G").
const SLOW_4G = { offline: false, latency: 150, downloadThroughput: (1.6 * 1024 * 1024) / 8, uploadThroughput: (750 * 1024) / 8 };
const CPU_RATE = 4;

type Seen = { jsKb: number; lcpS: number; cls: number; tbtMs: number };

/** Loads each page afresh several times; the figures are the medians of the heaviest page. */
export const run: Bench['run'] = async () => {
  const stack = await startTestStack({ name: 'bench-weight', seeded: true });
  const browser = await chromium.launch({ executablePath: process.env['CHROMIUM'] ?? '/usr/bin/chromium' });
  try {
    const paths = ['/', await aGarden(browser, stack.site), '/open-days', '/membership', '/visiting'];
    const worst: Seen = { jsKb: 0, lcpS: 0, cls: 0, tbtMs: 0 };
    for (const path of paths) {
      await load(browser, stack.site + path); // once uncounted: the server's own first time
      const seen: Seen[] = [];
      for (let time = 0; time < TIMES; time += 1) seen.push(await load(browser, stack.site + path));
      const middle: Seen = {
        jsKb: median(seen.map((one) => one.jsKb)), lcpS: median(seen.map((one) => one.lcpS)),
        cls: median(seen.map((one) => one.cls)), tbtMs: median(seen.map((one) => one.tbtMs)),
      };
      console.error(`${path}: ${rounded(middle.jsKb, 1)} kB, ${rounded(middle.lcpS)} s, shift ${rounded(middle.cls, 3)}, blocked ${rounded(middle.tbtMs, 0)} ms`);
      worst.jsKb = Math.max(worst.jsKb, middle.jsKb);
      worst.lcpS = Math.max(worst.lcpS, middle.lcpS);
      worst.cls = Math.max(worst.cls, middle.cls);
      worst.tbtMs = Math.max(worst.tbtMs, middle.tbtMs);
    }
    const figures = { js_kb: rounded(worst.jsKb, 1), lcp_s: rounded(worst.lcpS), cls: rounded(worst.cls, 3), tbt_ms: rounded(worst.tbtMs, 0) };
    return {
      figures,
      bars: [
        { name: 'js_kb', value: figures.js_kb, max: 170 }, { name: 'lcp_s', value: figures.lcp_s, max: 2.5 },
        { name: 'cls', value: figures.cls, max: 0.05 }, { name: 'tbt_ms', value: figures.tbt_ms, max: 300 },
      ],
    };
  } finally {
    await browser.close();
    await stack.stop();
  }
};

async function aGarden(browser: Browser, site: string): Promise<string> {
  const page = await browser.newPage();
  await page.goto(`${site}/gardens`);
  const path = await page.locator('a[href^="/gardens/"]').first().getAttribute('href');
  await page.close();
  if (!path) throw new Error('The index of gardens leads to no garden.');
  return path;
}

async function load(browser: Browser, url: string): Promise<Seen> {
  const context = await browser.newContext({ viewport: { width: 390, height: 844 }, deviceScaleFactor: 2 }); // nothing cached
  const page = await context.newPage();
  const devtools = await context.newCDPSession(page);
  await devtools.send('Network.enable');
  await devtools.send('Network.emulateNetworkConditions', SLOW_4G);
  await devtools.send('Emulation.setCPUThrottlingRate', { rate: CPU_RATE });
  const scripts = new Set<string>();
  let bytes = 0;
  devtools.on('Network.responseReceived', (event) => {
    if (event.type === 'Script') scripts.add(event.requestId);
  });
  devtools.on('Network.loadingFinished', (event) => {
    if (scripts.has(event.requestId)) bytes += event.encodedDataLength;
  });
  await page.addInitScript({ content: WATCH });
  await page.goto(url, { waitUntil: 'networkidle', timeout: 60_000 });
  const { lcp, cls, blocked } = await page.evaluate(() => window.leafhaltSeen);
  await context.close();
  return { jsKb: bytes / 1000, lcpS: lcp / 1000, cls, tbtMs: blocked };
}

declare global {
  interface Window {
    leafhaltSeen: { lcp: number; cls: number; blocked: number };
  }
}

/** Runs in the page, before anything of it: adds up what the browser reports of itself (web.dev's definitions). */
const WATCH = `
  const seen = (window.leafhaltSeen = { lcp: 0, cls: 0, blocked: 0 });
  const observe = (type, take) => new PerformanceObserver((list) => list.getEntries().forEach(take)).observe({ type, buffered: true });
  observe('largest-contentful-paint', (entry) => { seen.lcp = entry.startTime; });
  observe('layout-shift', (entry) => { if (!entry.hadRecentInput) seen.cls += entry.value; });
  observe('longtask', (entry) => { seen.blocked += Math.max(0, entry.duration - 50); });`;
