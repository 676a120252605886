import { eq } from 'drizzle-orm';
import { beforeAll, describe, expect, it } from 'vitest';
import { getDb } from '@/db/client';
import { gardenPlaces, placeShowings } from '@/db/schema/gardens';
import { encodeTicket } from '@/lib/bookings/rules/ticket-payload';
import { addMinutes } from '@/lib/core/time';
import { makeGatePass, recordFacts } from '@/lib/gate/commands';
import { findOpenDayGates, gateList, readTicket, showGatePlace } from '@/lib/gate/queries';
import { gateList as gateListSchema } from '@/lib/gate/schema';
import { ticketSigning } from '@/lib/infra/ticket-keys';
import type { AccountActor } from '@/lib/infra/context';
import { aClub, anEntryTime, anOpenDay, aStop, cleo, ctxOf, MAY_15, NOON, onTheDay } from '@/tests/support/cast';
import { aFact, aPhone, aVisit, batch } from './gate-cast';

let coordinator: AccountActor;

const aGate = async () => {
  const day = await anOpenDay();
  const stop = await aStop(day.id, 3);
  const entry = await anEntryTime(stop);
  return { day, stop, entry, phone: await aPhone(coordinator, stop.id) };
};

describe('the list on a gate’s phone', () => {
  beforeAll(async () => {
    await aClub();
    coordinator = await cleo();
  });

  it('holds this garden’s parties of the day by name, heads, time and code', async () => {
    const { day, entry, phone } = await aGate();
    const { visitId, code } = await aVisit(entry, day.id);

    const list = await gateList(phone);

    expect(list.parties).toEqual([expect.objectContaining({ visitId, code, name: 'Eve Okonjo-Hale', adults: 2, children: 1, babes: 0, opensAt: onTheDay(0), graceUntil: onTheDay(20), givenBackAt: null })]);
    expect(list.here).toMatchObject({ stopNumber: 3, heldOn: '2027-05-15', headsLimit: 28, calledOff: false });
  });

  it('holds no contact details, no address and nothing of another garden, and keeps to the wire format', async () => {
    const { day, entry, stop, phone } = await aGate();
    await aVisit(entry, day.id);
    await aVisit(await anEntryTime(await aStop(day.id, 4)), day.id, { name: 'Somebody Elsewhere' });
    const [place] = await getDb().select({ address: gardenPlaces.address }).from(gardenPlaces).where(eq(gardenPlaces.gardenId, stop.gardenId));

    const sent = JSON.stringify(await gateList(phone));

    for (const secret of ['hidden.example', '555 0100', 'Somebody Elsewhere', place?.address ?? 'no address', 'Secret Lane', '41.5']) expect(sent).not.toContain(secret);
    expect(gateListSchema.parse(JSON.parse(sent)).parties).toHaveLength(1);
  });

  it('leaves out places that are kept but not confirmed, and shows those given back as such', async () => {
    const { day, entry, phone } = await aGate();
    await aVisit(entry, day.id, { name: 'Only Holding', confirmedAt: null });
    await aVisit(entry, day.id, { name: 'Gave Back', givenBackAt: onTheDay(-60) });

    expect((await gateList(phone)).parties.map(({ name, givenBackAt }) => [name, givenBackAt])).toEqual([['Gave Back', onTheDay(-60)]]);
  });

  it('brings what the other phone did', async () => {
    const { day, entry, stop, phone } = await aGate();
    const other = await aPhone(coordinator, stop.id);
    const { visitId } = await aVisit(entry, day.id);
    const admission = aFact({ visitId, adults: 2, children: 1 });

    await recordFacts(other, batch(admission));

    expect((await gateList(phone)).facts).toEqual([expect.objectContaining({ id: admission.id, deviceId: other.actor.deviceId, adults: 2 })]);
  });

  it('says when the day is called off', async () => {
    const day = await anOpenDay({ calledOffAt: NOON });
    const stop = await aStop(day.id);

    expect((await gateList(await aPhone(coordinator, stop.id))).here.calledOff).toBe(true);
  });
});

