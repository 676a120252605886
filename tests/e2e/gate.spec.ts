import { expect, test, type Page } from '@playwright/test';
import { filmCode } from '../support/camera';
import { backToNow, bookFree, choose, dayInAddress, giveDetails, GOOD_CARD, keepPlaces, openTheBoard, openTickets, payWith, sayWhoComes, setClubClock, signInAs } from '../support/journeys';
import { readQr } from '../support/journeys-tickets';

test.afterEach(backToNow);

const qrOf = (page: Page, garden: string) => readQr(page.getByRole('article', { name: new RegExp(`^Ticket for ${garden}`) }).getByRole('img', { name: /^QR code/ }));

/** A party of three with a ticket for Thistledown Junction and one for Copperkettle & Western: what their QR codes say. */
async function partyOfThree(page: Page): Promise<{ day: string; here: string; elsewhere: string }> {
  await openTheBoard(page, 'next');
  const day = dayInAddress(page.url());
  await sayWhoComes(page, { adults: 2, children: 1, babes: 0 });
  await choose(page, 'Thistledown Junction', '10:00');
  await choose(page, 'Copperkettle & Western', '11:30');
  await keepPlaces(page);
  await giveDetails(page, { name: 'Quentin Marlowe', email: 'quentin@visitor.example' });
  await page.getByRole('button', { name: /^Pay / }).click();
  await payWith(page, GOOD_CARD);
  await openTickets(page);
  return { day, here: await qrOf(page, 'Thistledown'), elsewhere: await qrOf(page, 'Copperkettle') };
}

/** The coordinator makes a pass for the gate of Thistledown Junction; answers with its link. */
async function makePass(office: Page): Promise<string> {
  await signInAs(office, 'Cleo');
  await office.goto('/office/open-days');
  const day = await office.getByRole('table').getByRole('link', { name: /Open Gardens/ }).getAttribute('href');
  await office.goto(`${day ?? ''}/gates`);
  await office.getByLabel('Gate', { exact: true }).selectOption({ label: '4 Thistledown' });
  await office.getByLabel('Helper, or which turn').fill('Sybil, in the morning');
  await office.getByRole('button', { name: 'Make a gate pass' }).click();
  return office.getByText(/\/gate#/).innerText();
}

test('a helper scans, lets in by a press on the number, takes it back, and finds parties by code and name @phone', async ({ page, browser }) => {
  const { day, here, elsewhere } = await partyOfThree(page);
  const code = await bookFree(await (await browser.newContext()).newPage(), { name: 'Zuzanna Łęcka', email: 'zuzanna@visitor.example', people: { adults: 1, children: 0, babes: 0 }, day: 'next', times: [['Thistledown Junction', '10:00']] });
  const office = await (await browser.newContext()).newPage();
  const link = await makePass(office);
  setClubClock(day, '10:02');
  const phone = await (await browser.newContext()).newPage();
  const crowd = phone.getByText(/in the garden/).first();

  await filmCode(elsewhere);
  await phone.goto(link);
  await expect(phone.getByText('Garden 5, not 4')).toBeVisible();
  await expect(phone.getByRole('heading', { level: 1 })).toContainText('Thistledown');
  expect(phone.url()).not.toContain('#'); // the pass has left the address
  await expect(crowd).toContainText(/Nobody is in the garden yet, so there is room for 40\. .* due by 10:20\./);

  await filmCode(here);
  await phone.reload();
  const number = phone.getByRole('button', { name: 'Let in 3' });
  await expect(number).toBeVisible();
  await expect(phone.getByText('Quentin Marlowe')).toBeVisible();
  await number.dblclick(); // a thumb in a hurry lets them in once
  await expect(phone.getByText(/^Three in at 10:0\d$/)).toHaveCount(1);
  await expect(crowd).toContainText('3 people are in the garden, so there is room for 37.');
  await phone.getByRole('button', { name: 'Take that back' }).click();
  await expect(number).toBeVisible();
  await expect(crowd).toContainText('Nobody is in the garden yet');
  await number.click();
  await expect(phone.getByText(/^Three in at/)).toHaveCount(1);

  await phone.getByRole('button', { name: 'Find by name or code' }).click();
  await phone.getByRole('button', { name: 'Code', exact: true }).click();
  await phone.getByRole('textbox').pressSequentially(code.toLowerCase());
  await phone.getByRole('button', { name: /Zuzanna Łęcka/ }).click();
  await phone.getByRole('button', { name: 'Let in 1' }).click();
  await expect(phone.getByText(/^One in at/)).toHaveCount(1);
  await expect(crowd).toContainText('4 people are in the garden');

  await phone.getByRole('button', { name: 'Find by name or code' }).click();
  for (const letter of 'MAR') await phone.getByRole('button', { name: letter, exact: true }).click();
  await phone.getByRole('button', { name: /Quentin Marlowe.*came in at 10:0/ }).click();
  await expect(phone.getByText(/^Came in at 10:0\d$/)).toBeVisible();
  await expect(phone.getByRole('button', { name: /^Let in/ })).toHaveCount(0);

  await phone.getByRole('button', { name: 'Next ticket' }).click();
  await phone.getByRole('button', { name: 'One came out' }).click();
  await expect(crowd).toContainText('3 people are in the garden');
  await filmCode('NOT ONE OF OURS');
  await phone.reload();
  await expect(phone.getByText('Not one of ours')).toBeVisible();
  await expect(crowd).toContainText('3 people are in the garden'); // what was written down outlives the reload

  await office.reload();
  const row = office.getByRole('table', { name: 'Heads at each gate' }).getByRole('row', { name: /Thistledown/ });
  await expect(row.getByRole('cell').nth(1)).toHaveText('4'); // let in
  await expect(row.getByRole('cell').nth(2)).toHaveText('3'); // in now
  await expect(office.getByText(link)).toHaveCount(0); // shown once
  await office.getByRole('button', { name: 'Take back the pass of Sybil, in the morning' }).click();
  await expect(office.getByRole('button', { name: /^Take back the pass of Sybil/ })).toHaveCount(0);
  await phone.reload();
  await expect(phone.getByText('This gate pass was taken back.')).toBeVisible();
});
