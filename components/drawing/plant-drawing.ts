import type { Layer } from './ink';

/** A plant in one ink, drawn in its own units with its foot at the lower edge. */
export type PlantDrawing = { width: number; height: number; layers: readonly Layer[] };
