/**
 * The party's line across the board, as pieces of track that each lie in one cell: it leaves a box by its lower or upper
 * edge, runs along the gutter between two rows to the left side of the next time, along the gutter between two columns to
 * the next garden, and bends into that box. Pieces need no measuring, so rows may be of any height.
 */
export type Piece = {
  row: number;
  column: number;
  part: 'start' | 'across' | 'corner' | 'through' | 'end';
  /** Which edge of the row a start, across or corner lies on; for through and end the side that the line comes from. */
  edge: 'lower' | 'upper';
  /** The next or previous piece is a corner: this one stops short of it. */
  isCut: boolean;
  /** Two boxes under one another: the start turns back to the left, the corner opens to the right. */
  isBack: boolean;
};

type Place = { row: number; column: number };

/** The pieces of one way between two chosen times, the second no earlier than the first. */
export function piecesBetween(from: Place, to: Place, lastRow: number): Piece[] {
  const isLevel = from.row === to.row;
  const leavesBelow = isLevel ? from.row < lastRow || from.row === 0 : to.row > from.row;
  const goesDown = isLevel ? !leavesBelow : leavesBelow;
  const gutter = leavesBelow ? from.row : from.row - 1; // the gutter below that row
  const cornerRow = goesDown ? gutter + 1 : gutter;
  const isBack = to.column <= from.column;
  const edge = leavesBelow ? 'lower' : 'upper';
  const entered = goesDown ? 'upper' : 'lower';
  const pieces: Piece[] = [{ ...from, part: 'start', edge, isCut: isBack || to.column === from.column + 1, isBack }];
  for (let column = from.column + 1; column < to.column; column += 1) {
    pieces.push({ row: from.row, column, part: 'across', edge, isCut: column === to.column - 1, isBack: false });
  }
  pieces.push({ row: cornerRow, column: to.column, part: 'corner', edge: entered, isCut: false, isBack });
  for (let row = cornerRow; row !== to.row; row += goesDown ? 1 : -1) {
    pieces.push({ row, column: to.column, part: 'through', edge: entered, isCut: row === cornerRow, isBack: false });
  }
  pieces.push({ row: to.row, column: to.column, part: 'end', edge: entered, isCut: to.row === cornerRow, isBack: false });
  return pieces;
}

/** All pieces of a party's line, by the key `row-column` of the cell they lie in. */
export function trackPieces(visits: readonly Place[], lastRow: number): Map<string, Piece[]> {
  const byCell = new Map<string, Piece[]>();
  for (const [index, to] of visits.slice(1).entries()) {
    for (const piece of piecesBetween(visits[index] ?? to, to, lastRow)) {
      const key = `${piece.row}-${piece.column}`;
      byCell.set(key, [...(byCell.get(key) ?? []), piece]);
    }
  }
  return byCell;
}

/** Where the line runs along the foot or the head of a cell, by its key: a bar that stands there is cut to let it pass. */
export function cutsOf(pieces: ReadonlyMap<string, readonly Piece[]>): Map<string, 'foot' | 'head' | 'both'> {
  const cuts = new Map<string, 'foot' | 'head' | 'both'>();
  const cut = (row: number, column: number, where: 'foot' | 'head') => {
    const key = `${row}-${column}`;
    const before = cuts.get(key);
    cuts.set(key, before === undefined || before === where ? where : 'both');
  };
  for (const { row, column, part, edge } of [...pieces.values()].flat()) {
    if (part !== 'start' && part !== 'across') continue;
    cut(row, column, edge === 'lower' ? 'foot' : 'head');
    cut(edge === 'lower' ? row + 1 : row - 1, column, edge === 'lower' ? 'head' : 'foot');
  }
  return cuts;
}
