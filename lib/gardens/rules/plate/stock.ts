import { at, box, disc, f, line, shape, times, type Cuts } from './cut';

/** Vehicles the block can show, drawn in metres of the full-size railway, standing on y = 0 with the chimney to the right. */
export const STOCK_NAMES = [
  'tank', 'saddle', 'diesel', 'railcar', 'tram', 'coach', 'balcony', 'van', 'open', 'tub', 'logs', 'milk',
] as const;
export type StockName = (typeof STOCK_NAMES)[number];

type Vehicle = { readonly lengthMeters: number; readonly draw: () => Cuts };

const wheel = (x: number, radius: number, spokes = 8): Cuts => [
  ...disc(x, -radius, radius),
  ...disc(x, -radius, radius * 0.78, 'paper'),
  ...line(Array.from({ length: spokes }, (_, i) => {
    const turn = (i * 2 * Math.PI) / spokes;
    return `M${f(x)} ${f(-radius)}l${f(Math.cos(turn) * radius * 0.8)} ${f(Math.sin(turn) * radius * 0.8)}`;
  }).join(''), 0.07),
  ...disc(x, -radius, radius * 0.2),
];
const bogie = (x: number): Cuts => [...wheel(x - 0.55, 0.32, 6), ...wheel(x + 0.55, 0.32, 6), ...box(x - 0.85, -0.62, 1.7, 0.2)];
const windows = (count: number, from: number, step: number, y: number, width: number, height: number): Cuts =>
  times(count, (i) => box(from + i * step, y, width, height, 'paper'));
const slats = (count: number, from: number, step: number, rest: string, width: number): Cuts =>
  line(Array.from({ length: count }, (_, i) => `M${f(from + i * step)}${rest}`).join(''), width, 'paper');

