import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { piecesBetween, trackPieces } from '@/lib/opendays/rules/track';

const say = (from: [number, number], to: [number, number], lastRow = 6) =>
  piecesBetween({ row: from[0], column: from[1] }, { row: to[0], column: to[1] }, lastRow)
    .map((piece) => `${piece.part}${piece.isCut ? '-cut' : ''} ${piece.row},${piece.column} ${piece.edge}`);

describe("the party's line", () => {
  test('leaves below a garden, runs in the gutter to the next time, and comes down to the next garden', () => {
    expect(say([0, 0], [2, 2])).toEqual(['start 0,0 lower', 'across-cut 0,1 lower', 'corner 1,2 upper', 'through-cut 1,2 upper', 'end 2,2 upper']);
  });

  test('turns at once when the next time is the next column', () => {
    expect(say([0, 0], [1, 1])).toEqual(['start-cut 0,0 lower', 'corner 1,1 upper', 'end-cut 1,1 upper']);
  });

  test('leaves above when the next garden stands higher up', () => {
    expect(say([4, 1], [1, 3])).toEqual(['start 4,1 upper', 'across-cut 4,2 upper', 'corner 3,3 lower', 'through-cut 3,3 lower', 'through 2,3 lower', 'end 1,3 lower']);
  });

  test('goes under its own row to a later time at the same garden, and over the last row', () => {
    expect(say([2, 0], [2, 2])).toEqual(['start 2,0 lower', 'across-cut 2,1 lower', 'corner 2,2 lower', 'end-cut 2,2 lower']);
    expect(say([6, 0], [6, 1])).toEqual(['start-cut 6,0 upper', 'corner 6,1 upper', 'end-cut 6,1 upper']);
  });

  test('turns back to the left side of a box in the same column', () => {
    expect(piecesBetween({ row: 0, column: 3 }, { row: 1, column: 3 }, 6).map((piece) => piece.isBack)).toEqual([true, true, false]);
  });
});

test('the line of a whole day is kept by the cell it lies in', () => {
  const pieces = trackPieces([{ row: 0, column: 0 }, { row: 2, column: 2 }, { row: 4, column: 5 }], 6);

  expect(pieces.get('0-0')?.map((piece) => piece.part)).toEqual(['start']);
  expect(pieces.get('2-2')?.map((piece) => piece.part)).toEqual(['end', 'start']);
  expect(pieces.get('5-0')).toBeUndefined();
});

const place = fc.record({ row: fc.nat(6), column: fc.nat(8) });

test('every way is one start, one corner and one end, on the board, with no gap between', () => {
  fc.assert(fc.property(place, place, (a, b) => {
    const [from, to] = a.column <= b.column ? [a, b] : [b, a];
    fc.pre(from.row !== to.row || from.column !== to.column);

    const pieces = piecesBetween(from, to, 6);

    expect(pieces.filter((piece) => piece.part === 'start')).toMatchObject([from]);
    expect(pieces.filter((piece) => piece.part === 'end')).toMatchObject([to]);
    expect(pieces.filter((piece) => piece.part === 'across')).toHaveLength(Math.max(0, to.column - from.column - 1));
    expect(pieces.every((piece) => piece.row >= 0 && piece.row <= 6)).toBe(true);
    const upright = pieces.filter((piece) => piece.part !== 'start' && piece.part !== 'across').map((piece) => piece.row);
    expect(upright.slice(1).every((row, index) => Math.abs(row - (upright[index] ?? row)) <= 1)).toBe(true);
  }));
});
