import { minutesBetween, type Day } from '@/lib/core/time';
import { headCount, headsLeft, peopleCount, type BabesRule, type Heads } from './facts';
import { headsInGarden, storyOf, type GateFold } from './fold';

/** A ticket as the gate judges it, from this gate's list or from the code a visitor shows. */
export type GateTicket = Heads & {
  visitId: string;
  stopId: string;
  stopNumber: number;
  /** The club's calendar day of the entry time. */
  heldOn: Day;
  opensAt: Date;
  graceUntil: Date;
  givenBackAt: Date | null;
};

/** What the gate itself is: one stop on one day. */
export type GateHere = {
  stopId: string;
  stopNumber: number;
  heldOn: Day;
  /** Heads the garden carries at once. */
  headsLimit: number;
  /** How long before the entry time people may come in all the same. */
  earlyMinutes: number;
  babes: BabesRule;
  calledOff: boolean;
};

/** The one answer of the gate, with the facts its sentence needs. Heads are those still to come on the ticket. */
export type Verdict =
  | { kind: 'let_in'; heads: Heads; number: number; cameBefore: Heads | null }
  | { kind: 'early'; heads: Heads; number: number; opensAt: Date; minutes: number }
  | { kind: 'late'; heads: Heads; number: number; opensAt: Date; minutes: number }
  | { kind: 'full'; heads: Heads; number: number; room: number }
  | { kind: 'came_in'; at: Date; deviceId: string }
  | { kind: 'another_garden'; stopNumber: number }
  | { kind: 'another_day'; heldOn: Day }
  | { kind: 'given_back'; at: Date }
  | { kind: 'called_off' }
  | { kind: 'not_ours' };

/** How the gate is drawn. */
export type GateDrawing = 'open' | 'ajar' | 'shut' | 'one out';

/** What a helper may press: a verdict offers these and nothing else. */
export type GatePress = 'let in' | 'only some' | 'say why' | 'host says yes' | 'one came out' | 'see story';

/**
 * Judges a ticket at one gate at one moment. Pure, and the same on the phone and the server. `ticket` is null when
 * what was shown is not one of the club's. An entry time is half-open: people come in from its start, `earlyMinutes`
 * before it at the earliest, until its grace ends. What the ticket itself forbids comes first, the crowd last.
 */
export function judge(ticket: GateTicket | null, here: GateHere, fold: GateFold, now: Date): Verdict {
  if (ticket === null) return { kind: 'not_ours' };
  if (ticket.heldOn !== here.heldOn) return { kind: 'another_day', heldOn: ticket.heldOn };
  if (ticket.stopId !== here.stopId) return { kind: 'another_garden', stopNumber: ticket.stopNumber };
  if (ticket.givenBackAt !== null) return { kind: 'given_back', at: ticket.givenBackAt };
  const story = storyOf(fold, ticket.visitId);
  const heads = headsLeft(ticket, story.in);
  const last = story.admissions.at(-1);
  if (peopleCount(heads) === 0) return last ? { kind: 'came_in', at: last.at, deviceId: last.deviceId } : { kind: 'not_ours' };
  if (here.calledOff) return { kind: 'called_off' };
  const counted = headCount(heads, here.babes);
  const number = counted || peopleCount(heads); // a babe left to come in alone is still one to let in
  if (minutesBetween(now, ticket.opensAt) > here.earlyMinutes) {
    return { kind: 'early', heads, number, opensAt: ticket.opensAt, minutes: Math.ceil(minutesBetween(now, ticket.opensAt)) };
  }
  if (now >= ticket.graceUntil) {
    return { kind: 'late', heads, number, opensAt: ticket.opensAt, minutes: Math.floor(minutesBetween(ticket.opensAt, now)) };
  }
  const room = roomLeft(here, fold);
  if (counted > room) return { kind: 'full', heads, number, room };
  return { kind: 'let_in', heads, number, cameBefore: last ? story.in : null };
}

/** Heads for whom the garden still has room. */
export const roomLeft = (here: GateHere, fold: GateFold): number => Math.max(0, here.headsLimit - headsInGarden(fold, here.babes));

/** The drawing that is the answer: open is yes, ajar is wait or ask, shut is no, and full lets one in for one out. */
export function drawingOf(verdict: Verdict): GateDrawing {
  if (verdict.kind === 'let_in') return 'open';
  if (verdict.kind === 'early' || verdict.kind === 'late') return 'ajar';
  return verdict.kind === 'full' ? 'one out' : 'shut';
}

/** What may be pressed under each verdict. A used ticket can only be read; nothing lets it in again. */
export function pressesOf(verdict: Verdict): readonly GatePress[] {
  switch (verdict.kind) {
    case 'let_in':
      return peopleCount(verdict.heads) > 1 ? ['let in', 'only some'] : ['let in'];
    case 'early':
    case 'late':
      return ['say why'];
    case 'full':
      return verdict.room > 0 ? ['one came out', 'host says yes', 'only some'] : ['one came out', 'host says yes'];
    case 'came_in':
      return ['see story'];
    default:
      return [];
  }
}
