import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { FACT_KINDS } from '@/lib/core/words';
import { headCount, peopleCount, type GateFact } from '@/lib/gate/rules/facts';
import { foldFacts, headsInGarden, storyOf } from '@/lib/gate/rules/fold';
import { at, fact } from './cast';

/** What a fold says, as plain values that compare. */
const said = (facts: readonly GateFact[]) => {
  const fold = foldFacts(facts);
  const ids = (list: readonly GateFact[]) => list.map(({ id }) => id);
  const stories = [...fold.visits].map(([id, story]) => [id, story.in, ids(story.admissions), ids(story.takenBack), ids(story.refusals)] as const);
  return {
    stories: stories.sort((a, b) => (a[0] < b[0] ? -1 : 1)),
    cameIn: fold.cameIn,
    wentOut: fold.wentOut,
    standing: [...fold.standing.keys()],
    now: headsInGarden(fold, 'counted'),
  };
};

const heads = fc.integer({ min: 0, max: 6 });
const someFacts = fc.uniqueArray(
  fc.record({
    id: fc.integer({ min: 0, max: 40 }).map(String),
    kind: fc.constantFrom(...FACT_KINDS),
    undoesId: fc.integer({ min: 0, max: 40 }).map(String),
    visitId: fc.constantFrom('v1', 'v2', 'v3'),
    adults: heads, children: heads, babes: heads,
    at: fc.integer({ min: 0, max: 5 }).map((minute) => at(`11:0${minute}`)),
    deviceId: fc.constantFrom('this', 'other'),
    reason: fc.constant(null),
  }).map((made): GateFact => (made.kind === 'undo' ? made : { ...made, undoesId: null })),
  { selector: ({ id }) => id, maxLength: 25 },
);

describe('the fold of gate facts', () => {
  test('an untouched visit has let nobody in', () => {
    expect(storyOf(foldFacts([]), 'v1').in).toEqual({ adults: 0, children: 0, babes: 0 });
    expect(headsInGarden(foldFacts([]), 'counted')).toBe(0);
  });

  test('a party let in by two phones in two parts is in once, and its last part gives the time', () => {
    const first = fact({ adults: 2, children: 0, at: at('11:34') });
    const second = fact({ adults: 0, children: 1, at: at('11:41'), deviceId: 'other' });

    const story = storyOf(foldFacts([second, first]), 'v1');

    expect(story.in).toEqual({ adults: 2, children: 1, babes: 0 });
    expect(story.admissions.at(-1)?.deviceId).toBe('other');
  });

  test('an admission taken back counts for nothing, even when the taking back arrives first', () => {
    const admission = fact();
    const undo = fact({ kind: 'undo', undoesId: admission.id, visitId: null, adults: 0, children: 0 });

    for (const facts of [[admission, undo], [undo, admission]]) {
      expect(peopleCount(foldFacts(facts).cameIn)).toBe(0);
      expect(storyOf(foldFacts(facts), 'v1').takenBack).toEqual([admission]);
    }
  });

  test('a taking back cannot itself be taken back', () => {
    const admission = fact();
    const undo = fact({ kind: 'undo', undoesId: admission.id, visitId: null });
    const again = fact({ kind: 'undo', undoesId: undo.id, visitId: null });

    expect(peopleCount(foldFacts([admission, undo, again]).cameIn)).toBe(0);
  });

  test('people counted out leave room, and a count out can be taken back', () => {
    const out = fact({ kind: 'count-out', visitId: null, adults: 1, children: 0 });
    const undo = fact({ kind: 'undo', undoesId: out.id, visitId: null });

    expect(headsInGarden(foldFacts([fact(), out]), 'counted')).toBe(2);
    expect(headsInGarden(foldFacts([fact(), out, undo]), 'counted')).toBe(3);
  });

  test('more people counted out than came in leave nobody in the garden, never fewer', () => {
    const out = fact({ kind: 'count-out', visitId: null, adults: 5, children: 0 });

    expect(headsInGarden(foldFacts([fact(), out]), 'counted')).toBe(0);
  });

  test('walk-ups are in the garden without a ticket', () => {
    const walkUp = fact({ kind: 'walk-up', visitId: null, adults: 2, children: 2 });

    const fold = foldFacts([walkUp]);

    expect(headsInGarden(fold, 'counted')).toBe(4);
    expect(fold.visits.size).toBe(0);
  });

  test('babes in arms count as the club says', () => {
    const party = { adults: 2, children: 1, babes: 1 };

    expect(headCount(party, 'counted')).toBe(4);
    expect(headCount(party, 'not counted')).toBe(3);
  });

  test('an admission that the server turned down lets nobody in, whichever copy comes first', () => {
    const asked = fact({ id: 'same' });
    const answered = fact({ id: 'same', kind: 'refuse', reason: 'not_on_ticket' });

    for (const facts of [[asked, answered], [answered, asked]]) {
      expect(storyOf(foldFacts(facts), 'v1').in.adults).toBe(0);
      expect(storyOf(foldFacts(facts), 'v1').refusals).toHaveLength(1);
    }
  });

  test('facts in any order, and any of them twice, mean the same', () => {
    const shuffled = someFacts.chain((facts) =>
      fc.tuple(fc.constant(facts), fc.shuffledSubarray(facts, { minLength: facts.length }), fc.subarray(facts)));

    fc.assert(fc.property(shuffled, ([facts, mixed, twice]) => {
      expect(said([...twice, ...mixed, ...twice])).toEqual(said(facts));
    }), { numRuns: 400 });
  });

  test('an empty garden is never below nought, and people in it are those let in less those out', () => {
    fc.assert(fc.property(someFacts, (facts) => {
      const fold = foldFacts(facts);
      expect(headsInGarden(fold, 'counted')).toBe(Math.max(0, peopleCount(fold.cameIn) - fold.wentOut));
    }));
  });

  test('a late fact adds to what was known: folding it in one by one ends at the same', () => {
    fc.assert(fc.property(someFacts, (facts) => {
      const grown = facts.reduce<GateFact[]>((held, next) => [next, ...held], []);
      expect(said(grown)).toEqual(said(facts));
    }));
  });
});
