import { randomBytes } from 'node:crypto';
import { getDb } from '@/db/client';
import { bookingContacts, bookings, visits } from '@/db/schema/bookings';
import { drawSpokenCode } from '@/lib/bookings/rules/spoken-code';
import { newId, type Id } from '@/lib/core/ids';
import { only } from '@/lib/core/only';
import { exchangePass, makeGatePass } from '@/lib/gate/commands';
import { findGateActor } from '@/lib/gate/access';
import type { RecordFactsInput, SentFact } from '@/lib/gate/schema';
import type { AccountActor, Ctx, GateActor } from '@/lib/infra/context';
import { hashSecret, newSecret } from '@/lib/infra/secrets';
import { ctxOf, NOON, onTheDay } from '@/tests/support/cast';

type Booked = { name?: string; adults?: number; children?: number; babes?: number; givenBackAt?: Date; confirmedAt?: Date | null };

/** A confirmed booking of one visit, with contact details that no gate may see. */
export async function aVisit(entryTime: { id: Id<'entryTime'> }, openDayId: Id<'openDay'>, { name = 'Eve Okonjo-Hale', adults = 2, children = 1, babes = 0, givenBackAt, confirmedAt = NOON }: Booked = {}) {
  const db = getDb();
  const code = drawSpokenCode((count) => randomBytes(count));
  const booking = only(await db.insert(bookings).values({ openDayId, code, madeAt: NOON, heldUntil: NOON, confirmedAt, totalMinor: 0, currency: 'USD' }).returning({ id: bookings.id }));
  await db.insert(bookingContacts).values({ bookingId: booking.id, name, email: 'eve@hidden.example', phone: '+1 555 0100 199' });
  const visit = only(await db.insert(visits).values({
    bookingId: booking.id, openDayId, entryTimeId: entryTime.id, adults, children, babes, heads: adults + children, adultMinor: 0, childMinor: 0, babeMinor: 0, givenBackAt: givenBackAt ?? null,
  }).returning({ id: visits.id }));
  return { visitId: visit.id, bookingId: booking.id, code };
}

/** A phone at a stop's gate, `minutes` after the gates open: its context as each request finds it. */
export async function aPhone(coordinator: AccountActor, stopId: Id<'stop'>, minutes = 4): Promise<Ctx<GateActor>> {
  const office = await ctxOf(coordinator);
  const { secret } = await makeGatePass(office, { stopId, helper: 'Gus', devices: 1 });
  const deviceKey = newSecret();
  await exchangePass(office, { secret, deviceKey });
  const now = onTheDay(minutes);
  return ctxOf(await findGateActor(office.db, hashSecret(deviceKey), now), now);
}

/** One fact as a phone sends it. */
export const aFact = (changes: Partial<SentFact> = {}): SentFact => ({
  id: newId(), kind: 'admit', undoesId: null, visitId: null, adults: 0, children: 0, babes: 0, at: onTheDay(4), verdict: 'let_in', reason: null, ...changes,
});

/** A batch from a phone whose clock is right. */
export const batch = (...facts: SentFact[]): RecordFactsInput => ({ phoneTime: onTheDay(4), listVersion: 'test', facts });
