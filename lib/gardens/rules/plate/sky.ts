import { HEIGHT, WIDTH, type Block } from './block';
import { at, box, byInk, disc, dot, f, ff, line, shape, times, type Cuts, type Dice, type Ink } from './cut';

const isNight = (block: Block): boolean => block.sky === 'stars';
const skyTint = (block: Block): Ink => (block.tintedSky ? 'paper' : 'card');

function ruled(block: Block, dice: Dice): Cuts {
  const rows: Cuts[] = [];
  for (let y = 0.6; y < block.rail - 4; y += 1.25) {
    let d = '';
    for (let x = dice.between(-4, 0); x < WIDTH; ) {
      const length = dice.between(10, 36);
      d += `M${ff(x, y)}q${ff(length / 2, dice.between(-0.3, 0.3))} ${ff(length, 0)}`;
      x += length + dice.between(0.6, 2.4);
    }
    rows.push(line(d, 0.75 * (1 - y / (block.rail - 3)) + 0.05));
  }
  return rows.flat();
}

function rays(block: Block): Cuts {
  const [x, y] = block.sun;
  const point = (turn: number, reach: number): string => ff(x + Math.cos(turn) * reach, y + Math.sin(turn) * reach);
  return times(44, (i) => {
    const turn = (i * Math.PI) / 22;
    return shape(`M${point(turn, 9)}L${point(turn - 0.022, 130)}L${point(turn + 0.022, 130)}Z`, skyTint(block)).map((cut) => ({ ...cut, joins: true }));
  });
}

function rings(block: Block, dice: Dice): Cuts {
  const [x, y] = block.sun;
  const out: Cuts[] = [];
  for (let reach = 9; reach < 120; reach += 3.4) {
    let d = '';
    for (let turn = dice.between(0, 1); turn < 7; ) {
      const sweep = dice.between(14, 40) / reach;
      const end = turn + Math.min(3, sweep);
      d += `M${ff(x + Math.cos(turn) * reach, y + Math.sin(turn) * reach)}A${ff(reach, reach)} 0 0 1 ${ff(x + Math.cos(end) * reach, y + Math.sin(end) * reach)}`;
      turn = end + dice.between(1.6, 3.4) / reach;
    }
    out.push(line(d, 1.5 - reach * 0.008, skyTint(block)));
  }
  return out.flat();
}

const drizzle = (block: Block, dice: Dice): Cuts =>
  line(Array.from({ length: 150 }, () => `M${ff(dice.between(0, WIDTH), dice.between(0, block.rail))}l-.9 ${f(dice.between(2, 3.4))}`).join(''), 0.3, block.tintedSky ? 'paper' : 'ink');

const stars = (block: Block, dice: Dice): Cuts =>
  byInk(times(70, () => dot(dice.between(0, WIDTH), dice.between(0, block.rail - 3), Math.round(dice.between(0.8, 2.5)) / 5, dice.next() > 0.6 ? 'card' : 'paper')));

const clouds = (dice: Dice): Cuts => ([[22, 12, 1], [70, 8, 1.3], [102, 17, 0.9]] as const).flatMap(([x0, y, q]) => {
  const x = x0 + dice.between(-6, 6);
  return [
    ...([[0, 0, 7], [6, -2.4, 5], [-6, 0.4, 4.5], [11, 0.6, 4]] as const).flatMap(([dx, dy, r]) => disc(x + dx * q, y + dy * q, r * q, 'paper', r * q * 0.62)),
    ...line(`M${ff(x - 9 * q, y + 4 * q)}h${f(24 * q)}M${ff(x - 5 * q, y + 5.4 * q)}h${f(15 * q)}`, 0.4),
  ];
});

function sunOrMoon(block: Block): Cuts {
  const [x, y] = block.sun;
  if (block.sky === 'clouds' || block.sky === 'drizzle') return [];
  if (isNight(block)) return [...disc(x, y, 6.4, 'card'), ...disc(x + 2.6, y - 1.2, 5.4)];
  return [...disc(x, y, 6.7), ...disc(x, y, 6.15, block.tintedSky ? 'paper' : 'card')];
}

function hills(block: Block, dice: Dice): Cuts {
  const ridge = (x: number): number => block.far + Math.sin(x * 0.09 + (block.seed % 61) * 1.7) * 3.2;
  let d = `L-1 ${f(block.far + 2)}`;
  for (let x = 0; x <= WIDTH + 2; x += 4) d += `Q${ff(x - 2, ridge(x) - dice.between(0, 1.6))} ${ff(x, ridge(x) + dice.between(0, 0.8))}`;
  const tint: Ink = block.tintedSky ? 'paper' : 'card';
  const furrows = times(70, () => {
    const [x, y] = [dice.between(0, WIDTH), dice.between(block.far + 3, Math.min(HEIGHT, block.far + 26))];
    return line(`M${ff(x, y)}q${ff(dice.between(1, 2), dice.between(-0.8, -0.2))} ${ff(dice.between(2.4, 5), 0)}`, 0.32, dice.next() > 0.45 ? 'ink' : block.tintedSky ? 'card' : 'paper');
  });
  return [...shape(`M-1 ${HEIGHT}${d}L${WIDTH + 1} ${HEIGHT}Z`, tint), ...line(d.replace('L', 'M'), 0.5), ...byInk(furrows)];
}

/** Sky, sun or moon, and the far hills. */
export function cutSky(block: Block, dice: Dice): Cuts {
  const pattern: Record<Block['sky'], () => Cuts> = {
    ruled: () => ruled(block, dice), rays: () => rays(block), rings: () => rings(block, dice),
    drizzle: () => drizzle(block, dice), stars: () => stars(block, dice), clouds: () => clouds(dice),
  };
  const ground: Ink = isNight(block) ? 'ink' : block.tintedSky ? 'card' : 'paper';
  return [...at(0, 0, box(0, 0, WIDTH, HEIGHT, ground)), ...pattern[block.sky](), ...sunOrMoon(block), ...hills(block, dice)];
}
