import type { BoardCell, BoardStop, BoardView, PlacesLeft } from '../views';
import { clashWith, minutesFor, reasonForRun, reasonInFull, type Clash, type Naming, type Sitting } from './reach';
import { counted } from './words';

/** What one cell of the board is to one party, given what it has chosen. */
export type CellState =
  | { kind: 'none' } // no entry at that time
  | { kind: 'over' }
  | { kind: 'full' }
  | { kind: 'fewer'; places: number } // some, but not enough for the party
  | { kind: 'few'; places: number } // one to five: a peg for each
  | { kind: 'open'; places: number }
  | { kind: 'barred'; clash: Clash; places: number }
  | { kind: 'yours'; isGone: boolean };

/** Up to this many places are drawn as pegs. */
export const PEGS_MAX = 5;

/** The same board with fresher figures; an entry time that the answer does not name keeps its old ones. */
export function withPlaces(board: BoardView, { places }: PlacesLeft): BoardView {
  const refresh = (cell: BoardCell | null): BoardCell | null => {
    const left = cell ? places[cell.entryTimeId] : undefined;
    return cell === null || left === undefined ? cell : { ...cell, places: left ?? cell.places, isOver: left === null };
  };
  return { ...board, rows: board.rows.map((row) => row.map(refresh)) };
}

/** The same board for a party that keeps places already: choosing anew gives those back, so it may choose them again. */
export function withOwn(board: BoardView, own: Readonly<Record<string, number>>): BoardView {
  return { ...board, rows: board.rows.map((row) => row.map((cell) => cell && { ...cell, places: cell.places + (own[cell.entryTimeId] ?? 0) })) };
}

/** What a visitor may ask to see alone. */
export type Only = { stepFree: boolean; steam: boolean };

/** The board with only the gardens that fit, and those where the party has a time already. Rows are numbered anew. */
export function onlyFitting(board: BoardView, only: Only, chosen: readonly string[]): BoardView {
  const wanted = new Set(chosen);
  const fits = ({ notes }: BoardStop) => (!only.stepFree || notes.includes('w')) && (!only.steam || notes.includes('s'));
  const kept = board.stops.flatMap((stop, row) => (fits(stop) || board.rows[row]?.some((cell) => cell && wanted.has(cell.entryTimeId)) ? [row] : []));
  if (kept.length === board.stops.length) return board;
  return {
    ...board,
    stops: kept.flatMap((old, row) => {
      const stop = board.stops[old];
      const above = kept[row - 1];
      return stop ? [{ ...stop, minutesFromAbove: above === undefined ? null : minutesFor(board.minutes, above, old) }] : [];
    }),
    rows: kept.map((old, row) => (board.rows[old] ?? []).map((cell) => (cell ? { ...cell, row } : null))),
    minutes: kept.map((from) => kept.map((to) => minutesFor(board.minutes, from, to))),
  };
}

/** A cell as reachability sees it. */
export const sittingOf = (board: BoardView, cell: BoardCell): Sitting => ({ row: cell.row, opens: cell.opens, stayMinutes: board.stops[cell.row]?.stayMinutes ?? 0 });

/** The party's chosen cells, by start. Ids that are not on this board are left out. */
export function chosenCells(board: BoardView, chosen: readonly string[]): BoardCell[] {
  const wanted = new Set(chosen);
  return board.rows.flat().filter((cell) => cell !== null && wanted.has(cell.entryTimeId)).filter((cell) => cell !== null)
    .sort((a, b) => a.opens - b.opens || a.row - b.row);
}

/** What one cell is to a party of `heads` with these visits. What is full stays a dash whether or not it could be reached. */
export function cellState(board: BoardView, cell: BoardCell | null, heads: number, chosen: readonly BoardCell[]): CellState {
  if (cell === null) return { kind: 'none' };
  if (chosen.some((each) => each.entryTimeId === cell.entryTimeId)) return { kind: 'yours', isGone: cell.isOver || cell.places < heads };
  if (cell.isOver) return { kind: 'over' };
  if (cell.places === 0) return { kind: 'full' };
  if (cell.places < heads) return { kind: 'fewer', places: cell.places };
  const clash = clashWith(sittingOf(board, cell), chosen.map((each) => sittingOf(board, each)), board.minutes);
  if (clash) return { kind: 'barred', clash, places: cell.places };
  return { kind: cell.places <= PEGS_MAX ? 'few' : 'open', places: cell.places };
}

