import { expect, test } from '@playwright/test';
import { GOOD_CARD, letterTo, linkIn, payWith, refusal } from '../support/journeys';

const BEN = 'ben@alderfork.example';

test('a member signs in by a code, pays dues by card and has the receipt; then ends every sign-in at once', async ({ page, browser }) => {
  await page.goto('/sign-in');
  const byLetter = page.getByRole('region', { name: 'By letter' });
  await byLetter.getByLabel('E-mail').fill(BEN);
  await byLetter.getByRole('button', { name: 'Write me a code' }).click();
  await expect(page.getByRole('heading', { name: 'Look in your post' })).toBeVisible();
  const first = await letterTo(BEN, /^Your sign-in code/);
  const code = linkIn(first, /\b\d{6}\b/);
  expect(first.subject).not.toContain(code);

  await page.getByLabel('The code in the letter').fill(code === '000000' ? '111111' : '000000');
  await page.getByRole('button', { name: 'Sign in' }).click();
  await expect(refusal(page)).toContainText('That code is not right');
  await expect(page.getByLabel('E-mail')).toHaveValue(BEN);
  await page.getByLabel('The code in the letter').fill(code);
  await page.getByRole('button', { name: 'Sign in' }).click();
  await page.waitForURL('**/member');
  await expect(page.getByRole('heading', { level: 1 })).toContainText('Okonjo');

  await page.getByRole('link', { name: 'My dues' }).first().click();
  await page.getByRole('button', { name: /^Pay \$[\d.]+ by card$/ }).click();
  await payWith(page, GOOD_CARD);
  await page.waitForURL('**/member/dues**');
  await expect(async () => {
    await page.reload();
    await expect(page.getByText('The payment has come, thank you.')).toBeVisible({ timeout: 1000 });
  }).toPass();
  await expect(page.getByText('Nothing is owed.')).toBeVisible();
  const letter = await letterTo(BEN, /^Receipt .*: dues/);
  const number = linkIn(letter, /\b\d{4}\/\d{4}\b/);
  await page.getByRole('link', { name: number }).click();
  await expect(page.getByRole('heading', { level: 1 })).toContainText(`Receipt ${number}`);
  await expect(page.getByRole('main')).toContainText('by card');

  const elsewhere = await browser.newContext();
  const other = await elsewhere.newPage();
  await other.goto('/sign-in');
  await other.getByRole('region', { name: 'By letter' }).getByLabel('E-mail').fill(BEN);
  await other.getByRole('button', { name: 'Write me a code' }).click();
  const link = linkIn(await letterTo(BEN, /^Your sign-in code/, first), /http\S+\/sign-in\/link\/[\w-]+/);
  await other.request.get(link); // a mail scanner opens links, and must not use them up
  await other.goto(link);
  await other.getByRole('button', { name: 'Sign in here' }).click();
  await other.waitForURL('**/member');
  await other.goto(link);
  await other.getByRole('button', { name: 'Sign in here' }).click();
  await expect(refusal(other)).toContainText('used up'); // once

  await other.goto('/account');
  await expect(other.getByRole('listitem').filter({ hasText: /by a code|by a letter’s link/ })).toHaveCount(2);
  await other.getByRole('button', { name: 'Sign out everywhere at once' }).click();
  await expect(other.getByRole('link', { name: 'Sign in' }).first()).toBeVisible();
  await page.goto('/member');
  await expect(page).toHaveURL(/\/sign-in/);
  await elsewhere.close();
});
