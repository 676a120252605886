import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { BRIDGES, HEIGHT, WIDTH } from '@/lib/gardens/rules/plate/block';
import { captionOf } from '@/lib/gardens/rules/plate/caption';
import { compose, type PlateParticulars } from '@/lib/gardens/rules/plate/compose';
import { formOf, halfWidthCm } from '@/lib/gardens/rules/plate/forms';
import { JOKE_FACTS, JOKE_NAMES } from '@/lib/gardens/rules/plate/jokes';
import { CARD_INKS, cardOf, plateSvg } from '@/lib/gardens/rules/plate/plate';
import { trainLengthMeters } from '@/lib/gardens/rules/plate/stock';

const pineBarrow: PlateParticulars = {
  slug: 'pine-barrow', scaleOneTo: 22.5, powers: ['live-steam', 'battery'], bridge: 'trestle', water: 'brook', notes: { joke: 'boot', sky: 'ruled' },
  plants: [{ key: 'mother-of-thyme', drawing: 'thyme', heightMm: 50 }, { key: 'dwarf-alberta-spruce', drawing: 'spruce', heightMm: 500 }, { key: 'thrift', drawing: 'thrift', heightMm: 150 }],
};

const KEYS = ['thyme', 'dwarf-spruce', 'mugo-pine', 'apple', 'thrift', 'iris', 'fern', 'a-plant-nobody-drew', 'houseleek', 'japanese-maple', 'sedum'];
const anyGarden = fc.record({
  slug: fc.stringMatching(/^[a-z]{1,20}$/),
  scaleOneTo: fc.double({ min: 7, max: 48, noNaN: true }),
  powers: fc.subarray(['live-steam', 'battery', 'track', 'overhead', 'clockwork'] as const, { minLength: 1 }),
  bridge: fc.constantFrom(...BRIDGES, 'pier' as const),
  water: fc.constantFrom('none', 'brook', 'pond', 'pool', 'lagoon'),
  plants: fc.array(fc.record({ key: fc.constantFrom(...KEYS), drawing: fc.constant('flower'), heightMm: fc.integer({ min: 5, max: 3000 }) }), { maxLength: 8 }),
  notes: fc.record({ joke: fc.constantFrom(...JOKE_NAMES, 'no such thing'), sky: fc.constantFrom('stars', 'ruled', 'unheard of') }, { requiredKeys: [] }),
}) satisfies fc.Arbitrary<PlateParticulars>;

describe('a plate', () => {
  it('is the same each time for the same garden', () => {
    expect(plateSvg(pineBarrow, 'rose', 'x')).toBe(plateSvg({ ...pineBarrow }, 'rose', 'x'));
  });

  it('differs between two gardens with the same particulars', () => {
    expect(plateSvg(pineBarrow, 'rose', 'x')).not.toBe(plateSvg({ ...pineBarrow, slug: 'mossgill' }, 'rose', 'x'));
  });

  it('keeps its sky and its side when a plant is added', () => {
    const more = compose({ ...pineBarrow, notes: {}, plants: [...pineBarrow.plants, { key: 'iris', drawing: 'iris', heightMm: 200 }] });
    const before = compose({ ...pineBarrow, notes: {} });

    expect([more.sky, more.tintedSky, more.runsLeft]).toEqual([before.sky, before.tintedSky, before.runsLeft]);
  });

  it('can be cut from any particulars, without stray numbers', () => {
    fc.assert(fc.property(anyGarden, (garden) => {
      expect(/NaN|undefined|Infinity/.test(plateSvg(garden, cardOf(null, garden.slug), 'A & B'))).toBe(false);
    }), { numRuns: 60 });
  }, 30_000);

  it('uses two inks and paper, and nothing else', () => {
    const colours = new Set(plateSvg(pineBarrow, 'rose', 'x').match(/#[0-9a-f]{6}/g) ?? []);

    expect([...colours].sort()).toEqual(['#16241d', '#fdfdf9', CARD_INKS.rose].sort());
  });

  it('names its ids after the garden, so that two on a page never meet', () => {
    const ids = (slug: string): string[] => [...(plateSvg({ ...pineBarrow, slug }, 'rose', 'x').match(/ id="[^"]+"/g) ?? [])];

    expect(ids('pine-barrow').filter((id) => ids('mossgill').includes(id))).toEqual([]);
  });

  it('never puts a black train before a black tree', () => {
    fc.assert(fc.property(anyGarden, (garden) => {
      const block = compose(garden);
      const length = (trainLengthMeters(block.train) * 100) / block.scale;
      const [from, to] = block.runsLeft ? [block.nose, block.nose + length] : [block.nose - length, block.nose];

      for (const tree of block.back) {
        const half = halfWidthCm(tree.form, tree.heightCm) * 0.7; // the low boughs' tips may pass behind a buffer
        expect(tree.x + half < from || tree.x - half > to).toBe(true);
      }
    }), { numRuns: 200 });
  });

  it('keeps its one life-sized thing inside the block, and clear of the front row', () => {
    fc.assert(fc.property(anyGarden, (garden) => {
      const block = compose(garden);
      const thing = block.oddments[0];
      expect(thing).toBeDefined();
      if (!thing) return;
      const facts = JOKE_FACTS[thing.name];

      expect(thing.x + facts.left).toBeGreaterThanOrEqual(-3);
      expect(thing.x + facts.right).toBeLessThanOrEqual(WIDTH + 3);
      expect(thing.foot).toBeLessThanOrEqual(HEIGHT);
      for (const plant of block.front) expect(plant.x > thing.x + facts.left - 0.1 && plant.x < thing.x + facts.right + 0.1).toBe(false);
    }), { numRuns: 200 });
  });

  it('draws plants at the height the host gave, up to the room in the block', () => {
    const spruce = compose(pineBarrow).back.find((tree) => tree.form === 'spruce');

    expect(spruce?.heightCm).toBe(50);
  });
});

describe('what a plant is cut as', () => {
  it.each([
    ['dwarf-alberta-spruce', 'spruce'], ['mountain-pine', 'pine'], ['mother-of-thyme', 'thyme'], ['blue-star-creeper', 'star'], ['bell-heather', 'heather'],
    ['winter-aconite', 'daffodil'], ['miniature-rose', 'rose'], ['lily-of-the-valley', 'lily'], ['dwarf-apple', 'apple'],
  ])('%s is cut as %s', (key, form) => {
    expect(formOf({ key, drawing: 'anything', heightMm: 100 })).toBe(form);
  });

  it('is judged by height when nobody has heard of it', () => {
    const cut = [300, 100, 20].map((heightMm) => formOf({ key: 'zzz', drawing: 'zzz', heightMm }));

    expect(cut).toEqual(['topiary', 'daisy', 'thyme']);
  });
});

describe('the caption', () => {
  it('says what the block was cut from, and what is life-sized', () => {
    expect(captionOf(pineBarrow)).toMatch(/^Cut from the garden’s own particulars: a trestle over a brook, spruce for a forest, thyme for a meadow and thrift for a hedge\. The boot is life-sized/);
  });
});

describe('the card', () => {
  it('is the stop’s, and begins again from the eighth', () => {
    expect([1, 7, 8, 14].map((number) => cardOf(number, 'x'))).toEqual(['primrose', 'mint', 'primrose', 'mint']);
  });

  it('is the garden’s own where it takes no part', () => {
    expect(cardOf(null, 'pine-barrow')).toBe(cardOf(null, 'pine-barrow'));
  });
});
