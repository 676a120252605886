import { groundAt, HEIGHT, WIDTH, type Block } from './block';
import { box, byInk, disc, f, ff, line, shape, times, type Cuts, type Dice } from './cut';
import { layMat, type Tuft } from './mats';

/** The bank in solid ink, gouged with short cuts. */
export function cutBank(block: Block, dice: Dice): Cuts {
  let d = `M-1 ${HEIGHT + 1}`;
  for (let x = -1; x <= WIDTH + 1; x += 1.5) d += `L${ff(x, groundAt(block, x) + dice.between(-0.25, 0.25))}`;
  const gouges = times(260, () => {
    const x = dice.between(0, WIDTH);
    const top = groundAt(block, x);
    const y = top + 2.6 + Math.pow(dice.next(), 1.3) * (HEIGHT - top - 3);
    const cut = `M${ff(x, y)}q${ff(dice.between(0.3, 1.2), dice.between(-0.5, 0.3))} ${ff(dice.between(1, 3), dice.between(-0.3, 0.5))}`;
    const width = Math.round(dice.between(3, 7)) / 20;
    return y < HEIGHT ? line(cut, width, dice.next() > 0.3 ? 'paper' : 'card') : [];
  });
  return [...shape(`${d}L${WIDTH + 1} ${HEIGHT + 1}Z`), ...byInk(gouges)];
}

/** Ballast and sleepers where the line lies on the ground. */
export function cutWay(block: Block): Cuts {
  const stretches = block.gap ? [[0, block.gap[0]], [block.gap[1], WIDTH]] : [[0, WIDTH]];
  return stretches.flatMap(([from = 0, to = 0]) => {
    const sleepers = Array.from({ length: Math.max(0, Math.ceil((to - from - 0.4) / 1.9)) }, (_, i) => from + 0.4 + i * 1.9);
    return [...box(from - 0.5, block.rail, to - from + 1, 1.5, 'paper'), ...sleepers.flatMap((x) => box(x, block.rail + 0.45, 1.05, 0.8))];
  });
}

/** The rail itself, from edge to edge. */
export const cutRail = (block: Block): Cuts => box(-1, block.rail - 0.1, WIDTH + 2, 0.52);

const waterLine = (block: Block): number => ({ none: HEIGHT, stream: block.floor - 1, sea: HEIGHT - 15, pond: HEIGHT - 9 })[block.water];
const shores = (block: Block): readonly [number, number] => {
  if (block.water === 'pond') return block.pond;
  return block.water === 'stream' && block.gap ? [block.gap[0] + 5, block.gap[1] - 4] : [-2, WIDTH + 2];
};

/** Brook, pond or sea. */
export function cutWater(block: Block, dice: Dice): Cuts {
  if (block.water === 'none') return [];
  const y = waterLine(block);
  const [from, to] = shores(block);
  const [middle, half] = [(from + to) / 2, (to - from) / 2];
  const surface = {
    sea: () => shape(`M-1 ${f(y)}${Array.from({ length: 31 }, (_, i) => `q2 ${i % 2 ? -0.9 : 0.9} 4 0`).join('')}V${HEIGHT + 1}H-1Z`, 'card'),
    pond: () => [...disc(middle, y + 4.4, half, 'paper', 6.2), ...disc(middle, y + 4.6, half - 1, 'card', 5.4)],
    stream: () => shape(`M${ff(from, y)}Q${ff(middle, y - 2)} ${ff(to, y)}L${ff(to + 8, HEIGHT + 1)}H${f(from - 10)}Z`, 'card'),
  }[block.water]();
  const ripples = times(block.water === 'sea' ? 70 : 34, () => {
    const yy = y + dice.between(1, block.water === 'sea' ? 14 : 8);
    const reach = block.water === 'pond' ? Math.sqrt(Math.max(0, 1 - ((yy - y - 4.6) / 5.2) ** 2)) : 1;
    const x = middle + dice.between(-1, 1) * half * reach * 0.86;
    const length = dice.between(2, 7);
    return line(`M${ff(x - length / 2, yy)}q${ff(length / 2, -0.5)} ${ff(length, 0)}`, 0.34, dice.next() > 0.4 ? 'ink' : 'paper');
  });
  const pads = block.water !== 'pond' ? [] : ([[-0.5, 5.6], [0.1, 7.2], [0.52, 4.2]] as const).flatMap(([t, down]) => [
    ...disc(middle + t * half, y + down, 3, 'ink', 1.1),
    ...line(`M${ff(middle + t * half, y + down)}l2.6-.7`, 0.4, 'card'),
    ...disc(middle + t * half - 0.6, y + down - 0.9, 0.9, 'paper'),
  ]);
  return [...surface, ...byInk(ripples), ...pads];
}

const isWet = (block: Block, x: number, y: number): boolean => {
  if (block.water === 'sea') return y > HEIGHT - 17;
  if (block.water !== 'pond') return false;
  const [from, to] = block.pond;
  return Math.hypot((x - (from + to) / 2) / ((to - from) / 2 + 1), (y - HEIGHT + 4.5) / 6.6) < 1.05;
};

/** The flowering or gravel mat in front of the line, thick in drifts and never on the water. */
export function cutMat(block: Block, dice: Dice): Cuts {
  const tufts: Tuft[] = [];
  for (let i = 0; i < block.tuftCount; i++) {
    const drift = block.drifts[Math.floor(dice.next() * block.drifts.length)];
    const inDrift = dice.next() > 0.35 && drift !== undefined;
    const x = inDrift ? drift + (dice.next() + dice.next() + dice.next() - 1.5) * 13 : dice.between(0, WIDTH);
    const top = Math.max(groundAt(block, x) + 3, block.rail + 11);
    const y = top + Math.pow(dice.next(), 0.8) * (HEIGHT - top + 1);
    if (!isWet(block, x, y) && y < HEIGHT + 1) tufts.push({ x, y, size: 0.55 + ((y - block.rail) / (HEIGHT - block.rail)) * 1.25 });
  }
  return layMat(block.mat, tufts, dice);
}
