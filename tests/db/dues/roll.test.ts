import { eq } from 'drizzle-orm';
import { beforeAll, describe, expect, it } from 'vitest';
import { getDb } from '@/db/client';
import { charges, terms } from '@/db/schema/dues';
import { contactDetails, households, people } from '@/db/schema/people';
import { only } from '@/lib/core/only';
import { addDays } from '@/lib/core/time';
import { rollLines, rollSums } from '@/lib/dues/roll-queries';
import { ROLL_FILTERS, rollInput } from '@/lib/dues/schema';
import { ada, aClub, ctxOf, dov, NOON, wren } from '@/tests/support/cast';

/** The same numbers in every run: a linear congruential generator (constants of Numerical Recipes). */
function dice(seed: number) {
  let state = seed;
  return (sides: number) => {
    state = (Math.imul(state, 1_664_525) + 1_013_904_223) >>> 0;
    return Math.floor((state / 2 ** 32) * sides);
  };
}

const TODAY = '2027-05-01';
const HOUSEHOLDS = 150;

async function aHousehold(roll: (sides: number) => number, index: number) {
  const db = getDb();
  const leftOn = roll(8) === 0 ? addDays(TODAY, roll(3) - 1) : null;
  const household = only(await db.insert(households).values({ name: `Household ${String(index).padStart(3, '0')}`, memberNumber: 5000 + index, joinedOn: '2015-04-01', leftOn }).returning({ id: households.id }));
  await db.insert(people).values({ householdId: household.id, givenName: 'Pat', familyName: `Number ${index}`, isContact: true });
  const classKey = ['single', 'household', 'life'][roll(3)] ?? 'single';
  const end = roll(6) === 0 ? null : addDays(TODAY, roll(100) - 50); // the days kept on are 45, so ends lie on both sides of it
  if (end !== null) await db.insert(terms).values({ householdId: household.id, classKey, during: `[2026-01-01,${addDays(end, 1)})`, madeAt: NOON });
  if (end === null || roll(2) === 0) await db.insert(charges).values({ householdId: household.id, classKey, termFrom: '2028-01-01', termTo: '2028-12-31', amountMinor: 4800, currency: 'USD', dueOn: '2028-01-01', madeAt: NOON });
}

describe('the roll', () => {
  beforeAll(async () => {
    await aClub();
    const roll = dice(20_270_501);
    for (let index = 0; index < HOUSEHOLDS; index += 1) await aHousehold(roll, index);
  });

  const all = async (asked: Record<string, string> = {}) => rollLines(await ctxOf(await wren()), rollInput.parse(asked), 'all');

  it('filters by exactly the standing that the rule gives each household', async () => {
    const { lines } = await all();
    const byRule = new Map(lines.map((line) => [line.name, line.standing.kind]));

    for (const standing of ROLL_FILTERS.filter((each) => each !== 'all')) {
      const shown = (await all({ standing })).lines.map((line) => line.name);
      const expected = [...byRule].filter(([name, kind]) => kind === standing && name.startsWith('Household')).map(([name]) => name);
      expect(shown.filter((name) => name.startsWith('Household')).sort(), standing).toEqual(expected.sort());
      expect(expected.length, `some households are ${standing}`).toBeGreaterThan(0);
    }
  });

  it('says in its bill as many as its lines show; who left is no household of the club', async () => {
    const ctx = await ctxOf(await wren());
    const { lines } = await all();
    const count = (kind: string) => lines.filter((line) => line.standing.kind === kind).length;

    const sums = await rollSums(ctx);

    expect(sums.by.left).toBe(count('left'));
    expect(sums.by.lapsed).toBe(count('lapsed'));
    expect(sums.households).toBeGreaterThanOrEqual(HOUSEHOLDS - count('left'));
  });

  it('shows fifty to a page and every household once', async () => {
    const ctx = await ctxOf(await wren());
    const pages = await Promise.all(['1', '2', '3', '4'].map((page) => rollLines(ctx, rollInput.parse({ page }))));

    const names = pages.flatMap(({ lines }) => lines.map((line) => line.name)).filter((name) => name.startsWith('Household'));

    expect(pages[0]?.lines).toHaveLength(50);
    expect(new Set(names).size).toBe(HOUSEHOLDS);
    expect(names).toHaveLength(HOUSEHOLDS);
  });

  it('finds by number and by a person\'s name, and sorts by what is owed', async () => {
    expect((await all({ find: '5007' })).lines.map((line) => line.name)).toEqual(['Household 007']);
    expect((await all({ find: 'number 12' })).lines.map((line) => line.memberNumber)).toContain(5012);
    const owed = (await all({ sort: 'owed', order: 'desc' })).lines.map((line) => line.owedMinor);
    expect(owed).toEqual([...owed].sort((a, b) => b - a));
  });

  it('is searched by street and e-mail only for who may see how people are reached', async () => {
    const member = await ada();
    await getDb().update(contactDetails).set({ street: '9 Quiet Mews' }).where(eq(contactDetails.email, member.email));
    const found = async (officer: Awaited<ReturnType<typeof wren>>, find: string) => (await rollLines(await ctxOf(officer), rollInput.parse({ find }))).total;

    expect([await found(await wren(), 'quiet mews'), await found(await wren(), member.email)]).toEqual([1, 1]);
    expect([await found(await dov(), 'quiet mews'), await found(await dov(), member.email)]).toEqual([0, 0]);
    expect(await found(await dov(), 'Fennimore')).toBe(1);
  });
});
