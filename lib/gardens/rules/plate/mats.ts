import { byInk, dot, ff, line, shape, type Cuts, type Dice, type Ink } from './cut';

/** What covers the ground: one small thing strewn many times over. */
export const MAT_NAMES = ['thyme', 'star', 'moss', 'sedum', 'chips'] as const;
export type MatName = (typeof MAT_NAMES)[number];

/** Sizes in steps, so that equal dots share a path element. */
const step = (size: number): number => Math.max(0.2, Math.round(size * 8) / 8);

type Strew = (x: number, y: number, size: number, dice: Dice) => Cuts;
const oneOf = (dice: Dice, paperShare: number): Ink => (dice.next() < paperShare ? 'paper' : 'card');

const strewn: Record<MatName, Strew> = {
  thyme: (x, y, size, dice) => [...dot(x, y, step(size * 0.62), oneOf(dice, 0.62)), ...(size > 1 ? dot(x, y, step(size * 0.2)) : [])],
  star: (x, y, size, dice) => {
    const ink = oneOf(dice, 0.8);
    const petals = [0, 1, 2, 3, 4].map((i) => `M${ff(x + Math.cos(i * 1.257) * size * 0.55, y + Math.sin(i * 1.257) * size * 0.42)}h0`);
    return [...line(petals.join(''), step(size * 0.38) * 2, ink), ...dot(x, y, step(size * 0.2))];
  },
  moss: (x, y, size, dice) => line(`M${ff(x - size * 1.3, y)}q${ff(size * 1.3, -size * 1.8)} ${ff(size * 2.6, 0)}`, 0.4, oneOf(dice, 0.5)),
  sedum: (x, y, size, dice) => {
    const first = oneOf(dice, 0.5);
    const ray = (i: number): string => `M${ff(x, y)}l${ff(Math.cos(i * 1.047) * size * 0.8, Math.sin(i * 1.047) * size * 0.6)}`;
    return [...line(ray(0) + ray(2) + ray(4), 0.36, first), ...line(ray(1) + ray(3) + ray(5), 0.36, first === 'paper' ? 'card' : 'paper')];
  },
  chips: (x, y, size, dice) =>
    shape(`M${ff(x, y)}l${ff(size, -size * 0.5)} ${ff(size * 0.6, size * 0.7)} ${ff(-size * 0.8, size * 0.3)}Z`, oneOf(dice, 0.6)).map((cut) => ({ ...cut, joins: true })),
};

/** A place for one tuft and its size, nearer ones larger. */
export type Tuft = { readonly x: number; readonly y: number; readonly size: number };

/** A mat laid over the given tufts, the far ones first so that near ones lie on top. */
export function layMat(name: MatName, tufts: readonly Tuft[], dice: Dice): Cuts {
  const far = [...tufts].sort((a, b) => a.y - b.y);
  const bands = 5; // within a band order does not show, so its cuts may share elements
  const size = Math.ceil(far.length / bands) || 1;
  return Array.from({ length: bands }, (_, i) =>
    stacked(far.slice(i * size, (i + 1) * size).flatMap((tuft) => strewn[name](tuft.x, tuft.y, tuft.size, dice)))).flat();
}

/** Light cuts first, the ink hearts of flowers over them. */
const stacked = (cuts: Cuts): Cuts => {
  const isHeart = (cut: Cuts[number]): boolean => 'paint' in cut && cut.paint.includes('"ink"');
  return [...byInk(cuts.filter((cut) => !isHeart(cut))), ...byInk(cuts.filter(isHeart))];
};
