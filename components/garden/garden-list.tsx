import Link from 'next/link';
import { Post } from '@/components/drawing/post';
import { Plate } from '@/components/plate/plate';
import { LinkButton } from '@/components/ui/link-button';
import { RailRule } from '@/components/ui/rail-rule';
import type { ListedGarden } from '@/lib/gardens/views';

const LETTERS = [['s', 'live steam', 'isSteam'], ['w', 'step-free all the way round', 'isStepFree'], ['p', 'pond, pool or brook: hold small hands', 'hasWater']] as const;

/** The index beside the map, which says the same in words: where each garden is, what it is like, how many places are left. */
export function GardenIndex({ gardens }: { gardens: readonly ListedGarden[] }) {
  return (
      <ol className="border-b border-rule">
        {gardens.map((garden) => (
          <li key={garden.slug} className="relative grid grid-cols-[2.2rem_minmax(0,1fr)_auto] items-center gap-x-3 border-t border-rule py-2 first:border-t-0 first:pt-0">
            <Post stopNumber={garden.card} height={50} label={null} />
            <div className="leading-tight">
              <Link href={garden.href} className="font-heading text-[1.1667rem] font-bold text-ink after:absolute after:inset-0 hover:underline hover:underline-offset-4">
                <span className="sr-only">Garden {garden.number}, </span>
                {garden.name}
              </Link>
              <p className="text-ink-soft">{garden.area}</p>
            </div>
            <div className="text-right leading-tight">
              <Letters garden={garden} />
              {garden.places === null ? null : <p className={garden.places === 'full' ? 'text-ink-soft' : 'font-semibold'}>{garden.places}</p>}
            </div>
          </li>
        ))}
      </ol>
  );
}

/** What the letters of the index mean. */
export function LetterKey() {
  return (
    <p className="note mt-3 leading-snug">
      {LETTERS.map(([letter, words]) => (
        <span key={letter} className="mr-4 inline-block">
          <b className="figures font-bold not-italic">{letter}</b> {words}
        </span>
      ))}
    </p>
  );
}

function Letters({ garden }: { garden: ListedGarden }) {
  const held = LETTERS.filter(([, , fact]) => garden[fact]);
  return (
    <p className="note tracking-[0.2em]">
      <span aria-hidden="true">{held.map(([letter]) => letter).join(' ')}</span>
      <span className="sr-only">{held.map(([, words]) => words).join(', ')}</span>
    </p>
  );
}

/** Each garden's plate with its number, its name and what it was cut from. */
export function PlateWall({ gardens }: { gardens: readonly ListedGarden[] }) {
  return (
    <ul className="grid gap-x-7 gap-y-9 pt-8 sm:grid-cols-2 lg:grid-cols-3 large-print:grid-cols-1">
      {gardens.map((garden) => (
        <li key={garden.slug} className="relative">
          <div className="large-print:max-w-[36rem]">
            <Plate plate={garden.plate} isRepeated />
          </div>
          <div className="mt-2 grid grid-cols-[2.1rem_minmax(0,1fr)] leading-tight">
            <span className="font-heading text-[1.3333rem] font-extrabold tracking-[-0.04em]">{garden.number}</span>
            <div>
              <Link href={garden.href} className="font-heading text-[1.3333rem] leading-tight font-bold tracking-[-0.02em] text-ink after:absolute after:inset-0 hover:underline hover:underline-offset-4">
                {garden.name}
              </Link>
              <p className="note mt-1 leading-snug">{garden.line}</p>
              {garden.places === null ? null : <p className={garden.places === 'full' ? 'text-ink-soft' : 'font-semibold'}>{garden.places}</p>}
            </div>
          </div>
        </li>
      ))}
    </ul>
  );
}

/** No garden fits what was asked: sleepers without rails, and what to loosen first. */
export function NoGardens({ isNarrowed }: { isNarrowed: boolean }) {
  return (
    <section className="max-w-2xl py-8" aria-label="Nothing to show">
      <h2>{isNarrowed ? 'No garden is all of that at once' : 'No garden is shown yet'}</h2>
      <RailRule state="empty" />
      <p className="mt-4">
        {isNarrowed ? 'The sleepers are down; the rails want fewer wishes. Leave out the places, or the scale, and look again.' : 'The sleepers are down. The first garden appears here when its host says it may.'}
      </p>
      {isNarrowed ? (
        <p className="mt-4">
          <LinkButton href="/gardens">Show all the gardens</LinkButton>
        </p>
      ) : null}
    </section>
  );
}
