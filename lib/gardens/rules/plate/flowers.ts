import { disc, dot, ff, line, shape, times, type Cuts } from './cut';
import type { Grow } from './trees';

const spread = (count: number): number[] => Array.from({ length: count }, (_, i) => i - (count - 1) / 2);
const strokes = (count: number, make: (offset: number, index: number) => string): string => spread(count).map(make).join('');

const fern: Grow = (x, y, h) => times(7, (i) => {
  const turn = (i - 3) * 0.36;
  const [ex, ey] = [x + Math.sin(turn) * h * 0.9, y - Math.cos(turn) * h * (1 - Math.abs(i - 3) * 0.06)];
  const mid = x + (ex - x) * 0.25;
  let leaves = '';
  for (let t = 0.22; t < 1; t += 0.085) {
    const u = 1 - t;
    const bx = u * u * x + 2 * u * t * mid + t * t * ex;
    const by = u * u * y + 2 * u * t * (y - (y - ey) * 0.8) + t * t * ey;
    const l = (1.05 - t) * h * 0.2;
    leaves += `M${ff(bx - l, by - l * 0.25)}L${ff(bx, by)}l${ff(l, -l * 0.25)}`;
  }
  return [...line(`M${ff(x, y)}Q${ff(mid, y - (y - ey) * 0.8)} ${ff(ex, ey)}`, 0.45), ...line(leaves, 0.42)];
});

const thrift: Grow = (x, y, h, dice) => [
  ...line(strokes(16, (o) => `M${ff(x, y)}q${ff(o * 0.3, -h * 0.3)} ${ff(o * 0.75, -h * 0.34 + Math.abs(o) * 0.2)}`), 0.35),
  ...spread(6).flatMap((o) => {
    const [ex, ey] = [x + o * 2.5 + dice.between(-0.6, 0.6), y - h + Math.abs(o) * 1.3];
    return [
      ...line(`M${ff(x, y)}Q${ff(x + (ex - x) * 0.2, y - h * 0.6)} ${ff(ex, ey)}`, 0.32), ...disc(ex, ey, 1.55),
      ...times(7, (j) => dot(ex + Math.cos(j * 0.9) * 0.85, ey + Math.sin(j * 0.9) * 0.85, 0.4, j % 2 ? 'card' : 'paper')),
    ];
  }),
];

/** Upright spikes of small bells: heather, lavender and their like. */
const spikes = (count: number, step: number, bell: number): Grow => (x, y, h, dice) => spread(count).flatMap((o) => {
  const a = o * step;
  const tall = h * dice.between(0.7, 1);
  return [
    ...line(`M${ff(x + a * 0.6, y)}q${ff(0, -tall * 0.5)} ${ff(a * 0.5, -tall)}`, 0.5),
    ...times(7, (j) => dot(x + a * 0.6 + a * 0.5 * (0.4 + j * 0.09) + (j % 2 ? 0.5 : -0.5), y - tall * (0.4 + j * 0.09), bell, j % 3 ? 'paper' : 'card')),
  ];
});

const houseleek: Grow = (x, y, h, dice) => spread(5).flatMap((o) => {
  const a = x + o * h * 0.85 + dice.between(-0.5, 0.5);
  const q = h * (o === 0 ? 0.62 : 0.42);
  return [...disc(a, y - q * 0.6, q * 1.1, 'ink', q * 0.85), ...times(9, (j) => {
    const turn = j * 0.698;
    return line(`M${ff(a + Math.cos(turn) * q * 0.25, y - q * 0.6 + Math.sin(turn) * q * 0.2)}L${ff(a + Math.cos(turn) * q * 0.85, y - q * 0.6 + Math.sin(turn) * q * 0.64)}`, 0.42, j % 2 ? 'card' : 'paper');
  })];
});

const blades = (x: number, y: number, h: number): Cuts => spread(7).flatMap((o) =>
  shape(`M${ff(x + o * 0.8 - 0.5, y)}Q${ff(x + o * 1.5, y - h * 0.5)} ${ff(x + o * 2.1, y - h * (0.8 - Math.abs(o) * 0.06))}Q${ff(x + o * 1.6 + 1, y - h * 0.4)} ${ff(x + o * 0.8 + 0.6, y)}Z`));

const iris: Grow = (x, y, h) => [
  ...blades(x, y, h),
  ...[-2.6, 2.8].flatMap((a, i) => {
    const [ex, ey] = [x + a, y - h + i * 3];
    const p = ff(ex, ey);
    return [
      ...line(`M${ff(x, y)}L${p}`, 0.5), ...shape(`M${p}c-1.6-1.4-1.4-3.4 0-4.4c1.4 1 1.6 3 0 4.4Z`),
      ...shape(`M${p}c-1.2-1-3.6-.6-4 2.2c2 .6 3.4-.4 4-2.2c.6 1.8 2 2.8 4 2.2c-.4-2.8-2.8-3.2-4-2.2Z`),
      ...line(`M${ff(ex - 2.6, ey + 1)}l1.5-.7M${ff(ex + 2.6, ey + 1)}l-1.5-.7`, 0.35, 'card'),
    ];
  }),
];

