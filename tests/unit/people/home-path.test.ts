import { describe, expect, it } from 'vitest';
import { homePathOf } from '@/lib/people/rules/home-path';

describe('where someone begins after signing in', () => {
  it.each([
    ['an officer in the office, though a member too', { roles: ['treasurer' as const], householdId: 'h' }, '/office'],
    ['an officer without a household in the office', { roles: ['coordinator' as const], householdId: null }, '/office'],
    ['a member at the household', { roles: [], householdId: 'h' }, '/member'],
    ['someone who left at the account', { roles: [], householdId: null }, '/account'],
  ])('%s', (_, account, path) => {
    expect(homePathOf(account)).toBe(path);
  });
});
