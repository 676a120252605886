import type { BoardCell } from '@/lib/opendays/views';

/** The party's line along the left edge of the strips, for one garden: beside its name, and beside each of its times. */
export type Edge = { head: boolean; cell: (column: number) => 'full' | 'from' | 'to' | null };

const order = (cell: { row: number; column: number }) => cell.row * 1000 + cell.column;

/** The line runs down the page from the first of the chosen times to the last, whatever their hours. */
export function edgeLine(chosen: readonly BoardCell[], row: number): Edge {
  const places = chosen.map(order).sort((a, b) => a - b);
  const [first, last] = [places[0], places.at(-1)];
  if (first === undefined || last === undefined || first === last) return { head: false, cell: () => null };
  const head = order({ row, column: -1 });
  return {
    head: first < head && head < last,
    cell: (column) => {
      const here = order({ row, column });
      if (here === first) return 'from';
      if (here === last) return 'to';
      return first < here && here < last ? 'full' : null;
    },
  };
}
