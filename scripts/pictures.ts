// Makes the README's pictures from the running program: `npm run pictures`. Starts a portal of its own with the demo club
// (production build, a database of its own), photographs it with Debian's Chromium, and stops it.
import { mkdirSync } from 'node:fs';
import { chromium, type Browser, type Page } from 'playwright';
import { DEMO_SIGN_INS } from './seed/sign-ins';
import { startTestStack } from '../tests/support/stack';

type Picture = { name: string; path: string; width: number; height: number; scheme?: 'light' | 'dark'; as?: 'coordinator' | 'treasurer' | 'secretary'; before?: (page: Page) => Promise<void> };

const FOLDER = 'public/pictures';

const PICTURES: Picture[] = [
  { name: 'home', path: '/', width: 1280, height: 1500 },
  { name: 'board', path: 'next-day', width: 1280, height: 1500, before: chooseTwo },
  { name: 'board-phone', path: 'next-day', width: 390, height: 1400, before: chooseTwo },
  { name: 'garden', path: '/gardens/pine-barrow-light-railway', width: 1280, height: 1600 },
  { name: 'garden-evening', path: '/gardens/old-orchard-line', width: 1280, height: 1100, scheme: 'dark' },
  { name: 'office-day', path: 'office-next-day', width: 1280, height: 1300, as: 'coordinator' },
  { name: 'office-roll', path: '/office/roll', width: 1280, height: 1200, as: 'secretary' },
  { name: 'office-books', path: '/office/books', width: 1280, height: 1300, as: 'treasurer' },
];

/** Chooses two times that can be reached one after the other, so that the line is drawn. */
async function chooseTwo(page: Page): Promise<void> {
  const free = page.getByRole('checkbox', { disabled: false }).and(page.locator('[name^="entryTimeId"]'));
  await free.first().check({ force: true });
  await free.last().check({ force: true });
}

async function signIn(browser: Browser, site: string, does: string) {
  const person = DEMO_SIGN_INS.find((one) => one.does.startsWith(does));
  if (!person) throw new Error(`nobody in the demo club is ${does}`);
  const context = await browser.newContext({ baseURL: site });
  const page = await context.newPage();
  await page.goto('/sign-in');
  const form = page.getByRole('region', { name: 'With a password' });
  await form.getByLabel('E-mail').fill(person.email);
  await form.getByLabel('Password').fill(person.password);
  await form.getByRole('button', { name: 'Sign in with a password' }).click();
  await page.waitForURL(/office/);
  const state = await context.storageState();
  await context.close();
  return state;
}

async function nextDay(browser: Browser, site: string): Promise<string> {
  const page = await browser.newPage({ baseURL: site });
  await page.goto('/');
  const href = await page.getByRole('link', { name: 'Choose gardens and times' }).getAttribute('href');
  await page.close();
  if (href === null) throw new Error('the home page leads to no open day');
  return href;
}

async function takeAll(): Promise<void> {
  mkdirSync(FOLDER, { recursive: true });
  const stack = await startTestStack({ name: 'pictures', seeded: true });
  const browser = await chromium.launch({ executablePath: process.env['CHROMIUM'] ?? '/usr/bin/chromium', args: ['--no-sandbox', '--enable-unsafe-swiftshader'] });
  try {
    const day = await nextDay(browser, stack.site);
    const paths: Record<string, string> = { 'next-day': day, 'office-next-day': `/office${day}` };
    for (const picture of PICTURES) await take(browser, stack.site, { ...picture, path: paths[picture.path] ?? picture.path });
  } finally {
    await browser.close();
    await stack.stop();
  }
}

async function take(browser: Browser, site: string, picture: Picture): Promise<void> {
  const state = picture.as === undefined ? {} : { storageState: await signIn(browser, site, picture.as) };
  const context = await browser.newContext({ baseURL: site, viewport: { width: picture.width, height: picture.height }, colorScheme: picture.scheme ?? 'light', reducedMotion: 'reduce', ...state });
  const page = await context.newPage();
  await page.goto(picture.path, { waitUntil: 'networkidle' });
  await picture.before?.(page);
  await page.screenshot({ path: `${FOLDER}/${picture.name}.png` });
  await context.close();
  console.log(`${FOLDER}/${picture.name}.png`);
}

await takeAll();
