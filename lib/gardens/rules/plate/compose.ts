import type * as words from '@/lib/core/words';
import { HEIGHT, SKIES, WIDTH, type Block, type Oddment, type Planting, type Sky, type Water } from './block';
import { diceFrom, seedOf, type Dice } from './cut';
import { formOf, isFlower, isMat, isTree, type ListedPlant } from './forms';
import { JOKE_FACTS, JOKE_NAMES, type JokeName } from './jokes';
import type { MatName } from './mats';
import { plantBehind, plantInFront, roomBeside } from './planting';
import { STOCK_NAMES, trainLengthMeters, type StockName } from './stock';

/** What a host has told us that a plate can show. */
export type PlateParticulars = {
  readonly slug: string;
  readonly scaleOneTo: number;
  readonly powers: readonly words.Power[];
  readonly bridge: words.Bridge;
  readonly water: words.Water;
  readonly plants: readonly ListedPlant[];
  readonly notes: { readonly stock?: readonly string[]; readonly joke?: string; readonly sky?: string };
};

const pick = <T>(dice: Dice, choices: readonly [T, ...T[]]): T => choices[Math.floor(dice.next() * choices.length)] ?? choices[0];

function trainFor({ notes, powers, scaleOneTo }: PlateParticulars, dice: Dice): readonly StockName[] {
  const told = (notes.stock ?? []).flatMap((name) => STOCK_NAMES.filter((known) => known === name));
  if (told.length > 0) return told;
  switch (powers[0]) {
    case 'live-steam':
      return scaleOneTo < 17 ? ['saddle', 'tub', 'tub', 'tub', 'tub'] : pick<StockName[]>(dice, [['tank', 'balcony', 'coach'], ['tank', 'van', 'milk', 'van'], ['tank', 'logs', 'logs', 'van']]);
    case 'overhead':
      return ['tram'];
    case 'track':
      return ['diesel', 'coach', 'coach', 'coach'];
    case 'clockwork':
      return ['tank', 'open', 'open'];
    default:
      return pick<StockName[]>(dice, [['railcar'], ['diesel', 'open', 'open', 'open'], ['diesel', 'van', 'van']]);
  }
}

/** A train with wagons left in the yard until it fits, so that trees have a place behind it; three vehicles always stay. */
const shortened = (train: readonly StockName[], metres: number): readonly StockName[] =>
  train.length > 3 && trainLengthMeters(train) > metres ? shortened(train.slice(0, -1), metres) : train;

/** Where the bridge stands, right-running: its two ends, or nothing. */
function gapFor(bridge: PlateParticulars['bridge'], nose: number, dice: Dice): readonly [number, number] | null {
  const sway = dice.between(-3, 3);
  switch (bridge) {
    case 'none':
      return null;
    case 'pier':
      return [10 + sway, WIDTH + 4];
    case 'viaduct':
      return [14 + sway, 102 + sway];
    case 'trestle':
      return [28 + sway, Math.min(94, nose + 2 + sway)];
    case 'truss':
      return [nose - 44 + sway, Math.min(98, nose + 14 + sway)];
    case 'girder':
      return [nose - 40 + sway, nose - 6 + sway];
  }
}

const waterOf = (water: PlateParticulars['water'], bridge: PlateParticulars['bridge']): Water =>
  bridge === 'pier' || water === 'lagoon' ? 'sea' : water === 'brook' ? 'stream' : water === 'none' ? 'none' : 'pond';

function railHeight(bridge: PlateParticulars['bridge'], centimetresAMetre: number, steaming: boolean, dice: Dice): number {
  const usual = { none: 41, pier: 32, viaduct: 28, trestle: 34, truss: 36, girder: 38 }[bridge];
  const needed = centimetresAMetre * (steaming ? 5.6 : 3.6) + 2;
  return Math.round(Math.min(43, Math.max(usual, needed) + dice.between(-1.5, 1.5)));
}

function jokeFor(told: string | undefined, room: number, dice: Dice): JokeName {
  const known = JOKE_NAMES.find((name) => name === told);
  if (known) return known;
  const fitting = JOKE_NAMES.filter((name) => name !== 'snail' && (JOKE_FACTS[name].height <= room - 2 || JOKE_FACTS[name].right < 31));
  return fitting[Math.floor(dice.next() * fitting.length)] ?? 'apple';
}

