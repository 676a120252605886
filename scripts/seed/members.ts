import type { accounts, contactDetails, households, people, rolesHeld } from '@/db/schema/people';
import type { Id } from '@/lib/core/ids';
import { addDays, instantOf, type Day } from '@/lib/core/time';
import type { Role } from '@/lib/core/words';
import { type SeedCalendar, ZONE } from './calendar';
import { type SeedHousehold, HOUSEHOLDS } from './households';
import { diceFor, seedId } from './ids';

/** A household of the demo club as other files need it. */
export type Member = SeedHousehold & { number: number; id: Id<'household'>; accountId: Id<'account'>; contact: { name: string; email: string }; joinedOn: Day };

const OFFICERS: readonly [email: string, role: Role][] = [
  ['nell@alderfork.example', 'administrator'], ['cleo@alderfork.example', 'coordinator'], ['wren@alderfork.example', 'secretary'], ['dov@alderfork.example', 'treasurer'],
];
const FIRST_NAME_ONLY = ['Nell', 'Cleo', 'Wren', 'Dov', 'Ada', 'Ben'];
const ROADS = ['Ridge Road', 'Valley Road', 'Quarry Road', 'Moor Lane', 'Ferry Lane', 'Saltings Lane', 'Orchard Hill', 'Halt Street', 'Mill Hill', 'Barrow Lane', 'Chapel Lane'] as const;

const plain = (name: string): string => name.toLowerCase().replace(/[^a-z]/g, '');

/** The roll as other files need it. */
export function members({ today, year }: SeedCalendar): Member[] {
  return HOUSEHOLDS.map((household, i) => {
    const number = i + 1;
    const first = household.adults[0];
    const email = FIRST_NAME_ONLY.includes(first) && number < 8 ? `${plain(first)}@alderfork.example` : `${plain(first)}.${plain(household.family)}@alderfork.example`;
    const dice = diceFor(`joined ${number}`);
    const month = String(1 + dice.whole(10)).padStart(2, '0');
    const joinedOn = household.joinedYearsAgo === 0 ? addDays(today, -6 - dice.whole(20)) : `${year - household.joinedYearsAgo}-${month}-${String(1 + dice.whole(28)).padStart(2, '0')}`;
    return { ...household, number, id: seedId<'household'>(`household ${number}`), accountId: seedId<'account'>(`account ${number}`), contact: { name: `${first} ${household.family}`, email }, joinedOn };
  });
}

export type MemberRows = {
  households: (typeof households.$inferInsert)[]; accounts: (typeof accounts.$inferInsert)[]; people: (typeof people.$inferInsert)[];
  contacts: (typeof contactDetails.$inferInsert)[]; roles: (typeof rolesHeld.$inferInsert)[];
};

/** The rows of the roll: households, people, where they are reached, who can sign in and who holds office. */
export function memberRows(roll: readonly Member[], { year }: SeedCalendar): MemberRows {
  const nell = roll.find(({ contact }) => contact.email === 'nell@alderfork.example')?.accountId ?? null;
  return {
    households: roll.map((member) => ({
      id: member.id, name: `${member.family}, ${[...member.adults].join(' & ')}`, memberNumber: member.number, joinedOn: member.joinedOn, leftOn: member.standing === 'left' ? `${year}-03-03` : null,
    })).map((row) => (row.leftOn !== null && row.leftOn < row.joinedOn ? { ...row, leftOn: row.joinedOn } : row)),
    accounts: roll.map(({ accountId, contact, joinedOn }) => ({ id: accountId, email: contact.email, madeAt: instantOf(joinedOn, '19:30', ZONE) })),
    people: roll.flatMap((member) => [...member.adults, ...member.juniors].map((givenName, i) => ({
      id: seedId<'person'>(`person ${member.number} ${i}`), householdId: member.id, accountId: i === 0 ? member.accountId : null, givenName, familyName: member.family,
      age: i >= member.adults.length || member.classKey === 'junior' ? 'junior' as const : 'adult' as const, isContact: i === 0,
    }))),
    contacts: roll.map((member) => {
      const dice = diceFor(`contact ${member.number}`);
      return {
        personId: seedId<'person'>(`person ${member.number} 0`), email: member.contact.email, phone: dice.next() < 0.7 ? `555-01${String(member.number + 10).padStart(2, '0')}` : null,
        street: `${1 + dice.whole(60)} ${dice.pick(ROADS)}`, town: 'Alder Fork', postcode: '00417',
      };
    }),
    roles: OFFICERS.flatMap(([email, role]) => roll.filter(({ contact }) => contact.email === email).map(({ accountId }) => ({
      id: seedId(`role ${role}`), accountId, role, givenAt: instantOf(`${year - 1}-02-12`, '20:00', ZONE), givenBy: accountId === nell ? null : nell,
    }))),
  };
}
