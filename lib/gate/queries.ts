import 'server-only';
import { createPublicKey, verify } from 'node:crypto';
import { and, asc, count, eq, isNotNull, isNull, lt, max, sum } from 'drizzle-orm';
import type { Queryable } from '@/db/client';
import { bookingContacts, bookings, visits } from '@/db/schema/bookings';
import { gardenPlaces, gardens, placeShowings } from '@/db/schema/gardens';
import { gateFacts } from '@/db/schema/gate';
import { entryTimes, openDays, stops } from '@/db/schema/opendays';
import { gateDevices, gatePasses } from '@/db/schema/people';
import { verifyTicket, type TicketVerifier } from '@/lib/bookings/rules/ticket-payload';
import { asId, type Id } from '@/lib/core/ids';
import { firstOrNull } from '@/lib/core/only';
import { Refusal } from '@/lib/core/refusal';
import { addMinutes } from '@/lib/core/time';
import type { AccountCtx, Ctx, GateActor } from '@/lib/infra/context';
import { ticketPublicKeys } from '@/lib/infra/ticket-keys';
import type { GateFact } from './rules/facts';
import type { GateTicket } from './rules/verdict';
import type { GateList, GatePlace, ReadTicketInput } from './schema';
import { toOfficeGates, type OfficeGates } from './views/office';

/** How long before an entry time people may come in: not at all, until a club has a setting for it. */
const EARLY_MINUTES = 0;
/** A gate lists at most this many parties; a garden carries 500 heads at once at the very most. */
const PARTIES_MAX = 5_000;

/** The facts of one stop in the order they came, at most 20,000; times are the phone's, set right by its offset. */
export async function factsOfStop(db: Queryable, stopId: Id<'stop'>): Promise<GateFact[]> {
  const rows = await db.select({
    id: gateFacts.id, kind: gateFacts.kind, undoesId: gateFacts.undoesId, visitId: gateFacts.visitId, adults: gateFacts.adults, children: gateFacts.children,
    babes: gateFacts.babes, atPhone: gateFacts.atPhone, clockOffsetMs: gateFacts.clockOffsetMs, deviceId: gateFacts.deviceId, reason: gateFacts.reason,
  }).from(gateFacts).where(eq(gateFacts.stopId, stopId)).orderBy(asc(gateFacts.receivedAt), asc(gateFacts.id)).limit(20_000);
  return rows.map(({ atPhone, clockOffsetMs, deviceId, ...fact }) => ({ ...fact, at: new Date(atPhone.getTime() + clockOffsetMs), deviceId: deviceId ?? '' }));
}

const ticketColumns = {
  visitId: visits.id, stopId: stops.id, stopNumber: stops.number, heldOn: openDays.heldOn, opensAt: entryTimes.opensAt, graceUntil: entryTimes.graceUntil,
  givenBackAt: visits.givenBackAt, adults: visits.adults, children: visits.children, babes: visits.babes,
};

const tickets = (db: Queryable, and_: Parameters<typeof and>) =>
  db.select({ ...ticketColumns, version: visits.version, code: bookings.code, name: bookingContacts.name }) // the name and nothing else of the contacts
    .from(visits)
    .innerJoin(bookings, eq(bookings.id, visits.bookingId))
    .innerJoin(bookingContacts, eq(bookingContacts.bookingId, bookings.id))
    .innerJoin(entryTimes, eq(entryTimes.id, visits.entryTimeId))
    .innerJoin(stops, eq(stops.id, entryTimes.stopId))
    .innerJoin(openDays, eq(openDays.id, stops.openDayId))
    .where(and(isNotNull(bookings.confirmedAt), ...and_))
    .orderBy(asc(entryTimes.opensAt), asc(visits.id));

/** All that this gate's phone may hold: its own garden and day, no contact details, no address. Notes the phone as seen. */
export async function gateList({ db, actor, now, club }: Ctx<GateActor>): Promise<GateList> {
  const here = await findHere(db, actor.stopId);
  await db.update(gateDevices).set({ seenAt: now }).where(and(eq(gateDevices.id, actor.deviceId), lt(gateDevices.seenAt, addMinutes(now, -1))));
  const parties = await tickets(db, [eq(entryTimes.stopId, actor.stopId)]).limit(PARTIES_MAX);
  const keys = await ticketPublicKeys(db);
  return {
    version: now.toISOString(),
    madeAt: now,
    deviceId: actor.deviceId,
    here: {
      stopId: here.stopId, stopNumber: here.stopNumber, heldOn: here.heldOn, headsLimit: here.headsLimit, earlyMinutes: EARLY_MINUTES,
      babes: club.babesTakePlace ? 'counted' : 'not counted', calledOff: here.calledOffAt !== null,
    },
    garden: here.shortName,
    dayName: here.title,
    time: { timeZone: club.timeZone, locale: club.locale, hourCycle: club.hourCycle },
    parties,
    facts: await factsOfStop(db, actor.stopId),
    keys: keys.map(({ keyId, publicKey }) => ({ keyId, publicKey: publicKey.toString('base64url') })),
  };
}

