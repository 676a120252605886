import { formatMoney } from '@/lib/core/money';
import { addDays, formatDay, type Day } from '@/lib/core/time';

/** What is known of a household's dues. `termEnd` is the last day paid for, by the latest term that is not in the future alone. */
export type DuesFacts = {
  isForLife: boolean;
  joinedOn: Day;
  leftOn: Day | null;
  termEnd: Day | null;
  owedMinor: number;
};

/** How a household stands: derived from dated facts, never typed over. */
export type Standing =
  | { kind: 'left'; on: Day }
  | { kind: 'life'; since: Day }
  | { kind: 'paid'; to: Day }
  | { kind: 'kept'; owingSince: Day; keptOnTo: Day; owedMinor: number }
  | { kind: 'lapsed'; owingSince: Day; keptOnTo: Day; owedMinor: number }
  | { kind: 'new'; owedMinor: number };

/** How a household stands on `today`, when it is kept on for `keptOnDays` after its term has ended. */
export function standingOf(facts: DuesFacts, today: Day, keptOnDays: number): Standing {
  if (facts.leftOn !== null && facts.leftOn <= today) return { kind: 'left', on: facts.leftOn };
  if (facts.isForLife) return { kind: 'life', since: facts.joinedOn };
  if (facts.termEnd === null) return { kind: 'new', owedMinor: facts.owedMinor };
  if (facts.termEnd >= today) return { kind: 'paid', to: facts.termEnd };
  const owingSince = addDays(facts.termEnd, 1);
  const keptOnTo = addDays(owingSince, keptOnDays);
  return { kind: today <= keptOnTo ? 'kept' : 'lapsed', owingSince, keptOnTo, owedMinor: facts.owedMinor };
}

/** The standing as the dated sentence that the roll prints: "paid to 31 Dec 2027". */
export function standingSentence(standing: Standing, { locale, currency }: { locale: string; currency: string }): string {
  const day = (on: Day) => formatDay(on, { locale }, 'short');
  const owed = (amountMinor: number) => (amountMinor > 0 ? ` ${formatMoney({ amountMinor, currency }, locale)}` : '');
  switch (standing.kind) {
    case 'left': return `left ${day(standing.on)}`;
    case 'life': return `for life, since ${day(standing.since)}`;
    case 'paid': return `paid to ${day(standing.to)}`;
    case 'kept': return `owing${owed(standing.owedMinor)} since ${day(standing.owingSince)}, kept on to ${day(standing.keptOnTo)}`;
    case 'lapsed': return `owing${owed(standing.owedMinor)} since ${day(standing.owingSince)}, lapsed ${day(standing.keptOnTo)}`;
    case 'new': return standing.owedMinor > 0 ? `joining,${owed(standing.owedMinor)} to pay` : 'joining';
  }
}

/** How a standing is signed beside its sentence: nothing, take care, or wrong. */
export const standingTone = ({ kind }: Standing): 'plain' | 'caution' | 'danger' =>
  kind === 'kept' || kind === 'new' ? 'caution' : kind === 'lapsed' ? 'danger' : 'plain';

/** The dues of a class on a day: the latest amount that has begun by then; null when none has. */
export function duesOn(amounts: readonly { fromOn: Day; amountMinor: number }[], on: Day): number | null {
  const begun = amounts.filter((each) => each.fromOn <= on).sort((a, b) => (a.fromOn < b.fromOn ? 1 : -1));
  return begun[0]?.amountMinor ?? null;
}
