import type { RefusalCode } from '@/lib/core/refusal';
import { addMinutes, formatTime, type ClubTime } from '@/lib/core/time';
import type { Id } from '@/lib/core/ids';
import { firstClash, minutesTable, reasonInFull, type MinutesFact } from '@/lib/opendays/rules/reach';
import { costMinor, headsOf, partyRefusal, type People, type UnitPrices } from './party';

/** What must be known of an entry time before a party may have it. */
export type EntryFacts = {
  entryTimeId: Id<'entryTime'>;
  openDayId: Id<'openDay'>;
  gardenId: Id<'garden'>;
  gardenName: string;
  opensAt: Date;
  graceUntil: Date;
  closedAt: Date | null;
  stopClosedAt: Date | null;
  stayMinutes: number;
} & UnitPrices;

/** What must be known of the open day. */
export type DayFacts = { openDayId: Id<'openDay'>; publishedAt: Date | null; calledOffAt: Date | null; partyPeopleMax: number | null };

/** The club's limits on one party. */
export type PartyLimits = { partyPeopleMax: number; partyVisitsMax: number };

/** A wish: an entry time and who comes to it. */
export type WishedVisit = { entryTimeId: Id<'entryTime'> } & People;

/** The shortest payment session the card processor allows, in minutes (its API reference, Checkout Session `expires_at`: 30 minutes to 24 hours). */
export const PAYMENT_MINUTES = 30;

/** Until when new places are kept. */
export const keptUntil = (now: Date, holdMinutes: number): Date => addMinutes(now, holdMinutes);

/**
 * Until when places are kept if the party asks for longer: another full hold after the present one, never past the
 * payment limit counted from the first keeping. Null when that would be no longer than it is.
 */
export function keptLonger(hold: { madeAt: Date; heldUntil: Date }, now: Date, holdMinutes: number): Date | null {
  const last = addMinutes(hold.madeAt, Math.max(PAYMENT_MINUTES, holdMinutes));
  const asked = keptUntil(hold.heldUntil, holdMinutes);
  const until = asked < last ? asked : last;
  return until > hold.heldUntil && until > now ? until : null;
}

/** Whether a party may still ask for an entry time. It is half-open: [opensAt, graceUntil). */
export function entryRefusal(entry: Pick<EntryFacts, 'closedAt' | 'stopClosedAt' | 'graceUntil'>, now: Date): RefusalCode | null {
  if (entry.closedAt !== null || entry.stopClosedAt !== null) return 'entry_time_closed';
  return now >= entry.graceUntil ? 'entry_time_over' : null;
}

/** Whether an open day takes bookings. */
export function dayRefusal(day: Pick<DayFacts, 'publishedAt' | 'calledOffAt'>, now: Date): RefusalCode | null {
  if (day.calledOffAt !== null) return 'called_off';
  return day.publishedAt === null || day.publishedAt > now ? 'open_day_not_open' : null;
}

/** Why a party cannot have what it wants, before anyone counts places; null when it may. `entries` are those found. */
export function holdRefusal(day: DayFacts, entries: readonly EntryFacts[], wanted: readonly WishedVisit[], limits: PartyLimits, now: Date): RefusalCode | null {
  if (entries.length < wanted.length) return 'not_found';
  if (entries.some((entry) => entry.openDayId !== day.openDayId)) return 'wrong_open_day';
  if (wanted.length > limits.partyVisitsMax) return 'too_many_for_day';
  const peopleMax = day.partyPeopleMax ?? limits.partyPeopleMax;
  const refusals = [dayRefusal(day, now), ...wanted.map((wish) => partyRefusal(wish, peopleMax)), ...entries.map((entry) => entryRefusal(entry, now))];
  return refusals.find((refusal) => refusal !== null) ?? null;
}

/** The sentence on the first two of these visits that cannot both be made, or null when all can. Areas only: nothing exact is measured. */
export function clashSentence(entries: readonly EntryFacts[], minutes: readonly MinutesFact[], club: ClubTime): string | null {
  const gardens = [...new Set(entries.map((entry) => entry.gardenId))];
  const names = new Map(entries.map((entry) => [gardens.indexOf(entry.gardenId), entry.gardenName]));
  const sittings = entries.map((entry) => ({ row: gardens.indexOf(entry.gardenId), opens: Math.round(entry.opensAt.getTime() / 60_000), stayMinutes: entry.stayMinutes, entry }));
  const found = firstClash(sittings, minutesTable(gardens, minutes));
  if (!found) return null;
  const { wanted, clash } = found;
  const nameOf = (row: number) => names.get(row) ?? 'the other garden';
  const timeOf = ({ opens }: { opens: number }) => formatTime(new Date(opens * 60_000), club);
  const reason = reasonInFull(clash, wanted.row, { nameOf, timeOf });
  return `${timeOf(wanted)} at ${nameOf(wanted.row)}: ${reason}. Choose another time, or choose it all the same.`;
}

/** One visit as it is kept: heads and prices fixed now. */
export type PricedVisit = WishedVisit & UnitPrices & { heads: number };

/** The wishes with the heads they take and the prices of this moment; what a browser says about prices is never read. */
export function priced(wanted: readonly WishedVisit[], entries: readonly EntryFacts[], babesTakePlace: boolean): { visits: PricedVisit[]; totalMinor: number } {
  const byId = new Map(entries.map((entry) => [entry.entryTimeId, entry]));
  const visits = wanted.flatMap(({ entryTimeId, adults, children, babes }) => {
    const entry = byId.get(entryTimeId);
    if (!entry) return [];
    const { adultMinor, childMinor, babeMinor } = entry;
    return [{ entryTimeId, adults, children, babes, adultMinor, childMinor, babeMinor, heads: headsOf({ adults, children, babes }, babesTakePlace) }];
  });
  return { visits, totalMinor: visits.reduce((sum, visit) => sum + costMinor(visit, visit), 0) };
}
