import { readFileSync } from 'node:fs';
import { expect, test } from '@playwright/test';
import { choose, DECLINED_CARD, giveDetails, GOOD_CARD, keepPlaces, letterTo, linkIn, openTheBoard, openTickets, payWith, sayWhoComes, timeAt } from '../support/journeys';
import { eventsOf, readQr } from '../support/journeys-tickets';

const MM = 96 / 25.4; // CSS pixels in a millimetre (CSS Values and Units 3, section 6.2)
const FIVE = { adults: 2, children: 2, babes: 1 };

test('a visitor books two gardens for five, pays, reads the letter, opens the calendar file and prints the tickets', async ({ page, browser }) => {
  await openTheBoard(page, 'next');
  await sayWhoComes(page, FIVE);
  await choose(page, 'Pine Barrow Light Railway', '10:45');

  const barred = page.getByRole('button', { name: 'Thistledown Junction, 10:45, cannot be reached: you are at Pine Barrow then' });
  await expect(barred).toBeVisible();
  await expect(timeAt(page, 'Thistledown Junction', '10:45')).toHaveCount(0);
  await choose(page, 'Tansy Bank & Dunlin', '12:15');
  await expect(page.getByText('$48.00')).toBeVisible(); // twice 2 × 8 + 2 × 4; the babe costs nothing
  await keepPlaces(page);

  await page.reload();
  await expect(page.getByRole('heading', { level: 1 })).toContainText('Kept for you until');
  await giveDetails(page, { name: 'Marisol Vane', email: 'marisol@visitor.example' });
  await page.getByRole('button', { name: 'Pay $48.00' }).click();
  await payWith(page, DECLINED_CARD);
  await expect(page.getByText(/Nothing was taken\. Try another card/)).toBeVisible();
  await payWith(page, GOOD_CARD);
  await expect(page.getByRole('heading', { name: 'It is yours' })).toBeVisible();
  const code = await openTickets(page);
  await expect(page.getByRole('article', { name: /^Ticket for Pine Barrow Light Railway, .* 10:45, in by 11:05, 2 adults, 2 children and 1 babe in arms$/ })).toBeVisible();
  await expect(page.getByRole('article', { name: /^Ticket for Tansy Bank & Dunlin, .* 12:15/ })).toBeVisible();
  await expect(page.getByText('marisol@visitor.example')).toBeVisible();
  await expect(page.getByRole('button', { name: 'Yes, that is mine' })).toHaveCount(0); // only the letter's link shows that the letter came

  const letter = await letterTo('marisol@visitor.example', /^Your day in two gardens, /);
  for (const part of [letter.text, letter.html]) expect(part).toContain(`${code.slice(0, 4)} ${code.slice(4)}`);
  expect(letter.text).toContain('2 adults, 2 children and 1 babe in arms');
  expect(letter.text).toContain('$48.00 is paid');
  expect(letter.html).not.toMatch(/src="http/); // no remote picture
  const attached = eventsOf(letter.parts.find(({ type }) => type === 'text/calendar')?.text ?? '');
  expect(attached.map(({ summary }) => summary)).toEqual([expect.stringContaining('Pine Barrow'), expect.stringContaining('Tansy Bank')]);
  const invitation = await letterTo('marisol@visitor.example', /^Tansy Bank & Dunlin, /);
  expect(invitation.parts.find(({ type }) => type === 'text/calendar')?.method).toBe('REQUEST');

  const elsewhere = await browser.newContext();
  const other = await elsewhere.newPage();
  await other.goto(`/bookings/${code}`);
  await expect(other.getByRole('article')).toHaveCount(0); // the code alone opens nothing
  await other.goto(linkIn(letter, /http\S+\/link\/[\w-]+/));
  await expect(other).toHaveURL(new RegExp(`/bookings/${code}$`)); // the secret has left the address
  await other.getByRole('button', { name: 'Yes, that is mine' }).click();
  await expect(other.getByRole('heading', { name: 'Is this your e-mail?' })).toHaveCount(0);

  const coming = other.waitForEvent('download');
  await other.getByRole('link', { name: 'Add to calendar' }).click();
  const events = eventsOf(readFileSync(await (await coming).path(), 'utf8'));
  expect(events.map(({ uid }) => uid).sort()).toEqual(attached.map(({ uid }) => uid).sort());
  expect(events.map(({ start }) => start.slice(11, 16)).sort()).toEqual(['10:45', '12:15']);
  expect(events.map(({ location }) => location).join()).not.toMatch(/Halt Street|Ridge Road/); // the area only, weeks before

  await other.getByRole('link', { name: 'Print the tickets' }).click();
  await other.waitForURL('**/print');
  await other.emulateMedia({ media: 'print' });
  for (const qr of await other.getByRole('img', { name: /^QR code/ }).all()) {
    const box = await qr.boundingBox();
    const modules = Number((await qr.getAttribute('viewBox'))?.split(' ')[2]);
    expect(((box?.width ?? 0) * (modules - 8)) / modules / MM).toBeGreaterThanOrEqual(32); // the symbol without its quiet zone
    expect(await readQr(qr)).toMatch(/^[0-9A-Z $%*+\-./:]+$/); // ISO/IEC 18004, alphanumeric mode
  }
  await elsewhere.close();
});

test('on a phone, a visitor books and pays, and the way back tells the truth @phone', async ({ page }) => {
  await openTheBoard(page, 'next');
  await sayWhoComes(page, { adults: 1, children: 0, babes: 0 });
  await choose(page, 'Old Orchard Line', '11:30');
  await expect(page.getByRole('button', { name: /cannot be reached: you are at Old Orchard then/ }).first()).toBeVisible();
  await keepPlaces(page);
  await giveDetails(page, { name: 'Ines Calder', email: 'ines@visitor.example' });
  await page.getByRole('button', { name: 'Pay $8.00' }).click();
  await payWith(page, GOOD_CARD);
  await expect(page.getByRole('heading', { name: 'It is yours' })).toBeVisible();

  await page.goto('/');
  await page.goBack();
  await expect(page.getByRole('heading', { name: 'It is yours' })).toBeVisible();
  await page.goBack(); // the card service's page, which is done and leads on
  await expect(page.getByRole('heading', { name: 'It is yours' })).toBeVisible();
  await page.goto('/hold');
  await expect(page.getByRole('heading', { name: 'It is yours' })).toBeVisible();
  await expect(page.getByRole('button', { name: /^Pay/ })).toHaveCount(0);
  await openTickets(page);
  await expect(page.getByRole('article', { name: /^Ticket for Old Orchard Line/ })).toBeVisible();
});
