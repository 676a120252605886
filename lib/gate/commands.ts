import 'server-only';
import { and, asc, count, eq, inArray, isNotNull } from 'drizzle-orm';
import type { Tx } from '@/db/client';
import { bookings, visits } from '@/db/schema/bookings';
import { gardens } from '@/db/schema/gardens';
import { gateFacts } from '@/db/schema/gate';
import { entryTimes, stops } from '@/db/schema/opendays';
import { gateDevices, gatePasses } from '@/db/schema/people';
import { recordChange } from '@/lib/club/commands';
import type { Id } from '@/lib/core/ids';
import { firstOrNull, only } from '@/lib/core/only';
import { Refusal } from '@/lib/core/refusal';
import type { AccountCtx, Ctx, GateActor } from '@/lib/infra/context';
import { countTry } from '@/lib/infra/rate-limit';
import { hashSecret, newSecret } from '@/lib/infra/secrets';
import { inTransaction } from '@/lib/infra/transaction';
import { factsOfStop } from './queries';
import { turnedDown, type CarriedHeads, type TurnedDown } from './rules/accept';
import type { GateFact } from './rules/facts';
import { foldFacts } from './rules/fold';
import type { ExchangePassInput, FactAnswers, MakeGatePassInput, RecordFactsInput, RevokeGatePassInput, SentFact } from './schema';

/** Makes a pass for one gate on one day. The secret is in the answer and nowhere else: it is shown once. */
export async function makeGatePass({ db, actor, now }: AccountCtx, input: MakeGatePassInput): Promise<{ gatePassId: Id<'gatePass'>; helper: string; garden: string; secret: string }> {
  const secret = newSecret();
  return inTransaction(db, async (tx) => {
    const stop = firstOrNull(await tx.select({ id: stops.id, number: stops.number, garden: gardens.shortName }).from(stops)
      .innerJoin(gardens, eq(gardens.id, stops.gardenId)).where(eq(stops.id, input.stopId)));
    if (!stop) throw new Refusal('not_found');
    const made = only(await tx.insert(gatePasses).values({
      stopId: stop.id, helper: input.helper, secretHash: hashSecret(secret), devicesAllowed: input.devices, madeAt: now, madeBy: actor.accountId,
    }).returning({ id: gatePasses.id }));
    const after = { stop: stop.number, helper: input.helper, devices: input.devices };
    await recordChange(tx, { actor, now }, { action: 'made a gate pass', subjectKind: 'gatePass', subjectId: made.id, after });
    return { gatePassId: made.id, helper: input.helper, garden: stop.garden, secret };
  });
}

/** Takes a gate pass back: its phones are refused from the next request on. A second time changes nothing. */
export async function revokeGatePass({ db, actor, now }: AccountCtx, input: RevokeGatePassInput): Promise<void> {
  await inTransaction(db, async (tx) => {
    const pass = firstOrNull(await tx.select({ helper: gatePasses.helper, revokedAt: gatePasses.revokedAt })
      .from(gatePasses).where(eq(gatePasses.id, input.gatePassId)).for('no key update'));
    if (!pass) throw new Refusal('not_found');
    if (pass.revokedAt !== null) return;
    await tx.update(gatePasses).set({ revokedAt: now }).where(eq(gatePasses.id, input.gatePassId));
    const after = { helper: pass.helper, why: input.why };
    await recordChange(tx, { actor, now }, { action: 'took a gate pass back', subjectKind: 'gatePass', subjectId: input.gatePassId, after });
  });
}

/** Makes a phone one of the pass's devices. The phone made its own key, so asking again with it changes nothing. Locks the pass. */
export async function exchangePass({ db, now }: Ctx, input: ExchangePassInput): Promise<{ number: number }> {
  const secretHash = hashSecret(input.secret);
  const keyHash = hashSecret(input.deviceKey);
  await countTry(db, `gate pass ${secretHash.slice(0, 20)}`, { tries: 30, minutes: 10 }, now);
  return inTransaction(db, async (tx) => {
    const pass = firstOrNull(await tx.select({ id: gatePasses.id, allowed: gatePasses.devicesAllowed, revokedAt: gatePasses.revokedAt })
      .from(gatePasses).where(eq(gatePasses.secretHash, secretHash)).for('no key update')); // two phones cannot both be the last
    if (!pass) throw new Refusal('pass_unknown');
    if (pass.revokedAt !== null) throw new Refusal('pass_revoked');
    const known = firstOrNull(await tx.select({ number: gateDevices.number, passId: gateDevices.passId }).from(gateDevices).where(eq(gateDevices.keyHash, keyHash)));
    if (known) {
      if (known.passId !== pass.id) throw new Refusal('pass_unknown');
      return { number: known.number };
    }
    const opened = only(await tx.select({ devices: count() }).from(gateDevices).where(eq(gateDevices.passId, pass.id))).devices;
    if (opened >= pass.allowed) throw new Refusal('pass_full');
    await tx.insert(gateDevices).values({ passId: pass.id, number: opened + 1, keyHash, openedAt: now, seenAt: now });
    return { number: opened + 1 };
  });
}

