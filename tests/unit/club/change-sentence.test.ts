import { describe, expect, it } from 'vitest';
import { changeSentence } from '@/lib/club/rules/change-sentence';

describe('what an audit line says was changed', () => {
  it.each([
    { before: { capacity: 12 }, after: { capacity: 14 }, says: 'capacity 12 → 14' },
    { before: { capacity: 12, start: '10:00' }, after: { capacity: 12, start: '10:30' }, says: 'start 10:00 → 10:30' },
    { before: null, after: { role: 'treasurer' }, says: 'role treasurer' },
    { before: { role: 'treasurer' }, after: null, says: 'role treasurer → nothing' },
    { before: { garden: 'Mossgill', adults: 2 }, after: { adults: 0, reason: 'a cold' }, says: 'garden Mossgill, adults 2 → 0, reason a cold' },
    { before: { adultMinor: 800 }, after: { adultMinor: 950 }, says: 'adult $8.00 → $9.50' },
    { before: { babesTakePlace: false }, after: { babesTakePlace: true }, says: 'babes take place no → yes' },
    { before: { refundRules: [{ hoursBefore: 168, percent: 100 }] }, after: { refundRules: [{ hoursBefore: 24, percent: 50 }] }, says: 'refund rules hours before 168 percent 100 → hours before 24 percent 50' },
    { before: { closed: null }, after: { closed: null }, says: '' },
    { before: null, after: null, says: '' },
  ])('says "$says"', ({ before, after, says }) => {
    expect(changeSentence(before, after, { locale: 'en-US', currency: 'USD' })).toBe(says);
  });
});
