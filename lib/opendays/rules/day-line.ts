import type { BoardCell, BoardView } from '../views';
import { minutesFor } from './reach';
import { inWords, listed } from './words';

/** A stay on the party's line: arr., dep. */
export type LineStay = { row: number; column: number; opens: number; leaves: number; arrivesText: string; leavesText: string; entryTimeId: string };
/** The way between two stays. Short of time, `spareMinutes` is negative: the party chose it all the same. */
export type LineJourney = { fromRow: number; toRow: number; minutes: number; spareMinutes: number };
/** One party's day: stays in order of start, and the journey after each but the last. */
export type DayLine = { stays: LineStay[]; journeys: LineJourney[] };

/** The party's own day from its chosen cells, which are in order of start. */
export function dayLine(board: BoardView, cells: readonly BoardCell[]): DayLine {
  const stays = cells.map((cell) => ({
    row: cell.row, column: cell.column, opens: cell.opens, leaves: cell.opens + (board.stops[cell.row]?.stayMinutes ?? 0),
    arrivesText: cell.opensText, leavesText: cell.leavesText, entryTimeId: cell.entryTimeId,
  }));
  const journeys = stays.slice(1).map((to, index) => {
    const from = stays[index] ?? to;
    const minutes = minutesFor(board.minutes, from.row, to.row);
    return { fromRow: from.row, toRow: to.row, minutes, spareMinutes: to.opens - from.leaves - minutes };
  });
  return { stays, journeys };
}

/** A journey in words: "10 min on the way, 45 to spare". */
export function journeyInWords({ fromRow, toRow, minutes, spareMinutes }: LineJourney): string {
  const way = fromRow === toRow ? 'the same garden' : `${minutes} min on the way`;
  if (spareMinutes < 0) return `${way}, ${-spareMinutes} too late: you chose it all the same`;
  return `${way}, ${spareMinutes === 0 ? 'just on time' : `${spareMinutes} min to spare`}`;
}

/** A journey as a narrow sheet notes it after a visit: "leave by 10:35, 10 min to Pine Barrow, 45 to spare". */
export function journeyNote(board: BoardView, stay: LineStay, journey: LineJourney): string {
  const to = board.stops[journey.toRow]?.shortName ?? '';
  const way = journey.fromRow === journey.toRow ? 'the same garden again' : `${journey.minutes} min to ${to}`;
  if (journey.spareMinutes < 0) return `leave at ${stay.leavesText}, ${way}, ${-journey.spareMinutes} late there`;
  return `leave by ${stay.leavesText}, ${way}, ${journey.spareMinutes === 0 ? 'just on time' : `${journey.spareMinutes} to spare`}`;
}

/** The visits in one line: "10:00 Saltmarsh, 11:30 Pine Barrow and 13:45 Copperkettle". */
export const visitsInLine = (board: BoardView, cells: readonly BoardCell[]): string =>
  listed(cells.map((cell) => `${cell.opensText} ${board.stops[cell.row]?.shortName ?? ''}`));

/** What the main button says it will do: "Keep 3 places at all three". */
export function keepWords(cells: readonly BoardCell[], heads: number): string {
  const places = heads === 1 ? 'Keep 1 place' : `Keep ${heads} places`;
  const first = cells[0];
  if (first === undefined) return 'Keep places at the times you choose';
  if (cells.length === 1) return `${places} at ${first.opensText}`;
  return `${places} at ${cells.length === 2 ? 'both' : `all ${inWords(cells.length)}`}`;
}
