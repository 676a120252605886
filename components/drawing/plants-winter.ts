import { blade, dot, leaf, many, put, upTo } from './ink';
import type { PlantDrawing } from './plant-drawing';

const drops = [[38, 44, 1], [82, 26, 1.1], [112, 62, 0.86]] as const;

export const snowdrop: PlantDrawing = {
  width: 140,
  height: 186,
  layers: [
    { as: 'ink', d: blade([60, 184], [10, 92], 14, 9) + blade([66, 184], [56, 78], -4, 8) + blade([74, 184], [126, 104], -10, 10) + blade([70, 184], [92, 84], -4, 7) },
    { as: 'cut', width: 1.5, d: 'M58 172C48 144 34 118 20 102M68 172C66 142 62 114 58 96M78 174C90 148 106 126 118 114' },
    { as: 'line', width: 3, d: 'M62 184C58 120 52 66 58 36C60 26 44 24 38 44M70 184C72 110 66 40 88 12C98 4 92 14 82 26M76 184C86 130 92 84 104 48C110 40 118 46 112 62' },
    { as: 'ink', d: leaf(62, 34, 30, 24, 3) + leaf(92, 12, 40, 22, 3) + leaf(106, 46, 50, 20, 3) + many(drops, ([x, y, scale]) => dot(x, y + 2 * scale, 5 * scale)) },
    { as: 'open', width: 2.2, d: many(drops, ([x, y, scale]) => put('M0 4C-14 10 -18 28 -12 38C-4 34 -1 18 0 4ZM0 4C14 10 18 28 12 38C4 34 1 18 0 4ZM0 4C-9 14 -9 32 0 42C9 32 9 14 0 4Z', x, y, 0, scale)) },
    { as: 'line', width: 2, d: many(drops, ([x, y, scale]) => put('M-4 35L0 31L4 35M0 12L0 24', x, y, 0, scale)) },
  ],
};

const aconites = [[30, 58, 0.86], [76, 34, 1.1], [118, 66, 0.8]] as const;
const ruff = [-104, -78, -52, -24, 24, 52, 78, 104];

export const winterAconite: PlantDrawing = {
  width: 148,
  height: 148,
  layers: [
    { as: 'line', width: 4, d: many(aconites, ([x, y]) => `M${74 + (x - 74) * 0.4} 146Q${x - (x - 74) * 0.1} 120 ${x} ${y + 8}`) },
    { as: 'ink', d: many(aconites, ([x, y, scale]) => many(ruff, (angle) => leaf(x, y + 12 * scale, angle, 30 * scale, 5 * scale))) },
    { as: 'cut', width: 1.2, d: many(aconites, ([x, y, scale]) => many(ruff, (angle) => put('M0 -8L0 -24', x, y + 12 * scale, angle, scale))) },
    { as: 'open', width: 2.3, d: many(aconites, ([x, y, scale]) => put('M-2 12C-26 8 -26 -16 -14 -22C-4 -16 -2 0 -2 12ZM2 12C26 8 26 -16 14 -22C4 -16 2 0 2 12ZM0 14C-14 6 -14 -18 0 -28C14 -18 14 6 0 14Z', x, y, 0, scale)) },
    { as: 'line', width: 1.5, d: many(aconites, ([x, y, scale]) => put('M0 6L0 -14M-4 4C-7 -4 -6 -10 -4 -14M4 4C7 -4 6 -10 4 -14', x, y, 0, scale)) },
    { as: 'line', width: 2.4, d: 'M8 146H140' },
  ],
};

const goblets = [[36, 60, -10, 0.9], [78, 32, 0, 1.1], [116, 70, 10, 0.84]] as const;

