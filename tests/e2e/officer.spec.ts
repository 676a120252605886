import { readFileSync } from 'node:fs';
import { expect, test } from '@playwright/test';
import { bookFree, letterTo, signInAs } from '../support/journeys';
import { eventsOf } from '../support/journeys-tickets';
import { lettersTo } from '../support/stack';

test('a coordinator moves an entry time, and the party gets an updated invitation', async ({ page, browser }) => {
  const email = 'wilmot@visitor.example';
  const code = await bookFree(page, { name: 'Wilmot Ashdown', email, people: { adults: 2, children: 1, babes: 0 }, day: 'next', times: [['Thistledown Junction', '15:15']] });
  const invitation = await letterTo(email, /^Thistledown Junction, /);
  const [before] = eventsOf(invitation.parts.find(({ type }) => type === 'text/calendar')?.text ?? '');
  expect(before).toMatchObject({ method: 'REQUEST', start: expect.stringMatching(/T15:15:00$/) });

  const office = await (await browser.newContext()).newPage();
  await signInAs(office, 'Cleo');
  await office.goto('/office/open-days');
  await office.getByRole('link', { name: /Open Gardens/ }).first().click();
  await office.getByRole('link', { name: /Thistledown/ }).first().click();
  await office.getByRole('link', { name: /^15:15/ }).click();
  await office.getByLabel('Start', { exact: true }).fill('15:25');
  await office.getByLabel('Why, for the letter').fill('The hosts lunch at half past one.');
  await office.getByRole('button', { name: 'Change it, and write to those affected' }).click();
  await expect(office.getByRole('link', { name: /^15:25/ })).toBeVisible();

  const letter = await letterTo(email, /^Changed: /);
  expect(letter.text).toContain('The hosts lunch at half past one.');
  expect(letter.text).toContain('15:25');
  const updated = async () => (await lettersTo(email)).flatMap(({ parts }) => parts).filter(({ method }) => method === 'REQUEST').flatMap(({ text }) => eventsOf(text)).find(({ start }) => start.endsWith('T15:25:00'));
  await expect.poll(updated, { timeout: 40_000 }).toBeTruthy();
  const after = await updated();
  expect(after?.uid).toBe(before?.uid);
  expect(after?.sequence ?? 0).toBeGreaterThan(before?.sequence ?? 0);
  await page.goto(`/bookings/${code}`);
  await expect(page.getByRole('article', { name: /^Ticket for Thistledown Junction, .* 15:25/ })).toBeVisible();

  await office.goto('/office/bookings');
  await office.getByLabel('Name, code or e-mail').fill(code);
  await office.getByRole('button', { name: 'Find the party' }).click();
  await office.getByRole('link', { name: /Wilmot Ashdown/ }).click();
  await expect(office.getByText(email).first()).toBeVisible();
  await office.context().close();
});

test('a treasurer records a cheque and sees the money; a secretary finds the household and takes the roll along', async ({ page, browser }) => {
  await signInAs(page, 'Dov');
  await page.goto('/office/roll');
  await page.getByRole('searchbox').fill('Plumtree');
  await page.getByRole('button', { name: 'Look on the roll' }).click();
  await page.getByRole('table').getByRole('link', { name: /Plumtree/ }).click();
  await page.getByRole('link', { name: /^The household: / }).click();
  await page.waitForURL(/\/office\/roll\/[0-9a-f-]{36}/);
  const form = page.locator('form', { has: page.getByRole('button', { name: 'Record it and write the receipt' }) }).first();
  const amount = await form.getByLabel('Amount').inputValue();
  await form.getByLabel('Amount').fill('sixty');
  await form.getByRole('button', { name: 'Record it and write the receipt' }).click();
  await expect(page.getByText('Type an amount like').first()).toBeVisible();
  await expect(form.getByLabel('Amount')).toHaveValue('sixty');
  await form.getByLabel('It came as').selectOption('cheque');
  await form.getByLabel('Amount').fill(amount);
  await form.getByLabel('Reference').fill('No. 000417');
  await form.getByRole('button', { name: 'Record it and write the receipt' }).click();
  const receipts = page.getByRole('table', { name: 'Receipts of this household' });
  await expect(receipts.getByRole('row').filter({ hasText: 'cheque' }).filter({ hasText: `$${amount}` })).not.toHaveCount(0);

  await page.goto('/office/books');
  const row = page.getByRole('table', { name: 'Receipts' }).getByRole('row').filter({ hasText: 'No. 000417' });
  await expect(row).toContainText('Plumtree');
  await expect(row).toContainText(`$${amount}`);

  const desk = await (await browser.newContext()).newPage();
  await signInAs(desk, 'Wren');
  await desk.goto('/office/roll');
  await desk.getByRole('searchbox').fill('plumtree');
  await desk.getByRole('button', { name: 'Look on the roll' }).click();
  await expect(desk.getByRole('table').getByRole('row').filter({ hasText: 'Plumtree' })).toContainText(/Paid/i);
  const coming = desk.waitForEvent('download');
  await desk.getByRole('link', { name: /as a CSV file$/ }).click();
  const csv = readFileSync(await (await coming).path(), 'utf8');
  expect(csv.trim().split(/\r\n/)).toHaveLength(2);
  expect(csv).toContain('Plumtree');
  await desk.goto('/office/books');
  await expect(desk.getByRole('table', { name: 'Receipts' })).toHaveCount(0); // the books are the treasurer's
  await desk.context().close();
});
