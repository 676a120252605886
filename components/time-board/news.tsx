import type { CellState } from '@/lib/opendays/rules/board';
import { counted } from '@/lib/opendays/rules/words';
import type { BoardCell, BoardView } from '@/lib/opendays/views';

/** The chosen times that filled up or closed while the party was choosing, as a sentence; null when all are still there. */
export function goneSentence(board: BoardView, states: CellState[][], chosen: readonly BoardCell[]): string | null {
  const gone = chosen.filter((cell) => { const state = states[cell.row]?.[cell.column]; return state?.kind === 'yours' && state.isGone; });
  if (gone.length === 0) return null;
  const times = gone.map((cell) => `${cell.opensText} at ${board.stops[cell.row]?.shortName ?? ''}`).join(' and ');
  return `${times} ${gone.length === 1 ? 'has' : 'have'} too few places left for you now. Choose another time; the rest of your choice is kept.`;
}

/** What changed on the board, said politely to who cannot see it: times that can no longer be reached, places that moved. */
export function News({ states, changes }: { states: CellState[][]; changes: number }) {
  const barred = states.flat().filter((state) => state.kind === 'barred').length;
  return (
    <p role="status" className="sr-only">
      {barred === 0 ? '' : `${counted(barred, 'time', 'times')} cannot be reached with your choice. `}
      {changes === 0 ? '' : `Places left changed at ${counted(changes, 'time', 'times')}.`}
    </p>
  );
}
