import type { FactKind } from '@/lib/core/words';
import { headsFit, headsLeft, type Heads } from './facts';
import { storyOf, type GateFold } from './fold';

/** A ticket as the server reads it under the lock. */
export type CarriedHeads = Heads & { givenBackAt: Date | null };

/** What a phone asks to have written down. */
export type AskedFact = Heads & { id: string; kind: FactKind; undoesId: string | null; visitId: string | null };

/** Why an asked fact does not stand: `undone_before` and `unknown_fact` write nothing, the others become refusals. */
export type TurnedDown = 'not_this_garden' | 'given_back' | 'not_on_ticket' | 'unknown_fact' | 'undone_before';

/**
 * Whether a fact may stand beside those already kept, or why not. Only the ticket decides: who is early, late or one
 * too many for the garden was let in by a person, and that happened. `tickets` holds this stop's tickets by visit.
 */
export function turnedDown(fact: AskedFact, kept: GateFold, tickets: ReadonlyMap<string, CarriedHeads>): TurnedDown | null {
  if (fact.kind === 'undo') return undoTurnedDown(fact, kept);
  if (fact.kind !== 'admit') return null;
  const ticket = fact.visitId === null ? undefined : tickets.get(fact.visitId);
  if (ticket === undefined || fact.visitId === null) return 'not_this_garden';
  if (ticket.givenBackAt !== null) return 'given_back';
  return headsFit(fact, headsLeft(ticket, storyOf(kept, fact.visitId).in)) ? null : 'not_on_ticket';
}

function undoTurnedDown({ undoesId }: AskedFact, kept: GateFold): TurnedDown | null {
  if (undoesId === null || kept.refused.has(undoesId)) return 'unknown_fact';
  if (kept.standing.has(undoesId)) return null;
  return kept.undone.has(undoesId) ? 'undone_before' : 'unknown_fact';
}
