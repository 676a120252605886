import { Flower } from '@/components/drawing/flower';

export type InFlower = {
  /** A drawing's key, or the plant's common name. */
  plantKey: string;
  name: string;
  /** The stops or gardens where it flowers, by number; empty where numbers mean nothing. */
  gardens: readonly number[];
};

type GardenProps = { plants: readonly InFlower[] };

/** What is in flower on the page's day, in the right margin; on a phone one drawing and one sentence. */
export function GardenMargin({ plants }: GardenProps) {
  const [first] = plants;
  if (first === undefined) return null;
  return (
    <aside aria-label="In flower" className="garden-margin">
      <div className="hidden flex-col gap-10 lg:flex large-print:hidden">
        {plants.map((plant) => (
          <figure key={plant.name}>
            <Flower plant={plant.plantKey} width={128} height={240} />
            <figcaption className="note mt-2 leading-snug">
              {plant.name}
              <PlantGardens gardens={plant.gardens} />
            </figcaption>
          </figure>
        ))}
      </div>
      <div className="lg:hidden large-print:block">
        <OneAndASentence first={first} plants={plants} />
      </div>
    </aside>
  );
}

/** What is in flower, growing on the foot rule: for pages that already have two columns. */
export function GardenFoot({ plants }: GardenProps) {
  const [first] = plants;
  if (first === undefined) return null;
  return (
    <aside aria-label="In flower" className="mt-10">
      <div className="hidden grid-cols-[repeat(auto-fit,minmax(12rem,1fr))] items-end gap-x-6 md:grid large-print:hidden">
        {plants.slice(0, 4).map((plant) => (
          <figure key={plant.name} className="flex items-end gap-3">
            <Flower plant={plant.plantKey} width={132} height={200} />
            <figcaption className="note pb-2 leading-snug">
              {plant.name}
              <PlantGardens gardens={plant.gardens} />
            </figcaption>
          </figure>
        ))}
      </div>
      <div className="md:hidden large-print:block">
        <OneAndASentence first={first} plants={plants} />
      </div>
    </aside>
  );
}

function OneAndASentence({ first, plants }: { first: InFlower; plants: readonly InFlower[] }) {
  return (
    <div className="grid grid-cols-[auto_minmax(0,1fr)] items-end gap-4">
      <Flower plant={first.plantKey} width={112} height={170} />
      <p className="note pb-2 text-lg leading-snug">In flower: {plants.map(inOneSentence).join(', ')}.</p>
    </div>
  );
}

function PlantGardens({ gardens }: { gardens: readonly number[] }) {
  if (gardens.length === 0) return null;
  return <span className="block text-balance font-text font-semibold not-italic">{numbered(gardens)}</span>;
}

/** "garden 6", "gardens 4 and 7", "gardens 1, 4 and 7". */
export function numbered(gardens: readonly number[]): string {
  if (gardens.length === 1) return `garden ${gardens.join('')}`;
  return `gardens ${gardens.slice(0, -1).join(', ')} and ${gardens.slice(-1).join('')}`;
}

const inOneSentence = ({ name, gardens }: InFlower) => (gardens.length === 0 ? name : `${name} at ${numbered(gardens)}`);
