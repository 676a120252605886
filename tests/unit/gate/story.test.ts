import { expect, test } from 'vitest';
import { foldFacts, storyOf } from '@/lib/gate/rules/fold';
import { storyLines } from '@/lib/gate/views/story';
import { at, club, fact } from './cast';

test('what a ticket did is told in the order it happened, with the phone and the reason', () => {
  const first = fact({ at: at('11:34'), children: 0 });
  const facts = [
    fact({ kind: 'refuse', at: at('11:20'), deviceId: 'other' }),
    first,
    fact({ kind: 'undo', undoesId: first.id, visitId: null, at: at('11:35') }),
    fact({ at: at('11:40'), deviceId: 'other', reason: 'The host says yes' }),
  ];

  const lines = storyLines(storyOf(foldFacts(facts), 'v1'), 'this', club);

  expect(lines.map(({ time, words }) => `${time} ${words}`)).toEqual([
    '11:20 Shown to the other phone and not let in.',
    '11:34 Let in 2 adults by this phone, then taken back.',
    '11:40 Let in 2 adults and 1 child by the other phone: The host says yes.',
  ]);
});

test('a ticket that was never shown has no story', () => {
  expect(storyLines(storyOf(foldFacts([]), 'v1'), 'this', club)).toEqual([]);
});
