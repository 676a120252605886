import { around, dot, dotsAround, leaf, many, put, rays, upTo, veins } from './ink';
import type { PlantDrawing } from './plant-drawing';

const bell = 'M-2 0C-10 2 -11 12 -11 17C-8 15 -6 17 -5.500 20C-3 16 3 16 5.500 20C6 17 8 15 11 17C11 12 10 2 2 0Z';
const bells = [[42, 94, 1], [74, 68, 0.92], [58, 46, 0.84], [96, 30, 0.76], [110, 21, 0.68], [124, 22, 0.6]] as const;

export const lilyOfTheValley: PlantDrawing = {
  width: 136,
  height: 222,
  layers: [
    { as: 'ink', d: 'M60 220C10 190 -4 110 20 40C52 84 70 150 60 220ZM66 220C60 150 84 90 126 60C136 130 112 190 66 220Z' },
    { as: 'cut', width: 1.6, d: 'M58 208C40 160 30 110 23 60M50 206C26 170 16 120 18 70M60 196C52 150 42 116 28 72M70 206C80 160 96 114 122 74M78 204C98 172 114 136 124 92' },
    { as: 'line', width: 3, d: 'M62 220C56 150 44 70 84 20C92 12 104 10 112 14' },
    { as: 'line', width: 1.8, d: 'M56 86q-6-2-14 8M62 60q6-2 12 8M72 38q-6-2-14 8M84 22q6-2 12 8M98 13q6-2 12 8M112 14q6-2 12 8' },
    { as: 'open', width: 2, d: many(bells, ([x, y, scale]) => put(bell, x, y, 0, scale)) },
  ],
};

export const iris: PlantDrawing = {
  width: 142,
  height: 232,
  layers: [
    { as: 'ink', d: 'M44 230C32 170 18.800 110 14 80C35 140 47 185 44 230ZM60 230C49 158 46 86 50 50C64 122 68 176 60 230ZM84 230C76 162 88 94 104 60C106 128 98 179 84 230ZM98 230C93.200 178 116 126 140 100C132.200 152 115.400 191 98 230ZM72 230C63.200 182 66 134 74 110C82.200 158 81.400 194 72 230Z' },
    { as: 'cut', width: 1.6, d: 'M44 224C39.500 170 26 125 15.800 95M60 224C58.500 158 54 104 50.600 68M84 224C87 162 96 111 102.800 77M98 224C104.300 178 123.200 139 137.500 113M72 224C72.300 182 73.200 146 73.900 122' },
    { as: 'line', width: 5, d: 'M72 230C70 160 70 120 68 78' },
    { as: 'open', width: 2.4, d: put('M0 0C-20 -10 -20 -44 0 -60C20 -44 20 -10 0 0Z', 68, 74) },
    { as: 'line', width: 1.4, d: put('M0 -6L0 -46M-5 -10C-9 -22 -8 -32 -4 -42M5 -10C9 -22 8 -32 4 -42', 68, 74) },
    { as: 'ink', d: put('M0 0C-10 -14 -34 -18 -46 2C-52 16 -46 32 -40 36C-28 30 -12 20 0 0ZM0 0C10 -14 34 -18 46 2C52 16 46 32 40 36C28 30 12 20 0 0ZM0 2C-9 8 -12 30 0 46C12 30 9 8 0 2Z', 68, 74) },
    { as: 'cut', width: 1.6, d: put('M-8 0C-20 0 -34 8 -40 26M-10 -4C-22 -6 -36 0 -44 16M8 0C20 0 34 8 40 26M10 -4C22 -6 36 0 44 16M0 8L0 36M-3 12C-5 20 -4 26 -2 32M3 12C5 20 4 26 2 32', 68, 74) },
  ],
};

const blossom = 'M0 0C-12 -6.600 -12 -19 0 -19C12 -19 12 -6.600 0 0Z';
const stamens = 'M0 -6L0 -13M-2 -6L-4 -11M2 -6L4 -11';
const blossoms = [[26, 56, 10, 1.15], [64, 30, 40, 0.85], [28, 160, 5, 1.2], [76, 142, 30, 1.05]] as const;
const appleLeaves = [[54, 92, -70, 30, 10], [84, 58, 60, 28, 9], [42, 116, -110, 32, 10], [74, 118, 80, 28, 9], [34, 132, 70, 26, 8]] as const;

