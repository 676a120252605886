import { expect, test, type Browser, type Page } from '@playwright/test';
import { Client } from 'pg';
import { expectNoProblems, listenForComplaints, problemsOf, problemsOfLetter } from '../support/axe';
import { bookFree, choose, giveDetails, keepPlaces, letterTo, openTheBoard, payWith, GOOD_CARD, sayWhoComes, signInAs } from '../support/journeys';
import { theStack } from '../support/stack';

test.describe.configure({ timeout: 240_000 });

/** Goes to each address and asks what is wrong with the page there. */
async function lookAt(page: Page, paths: readonly string[]): Promise<Record<string, string[]>> {
  const heard = listenForComplaints(page);
  const problems: Record<string, string[]> = {};
  for (const path of paths) {
    await page.goto(path);
    problems[path] = await problemsOf(page);
  }
  return { ...problems, 'the console': heard };
}

/** The address of the first link on a page that leads where `leads` says. */
async function linkOn(page: Page, path: string, leads: RegExp): Promise<string> {
  await page.goto(path);
  const hrefs = await page.getByRole('link').evaluateAll((links) => links.map((link) => link.getAttribute('href') ?? ''));
  const found = hrefs.find((href) => leads.test(href));
  if (found === undefined) throw new Error(`${path} has no link to ${String(leads)}`);
  return found;
}

const SLUG = /^\/open-days\/[a-z-]+-open-gardens-\d{4}-\d\d-\d\d$/;

test('public pages can be used by everyone, wide or narrow, by day and in the evening', async ({ page }) => {
  const next = await linkOn(page, '/open-days', SLUG);
  const past = await linkOn(page, '/open-days', /friends-and-neighbours/);
  const chosen = `${next}?adults=3&${(await page.goto(next).then(() => page.getByRole('checkbox', { name: /^Saltmarsh & Plover, 1[01]:/ }).evaluateAll((boxes) => boxes.slice(0, 1).map((box) => `with=${box.getAttribute('value') ?? ''}`)))).join('&')}`;
  expectNoProblems(await lookAt(page, ['/', '/open-days', next, chosen, past, '/gardens', '/gardens?steam=only', '/gardens/pine-barrow-light-railway', '/gardens/copperkettle-and-western', '/membership', '/visiting']));
});

