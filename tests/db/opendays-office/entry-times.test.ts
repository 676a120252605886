import { eq } from 'drizzle-orm';
import { beforeAll, describe, expect, it } from 'vitest';
import { getDb } from '@/db/client';
import { visits } from '@/db/schema/bookings';
import { letterTexts, letters } from '@/db/schema/letters';
import { entryTimes } from '@/db/schema/opendays';
import { asId, type Id } from '@/lib/core/ids';
import { only } from '@/lib/core/only';
import { changeEntryTime, closeEntryTime, makeEntryTimes, reopenEntryTime } from '@/lib/opendays/commands/entry-times';
import { planNotes } from '@/lib/opendays/office-queries';
import { aClub, anEntryTime, anOpenDay, aStop, cleo, ctxOf } from '@/tests/support/cast';
import { keep, refusalOf } from '../bookings/hold-cast';
import { aFreeDay, aParty, auditOf, lettersTo } from './office-cast';

const row = { firstAt: '10:00', lastAt: '12:15', everyMinutes: 45, graceMinutes: 20, capacity: 12 };
const later = { opensAt: '10:30', graceMinutes: 20, capacity: 12, reason: 'the steam-up takes longer' };
const timeOf = async (id: Id<'entryTime'>) => only(await getDb().select().from(entryTimes).where(eq(entryTimes.id, id)));
const versionsOf = async (bookingId: Id<'booking'>) => (await getDb().select({ version: visits.version }).from(visits).where(eq(visits.bookingId, bookingId))).map((visit) => visit.version);

describe('making entry times', () => {
  beforeAll(() => aClub());

  it('makes a whole row at once, and keeps who did it', async () => {
    const coordinator = await cleo();
    const stop = await aStop((await anOpenDay()).id);

    expect(await makeEntryTimes(await ctxOf(coordinator), { stopId: stop.id, ...row })).toBe(4);

    const starts = await getDb().select({ opensAt: entryTimes.opensAt, capacity: entryTimes.capacity }).from(entryTimes).where(eq(entryTimes.stopId, stop.id));
    expect(starts.map(({ opensAt }) => opensAt.toISOString()).sort()).toEqual(['2027-05-15T14:00:00.000Z', '2027-05-15T14:45:00.000Z', '2027-05-15T15:30:00.000Z', '2027-05-15T16:15:00.000Z']);
    expect(await auditOf('made entry times', stop.id)).toEqual([{ by: coordinator.accountId }]);
  });

  it('makes none of a row of which one start is there already', async () => {
    const ctx = await ctxOf(await cleo());
    const stop = await aStop((await anOpenDay()).id);
    await anEntryTime(stop, { atMinutes: 90 });

    expect(await refusalOf(makeEntryTimes(ctx, { stopId: stop.id, ...row }))).toBe('entry_times_overlap');

    expect(await getDb().select({ id: entryTimes.id }).from(entryTimes).where(eq(entryTimes.stopId, stop.id))).toHaveLength(1);
  });

  it('gives no more places than the stop carries people', async () => {
    const ctx = await ctxOf(await cleo());
    const stop = await aStop((await anOpenDay()).id, 1, { headsLimit: 10 });

    expect(await refusalOf(makeEntryTimes(ctx, { stopId: stop.id, ...row, capacity: 11 }))).toBe('heads_over_limit');
    expect(await refusalOf(makeEntryTimes(ctx, { stopId: stop.id, ...row, capacity: 10 }))).toBe('done');
  });

  it('makes the row once, though two coordinators press at the same moment', async () => {
    const ctx = await ctxOf(await cleo());
    const stop = await aStop((await anOpenDay()).id);

    const ends = await Promise.all([0, 1].map(() => refusalOf(makeEntryTimes(ctx, { stopId: stop.id, ...row }))));

    expect(ends.sort()).toEqual(['done', 'entry_times_overlap']);
    expect(await getDb().select({ id: entryTimes.id }).from(entryTimes).where(eq(entryTimes.stopId, stop.id))).toHaveLength(4);
  });
});

