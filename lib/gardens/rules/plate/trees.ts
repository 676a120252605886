import { box, disc, dot, ff, line, shape, times, type Cuts, type Dice } from './cut';

/** How a plant is drawn: its middle, its foot and its height, all in centimetres of real garden. */
export type Grow = (x: number, foot: number, height: number, dice: Dice) => Cuts;

const spruce: Grow = (x, y, h, dice) => {
  const width = h * 0.27;
  const layers = Math.max(3, Math.round(h / 3.6));
  const left: string[] = [];
  const right: string[] = [];
  let needles = '';
  for (let i = 0; i <= layers; i++) {
    const t = i / layers;
    const yy = y - h + h * 0.94 * t;
    const reach = width * Math.pow(t, 0.86);
    left.push(ff(x - reach - dice.between(0, 0.9), yy + 1.5), ff(x - reach * 0.62, yy + 0.3));
    right.push(ff(x + reach + dice.between(0, 0.9), yy + 1.5), ff(x + reach * 0.62, yy + 0.3));
    for (let j = 0; j < reach / 1.05; j++) {
      const a = dice.between(-0.86, 0.5) * reach;
      needles += `M${ff(x + a * 0.7, yy - 0.9)}l${ff(a * 0.2 - 0.12, dice.between(1, 2.1))}`;
    }
  }
  return [
    ...box(x - 0.9, y - 3, 1.8, 3),
    ...shape(`M${ff(x, y - h - 2)}L${right.join('L')}L${left.reverse().join('L')}Z`),
    ...line(needles, 0.3, 'paper'),
  ];
};

const pine: Grow = (x, y, h, dice) => [
  ...box(x - 1, y - 4, 2, 4),
  ...times(9, (i) => {
    const a = x + ((i % 3) - 1) * h * 0.32 + dice.between(-1, 1);
    const b = y - h * 0.2 - Math.floor(i / 3) * h * 0.27 - (i % 3 === 1 ? h * 0.1 : 0);
    const q = h * 0.2 + dice.between(0, 1);
    const needles = Array.from({ length: 8 }, (_, j) => {
      const turn = -2.7 + j * 0.31;
      return `M${ff(a + Math.cos(turn) * q * 0.3, b + Math.sin(turn) * q * 0.3)}L${ff(a + Math.cos(turn) * q * 0.86, b + Math.sin(turn) * q * 0.8)}`;
    });
    return [...disc(a, b, q * 1.12 + 0.3, 'paper', q + 0.3), ...disc(a, b, q * 1.12, 'ink', q), ...line(needles.join(''), 0.28, 'paper')];
  }),
];

const cypress: Grow = (x, y, h, dice) => {
  const w = h * 0.13;
  const cuts = Array.from({ length: Math.round(h * 1.5) }, () => {
    const t = dice.between(0.08, 0.96);
    const a = dice.between(-0.75, 0.75) * w * Math.sin(Math.PI * Math.min(0.9, t * 0.62 + 0.2));
    return `M${ff(x + a, y - h + h * t)}q${ff(a * 0.12, 1)} ${ff(a * 0.1, dice.between(1.4, 2.6))}`;
  });
  return [
    ...box(x - 0.7, y - 2, 1.4, 2.4),
    ...shape(`M${ff(x, y - h)}C${ff(x + w * 0.8, y - h * 0.72)} ${ff(x + w * 1.15, y - h * 0.3)} ${ff(x + w * 0.75, y - 1)}L${ff(x - w * 0.75, y - 1)}C${ff(x - w * 1.15, y - h * 0.3)} ${ff(x - w * 0.8, y - h * 0.72)} ${ff(x, y - h)}Z`),
    ...line(cuts.join(''), 0.3, 'paper'),
  ];
};