export const autumnCrocus: PlantDrawing = {
  width: 150,
  height: 186,
  layers: [
    { as: 'line', width: 6, d: many(goblets, ([x, y, lean]) => `M${78 + (x - 78) * 0.3} 184Q${x - lean} 140 ${x} ${y + 44}`) },
    { as: 'ink', d: many(goblets, ([x, y, lean, scale]) => put('M0 48C-30 40 -32 -6 -20 -26C-8 -16 0 10 0 48ZM0 48C30 40 32 -6 20 -26C8 -16 0 10 0 48Z', x, y, lean, scale)) },
    { as: 'open', width: 2.2, d: many(goblets, ([x, y, lean, scale]) => put('M0 48C-20 30 -18 -12 0 -34C18 -12 20 30 0 48Z', x, y, lean, scale)) },
    { as: 'line', width: 1.4, d: many(goblets, ([x, y, lean, scale]) => put('M0 40L0 -18M-5 32C-10 14 -8 -6 -4 -16M5 32C10 14 8 -6 4 -16', x, y, lean, scale)) },
    { as: 'cut', width: 1.5, d: many(goblets, ([x, y, lean, scale]) => put('M-16 26C-22 10 -22 -6 -19 -16M16 26C22 10 22 -6 19 -16', x, y, lean, scale)) },
    { as: 'line', width: 2, d: 'M22 184q6-8 4-16M44 184q-2-8 4-14M104 184q2-8-2-14M128 184q-4-8 0-15M10 184H142' },
  ],
};

/* Tiers of needles, each wider than the one above, drooping a little at the ends. */
const tier = (index: number) => {
  const [y, half] = [26 + index * 22, 12 + index * 8.5];
  return `M66 ${y - 18}C${66 - half * 0.4} ${y} ${66 - half * 0.8} ${y + 8} ${66 - half} ${y + 12}L${66 - half * 0.72} ${y + 13}L${66 - half * 0.6} ${y + 20}L${66 - half * 0.36} ${y + 16}L${66 - half * 0.18} ${y + 24}L66 ${y + 18}L${66 + half * 0.18} ${y + 24}L${66 + half * 0.36} ${y + 16}L${66 + half * 0.6} ${y + 20}L${66 + half * 0.72} ${y + 13}L${66 + half} ${y + 12}C${66 + half * 0.8} ${y + 8} ${66 + half * 0.4} ${y} 66 ${y - 18}Z`;
};

export const dwarfSpruce: PlantDrawing = {
  width: 132,
  height: 194,
  layers: [
    { as: 'ink', d: many(upTo(6), tier) + 'M61 158h10v34H61Z' },
    { as: 'cut', width: 1.6, d: many(upTo(6), (index) => {
      const [y, half] = [26 + index * 22, 12 + index * 8.5];
      return `M66 ${y - 4}L${66 - half * 0.5} ${y + 11}M66 ${y - 4}L${66 + half * 0.5} ${y + 11}M66 ${y - 2}V${y + 12}`;
    }) },
    { as: 'line', width: 2.4, d: 'M20 192H112' },
  ],
};

const tufts = [[28, 84, -46], [46, 44, -22], [78, 26, 0], [108, 48, 24], [130, 88, 46], [64, 90, -12], [96, 92, 14]] as const;

export const mountainPine: PlantDrawing = {
  width: 158,
  height: 176,
  layers: [
    { as: 'line', width: 5, d: many(tufts, ([x, y]) => `M78 174Q${78 + (x - 78) * 0.5} 130 ${x} ${y}`) },
    { as: 'line', width: 2, d: many(tufts, ([x, y, lean]) => many(upTo(11), (index) => put('M0 0L0 -26', x, y + 6, lean + (index - 5) * 22)) + many(upTo(5), (index) => put('M0 0L0 -18', x, y + 20, lean + (index - 2) * 38))) },
    { as: 'ink', d: many([[56, 124, -14], [104, 126, 16], [80, 64, 0]] as const, ([x, y, lean]) => put('M0 -16C10 -12 12 8 0 18C-12 8 -10 -12 0 -16Z', x, y, lean)) },
    { as: 'cut', width: 1.4, d: many([[56, 124, -14], [104, 126, 16], [80, 64, 0]] as const, ([x, y, lean]) => put('M-7 -6L7 2M-8 2L6 10M7 -6L-7 2M8 2L-6 10', x, y, lean)) },
    { as: 'line', width: 2.4, d: 'M30 174H128' },
  ],
};

/* For a plant that has no drawing of its own yet: something just come up. */
export const seedling: PlantDrawing = {
  width: 96,
  height: 96,
  layers: [
    { as: 'line', width: 3.4, d: 'M48 94C46 74 50 60 48 44' },
    { as: 'ink', d: leaf(48, 56, -58, 42, 13) + leaf(48, 48, 52, 44, 14) + leaf(48, 46, 0, 22, 5) },
    { as: 'cut', width: 1.5, d: put('M0 -8L0 -34', 48, 56, -58) + put('M0 -8L0 -36', 48, 48, 52) },
    { as: 'line', width: 2.4, d: 'M18 94H78' },
  ],
};
