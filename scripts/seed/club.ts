import type { club } from '@/db/schema/club';
import type { classDues, membershipClasses } from '@/db/schema/dues';
import { ZONE } from './calendar';

export const CLUB = {
  name: 'Alder Fork Garden Railway Society', footLine: 'founded in a potting shed in 1983', email: 'gate@alderfork.example', timeZone: ZONE, currency: 'USD', locale: 'en-US', hourCycle: 'h23',
  holdMinutes: 10, partyPeopleMax: 9, partyVisitsMax: 7, babesTakePlace: false, addressReleaseHours: 72, changesEndMinutes: 60, duesKeptOnDays: 45,
  refundRules: [{ hoursBefore: 168, percent: 100 }, { hoursBefore: 48, percent: 50 }],
  visitRules: 'Stay on the path and off the track. Ask before you touch a train. Children stay with their grown-ups. No smoking near the gas or the dry grass. What the host says goes, and so do you when the bell rings.',
} as const satisfies typeof club.$inferInsert;

export const CLASSES: readonly (typeof membershipClasses.$inferInsert)[] = [
  { key: 'single', name: 'Single', about: 'One grown-up.', position: 1 },
  { key: 'household', name: 'Household', about: 'Everyone who lives at one address.', position: 2 },
  { key: 'junior', name: 'Junior', about: 'Someone under eighteen, with a grown-up who knows of it.', position: 3 },
  { key: 'life', name: 'Life', about: 'Paid once.', isForLife: true, position: 4 },
];

/** What a class pays a year, from this year on and before. */
export const DUES = { single: { now: 4800, before: 4500 }, household: { now: 6200, before: 6000 }, junior: { now: 1800, before: 1800 }, life: { now: 75_000, before: 75_000 } } as const;

/** The rows of the dues: the older amounts from 2015, the present ones from the first of January of `year`. */
export const duesRows = (year: number): (typeof classDues.$inferInsert)[] => Object.entries(DUES).flatMap(([classKey, { now, before }]) => [
  { classKey, fromOn: '2015-01-01', amountMinor: before },
  ...(now === before ? [] : [{ classKey, fromOn: `${year}-01-01`, amountMinor: now }]),
]);
