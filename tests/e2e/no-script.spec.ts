import { expect, test } from '@playwright/test';
import { choose, giveDetails, GOOD_CARD, keepPlaces, letterTo, openTheBoard, openTickets, payWith, refusal, sayWhoComes, timeAt } from '../support/journeys';

test.use({ javaScriptEnabled: false });

test('without JavaScript a visitor answers a clash, keeps, pays and has the tickets', async ({ page }) => {
  await openTheBoard(page, 'next');
  await sayWhoComes(page, { adults: 2, children: 1, babes: 1 });
  await choose(page, 'Saltmarsh & Plover', '10:00');
  await choose(page, 'Pine Barrow Light Railway', '14:30');
  await choose(page, 'Thistledown Junction', '14:30');
  await page.getByRole('button', { name: /^Keep / }).click();

  await expect(refusal(page)).toContainText(/you are at .* then\. Choose another time, or choose it all the same\./);
  await expect(page.getByLabel('Adults')).toHaveValue('2');
  for (const [garden, time] of [['Saltmarsh & Plover', '10:00'], ['Pine Barrow Light Railway', '14:30'], ['Thistledown Junction', '14:30']] as const) await expect(timeAt(page, garden, time)).toBeChecked();
  await page.getByRole('checkbox', { name: 'choose it all the same' }).check();
  await keepPlaces(page);

  await giveDetails(page, { name: '', email: 'no script at all' });
  await page.getByRole('button', { name: /^Pay / }).click();
  await expect(page.getByText('Type the name for the booking.').first()).toBeVisible();
  await expect(page.getByLabel('E-mail')).toHaveValue('no script at all');
  await giveDetails(page, { name: 'Piet Morrow', email: 'piet@visitor.example' });
  await page.getByRole('button', { name: /^Pay / }).click();
  await payWith(page, GOOD_CARD);
  await expect(page.getByRole('heading', { name: 'It is yours' })).toBeVisible();
  const code = await openTickets(page);
  await expect(page.getByRole('article', { name: /^Ticket for / })).toHaveCount(3);

  const letter = await letterTo('piet@visitor.example', /^Your day in three gardens, /);
  expect(letter.text).toContain(`${code.slice(0, 4)} ${code.slice(4)}`);
});
