import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { headsFit, peopleCount } from '@/lib/gate/rules/facts';
import { foldFacts, storyOf } from '@/lib/gate/rules/fold';
import { drawingOf, judge, pressesOf, type GateTicket } from '@/lib/gate/rules/verdict';
import { at, fact, here, ticket } from './cast';

const nobodyYet = foldFacts([]);
const crowd = (heads: number) => fact({ kind: 'walk-up', visitId: null, adults: heads, children: 0 });

describe('the verdict at the gate, by the clock', () => {
  test.each([
    ['11:14', 'early', 'sixteen minutes early'],
    ['11:29', 'early', 'the last minute before the entry time'],
    ['11:30', 'let_in', 'exactly at the entry time'],
    ['11:49', 'let_in', 'in the last minute of the grace'],
    ['11:50', 'late', 'exactly when the grace has ended'],
    ['16:00', 'late', 'hours later'],
  ])('at %s a ticket for 11:30 with grace until 11:50 is %s: %s', (time, kind) => {
    expect(judge(ticket(), here(), nobodyYet, at(time)).kind).toBe(kind);
  });

  test.each([
    ['11:19', 'early'],
    ['11:20', 'let_in'],
  ])('where people may come ten minutes early, at %s the gate says %s', (time, kind) => {
    expect(judge(ticket(), here({ earlyMinutes: 10 }), nobodyYet, at(time)).kind).toBe(kind);
  });

  test('says how early and how late in whole minutes', () => {
    expect(judge(ticket(), here(), nobodyYet, at('11:14'))).toMatchObject({ minutes: 16, opensAt: at('11:30') });
    expect(judge(ticket(), here(), nobodyYet, at('12:05'))).toMatchObject({ minutes: 35 });
  });
});

describe('the verdict at the gate, by the ticket', () => {
  const now = at('11:34');

  test.each<[string, Partial<GateTicket>, object]>([
    ['another garden', { stopId: 'brook', stopNumber: 5 }, { kind: 'another_garden', stopNumber: 5 }],
    ['another day', { heldOn: '2027-05-16' }, { kind: 'another_day', heldOn: '2027-05-16' }],
    ['another day before another garden', { heldOn: '2027-05-16', stopId: 'brook' }, { kind: 'another_day' }],
    ['given back', { givenBackAt: at('09:00') }, { kind: 'given_back', at: at('09:00') }],
    ['given back before early', { givenBackAt: at('09:00'), opensAt: at('14:00') }, { kind: 'given_back' }],
  ])('a ticket for %s is told so', (_, changes, verdict) => {
    expect(judge(ticket(changes), here(), nobodyYet, now)).toMatchObject(verdict);
  });

  test('what is no ticket of the club is not one of ours', () => {
    expect(judge(null, here(), nobodyYet, now)).toEqual({ kind: 'not_ours' });
  });

  test('a used ticket came in at its last admission, and can only be read', () => {
    const verdict = judge(ticket(), here(), foldFacts([fact({ at: at('11:32'), deviceId: 'other' })]), now);

    expect(verdict).toEqual({ kind: 'came_in', at: at('11:32'), deviceId: 'other' });
    expect(pressesOf(verdict)).toEqual(['see story']);
  });

  test('a used ticket came in, however late it is shown again', () => {
    expect(judge(ticket(), here(), foldFacts([fact()]), at('15:00')).kind).toBe('came_in');
  });

  test('a party of which two are in has one still to come', () => {
    const verdict = judge(ticket(), here(), foldFacts([fact({ adults: 2, children: 0 })]), now);

    expect(verdict).toMatchObject({ kind: 'let_in', number: 1, heads: { adults: 0, children: 1, babes: 0 }, cameBefore: { adults: 2 } });
    expect(pressesOf(verdict)).toEqual(['let in']);
  });

  test('an admission taken back lets the party in again', () => {
    const admission = fact();
    const undo = fact({ kind: 'undo', undoesId: admission.id, visitId: null });

    expect(judge(ticket(), here(), foldFacts([admission, undo]), now)).toMatchObject({ kind: 'let_in', number: 3 });
  });

  test('babes in arms are on the number only where they take a place', () => {
    const withBabe = ticket({ babes: 1 });

    expect(judge(withBabe, here(), nobodyYet, now)).toMatchObject({ number: 3 });
    expect(judge(withBabe, here({ babes: 'counted' }), nobodyYet, now)).toMatchObject({ number: 4 });
  });

  test('on a day that is called off nobody is let in', () => {
    expect(judge(ticket(), here({ calledOff: true }), nobodyYet, now)).toEqual({ kind: 'called_off' });
  });
});

