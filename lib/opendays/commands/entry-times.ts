import 'server-only';
import { and, asc, eq, isNotNull, isNull, sql } from 'drizzle-orm';
import type { z } from 'zod';
import type { Tx } from '@/db/client';
import { bookings, visits } from '@/db/schema/bookings';
import { gardens } from '@/db/schema/gardens';
import { entryTimes, openDays, stops } from '@/db/schema/opendays';
import { findParty } from '@/lib/bookings/commands/confirm';
import { recordChange } from '@/lib/club/commands';
import type { Id } from '@/lib/core/ids';
import { firstOrNull } from '@/lib/core/only';
import { Refusal } from '@/lib/core/refusal';
import { addMinutes, formatTime, instantOf, minutesBetween } from '@/lib/core/time';
import type { AccountCtx } from '@/lib/infra/context';
import { constraintOf } from '@/lib/infra/sql-state';
import { inTransaction } from '@/lib/infra/transaction';
import { queueLetter } from '@/lib/letters/commands';
import { entryStarts } from '../rules/entry-starts';
import { counted } from '../rules/words';
import { pencil } from './pencil';
import type { entryTimeChangeInput, entryTimeIdInput, entryTimesInput } from '../schema';

/** Makes entry times at a stop; a start that is there already refuses all. Returns how many were made. */
export async function makeEntryTimes(ctx: AccountCtx, input: z.output<typeof entryTimesInput>): Promise<number> {
  return inTransaction(ctx.db, async (tx) => {
    const stop = firstOrNull(await tx.select({ openDayId: stops.openDayId, heldOn: openDays.heldOn, headsLimit: stops.headsLimit })
      .from(stops).innerJoin(openDays, eq(openDays.id, stops.openDayId)).where(eq(stops.id, input.stopId)).for('no key update', { of: openDays })); // the day itself must not change meanwhile
    if (!stop) throw new Refusal('not_found');
    refuseOver(input.capacity, stop.headsLimit);
    const starts = entryStarts(stop.heldOn, input.firstAt, input.lastAt, input.everyMinutes, ctx.club.timeZone);
    const made = await tx.insert(entryTimes).values(starts.map((opensAt) => ({
      stopId: input.stopId, openDayId: stop.openDayId, opensAt, graceUntil: addMinutes(opensAt, input.graceMinutes), capacity: input.capacity,
    }))).onConflictDoNothing().returning({ id: entryTimes.id });
    if (made.length < starts.length) throw new Refusal('entry_times_overlap', { fields: { firstAt: 'One of these starts is there already.' } });
    await recordChange(tx, ctx, { action: 'made entry times', subjectKind: 'stop', subjectId: input.stopId, after: { firstAt: input.firstAt, lastAt: input.lastAt, everyMinutes: input.everyMinutes, capacity: input.capacity } });
    return made.length;
  });
}

const refuseOver = (capacity: number, headsLimit: number) => {
  if (capacity > headsLimit) throw new Refusal('heads_over_limit', { fields: { capacity: `This stop carries ${headsLimit} people at most.` } });
};

/**
 * Changes when an entry time starts, its grace and its places. Parties whose start moves get a letter and a new
 * invitation; their tickets' versions rise. Locks the bookings in id order, then the entry time. Returns how many were told.
 */
export async function changeEntryTime(ctx: AccountCtx, input: z.output<typeof entryTimeChangeInput>): Promise<number> {
  try {
    return await inTransaction(ctx.db, (tx) => change(tx, ctx, input));
  } catch (error) {
    const broken = constraintOf(error);
    if (broken === 'entry_times_never_oversold') throw new Refusal('capacity_below_taken', { fields: { capacity: 'More places than that are taken.' } });
    if (broken === 'entry_times_one_start') throw new Refusal('entry_times_overlap', { fields: { opensAt: 'Another entry time starts then.' } });
    throw error;
  }
}

async function change(tx: Tx, ctx: AccountCtx, input: z.output<typeof entryTimeChangeInput>): Promise<number> {
  const { entryTimeId } = input;
  await lockBookingsAt(tx, entryTimeId);
  const before = await lockEntryTime(tx, entryTimeId);
  const affected = await confirmedAt(tx, entryTimeId); // read after the locks: who gave back or moved meanwhile is not told
  refuseOver(input.capacity, before.headsLimit);
  const opensAt = instantOf(before.heldOn, input.opensAt, ctx.club.timeZone);
  await tx.update(entryTimes).set({ opensAt, graceUntil: addMinutes(opensAt, input.graceMinutes), capacity: input.capacity }).where(eq(entryTimes.id, entryTimeId));
  await recordChange(tx, ctx, {
    action: 'changed an entry time', subjectKind: 'entry time', subjectId: entryTimeId,
    before: { start: formatTime(before.opensAt, ctx.club), grace: minutesBetween(before.opensAt, before.graceUntil), capacity: before.capacity },
    after: { start: formatTime(opensAt, ctx.club), grace: input.graceMinutes, capacity: input.capacity },
  });
  if (opensAt.getTime() === before.opensAt.getTime()) return 0;
  await pencil(tx, ctx, { openDayId: before.openDayId, stopId: before.stopId, note: `${before.garden}: ${formatTime(before.opensAt, ctx.club)} is now ${formatTime(opensAt, ctx.club)}. ${affected.length === 0 ? 'No party to write to' : `${counted(affected.length, 'party', 'parties')} written to`}.` });
  const was = `${before.garden} at ${formatTime(before.opensAt, ctx.club)}`;
  for (const visit of affected) await tellMoved(tx, ctx, visit, { was, reason: input.reason });
  return affected.length;
}

