import 'server-only';
import { and, eq, isNull, sql } from 'drizzle-orm';
import type { z } from 'zod';
import type { Tx } from '@/db/client';
import { gardens } from '@/db/schema/gardens';
import { entryTimes, openDays, prices, stops } from '@/db/schema/opendays';
import { recordChange } from '@/lib/club/commands';
import type { Id } from '@/lib/core/ids';
import { parseMoney } from '@/lib/core/money';
import { firstOrNull, only } from '@/lib/core/only';
import { Refusal } from '@/lib/core/refusal';
import { instantOf } from '@/lib/core/time';
import type { AccountCtx } from '@/lib/infra/context';
import { constraintOf } from '@/lib/infra/sql-state';
import { inTransaction } from '@/lib/infra/transaction';
import { pencil } from './pencil';
import type { openDayChangeInput, openDayIdInput, openDayInput, planNoteInput, stopChangeInput, stopInput } from '../schema';

type Prices = { adult: string; child: string; babe: string };
const KINDS = ['adult', 'child', 'babe'] as const;

/** Makes an open day that nobody sees until it is published; returns its slug. */
export async function makeOpenDay(ctx: AccountCtx, input: z.output<typeof openDayInput>): Promise<string> {
  const amounts = readPrices(ctx, input);
  return inTransaction(ctx.db, async (tx) => {
    const day = await unique(() => tx.insert(openDays).values({ slug: input.slug, ...columnsOf(ctx, input) }).returning({ id: openDays.id }), 'open_days_slug_unique', 'slug_taken', 'slug');
    const { id } = only(day);
    await tx.insert(prices).values(KINDS.map((kind) => ({ openDayId: id, kind, amountMinor: amounts[kind] })));
    await recordChange(tx, ctx, { action: 'made an open day', subjectKind: 'open day', subjectId: id, after: { title: input.title, heldOn: input.heldOn } });
    return input.slug;
  });
}

/** Changes an open day's words, hours and prices; places already kept or paid for keep the price they had. */
export async function changeOpenDay(ctx: AccountCtx, input: z.output<typeof openDayChangeInput>): Promise<void> {
  const amounts = readPrices(ctx, input);
  await inTransaction(ctx.db, async (tx) => {
    const before = await lockDay(tx, input.openDayId);
    if (input.heldOn !== before.heldOn) await refuseWithTimes(tx, input.openDayId);
    await tx.update(openDays).set(columnsOf(ctx, input)).where(eq(openDays.id, input.openDayId));
    for (const kind of KINDS) {
      await tx.insert(prices).values({ openDayId: input.openDayId, kind, amountMinor: amounts[kind] })
        .onConflictDoUpdate({ target: [prices.openDayId, prices.stopId, prices.kind], set: { amountMinor: amounts[kind] } });
    }
    await recordChange(tx, ctx, { action: 'changed an open day', subjectKind: 'open day', subjectId: input.openDayId, before: { title: before.title, heldOn: before.heldOn }, after: { title: input.title, heldOn: input.heldOn, adultMinor: amounts.adult, childMinor: amounts.child, babeMinor: amounts.babe } });
  });
}

type DayWords = { title: string; placeLine: string; howToCome: string | null; heldOn: string; opensAt: string; closesAt: string; partyPeopleMax: number | null };

function columnsOf({ club }: AccountCtx, input: DayWords) {
  const opensAt = instantOf(input.heldOn, input.opensAt, club.timeZone);
  const closesAt = instantOf(input.heldOn, input.closesAt, club.timeZone);
  if (closesAt <= opensAt) throw new Refusal('entry_time_over', { sentence: 'The gates close after they open.', fields: { closesAt: 'Choose a later time.' } });
  return { title: input.title, placeLine: input.placeLine, howToCome: input.howToCome, heldOn: input.heldOn, opensAt, closesAt, partyPeopleMax: input.partyPeopleMax };
}

function readPrices({ club }: AccountCtx, typed: Prices): Record<(typeof KINDS)[number], number> {
  const read = (kind: (typeof KINDS)[number]) => {
    const amountMinor = parseMoney(typed[kind], club.currency);
    if (amountMinor === null) throw new Refusal('wrong_amount', { fields: { [kind]: 'Type a price like 8.00; 0 is free.' } });
    return amountMinor;
  };
  return { adult: read('adult'), child: read('child'), babe: read('babe') };
}

async function lockDay(tx: Tx, id: Id<'openDay'>) {
  const day = firstOrNull(await tx.select({ id: openDays.id, title: openDays.title, heldOn: openDays.heldOn, publishedAt: openDays.publishedAt })
    .from(openDays).where(eq(openDays.id, id)).for('no key update'));
  if (!day) throw new Refusal('not_found');
  return day;
}

