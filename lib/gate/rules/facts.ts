import type { FactKind } from '@/lib/core/words';

/** People of each kind. A count out names no kind: whoever came out is counted under adults. */
export type Heads = { adults: number; children: number; babes: number };

export const NO_HEADS: Heads = { adults: 0, children: 0, babes: 0 };

/** One thing that one phone did at one gate. The phone made the id, so a repeat is the same fact. */
export type GateFact = Heads & {
  id: string;
  kind: FactKind;
  undoesId: string | null;
  visitId: string | null;
  /** When it happened, by the phone's clock set right by the server's. */
  at: Date;
  deviceId: string;
  reason: string | null;
};

/** Whether babes in arms take a place, by the club's setting. */
export type BabesRule = 'counted' | 'not counted';

/** How many heads these people are against a limit or a number on the gate. */
export const headCount = ({ adults, children, babes }: Heads, rule: BabesRule): number =>
  adults + children + (rule === 'counted' ? babes : 0);

/** Everyone, babes in arms too, whatever counts as a place. */
export const peopleCount = ({ adults, children, babes }: Heads): number => adults + children + babes;

/** The sum of two groups of people. */
export const addHeads = (a: Heads, b: Heads): Heads => ({
  adults: a.adults + b.adults,
  children: a.children + b.children,
  babes: a.babes + b.babes,
});

/** Who of `a` is left after `b`, never fewer than nobody of a kind. */
export const headsLeft = (a: Heads, b: Heads): Heads => ({
  adults: Math.max(0, a.adults - b.adults),
  children: Math.max(0, a.children - b.children),
  babes: Math.max(0, a.babes - b.babes),
});

/** Whether `part` fits into `whole`, kind by kind: a child's place is never an adult's. */
export const headsFit = (part: Heads, whole: Heads): boolean =>
  part.adults <= whole.adults && part.children <= whole.children && part.babes <= whole.babes;
