import { existsSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { ROLES } from '@/lib/core/words';
import { officeContents } from '@/lib/people/rules/office-contents';
import { officeWaiting } from '@/lib/people/rules/office-waiting';

const nothing = { failing: 0, stuck: 0, lapsed: 0, unpublished: [] };

describe('the office\'s contents', () => {
  it('leads only to pages that are there', () => {
    const hrefs = officeContents(ROLES).flat().map((line) => line.href);

    expect(hrefs.filter((href) => !existsSync(`app/(office)${href}/page.tsx`))).toEqual([]);
    expect(new Set(hrefs).size).toBe(hrefs.length);
  });

  it.each([
    { role: 'administrator' as const, shows: ['/office/letters', '/office/people', '/office/settings', '/office/audit'] },
    { role: 'coordinator' as const, shows: ['/office/open-days', '/office/bookings', '/office/letters'] },
    { role: 'secretary' as const, shows: ['/office/roll', '/office/letters'] },
    { role: 'treasurer' as const, shows: ['/office/open-days', '/office/bookings', '/office/roll', '/office/books', '/office/letters'] },
  ])('shows the $role what that role may open', ({ role, shows }) => {
    expect(officeContents([role]).flat().map((line) => line.href)).toEqual(shows);
  });

  it('shows nothing to someone without a role', () => {
    expect(officeContents([])).toEqual([]);
  });
});

describe('what waits for an officer', () => {
  it('is nothing when nothing does', () => {
    expect(officeWaiting(nothing)).toEqual([]);
  });

  it('puts money first, then letters, then plans, then lapsed households', () => {
    const waiting = officeWaiting({ failing: 2, stuck: 1, lapsed: 1, unpublished: [{ slug: 'spring-2027', title: 'Spring Open Gardens' }] });

    expect(waiting.map((each) => each.sentence)).toEqual([
      'One refund must be paid out by hand', '2 letters have not been delivered yet', 'Spring Open Gardens is not published: nobody can see it or book', 'One household has lapsed',
    ]);
  });
});
