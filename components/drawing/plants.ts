import type { PlantDrawing } from './plant-drawing';
import { dwarfApple, iris, lilyOfTheValley, thrift, thyme } from './plants-spring';
import { allium, fern, heather, houseleek, rose, starCreeper } from './plants-summer';
import { autumnCrocus, dwarfSpruce, mountainPine, seedling, snowdrop, winterAconite } from './plants-winter';

const DRAWINGS = {
  thyme,
  thrift,
  allium,
  'lily-of-the-valley': lilyOfTheValley,
  iris,
  'dwarf-apple': dwarfApple,
  heather,
  fern,
  houseleek,
  'star-creeper': starCreeper,
  rose,
  'autumn-crocus': autumnCrocus,
  snowdrop,
  'winter-aconite': winterAconite,
  'dwarf-spruce': dwarfSpruce,
  'mountain-pine': mountainPine,
  seedling,
} as const satisfies Record<string, PlantDrawing>;

export type PlantKey = keyof typeof DRAWINGS;

/* The first word that occurs in a plant's common name decides, so "Mother-of-thyme" is drawn as thyme. */
const WORDS: readonly [word: string, key: PlantKey][] = [
  ['thyme', 'thyme'], ['chamomile', 'thyme'], ['thrift', 'thrift'], ['pink', 'thrift'], ['allium', 'allium'], ['chive', 'allium'],
  ['lily of the valley', 'lily-of-the-valley'], ['iris', 'iris'], ['flag', 'iris'], ['apple', 'dwarf-apple'], ['cherry', 'dwarf-apple'], ['plum', 'dwarf-apple'], ['pear', 'dwarf-apple'],
  ['heather', 'heather'], ['heath', 'heather'], ['lavender', 'heather'], ['fern', 'fern'], ['bracken', 'fern'], ['spleenwort', 'fern'],
  ['houseleek', 'houseleek'], ['stonecrop', 'houseleek'], ['saxifrage', 'houseleek'], ['star creeper', 'star-creeper'], ['pratia', 'star-creeper'], ['speedwell', 'star-creeper'], ['phlox', 'star-creeper'],
  ['rose', 'rose'], ['crocus', 'autumn-crocus'], ['cyclamen', 'autumn-crocus'], ['snowdrop', 'snowdrop'], ['aconite', 'winter-aconite'],
  ['spruce', 'dwarf-spruce'], ['fir', 'dwarf-spruce'], ['cypress', 'dwarf-spruce'], ['pine', 'mountain-pine'], ['juniper', 'mountain-pine'],
];

const isKey = (text: string): text is PlantKey => Object.hasOwn(DRAWINGS, text);

/** Which drawing stands for a plant, by key or common name; a seedling where none fits. */
export function plantKeyFor(plant: string): PlantKey {
  if (isKey(plant)) return plant;
  const name = plant.toLowerCase();
  return WORDS.find(([word]) => name.includes(word))?.[1] ?? 'seedling';
}

/** The drawing of a plant, by key or common name. */
export const plantDrawing = (plant: string): PlantDrawing => DRAWINGS[plantKeyFor(plant)];
