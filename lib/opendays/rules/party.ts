import { REFUSALS, type RefusalCode } from '@/lib/core/refusal';
import type { Party } from './prices';
import { inWordsFirst } from './words';

/** A number of people as typed in the box of a party; an empty box is nought, null is not a whole number from 0 to 99. */
export function headsTyped(text: string): number | null {
  const typed = text.trim();
  if (typed === '') return 0;
  return /^\d{1,2}$/.test(typed) ? Number(typed) : null;
}

/** Why these people cannot come as one party, or null. Babes are people too, whether or not they take a place. */
export function partyRefusal({ adults, children, babes }: Party, peopleMax: number): RefusalCode | null {
  if (adults + children + babes === 0) return 'nobody_in_party';
  if (adults === 0) return 'child_needs_adult';
  return adults + children + babes > peopleMax ? 'party_too_large' : null;
}

/** The same as a sentence beside the boxes of the party; people that cannot be read as numbers are null. */
export function partyMistake(party: Party | null, peopleMax: number): string | null {
  if (party === null) return 'Type whole numbers of people, from 0 to 99.';
  const refusal = partyRefusal(party, peopleMax);
  if (refusal === 'party_too_large') return `${inWordsFirst(peopleMax)} is the most one party can bring. For a school or a club, write to the coordinator.`;
  return refusal === null ? null : REFUSALS[refusal];
}
