import type { RefusalCode } from '@/lib/core/refusal';

/** People of one party at one visit. */
export type People = { adults: number; children: number; babes: number };

/** What one person of each kind pays for one visit, in minor units, as it was when the places were kept. */
export type UnitPrices = { adultMinor: number; childMinor: number; babeMinor: number };

/** How many people come, babes in arms included. */
export const countPeople = ({ adults, children, babes }: People): number => adults + children + babes;

/** How many places they take: babes in arms only if the club says so. */
export const headsOf = (people: People, babesTakePlace: boolean): number => people.adults + people.children + (babesTakePlace ? people.babes : 0);

/** What these people pay for one visit, in minor units. */
export const costMinor = (people: People, unit: UnitPrices): number =>
  people.adults * unit.adultMinor + people.children * unit.childMinor + people.babes * unit.babeMinor;

/** Why these people cannot come as one party, or null: somebody comes, children and babes with an adult, no more than one party may bring. */
export function partyRefusal(people: People, peopleMax: number): RefusalCode | null {
  if (countPeople(people) === 0) return 'nobody_in_party';
  if (people.adults === 0) return 'child_needs_adult';
  return countPeople(people) > peopleMax ? 'party_too_large' : null;
}

/** Who is left when `back` go, or why they cannot go: nobody named, more than there are, children left without an adult. */
export function peopleLeft(now: People, back: People): { left: People } | { refusal: RefusalCode } {
  if (countPeople(back) === 0) return { refusal: 'nobody_in_party' };
  const left = { adults: now.adults - back.adults, children: now.children - back.children, babes: now.babes - back.babes };
  if (left.adults < 0 || left.children < 0 || left.babes < 0) return { refusal: 'more_than_booked' };
  if (countPeople(left) > 0 && left.adults === 0) return { refusal: 'child_needs_adult' };
  return { left };
}
