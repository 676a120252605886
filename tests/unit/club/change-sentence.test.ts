import { describe, expect, it } from 'vitest';
import { changeSentence } from '@/lib/club/rules/change-sentence';

describe('what an audit line says was changed', () => {
  it.each([
    { before: { capacity: 12 }, after: { capacity: 14 }, says: 'capacity 12 → 14' },
    { before: { capacity: 12, start: '10:00' }, after: { capacity: 12, start: '10:30' }, says: 'start 10:00 → 10:30' },
    { before: null, after: { role: 'treasurer' }, says: 'role treasurer' },
    { before: { role: 'treasurer' }, after: null, says: 'role treasurer → nothing' },
    { before: { steps: [1] }, after: { steps: [1, 2] }, says: 'steps [1] → [1,2]' },
    { before: null, after: null, says: '' },
  ])('says "$says"', ({ before, after, says }) => {
    expect(changeSentence(before, after)).toBe(says);
  });
});
