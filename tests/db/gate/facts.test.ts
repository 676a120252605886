import { asc, eq } from 'drizzle-orm';
import { beforeAll, beforeEach, describe, expect, it } from 'vitest';
import { getDb } from '@/db/client';
import { gateFacts } from '@/db/schema/gate';
import { giveBackForParty } from '@/lib/bookings/commands/give-back';
import { newId, type Id } from '@/lib/core/ids';
import { peopleCount } from '@/lib/gate/rules/facts';
import { foldFacts, headsInGarden, storyOf } from '@/lib/gate/rules/fold';
import { recordFacts } from '@/lib/gate/commands';
import { factsOfStop } from '@/lib/gate/queries';
import type { AccountActor, Ctx, GateActor } from '@/lib/infra/context';
import { aClub, anEntryTime, anOpenDay, aStop, cleo, ctxOf, onTheDay } from '@/tests/support/cast';
import { aFact, aPhone, aVisit, batch } from './gate-cast';

let coordinator: AccountActor;
let stopId: Id<'stop'>;
let openDayId: Id<'openDay'>;
let entry: { id: Id<'entryTime'> };
let phone: Ctx<GateActor>;
let other: Ctx<GateActor>;

const fold = async () => foldFacts(await factsOfStop(getDb(), stopId));
const rows = () => getDb().select({ id: gateFacts.id, kind: gateFacts.kind, verdict: gateFacts.verdict, visitId: gateFacts.visitId }).from(gateFacts).where(eq(gateFacts.stopId, stopId)).orderBy(asc(gateFacts.receivedAt));