async function findHere(db: Queryable, stopId: Id<'stop'>) {
  const here = firstOrNull(await db.select({
    stopId: stops.id, stopNumber: stops.number, gardenId: stops.gardenId, headsLimit: stops.headsLimit, shortName: gardens.shortName,
    heldOn: openDays.heldOn, title: openDays.title, calledOffAt: openDays.calledOffAt, opensAt: openDays.opensAt,
  }).from(stops).innerJoin(gardens, eq(gardens.id, stops.gardenId)).innerJoin(openDays, eq(openDays.id, stops.openDayId)).where(eq(stops.id, stopId)));
  if (!here) throw new Refusal('not_found');
  return here;
}

/** Verifies a ticket's signature with Node's own Ed25519. */
const verifierOf = (keys: readonly { keyId: number; publicKey: Buffer }[]): TicketVerifier => (bytes, signature, keyId) => {
  const key = keys.find((each) => each.keyId === keyId);
  if (!key) return false;
  const publicKey = createPublicKey({ key: { kty: 'OKP', crv: 'Ed25519', x: key.publicKey.toString('base64url') }, format: 'jwk' });
  return verify(null, bytes, publicKey, signature);
};

/**
 * The ticket that a shown code stands for as it is now, also when it is for another garden or day; null when it is
 * not one of ours. For phones that cannot verify, and for tickets that their list does not hold. No name is told.
 */
export async function readTicket({ db }: Ctx<GateActor>, { text }: ReadTicketInput): Promise<{ ticket: GateTicket | null }> {
  const facts = await verifyTicket(text, verifierOf(await ticketPublicKeys(db)));
  if (facts === null) return { ticket: null };
  const found = firstOrNull(await tickets(db, [eq(visits.id, asId<'visit'>(facts.visitId))]).limit(1));
  if (!found) return { ticket: null };
  const { visitId, stopId, stopNumber, heldOn, opensAt, graceUntil, givenBackAt, adults, children, babes } = found;
  return { ticket: { visitId, stopId, stopNumber, heldOn, opensAt, graceUntil, givenBackAt, adults, children, babes } };
}

/**
 * Where this gate's garden is, for an ambulance: from the release time before the day until a day after it. Each
 * answer is a showing and is recorded with it.
 */
export async function showGatePlace({ db, actor, now, club }: Ctx<GateActor>): Promise<GatePlace> {
  const here = await findHere(db, actor.stopId);
  if (now < addMinutes(here.opensAt, -club.addressReleaseHours * 60)) throw new Refusal('not_allowed', { sentence: 'The address is shown here from the days just before the open day on. Ask the coordinator.' });
  const place = firstOrNull(await db.select({ address: gardenPlaces.address, directions: gardenPlaces.directions, lat: gardenPlaces.lat, lon: gardenPlaces.lon })
    .from(gardenPlaces).where(eq(gardenPlaces.gardenId, here.gardenId)));
  if (!place) throw new Refusal('not_found');
  await db.insert(placeShowings).values({ gardenId: here.gardenId, at: now, viewerKind: 'gate', viewerId: actor.deviceId });
  return { garden: here.shortName, ...place };
}

/** Every gate of an open day as the coordinator sees it: heads expected, in and here now, and its passes; null when there is no such day. */
export async function findOpenDayGates({ db, club }: AccountCtx, slug: string): Promise<OfficeGates | null> {
  const day = firstOrNull(await db.select({ id: openDays.id, title: openDays.title, heldOn: openDays.heldOn, calledOffAt: openDays.calledOffAt }).from(openDays).where(eq(openDays.slug, slug)));
  if (!day) return null;
  const gates = await db.select({ stopId: stops.id, number: stops.number, garden: gardens.shortName, headsLimit: stops.headsLimit })
    .from(stops).innerJoin(gardens, eq(gardens.id, stops.gardenId)).where(eq(stops.openDayId, day.id)).orderBy(asc(stops.number)).limit(14);
  const expected = await db.select({ stopId: entryTimes.stopId, heads: sum(visits.heads).mapWith(Number) }).from(visits)
    .innerJoin(bookings, eq(bookings.id, visits.bookingId)).innerJoin(entryTimes, eq(entryTimes.id, visits.entryTimeId))
    .where(and(eq(visits.openDayId, day.id), isNotNull(bookings.confirmedAt), isNull(visits.givenBackAt))).groupBy(entryTimes.stopId);
  const passes = await db.select({
    gatePassId: gatePasses.id, stopId: gatePasses.stopId, helper: gatePasses.helper, madeAt: gatePasses.madeAt, revokedAt: gatePasses.revokedAt,
    devicesAllowed: gatePasses.devicesAllowed, devices: count(gateDevices.id), seenAt: max(gateDevices.seenAt),
  }).from(gatePasses).innerJoin(stops, eq(stops.id, gatePasses.stopId)).leftJoin(gateDevices, eq(gateDevices.passId, gatePasses.id))
    .where(eq(stops.openDayId, day.id)).groupBy(gatePasses.id).orderBy(asc(gatePasses.madeAt)).limit(500);
  const facts = new Map<string, GateFact[]>();
  for (const { stopId } of gates) facts.set(stopId, await factsOfStop(db, stopId));
  return toOfficeGates({ day, gates, expected, passes, facts }, club);
}
