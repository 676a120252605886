import { listed } from '@/lib/opendays/rules/words';
import { compose, type PlateParticulars } from './compose';
import { formOf, isMat } from './forms';
import { JOKE_FACTS } from './jokes';

const BRIDGE_WORDS: Readonly<Record<string, string>> = { trestle: 'a trestle', viaduct: 'a viaduct', girder: 'a girder bridge', truss: 'a truss', pier: 'a pier on trestles' };
const WATER_WORDS: Readonly<Record<string, string>> = { brook: 'a brook', pond: 'a pond', pool: 'a pool', lagoon: 'the lagoon' };
const PARTS: Readonly<Record<string, string>> = {
  spruce: 'spruce for a forest', pine: 'dwarf pine for a hill wood', cypress: 'cypress for poplars', apple: 'a dwarf apple for an orchard', maple: 'a small maple for an oak',
  topiary: 'clipped bushes for a park', rose: 'miniature roses for a garden wall', juniper: 'juniper for scrub', thyme: 'thyme for a meadow', star: 'small stars for a pasture',
  moss: 'moss for turf', sedum: 'stonecrop for shingle', fern: 'ferns for palms', thrift: 'thrift for a hedge', heather: 'heather for a moor', houseleek: 'houseleeks for cabbages',
  iris: 'irises for banners', grass: 'grass for reeds', allium: 'alliums for street lamps', daffodil: 'bulbs for a show', daisy: 'daisies for sunflowers', lily: 'lilies for bell towers', lavender: 'lavender for a wood',
};

/** What a plate was cut from, and what in it is life-sized. */
export function captionOf(garden: PlateParticulars): string {
  const bridge = BRIDGE_WORDS[garden.bridge];
  const water = WATER_WORDS[garden.water];
  const crossing = bridge && water && garden.bridge !== 'pier' ? `${bridge} over ${water}` : bridge ?? water;
  const block = compose(garden);
  const listedMat = garden.plants.map(formOf).find(isMat);
  const forms = [...new Set([...block.back.map(({ form }) => form), ...(listedMat ? [listedMat] : []), ...block.front.map(({ form }) => form)])]; // only what the block shows
  const order = forms.slice(0, 3).flatMap((form) => PARTS[form] ?? []);
  const parts = [...(crossing ? [crossing] : []), ...order];
  const things = block.oddments.map(({ name }) => JOKE_FACTS[name].words);
  const [first = 'boot', second] = things;
  const cutFrom = parts.length > 0 ? `Cut from the garden’s own particulars: ${listed(parts)}.` : 'Cut from the garden’s own particulars.';
  return `${cutFrom} The ${first} is life-sized${second ? `, and so is the ${second}` : ''}.`;
}
