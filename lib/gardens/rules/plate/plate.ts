import { cutBridge, cutNearSide } from './bridges';
import { HEIGHT, WIDTH, type Block, type Planting } from './block';
import { compose, type PlateParticulars } from './compose';
import { at, diceFrom, ff, line, print, seedOf, type Cuts, type Dice, type Inks } from './cut';
import { FLOWERS } from './flowers';
import { cutBank, cutMat, cutRail, cutWater, cutWay } from './ground';
import { jokeOf } from './jokes';
import { cutSky } from './sky';
import { trainOf } from './stock';
import { TREES } from './trees';

/** Daylight inks (LOOK.md's tokens): a plate is pasteboard and keeps them after dark, as tickets do. */
export const CARD_INKS = {
  primrose: '#f7ecae', lilac: '#ded6f0', rose: '#f6d3d6', sage: '#cfe0c9', sky: '#cfe3f2', buff: '#ecdcc3', mint: '#c5e6da',
} as const;
export type CardInk = keyof typeof CARD_INKS;
const CARD_NAMES = ['primrose', 'lilac', 'rose', 'sage', 'sky', 'buff', 'mint'] as const satisfies readonly CardInk[];
const DAYLIGHT = { ink: '#16241d', paper: '#fdfdf9' } as const;

/** The card of stop `number`: seven colours, over again from the eighth. Without a stop, a garden's own by its address. */
export const cardOf = (number: number | null, slug: string): CardInk =>
  CARD_NAMES[((number ?? (seedOf(slug) % 7) + 1) - 1) % CARD_NAMES.length] ?? 'primrose';

const GROW = { ...TREES, ...FLOWERS };
const grown = (plants: readonly Planting[], dice: Dice): Cuts => plants.flatMap(({ form, x, foot, heightCm }) => GROW[form](x, foot, heightCm, dice));
const haloed = (id: string, pieces: Cuts): Cuts => (pieces.length > 0 ? [{ wrap: `filter="url(#${id}h)"`, pieces }] : []);

function cutTrain(block: Block): Cuts {
  const metre = 100 / block.scale;
  const wire = block.overheadWire ? line(`M-1 ${ff(block.rail - 5 * metre)}H${WIDTH + 1}`, 0.35) : [];
  return [...wire, ...at(block.nose, block.rail, trainOf(block.train, block.steaming), block.runsLeft ? -metre : metre, metre)];
}

/** The block from back to front: what lies first is covered by what comes after. */
function layers(block: Block, inks: Inks, id: string): string {
  const isNight = block.sky === 'stars';
  const dice = diceFrom(block.seed + 1);
  const trees = grown(block.back, dice);
  const lit = isNight ? { ...inks, paper: inks.card } : inks;
  return [
    print([...cutSky(block, dice), ...(isNight ? haloed(id, trees) : trees), ...cutBank(block, dice), ...cutWay(block), ...cutBridge(block), ...cutRail(block), ...cutWater(block, dice)], inks),
    print(haloed(id, cutTrain(block)), lit),
    print([...cutNearSide(block), ...cutMat(block, dice), ...haloed(id, grown(block.front, dice))], inks),
    print(block.oddments.flatMap(({ name, x, foot }) => haloed(id, at(x, foot, jokeOf(name)))), inks),
  ].join('');
}

const WORN_EDGE = 'M1.2 1L40 .5 78 1.1 119 .7 119.4 30 118.9 67.2 80 67.5 36 67 .8 67.4 1.1 33Z';

const escaped = (words: string): string => words.replace(/&/g, '&amp;').replace(/</g, '&lt;').replace(/"/g, '&quot;');

/** The whole plate as an SVG document of its own: pure, the same for the same garden and card, in two inks on paper. */
export function plateSvg(garden: PlateParticulars, card: CardInk, title: string): string {
  const block = compose(garden);
  const id = `k${block.seed.toString(36)}`;
  const inks: Inks = { ...DAYLIGHT, card: CARD_INKS[card] };
  const wobble = `<filter id="${id}w" x="0" y="0" width="1" height="1" color-interpolation-filters="sRGB"><feTurbulence type="fractalNoise" baseFrequency=".32" numOctaves="2" seed="${block.seed % 999}" result="n"/><feDisplacementMap in="SourceGraphic" in2="n" scale=".7" xChannelSelector="R" yChannelSelector="G"/></filter>`;
  const halo = `<filter id="${id}h" x="-.2" y="-.2" width="1.4" height="1.4"><feMorphology in="SourceAlpha" operator="dilate" radius=".6"/><feComponentTransfer result="m"><feFuncA type="linear" slope="9"/></feComponentTransfer><feFlood flood-color="${DAYLIGHT.paper}"/><feComposite in2="m" operator="in"/><feMerge><feMergeNode/><feMergeNode in="SourceGraphic"/></feMerge></filter>`;
  return `<svg xmlns="http://www.w3.org/2000/svg" viewBox="0 0 ${WIDTH} ${HEIGHT}" width="${WIDTH * 10}" height="${HEIGHT * 10}" role="img"><title>${escaped(title)}</title><defs><clipPath id="${id}"><path d="${WORN_EDGE}"/></clipPath>${wobble}${halo}</defs><rect width="${WIDTH}" height="${HEIGHT}" fill="${DAYLIGHT.paper}"/><g clip-path="url(#${id})" stroke-linecap="round" stroke-linejoin="round"><g filter="url(#${id}w)">${layers(block, inks, id)}</g></g></svg>`;
}
