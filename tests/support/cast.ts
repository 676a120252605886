import { getDb } from '@/db/client';
import { club } from '@/db/schema/club';
import { membershipClasses, classDues } from '@/db/schema/dues';
import { gardenAreas, gardenPlaces, gardens } from '@/db/schema/gardens';
import { areaMinutes, entryTimes, openDays, prices, stops } from '@/db/schema/opendays';
import { accounts, contactDetails, households, people, rolesHeld, signIns } from '@/db/schema/people';
import { type Role } from '@/lib/core/words';
import { getClub } from '@/lib/club/queries';
import { newId, type Id } from '@/lib/core/ids';
import { only } from '@/lib/core/only';
import { addMinutes } from '@/lib/core/time';
import type { AccountActor, Actor, Ctx } from '@/lib/infra/context';

/** Noon on 1 May 2027 in the test club's zone: the moment at which tests begin unless they say otherwise. */
export const NOON = new Date('2027-05-01T16:00:00Z');
/** The test open day: Saturday 15 May 2027, gates 10:00 to 16:00 in New York. */
export const MAY_15 = { heldOn: '2027-05-15', opensAt: new Date('2027-05-15T14:00:00Z'), closesAt: new Date('2027-05-15T20:00:00Z') };
/** 10:00 on the open day plus some minutes. */
export const onTheDay = (minutes: number): Date => addMinutes(MAY_15.opensAt, minutes);

/** The club's one row with its membership classes; call it once a test file, before anything else. */
export async function aClub(changes: Partial<typeof club.$inferInsert> = {}): Promise<void> {
  const db = getDb();
  await db.insert(club).values({
    name: 'Test Valley Garden Railway Society', footLine: 'founded in a shed', email: 'club@testvalley.example', timeZone: 'America/New_York',
    currency: 'USD', locale: 'en-US', hourCycle: 'h23', refundRules: [{ hoursBefore: 168, percent: 100 }, { hoursBefore: 1, percent: 50 }],
    visitRules: 'Stay on the path.', ...changes,
  }).onConflictDoNothing();
  await db.insert(membershipClasses).values([
    { key: 'single', name: 'Single', about: 'One person.', position: 1 },
    { key: 'household', name: 'Household', about: 'Everyone at one address.', position: 2 },
    { key: 'life', name: 'Life', about: 'For life.', isForLife: true, position: 3 },
  ]).onConflictDoNothing();
  await db.insert(classDues).values([
    { classKey: 'single', fromOn: '2020-01-01', amountMinor: 4800 },
    { classKey: 'household', fromOn: '2020-01-01', amountMinor: 6200 },
  ]).onConflictDoNothing();
}

let members = 0;

/** Someone with an account, in a household of their own, holding `roles`. */
export async function anAccount(name: string, roles: readonly Role[] = [], at = NOON): Promise<AccountActor> {
  const db = getDb();
  const [givenName = name, familyName = 'Testers'] = name.split(' ');
  members += 1;
  const household = only(await db.insert(households).values({ name: `${familyName}, ${givenName}`, memberNumber: 1000 + members, joinedOn: '2020-01-01' }).returning({ id: households.id }));
  const email = `${givenName.toLowerCase()}${members}@testvalley.example`;
  const account = only(await db.insert(accounts).values({ email, madeAt: at }).returning({ id: accounts.id }));
  const person = only(await db.insert(people).values({ householdId: household.id, accountId: account.id, givenName, familyName, isContact: true }).returning({ id: people.id }));
  await db.insert(contactDetails).values({ personId: person.id, email });
  if (roles.length > 0) await db.insert(rolesHeld).values(roles.map((role) => ({ accountId: account.id, role, givenAt: at })));
  const signIn = only(await db.insert(signIns).values({ accountId: account.id, personId: person.id, method: 'code', signedInAt: at }).returning({ id: signIns.id }));
  return { kind: 'account', accountId: account.id, signInId: signIn.id, personId: person.id, householdId: household.id, name: `${givenName} ${familyName}`, email, isHost: false, roles: [...roles] };
}

/** Ada: a member and host. */
export const ada = () => anAccount('Ada Fennimore');
/** Ben: another member. */
export const ben = () => anAccount('Ben Okonjo');
/** Cleo: the coordinator. */
export const cleo = () => anAccount('Cleo Haldane', ['coordinator']);
/** Dov: the treasurer. */
export const dov = () => anAccount('Dov Dorrell', ['treasurer']);
/** Wren: the membership secretary. */
export const wren = () => anAccount('Wren Castellane', ['secretary']);
/** Nell: the administrator. */
export const nell = () => anAccount('Nell Abara', ['administrator']);

