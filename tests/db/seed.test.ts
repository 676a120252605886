import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { dirname, join } from 'node:path';
import { and, eq, gt, isNull, lt, sql } from 'drizzle-orm';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { getDb } from '@/db/client';
import { bookings, visits } from '@/db/schema/bookings';
import { payments, postings } from '@/db/schema/books';
import { gardenPlants, gardens, plants } from '@/db/schema/gardens';
import { gateFacts } from '@/db/schema/gate';
import { lettersDue } from '@/db/schema/letters';
import { areaMinutes, entryTimes, openDays, stops } from '@/db/schema/opendays';
import { households } from '@/db/schema/people';
import { getClub } from '@/lib/club/queries';
import { only } from '@/lib/core/only';
import { householdDues } from '@/lib/dues/queries';
import type { SystemCtx } from '@/lib/infra/context';
import { signInWithPassword } from './seed-sign-in';
import { Cards } from '@/scripts/stand-ins/cards/cards';
import { seed } from '@/scripts/seed/run';
import { DEMO_SIGN_INS } from '@/scripts/seed/sign-ins';

const NOW = new Date('2026-12-01T17:00:00Z');
const db = getDb();
const count = async (query: ReturnType<typeof sql>): Promise<number> => only((await db.execute<{ n: number }>(sql`select (${query})::int as n`)).rows).n;

const cardsFile = join(mkdtempSync(join(tmpdir(), 'leafhalt-seed-')), 'cards.jsonl');

beforeAll(() => seed({ now: NOW, cardsFile }));
afterAll(() => rmSync(dirname(cardsFile), { recursive: true }));

