import { chosenCells, sittingOf } from '@/lib/opendays/rules/board';
import { clashWith } from '@/lib/opendays/rules/reach';
import type { BoardCell, BoardView } from '@/lib/opendays/views';
import { costMinor, type People, type UnitPrices } from './party';

type Standing = People & UnitPrices & { entryTimeId: string; heads: number };

/**
 * The entry times that one visit could be moved to: with places enough, at the same or a lower price, and reachable
 * beside the party's other visits. The command judges again.
 */
export function otherTimes(board: BoardView, visit: Standing, live: readonly { entryTimeId: string }[]): { entryTimeId: string; label: string }[] {
  const others = live.map((each) => each.entryTimeId).filter((id) => id !== visit.entryTimeId);
  const sittings = chosenCells(board, others).map((cell) => sittingOf(board, cell));
  const now = costMinor(visit, visit);
  const isOpen = (cell: BoardCell) => !cell.isOver && cell.places >= visit.heads && cell.entryTimeId !== visit.entryTimeId && !others.includes(cell.entryTimeId);
  return board.rows.flat().filter((cell) => cell !== null).filter((cell) => {
    const stop = board.stops[cell.row];
    return stop !== undefined && isOpen(cell) && costMinor(visit, stop.prices) <= now && clashWith(sittingOf(board, cell), sittings, board.minutes) === null;
  }).map((cell) => ({ entryTimeId: cell.entryTimeId, label: `${cell.opensText}, ${board.stops[cell.row]?.name ?? ''}` }));
}