const crown = (x: number, y: number, h: number): Cuts => [
  ...line(`M${ff(x, y)}C${ff(x - 1, y - h * 0.25)} ${ff(x + 1, y - h * 0.3)} ${ff(x, y - h * 0.5)}M${ff(x, y - h * 0.36)}L${ff(x - h * 0.2, y - h * 0.58)}M${ff(x, y - h * 0.34)}L${ff(x + h * 0.22, y - h * 0.6)}`, h * 0.055),
  ...times(13, (i) => {
    const turn = i * 2.4;
    const q = h * 0.3 * Math.sqrt(i / 13);
    return disc(x + Math.cos(turn) * q * 1.25, y - h * 0.68 + Math.sin(turn) * q * 0.9, h * 0.13);
  }),
];
const overCrown = (x: number, y: number, h: number, count: number, make: (a: number, b: number, i: number) => Cuts): Cuts =>
  times(count, (i) => {
    const q = h * 0.37 * Math.sqrt(i / count);
    return make(x + Math.cos(i * 2.4) * q * 1.2, y - h * 0.68 + Math.sin(i * 2.4) * q * 0.85, i);
  });

const apple: Grow = (x, y, h) => [
  ...crown(x, y, h),
  ...overCrown(x, y, h, 34, (a, b, i) => [...dot(a, b, 0.95, i % 3 ? 'paper' : 'card'), ...dot(a, b, 0.28)]),
];

const maple: Grow = (x, y, h, dice) => [
  ...crown(x, y, h),
  ...overCrown(x, y, h, 30, (a, b, i) => {
    const turn = dice.between(0, 2);
    const rays = Array.from({ length: 5 }, (_, j) => `M${ff(a, b)}l${ff(Math.cos(turn + j * 1.257) * 1.25, Math.sin(turn + j * 1.257) * 1.1)}`);
    return line(rays.join(''), 0.42, i % 3 ? 'paper' : 'card');
  }),
];

const topiary: Grow = (x, y, h, dice) => {
  const q = h * 0.46;
  const leaves = Array.from({ length: Math.round(h * 2) }, () => {
    const turn = dice.between(0, 6.28);
    const reach = q * 0.86 * Math.sqrt(dice.next());
    return `M${ff(x + Math.cos(turn) * reach, y - h * 0.54 + Math.sin(turn) * reach)}l${ff(dice.between(-0.5, 0.5), 0.7)}`;
  });
  return [...box(x - 0.8, y - 3, 1.6, 3), ...disc(x, y - h * 0.54, q), ...line(leaves.join(''), 0.32, 'paper')];
};

const rose: Grow = (x, y, h, dice) => {
  const stems = Array.from({ length: 7 }, (_, i) => `M${ff(x, y)}Q${ff(x + (i - 3) * h * 0.08, y - h * 0.5)} ${ff(x + (i - 3) * h * 0.13, y - h * (0.95 - Math.abs(i - 3) * 0.08))}`);
  return [
    ...line(stems.join(''), 0.45),
    ...times(15, (i) => disc(x + dice.between(-0.36, 0.36) * h, y - h * (0.22 + (i % 6) * 0.12), h * 0.075)),
    ...times(7, (i) => {
      const [a, b] = [x + (i - 3) * h * 0.13, y - h * (0.95 - Math.abs(i - 3) * 0.08)];
      return [...disc(a, b, 1.7), ...disc(a, b, 1.3, i % 2 ? 'paper' : 'card'), ...line(`M${ff(a - 0.6, b)}a.6 .6 0 1 1 .6 .6`, 0.26)];
    }),
  ];
};

const juniper: Grow = (x, y, h, dice) => times(11, (i) => {
  const turn = (i - 5) * 0.27;
  const reach = h * dice.between(0.85, 1.25);
  const [ex, ey] = [x + Math.sin(turn) * reach * 1.5, y - Math.cos(turn) * reach * 0.72];
  const twigs = Array.from({ length: 7 }, (_, j) => {
    const t = 0.3 + j * 0.1;
    return `M${ff(x + (ex - x) * t, y + (ey - y) * t)}l${ff(1.1, -1.4)}M${ff(x + (ex - x) * t, y + (ey - y) * t)}l${ff(-1.1, -1.2)}`;
  });
  return [...line(`M${ff(x, y)}L${ff(ex, ey)}`, 0.7), ...line(twigs.join(''), 0.5)];
});

/** Woody plants, from the whole tree to the low bush. */
export const TREES = { spruce, pine, cypress, apple, maple, topiary, rose, juniper } as const satisfies Record<string, Grow>;
