import { expect, type Locator, type Page } from '@playwright/test';
import { instantOf } from '@/lib/core/time';
import { DEMO_SIGN_INS } from '@/scripts/seed/sign-ins';
import { ZONE } from '@/scripts/seed/calendar';
import { lettersTo, setClock, type LetterRead } from './stack';

/** The two coming open days of the demo: one in a week or two, one five weeks later. */
const DAYS = { next: /Open Gardens$/, later: 'Five Gardens and Tea' };
export type ComingDay = keyof typeof DAYS;

export type People = { adults: number; children: number; babes: number };

/** Opens an open day's time board as a visitor comes to it, and waits until the page is awake (when it runs scripts at all). */
export async function openTheBoard(page: Page, day: ComingDay): Promise<void> {
  await page.goto('/open-days');
  await page.getByRole('link', { name: DAYS[day] }).click();
  await expect(page.getByRole('table')).toBeVisible();
}

/** Says who is coming. */
export async function sayWhoComes(page: Page, { adults, children, babes }: People): Promise<void> {
  await page.getByLabel('Adults').fill(String(adults));
  await page.getByLabel('Children').fill(String(children));
  await page.getByLabel('Babes in arms').fill(String(babes));
}

const plainly = (text: string) => text.replace(/[.*+?^${}()|[\]\\]/g, '\\$&');

/** The box of one garden at one time. */
export const timeAt = (page: Page, garden: string, time: string): Locator => page.getByRole('checkbox', { name: new RegExp(`^${plainly(garden)}, ${time}, `) });

/** The places left that a garden's box says it has. */
export async function placesLeft(page: Page, garden: string, time: string): Promise<number> {
  const name = (await timeAt(page, garden, time).getAttribute('aria-label')) ?? '';
  return Number(/(\d+) places? left/.exec(name)?.[1] ?? Number.NaN);
}

/** Chooses one time. */
export async function choose(page: Page, garden: string, time: string): Promise<void> {
  await timeAt(page, garden, time).check();
}

/** Keeps what is chosen and lands on the page of kept places. */
export async function keepPlaces(page: Page): Promise<void> {
  await page.getByRole('button', { name: /^Keep / }).click();
  await page.waitForURL('**/hold');
  await expect(page.getByRole('heading', { level: 1 })).toContainText(/Kept for you until \d\d:\d\d/);
}

/** Types who the party is and agrees to the visit rules. */
export async function giveDetails(page: Page, { name, email }: { name: string; email: string }): Promise<void> {
  await page.getByLabel('Your name').fill(name);
  await page.getByLabel('E-mail').fill(email);
  await page.getByLabel(/keep to the visit rules/).check();
}

export const GOOD_CARD = '4242 4242 4242 4242';
export const DECLINED_CARD = '4000 0000 0000 0002';

/** Types a card on the card service's own page and presses its button. */
export async function payWith(page: Page, card: string, email?: string): Promise<void> {
  if (email !== undefined) await page.getByLabel('E-mail').fill(email); // asked for only where the portal could not tell it
  await page.getByLabel('Card number').fill(card);
  await page.getByRole('button', { name: /^Pay / }).click();
}

/** Opens the tickets of a party whose places are confirmed; answers with the booking's code. */
export async function openTickets(page: Page): Promise<string> {
  await page.getByRole('button', { name: 'See our tickets' }).click();
  await page.waitForURL('**/bookings/*');
  return page.url().split('/').at(-1) ?? '';
}

type Party = { name: string; email: string; people: People; day: ComingDay; times: readonly (readonly [garden: string, time: string])[] };

/** A party books gardens that cost nothing, from the board to its tickets; answers with the booking's code. */
export async function bookFree(page: Page, { name, email, people, day, times }: Party): Promise<string> {
  await openTheBoard(page, day);
  await sayWhoComes(page, people);
  for (const [garden, time] of times) await choose(page, garden, time);
  await keepPlaces(page);
  await giveDetails(page, { name, email });
  await page.getByRole('button', { name: 'Confirm these places' }).click();
  return openTickets(page);
}

/** The newest letter to an address whose subject answers to `subject`, as soon as it has come; newer than `after`, if that is given. */
export async function letterTo(address: string, subject: RegExp, after?: LetterRead): Promise<LetterRead> {
  const find = async () => (await lettersTo(address)).find((letter) => subject.test(letter.subject) && letter.id > (after?.id ?? 0));
  await expect.poll(find, { message: `a letter to ${address} about ${subject}`, timeout: 40_000 }).toBeTruthy();
  const letter = await find();
  if (!letter) throw new Error('the letter went away');
  return letter;
}

/** The first address in a letter that answers to a pattern. */
export function linkIn(letter: LetterRead, pattern: RegExp): string {
  const found = pattern.exec(letter.text)?.[0];
  if (found === undefined) throw new Error(`no such link in “${letter.subject}”`);
  return found;
}

/** Signs in as one of the demo club's people, with the password that scripts/start prints. */
export async function signInAs(page: Page, first: 'Nell' | 'Cleo' | 'Wren' | 'Dov' | 'Ada' | 'Ben'): Promise<void> {
  const who = DEMO_SIGN_INS.find(({ name }) => name.startsWith(`${first} `));
  if (!who) throw new Error(`${first} cannot sign in`);
  await page.goto('/sign-in');
  const form = page.getByRole('region', { name: 'With a password' });
  await form.getByLabel('E-mail').fill(who.email);
  await form.getByLabel('Password').fill(who.password);
  await form.getByRole('button', { name: 'Sign in with a password' }).click();
  await page.waitForURL(/\/(office|member)/);
}

/** The date in the address of an open day's page. */
export function dayInAddress(url: string): string {
  const day = /(\d{4}-\d\d-\d\d)(?:[/?#]|$)/.exec(url)?.[1];
  if (day === undefined) throw new Error(`no day in ${url}`);
  return day;
}

/** Sets the clock that everything shares to a moment of the club's own time; `backToNow` sets it right again. */
export const setClubClock = (day: string, time: string): void => setClock((instantOf(day, time, ZONE).getTime() - Date.now()) / 60_000);

export const backToNow = (): void => setClock(0);

/** What the page says was not done; the framework's own announcer of pages has the same role. */
export const refusal = (page: Page): Locator => page.getByRole('alert').and(page.locator(':not(#__next-route-announcer__)'));