const engines: Record<'tank' | 'saddle' | 'diesel' | 'railcar' | 'tram', Vehicle> = {
  tank: { lengthMeters: 7.6, draw: () => [
    ...box(0.3, -1, 7, 0.3), ...box(2.3, -2.25, 4, 1.35), ...box(2.3, -2.02, 2.9, 1.2),
    ...line('M2.5-1.86h2.5v.84h-2.5z', 0.07, 'paper'),
    ...line('M5.5-2.2v1.1M6.05-2.2v1.1M2.5-2.14h2.8', 0.06, 'paper'),
    ...shape('M5.85-2.2h.62l-.08-.9h.16v-.24h-.8v.24h.18Z'), ...shape('M4.1-2.2c0-.75.8-.75.8 0Z'), ...shape('M3.05-2.2c0-.45.5-.45.5 0Z'),
    ...line('M3.3-2.55v-.22', 0.12),
    ...shape('M.35-1v-2.05h1.95V-1Z'), ...box(0.1, -3.22, 2.5, 0.24), ...box(0.75, -2.75, 0.55, 0.66, 'paper'), ...box(1.5, -2.75, 0.55, 0.66, 'paper'),
    ...shape('M-.35-1v-1.1h.75V-1Z'), ...line('M.35-1.85h1.95', 0.06, 'paper'),
    ...wheel(2.1, 0.5), ...wheel(3.55, 0.5), ...wheel(5, 0.5), ...wheel(6.5, 0.32, 6),
    ...line('M2.1-.42L5-.42', 0.13), ...line('M3.55-.42L5.95-.66', 0.11), ...box(5.55, -1, 0.95, 0.56), ...box(7.2, -1.12, 0.18, 0.5),
    ...shape('M7.3-.75L8-.1h-.9Z'), ...box(6.3, -1.75, 0.35, 0.5), ...box(6.6, -2.02, 0.26, 0.3),
  ] },
  saddle: { lengthMeters: 5.6, draw: () => [
    ...box(0.2, -0.95, 5.4, 0.3), ...shape('M1.9-1.1c-.1-1.7.3-1.75 1.9-1.75S5.3-2.8 5.2-1.1Z'),
    ...line('M2.4-2.7c-.2.4-.25 1-.2 1.5M4.7-2.7c.2.4.25 1 .2 1.5', 0.07, 'paper'),
    ...shape('M4.2-2.8h.5l-.06-.85h.14v-.22h-.66v.22h.14Z'), ...shape('M2.7-2.8c0-.5.6-.5.6 0Z'),
    ...line('M.35-1v-2.1M1.85-1v-2.1', 0.16), ...box(0.05, -3.2, 2.1, 0.2), ...box(0.3, -1.85, 1.6, 0.9), ...line('M.5-1.7h1.2v.6H.5Z', 0.06, 'paper'),
    ...wheel(1.5, 0.48), ...wheel(3.4, 0.48), ...line('M1.5-.4H3.4L4.8-.6', 0.12), ...box(4.4, -0.95, 0.9, 0.55), ...box(5.5, -1.05, 0.16, 0.55),
  ] },
  diesel: { lengthMeters: 6.8, draw: () => [
    ...box(0.2, -1, 6.4, 0.34), ...box(2.4, -2.2, 4, 1.25), ...slats(9, 4.2, 0.22, '-2v.85', 0.06), ...line('M2.7-1.9h1.2v.7H2.7Z', 0.06, 'paper'),
    ...shape('M.4-1v-2.1h2.1V-1Z'), ...box(0.2, -3.25, 2.5, 0.2), ...box(0.7, -2.8, 0.6, 0.75, 'paper'), ...box(1.55, -2.8, 0.65, 0.75, 'paper'),
    ...box(3.4, -2.55, 0.22, 0.36), ...bogie(1.5), ...bogie(5.2), ...line('M6.45-2.2v1.2', 0.1, 'paper'),
  ] },
  railcar: { lengthMeters: 8.6, draw: () => [
    ...shape('M.1-.75V-2.5C.1-2.95.5-3 .9-3H7.4C8.1-3 8.4-2.6 8.5-1.6V-.75Z'), ...windows(6, 0.7, 1.05, -2.55, 0.78, 0.75), ...box(7.15, -2.5, 0.8, 0.85, 'paper'),
    ...line('M.2-1.5H8.4M.2-1.28H8.4', 0.07, 'paper'), ...box(1.6, -3.2, 1.4, 0.22), ...bogie(1.7), ...bogie(6.7),
  ] },
  tram: { lengthMeters: 7, draw: () => [
    ...box(0.2, -2.9, 6.6, 2.2), ...windows(7, 0.75, 0.82, -2.5, 0.56, 0.85), ...box(-0.1, -3.1, 7.2, 0.22), ...box(1.4, -3.45, 4.2, 0.36),
    ...line('M3.5-3.4L.8-5', 0.1), ...line('M.4-1.35h6.2', 0.08, 'paper'), ...box(-0.05, -2.6, 0.14, 1.9), ...box(6.95, -2.6, 0.14, 1.9),
    ...wheel(2.4, 0.38, 6), ...wheel(4.6, 0.38, 6),
  ] },
};