type Affected = { bookingId: Id<'booking'>; visitId: Id<'visit'> };

/** Locks the confirmed bookings with places at an entry time, in id order. */
async function lockBookingsAt(tx: Tx, entryTimeId: Id<'entryTime'>): Promise<void> {
  await tx.select({ id: bookings.id }).from(bookings).innerJoin(visits, eq(visits.bookingId, bookings.id)).where(confirmedThere(entryTimeId))
    .orderBy(asc(bookings.id)).for('no key update', { of: bookings });
}

/** The confirmed live visits at an entry time, by booking. */
const confirmedAt = (tx: Tx, entryTimeId: Id<'entryTime'>): Promise<Affected[]> =>
  tx.select({ bookingId: bookings.id, visitId: visits.id }).from(bookings).innerJoin(visits, eq(visits.bookingId, bookings.id)).where(confirmedThere(entryTimeId)).orderBy(asc(bookings.id));

const confirmedThere = (entryTimeId: Id<'entryTime'>) => and(eq(visits.entryTimeId, entryTimeId), isNull(visits.givenBackAt), isNotNull(bookings.confirmedAt));

async function lockEntryTime(tx: Tx, entryTimeId: Id<'entryTime'>) {
  const row = firstOrNull(await tx.select({
    openDayId: entryTimes.openDayId, stopId: entryTimes.stopId, opensAt: entryTimes.opensAt, graceUntil: entryTimes.graceUntil, capacity: entryTimes.capacity,
    heldOn: openDays.heldOn, headsLimit: stops.headsLimit, garden: gardens.railwayName,
  }).from(entryTimes)
    .innerJoin(stops, eq(stops.id, entryTimes.stopId)).innerJoin(openDays, eq(openDays.id, stops.openDayId)).innerJoin(gardens, eq(gardens.id, stops.gardenId))
    .where(eq(entryTimes.id, entryTimeId)).for('no key update', { of: entryTimes }));
  if (!row) throw new Refusal('not_found');
  return row;
}

async function tellMoved(tx: Tx, ctx: AccountCtx, { bookingId, visitId }: Affected, { was, reason }: { was: string; reason: string | null }): Promise<void> {
  const moved = firstOrNull(await tx.update(visits).set({ version: sql`${visits.version} + 1`, movedAt: ctx.now }).where(eq(visits.id, visitId)).returning({ version: visits.version }));
  const party = await findParty(tx, bookingId);
  if (!party || !moved) return;
  const letter = { to: party.to, madeAt: ctx.now, dueAt: ctx.now, openDayId: party.openDayId, bookingId };
  await queueLetter(tx, { ...letter, key: `change:${visitId}:${moved.version}`, kind: 'change', facts: { was: [was], ...(reason === null ? {} : { reason }) } });
  if (party.wantsInvitations) await queueLetter(tx, { ...letter, key: `calendar:${visitId}:${moved.version}`, kind: 'calendar', facts: { visitId } });
}

/** Closes an entry time to new parties; those who hold places keep them. */
export async function closeEntryTime(ctx: AccountCtx, { entryTimeId }: z.output<typeof entryTimeIdInput>): Promise<void> {
  await setClosed(ctx, entryTimeId, ctx.now);
}

/** Opens a closed entry time again. */
export async function reopenEntryTime(ctx: AccountCtx, { entryTimeId }: z.output<typeof entryTimeIdInput>): Promise<void> {
  await setClosed(ctx, entryTimeId, null);
}

async function setClosed(ctx: AccountCtx, entryTimeId: Id<'entryTime'>, closedAt: Date | null): Promise<void> {
  await inTransaction(ctx.db, async (tx) => {
    const before = await lockEntryTime(tx, entryTimeId);
    await tx.update(entryTimes).set({ closedAt }).where(eq(entryTimes.id, entryTimeId));
    await pencil(tx, ctx, { openDayId: before.openDayId, stopId: before.stopId, note: `${before.garden}: ${formatTime(before.opensAt, ctx.club)} is ${closedAt === null ? 'open again' : 'closed to new parties'}.` });
    await recordChange(tx, ctx, { action: closedAt === null ? 'opened an entry time again' : 'closed an entry time', subjectKind: 'entry time', subjectId: entryTimeId });
  });
}
