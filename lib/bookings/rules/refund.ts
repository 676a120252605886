import { formatMoney, percentOfMinor, type Money } from '@/lib/core/money';
import type { RefusalCode } from '@/lib/core/refusal';
import { addMinutes, dayOf, formatDay, formatTime, type ClubTime } from '@/lib/core/time';

/** One step of the club's refund rule: given back at least this many hours before the entry time, this percent is returned. */
export type RefundStep = { hoursBefore: number; percent: number };

/** The club's rule as given-back places need it: the steps, and how long before the entry time changes end. */
export type RefundRule = { refundRules: readonly RefundStep[]; changesEndMinutes: number };

/** The last instant at which places of an entry time may be given back or changed; that instant itself still counts. */
export const changesEndAt = (entryAt: Date, { changesEndMinutes }: Pick<RefundRule, 'changesEndMinutes'>): Date => addMinutes(entryAt, -changesEndMinutes);

/** Whether places of an entry time may still be given back or changed. */
export function changeRefusal(entryAt: Date, rule: Pick<RefundRule, 'changesEndMinutes'>, now: Date): RefusalCode | null {
  return now > changesEndAt(entryAt, rule) ? 'changes_over' : null;
}

/** The percent that comes back now: the best step whose hours are still met, its own instant included; none met is nothing. */
export function refundPercent(entryAt: Date, { refundRules }: Pick<RefundRule, 'refundRules'>, now: Date): number {
  const met = refundRules.filter((step) => now <= stepEnds(entryAt, step));
  return Math.max(0, ...met.map((step) => step.percent));
}

/** What comes back of `paidMinor` now, rounded half up to the minor unit, so in the payer's favour. */
export function refundMinor(paidMinor: number, entryAt: Date, rule: Pick<RefundRule, 'refundRules'>, now: Date): number {
  return percentOfMinor(paidMinor, refundPercent(entryAt, rule, now));
}

const stepEnds = (entryAt: Date, step: RefundStep): Date => addMinutes(entryAt, -step.hoursBefore * 60);

/** The whole rule for one entry time, in dated sentences; what stands in a letter and above the places. */
export function refundRuleWords(entryAt: Date, rule: RefundRule, club: ClubTime): string {
  const end = changesEndAt(entryAt, rule);
  const steps = [...rule.refundRules].filter((step) => step.percent > 0).sort((a, b) => b.hoursBefore - a.hoursBefore);
  const useful = steps.filter((step, at) => steps.slice(at + 1).every((later) => later.percent < step.percent));
  const dated = useful.map((step) => ({ until: earlier(stepEnds(entryAt, step), end), share: shareWords(step.percent) }));
  const sentences = dated.map(({ until, share }, at) => `${at === 0 ? 'Given back' : 'After that,'} by ${whenWords(until, club)}: ${share}.`);
  const last = dated.at(-1)?.until;
  if (!last) return `Places may be given back until ${whenWords(end, club)}. Nothing is returned, and someone else can come.`;
  if (last < end) sentences.push(`After that, and until ${whenWords(end, club)}: none of it, but someone else can come.`);
  return sentences.join(' ');
}

/** The same rule for all of a party's visits at once, counted from each one's own time; what a letter says. */
export function refundRuleForAll({ refundRules, changesEndMinutes }: RefundRule): string {
  const end = lengthWords(changesEndMinutes);
  const steps = [...refundRules].filter((step) => step.percent > 0).sort((a, b) => b.hoursBefore - a.hoursBefore);
  const useful = steps.filter((step, at) => steps.slice(at + 1).every((later) => later.percent < step.percent));
  if (useful.length === 0) return `Places may be given back until ${end} before each time; nothing is returned, and someone else can come.`;
  const minutes = useful.map((step) => Math.max(step.hoursBefore * 60, changesEndMinutes));
  const sentences = useful.map((step, at) => `${at === 0 ? 'Given back' : 'After that,'} until ${lengthWords(minutes[at] ?? 0)} before a time: ${shareWords(step.percent)} is returned.`);
  if ((minutes.at(-1) ?? 0) > changesEndMinutes) sentences.push(`After that, until ${end} before: none of it.`);
  return sentences.join(' ');
}

function lengthWords(minutes: number): string {
  if (minutes % (7 * 1440) === 0 && minutes > 0) return minutes === 7 * 1440 ? 'a week' : `${minutes / (7 * 1440)} weeks`;
  if (minutes % 1440 === 0 && minutes > 0) return minutes === 1440 ? 'a day' : `${minutes / 1440} days`;
  return minutes % 60 === 0 && minutes > 60 ? `${minutes / 60} hours` : `${minutes} minutes`;
}

/** What pressing the button returns, said before it is pressed: "$30.00 of $60.00 comes back to your card: half of it." */
export function refundWords({ amountMinor: paidMinor, currency }: Money, entryAt: Date, rule: RefundRule, club: ClubTime, now: Date): string {
  if (paidMinor === 0) return 'These places cost nothing, so nothing comes back. Someone else can come.';
  const percent = refundPercent(entryAt, rule, now);
  const paid = formatMoney({ amountMinor: paidMinor, currency }, club.locale);
  if (percent === 0) return `Nothing of the ${paid} comes back so near the day. Someone else can come.`;
  const back = formatMoney({ amountMinor: percentOfMinor(paidMinor, percent), currency }, club.locale);
  return percent === 100 ? `All ${paid} comes back the way you paid.` : `${back} of ${paid} comes back the way you paid: ${shareWords(percent)}.`;
}

const earlier = (a: Date, b: Date): Date => (a < b ? a : b);

const whenWords = (at: Date, club: ClubTime): string => `${formatTime(at, club)} on ${formatDay(dayOf(at, club.timeZone), club, 'weekday')} ${formatDay(dayOf(at, club.timeZone), club, 'bare')}`;

function shareWords(percent: number): string {
  if (percent >= 100) return 'all of it';
  return percent === 50 ? 'half of it' : `${percent} % of it`;
}
