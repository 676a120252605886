import { eq } from 'drizzle-orm';
import { beforeAll, describe, expect, it } from 'vitest';
import { getDb } from '@/db/client';
import { gardens } from '@/db/schema/gardens';
import { stops } from '@/db/schema/opendays';
import { newId, type Id } from '@/lib/core/ids';
import { addMinutes } from '@/lib/core/time';
import { addPlanNote, addStop, changeOpenDay, changeStop, makeOpenDay, publishOpenDay } from '@/lib/opendays/commands/plan';
import { findOfficeDay, gardensToAdd, officeOpenDays, officeTimes, planNotes } from '@/lib/opendays/office-queries';
import { sumsOf, toOfficeStops } from '@/lib/opendays/office-views';
import { aClub, aGarden, anEntryTime, anOpenDay, cleo, ctxOf, NOON } from '@/tests/support/cast';
import { keep, refusalOf } from '../bookings/hold-cast';
import { aFreeDay, aParty, auditOf } from './office-cast';

const spring = { slug: 'spring', title: 'Spring Open Gardens', placeLine: 'in the valley', howToCome: null, heldOn: '2027-05-15', opensAt: '10:00', closesAt: '16:00', adult: '8', child: '4.50', babe: '0', partyPeopleMax: null };

async function made(slug: string) {
  const ctx = await ctxOf(await cleo());
  await makeOpenDay(ctx, { ...spring, slug });
  const day = await findOfficeDay(ctx, slug);
  return { ctx, day: day ?? expect.fail('it was made') };
}

describe('an open day of the office', () => {
  beforeAll(() => aClub());

  it('is made with its prices and hours, and is not published', async () => {
    const { ctx, day } = await made('made');

    expect(day).toMatchObject({ title: 'Spring Open Gardens', opensAt: new Date('2027-05-15T14:00:00Z'), closesAt: new Date('2027-05-15T20:00:00Z'), publishedAt: null, adultMinor: 800, childMinor: 450, babeMinor: 0 });
    expect(await auditOf('made an open day', day.id)).toEqual([{ by: ctx.actor.accountId }]);
  });

  it.each([
    { what: 'a short name that another day has', change: { slug: 'taken' }, ends: 'slug_taken' },
    { what: 'gates that close before they open', change: { slug: 'b', closesAt: '09:30' }, ends: 'entry_time_over' },
    { what: 'a price that is no amount', change: { slug: 'c', adult: '8 or so' }, ends: 'wrong_amount' },
    { what: 'a price below nothing', change: { slug: 'd', child: '-1' }, ends: 'wrong_amount' },
  ])('is not made with $what', async ({ change, ends }) => {
    await anOpenDay({ slug: 'taken' }).catch(() => undefined); // made by the first of these

    expect(await refusalOf(makeOpenDay(await ctxOf(await cleo()), { ...spring, ...change }))).toBe(ends);
  });

  it('changes its words and prices, with the old ones in the audit trail', async () => {
    const { ctx, day } = await made('changed');

    await changeOpenDay(ctx, { ...spring, openDayId: day.id, title: 'May Open Gardens', adult: '9.00' });

    expect(await findOfficeDay(ctx, 'changed')).toMatchObject({ title: 'May Open Gardens', adultMinor: 900, childMinor: 450 });
    expect(await auditOf('changed an open day', day.id)).toHaveLength(1);
  });

  it('is published once, though two press at the same moment', async () => {
    const { ctx, day } = await made('published');

    const ends = await Promise.all([0, 1].map(() => refusalOf(publishOpenDay(ctx, { openDayId: day.id }))));

    expect(ends.sort()).toEqual(['changed_meanwhile', 'done']);
    expect((await findOfficeDay(ctx, 'published'))?.publishedAt).toEqual(NOON);
  });

  it('counts its places, parties and people, and not those of another day', async () => {
    const { day, stop, time } = await aFreeDay();
    const second = await anEntryTime(stop, { atMinutes: 120 });
    await aParty(day.id, [time.id, second.id], { people: { adults: 2, children: 1, babes: 1 } });
    await keep(day.id, [time.id]);
    const elsewhere = await aFreeDay();
    await aParty(elsewhere.day.id, [elsewhere.time.id]);
    const ctx = await ctxOf(await cleo());

    const stopsNow = toOfficeStops(await officeTimes(ctx, day.id));

    expect(await findOfficeDay(ctx, day.slug)).toMatchObject({ parties: 1, people: 4, cameInMinor: 0, lettersFailing: 0 });
    expect(sumsOf(stopsNow)).toEqual({ capacity: 24, taken: 8, held: 2, walkUps: 0 });
    expect(stopsNow[0]?.times.map((each) => each.people)).toEqual([4, 4]);
    expect((await officeOpenDays(ctx)).find((each) => each.id === day.id)).toMatchObject({ stops: 1, capacity: 24, taken: 8 });
  });
});

