import { expect, test, type Page } from '@playwright/test';
import { choose, openTheBoard, placesLeft, sayWhoComes, timeAt } from '../support/journeys';

test('two visitors press for the last place at once: one gets it, the other is told and keeps the rest of the choice', async ({ browser }) => {
  const visitors: Page[] = await Promise.all([1, 2].map(async () => (await browser.newContext()).newPage()));
  for (const page of visitors) {
    await openTheBoard(page, 'next');
    await sayWhoComes(page, { adults: 1, children: 0, babes: 0 });
    expect(await placesLeft(page, 'Thistledown Junction', '13:00')).toBe(1);
    await choose(page, 'Thistledown Junction', '13:00');
    await choose(page, 'Copperkettle & Western', '15:15');
  }

  await Promise.all(visitors.map((page) => page.getByRole('button', { name: 'Keep 1 place at both' }).click()));

  const kept = (page: Page) => page.getByRole('heading', { level: 1, name: /^Kept for you until/ });
  const told = (page: Page) => page.getByText(/went to someone else a moment ago|has too few places left for you now/);
  await Promise.all(visitors.map((page) => expect(kept(page).or(told(page)).first()).toBeVisible()));
  const [winner, loser] = (await kept(visitors[0] as Page).isVisible()) ? visitors : visitors.toReversed();
  if (!winner || !loser) throw new Error('there are two visitors');
  await expect(winner.getByRole('table')).toContainText('Thistledown Junction');
  await expect(told(loser)).toContainText('the rest of your choice is kept');
  await expect(timeAt(loser, 'Copperkettle & Western', '15:15')).toBeChecked();

  await timeAt(loser, 'Thistledown Junction', '13:00').uncheck();
  await loser.getByRole('button', { name: 'Keep 1 place at 15:15' }).click();
  await expect(kept(loser)).toBeVisible();
  await winner.getByRole('button', { name: 'Let them go' }).click();
  await expect(winner.getByRole('heading', { name: 'No longer kept' })).toBeVisible();
  await loser.getByRole('button', { name: 'Let them go' }).click();
  await Promise.all(visitors.map((page) => page.context().close()));
});