export const dwarfApple: PlantDrawing = {
  width: 136,
  height: 186,
  layers: [
    { as: 'line', width: 6, d: 'M134 0C98 18 84 62 58 86C46 98 34 130 28 160' },
    { as: 'line', width: 4, d: 'M84 54C68 50 48 46 28 54M54 90C70 102 76 120 78 142M92 44C84 36 74 32 66 32' },
    { as: 'ink', d: many(appleLeaves, ([x, y, angle, length, width]) => leaf(x, y, angle, length, width)) + dot(58, 166, 6) },
    { as: 'cut', width: 1.4, d: many(appleLeaves, ([x, y, angle, length, width]) => veins(x, y, angle, length, width)) + 'M54 163q1-3 4-3' },
    { as: 'open', width: 2.2, d: many(blossoms, ([x, y, from, scale]) => around(blossom, x, y, 5, from, scale)) },
    { as: 'line', width: 1.3, d: many(blossoms, ([x, y, from, scale]) => around(stamens, x, y, 5, from, scale)) },
    { as: 'ink', d: many(blossoms, ([x, y]) => dot(x, y, 4)) },
  ],
};

const thriftHeads = [[28, 100], [54, 54], [82, 78], [102, 24], [130, 70], [140, 116]] as const;
const grass = upTo(27).map((index) => index - 13);

export const thrift: PlantDrawing = {
  width: 164,
  height: 204,
  layers: [
    { as: 'line', width: 2.4, d: many(grass, (index) => `M${82 + index * 1.2} 202q${index * 0.9}-24 ${index * 4.4}${-(38 - Math.abs(index) * 1.5)}`) },
    { as: 'ink', d: 'M60 203C64 186 100 186 104 203Z' },
    { as: 'line', width: 3, d: many(thriftHeads, ([x, y]) => `M${82 + (x - 82) * 0.12} 190Q${82 + (x - 82) * 0.3} ${(y + 190) / 2 + 10} ${x} ${y + 12}`) },
    { as: 'ink', d: many(thriftHeads, ([x, y]) => dot(x, y, 15) + dotsAround(x, y, 15, 14, 2.8) + `M${x - 9} ${y + 13}h18L${x} ${y + 24}Z`) },
    { as: 'cut', width: 1.5, d: many(thriftHeads, ([x, y]) => around('M-3.200 -5.500L0 -10.500L3.200 -5.500', x, y, 6) + `M${x - 11} ${y + 13.5}h22`) },
    { as: 'cut', width: 2.4, d: many(thriftHeads, ([x, y]) => rays(x, y, 12.4, 12.6, 12, 15)) },
  ],
};

const thymeStems = [[16, 38, 20], [46, 22, 12], [76, 34, 0], [108, 20, -12], [138, 40, -20]] as const;

export const thyme: PlantDrawing = {
  width: 156,
  height: 128,
  layers: [
    { as: 'line', width: 2.6, d: many(thymeStems, ([x, y]) => `M76 126C${76 + (x - 76) * 0.4} 108 ${x} 104 ${x} ${y + 12}`) },
    { as: 'ink', d: many(thymeStems, ([x, y, lean]) => many(upTo(5), (index) => {
      const [lx, ly] = [x + index * lean * 0.1, y + 22 + index * 11];
      return leaf(lx, ly, -75, 11, 4.6) + leaf(lx, ly, 75, 11, 4.6);
    })) },
    { as: 'ink', d: many(thymeStems, ([x, y]) => dot(x, y, 9) + dotsAround(x, y, 10.5, 8, 4.4)) },
    { as: 'cut', width: 2.6, d: many(thymeStems, ([x, y]) => rays(x, y, 10.4, 10.6, 8) + rays(x, y, 4, 4.2, 5)) },
  ],
};