/** A context for an actor at a moment. */
export async function ctxOf<A extends Actor>(actor: A, now = NOON): Promise<Ctx<A>> {
  const db = getDb();
  return { db, club: await getClub(db), actor, now, requestId: 'test', client: null };
}

let made = 0;

/** A published garden with an area and an exact place that nothing public may show. */
export async function aGarden(changes: Partial<typeof gardens.$inferInsert> & { householdId?: Id<'household'> } = {}) {
  const db = getDb();
  made += 1;
  const householdId = changes.householdId ?? (await anAccount(`Host${made} Gardener`)).householdId;
  if (householdId === null) throw new Error('a host has a household');
  const row = only(await db.insert(gardens).values({
    slug: `garden-${made}`, railwayName: `Test Garden ${made} Railway`, shortName: `Garden ${made}`, subtitle: 'a test line', scaleOneTo: 22.5, gaugeMm: 45,
    trackLengthMm: 64_000, powers: ['battery'], isStepFree: true, headsLimit: 28, publishedAt: NOON, ...changes, householdId,
  }).returning({ id: gardens.id, slug: gardens.slug, railwayName: gardens.railwayName }));
  await db.insert(gardenPlaces).values({ gardenId: row.id, lat: 41.5 + made / 1000, lon: -40.25, address: `${made} Secret Lane, Hidden End`, directions: 'The green gate.' });
  await db.insert(gardenAreas).values({ gardenId: row.id, areaKey: `area-${made}`, name: 'the test end', caption: 'Somewhere in the test end.', polygon: [[-40.3, 41.4], [-40.2, 41.4], [-40.2, 41.6], [-40.3, 41.4]], labelLat: 41.45, labelLon: -40.25 });
  return { ...row, householdId };
}

/** A published open day on 15 May 2027 at $8 an adult, $4 a child, babes free. */
export async function anOpenDay(changes: Partial<typeof openDays.$inferInsert> = {}, priceMinor = { adult: 800, child: 400, babe: 0 }) {
  const db = getDb();
  made += 1;
  const row = only(await db.insert(openDays).values({ slug: `open-day-${made}`, title: `Test Open Gardens ${made}`, placeLine: 'in the test valley', ...MAY_15, publishedAt: NOON, ...changes }).returning({ id: openDays.id, slug: openDays.slug }));
  await db.insert(prices).values((['adult', 'child', 'babe'] as const).map((kind) => ({ openDayId: row.id, kind, amountMinor: priceMinor[kind] })));
  return row;
}

/** A stop at a new garden of that open day. */
export async function aStop(openDayId: Id<'openDay'>, number = 1, changes: Partial<typeof stops.$inferInsert> = {}) {
  const gardenId = changes.gardenId ?? (await aGarden()).id;
  return only(await getDb().insert(stops).values({ openDayId, number, stayMinutes: 35, headsLimit: 28, ...changes, gardenId }).returning({ id: stops.id, gardenId: stops.gardenId, number: stops.number, openDayId: stops.openDayId }));
}

/** An entry time at a stop, `atMinutes` after the gates open, with a grace of 20 minutes. */
export async function anEntryTime(stop: { id: Id<'stop'>; openDayId: Id<'openDay'> }, { capacity = 12, atMinutes = 0, ...changes }: { capacity?: number; atMinutes?: number } & Partial<typeof entryTimes.$inferInsert> = {}) {
  const opensAt = onTheDay(atMinutes);
  return only(await getDb().insert(entryTimes).values({ stopId: stop.id, openDayId: stop.openDayId, opensAt, graceUntil: addMinutes(opensAt, 20), capacity, ...changes }).returning({ id: entryTimes.id, opensAt: entryTimes.opensAt }));
}

/** Says how many minutes lie between two gardens' areas, both ways. */
export async function apart(a: Id<'garden'>, b: Id<'garden'>, minutes: number): Promise<void> {
  await getDb().insert(areaMinutes).values([{ fromGardenId: a, toGardenId: b, minutes }, { fromGardenId: b, toGardenId: a, minutes }]);
}

/** A browser that holds places. */
export const aBrowser = (householdId: Id<'household'> | null = null) => ({ kind: 'holder' as const, holderHash: `hash-of-${newId()}`, householdId });
