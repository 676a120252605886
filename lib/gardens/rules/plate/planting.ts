import { HEIGHT, WIDTH, type FlowerForm, type Oddment, type Planting, type TreeForm } from './block';
import type { Dice } from './cut';
import { halfWidthCm } from './forms';
import { JOKE_FACTS, type JokeName } from './jokes';

type Stretch = { readonly from: number; readonly to: number };
/** The sky before and behind the train, where black may stand without hiding it; `jokeStands` when a tall joke needs a part. */
export type Room = { readonly ahead: Stretch; readonly behind: Stretch; readonly jokeStands: Stretch | null };

/** Whether a joke would reach up to the wheels, so that it must stand ahead of the engine. */
const isTall = (joke: JokeName, rail: number): boolean => JOKE_FACTS[joke].height > HEIGHT - rail - 5;
const widthOf = (joke: JokeName): number => JOKE_FACTS[joke].right - JOKE_FACTS[joke].left;

/** Where trees and tall things may stand. No black train before a black tree, nor under its own smoke. */
export function roomBeside({ nose, tail, steamEnd, joke, rail }: { nose: number; tail: number; steamEnd: number; joke: JokeName; rail: number }): Room {
  const ahead = { from: nose + 4, to: WIDTH + 4 };
  const behind = { from: 0, to: Math.min(tail, steamEnd) - 3 };
  if (!isTall(joke, rail)) return { ahead, behind, jokeStands: null };
  const stands = { from: Math.min(ahead.from, WIDTH - 2 - widthOf(joke)), to: Math.min(ahead.from, WIDTH - 2 - widthOf(joke)) + widthOf(joke) };
  return { ahead: { from: stands.from + 14, to: ahead.to }, behind, jokeStands: stands }; // a tree may look over a boot's toe: the boot has its halo
}

type Tree = { readonly form: TreeForm; readonly heightCm: number };

function fill(stretch: Stretch, trees: readonly Tree[], rail: number, dice: Dice): Planting[] {
  const planted: Planting[] = [];
  let x = stretch.from;
  for (let i = 0; planted.length < 3 && i < 9; i++) {
    const tree = trees[i % trees.length];
    if (!tree) break;
    const heightCm = Math.min(52, tree.heightCm * (i < trees.length ? 1 : dice.between(0.62, 0.9)));
    const half = halfWidthCm(tree.form, heightCm);
    if (x + half * 1.7 > stretch.to) continue;
    planted.push({ form: tree.form, x: x + half, heightCm, foot: rail + 2.5 });
    x += half * 1.75 + dice.between(0, 2);
  }
  return planted;
}

/** The trees behind the line, each at its true height, clear of the train. */
export function plantBehind(trees: readonly Tree[], room: Room, rail: number, dice: Dice): Planting[] {
  const tall = [...trees].sort((a, b) => b.heightCm - a.heightCm);
  return [...fill(room.ahead, tall, rail, dice), ...fill(room.behind, [...tall].reverse(), rail, dice)];
}

type Low = { readonly form: TreeForm | FlowerForm; readonly heightCm: number };
type FrontInput = { readonly low: readonly Low[]; readonly joke: JokeName; readonly room: Room; readonly rail: number; readonly wet: readonly [number, number] | null };

/** Where a low joke may stand: toward the quiet end of the block, on dry land if there is any. */
function jokePlace({ joke, room, wet }: FrontInput, dice: Dice): Oddment {
  const facts = JOKE_FACTS[joke];
  if (room.jokeStands) return { name: joke, x: room.jokeStands.from - facts.left, foot: HEIGHT - 1.5 };
  const width = widthOf(joke);
  const from = wet ? Math.min(wet[1] - 4, WIDTH - 5 - width) : dice.between(8, WIDTH - 10 - width);
  return { name: joke, x: from - facts.left, foot: HEIGHT - dice.between(1, 3) };
}

/** The front row and the life-sized thing, none before another. */
export function plantInFront(input: FrontInput, dice: Dice): { front: Planting[]; oddments: Oddment[] } {
  const thing = jokePlace(input, dice);
  const facts = JOKE_FACTS[thing.name];
  const taken: Stretch[] = [{ from: thing.x + facts.left - 2, to: thing.x + facts.right + 2 }];
  if (input.wet) taken.push({ from: input.wet[0] + 2, to: input.wet[1] - 2 });
  const front: Planting[] = [];
  let x = dice.between(0, 4);
  let tries = 0; // at one place, the plants of the list take their turn until one fits
  while (x < WIDTH - 4 && front.length < 5) {
    const plant = input.low[(front.length + tries) % Math.max(1, input.low.length)];
    if (!plant) break;
    const heightCm = Math.min(plant.heightCm * (front.length < input.low.length ? 1 : dice.between(0.75, 1)), HEIGHT - input.rail - 3);
    const half = Math.min(24, halfWidthCm(plant.form, heightCm));
    const blocker = taken.find((stretch) => x < stretch.to && x + 2 * half > stretch.from);
    const isOut = x + half * 1.6 > WIDTH;
    if (blocker || isOut) {
      tries += 1;
      if (tries < input.low.length) continue;
      if (!blocker) break;
      x = blocker.to;
      tries = 0;
      continue;
    }
    front.push({ form: plant.form, x: x + half, heightCm, foot: HEIGHT - dice.between(0.5, 2.5) });
    x += 2 * half + dice.between(4, 22);
    tries = 0;
  }
  const perch = thing.name === 'boot' && input.room.jokeStands ? [{ name: 'robin' as const, x: thing.x + 1.5, foot: thing.foot - 31.5 }] : [];
  return { front, oddments: [thing, ...perch] };
}
