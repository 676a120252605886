import { NipCard } from '@/components/drawing/nip';
import { Post } from '@/components/drawing/post';
import type { BoardStop } from '@/lib/opendays/views';

const SPOKEN = { s: 'live steam', w: 'step-free all the way round', p: 'pond' } as const;

/** A garden as the board names it: its post, its railway, its lettered notes and the shape its gate nips. Drawn on the server. */
export function GardenHead({ stop }: { stop: BoardStop }) {
  return (
    <span className="grid grid-cols-[48px_minmax(0,1fr)_auto] items-center gap-3">
      <Post stopNumber={stop.number} {...(stop.minutesFromAbove === null ? {} : { minutes: stop.minutesFromAbove })} />
      <span className="min-w-0">
        <a href={`/gardens/${stop.slug}`} className="block py-1 font-heading text-[1.3333rem] leading-[1.04] font-bold tracking-tight text-balance text-ink no-underline hover:underline">
          {stop.name.replace(/ & /g, ' &\u00a0')}
        </a>
        <small className="mt-0.5 block text-[0.9444rem] leading-tight text-ink-soft">{stop.subtitle}</small>
      </span>
      <span className="grid justify-items-end gap-1.5">
        <i aria-hidden="true" className="text-[1.1rem] leading-none whitespace-nowrap">{stop.notes.join(' ')}</i>
        {stop.notes.length === 0 ? null : <span className="sr-only">{stop.notes.map((letter) => SPOKEN[letter]).join(', ')}</span>}
        <NipCard stopNumber={stop.number} />
      </span>
    </span>
  );
}
