import { describe, expect, it } from 'vitest';
import { areaFaults } from '@/lib/gardens/rules/area';
import { neighbourhoodsOf, valleySchema } from '@/lib/gardens/rules/valley';
import { builtInValley } from '@/lib/gardens/rules/valley-data';
import { passwordProblem } from '@/lib/people/rules/password';
import { seedCalendar } from '@/scripts/seed/calendar';
import { seedDays } from '@/scripts/seed/days';
import { valley } from '@/scripts/seed/draw-valley';
import { ALL_GARDENS, minutesRows, placeOf } from '@/scripts/seed/garden-rows';
import { members } from '@/scripts/seed/members';
import { PLANTING } from '@/scripts/seed/planting';
import { PLANTS } from '@/scripts/seed/plants';
import { seatEveryone } from '@/scripts/seed/seatings';
import { DEMO_SIGN_INS } from '@/scripts/seed/sign-ins';

const calendar = seedCalendar(new Date('2027-03-08T17:00:00Z'));

describe('the demo club’s valley', () => {
  it('on file is what the hand drawing draws', () => {
    expect(valleySchema.parse(valley)).toEqual(builtInValley);
  });

  it('keeps every garden’s place where its neighbourhood may stand for it', () => {
    for (const garden of ALL_GARDENS) {
      const area = neighbourhoodsOf(builtInValley).find(({ key }) => key === garden.areaKey);
      expect(areaFaults(area?.ring ?? [], placeOf(garden), area?.homes ?? 0)).toEqual([]);
    }
  });
});

describe('the demo club’s days', () => {
  it.each([['2026-12-01T17:00:00Z', '2026-11-14', '2026-12-12', '2027-01-16'], ['2027-03-05T17:00:00Z', '2027-02-13', '2027-03-13', '2027-04-17'], ['2027-03-06T03:00:00Z', '2027-02-13', '2027-03-13', '2027-04-17'], ['2027-03-06T17:00:00Z', '2027-02-13', '2027-03-13', '2027-04-17']])('planted at %s are Saturdays: one past, one a week or two ahead, one later', (now, past, next, later) => {
    expect(seedCalendar(new Date(now))).toMatchObject({ past, next, later });
  });

  it('are the same, down to the last booking, when planted twice at one moment', () => {
    const once = () => seatEveryone(seedDays(calendar), members(calendar), minutesRows().area, calendar);

    expect(once()).toEqual(once());
  });
});

describe('the demo club’s gardens', () => {
  it('grow only plants of the list', () => {
    const known = PLANTS.map(([key]) => key);

    for (const { slug } of ALL_GARDENS) {
      expect(PLANTING[slug]?.length).toBeGreaterThanOrEqual(6);
      for (const [key] of PLANTING[slug] ?? []) expect(known).toContain(key);
    }
  });
});

describe('the demo club’s printed sign-ins', () => {
  it('have passwords that the club’s own rule accepts', () => {
    for (const { password } of DEMO_SIGN_INS) expect(passwordProblem(password)).toBeNull();
  });
});
