import { eq } from 'drizzle-orm';
import { beforeAll, describe, expect, it } from 'vitest';
import { getDb } from '@/db/client';
import { visits } from '@/db/schema/bookings';
import { addMinutes } from '@/lib/core/time';
import { writeToParties } from '@/lib/opendays/commands/notice';
import { aClub, anEntryTime, aStop, cleo, ctxOf, NOON } from '@/tests/support/cast';
import { keep } from '../bookings/hold-cast';
import { aFreeDay, aParty, auditOf, lettersTo } from './office-cast';

const words = { subject: 'Rain from two', body: 'Bring a coat.\nThe trains run all the same.' };

describe('a letter to those affected', () => {
  beforeAll(() => aClub());

  it('goes once to each party with live places, and to nobody else', async () => {
    const { day, stop, time } = await aFreeDay();
    const second = await anEntryTime(stop, { atMinutes: 120 });
    const eve = await aParty(day.id, [time.id, second.id]);
    const gone = await aParty(day.id, [time.id], { name: 'Gil', email: 'gil@visitors.example' });
    await getDb().update(visits).set({ givenBackAt: NOON }).where(eq(visits.bookingId, gone.bookingId));
    const deciding = await keep(day.id, [time.id]);

    const written = await writeToParties(await ctxOf(await cleo()), { openDayId: day.id, stopId: null, ...words });

    expect(written).toBe(1);
    expect(await lettersTo(eve.bookingId)).toEqual(['notice']);
    expect(await lettersTo(gone.bookingId)).toEqual([]);
    expect(await lettersTo(deciding)).toEqual([]);
    expect(await auditOf('wrote to the parties', day.id)).toHaveLength(1);
  });

  it('goes to the parties of one stop alone', async () => {
    const { day, time } = await aFreeDay();
    const other = await aStop(day.id, 2);
    const there = await anEntryTime(other, { atMinutes: 120 });
    const eve = await aParty(day.id, [time.id]);
    const finn = await aParty(day.id, [there.id], { name: 'Finn', email: 'finn@visitors.example' });

    expect(await writeToParties(await ctxOf(await cleo()), { openDayId: day.id, stopId: other.id, ...words })).toBe(1);

    expect([await lettersTo(eve.bookingId), await lettersTo(finn.bookingId)]).toEqual([[], ['notice']]);
  });

  it('is one letter when it is sent twice in a moment, and two when it is sent again later', async () => {
    const ctx = await ctxOf(await cleo());
    const { day, time } = await aFreeDay();
    const eve = await aParty(day.id, [time.id]);
    const send = (now: Date) => writeToParties({ ...ctx, now }, { openDayId: day.id, stopId: null, ...words });

    await Promise.all([send(NOON), send(NOON)]);
    expect(await lettersTo(eve.bookingId)).toEqual(['notice']);

    await send(addMinutes(NOON, 5));
    expect(await lettersTo(eve.bookingId)).toEqual(['notice', 'notice']);
  });
});