describe('changing an entry time', () => {
  beforeAll(() => aClub());

  it('moves the parties with it: each gets a letter and a new invitation, and its ticket a new version', async () => {
    const coordinator = await cleo();
    const { day, stop, time } = await aFreeDay();
    const other = await anEntryTime(stop, { atMinutes: 90 });
    const eve = await aParty(day.id, [time.id]);
    const finn = await aParty(day.id, [other.id], { name: 'Finn', email: 'finn@visitors.example' });

    const told = await changeEntryTime(await ctxOf(coordinator), { entryTimeId: time.id, ...later });

    expect(told).toBe(1);
    expect((await timeOf(time.id)).opensAt).toEqual(new Date('2027-05-15T14:30:00Z'));
    expect(await lettersTo(eve.bookingId)).toEqual(['calendar', 'change']);
    expect(await versionsOf(eve.bookingId)).toEqual([2]);
    expect(await lettersTo(finn.bookingId)).toEqual([]);
    expect(await versionsOf(finn.bookingId)).toEqual([1]);
    expect(await auditOf('changed an entry time', time.id)).toEqual([{ by: coordinator.accountId }]);
  });

  it('says in the letter how it was and why it changed', async () => {
    const { day, time } = await aFreeDay();
    const eve = await aParty(day.id, [time.id]);

    await changeEntryTime(await ctxOf(await cleo()), { entryTimeId: time.id, ...later });

    const facts = await getDb().select({ kind: letters.kind, facts: letterTexts.facts }).from(letters).innerJoin(letterTexts, eq(letterTexts.letterId, letters.id)).where(eq(letters.bookingId, eve.bookingId));
    expect(facts.find(({ kind }) => kind === 'change')?.facts).toEqual({ was: [expect.stringMatching(/at 10:00$/)], reason: 'the steam-up takes longer' });
  });

  it('pencils the change into the margin with initials and an arrow to its stop', async () => {
    const ctx = await ctxOf(await cleo());
    const { day, time } = await aFreeDay();

    await changeEntryTime(ctx, { entryTimeId: time.id, ...later });

    expect(await planNotes(ctx, day.id)).toMatchObject([{ initials: 'C. H.', stopNumber: 1, note: expect.stringContaining('10:00 is now 10:30') }]);
  });

  it('sends no invitation to a party that wants none, and nothing to one that is still deciding', async () => {
    const { day, time } = await aFreeDay();
    const plain = await aParty(day.id, [time.id], { wantsInvitations: false });
    const deciding = await keep(day.id, [time.id]);

    await changeEntryTime(await ctxOf(await cleo()), { entryTimeId: time.id, ...later });

    expect(await lettersTo(plain.bookingId)).toEqual(['change']);
    expect(await lettersTo(deciding)).toEqual([]);
  });

  it('writes to nobody when only the places change', async () => {
    const { day, time } = await aFreeDay();
    const eve = await aParty(day.id, [time.id]);

    const told = await changeEntryTime(await ctxOf(await cleo()), { entryTimeId: time.id, opensAt: '10:00', graceMinutes: 25, capacity: 14, reason: null });

    expect(told).toBe(0);
    expect(await timeOf(time.id)).toMatchObject({ capacity: 14, graceUntil: new Date('2027-05-15T14:25:00Z') });
    expect(await lettersTo(eve.bookingId)).toEqual([]);
  });

  it.each([
    { capacity: 2, ends: 'done', because: 'exactly as many places as are taken' },
    { capacity: 1, ends: 'capacity_below_taken', because: 'one place fewer than are taken' },
  ])('answers $ends to $because', async ({ capacity, ends }) => {
    const { day, time } = await aFreeDay();
    await aParty(day.id, [time.id]);

    expect(await refusalOf(changeEntryTime(await ctxOf(await cleo()), { entryTimeId: time.id, opensAt: '10:00', graceMinutes: 20, capacity, reason: null }))).toBe(ends);
  });

  it('refuses a start at which another entry time begins, and changes nothing', async () => {
    const { day, stop, time } = await aFreeDay();
    await anEntryTime(stop, { atMinutes: 30 });
    const eve = await aParty(day.id, [time.id]);

    expect(await refusalOf(changeEntryTime(await ctxOf(await cleo()), { entryTimeId: time.id, ...later }))).toBe('entry_times_overlap');

    expect(await lettersTo(eve.bookingId)).toEqual([]);
    expect(await versionsOf(eve.bookingId)).toEqual([1]);
  });

  it('writes about each of two changes that are made at the same moment, one after the other', async () => {
    const ctx = await ctxOf(await cleo());
    const { day, time } = await aFreeDay();
    const eve = await aParty(day.id, [time.id]);

    await Promise.all(['10:30', '10:45'].map((opensAt) => changeEntryTime(ctx, { entryTimeId: time.id, ...later, opensAt })));

    expect(await versionsOf(eve.bookingId)).toEqual([3]);
    expect(await lettersTo(eve.bookingId)).toEqual(['calendar', 'calendar', 'change', 'change']);
  });

  it('does not find an entry time that is not there', async () => {
    expect(await refusalOf(changeEntryTime(await ctxOf(await cleo()), { entryTimeId: asId('00000000-0000-4000-8000-000000000000'), ...later }))).toBe('not_found');
  });
});

describe('closing an entry time', () => {
  beforeAll(() => aClub());

  it('turns new parties away and leaves the places of those who hold them', async () => {
    const coordinator = await cleo();
    const { day, time } = await aFreeDay();
    const eve = await aParty(day.id, [time.id]);

    await closeEntryTime(await ctxOf(coordinator), { entryTimeId: time.id });

    expect(await refusalOf(keep(day.id, [time.id]))).toBe('entry_time_closed');
    expect(await timeOf(time.id)).toMatchObject({ taken: 2 });
    expect(await lettersTo(eve.bookingId)).toEqual([]);
    expect(await auditOf('closed an entry time', time.id)).toEqual([{ by: coordinator.accountId }]);
  });

  it('lets parties in again once it is opened again', async () => {
    const ctx = await ctxOf(await cleo());
    const { day, time } = await aFreeDay();
    await closeEntryTime(ctx, { entryTimeId: time.id });

    await reopenEntryTime(ctx, { entryTimeId: time.id });

    expect(await refusalOf(keep(day.id, [time.id]))).toBe('done');
  });
});
