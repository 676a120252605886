import { readFileSync } from 'node:fs';
import { expect, test, type Page } from '@playwright/test';
import { backToNow, bookFree, choose, giveDetails, keepPlaces, letterTo, openTheBoard, payWith, GOOD_CARD, refusal, sayWhoComes, signInAs, timeAt } from '../support/journeys';
import { setClock, theStack } from '../support/stack';

test.afterEach(backToNow);

const ONE = { adults: 1, children: 0, babes: 0 };

/** Sends a request from the page itself, as a script in its own console could; answers with the status and what was said. */
const send = (page: Page, path: string, body: string, headers: Record<string, string> = {}) =>
  page.evaluate(async ([to, text, more]) => {
    const answer = await fetch(to, { method: 'POST', body: text, headers: { 'Content-Type': 'application/json', ...more } });
    return { status: answer.status, said: await answer.text() };
  }, [path, body, headers] as const);

const sessionsAtTheCardService = async (): Promise<number> => (await (await fetch(`${theStack().cards}/_control`)).json()).sessions.length;

const boxOf = (page: Page, garden: string, time: string) => timeAt(page, garden, time).getAttribute('value');

test('wrong numbers of people are answered beside the boxes, and a forged request keeps nothing', async ({ page }) => {
  await openTheBoard(page, 'next');
  const ofAnotherDay = await boxOf(page, 'Saltmarsh & Plover', '14:30');
  await openTheBoard(page, 'later');
  await choose(page, 'Bellwether Street Tram', '14:00');
  for (const [typed, sentence] of [['0', /at least one/], ['-1', /whole numbers/], ['1e9', /whole numbers/], ['999999999', /whole numbers/], ['3.5', /whole numbers/], ['99', /the most one party can bring/]] as const) {
    await page.getByLabel('Adults').fill(typed);
    await page.getByRole('button', { name: /^Keep / }).click();
    await expect(page.locator('#people-mistake')).toContainText(sentence);
    await expect(page.getByLabel('Adults')).toHaveAttribute('aria-invalid', 'true');
    await expect(page.getByLabel('Adults')).toHaveValue(typed);
  }
  await page.getByLabel('Adults').fill('0');
  await page.getByLabel('Children').fill('2');
  await expect(page.locator('#people-mistake')).toContainText('at least one adult');

  const openDayId = await page.locator('input[name=openDayId]').inputValue();
  const entryTimeId = await boxOf(page, 'Bellwether Street Tram', '14:00');
  const wish = (more: object) => JSON.stringify({ openDayId, wanted: [{ entryTimeId, ...ONE, ...more }] });
  for (const adults of [-1, 3.5, 1e9, '1e9', 'two', null, { $gt: 0 }]) expect(await send(page, '/api/holds', wish({ adults })), `${JSON.stringify(adults)} adults`).toMatchObject({ status: 400 });
  for (const [wrong, code] of [[wish({ adults: 0 }), 'nobody_in_party'], [wish({ entryTimeId: ofAnotherDay }), 'wrong_open_day'], [wish({ entryTimeId: crypto.randomUUID() }), 'not_found']] as const) {
    const { status, said } = await send(page, '/api/holds', wrong);
    expect(JSON.parse(said)).toMatchObject({ refused: code });
    expect(status).toBeGreaterThanOrEqual(400);
    expect(status).toBeLessThan(500);
  }
  expect((await send(page, '/api/holds', wish({ entryTimeId: "' or 1=1 --" }))).status).toBe(400);
  expect((await send(page, '/api/holds', '{"openDayId": ')).status).toBe(400);
  expect((await send(page, '/api/holds', JSON.stringify({ openDayId, wanted: 'x'.repeat(100_000) }))).status).toBe(413);
  await page.goto('/hold');
  await expect(page.getByRole('heading', { name: 'Nothing kept' })).toBeVisible();

  expect((await send(page, '/api/holds', wish({ adultMinor: 1, priceMinor: 0, totalMinor: 0 }))).status).toBe(200);
  await page.goto('/hold');
  await expect(page.getByRole('button', { name: 'Pay $5.00' })).toBeVisible(); // the club's price, whatever the request says
});

test('the card webhook answers 400 to a signature it does not know, and every door to broken JSON', async ({ request }) => {
  const event = JSON.stringify({ id: 'evt_1', type: 'checkout.session.completed', data: { object: { id: 'cs_test_1', payment_status: 'paid' } } });
  for (const headers of [{}, { 'stripe-signature': 't=1,v1=00' }]) expect((await request.post('/api/stripe', { data: event, headers })).status()).toBe(400);
  for (const path of ['/api/holds', '/api/gate/device', '/api/stripe']) {
    const answer = await request.post(path, { data: '{"broken', headers: { 'Content-Type': 'application/json', Origin: theStack().site } });
    expect(answer.status(), path).toBe(400);
  }
  expect((await request.post('/api/stripe', { data: 'x'.repeat(600_000) })).status()).toBe(413);
  expect((await request.post('/sign-in', { data: 'x'.repeat(1_100_000), headers: { Origin: theStack().site } })).status()).toBe(413);
  expect((await request.post('/sign-in', { data: 'email=a', headers: { Origin: 'https://elsewhere.example' } })).status()).toBe(403);
});

