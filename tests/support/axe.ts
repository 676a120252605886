import { readFileSync } from 'node:fs';
import { createRequire } from 'node:module';
import { expect, type Page } from '@playwright/test';
import type { AxeResults, RunOptions } from 'axe-core';
import { theStack } from './stack';

// The engine itself instead of its builder, which loads it anew and opens a second page for every look.
const engine = readFileSync(createRequire(import.meta.resolve('@axe-core/playwright')).resolve('axe-core/axe.min.js'), 'utf8');

/** Rules whose answer can change with the width of the window, and the one that changes with its colours. */
const WITH_WIDTH = ['target-size', 'scrollable-region-focusable', 'link-in-text-block', 'page-has-heading-one', 'region', 'color-contrast'];
const WITH_COLOURS = ['color-contrast'];

/** How the page stands for each look: in full first, then resized and switched in place. */
const LOOKS = [
  { width: 1280, colorScheme: 'light', rules: null },
  { width: 390, colorScheme: 'light', rules: WITH_WIDTH },
  { width: 390, colorScheme: 'dark', rules: WITH_COLOURS },
  { width: 1280, colorScheme: 'dark', rules: WITH_COLOURS },
] as const;

async function violations(page: Page, rules: readonly string[] | null): Promise<string[]> {
  const options: RunOptions = { resultTypes: ['violations'], ...(rules && { runOnly: { type: 'rule', values: [...rules] } }) };
  const { violations: found } = await page.evaluate<AxeResults>(`window.axe.run(document, ${JSON.stringify(options)})`);
  return found.flatMap(({ id, nodes }) => nodes.map(({ target, failureSummary }) => `${id}: ${target.join(' ')} ${(failureSummary ?? '').split('\n')[1]?.trim() ?? ''}`));
}

const overflow = (page: Page) => page.evaluate(() => document.documentElement.scrollWidth - window.innerWidth);

/**
 * What is wrong with the page that stands there, in sentences: axe once in full, then resized and switched in place with
 * the rules that can change; nothing wider than a phone of 390 or 320; one heading of the first rank and a title.
 */
export async function problemsOf(page: Page): Promise<string[]> {
  const before = page.viewportSize();
  const found: string[] = [];
  await page.evaluate(engine);
  for (const { width, colorScheme, rules } of LOOKS) {
    await page.setViewportSize({ width, height: 844 });
    await page.emulateMedia({ colorScheme });
    found.push(...(await violations(page, rules)).map((words) => `at ${width}, ${colorScheme}: ${words}`));
  }
  for (const width of [390, 320]) {
    await page.setViewportSize({ width, height: 844 });
    const over = await overflow(page);
    if (over > 0) found.push(`at ${width} the page is ${over} px too wide`);
  }
  const heads = await page.getByRole('heading', { level: 1 }).count();
  if (heads !== 1) found.push(`${heads} headings of the first rank`);
  if ((await page.title()).trim() === '') found.push('no title');
  await page.emulateMedia({ colorScheme: null });
  if (before) await page.setViewportSize(before);
  return found;
}

/** What is wrong with a letter as a mail program shows it: its contrast by day and in a dark inbox, and its width on a phone. */
export async function problemsOfLetter(page: Page, html: string): Promise<string[]> {
  await page.goto('about:blank');
  await page.setContent(html);
  await page.evaluate(engine);
  const found: string[] = [];
  for (const colorScheme of ['light', 'dark'] as const) {
    await page.emulateMedia({ colorScheme });
    found.push(...(await violations(page, ['color-contrast', 'image-alt', 'link-name', 'heading-order', 'html-has-lang', 'document-title'])));
  }
  await page.setViewportSize({ width: 320, height: 844 });
  const over = await overflow(page);
  return over > 0 ? [...found, `at 320 the letter is ${over} px too wide`] : found;
}

/** Listens for what a page complains of: errors in its console, refusals of its security policy, scripts that broke. */
export function listenForComplaints(page: Page): string[] {
  const heard: string[] = [];
  page.on('console', (message) => { if (message.type() === 'error' && page.url().startsWith(theStack().site)) heard.push(`${new URL(page.url()).pathname}: ${message.text()}`); });
  page.on('pageerror', (error) => heard.push(`${new URL(page.url()).pathname}: ${error.message}`));
  return heard;
}

/** Fails with every problem of every page at once, so that one run tells all. */
export const expectNoProblems = (problems: Record<string, string[]>): void =>
  expect(Object.fromEntries(Object.entries(problems).filter(([, found]) => found.length > 0))).toEqual({});
