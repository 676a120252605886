/**
 * Which times of an open day one party can make. Reachable means: start + the stop's stay + area minutes ≤ the later
 * start, exactly on time included; grace is the party's own margin and is never planned away.
 */

/** A visit as the arithmetic sees it: the stop's row on the board, the start in whole minutes since the epoch, the usual stay. */
export type Sitting = { row: number; opens: number; stayMinutes: number };

/** Minutes from one stop's area to another's, by board rows; multiples of 5. */
export type MinutesTable = readonly (readonly number[])[];
export type MinutesFact = { fromGardenId: string; toGardenId: string; minutes: number };

/** Why one time cannot be had beside another that the party has chosen. `other` is the chosen one. */
export type Clash =
  | { kind: 'there'; other: Sitting }
  | { kind: 'late'; way: 'from' | 'to'; other: Sitting; minutes: number; lateMinutes: number };

/** The table of minutes between gardens in board order. A pair that nobody has measured counts as far as the farthest known one. */
export function minutesTable(gardenIds: readonly string[], facts: readonly MinutesFact[]): number[][] {
  const known = new Map(facts.map((fact) => [`${fact.fromGardenId} ${fact.toGardenId}`, fact.minutes]));
  const farthest = Math.max(0, ...facts.map((fact) => fact.minutes));
  return gardenIds.map((from) => gardenIds.map((to) => (from === to ? 0 : known.get(`${from} ${to}`) ?? farthest)));
}

/** Minutes between two rows of the board; nought within one garden. */
export const minutesFor = (table: MinutesTable, from: number, to: number): number => (from === to ? 0 : table[from]?.[to] ?? 0);

/** Why `wanted` cannot be had beside `chosen`, or null when both can be made in the order of their starts. */
export function clashBetween(wanted: Sitting, chosen: Sitting, table: MinutesTable): Clash | null {
  if (wanted.opens >= chosen.opens && wanted.opens < chosen.opens + chosen.stayMinutes) return { kind: 'there', other: chosen };
  const isLater = wanted.opens >= chosen.opens; // a stay of no length at the same minute counts as first
  const [first, then] = isLater ? [chosen, wanted] : [wanted, chosen];
  const minutes = minutesFor(table, first.row, then.row);
  const lateMinutes = first.opens + first.stayMinutes + minutes - then.opens;
  return lateMinutes <= 0 ? null : { kind: 'late', way: isLater ? 'from' : 'to', other: chosen, minutes, lateMinutes };
}

const apart = (a: Sitting, b: Sitting) => Math.abs(a.opens - b.opens);

/** Why `wanted` cannot be reached by a party with these visits: the clash nearest in time, being there before being late. */
export function clashWith(wanted: Sitting, chosen: readonly Sitting[], table: MinutesTable): Clash | null {
  const clashes = chosen.map((each) => clashBetween(wanted, each, table)).filter((clash) => clash !== null);
  const rank = (clash: Clash) => (clash.kind === 'there' ? 0 : 1);
  return clashes.sort((a, b) => rank(a) - rank(b) || apart(wanted, a.other) - apart(wanted, b.other))[0] ?? null;
}

/** The first two of a party's visits, by start, that cannot both be made, and why the later cannot; null when all can. */
export function firstClash<S extends Sitting>(visits: readonly S[], table: MinutesTable): { wanted: S; clash: Clash } | null {
  const inOrder = [...visits].sort((a, b) => a.opens - b.opens);
  for (const [index, wanted] of inOrder.entries()) {
    const clash = clashWith(wanted, inOrder.slice(0, index), table);
    if (clash) return { wanted, clash };
  }
  return null;
}

/** What the sentences below call a stop and its time: "Copperkettle", "13:45". */
export type Naming = { nameOf: (row: number) => string; timeOf: (sitting: Sitting) => string };

/** The reason in full, with the garden it is about: "15 min from Copperkettle, you would be 5 late". */
export function reasonInFull(clash: Clash, wantedRow: number, { nameOf, timeOf }: Naming): string {
  const name = nameOf(clash.other.row);
  if (clash.kind === 'there') return `you are at ${name} then`;
  if (clash.other.row === wantedRow) return `too close to your ${timeOf(clash.other)} at the same garden`;
  const there = clash.way === 'to' ? ' there' : '';
  return `${clash.minutes} min ${clash.way} ${name}, you would be ${clash.lateMinutes} late${there}`;
}

/** The reason beside the time itself, short: "15 min away, you would be 5 late". */
export function reasonInShort(clash: Clash, wantedRow: number, naming: Naming): string {
  const isPlain = clash.kind === 'late' && clash.way === 'from' && clash.other.row !== wantedRow;
  return isPlain ? `${clash.minutes} min away, you would be ${clash.lateMinutes} late` : reasonInFull(clash, wantedRow, naming);
}

/** The reason for a run of times at once, where the lateness differs: "15 min from Copperkettle, too close to your 13:45". */
export function reasonForRun(clash: Clash, wantedRow: number, naming: Naming): string {
  if (clash.kind === 'there' || clash.other.row === wantedRow) return reasonInFull(clash, wantedRow, naming);
  return `${clash.minutes} min from ${naming.nameOf(clash.other.row)}, too close to your ${naming.timeOf(clash.other)}`;
}
