import { formatTime, type ClubTime } from '@/lib/core/time';
import type { GateFact } from '../rules/facts';
import type { VisitStory } from '../rules/fold';
import { peopleInWords } from './screen';

/** One dated line of what a ticket did at the gate. */
export type StoryLine = { id: string; time: string; words: string };

/** What a ticket did, earliest first: let in, taken back, turned away, and by which phone. */
export function storyLines(story: VisitStory, deviceId: string, club: ClubTime): StoryLine[] {
  const by = (fact: GateFact) => (fact.deviceId === deviceId ? 'this phone' : 'the other phone');
  const because = (fact: GateFact) => (fact.reason === null ? '' : `: ${fact.reason}`);
  const lines = [
    ...story.admissions.map((fact) => ({ fact, words: `Let in ${peopleInWords(fact)} by ${by(fact)}${because(fact)}.` })),
    ...story.takenBack.map((fact) => ({ fact, words: `Let in ${peopleInWords(fact)} by ${by(fact)}, then taken back.` })),
    ...story.refusals.map((fact) => ({ fact, words: `Shown to ${by(fact)} and not let in.` })),
  ];
  return lines.sort((a, b) => a.fact.at.getTime() - b.fact.at.getTime()).map(({ fact, words }) => ({ id: fact.id, time: formatTime(fact.at, club), words }));
}
