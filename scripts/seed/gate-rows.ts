import type { gateFacts } from '@/db/schema/gate';
import type { gateDevices, gatePasses } from '@/db/schema/people';
import type { Id } from '@/lib/core/ids';
import { addMinutes } from '@/lib/core/time';
import type { SeedDay, SeedStop } from './days';
import { diceFor, type Dice, seedHash, seedId } from './ids';
import { type People, type SeedBooking } from './parties';

export type GateRows = { passes: (typeof gatePasses.$inferInsert)[]; devices: (typeof gateDevices.$inferInsert)[]; facts: (typeof gateFacts.$inferInsert)[] };
type Fact = GateRows['facts'][number];

const HELPERS = ['Dilys Swithin', 'Roy Kestrelman', 'Sybil Quickbeam', 'Noor Ellingham', 'Basil Whinstone', 'Pru Underhay'];
const NOBODY: People = { adults: 0, children: 0, babes: 0 };

/** What the gates of the past day wrote down: parties that came, some short, some not at all; callers; people counted out; one slip taken back. */
export function gateRows(day: SeedDay, bookings: readonly SeedBooking[], cleo: Id<'account'>): GateRows {
  const rows: GateRows = { passes: [], devices: [], facts: [] };
  for (const stop of day.stops) {
    const passId = seedId<'gatePass'>(`pass ${day.key} ${stop.number}`);
    const deviceId = seedId<'device'>(`device ${day.key} ${stop.number}`);
    rows.passes.push({ id: passId, stopId: stop.id, helper: HELPERS[(stop.number - 1) % HELPERS.length] ?? 'a helper', secretHash: seedHash(passId), madeAt: addMinutes(day.opensAt, -2880), madeBy: cleo, revokedAt: addMinutes(day.closesAt, 120) });
    rows.devices.push({ id: deviceId, passId, number: 1, keyHash: seedHash(deviceId), openedAt: addMinutes(day.opensAt, -25), seenAt: day.closesAt });
    rows.facts.push(...factsAt(day, stop, bookings).map((fact) => ({ ...fact, passId, deviceId })));
  }
  return rows;
}

function factsAt(day: SeedDay, stop: SeedStop, bookings: readonly SeedBooking[]): Fact[] {
  const dice = diceFor(`gate ${day.key} ${stop.number}`);
  const here = bookings.flatMap((booking) => booking.visits.filter((visit) => visit.stop === stop && visit.givenBackAt === null).map((visit) => ({ booking, visit })));
  const admissions = here.flatMap(({ booking, visit }, i) => (dice.next() < 0.09 ? [] : comingIn(day, stop, { visitId: visit.id, opensAt: visit.time.opensAt, people: booking.people, slip: i === 2 && stop.number === 1 }, dice)));
  const callers = stop.times.flatMap((time) => (time.walkUps > 0 && dice.next() < 0.6 ? callingIn(day, stop, addMinutes(time.opensAt, 8 + dice.whole(9)), 1 + dice.whole(time.walkUps), dice) : []));
  const strayed = addMinutes(day.opensAt, 95 + stop.number);
  const refusals = stop.number === 2 ? [fact(day, stop, 'refused', strayed, { kind: 'refuse', ...NOBODY, verdict: 'another_garden' })] : [];
  return [...admissions, ...callers, ...refusals];
}

function fact(day: SeedDay, stop: SeedStop, name: string, at: Date, rest: Omit<Fact, 'id' | 'openDayId' | 'stopId' | 'atPhone' | 'receivedAt'>): Fact {
  return { id: seedId<'gateFact'>(`fact ${day.key} ${stop.number} ${name}`), openDayId: day.id, stopId: stop.id, atPhone: at, receivedAt: new Date(at.getTime() + 1400), clockOffsetMs: 0, ...rest };
}

type Arriving = { visitId: Id<'visit'>; opensAt: Date; people: People; slip: boolean };

function comingIn(day: SeedDay, stop: SeedStop, { visitId, opensAt, people, slip }: Arriving, dice: Dice): Fact[] {
  const at = addMinutes(opensAt, dice.whole(18));
  const isShort = people.adults > 1 && dice.next() < 0.07;
  const came = isShort ? { ...people, adults: people.adults - 1 } : people;
  const admit = fact(day, stop, `in ${visitId}`, at, { kind: 'admit', visitId, ...came, verdict: 'let_in' });
  const slipped = fact(day, stop, `slip ${visitId}`, addMinutes(at, -1), { kind: 'admit', visitId, ...people, verdict: 'let_in' });
  const takenBack = fact(day, stop, `slip back ${visitId}`, new Date(at.getTime() - 30_000), { kind: 'undo', undoesId: slipped.id, visitId, ...NOBODY });
  const left = addMinutes(at, stop.stayMinutes - 8 + dice.whole(20));
  const out = fact(day, stop, `out ${visitId}`, left, { kind: 'count-out', ...NOBODY, adults: came.adults + came.children });
  return [...(slip ? [slipped, takenBack] : []), admit, ...(dice.next() < 0.85 ? [out] : [])];
}

function callingIn(day: SeedDay, stop: SeedStop, at: Date, adults: number, dice: Dice): Fact[] {
  const left = addMinutes(at, stop.stayMinutes - 5 + dice.whole(12));
  return [
    fact(day, stop, `caller ${at.toISOString()}`, at, { kind: 'walk-up', ...NOBODY, adults }),
    fact(day, stop, `caller out ${at.toISOString()}`, left, { kind: 'count-out', ...NOBODY, adults }),
  ];
}