describe('the verdict at the gate, by the crowd', () => {
  const now = at('11:34');

  test.each([
    [25, 'let_in', 'exactly three places are left for three'],
    [26, 'full', 'two places are left for three'],
    [28, 'full', 'none is left'],
    [30, 'full', 'the garden is over its limit'],
  ])('with %i of 28 in the garden three people meet "%s": %s', (inside, kind) => {
    expect(judge(ticket(), here(), foldFacts([crowd(inside)]), now).kind).toBe(kind);
  });

  test('one out makes room for one in', () => {
    const out = fact({ kind: 'count-out', visitId: null, adults: 1, children: 0 });

    expect(judge(ticket({ adults: 1, children: 0 }), here(), foldFacts([crowd(28)]), now)).toMatchObject({ kind: 'full', room: 0 });
    expect(judge(ticket({ adults: 1, children: 0 }), here(), foldFacts([crowd(28), out]), now).kind).toBe('let_in');
  });

  test('a full garden offers one thing that happens and the host\'s word, and part of a party where part has room', () => {
    expect(pressesOf({ kind: 'full', heads: ticket(), number: 3, room: 0 })).toEqual(['one came out', 'host says yes']);
    expect(pressesOf({ kind: 'full', heads: ticket(), number: 3, room: 2 })).toContain('only some');
  });
});

describe('the gate as it is drawn', () => {
  const heads = { adults: 2, children: 1, babes: 0 };
  const drawn = { kind: 'early', heads, number: 3, opensAt: at('11:30'), minutes: 16 } as const;

  test('open is yes, ajar is early or late, shut is no, and full has its own', () => {
    expect(drawingOf({ kind: 'let_in', heads, number: 3, cameBefore: null })).toBe('open');
    expect([drawingOf(drawn), drawingOf({ ...drawn, kind: 'late' })]).toEqual(['ajar', 'ajar']);
    expect(drawingOf({ kind: 'full', heads, number: 3, room: 0 })).toBe('one out');
    expect(['came_in', 'given_back', 'another_day', 'another_garden', 'called_off', 'not_ours']
      .map((kind) => drawingOf({ kind, at: at('11:00'), deviceId: 'this', heldOn: '2027-05-16', stopNumber: 5 } as never)))
      .toEqual(Array(6).fill('shut'));
  });
});

test('whatever the phones do by the verdicts, a ticket never admits more heads than it carries', () => {
  const size = fc.integer({ min: 0, max: 4 });
  const asked = fc.array(fc.record({ adults: size, children: size, babes: size, takeBack: fc.boolean() }), { maxLength: 12 });

  fc.assert(fc.property(fc.record({ adults: size, children: size, babes: size }), asked, (party, steps) => {
    const carried = ticket(party);
    const facts: ReturnType<typeof fact>[] = [];
    for (const { takeBack, ...heads } of steps) {
      const verdict = judge(carried, here({ headsLimit: 500 }), foldFacts(facts), at('11:34'));
      if (verdict.kind === 'let_in' && headsFit(heads, verdict.heads) && peopleCount(heads) > 0) facts.push(fact(heads));
      const last = storyOf(foldFacts(facts), 'v1').admissions.at(-1);
      if (takeBack && last) facts.push(fact({ kind: 'undo', undoesId: last.id, visitId: null }));
      expect(headsFit(storyOf(foldFacts(facts), 'v1').in, party)).toBe(true);
    }
  }));
});