const trailers: Record<Exclude<StockName, keyof typeof engines>, Vehicle> = {
  coach: { lengthMeters: 7.2, draw: () => [
    ...box(0.1, -2.55, 7, 1.9), ...shape('M-.05-2.52C.3-3 .8-3.05 3.6-3.05S6.9-3 7.25-2.52Z'), ...windows(5, 0.85, 1.14, -2.25, 0.82, 0.72),
    ...line('M.25-1.32h6.7M.25-1.14h6.7', 0.06, 'paper'), ...bogie(1.5), ...bogie(5.7),
  ] },
  balcony: { lengthMeters: 7.2, draw: () => [
    ...box(1, -2.55, 5.2, 1.9), ...shape('M-.05-2.52C.3-2.95.8-3 3.6-3S6.9-2.95 7.25-2.52Z'), ...line('M.15-2.5V-.7M7.05-2.5V-.7M.15-1.45H1M6.2-1.45h.85', 0.1),
    ...box(0, -0.78, 7.2, 0.16), ...windows(4, 1.4, 1.18, -2.25, 0.86, 0.78), ...line('M1.1-1.2h5', 0.06, 'paper'), ...bogie(1.5), ...bogie(5.7),
  ] },
  van: { lengthMeters: 4.4, draw: () => [
    ...box(0.1, -2.5, 4.2, 1.85), ...shape('M-.05-2.48C.4-2.85 1-2.85 2.2-2.85s1.8 0 2.25.37Z'), ...slats(9, 0.45, 0.44, '-2.35v1.55', 0.05),
    ...line('M1.5-2.4L2.9-.8M2.9-2.4L1.5-.8', 0.07, 'paper'), ...wheel(1, 0.34, 6), ...wheel(3.4, 0.34, 6),
  ] },
  open: { lengthMeters: 4, draw: () => [
    ...box(0.1, -1.5, 3.8, 0.85), ...line('M.2-1.2h3.6M.2-.92h3.6', 0.05, 'paper'), ...times(9, (i) => disc(0.5 + i * 0.37, -1.62 - (i % 2) * 0.16, 0.28)),
    ...wheel(0.9, 0.34, 6), ...wheel(3.1, 0.34, 6),
  ] },
  tub: { lengthMeters: 2.2, draw: () => [
    ...shape('M.05-1.75h2.1L1.85-.6H.35Z'), ...line('M.3-1.45h1.6', 0.06, 'paper'), ...times(5, (i) => disc(0.35 + i * 0.37, -1.85, 0.25)),
    ...wheel(0.6, 0.28, 6), ...wheel(1.6, 0.28, 6),
  ] },
  logs: { lengthMeters: 5, draw: () => [
    ...box(0.1, -0.85, 4.8, 0.24),
    ...times(3, (i) => [...disc(2.5, -1.15 - i * 0.4, 2.3 - i * 0.25, 'ink', 0.26), ...line(`M.5 ${f(-1.15 - i * 0.4)}h3.9`, 0.05, 'paper')]),
    ...line('M.7-2.2V-.8M4.3-2.2V-.8', 0.1), ...bogie(1.2), ...bogie(3.8),
  ] },
  milk: { lengthMeters: 4.2, draw: () => [
    ...shape('M.3-1.2C.1-2.6.6-2.7 2.1-2.7S4.1-2.6 3.9-1.2Z'), ...line('M.5-2h3.2M1.2-2.6v1.4M3-2.6v1.4', 0.07, 'paper'), ...box(0.1, -1.1, 4, 0.35),
    ...box(1.8, -2.95, 0.6, 0.3), ...wheel(1, 0.34, 6), ...wheel(3.2, 0.34, 6),
  ] },
};

const stock: Record<StockName, Vehicle> = { ...engines, ...trailers };
const COUPLING_METERS = 0.45;

/** How long a train is, in metres of the full-size railway, couplings included. */
export function trainLengthMeters(names: readonly StockName[]): number {
  return names.reduce((sum, name) => sum + stock[name].lengthMeters + COUPLING_METERS, -COUPLING_METERS);
}

const PUFFS = [[0, -4, 0.5], [-0.6, -4.7, 0.75], [-1.7, -5.2, 1], [-3.2, -5.5, 1.15], [-5, -5.6, 1.2], [-6.9, -5.45, 1.05], [-8.6, -5.3, 0.8], [-10, -5.2, 0.5]] as const;

function steamFrom(chimney: number): Cuts {
  return [
    ...PUFFS.flatMap(([x, y, r]) => disc(chimney + x, y, r + 0.1, 'ink', r * 0.82 + 0.1)),
    ...PUFFS.flatMap(([x, y, r]) => disc(chimney + x, y, r, 'paper', r * 0.82)),
    ...line([[-2.2, -5.1], [-4.2, -5.3], [-6.3, -5.2], [-0.9, -4.5]].map(([x, y]) => `M${f(chimney + (x ?? 0))} ${f(y ?? 0)}q.5-.7 1.2-.2`).join(''), 0.09),
  ];
}

/** A train with its nose at x = 0, running to the right; `steaming` gives it smoke. One unit is one full-size metre. */
export function trainOf(names: readonly StockName[], steaming: boolean): Cuts {
  let x = 0;
  const cars = names.flatMap((name, i) => {
    x -= stock[name].lengthMeters;
    const car = at(x, 0, stock[name].draw());
    x -= COUPLING_METERS;
    return i < names.length - 1 ? [...car, ...box(x - 0.1, -0.85, 0.7, 0.16)] : car;
  });
  return [...(steaming ? steamFrom(names[0] === 'tank' ? -1.45 : -1.15) : []), ...cars];
}
