import Link from 'next/link';
import { Post } from '@/components/drawing/post';
import { Plate } from '@/components/plate/plate';
import { LinkButton } from '@/components/ui/link-button';
import { RailRule } from '@/components/ui/rail-rule';
import type { ListedGarden } from '@/lib/gardens/views';

/** The index beside the map: it says the same in words, with each garden's plate. */
export function GardenList({ gardens }: { gardens: readonly ListedGarden[] }) {
  return (
    <ol className="border-b border-rule">
      {gardens.map((garden) => (
        <li key={garden.slug} className="relative grid grid-cols-[3rem_minmax(0,1fr)] gap-x-3 gap-y-3 border-t border-rule py-4 first:border-t-0 first:pt-1 sm:grid-cols-[3rem_minmax(0,1fr)_10.5rem] large-print:grid-cols-[4rem_minmax(0,1fr)]">
          <Post stopNumber={garden.card} height={66} label={null} />
          <div>
            <h2 className="text-[1.3333rem] leading-tight font-bold">
              <span className="sr-only">{garden.number}. </span>
              <Link href={garden.href} className="text-ink hover:underline hover:decoration-[2px] hover:underline-offset-4 after:absolute after:inset-0">
                {garden.name}
              </Link>
            </h2>
            <p className="note mt-0.5 leading-snug">{garden.subtitle}</p>
            <p className="mt-1 leading-snug">{garden.line}</p>
            <p className="leading-snug text-ink-soft">
              {garden.area}
              {garden.isStepFree ? ', step-free' : ''}
              {garden.hasWater ? ', water' : ''}
            </p>
            {garden.places === null ? null : <p className="leading-snug font-semibold">{garden.places}</p>}
          </div>
          <div className="col-span-2 sm:col-span-1 large-print:col-span-2">
            <Plate plate={garden.plate} isRepeated />
          </div>
        </li>
      ))}
    </ol>
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
