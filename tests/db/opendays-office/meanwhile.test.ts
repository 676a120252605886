import { eq, sql } from 'drizzle-orm';
import { beforeAll, describe, expect, it } from 'vitest';
import { getDb } from '@/db/client';
import { visits } from '@/db/schema/bookings';
import { openDays } from '@/db/schema/opendays';
import { changeEntryTime } from '@/lib/opendays/commands/entry-times';
import { changeOpenDay } from '@/lib/opendays/commands/plan';
import { only } from '@/lib/core/only';
import { aClub, anOpenDay, cleo, ctxOf } from '@/tests/support/cast';
import { refusalOf } from '../bookings/hold-cast';
import { aFreeDay, aParty, lettersTo } from './office-cast';

const words = { title: 'Test Open Gardens', placeLine: 'in the test valley', howToCome: null, opensAt: '10:00', closesAt: '16:00', adult: '0', child: '0', babe: '0', partyPeopleMax: null };

/** Comes back once some connection of this database waits for a lock. */
async function someoneWaits(): Promise<void> {
  for (;;) {
    const { rows } = await getDb().execute(sql`select 1 from pg_stat_activity where datname = current_database() and wait_event_type = 'Lock'`);
    if (rows.length > 0) return;
  }
}

describe('what a party does while the coordinator changes its time', () => {
  beforeAll(() => aClub());

  it('counts: places that were given back meanwhile are not written about', async () => {
    const { day, time } = await aFreeDay();
    const stays = await aParty(day.id, [time.id]);
    const goes = await aParty(day.id, [time.id], { email: 'finn@visitors.example' });
    const party = await getDb().$client.connect();
    await party.query('begin');
    await party.query('select 1 from bookings where id = $1 for no key update', [goes.bookingId]);

    const change = changeEntryTime(await ctxOf(await cleo()), { entryTimeId: time.id, opensAt: '10:30', graceMinutes: 20, capacity: 12, reason: null });
    await someoneWaits();
    await party.query('update entry_times set taken = taken - 2 where id = $1', [time.id]);
    await party.query('update visits set given_back_at = $2, version = version + 1 where booking_id = $1', [goes.bookingId, new Date()]);
    await party.query('commit');
    party.release();

    expect(await change).toBe(1);
    expect(await lettersTo(stays.bookingId)).toEqual(['calendar', 'change']);
    expect(await lettersTo(goes.bookingId)).toEqual([]);
    expect(only(await getDb().select({ version: visits.version }).from(visits).where(eq(visits.bookingId, goes.bookingId)))).toEqual({ version: 2 });
  });
});

describe('the day on which an open day is held', () => {
  it('can be changed until there are entry times, which stand on it', async () => {
    const ctx = await ctxOf(await cleo());
    const empty = await anOpenDay();
    const { day } = await aFreeDay();
    const heldOn = async (id: typeof day.id) => only(await getDb().select({ heldOn: openDays.heldOn }).from(openDays).where(eq(openDays.id, id))).heldOn;

    expect(await refusalOf(changeOpenDay(ctx, { openDayId: empty.id, ...words, heldOn: '2027-05-22' }))).toBe('done');
    expect(await refusalOf(changeOpenDay(ctx, { openDayId: day.id, ...words, heldOn: '2027-05-22' }))).toBe('day_has_times');
    expect(await refusalOf(changeOpenDay(ctx, { openDayId: day.id, ...words, heldOn: '2027-05-15', opensAt: '09:00' }))).toBe('done');

    expect([await heldOn(empty.id), await heldOn(day.id)]).toEqual(['2027-05-22', '2027-05-15']);
  });
});
