import { REFUSALS } from '@/lib/core/refusal';
import { partyRefusal, type People } from '@/lib/bookings/rules/party';
import { inWordsFirst } from './words';

/** A number of people as typed in the box of a party; an empty box is nought, null is not a whole number from 0 to 99. */
export function headsTyped(text: string): number | null {
  const typed = text.trim();
  if (typed === '') return 0;
  return /^\d{1,2}$/.test(typed) ? Number(typed) : null;
}

/** Why a party cannot come, as a sentence beside its boxes, or null; people that cannot be read as numbers are null. */
export function partyMistake(party: People | null, peopleMax: number): string | null {
  if (party === null) return 'Type whole numbers of people, from 0 to 99.';
  const refusal = partyRefusal(party, peopleMax);
  if (refusal === 'party_too_large') return `${inWordsFirst(peopleMax)} is the most one party can bring. For a school or a club, write to the coordinator.`;
  return refusal === null ? null : REFUSALS[refusal];
}