/**
 * Keeps what a phone did, each fact once however often it is sent. An admission is taken only if its heads are still
 * on the ticket; otherwise it is kept as a refusal and answered so. Locks the bookings named, in id order.
 */
export async function recordFacts(ctx: Ctx<GateActor>, input: RecordFactsInput): Promise<FactAnswers> {
  return inTransaction(ctx.db, async (tx) => {
    const tickets = await lockTickets(tx, ctx.actor.stopId, input.facts);
    const known = await factsOfStop(tx, ctx.actor.stopId); // read after the lock: the other phone's last people are in it
    const offset = ctx.now.getTime() - input.phoneTime.getTime();
    const answers: FactAnswers['answers'] = [];
    for (const sent of input.facts) {
      const stored = known.find(({ id }) => id === sent.id);
      const no = stored ? null : turnedDown(sent, foldFacts(known), tickets);
      if (!stored && no !== 'unknown_fact' && no !== 'undone_before') known.push(await keepFact(tx, ctx, { sent, no, offset, tickets, listVersion: input.listVersion }));
      const isRefused = stored ? stored.kind === 'refuse' && sent.kind !== 'refuse' : no !== null && no !== 'undone_before';
      answers.push({ id: sent.id, outcome: isRefused ? 'refused' : 'kept', reason: no });
    }
    return { answers };
  });
}

type Tickets = ReadonlyMap<string, CarriedHeads>;

/**
 * The tickets of this stop that the facts name. Their bookings are locked, in id order as everywhere: two phones cannot
 * both let in the last people, and nobody gives back or moves what is being let in.
 */
async function lockTickets(tx: Tx, stopId: Id<'stop'>, facts: readonly SentFact[]): Promise<Tickets> {
  const named = [...new Set(facts.flatMap(({ visitId }) => (visitId === null ? [] : [visitId])))];
  if (named.length === 0) return new Map();
  const owners = await tx.select({ bookingId: visits.bookingId }).from(visits).where(inArray(visits.id, named));
  await tx.select({ id: bookings.id }).from(bookings).where(inArray(bookings.id, owners.map(({ bookingId }) => bookingId))).orderBy(asc(bookings.id)).for('no key update');
  const rows = await tx.select({ id: visits.id, adults: visits.adults, children: visits.children, babes: visits.babes, givenBackAt: visits.givenBackAt })
    .from(visits)
    .innerJoin(entryTimes, eq(entryTimes.id, visits.entryTimeId))
    .innerJoin(bookings, eq(bookings.id, visits.bookingId))
    .where(and(inArray(visits.id, named), eq(entryTimes.stopId, stopId), isNotNull(bookings.confirmedAt)));
  return new Map(rows.map((row) => [row.id, row]));
}

type Keeping = { sent: SentFact; no: TurnedDown | null; offset: number; tickets: Tickets; listVersion: string };

/** Writes one fact down; one that was turned down is written as the refusal it became. */
async function keepFact(tx: Tx, { actor, now }: Ctx<GateActor>, { sent, no, offset, tickets, listVersion }: Keeping): Promise<GateFact> {
  const kind = no === null ? sent.kind : 'refuse';
  const visitId = sent.visitId !== null && tickets.has(sent.visitId) ? sent.visitId : null; // never another garden's ticket
  await tx.insert(gateFacts).values({
    id: sent.id, openDayId: actor.openDayId, stopId: actor.stopId, visitId, kind, adults: sent.adults, children: sent.children, babes: sent.babes,
    undoesId: kind === 'undo' ? sent.undoesId : null, atPhone: sent.at, clockOffsetMs: clockOffset(offset), receivedAt: now, listVersion,
    passId: actor.passId, deviceId: actor.deviceId, verdict: no ?? sent.verdict, reason: sent.reason,
  }).onConflictDoNothing();
  return { ...sent, kind, visitId, undoesId: kind === 'undo' ? sent.undoesId : null, deviceId: actor.deviceId };
}

/** A phone set to another year is no reason to lose a fact: the offset is kept within what the column holds. */
const clockOffset = (ms: number): number => Math.max(-2_147_483_648, Math.min(2_147_483_647, Math.round(ms)));