const grass: Grow = (x, y, h, dice) => line(strokes(15, (o) =>
  `M${ff(x + o * 0.35, y)}q${ff(o * 0.2, -h * 0.6)} ${ff(o * 1.1 + dice.between(-1, 1), -h * dice.between(0.7, 1))}`), 0.4);

const allium: Grow = (x, y, h) => [
  ...line(strokes(5, (o) => `M${ff(x, y)}q${ff(o * 2, -h * 0.3)} ${ff(o * 3.4, -h * 0.12)}`), 0.8),
  ...([[-3, 0.86], [3.4, 1]] as const).flatMap(([a, t]) => {
    const [ex, ey] = [x + a, y - h * t];
    return [
      ...line(`M${ff(x, y)}Q${ff(x + a * 0.2, y - h * 0.5)} ${ff(ex, ey)}`, 0.5), ...disc(ex, ey, 3.1),
      ...times(22, (j) => dot(ex + Math.cos(j * 2.4) * 2.6 * Math.sqrt(j / 22), ey + Math.sin(j * 2.4) * 2.6 * Math.sqrt(j / 22), 0.36, j % 3 ? 'paper' : 'card')),
    ];
  }),
];

const daffodil: Grow = (x, y, h, dice) => [
  ...blades(x, y, h * 0.8),
  ...spread(3).flatMap((o) => {
    const [ex, ey] = [x + o * 4 + dice.between(-0.5, 0.5), y - h + Math.abs(o) * 2.4];
    return [
      ...line(`M${ff(x, y)}Q${ff(x + o, y - h * 0.6)} ${ff(ex, ey)}`, 0.5),
      ...times(6, (j) => disc(ex + Math.cos(j * 1.047) * 1.5, ey + Math.sin(j * 1.047) * 1.5, 1.05)),
      ...disc(ex, ey, 1.1, 'card'), ...disc(ex, ey, 0.5),
    ];
  }),
];

const daisy: Grow = (x, y, h, dice) => [
  ...line(strokes(9, (o) => `M${ff(x, y)}q${ff(o * 0.6, -h * 0.2)} ${ff(o * 1.1, -h * 0.26)}`), 0.9),
  ...spread(5).flatMap((o) => {
    const [ex, ey] = [x + o * 2.9, y - h * dice.between(0.72, 1) + Math.abs(o)];
    return [
      ...line(`M${ff(x, y)}Q${ff(x + o * 0.6, y - h * 0.5)} ${ff(ex, ey)}`, 0.4), ...disc(ex, ey, 1.9),
      ...times(9, (j) => dot(ex + Math.cos(j * 0.698) * 1.15, ey + Math.sin(j * 0.698) * 1.15, 0.42, 'paper')), ...dot(ex, ey, 0.6, 'card'),
    ];
  }),
];

const lily: Grow = (x, y, h) => [
  ...([[-1, 0.9], [1, 1]] as const).flatMap(([side, tall]) => [
    ...shape(`M${ff(x, y)}C${ff(x + side * h * 0.5, y - h * 0.2)} ${ff(x + side * h * 0.5, y - h * 0.7)} ${ff(x + side * h * 0.3, y - h * tall)}C${ff(x + side * h * 0.1, y - h * 0.7)} ${ff(x, y - h * 0.3)} ${ff(x, y)}Z`),
    ...line(`M${ff(x + side * h * 0.08, y - h * 0.16)}Q${ff(x + side * h * 0.3, y - h * 0.5)} ${ff(x + side * h * 0.29, y - h * 0.8)}`, 0.3, 'paper'),
  ]),
  ...line(`M${ff(x, y)}Q${ff(x, y - h)} ${ff(x + h * 0.42, y - h * 1.08)}`, 0.45),
  ...times(5, (j) => [...disc(x + h * (0.08 + j * 0.085), y - h * (0.86 + j * 0.03) + (j < 2 ? -0.3 : 1.2), 0.9), ...dot(x + h * (0.08 + j * 0.085), y - h * (0.86 + j * 0.03) + (j < 2 ? -0.1 : 1.4), 0.5, 'paper')]),
];

/** Soft plants that stand in front, each at its own height. */
export const FLOWERS = {
  fern, thrift, houseleek, iris, grass, allium, daffodil, daisy, lily, heather: spikes(13, 0.9, 0.42), lavender: spikes(9, 1.3, 0.5),
} as const satisfies Record<string, Grow>;
