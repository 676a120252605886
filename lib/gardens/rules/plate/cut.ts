/** The three colours a block is printed in: ink, bare paper, and the stop's card. */
export type Ink = 'ink' | 'paper' | 'card';

/** One cut: an outline in one ink. `joins` says that its neighbours in the same ink may share its path element. */
export type Mark = { readonly paint: string; readonly d: string; readonly joins: boolean };
/** Cuts that share an attribute: a place, a scale, a halo. */
export type Group = { readonly wrap: string; readonly pieces: readonly Piece[] };
export type Piece = Mark | Group;
/** What a drawing function gives back: cuts in painting order. */
export type Cuts = readonly Piece[];

/** Numbers from 0 to 1 that are always the same for the same seed (mulberry32, public domain). */
export type Dice = { readonly next: () => number; readonly between: (from: number, to: number) => number };

/** Dice for one garden: the same seed always throws the same numbers. */
export function diceFrom(seed: number): Dice {
  let state = Math.imul(seed, 2654435761) >>> 0;
  const next = (): number => {
    state = (state + 0x6d2b79f5) | 0;
    let t = Math.imul(state ^ (state >>> 15), 1 | state);
    t = (t + Math.imul(t ^ (t >>> 7), 61 | t)) ^ t;
    return ((t ^ (t >>> 14)) >>> 0) / 4294967296;
  };
  return { next, between: (from, to) => from + next() * (to - from) };
}

/** A whole number for a name (FNV-1a, 32 bits), so that a garden keeps its plate for as long as it keeps its address. */
export function seedOf(name: string): number {
  let hash = 0x811c9dc5;
  for (const character of name) hash = Math.imul(hash ^ (character.codePointAt(0) ?? 0), 0x01000193);
  return hash >>> 0;
}

/** A number as short as a path needs it. */
export const f = (value: number): string => String(Math.round(value * 100) / 100 + 0).replace(/^(-?)0\./, '$1.');
/** Several numbers in a row, parted by spaces. */
export const ff = (...values: readonly number[]): string => values.map(f).join(' ');

/** A filled outline of any form; it keeps a path element of its own, because overlapping turns would cancel out. */
export const shape = (d: string, ink: Ink = 'ink', more = ''): Cuts => [{ paint: `fill="${ink}"${more}`, d, joins: false }];

/** A stroke with round ends, `width` in the units of its group. */
export const line = (d: string, width = 0.4, ink: Ink = 'ink'): Cuts => [
  { paint: `fill="none" stroke="${ink}" stroke-width="${f(width)}"`, d, joins: true },
];

/** An ellipse, always drawn clockwise, so that many can share one path. */
export const disc = (x: number, y: number, rx: number, ink: Ink = 'ink', ry = rx): Cuts => [
  { paint: `fill="${ink}"`, d: `M${ff(x - rx, y)}a${ff(rx, ry)} 0 1 1 ${ff(2 * rx, 0)}a${ff(rx, ry)} 0 1 1 ${ff(-2 * rx, 0)}`, joins: true },
];

/** A round dot as a stroke of no length: the shortest way to write hundreds of them. */
export const dot = (x: number, y: number, radius: number, ink: Ink = 'ink'): Cuts => line(`M${ff(x, y)}h0`, radius * 2, ink);

/** An upright rectangle, clockwise like the discs. */
export const box = (x: number, y: number, width: number, height: number, ink: Ink = 'ink'): Cuts => [
  { paint: `fill="${ink}"`, d: `M${ff(x, y)}h${f(width)}v${f(height)}h${f(-width)}z`, joins: true },
];

/** Cuts moved to a place and scaled about it. */
export const at = (x: number, y: number, pieces: Cuts, scaleX = 1, scaleY = Math.abs(scaleX)): Cuts => [
  { wrap: `transform="translate(${ff(x, y)})${scaleX === 1 && scaleY === 1 ? '' : ` scale(${ff(scaleX, scaleY)})`}"`, pieces },
];

/** The cuts of `make(0)` to `make(count − 1)`, in order. */
export function times(count: number, make: (index: number) => Cuts): Cuts {
  return Array.from({ length: count }, (_, index) => make(index)).flat();
}

/** Cuts whose order does not matter, put in the order that needs the fewest path elements. */
export const byInk = (pieces: Cuts): Cuts => [...pieces].sort((a, b) => ('paint' in a && 'paint' in b ? a.paint.localeCompare(b.paint) : 0));

/** The colours to print with. */
export type Inks = Readonly<Record<Ink, string>>;

/** The cuts as SVG elements, neighbours in the same ink run together. */
export function print(pieces: Cuts, inks: Inks): string {
  let out = '';
  let open: { paint: string; d: string } | null = null;
  const close = (): void => {
    if (open) out += `<path ${inked(open.paint, inks)} d="${open.d}"/>`;
    open = null;
  };
  for (const piece of pieces) {
    if ('wrap' in piece) {
      close();
      out += `<g ${piece.wrap}>${print(piece.pieces, inks)}</g>`;
    } else if (open && piece.joins && open.paint === piece.paint) open.d += piece.d;
    else {
      close();
      open = { paint: piece.paint, d: piece.d };
      if (!piece.joins) close();
    }
  }
  close();
  return out;
}

const inked = (paint: string, inks: Inks): string => paint.replace(/"(ink|paper|card)"/g, (_, ink: Ink) => `"${inks[ink]}"`);