/** Entry times, and with them the tickets, stand on the day: it cannot be moved under them. The day is locked. */
async function refuseWithTimes(tx: Tx, openDayId: Id<'openDay'>): Promise<void> {
  const times = await tx.select({ id: entryTimes.id }).from(entryTimes).where(eq(entryTimes.openDayId, openDayId)).limit(1);
  if (times.length > 0) throw new Refusal('day_has_times', { fields: { heldOn: 'Keep the day, or make another open day.' } });
}

/** Shows an open day to everyone and opens its booking. */
export async function publishOpenDay(ctx: AccountCtx, { openDayId }: z.output<typeof openDayIdInput>): Promise<void> {
  await inTransaction(ctx.db, async (tx) => {
    const shown = await tx.update(openDays).set({ publishedAt: ctx.now }).where(and(eq(openDays.id, openDayId), isNull(openDays.publishedAt))).returning({ id: openDays.id });
    if (shown.length === 0) throw new Refusal('changed_meanwhile');
    await recordChange(tx, ctx, { action: 'published an open day', subjectKind: 'open day', subjectId: openDayId });
  });
}

/** Adds a garden to an open day; its number is its card and its nip. The stay and the limit begin as the garden's own. */
export async function addStop(ctx: AccountCtx, input: z.output<typeof stopInput>): Promise<Id<'stop'>> {
  return inTransaction(ctx.db, async (tx) => {
    await lockDay(tx, input.openDayId);
    await refuseOverLimit(tx, input.gardenId, input.headsLimit);
    const values = { openDayId: input.openDayId, gardenId: input.gardenId, number: input.number, stayMinutes: input.stayMinutes, headsLimit: input.headsLimit };
    const rows = await unique(() => tx.insert(stops).values(values).returning({ id: stops.id }), 'stops_one_number', 'slug_taken', 'number', 'stops_one_garden');
    const { id } = only(rows);
    await recordChange(tx, ctx, { action: 'added a stop', subjectKind: 'stop', subjectId: id, after: { number: input.number, headsLimit: input.headsLimit, stayMinutes: input.stayMinutes } });
    return id;
  });
}

/** Changes a stop's usual stay and its limit, never above what the host said. */
export async function changeStop(ctx: AccountCtx, input: z.output<typeof stopChangeInput>): Promise<void> {
  await inTransaction(ctx.db, async (tx) => {
    const before = firstOrNull(await tx.select({ gardenId: stops.gardenId, stayMinutes: stops.stayMinutes, headsLimit: stops.headsLimit }).from(stops).where(eq(stops.id, input.stopId)).for('no key update'));
    if (!before) throw new Refusal('not_found');
    await refuseOverLimit(tx, before.gardenId, input.headsLimit);
    await tx.update(stops).set({ stayMinutes: input.stayMinutes, headsLimit: input.headsLimit }).where(eq(stops.id, input.stopId));
    await recordChange(tx, ctx, { action: 'changed a stop', subjectKind: 'stop', subjectId: input.stopId, before: { stayMinutes: before.stayMinutes, headsLimit: before.headsLimit }, after: { stayMinutes: input.stayMinutes, headsLimit: input.headsLimit } });
  });
}

async function refuseOverLimit(tx: Tx, gardenId: Id<'garden'>, headsLimit: number): Promise<void> {
  const garden = firstOrNull(await tx.select({ headsLimit: gardens.headsLimit }).from(gardens).where(and(eq(gardens.id, gardenId), sql`${gardens.withdrawnAt} is null`)));
  if (!garden) throw new Refusal('not_found');
  if (headsLimit > garden.headsLimit) throw new Refusal('heads_over_limit', { fields: { headsLimit: `The host said ${garden.headsLimit} at most.` } });
}

/** Pencils a dated note into the margin of an open day's staff copy. */
export async function addPlanNote(ctx: AccountCtx, input: z.output<typeof planNoteInput>): Promise<void> {
  await inTransaction(ctx.db, async (tx) => {
    await lockDay(tx, input.openDayId);
    await pencil(tx, ctx, { openDayId: input.openDayId, stopId: null, note: input.note });
  });
}

/** Runs an insert whose unique constraint decides, and says so beside the field when it is broken. */
async function unique<T>(insert: () => Promise<T>, constraint: string, code: 'slug_taken', field: string, other?: string): Promise<T> {
  try {
    return await insert();
  } catch (error) {
    const broken = constraintOf(error);
    if (broken === constraint) throw new Refusal(code, { fields: { [field]: 'That one is taken. Choose another.' } });
    if (other !== undefined && broken === other) throw new Refusal('changed_meanwhile', { sentence: 'That garden is a stop of this open day already.' });
    throw error;
  }
}
