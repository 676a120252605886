import AxeBuilder from '@axe-core/playwright';
import { expect, test } from '@playwright/test';
import { sdkFor } from '../support/cards-stand-in';
import { theStack } from '../support/stack';

const session = () => sdkFor(theStack().cards).checkout.sessions.create({
  mode: 'payment',
  line_items: [{ quantity: 2, price_data: { currency: 'usd', unit_amount: 600, product_data: { name: 'Two visits' } } }],
  customer_email: 'eve@visitor.example',
  success_url: `${theStack().site}/api/health?session={CHECKOUT_SESSION_ID}`,
  cancel_url: `${theStack().site}/api/health`,
});

test('the card stand-in\'s page takes a declined card, then one the bank asks about, by keyboard alone', async ({ page }) => {
  const { id, url } = await session();
  await page.goto(url ?? '');
  await page.getByLabel('Card number').fill('4000 0000 0000 0002');
  await page.keyboard.press('Enter');
  await expect(page.getByText('The card was declined. Nothing was taken.')).toBeVisible();
  expect((await new AxeBuilder({ page }).analyze()).violations).toEqual([]);

  await page.getByLabel('Card number').fill('4000 0025 0000 3155');
  await page.keyboard.press('Enter');
  await expect(page.getByRole('heading', { name: 'is this you?' })).toBeVisible();
  expect((await new AxeBuilder({ page }).analyze()).violations).toEqual([]);
  await page.getByRole('button', { name: 'Yes, it is me' }).press('Enter');

  await expect(page).toHaveURL(`${theStack().site}/api/health?session=${id}`);
});

test('the inbox can be read by everyone', async ({ page }) => {
  await page.goto(theStack().inbox);

  await expect(page.getByRole('heading', { name: 'Letters' })).toBeVisible();
  expect((await new AxeBuilder({ page }).analyze()).violations).toEqual([]);
});