describe('the demo club', () => {
  it('is planted once and never over another club', async () => {
    await expect(seed({ now: NOW })).rejects.toThrow('There is a club in this database already.');
  });

  it('has 12 gardens, 60 households and three open days: one past and two to come', async () => {
    const days = await db.select({ heldOn: openDays.heldOn }).from(openDays).orderBy(openDays.heldOn);

    expect(await db.$count(gardens)).toBe(12);
    expect(await db.$count(households)).toBe(60);
    expect(days.map(({ heldOn }) => heldOn)).toEqual(['2026-11-14', '2026-12-12', '2027-01-16']);
  });

  it('has taken exactly the places of live visits and of callers expected, at every entry time', async () => {
    const live = db.select({ sum: sql`coalesce(sum(${visits.heads}), 0)` }).from(visits).where(and(eq(visits.entryTimeId, entryTimes.id), isNull(visits.givenBackAt)));

    const wrong = await db.select({ id: entryTimes.id }).from(entryTimes).where(sql`${entryTimes.taken} <> ${entryTimes.walkUps} + (${live})`);

    expect(wrong).toEqual([]);
  });

  it('has on the coming day seven stops, one full entry time, some nearly full, a free stop and one with prices of its own', async () => {
    const next = only(await db.select({ id: openDays.id }).from(openDays).where(eq(openDays.heldOn, '2026-12-12')));
    const times = await db.select({ left: sql<number>`${entryTimes.capacity} - ${entryTimes.taken}` }).from(entryTimes).where(eq(entryTimes.openDayId, next.id));

    expect(await db.$count(stops, eq(stops.openDayId, next.id))).toBe(7);
    expect(times.length).toBe(54);
    expect(times.filter(({ left }) => left === 0)).toHaveLength(1);
    expect(times.filter(({ left }) => left > 0 && left <= 5).length).toBeGreaterThanOrEqual(5);
    expect(await count(sql`select count(*) from prices where open_day_id = ${next.id} and stop_id is not null and kind = 'adult' and amount_minor = 0`)).toBe(1);
    expect(await count(sql`select count(*) from prices where open_day_id = ${next.id} and stop_id is not null and kind = 'child' and amount_minor = 500`)).toBe(1);
  });

  it('gives no party two visits between which it cannot travel', async () => {
    const tight = await count(sql`select count(*) from visits a join visits b on b.booking_id = a.booking_id and b.id <> a.id
      join entry_times ea on ea.id = a.entry_time_id join entry_times eb on eb.id = b.entry_time_id join stops sa on sa.id = ea.stop_id join stops sb on sb.id = eb.stop_id
      join area_minutes m on m.from_garden_id = sa.garden_id and m.to_garden_id = sb.garden_id
      where a.given_back_at is null and b.given_back_at is null and ea.opens_at <= eb.opens_at and ea.opens_at + make_interval(mins => sa.stay_minutes + m.minutes) > eb.opens_at`);

    expect(tight).toBe(0);
  });

  it('has balanced books, receipts numbered without a gap, and every paid booking paid in full', async () => {
    const sums = await db.select({ sum: sql<number>`sum(${postings.amountMinor})::int` }).from(postings);
    const years = await db.select({ year: payments.receiptYear, last: sql<number>`max(${payments.receiptNumber})`, all: sql<number>`count(*)::int` }).from(payments).groupBy(payments.receiptYear);
    const unpaid = await count(sql`select count(*) from bookings b where b.total_minor <> coalesce((select sum(p.amount_minor) from payments p where p.booking_id = b.id), 0)`);

    expect(sums).toEqual([{ sum: 0 }]);
    expect(years.every(({ last, all }) => last === all)).toBe(true);
    expect(unpaid).toBe(0);
  });

  it('learnt from its past day: parties that came, some that did not, callers, one slip taken back', async () => {
    const came = await count(sql`select count(distinct visit_id) from gate_facts where kind = 'admit'`);
    const expected = await db.$count(visits, and(isNull(visits.givenBackAt), sql`${visits.openDayId} = (select id from open_days where held_on = '2026-11-14')`));

    expect(came / expected).toBeGreaterThan(0.8);
    expect(came).toBeLessThan(expected);
    for (const kind of ['walk-up', 'count-out', 'undo', 'refuse'] as const) expect(await db.$count(gateFacts, eq(gateFacts.kind, kind))).toBeGreaterThan(0);
  });

  it('has dues that are paid, owing and lapsed, members for life and households that left', async () => {
    const ctx: SystemCtx = { db, club: await getClub(db), actor: { kind: 'system', name: 'test' }, now: NOW, requestId: 'test', client: null };
    const roll = await db.select({ id: households.id }).from(households);

    const dues = await Promise.all(roll.map(({ id }) => householdDues(ctx, id)));

    for (const kind of ['paid', 'lapsed', 'new', 'life', 'left'] as const) expect(dues.filter(({ standing }) => standing.kind === kind).length).toBeGreaterThan(1);
    expect(dues.filter(({ charges }) => charges.some(({ amountMinor, paidMinor }) => paidMinor < amountMinor)).length).toBeGreaterThan(20);
  });

  it('has something in flower in every month of the year', async () => {
    const months = await db.selectDistinct({ month: sql<number>`unnest(${plants.bloomMonths})` }).from(gardenPlants).innerJoin(plants, eq(plants.key, gardenPlants.plantKey));

    expect(months.map(({ month }) => month).sort((a, b) => a - b)).toEqual([1, 2, 3, 4, 5, 6, 7, 8, 9, 10, 11, 12]);
  });

  it('publishes minutes in whole fives, both ways alike, between all gardens', async () => {
    const uneven = await count(sql`select count(*) from area_minutes a join area_minutes b on b.from_garden_id = a.to_garden_id and b.to_garden_id = a.from_garden_id where a.minutes <> b.minutes or a.minutes % 5 <> 0`);

    expect(uneven).toBe(0);
    expect(await db.$count(areaMinutes)).toBe(12 * 11);
  });

  it('lets everyone on the printed list sign in with the printed password', async () => {
    for (const { email, password } of DEMO_SIGN_INS) expect(await signInWithPassword(email, password)).toBe(true);
    expect(await signInWithPassword('cleo@alderfork.example', 'not her password')).toBe(false);
  });

  it('has card payments that the card stand-in can refund, up to what is left of them', async () => {
    const cards = new Cards({ file: cardsFile, hook: null, clockOffsetFile: null });
    const paid = await db.execute<{ intent: string; amount: number; back: number }>(sql`select a.payment_intent_id as intent, a.amount_minor as amount,
      coalesce((select sum(r.amount_minor) from refunds r join payments p on p.id = r.payment_id where p.attempt_id = a.id), 0)::int as back from payment_attempts a`);

    const left = paid.rows.map(({ intent }) => {
      const charge = cards.store.find('charge', cards.store.find('intent', intent)?.latest_charge ?? '');
      return charge ? charge.amount - charge.amount_refunded : null;
    });
    cards.stop();

    expect(paid.rows.length).toBeGreaterThan(100);
    expect(left).toEqual(paid.rows.map(({ amount, back }) => amount - back));
  });

  it('has nothing dated after today but what is to come, and owes nobody a letter', async () => {
    expect(await db.$count(bookings, gt(bookings.madeAt, NOW))).toBe(0);
    expect(await db.$count(bookings, lt(bookings.confirmedAt, bookings.madeAt))).toBe(0);
    expect(await db.$count(payments, gt(payments.recordedAt, NOW))).toBe(0);
    expect(await db.$count(lettersDue)).toBe(0);
  });
});
