import { addMinutes, formatDay, formatTime, type ClubTime, type Day } from '@/lib/core/time';
import type { Id } from '@/lib/core/ids';
import { listed } from '@/lib/opendays/rules/words';
import { partyInWords } from '@/lib/opendays/rules/prices';
import { keptLonger } from './rules/hold';
import { costMinor, type People, type UnitPrices } from './rules/party';

/** One visit as a hold lists it. */
export type HeldVisit = { visitId: Id<'visit'>; stopNumber: number; garden: string; at: string; people: string; costMinor: number };

/**
 * How kept places stand. `kept`: the party may pay or confirm. `paying`: a payment is open. `over`: given back or run out.
 * `confirmed`: they are the party's. `too-late`: money came when the places were gone and goes back in full.
 */
export type HoldState = 'kept' | 'paying' | 'over' | 'confirmed' | 'too-late';

/** What the hold page shows: plain JSON, times as text. */
export type HoldView = {
  bookingId: Id<'booking'>;
  state: HoldState;
  code: string;
  day: { title: string; slug: string; line: string };
  visits: HeldVisit[];
  totalMinor: number;
  currency: string;
  keptUntil: string;
  keptUntilAt: string; // ISO 8601, for the one quiet reminder
  /** Until when the places could be kept if asked now; null when no longer. */
  longerUntil: string | null;
  typed: { name: string; email: string; phone: string; wantsInvitations: boolean };
  where: string; // "garden 1 at 10:00 and garden 3 at 11:30"
};

/** A hold as the database gives it. */
export type HoldFacts = {
  bookingId: Id<'booking'>; code: string; madeAt: Date; heldUntil: Date; confirmedAt: Date | null; releasedAt: Date | null; totalMinor: number; currency: string; wantsInvitations: boolean;
  title: string; slug: string; heldOn: Day; placeLine: string; name: string | null; email: string | null; phone: string | null; hasOpenAttempt: boolean; wasPaid: boolean;
};
export type HeldVisitFacts = { visitId: Id<'visit'>; stopNumber: number; garden: string; opensAt: Date } & People & UnitPrices;

type HoldClub = ClubTime & { holdMinutes: number; holdsMayBeExtended: boolean };

/** How kept places stand at a moment. */
export function holdStateOf(facts: Pick<HoldFacts, 'confirmedAt' | 'releasedAt' | 'heldUntil' | 'hasOpenAttempt' | 'wasPaid'>, now: Date): HoldState {
  if (facts.confirmedAt !== null) return 'confirmed';
  if (facts.wasPaid) return 'too-late';
  if (facts.releasedAt !== null) return 'over';
  if (facts.hasOpenAttempt) return facts.heldUntil <= now ? 'over' : 'paying';
  return facts.heldUntil <= now ? 'over' : 'kept';
}

/** Sets the hold page. */
export function toHoldView(facts: HoldFacts, visits: readonly HeldVisitFacts[], club: HoldClub, now: Date): HoldView {
  const longer = club.holdsMayBeExtended && !facts.hasOpenAttempt ? keptLonger(facts, now, club.holdMinutes) : null;
  return {
    bookingId: facts.bookingId, state: holdStateOf(facts, now), code: facts.code, totalMinor: facts.totalMinor, currency: facts.currency,
    day: { title: facts.title, slug: facts.slug, line: `${formatDay(facts.heldOn, club)}, ${facts.placeLine}` },
    visits: visits.map((visit) => ({ visitId: visit.visitId, stopNumber: visit.stopNumber, garden: visit.garden, at: formatTime(visit.opensAt, club), people: partyInWords(visit), costMinor: costMinor(visit, visit) })),
    keptUntil: formatTime(facts.heldUntil, club), keptUntilAt: facts.heldUntil.toISOString(),
    longerUntil: longer === null ? null : formatTime(longer, club),
    typed: { name: facts.name ?? '', email: facts.email ?? '', phone: facts.phone ?? '', wantsInvitations: facts.wantsInvitations },
    where: listed(visits.map((visit) => `${visit.garden} at ${formatTime(visit.opensAt, club)}`)),
  };
}

/** Minutes before the end at which the one quiet reminder is said. */
export const REMIND_MINUTES = 2;

/** When the quiet reminder is due. */
export const remindAt = (keptUntilAt: string): Date => addMinutes(new Date(keptUntilAt), -REMIND_MINUTES);
