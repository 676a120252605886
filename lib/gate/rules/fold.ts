import { addHeads, headCount, NO_HEADS, type BabesRule, type GateFact, type Heads } from './facts';

/** What the facts say about one visit's ticket. */
export type VisitStory = {
  /** Heads let in and not taken back. */
  in: Heads;
  /** The admissions that stand, earliest first. */
  admissions: GateFact[];
  /** Admissions that were taken back, earliest first. */
  takenBack: GateFact[];
  /** Times the gate said no, earliest first. */
  refusals: GateFact[];
};

/** What all the facts of a stop mean together. */
export type GateFold = {
  visits: ReadonlyMap<string, VisitStory>;
  /** Everyone let in, on tickets and as walk-ups. */
  cameIn: Heads;
  /** Heads counted out. */
  wentOut: number;
  /** The facts that stand, by id: not undone, each once. */
  standing: ReadonlyMap<string, GateFact>;
  /** Ids of facts that were taken back. */
  undone: ReadonlySet<string>;
  /** Times a gate said no, and what the server turned down, by id. */
  refused: ReadonlyMap<string, GateFact>;
};

const EMPTY_STORY: VisitStory = { in: NO_HEADS, admissions: [], takenBack: [], refusals: [] };

/**
 * Folds gate facts. The same on a phone and on the server: facts may come in any order and several times; of two
 * copies of one fact a refusal wins, because only the server turns an admission down. An undo cannot be undone.
 */
export function foldFacts(facts: readonly GateFact[]): GateFold {
  const known = eachOnce(facts);
  const undone = new Set(known.flatMap((fact) => (fact.kind === 'undo' && fact.undoesId !== null ? [fact.undoesId] : [])));
  const stands = (fact: GateFact) => fact.kind !== 'undo' && fact.kind !== 'refuse' && !undone.has(fact.id);
  const standing = known.filter(stands);
  return {
    visits: storiesOf(known, undone),
    cameIn: standing.filter(({ kind }) => kind === 'admit' || kind === 'walk-up').reduce(addHeads, NO_HEADS),
    wentOut: standing.filter(({ kind }) => kind === 'count-out').reduce((sum, fact) => sum + headCount(fact, 'counted'), 0),
    standing: byId(standing),
    undone,
    refused: byId(known.filter(({ kind }) => kind === 'refuse')),
  };
}

/** What the gate knows of one visit; an untouched one has an empty story. */
export const storyOf = (fold: GateFold, visitId: string): VisitStory => fold.visits.get(visitId) ?? EMPTY_STORY;

/** Heads in the garden now: let in less counted out, never below nought (people leave uncounted, and come back). */
export const headsInGarden = (fold: GateFold, babes: BabesRule): number => Math.max(0, headCount(fold.cameIn, babes) - fold.wentOut);

const byId = (facts: readonly GateFact[]) => new Map(facts.map((fact) => [fact.id, fact]));

/** Each id once, in one order whatever the order of arrival. */
function eachOnce(facts: readonly GateFact[]): GateFact[] {
  const kept = new Map<string, GateFact>();
  for (const fact of facts) {
    const other = kept.get(fact.id);
    if (other === undefined || (fact.kind === 'refuse' && other.kind !== 'refuse')) kept.set(fact.id, fact);
  }
  return [...kept.values()].sort((a, b) => a.at.getTime() - b.at.getTime() || (a.id < b.id ? -1 : 1));
}

function storiesOf(known: readonly GateFact[], undone: ReadonlySet<string>): Map<string, VisitStory> {
  const stories = new Map<string, VisitStory>();
  for (const fact of known) {
    if (fact.visitId === null || (fact.kind !== 'admit' && fact.kind !== 'refuse')) continue;
    const story = stories.get(fact.visitId) ?? { in: NO_HEADS, admissions: [], takenBack: [], refusals: [] };
    if (fact.kind === 'refuse') story.refusals.push(fact);
    else if (undone.has(fact.id)) story.takenBack.push(fact);
    else {
      story.admissions.push(fact);
      story.in = addHeads(story.in, fact);
    }
    stories.set(fact.visitId, story);
  }
  return stories;
}
