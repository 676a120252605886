/* Path makers for the one-ink plants. Angles in degrees, 0 straight up, clockwise; y grows downwards as on the page. */

export type Layer = {
  d: string;
  /** Solid ink; a line of ink; a line cut into the ink; paper with an ink edge. */
  as: 'ink' | 'line' | 'cut' | 'open';
  width?: number;
};

const short = (value: number) => String(Math.round(value * 10) / 10);

export type Point = readonly [x: number, y: number];

/** A drawing's own points set at a place, turned and scaled: what was right and up stays so to the plant. */
const placed = (x: number, y: number, angle: number, scale = 1) => {
  const turn = (angle * Math.PI) / 180;
  const [cos, sin] = [Math.cos(turn) * scale, Math.sin(turn) * scale];
  return ([px, py]: Point) => `${short(x + px * cos - py * sin)} ${short(y + px * sin + py * cos)}`;
};

/** A path of absolute M, L, C, Q and Z commands set at a place, turned and scaled. */
export function put(path: string, x: number, y: number, angle = 0, scale = 1): string {
  const at = placed(x, y, angle, scale);
  return path.replace(/(-?[\d.]+)[ ,](-?[\d.]+)/g, (_, px: string, py: string) => at([Number(px), Number(py)]));
}

/** The same path several times round a point, the first at `from` degrees. */
export const around = (path: string, x: number, y: number, count: number, from = 0, scale = 1): string =>
  Array.from({ length: count }, (_, index) => put(path, x, y, from + (index * 360) / count, scale)).join('');

/** A round dot. */
export const dot = (x: number, y: number, r: number): string =>
  `M${short(x - r)} ${short(y)}a${short(r)} ${short(r)} 0 1 0 ${short(2 * r)} 0a${short(r)} ${short(r)} 0 1 0 ${short(-2 * r)} 0Z`;

/** Dots on a circle round a point. */
export const dotsAround = (x: number, y: number, radius: number, count: number, r: number, from = 0): string =>
  Array.from({ length: count }, (_, index) => {
    const turn = ((from + (index * 360) / count) * Math.PI) / 180;
    return dot(x + radius * Math.sin(turn), y - radius * Math.cos(turn), r);
  }).join('');

/** Straight strokes from a point outwards, from `inner` to `outer`. */
export const rays = (x: number, y: number, inner: number, outer: number, count: number, from = 0): string =>
  around(`M0 ${-inner}L0 ${-outer}`, x, y, count, from);

/** A pointed leaf growing from a point along an angle. */
export const leaf = (x: number, y: number, angle: number, length: number, width: number): string =>
  put(`M0 0C${width} ${-length * 0.3} ${width * 0.9} ${-length * 0.75} 0 ${-length}C${-width * 0.9} ${-length * 0.75} ${-width} ${-length * 0.3} 0 0Z`, x, y, angle);

/** A leaf's middle vein with two pairs of side veins. */
export const veins = (x: number, y: number, angle: number, length: number, width: number): string => {
  const [low, high, out] = [-length * 0.35, -length * 0.6, width * 0.45];
  return put(`M0 ${-length * 0.12}L0 ${-length * 0.86}M0 ${low}L${out} ${low - 5}M0 ${low}L${-out} ${low - 5}M0 ${high}L${out * 0.8} ${high - 4}M0 ${high}L${-out * 0.8} ${high - 4}`, x, y, angle);
};

/** A strap-shaped leaf from a foot to a tip, bellied to the side of `bend`. */
export function blade(foot: Point, tip: Point, bend: number, width: number): string {
  const [fx, fy] = foot;
  const [tx, ty] = tip;
  const mx = (fx + tx) / 2 + bend;
  const my = (fy + ty) / 2;
  const points = [mx - width, my, mx + width, my].map(short);
  return `M${short(fx)} ${short(fy)}Q${points[0]} ${points[1]} ${short(tx)} ${short(ty)}Q${points[2]} ${points[3]} ${short(fx + 2)} ${short(fy)}Z`;
}

/** A place on a curve from `from` to `to` pulled by `pull`, at `t` 0 to 1, with the way it is heading there. */
export function along(from: Point, pull: Point, to: Point, t: number): { x: number; y: number; heading: number } {
  const u = 1 - t;
  const at = (axis: 0 | 1) => u * u * from[axis] + 2 * t * u * pull[axis] + t * t * to[axis];
  const speed = (axis: 0 | 1) => 2 * u * (pull[axis] - from[axis]) + 2 * t * (to[axis] - pull[axis]);
  return { x: at(0), y: at(1), heading: (Math.atan2(speed(0), -speed(1)) * 180) / Math.PI };
}

/** Every item's paths as one path. */
export const many = <T>(items: readonly T[], draw: (item: T, index: number) => string): string => items.map(draw).join('');

/** Whole numbers from nought. */
export const upTo = (count: number): number[] => Array.from({ length: count }, (_, index) => index);