describe('what a phone did at the gate', () => {
  beforeAll(async () => {
    await aClub();
    coordinator = await cleo();
  });
  beforeEach(async () => {
    openDayId = (await anOpenDay()).id;
    const stop = await aStop(openDayId);
    stopId = stop.id;
    entry = await anEntryTime(stop);
    phone = await aPhone(coordinator, stopId);
    other = await aPhone(coordinator, stopId);
  });

  it('is kept with its phone, pass, list and times', async () => {
    const { visitId } = await aVisit(entry, openDayId);
    const admission = aFact({ visitId, adults: 2, children: 1 });

    expect(await recordFacts(phone, batch(admission))).toEqual({ answers: [{ id: admission.id, outcome: 'kept', reason: null }] });

    const [row] = await getDb().select().from(gateFacts).where(eq(gateFacts.id, admission.id));
    expect(row).toMatchObject({ kind: 'admit', visitId, adults: 2, children: 1, stopId, openDayId, deviceId: phone.actor.deviceId, passId: phone.actor.passId, listVersion: 'test', verdict: 'let_in', receivedAt: onTheDay(4) });
  });

  it('is one fact however often it is sent, and is answered the same', async () => {
    const { visitId } = await aVisit(entry, openDayId);
    const admission = aFact({ visitId, adults: 2, children: 1 });
    const first = await recordFacts(phone, batch(admission));

    expect(await recordFacts(phone, batch(admission, admission))).toEqual({ answers: [...first.answers, ...first.answers] });

    expect(await rows()).toHaveLength(1);
  });

  it('sent twice at the same moment is one fact', async () => {
    const out = aFact({ kind: 'count-out', adults: 1 });

    await Promise.all([recordFacts(phone, batch(out)), recordFacts(phone, batch(out))]);

    expect(await rows()).toHaveLength(1);
  });

  it('by a phone whose clock is wrong happened at the right time all the same', async () => {
    const out = aFact({ kind: 'count-out', adults: 1, at: onTheDay(-500) });

    await recordFacts(phone, { ...batch(out), phoneTime: onTheDay(-499) });

    expect((await factsOfStop(getDb(), stopId))[0]?.at).toEqual(onTheDay(3));
  });

  it('lets in a party in two parts, and not one head more', async () => {
    const { visitId } = await aVisit(entry, openDayId);

    await recordFacts(phone, batch(aFact({ visitId, adults: 2 })));
    const second = await recordFacts(other, batch(aFact({ visitId, children: 1 })));
    const third = await recordFacts(phone, batch(aFact({ visitId, children: 1 })));

    expect([second.answers[0]?.outcome, third.answers[0]]).toEqual(['kept', expect.objectContaining({ outcome: 'refused', reason: 'not_on_ticket' })]);
    expect(storyOf(await fold(), visitId).in).toEqual({ adults: 2, children: 1, babes: 0 });
  });

  it('keeps an admission that was turned down as a refusal, and answers a repeat the same', async () => {
    const { visitId } = await aVisit(entry, openDayId, { adults: 1, children: 0 });
    const tooMany = aFact({ visitId, adults: 2 });

    await recordFacts(phone, batch(tooMany));

    expect(await rows()).toEqual([{ id: tooMany.id, kind: 'refuse', verdict: 'not_on_ticket', visitId }]);
    expect((await recordFacts(phone, batch(tooMany))).answers[0]?.outcome).toBe('refused');
  });

  it('never counts a child’s place as an adult’s', async () => {
    const { visitId } = await aVisit(entry, openDayId, { adults: 1, children: 2 });

    expect((await recordFacts(phone, batch(aFact({ visitId, adults: 3 })))).answers[0]?.outcome).toBe('refused');
  });

  it('lets the last people in by one of two phones, whichever is first', async () => {
    for (let round = 0; round < 12; round += 1) {
      const { visitId } = await aVisit(entry, openDayId);

      const answers = await Promise.all([phone, other, phone, other].map((each) => recordFacts(each, batch(aFact({ visitId, adults: 2, children: 1 })))));

      expect(answers.map(({ answers: [answer] }) => answer?.outcome).sort()).toEqual(['kept', 'refused', 'refused', 'refused']);
      expect(peopleCount(storyOf(await fold(), visitId).in)).toBe(3);
    }
  });

  it('lets a party in or gives its places back, never both, when the office and the gate act at once', async () => {
    const office = await ctxOf(coordinator, onTheDay(4));
    const busy = await anEntryTime({ id: stopId, openDayId }, { atMinutes: 60, capacity: 60, taken: 30 });
    for (let round = 0; round < 10; round += 1) {
      const { visitId } = await aVisit(busy, openDayId);

      const [letIn, gaveBack] = await Promise.all([
        recordFacts(phone, batch(aFact({ visitId, adults: 2, children: 1 }))).then(({ answers: [answer] }) => answer?.outcome === 'kept'),
        giveBackForParty(office, { visitId, version: 1, adults: 2, children: 1, babes: 0, reason: 'ill', refundPercent: null }).then(() => true, (error: { code: string }) => error.code !== 'already_came_in'),
      ]);

      expect(letIn).not.toBe(gaveBack);
    }
  });

  it('taken back lets the party in again, by either phone', async () => {
    const { visitId } = await aVisit(entry, openDayId);
    const admission = aFact({ visitId, adults: 2, children: 1 });
    await recordFacts(phone, batch(admission));

    await recordFacts(other, batch(aFact({ kind: 'undo', undoesId: admission.id })));
    const again = await recordFacts(phone, batch(aFact({ visitId, adults: 2, children: 1 })));

    expect(again.answers[0]?.outcome).toBe('kept');
    expect(await rows()).toHaveLength(3);
  });

  it('taken back twice is taken back once', async () => {
    const admission = aFact({ kind: 'count-out', adults: 1 });
    await recordFacts(phone, batch(admission));

    const answers = await Promise.all([phone, other].map((each) => recordFacts(each, batch(aFact({ kind: 'undo', undoesId: admission.id })))));

    expect(answers.map(({ answers: [answer] }) => answer?.outcome)).toEqual(['kept', 'kept']);
    expect((await rows()).filter(({ kind }) => kind === 'undo')).toHaveLength(1);
  });

  it('cannot take back what was done at another gate', async () => {
    const elsewhere = await aStop(openDayId, 2);
    const theirs = aFact({ kind: 'count-out', adults: 1 });
    await recordFacts(await aPhone(coordinator, elsewhere.id), batch(theirs));

    const [answer] = (await recordFacts(phone, batch(aFact({ kind: 'undo', undoesId: theirs.id })))).answers;

    expect(answer).toMatchObject({ outcome: 'refused', reason: 'unknown_fact' });
    expect(await rows()).toEqual([]);
  });

  it('in one batch is judged in the order it was done', async () => {
    const { visitId } = await aVisit(entry, openDayId);
    const first = aFact({ visitId, adults: 2, children: 1 });
    const undo = aFact({ kind: 'undo', undoesId: first.id });
    const second = aFact({ visitId, adults: 2 });

    const { answers } = await recordFacts(phone, batch(first, undo, second));

    expect(answers.map(({ outcome }) => outcome)).toEqual(['kept', 'kept', 'kept']);
    expect(storyOf(await fold(), visitId).in).toEqual({ adults: 2, children: 0, babes: 0 });
  });

  it('counts people out of the garden', async () => {
    const { visitId } = await aVisit(entry, openDayId);

    await recordFacts(phone, batch(aFact({ visitId, adults: 2, children: 1 }), aFact({ kind: 'count-out', adults: 1 })));

    expect(headsInGarden(await fold(), 'not counted')).toBe(2);
  });

  it.each([
    ['a ticket of another garden', async () => aVisit(await anEntryTime(await aStop(openDayId, 2)), openDayId), 'not_this_garden'],
    ['a ticket of another day', async () => {
      const otherDay = await anOpenDay();
      return aVisit(await anEntryTime(await aStop(otherDay.id)), otherDay.id);
    }, 'not_this_garden'],
    ['places that were given back', () => aVisit(entry, openDayId, { givenBackAt: onTheDay(-60) }), 'given_back'],
    ['places that are only kept, not confirmed', () => aVisit(entry, openDayId, { confirmedAt: null }), 'not_this_garden'],
    ['a ticket that never was', async () => ({ visitId: newId<'visit'>() }), 'not_this_garden'],
  ] as const)('never lets anyone in on %s', async (_, make, reason) => {
    const { visitId } = await make();

    const [answer] = (await recordFacts(phone, batch(aFact({ visitId, adults: 1 })))).answers;

    expect(answer).toMatchObject({ outcome: 'refused', reason });
    expect((await rows()).map(({ kind }) => kind)).toEqual(['refuse']);
  });

  it('keeps a refusal the phone made, with what it said', async () => {
    const { visitId } = await aVisit(entry, openDayId);

    await recordFacts(phone, batch(aFact({ kind: 'refuse', visitId, verdict: 'early' })));

    expect(await rows()).toMatchObject([{ kind: 'refuse', verdict: 'early', visitId }]);
  });

  it('cannot be changed or taken out of the table afterwards', async () => {
    const out = aFact({ kind: 'count-out', adults: 1 });
    await recordFacts(phone, batch(out));

    await expect(getDb().update(gateFacts).set({ adults: 5 }).where(eq(gateFacts.id, out.id))).rejects.toThrow();
    await expect(getDb().delete(gateFacts).where(eq(gateFacts.id, out.id))).rejects.toThrow();
  });
});
