import { along, around, blade, dot, dotsAround, leaf, many, put, rays, upTo, veins, type Point } from './ink';
import type { PlantDrawing } from './plant-drawing';

const rings = [{ radius: 22, count: 11 }, { radius: 34, count: 13 }, { radius: 50, count: 15 }];
const floret = (index: number, radius: number, count: number) => {
  const turn = (index * 2 * Math.PI) / count + radius;
  return rays(66 + radius * Math.sin(turn), 60 - radius * Math.cos(turn), 0, 7, 6, (turn * 180) / Math.PI);
};

export const allium: PlantDrawing = {
  width: 138,
  height: 304,
  layers: [
    { as: 'ink', d: blade([62, 302], [14, 180], 16, 9) + blade([68, 302], [108, 170], -14, 16) + blade([63, 302], [50, 210], -1, 7) + blade([70, 302], [136, 218], 4, 12) },
    { as: 'cut', width: 1.6, d: 'M68 290C74 246 90 206 103 182M74 290C86 264 108 242 128 226' },
    { as: 'line', width: 5, d: 'M64 302C62 222 68 150 66 60' },
    { as: 'line', width: 4, d: 'M70 300C78 250 96 220 104 176' },
    { as: 'ink', d: put('M0 0C-11 -4 -9 -22 0 -30C9 -22 11 -4 0 0Z', 104, 178, 4) + dot(66, 60, 10) },
    { as: 'cut', width: 1.6, d: put('M0 -5L0 -22M-4 -6C-5 -12 -4 -16 -2 -20', 104, 178, 4) },
    { as: 'line', width: 1.5, d: many(rings, ({ radius, count }) => rays(66, 60, 8, radius, count, (radius * 180) / Math.PI)) },
    { as: 'line', width: 2.3, d: many(rings, ({ radius, count }) => many(upTo(count), (index) => floret(index, radius, count))) },
  ],
};

const heatherFoot: Point = [78, 186];
const spikes = [[22, 74], [50, 26], [80, 40], [108, 12], [134, 78]] as const;
const heatherBell = 'M0 0C-5 1 -6 6 -5 10L-2 8L0 11L2 8L5 10C6 6 5 1 0 0Z';
const pullOf = ([x, y]: Point): Point => [x, y + 70];

/* Needles low on each stem, bells in pairs above them, a bud at the tip. */
const needles = (tip: Point) => many(upTo(6), (index) => {
  const { x, y, heading } = along(heatherFoot, pullOf(tip), tip, 0.2 + index * 0.06);
  return put('M-9 -5L0 0L9 -5', x, y, heading);
});
const bells = (draw: (x: number, y: number, angle: number) => string) => (tip: Point) => many(upTo(7), (index) => {
  const { x, y, heading } = along(heatherFoot, pullOf(tip), tip, 0.56 + index * 0.065);
  return draw(x - 2, y, heading + 130) + draw(x + 2, y + 4, heading - 130);
});
const hung = (path: string) => (x: number, y: number, angle: number) => put(path, x, y, angle > 0 ? angle - 80 : angle + 80);

export const heather: PlantDrawing = {
  width: 156,
  height: 190,
  layers: [
    { as: 'line', width: 3, d: many(spikes, (tip) => `M${heatherFoot.join(' ')}Q${pullOf(tip).join(' ')} ${tip.join(' ')}`) },
    { as: 'line', width: 1.8, d: many(spikes, needles) },
    { as: 'ink', d: many(spikes, bells(hung(heatherBell))) + many(spikes, ([x, y]) => leaf(x, y + 6, 0, 15, 4)) },
    { as: 'cut', width: 1.2, d: many(spikes, bells(hung('M0 2L0 7'))) },
    { as: 'ink', d: 'M50 189C58 176 98 176 106 189Z' },
  ],
};

const roseLeaves = [[52, 120, -62, 36, 13], [84, 108, 60, 36, 13], [58, 158, -70, 30, 11], [80, 150, 66, 30, 11]] as const;
const roses = [[68, 46, 1], [114, 84, 0.62]] as const;

