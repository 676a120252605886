import type { JokeName } from './jokes';
import type { MatName } from './mats';
import type { FLOWERS } from './flowers';
import type { TREES } from './trees';
import type { StockName } from './stock';

/** The block's size in centimetres of real garden. */
export const WIDTH = 120;
export const HEIGHT = 68;

export type TreeForm = keyof typeof TREES;
export type FlowerForm = keyof typeof FLOWERS;
/** The drawings a plant can be cut as. */
export type PlantForm = TreeForm | FlowerForm | MatName;

export const BRIDGES = ['none', 'trestle', 'viaduct', 'girder', 'truss'] as const;
export type Bridge = (typeof BRIDGES)[number];
export const WATERS = ['none', 'stream', 'pond', 'sea'] as const;
export type Water = (typeof WATERS)[number];
export const SKIES = ['ruled', 'rays', 'rings', 'clouds', 'drizzle', 'stars'] as const;
export type Sky = (typeof SKIES)[number];

/** A plant set in the block: which, where its middle stands, how tall, and for the front row its foot. */
export type Planting = { readonly form: TreeForm | FlowerForm; readonly x: number; readonly heightCm: number; readonly foot: number };
export type Oddment = { readonly name: JokeName; readonly x: number; readonly foot: number };

/** Everything the cutter needs, in centimetres: what `compose` makes of a garden's particulars. */
export type Block = {
  readonly seed: number;
  readonly scale: number;
  readonly rail: number;
  readonly floor: number;
  readonly gap: readonly [number, number] | null;
  readonly bridge: Bridge;
  readonly water: Water;
  readonly pond: readonly [number, number];
  readonly sky: Sky;
  readonly tintedSky: boolean;
  readonly sun: readonly [number, number];
  readonly far: number;
  readonly train: readonly StockName[];
  readonly nose: number;
  readonly runsLeft: boolean;
  readonly steaming: boolean;
  readonly overheadWire: boolean;
  readonly back: readonly Planting[];
  readonly front: readonly Planting[];
  readonly oddments: readonly Oddment[];
  readonly mat: MatName;
  readonly tuftCount: number;
  readonly drifts: readonly number[];
};

/** The height of the ground at `x`: level beside the line, falling under a bridge to the block's floor. */
export function groundAt(block: Block, x: number): number {
  const level = block.rail + 1.7 + Math.sin(x * 0.13 + (block.seed % 97)) * 0.35;
  if (!block.gap || x <= block.gap[0] - 3 || x >= block.gap[1] + 3) return level;
  const t = Math.min(1, Math.min(x - block.gap[0] + 3, block.gap[1] + 3 - x) / 9);
  return level + (block.floor - block.rail) * (3 * t * t - 2 * t * t * t);
}
