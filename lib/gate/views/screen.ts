import { dayOf, formatDay, formatTime, type ClubTime } from '@/lib/core/time';
import { counted, inWordsFirst, listed } from '@/lib/opendays/rules/words';
import { headCount, peopleCount, type BabesRule, type Heads } from '../rules/facts';
import { headsInGarden, storyOf, type GateFold } from '../rules/fold';
import type { GateHere, GateTicket, Verdict } from '../rules/verdict';

/** The large short sentence on the gate. */
export function sentenceOf(verdict: Verdict, hereNumber: number, club: ClubTime): string {
  switch (verdict.kind) {
    case 'let_in':
      return `Let in ${verdict.number}`;
    case 'early':
      return `Not yet: ${formatTime(verdict.opensAt, club)}`;
    case 'late':
      return `Late: ${formatTime(verdict.opensAt, club)}`;
    case 'full':
      return 'Full: one out, one in';
    case 'came_in':
      return `Came in at ${formatTime(verdict.at, club)}`;
    case 'another_garden':
      return `Garden ${verdict.stopNumber}, not ${hereNumber}`;
    case 'another_day':
      return `For ${formatDay(verdict.heldOn, club, 'bare')}`;
    case 'given_back':
      return `Given back on ${formatDay(dayOf(verdict.at, club.timeZone), club, 'bare')}`;
    case 'called_off':
      return 'Called off';
    case 'not_ours':
      return 'Not one of ours';
  }
}

/** A party in words: "2 adults and 1 child". */
export function peopleInWords({ adults, children, babes }: Heads): string {
  const parts = [
    adults > 0 && counted(adults, 'adult', 'adults'),
    children > 0 && counted(children, 'child', 'children'),
    babes > 0 && counted(babes, 'babe in arms', 'babes in arms'),
  ].filter((part) => part !== false);
  return listed(parts) || 'nobody';
}

/** What stands on the open gate once they are in: "Three in at 11:34". */
export const letInSentence = (count: number, at: Date, club: ClubTime): string => `${inWordsFirst(count)} in at ${formatTime(at, club)}`;

/** A length of time at the gate: minutes to two hours, then hours. */
const minutesInWords = (minutes: number) => (minutes <= 120 ? counted(minutes, 'minute', 'minutes') : `${Math.floor(minutes / 60)} hours`);

/** The quieter lines under the drawing: who it is, and what to do. `deviceId` is this phone's. */
export function explain(verdict: Verdict, story: { deviceId: string; club: ClubTime }): string {
  switch (verdict.kind) {
    case 'let_in':
      return verdict.cameBefore ? `${inWordsFirst(peopleCount(verdict.cameBefore))} of the party came in before. Press the number.` : 'Press the number.';
    case 'early':
      return `${peopleInWords(verdict.heads)}, ${minutesInWords(verdict.minutes)} early.`;
    case 'late':
      return `${peopleInWords(verdict.heads)}, ${minutesInWords(verdict.minutes)} after the entry time.`;
    case 'full':
      return verdict.room === 0
        ? `${peopleInWords(verdict.heads)}. They wait until ${counted(verdict.number, 'person comes', 'people come')} out.`
        : `${peopleInWords(verdict.heads)}. There is room for ${verdict.room}; the others wait.`;
    case 'came_in':
      return `All on this ticket were let in by ${verdict.deviceId === story.deviceId ? 'this' : 'the other'} phone. None is still to come.`;
    case 'another_garden':
      return 'This ticket is for another garden today. The number on its card says which.';
    case 'another_day':
      return 'This ticket is for another open day.';
    case 'given_back':
      return 'These places were given back, so the ticket no longer lets anyone in.';
    case 'called_off':
      return 'This open day is called off. Nobody is let in.';
    case 'not_ours':
      return 'This is not a ticket of this club. Ask for the code or the name, and find them.';
  }
}

/** The people in the garden now, against its limit, and who is due next: one paragraph of one or two sentences. */
export function crowdSentence(fold: GateFold, here: GateHere, due: { heads: number; by: Date } | null, club: ClubTime): string {
  const now = headsInGarden(fold, here.babes);
  const people = now === 0 ? 'Nobody is in the garden yet' : now === 1 ? '1 person is in the garden' : `${now} people are in the garden`;
  const next = due === null ? '' : ` ${inWordsFirst(due.heads)} more ${due.heads === 1 ? 'is' : 'are'} due by ${formatTime(due.by, club)}.`;
  const room = here.headsLimit - now;
  if (room > 0) return `${people}, so there is room for ${room}.${next}`;
  return room === 0 ? `${now} of ${here.headsLimit} people are in the garden: it is full.${next}` : `${now} people are in the garden, ${-room} over its limit of ${here.headsLimit}.${next}`;
}

/** Heads still to come in on tickets whose entry time has begun, and when the last of their graces ends; null when none. */
export function dueNow(parties: readonly GateTicket[], fold: GateFold, babes: BabesRule, now: Date): { heads: number; by: Date } | null {
  const open = parties.filter((party) => party.givenBackAt === null && party.opensAt <= now && now < party.graceUntil);
  const heads = open.reduce((sum, party) => sum + Math.max(0, headCount(party, babes) - headCount(storyOf(fold, party.visitId).in, babes)), 0);
  const by = open.reduce<Date | null>((last, party) => (last === null || party.graceUntil > last ? party.graceUntil : last), null);
  return heads > 0 && by !== null ? { heads, by } : null;
}

/** The entry time of a ticket, with the end of its grace: "11:30, until 11:50". */
export const whenInWords = (ticket: Pick<GateTicket, 'opensAt' | 'graceUntil'>, club: ClubTime): string =>
  `${formatTime(ticket.opensAt, club)}, until ${formatTime(ticket.graceUntil, club)}`;
