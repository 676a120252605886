import { describe, expect, test } from 'vitest';
import { foldFacts } from '@/lib/gate/rules/fold';
import { crowdSentence, dueNow, explain, letInSentence, peopleInWords, sentenceOf } from '@/lib/gate/views/screen';
import type { Verdict } from '@/lib/gate/rules/verdict';
import { at, club, fact, here, ticket } from './cast';

const heads = { adults: 2, children: 1, babes: 0 };
const inside = (count: number) => foldFacts(count === 0 ? [] : [fact({ kind: 'walk-up', visitId: null, adults: count, children: 0 })]);

describe('the words on the gate', () => {
  test.each<[string, Verdict]>([
    ['Let in 3', { kind: 'let_in', heads, number: 3, cameBefore: null }],
    ['Not yet: 11:30', { kind: 'early', heads, number: 3, opensAt: at('11:30'), minutes: 16 }],
    ['Late: 11:30', { kind: 'late', heads, number: 3, opensAt: at('11:30'), minutes: 30 }],
    ['Came in at 11:34', { kind: 'came_in', at: at('11:34'), deviceId: 'this' }],
    ['Garden 5, not 3', { kind: 'another_garden', stopNumber: 5 }],
    ['Given back on 15 May', { kind: 'given_back', at: at('09:00') }],
    ['For 16 May', { kind: 'another_day', heldOn: '2027-05-16' }],
    ['Full: one out, one in', { kind: 'full', heads, number: 3, room: 0 }],
    ['Not one of ours', { kind: 'not_ours' }],
    ['Called off', { kind: 'called_off' }],
  ])('"%s"', (sentence, verdict) => {
    expect(sentenceOf(verdict, 3, club)).toBe(sentence);
  });

  test('after the press the gate says how many are in and when', () => {
    expect(letInSentence(3, at('11:34'), club)).toBe('Three in at 11:34');
    expect(letInSentence(15, at('11:34'), club)).toBe('15 in at 11:34');
  });

  test('a party is told by kinds of people', () => {
    expect(peopleInWords({ adults: 2, children: 1, babes: 1 })).toBe('2 adults, 1 child and 1 babe in arms');
    expect(peopleInWords({ adults: 1, children: 0, babes: 0 })).toBe('1 adult');
  });

  test('a used ticket says which phone let the party in', () => {
    const verdict = { kind: 'came_in', at: at('11:34'), deviceId: 'that' } as const;

    expect(explain(verdict, { deviceId: 'this', club })).toContain('the other phone');
    expect(explain(verdict, { deviceId: 'that', club })).toContain('this phone');
  });
});

describe('the people in the garden, against its limit', () => {
  test.each([
    [0, 'Nobody is in the garden yet, so there is room for 28.'],
    [1, '1 person is in the garden, so there is room for 27.'],
    [21, '21 people are in the garden, so there is room for 7.'],
    [28, '28 of 28 people are in the garden: it is full.'],
    [30, '30 people are in the garden, 2 over its limit of 28.'],
  ])('with %i inside: "%s"', (count, sentence) => {
    expect(crowdSentence(inside(count), here(), null, club)).toBe(sentence);
  });

  test('says who is still due, and by when', () => {
    const parties = [ticket(), ticket({ visitId: 'v2', adults: 6, children: 0 }), ticket({ visitId: 'v3', opensAt: at('12:10'), graceUntil: at('12:30') })];

    expect(dueNow(parties, foldFacts([]), 'counted', at('11:34'))).toEqual({ heads: 9, by: at('11:50') });
    expect(crowdSentence(inside(21), here(), { heads: 9, by: at('11:50') }, club))
      .toBe('21 people are in the garden, so there is room for 7. Nine more are due by 11:50.');
  });

  test('nobody is due who is in, has given back, or whose grace is over', () => {
    const parties = [ticket(), ticket({ visitId: 'v2', givenBackAt: at('09:00') })];

    expect(dueNow(parties, foldFacts([fact()]), 'counted', at('11:34'))).toBeNull();
    expect(dueNow([ticket()], foldFacts([]), 'counted', at('11:50'))).toBeNull();
  });
});
