import type { MapInks } from './map-inks';

/** A tile that repeats without a seam: one line from corner to corner, `turn` degrees down to the right (above 90, to the left). */
interface Weave {
  readonly wide: number;
  readonly high: number;
  readonly lines: readonly ('down' | 'up' | 'across' | 'upright')[];
  readonly weight: number;
  readonly isDashed: boolean;
}

/** The printed map's seven hatches, as near as a tile comes; from the eighth stop on each is crossed by a second line. */
const WEAVES: readonly Weave[] = [
  { wide: 12, high: 8, lines: ['down'], weight: 1.2, isDashed: false },
  { wide: 9, high: 8, lines: ['up'], weight: 1.5, isDashed: false },
  { wide: 6, high: 6, lines: ['upright'], weight: 1.2, isDashed: false },
  { wide: 7, high: 7, lines: ['across'], weight: 1.5, isDashed: false },
  { wide: 8, high: 13, lines: ['down'], weight: 1.2, isDashed: true },
  { wide: 20, high: 8, lines: ['up'], weight: 1.5, isDashed: true },
  { wide: 8, high: 13, lines: ['up'], weight: 1.2, isDashed: true },
];

const CROSSED = { down: 'up', up: 'down', across: 'upright', upright: 'across' } as const;

/** Device pixels to a point in every tile. */
export const TILE_RATIO = 2;

function canvasOf(wide: number, high: number): CanvasRenderingContext2D {
  const canvas = document.createElement('canvas');
  canvas.width = wide * TILE_RATIO;
  canvas.height = high * TILE_RATIO;
  const pen = canvas.getContext('2d');
  if (!pen) throw new Error('this browser draws no canvas');
  pen.scale(TILE_RATIO, TILE_RATIO);
  return pen;
}

function stroke(pen: CanvasRenderingContext2D, { wide, high, isDashed }: Weave, line: Weave['lines'][number]): void {
  const length = Math.hypot(wide, high);
  pen.setLineDash(isDashed ? [length * 0.36, length * 0.14] : []);
  pen.beginPath();
  for (const shift of [-1, 0, 1]) {
    if (line === 'down') { pen.moveTo((shift - 1) * wide, -high); pen.lineTo((shift + 2) * wide, 2 * high); }
    if (line === 'up') { pen.moveTo((shift - 1) * wide, 2 * high); pen.lineTo((shift + 2) * wide, -high); }
  }
  if (line === 'across') { pen.moveTo(0, high / 2); pen.lineTo(wide, high / 2); }
  if (line === 'upright') { pen.moveTo(wide / 2, 0); pen.lineTo(wide / 2, high); }
  pen.stroke();
}

/** The pattern of one stop's neighbourhood. */
export function hatchTile(number: number, { cardInk, cards }: MapInks): ImageData {
  const weave = WEAVES[(number - 1) % WEAVES.length] ?? { wide: 8, high: 8, lines: ['down'], weight: 1.2, isDashed: false };
  const isWoven = number > WEAVES.length;
  const pen = canvasOf(weave.wide, weave.high);
  pen.fillStyle = cards[(number - 1) % cards.length] ?? '#fff';
  pen.fillRect(0, 0, weave.wide, weave.high);
  pen.strokeStyle = cardInk;
  pen.lineWidth = isWoven ? 0.9 : weave.weight;
  for (const line of weave.lines) {
    stroke(pen, weave, line);
    if (isWoven) stroke(pen, { ...weave, isDashed: false }, CROSSED[line]);
  }
  return pen.getImageData(0, 0, weave.wide * TILE_RATIO, weave.high * TILE_RATIO);
}

/** The printed map's tree, on a halo of paper. */
export function treeImage({ conifer, paper }: MapInks): ImageData {
  const [wide, high] = [32, 44];
  const pen = canvasOf(wide, high);
  pen.translate(16, 30);
  pen.scale(0.8, 0.8);
  const tree = new Path2D('M0 -24L9 -8H5L12 4H2V9H-2V4H-12L-5 -8H-9Z');
  pen.lineJoin = 'round';
  pen.strokeStyle = paper;
  pen.lineWidth = 3;
  pen.stroke(tree);
  pen.fillStyle = conifer;
  pen.fill(tree);
  pen.lineWidth = 1.3;
  pen.stroke(new Path2D('M-3 -10l-2 4M2 -4l3 4M-2 0l-3 3'));
  return pen.getImageData(0, 0, wide * TILE_RATIO, high * TILE_RATIO);
}