test('the pages of booking and signing in can be used by everyone', async ({ page }) => {
  const problems: Record<string, string[]> = await lookAt(page, ['/hold', '/sign-in', '/sign-in/code', '/sign-in/link/no-such-secret']);
  await openTheBoard(page, 'later');
  await sayWhoComes(page, { adults: 1, children: 0, babes: 0 });
  await choose(page, 'Curlew Pier Railway', '10:00');
  await choose(page, 'Bellwether Street Tram', '12:00');
  await keepPlaces(page);
  problems['kept places'] = await problemsOf(page);
  await giveDetails(page, { name: '', email: 'wrong' });
  await page.getByRole('button', { name: /^Pay/ }).click();
  await expect(page.getByLabel('Your name')).toHaveAttribute('aria-invalid', 'true');
  problems['kept places, with mistakes'] = await problemsOf(page);
  await giveDetails(page, { name: 'Axel Dunmore', email: 'axel@visitor.example' });
  await page.getByRole('button', { name: /^Pay/ }).click();
  await page.waitForURL(/\/pay\//);
  const payPage = page.url();
  await page.goto('/hold');
  problems['a payment is open'] = await problemsOf(page);
  await page.goto('/hold/paid');
  problems['waiting for the card service'] = await problemsOf(page);
  await page.goto(payPage);
  await payWith(page, GOOD_CARD);
  await expect(page.getByRole('heading', { name: 'It is yours' })).toBeVisible();
  problems['paid'] = await problemsOf(page);
  await page.getByRole('button', { name: 'See our tickets' }).click();
  await page.waitForURL('**/bookings/*');
  await page.getByText('Change or give back').first().click();
  problems['tickets'] = await problemsOf(page);
  const letter = await letterTo('axel@visitor.example', /^Your day in two gardens/);
  await page.goto(/http\S+\/link\/[\w-]+/.exec(letter.text)?.[0] ?? '');
  problems['tickets, from the letter'] = await problemsOf(page);
  await page.goto(`${page.url()}/print`);
  problems['tickets to print'] = await problemsOf(page);
  problems['the letter'] = await problemsOfLetter(page, letter.html);
  expectNoProblems(problems);
});

test('a member’s pages can be used by everyone', async ({ page }) => {
  await signInAs(page, 'Ada');
  const receipt = await linkOn(page, '/member/dues', /\/receipts\//);
  expectNoProblems(await lookAt(page, ['/account', '/member', '/member/dues', receipt, '/member/visits', '/member/garden']));
});

const officePages: Record<'Nell' | 'Cleo' | 'Wren' | 'Dov', (page: Page) => Promise<string[]>> = {
  Nell: async () => ['/office', '/office/people', '/office/settings', '/office/audit'],
  Cleo: async (page) => {
    const day = await linkOn(page, '/office/open-days', /^\/office\/open-days\/[a-z-]+-open-gardens-/);
    const time = await linkOn(page, `${day}/stops/3`, /\?open=/);
    const booking = await linkOn(page, `/office/bookings?find=ben%40alderfork.example&day=${day.split('/').at(-1) ?? ''}`, /^\/office\/bookings\/[0-9A-Z]{8}$/);
    const visit = await linkOn(page, booking, /\?open=/);
    const letter = await linkOn(page, '/office/letters', /^\/office\/letters\/[0-9a-f-]{36}/);
    return ['/office/open-days/new', day, `${day}/plan`, `${day}/letter`, `${day}/gates`, time, visit, '/office/bookings?find=nobody+at+all', letter];
  },
  Wren: async (page) => {
    const open = await linkOn(page, '/office/roll', /open=/);
    return [open, await linkOn(page, open, /^\/office\/roll\/[0-9a-f-]{36}/), '/office/letters'];
  },
  Dov: async (page) => {
    await page.goto('/office/roll?find=Moravec');
    await page.getByRole('link', { name: /Moravec/ }).click();
    await page.waitForURL(/open=/);
    return ['/office', await linkOn(page, page.url(), /^\/office\/roll\/[0-9a-f-]{36}/), '/office/books', await linkOn(page, '/office/books', /\/receipts\//)];
  },
};

for (const [who, pages] of Object.entries(officePages)) {
  test(`the office can be used by everyone: what ${who} opens`, async ({ page }) => {
    await signInAs(page, who as keyof typeof officePages);
    expectNoProblems(await lookAt(page, await pages(page)));
  });
}

/** Opens the gate of a stop of the next open day on a phone of its own. */
async function openGate(browser: Browser, stop: number, listen: (phone: Page) => void): Promise<Page> {
  const office = await (await browser.newContext()).newPage();
  await signInAs(office, 'Cleo');
  const day = await linkOn(office, '/office/open-days', /^\/office\/open-days\/[a-z-]+-open-gardens-/);
  await office.goto(`${day}/gates`);
  await office.getByLabel('Gate', { exact: true }).selectOption({ index: stop - 1 });
  await office.getByLabel('Helper, or which turn').fill('Basil');
  await office.getByRole('button', { name: 'Make a gate pass' }).click();
  const link = await office.getByText(/\/gate#/).innerText();
  await office.context().close();
  const phone = await (await browser.newContext({ viewport: { width: 390, height: 844 } })).newPage();
  listen(phone);
  // A helper who says no to the camera: the film before it would show a code, and the gate would answer that instead.
  await phone.addInitScript(() => { navigator.mediaDevices.getUserMedia = () => Promise.reject(new DOMException('', 'NotAllowedError')); });
  await phone.goto(link);
  await expect(phone.getByRole('heading', { level: 1 })).toBeVisible();
  return phone;
}

test('the gate can be used by everyone', async ({ page, browser }) => {
  const problems: Record<string, string[]> = await lookAt(page, ['/gate']);
  const phone = await openGate(browser, 2, (opened) => { problems['the gate’s console'] = listenForComplaints(opened); });
  problems['nobody at the gate'] = await problemsOf(phone);
  await phone.getByRole('button', { name: 'Black on white' }).click();
  problems['black on white'] = await problemsOf(phone);
  await phone.getByRole('button', { name: 'Find by name or code' }).click();
  problems['finding'] = await problemsOf(phone);
  await phone.getByRole('button', { name: /^[A-Z]$/ }).first().click();
  await phone.getByRole('listitem').getByRole('button').first().click();
  problems['a ticket'] = await problemsOf(phone);
  expectNoProblems(problems);
});

test('the skip link leads past the heading, and a page that is not there says so', async ({ page }) => {
  await page.goto('/gardens');
  await page.keyboard.press('Tab');
  await expect(page.getByRole('link', { name: 'Skip to the page' })).toBeFocused();
  await page.keyboard.press('Enter');
  await expect(page.getByRole('main')).toBeFocused();
  const answer = await page.goto('/gardens/no-such-garden');
  expect(answer?.status()).toBe(404);
  expect(await problemsOf(page)).toEqual([]);
});

type Secret = { garden: string; words: string[] };

/** What nobody outside may read of each garden: its street with its number; its latitude together with its longitude. */
async function secretsOfGardens(): Promise<Secret[]> {
  const client = new Client({ connectionString: theStack().database.MIGRATE_DATABASE_URL });
  await client.connect();
  const { rows } = await client.query<{ slug: string; address: string; lat: number; lon: number }>('select slug, address, lat, lon from garden_places join gardens on gardens.id = garden_id');
  await client.end();
  return rows.flatMap(({ slug, address, lat, lon }) => [{ garden: slug, words: [address.split(',')[0] ?? address] }, { garden: slug, words: [String(lat), String(lon)] }]);
}

test('before the release no exact address or place of a garden stands on any page, in any answer or letter', async ({ page, browser }) => {
  const secrets = await secretsOfGardens();
  expect(secrets).toHaveLength(24);
  const answers: { from: string; text: string }[] = [];
  const reading: Promise<void>[] = [];
  const listen = (opened: Page) => opened.on('response', (response) => {
    const from = new URL(response.url());
    if (from.origin !== theStack().site || /\.(?:woff2?|png|svg|css)$/.test(from.pathname)) return;
    reading.push(response.text().then((text) => void answers.push({ from: from.pathname, text }), () => undefined));
  });
  listen(page);
  const code = await bookFree(page, { name: 'Curious Finch', email: 'finch@visitor.example', people: { adults: 1, children: 0, babes: 0 }, day: 'next', times: [['Thistledown Junction', '14:30']] });
  const letter = await letterTo('finch@visitor.example', /^Your day in one garden/);
  const invitation = await letterTo('finch@visitor.example', /^Thistledown Junction, /);
  const next = await linkOn(page, '/open-days', SLUG);
  for (const path of ['/', '/open-days', next, '/gardens', '/membership', '/visiting', `/bookings/${code}`, `/bookings/${code}/print`, `/bookings/${code}/calendar.ics`, '/valley/valley.json']) {
    const answer = await page.request.get(path);
    expect(answer.status(), path).toBe(200);
    answers.push({ from: path, text: await answer.text() });
  }
  await page.goto('/gardens');
  const gardens = await page.getByRole('link').evaluateAll((links) => [...new Set(links.map((link) => link.getAttribute('href') ?? '').filter((href) => /^\/gardens\/[a-z-]+$/.test(href)))]);
  expect(gardens).toHaveLength(12);
  for (const path of gardens) answers.push({ from: path, text: await (await page.goto(path))?.text() ?? '' });
  await page.goto(next);
  const openDayId = await page.locator('input[name=openDayId]').inputValue();
  answers.push({ from: 'the board', text: await (await page.request.get(`/api/board/${openDayId}`)).text() });
  const phone = await openGate(browser, 1, listen);
  await phone.waitForResponse(/\/api\/gate\/list/);
  for (const { subject, text, html, parts } of [letter, invitation]) answers.push({ from: `letter “${subject}”`, text: [text, html, ...parts.map((part) => part.text)].join('\n') });
  await Promise.all(reading);

  expect(answers.map(({ from }) => from)).toContain('/api/gate/list');
  const told = answers.flatMap(({ from, text }) => secrets.filter(({ words }) => words.every((word) => text.includes(word))).map(({ garden, words }) => `${from} tells ${words.join(' ')} of ${garden}`));
  expect(told).toEqual([]);
});