const SKY_CHOICES = ['ruled', 'rays', 'rings', 'clouds', 'drizzle'] as const satisfies readonly [Sky, ...Sky[]];
const TUFTS: Record<MatName, number> = { thyme: 560, star: 240, moss: 230, sedum: 190, chips: 110 };

/** A garden's particulars laid out as a block. The same particulars always make the same block. */
export function compose(garden: PlateParticulars): Block {
  const seed = seedOf(garden.slug);
  const dice = diceFrom(seed);
  const weather = diceFrom(seed + 7); // of its own, so that a new plant does not change the sky
  const centimetresAMetre = 100 / garden.scaleOneTo;
  const asked = trainFor(garden, dice);
  const steaming = garden.powers[0] === 'live-steam' && (asked[0] === 'tank' || asked[0] === 'saddle');
  const rail = railHeight(garden.bridge, centimetresAMetre, steaming, dice);
  const plants = garden.plants.map((plant) => ({ form: formOf(plant), heightCm: plant.heightMm / 10 }));
  const trees = plants.flatMap(({ form, heightCm }) => (isTree(form) ? [{ form, heightCm }] : []));
  const nose = Math.round(trees.length > 0 ? dice.between(74, 84) : dice.between(80, 98));
  const train = trees.length > 0 ? shortened(asked, (nose - 24) / centimetresAMetre) : asked;
  const length = trainLengthMeters(train) * centimetresAMetre;
  const gap = gapFor(garden.bridge, nose, dice);
  const water = waterOf(garden.water, garden.bridge);
  const joke = jokeFor(garden.notes.joke, HEIGHT - rail - 3, dice);
  const room = roomBeside({ nose, tail: nose - length, steamEnd: steaming ? nose - 12 * centimetresAMetre : WIDTH, joke, rail });
  const back = plantBehind(trees, room, rail, dice);
  const low = plants.flatMap(({ form, heightCm }) => (isFlower(form) || (isTree(form) && heightCm <= HEIGHT - rail - 6) ? [{ form, heightCm }] : []));
  const pond = gap ? ([gap[0] + 4, gap[1]] as const) : ([34 + dice.between(-4, 4), 84 + dice.between(-4, 4)] as const);
  const laid = plantInFront({ low, joke, room, rail, wet: water === 'sea' ? [24, 97] : water === 'pond' ? pond : null }, dice);
  const sky = SKIES.find((known) => known === garden.notes.sky) ?? pick(weather, SKY_CHOICES);
  const mat = plants.map(({ form }) => form).find(isMat);
  const runsLeft = weather.next() < 0.3;
  const bridge = garden.bridge === 'pier' ? 'trestle' : garden.bridge;
  const block: Block = {
    seed, scale: garden.scaleOneTo, rail, floor: Math.min(64, bridge === 'viaduct' ? 61 : rail + 26), gap, bridge, water, pond, sky,
    tintedSky: sky === 'clouds' || ((sky === 'rings' || sky === 'drizzle') && weather.next() < 0.5),
    sun: [weather.between(17, 30), weather.between(11, 14)], far: sky === 'stars' ? 17 : rail - 7 - Math.round(weather.between(0, 4)),
    train, nose, runsLeft: false, steaming, overheadWire: garden.powers[0] === 'overhead', back, front: laid.front, oddments: laid.oddments,
    mat: mat ?? 'chips', tuftCount: mat ? TUFTS[mat] : 70, drifts: [8, 26, 46, 62, 78, 112].map((x) => x + weather.between(-6, 6)),
  };
  return runsLeft ? mirrored(block) : block;
}

const flip = (x: number): number => WIDTH - x;
const flipPlant = (plant: Planting): Planting => ({ ...plant, x: flip(plant.x) });
const flipOddment = (thing: Oddment): Oddment => ({ ...thing, x: flip(thing.x + JOKE_FACTS[thing.name].left + JOKE_FACTS[thing.name].right) });

/** The same block seen from the other side of the line. */
const mirrored = (block: Block): Block => ({
  ...block, runsLeft: true, nose: flip(block.nose), gap: block.gap ? [flip(block.gap[1]), flip(block.gap[0])] : null, pond: [flip(block.pond[1]), flip(block.pond[0])],
  sun: [flip(block.sun[0]), block.sun[1]], back: block.back.map(flipPlant), front: block.front.map(flipPlant), oddments: block.oddments.map(flipOddment), drifts: block.drifts.map(flip),
});
