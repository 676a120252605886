import type { RefusalCode } from '@/lib/core/refusal';
import { costMinor, type People, type UnitPrices } from './party';

/** How a visit stands, for those who would change it. */
export type StandingVisit = People & UnitPrices & { version: number; givenBackAt: Date | null; cameIn: boolean };

/** Why a visit cannot be changed as it stands: given back, used at the gate, or changed since the party looked. */
export function standingRefusal(visit: StandingVisit, seenVersion: number): RefusalCode | null {
  if (visit.givenBackAt !== null) return 'already_given_back';
  if (visit.cameIn) return 'already_came_in';
  return visit.version !== seenVersion ? 'changed_meanwhile' : null;
}

/** What a visit costs at another entry time's prices beside what it cost. A party moves itself only to the same or a lower price. */
export function priceChange(people: People, was: UnitPrices, becomes: UnitPrices): { refusal: RefusalCode } | { lessMinor: number } {
  const lessMinor = costMinor(people, was) - costMinor(people, becomes);
  return lessMinor < 0 ? { refusal: 'dearer' } : { lessMinor };
}