test('odd names and addresses are taken as they are, too long ones are answered beside the box', async ({ page }) => {
  await openTheBoard(page, 'later');
  await sayWhoComes(page, ONE);
  await choose(page, 'Bellwether Street Tram', '15:00');
  await keepPlaces(page);
  const long = 'Ó'.repeat(300);
  await giveDetails(page, { name: long, email: 'not an address' });
  await page.getByLabel(/Telephone/).fill('ring me');
  await page.getByRole('button', { name: /^Pay/ }).click();
  await expect(page.getByLabel('Your name')).toHaveAccessibleDescription(/longer than 120 characters/);
  await expect(page.getByLabel('E-mail')).toHaveAccessibleDescription(/not an e-mail address/);
  await expect(page.getByLabel(/Telephone/)).toHaveAccessibleDescription(/digits, spaces/);
  await expect(page.getByLabel('Your name')).toHaveValue(long);
  await expect(page.getByLabel('E-mail')).toHaveValue('not an address');
  await expect(refusal(page)).toBeFocused();

  const name = '👩‍👧‍👦 עדה 𝒪lga O’Łęcka';
  const email = '"odd,+one"@visitor.example';
  await giveDetails(page, { name, email });
  await page.getByLabel(/Telephone/).fill('');
  const before = await sessionsAtTheCardService();
  await page.getByRole('button', { name: /^Pay/ }).dblclick(); // twice in a hurry: one payment
  await page.waitForURL(/\/pay\//);
  expect(await sessionsAtTheCardService()).toBe(before + 1);
  await payWith(page, GOOD_CARD, 'payer@visitor.example');
  await expect(page.getByRole('heading', { name: 'It is yours' })).toBeVisible();
  const letter = await letterTo(email, /^Your day in one garden/);
  expect(letter.to).toEqual([email]);
  await page.getByRole('button', { name: 'See our tickets' }).click();
  await page.getByRole('link', { name: 'Print the tickets' }).click();
  await expect(page.getByText(`to ${name}`)).toBeVisible();
});

test('a name that looks like a page, a query or a formula is shown as text on the page, in the letter and in the file', async ({ page, browser }) => {
  const name = `=1+1<b id=bold>Rob</b><script>document.title='owned'</script>'); drop table bookings;--`;
  const email = 'rob@visitor.example';
  const code = await bookFree(page, { name, email, people: ONE, day: 'next', times: [['Thistledown Junction', '12:15']] });
  await page.goto(`/bookings/${code}/print`);
  await expect(page.getByText(`to ${name}`)).toBeVisible();
  await expect(page.locator('#bold')).toHaveCount(0);
  expect(await page.title()).not.toBe('owned');
  const letter = await letterTo(email, /^Your day in one garden/);
  expect(letter.html).not.toMatch(/<script|<b id=bold/);

  const office = await (await browser.newContext()).newPage();
  await signInAs(office, 'Cleo');
  await office.goto(`/office/bookings?find=${code}`);
  await expect(office.getByRole('table').getByText(name)).toBeVisible();
  const coming = office.waitForEvent('download');
  await office.getByRole('link', { name: /as a CSV file$/ }).click();
  const csv = readFileSync(await (await coming).path(), 'utf8');
  expect(csv).toMatch(/^'=1\+1<b/m); // a leading apostrophe keeps a spreadsheet from reckoning (OWASP, CSV injection)
  await office.getByLabel('Name, code or e-mail').fill("%_' or true --");
  await office.getByRole('button', { name: 'Find the party' }).click();
  await expect(office.getByRole('main').getByText(/0 bookings|No bookings|no booking/i).first()).toBeVisible();
});

test('places whose time ran out are not paid for, and what was typed is still there', async ({ page }) => {
  await openTheBoard(page, 'later');
  await sayWhoComes(page, ONE);
  await choose(page, 'Inchworm & Vale', '10:00');
  await keepPlaces(page);
  await giveDetails(page, { name: 'Late Larch', email: 'larch@visitor.example' });
  setClock(11);
  await page.getByRole('button', { name: /^Pay/ }).click();
  await expect(page.getByText(/no longer kept/i).first()).toBeVisible();
  await expect(page.getByLabel('Your name')).toHaveValue('Late Larch');

  await page.goto('/hold');
  await expect(page.getByRole('heading', { name: 'No longer kept' })).toBeVisible();
  await page.getByRole('button', { name: 'Keep the same places again' }).click();
  await expect(page.getByRole('heading', { name: /^Kept for you until/ })).toBeVisible();
  await expect(page.getByLabel('Your name')).toHaveValue('Late Larch');
  await expect(page.getByLabel('E-mail')).toHaveValue('larch@visitor.example');
  await page.getByRole('button', { name: 'Let them go' }).click();
  await expect(page.getByRole('heading', { name: 'No longer kept' })).toBeVisible();
});

test('two tabs of a browser share what it keeps, and a new choice takes the place of the old one', async ({ page }) => {
  await openTheBoard(page, 'later');
  await sayWhoComes(page, ONE);
  await choose(page, 'Inchworm & Vale', '11:00');
  await keepPlaces(page);
  const second = await page.context().newPage();
  await openTheBoard(second, 'later');
  await expect(second.getByText(/^Kept for you until/)).toBeVisible();
  await sayWhoComes(second, ONE);
  await choose(second, 'Curlew Pier Railway', '14:00');
  await keepPlaces(second);
  await expect(second.getByRole('table')).not.toContainText('Inchworm');

  await giveDetails(page, { name: 'Two Tabs', email: 'tabs@visitor.example' });
  await page.getByRole('button', { name: /^Pay/ }).click();
  await expect(page.getByText(/no longer kept/i).first()).toBeVisible(); // the first tab's places are given back
  await page.reload();
  await expect(page.getByRole('table')).toContainText('Curlew Pier');
  await page.getByRole('button', { name: 'Keep them until' }).click();
  await expect(page.getByRole('heading', { name: /^Kept for you until/ })).toBeVisible();
  await second.getByRole('button', { name: 'Let them go' }).click();
  await expect(second.getByRole('heading', { name: 'No longer kept' })).toBeVisible();
  await page.reload();
  await expect(page.getByRole('heading', { name: 'No longer kept' })).toBeVisible();
});