describe('its stops', () => {
  beforeAll(() => aClub());

  const asked = (openDayId: Id<'openDay'>, gardenId: Id<'garden'>) => ({ openDayId, gardenId, number: 1, stayMinutes: 35, headsLimit: 20 });

  it('are added once each, with a number of their own', async () => {
    const ctx = await ctxOf(await cleo());
    const day = await anOpenDay();
    const [first, second] = [await aGarden(), await aGarden()];

    const stopId = await addStop(ctx, asked(day.id, first.id));

    expect(await auditOf('added a stop', stopId)).toHaveLength(1);
    expect(await refusalOf(addStop(ctx, asked(day.id, second.id)))).toBe('slug_taken');
    expect(await refusalOf(addStop(ctx, { ...asked(day.id, first.id), number: 2 }))).toBe('changed_meanwhile');
    expect((await gardensToAdd(ctx, day.id)).map((garden) => garden.id)).not.toContain(first.id);
  });

  it('never carry more people than the host said', async () => {
    const ctx = await ctxOf(await cleo());
    const day = await anOpenDay();
    const garden = await aGarden({ headsLimit: 18 });

    expect(await refusalOf(addStop(ctx, { ...asked(day.id, garden.id), headsLimit: 19 }))).toBe('heads_over_limit');
    const stopId = await addStop(ctx, { ...asked(day.id, garden.id), headsLimit: 18 });
    expect(await refusalOf(changeStop(ctx, { stopId, stayMinutes: 40, headsLimit: 19 }))).toBe('heads_over_limit');

    await changeStop(ctx, { stopId, stayMinutes: 40, headsLimit: 12 });
    expect(await getDb().select({ stay: stops.stayMinutes, limit: stops.headsLimit }).from(stops).where(eq(stops.id, stopId))).toEqual([{ stay: 40, limit: 12 }]);
    expect(await auditOf('changed a stop', stopId)).toHaveLength(1);
  });

  it('are not made of a garden that was withdrawn', async () => {
    const ctx = await ctxOf(await cleo());
    const day = await anOpenDay();
    const garden = await aGarden();
    await getDb().update(gardens).set({ withdrawnAt: NOON }).where(eq(gardens.id, garden.id));

    expect(await refusalOf(addStop(ctx, asked(day.id, garden.id)))).toBe('not_found');
  });
});

describe('a pencil note', () => {
  beforeAll(() => aClub());

  it('stands in the margin with its writer\'s initials, the newest first', async () => {
    const ctx = await ctxOf(await cleo());
    const day = await anOpenDay();
    await addPlanNote(ctx, { openDayId: day.id, note: 'Ring the hosts.' });

    await addPlanNote({ ...ctx, now: addMinutes(NOON, 5) }, { openDayId: day.id, note: 'All rung.' });

    expect((await planNotes(ctx, day.id)).map(({ initials, note }) => `${note} ${initials}`)).toEqual(['All rung. C. H.', 'Ring the hosts. C. H.']);
  });

  it('is refused for an open day that is not there', async () => {
    const ctx = await ctxOf(await cleo());

    expect(await refusalOf(addPlanNote(ctx, { openDayId: newId<'openDay'>(), note: 'nowhere' }))).toBe('not_found');
  });
});