describe('a code that is not on the list', () => {
  beforeAll(async () => {
    await aClub();
    coordinator = await cleo();
  });

  const aCode = async (visitId: string, stop: { id: string; number: number }) => {
    const { keyId, clubId, sign } = await ticketSigning(getDb(), NOON);
    return encodeTicket({ keyId, clubId, visitId, visitVersion: 1, stopId: stop.id, stopNumber: stop.number, entryAt: onTheDay(0), graceMinutes: 20, adults: 2, children: 1, babes: 0 }, sign);
  };

  it('is read as the ticket it is now, without a name', async () => {
    const { day, phone } = await aGate();
    const elsewhere = await aStop(day.id, 5);
    const { visitId } = await aVisit(await anEntryTime(elsewhere), day.id);

    const { ticket } = await readTicket(phone, { text: await aCode(visitId, elsewhere) });

    expect(ticket).toMatchObject({ visitId, stopNumber: 5, heldOn: '2027-05-15' });
    expect(Object.keys(ticket ?? {})).not.toContain('name');
  });

  it('that was changed by one character is not one of ours', async () => {
    const { day, entry, stop, phone } = await aGate();
    const { visitId } = await aVisit(entry, day.id);
    const code = await aCode(visitId, stop);
    const forged = code.slice(0, 60) + (code.charAt(60) === 'A' ? 'B' : 'A') + code.slice(61);

    expect(await readTicket(phone, { text: forged })).toEqual({ ticket: null });
    expect(await readTicket(phone, { text: 'HTTPS://ELSEWHERE.EXAMPLE' })).toEqual({ ticket: null });
    expect((await readTicket(phone, { text: code })).ticket?.visitId).toBe(visitId);
  });
});

describe('where the garden is, for an ambulance', () => {
  beforeAll(async () => {
    await aClub();
    coordinator = await cleo();
  });

  it('is shown to this gate’s phone on the day, and each showing is recorded', async () => {
    const { stop, phone } = await aGate();
    const before = await getDb().select({ id: placeShowings.id }).from(placeShowings).where(eq(placeShowings.gardenId, stop.gardenId));

    const place = await showGatePlace(phone);

    expect(place.address).toContain('Secret Lane');
    const after = await getDb().select({ kind: placeShowings.viewerKind, who: placeShowings.viewerId }).from(placeShowings).where(eq(placeShowings.gardenId, stop.gardenId));
    expect(before).toHaveLength(0);
    expect(after).toEqual([{ kind: 'gate', who: phone.actor.deviceId }]);
  });

  it('is not shown before addresses are released', async () => {
    const { phone } = await aGate();
    const early = addMinutes(MAY_15.opensAt, -72 * 60 - 1);

    await expect(showGatePlace({ ...phone, now: early })).rejects.toMatchObject({ code: 'not_allowed' });
    expect((await showGatePlace({ ...phone, now: addMinutes(early, 1) })).address).toContain('Secret Lane');
  });
});

describe('all gates, in the office', () => {
  beforeAll(async () => {
    await aClub();
    coordinator = await cleo();
  });

  it('shows each gate’s heads expected, let in and in the garden now, and its passes without their secrets', async () => {
    const { day, entry, stop, phone } = await aGate();
    const { visitId } = await aVisit(entry, day.id);
    await aVisit(entry, day.id, { givenBackAt: onTheDay(-60) });
    const { secret } = await makeGatePass(await ctxOf(coordinator, addMinutes(NOON, 1)), { stopId: stop.id, helper: 'Ben', devices: 2 });
    await recordFacts(phone, batch(aFact({ visitId, adults: 2, children: 1 }), aFact({ kind: 'count-out', adults: 1 }), aFact({ kind: 'refuse', verdict: 'not_ours' })));

    const gates = await findOpenDayGates(await ctxOf(coordinator), day.slug);

    expect(gates?.gates).toEqual([expect.objectContaining({ number: 3, expected: 3, cameIn: 3, now: 2, refusals: 1, headsLimit: 28 })]);
    expect(gates?.passes.map(({ helper, phonesText, isLive }) => [helper, phonesText, isLive])).toEqual([['Gus', '1 of 1 phone', true], ['Ben', '0 of 2 phones', true]]);
    expect(JSON.stringify(gates)).not.toContain(secret);
  });

  it('are of an open day that exists', async () => {
    expect(await findOpenDayGates(await ctxOf(coordinator), 'no-such-day')).toBeNull();
  });
});