export const rose: PlantDrawing = {
  width: 140,
  height: 216,
  layers: [
    { as: 'line', width: 5, d: 'M70 214C66 170 72 120 68 60' },
    { as: 'line', width: 3.4, d: 'M69 156C86 140 106 124 113 92M69 126C62 124 56 122 52 120M69 114C76 112 80 110 84 108M69 164C64 162 60 160 58 158M69 156C74 154 78 152 80 150M70 186l-8-5M69 140l7-6' },
    { as: 'ink', d: many(roseLeaves, ([x, y, angle, length, width]) => leaf(x, y, angle, length, width)) },
    { as: 'cut', width: 1.5, d: many(roseLeaves, ([x, y, angle, length, width]) => veins(x, y, angle, length, width)) },
    { as: 'ink', d: many(roses, ([x, y, scale]) => around('M0 0C-22 -8 -24 -32 -8 -38C2 -42 18 -36 18 -20C18 -8 8 0 0 0Z', x, y, 5, 0, scale) + dot(x, y, 18 * scale)) },
    { as: 'cut', width: 2, d: many(roses, ([x, y, scale]) =>
      around('M-12 -30C-18 -22 -14 -10 -4 -6', x, y, 5, 20, scale) +
      put('M-2 2C-8 0 -8 -10 0 -10C10 -10 12 4 2 8C-10 12 -18 0 -12 -10C-8 -18 6 -20 14 -12C20 -4 20 8 12 14C4 20 -10 20 -16 12', x, y, 0, scale)) },
    { as: 'ink', d: many(roses, ([x, y, scale]) => leaf(x - 6 * scale, y + 32 * scale, 200, 22 * scale, 5 * scale) + leaf(x + 6 * scale, y + 32 * scale, 160, 22 * scale, 5 * scale)) },
  ],
};

const fernFoot: Point = [80, 188];
const fronds = [[6, 104], [22, 40], [80, 6], [138, 40], [154, 104]] as const;
const archOf = ([x, y]: Point): Point => [80 + (x - 80) * 0.42, y - 14 + Math.abs(x - 80) * 0.1];

/* Pinnae in pairs, longest a third of the way up, none near the foot where the fronds crowd. */
const frond = (tip: Point) => many(upTo(15), (index) => {
  const { x, y, heading } = along(fernFoot, archOf(tip), tip, 0.4 + index * 0.04);
  const length = 19 * Math.sin(Math.PI * (0.3 + index * 0.048));
  return leaf(x, y, heading - 68, length, 2.7) + leaf(x, y, heading + 68, length, 2.7);
});

export const fern: PlantDrawing = {
  width: 160,
  height: 190,
  layers: [
    { as: 'line', width: 2.4, d: many(fronds, (tip) => `M${fernFoot.join(' ')}Q${archOf(tip).join(' ')} ${tip.join(' ')}`) },
    { as: 'ink', d: many(fronds, frond) + many(fronds, (tip) => leaf(tip[0], tip[1], along(fernFoot, archOf(tip), tip, 1).heading, 7, 2.500)) },
    { as: 'line', width: 3, d: 'M68 188C58 176 60 162 68 164C74 166 70 175 66 172M92 188C102 178 102 164 94 165C88 167 91 175 95 173' },
  ],
};

const rosette = (x: number, y: number, scale: number) =>
  ({ outer: around('M0 0C-9 -10 -10 -26 0 -38C10 -26 9 -10 0 0Z', x, y, 11, 0, scale), middle: around('M0 0C-8 -8 -8 -18 0 -27C8 -18 8 -8 0 0Z', x, y, 8, 22, scale), inner: around('M0 0C-5 -5 -5 -11 0 -16C5 -11 5 -5 0 0Z', x, y, 6, 0, scale) });
const rosettes = [rosette(66, 56, 1.15), rosette(124, 84, 0.62), rosette(20, 92, 0.5)];

export const houseleek: PlantDrawing = {
  width: 152,
  height: 116,
  layers: [
    { as: 'ink', d: many(rosettes, (each) => each.outer) },
    { as: 'open', width: 1.8, d: many(rosettes, (each) => each.middle) },
    { as: 'ink', d: many(rosettes, (each) => each.inner) },
    { as: 'line', width: 2, d: 'M96 84q10 8 18 6M44 88q-8 8-16 8M6 114q30-8 66-4t74 4' },
  ],
};

const stars = [[24, 62], [56, 30], [88, 58], [120, 34], [44, 92], [104, 92]] as const;

export const starCreeper: PlantDrawing = {
  width: 146,
  height: 124,
  layers: [
    { as: 'line', width: 2, d: many(stars, ([x, y]) => `M72 122Q${(x + 72) / 2} 112 ${x} ${y}`) },
    { as: 'ink', d: many(upTo(13), (index) => leaf(14 + index * 10, 116 - (index % 3) * 5, index % 2 === 0 ? -50 : 50, 13, 6)) },
    { as: 'open', width: 2, d: many(stars, ([x, y], index) => around('M0 0C-6 -5 -6 -12 0 -18C6 -12 6 -5 0 0Z', x, y, 5, index * 20)) },
    { as: 'ink', d: many(stars, ([x, y]) => dot(x, y, 3.4) + dotsAround(x, y, 5.500, 5, 1.100)) },
    { as: 'line', width: 2.4, d: 'M4 122H142' },
  ],
};