/** The state of every cell of the board, by row and column. */
export function boardStates(board: BoardView, heads: number, chosen: readonly BoardCell[]): CellState[][] {
  return board.rows.map((row) => row.map((cell) => cellState(board, cell, heads, chosen)));
}

/** Whether anything can be had at all. */
export const hasPlaces = (board: BoardView): boolean => board.rows.flat().some((cell) => cell !== null && !cell.isOver && cell.places > 0);

/** How the reasons name gardens and times on this board. */
export function namingOf(board: BoardView): Naming {
  const texts = new Map(board.columns.map((column) => [column.opens, column.text]));
  return { nameOf: (row) => board.stops[row]?.shortName ?? '', timeOf: (sitting) => texts.get(sitting.opens) ?? '' };
}

/** Neighbouring cells of one row that a narrow sheet sets as one line: barred by one visit, not open, over. */
export type Run = { from: number; to: number; reason: string | null };

function runKey(state: CellState): string | null {
  if (state.kind === 'barred') return `barred ${state.clash.other.row} ${state.clash.other.opens}`;
  return state.kind === 'none' || state.kind === 'over' ? state.kind : null;
}

function reasonOf(board: BoardView, states: readonly CellState[], row: number): string | null {
  const clashes = states.flatMap((state) => (state.kind === 'barred' ? [state.clash] : []));
  const [first] = clashes;
  if (first === undefined) return null;
  const late = clashes.find((clash) => clash.kind === 'late');
  return clashes.length === 1 || late === undefined ? reasonInFull(first, row, namingOf(board)) : reasonForRun(late, row, namingOf(board));
}

/** A row as a narrow sheet sets it: runs of one or more columns, in order, each with its one reason. */
export function runsOf(board: BoardView, states: readonly CellState[], row: number): Run[] {
  const runs: { from: number; to: number; key: string | null }[] = [];
  states.forEach((state, column) => {
    const key = runKey(state);
    const last = runs.at(-1);
    if (last && key !== null && last.key === key) last.to = column;
    else runs.push({ from: column, to: column, key });
  });
  return runs.map(({ from, to }) => ({ from, to, reason: reasonOf(board, states.slice(from, to + 1), row) }));
}

/** What a cell is called by a screen reader: garden, time, then places or the reason. */
export function spokenName(board: BoardView, stop: BoardStop, cell: BoardCell, state: CellState, people: number): string {
  const name = `${stop.name}, ${cell.opensText}`;
  switch (state.kind) {
    case 'yours': return state.isGone ? `${name}, yours, but these places have gone` : `${name}, yours, ${counted(people, 'person', 'people')}`;
    case 'barred': return `${name}, cannot be reached: ${reasonInFull(state.clash, cell.row, namingOf(board))}`;
    case 'full': return `${name}, full`;
    case 'fewer': return `${name}, ${counted(state.places, 'place', 'places')} left, fewer than your party`;
    case 'few': case 'open': return `${name}, ${counted(state.places, 'place', 'places')} left`;
    case 'over': return `${name}, over`;
    case 'none': return `${name}, not open`;
  }
}

/** The most times that stand across a sheet; with more, the board is set in strips at every width. */
const COLUMNS_MOST = 14;
const COLUMNS_FEW = 8;

/** How a board is set: with few columns beside the plants, with many on the full measure, with too many always in strips. */
export function settingOf({ columns }: BoardView): 'few' | 'many' | 'strips' {
  if (columns.length > COLUMNS_MOST) return 'strips';
  return columns.length > COLUMNS_FEW ? 'many' : 'few';
}

/** A state as a browser without JavaScript shows it: times that clash can be ticked, and the server says why not. */
export const unbarred = (state: CellState): CellState =>
  state.kind === 'barred' ? { kind: state.places <= PEGS_MAX ? 'few' : 'open', places: state.places } : state;
