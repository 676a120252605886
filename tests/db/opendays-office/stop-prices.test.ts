import { eq } from 'drizzle-orm';
import { beforeAll, describe, expect, it } from 'vitest';
import { getDb } from '@/db/client';
import { bookings } from '@/db/schema/bookings';
import { holdPlaces } from '@/lib/bookings/commands/hold';
import { newId } from '@/lib/core/ids';
import { setStopPrices } from '@/lib/opendays/commands/stop-prices';
import { changeOpenDay } from '@/lib/opendays/commands/plan';
import { officeTimes } from '@/lib/opendays/office-queries';
import { stopPricesInput } from '@/lib/opendays/schema';
import { aBrowser, aClub, anEntryTime, anOpenDay, aStop, cleo, ctxOf, MAY_15 } from '@/tests/support/cast';
import { auditOf } from './office-cast';

const none = { adult: '', child: '', babe: '' };

async function aPricedStop() {
  const day = await anOpenDay(); // $8 an adult, $4 a child
  const stop = await aStop(day.id);
  return { day, stop, time: await anEntryTime(stop), ctx: await ctxOf(await cleo()) };
}

/** What two adults and a child are asked for one visit. */
async function asked({ day, time }: Awaited<ReturnType<typeof aPricedStop>>): Promise<number | undefined> {
  const id = await holdPlaces(await ctxOf(aBrowser()), { openDayId: day.id, wanted: [{ entryTimeId: time.id, adults: 2, children: 1, babes: 0 }], insists: false });
  return (await getDb().select({ totalMinor: bookings.totalMinor }).from(bookings).where(eq(bookings.id, id)))[0]?.totalMinor;
}

describe('a stop’s own prices', () => {
  beforeAll(() => aClub());

  it('take the place of the open day’s, kind by kind, and are kept in the audit trail', async () => {
    const here = await aPricedStop();

    await setStopPrices(here.ctx, { stopId: here.stop.id, ...none, adult: '12.50' });

    expect(await asked(here)).toBe(2 * 1250 + 400);
    expect((await officeTimes(here.ctx, here.day.id))[0]?.ownPrices).toEqual({ adult: 1250 });
    expect(await auditOf('set a stop’s own prices', here.stop.id)).toHaveLength(1);
  });

  it('make one stop free on a priced day', async () => {
    const here = await aPricedStop();

    await setStopPrices(here.ctx, { stopId: here.stop.id, adult: '0', child: '0', babe: '0' });

    expect(await asked(here)).toBe(0);
  });

  it('give way to the open day’s again when a box is emptied', async () => {
    const here = await aPricedStop();
    await setStopPrices(here.ctx, { stopId: here.stop.id, ...none, adult: '12.50', child: '6' });

    await setStopPrices(here.ctx, { stopId: here.stop.id, ...none });

    expect(await asked(here)).toBe(2 * 800 + 400);
  });

  it('refuse what is no amount beside its box, and change nothing', async () => {
    const here = await aPricedStop();

    await expect(setStopPrices(here.ctx, { stopId: here.stop.id, ...none, adult: '5', child: 'half' })).rejects.toMatchObject({ code: 'wrong_amount', detail: { fields: { child: expect.any(String) } } });
    expect(await asked(here)).toBe(2 * 800 + 400);
  });

  it('belong to a stop that is there', async () => {
    const { ctx } = await aPricedStop();

    await expect(setStopPrices(ctx, { stopId: newId<'stop'>(), ...none })).rejects.toMatchObject({ code: 'not_found' });
  });

  it('read boxes that were left out as empty', () => {
    expect(stopPricesInput.parse({ stopId: newId<'stop'>() })).toMatchObject(none);
  });
});

describe('people in one party', () => {
  it('are as many as the open day says, though the club’s settings say otherwise', async () => {
    const here = await aPricedStop();
    const words = { openDayId: here.day.id, title: 'Small parties', placeLine: 'in the valley', howToCome: null, heldOn: MAY_15.heldOn, opensAt: '10:00', closesAt: '16:00', adult: '8', child: '4', babe: '0' };

    await changeOpenDay(here.ctx, { ...words, partyPeopleMax: 2 });

    await expect(asked(here)).rejects.toMatchObject({ code: 'party_too_large' });
  });
});
