import Link from 'next/link';
import { Pegs } from '@/components/drawing/pegs';
import { LinkButton } from '@/components/ui/link-button';
import { Notice } from '@/components/ui/notice';
import type { TimesView, TimeView } from '@/lib/gardens/views';

/** The times of one garden at the next open day. A time leads to the board with that time chosen. */
export function TimesList({ day }: { day: TimesView }) {
  if (day.isCalledOff)
    return (
      <Notice tone="caution" word="Called off" as="standing">
        {day.note ?? `${day.dayTitle} does not take place.`}
      </Notice>
    );
  if (day.times.length === 0) return <p>The times are not set yet. They stand here as soon as they are.</p>;
  return (
    <>
      <ol className="border-y-4 border-ink">
        {day.times.map((time) => (
          <li key={time.entryTimeId} className="grid min-h-14 grid-cols-[5.4rem_1fr] items-center border-t border-rule first:border-t-0">
            <Time time={time} />
          </li>
        ))}
      </ol>
      <p className="mt-4 flex flex-col">
        <LinkButton tone="main" href={day.href}>
          All gardens and times
        </LinkButton>
      </p>
    </>
  );
}

const clock = 'figures text-[1.1667rem] font-semibold';

function Time({ time }: { time: TimeView }) {
  if (time.kind === 'over' || time.kind === 'full')
    return (
      <>
        <span className={`${clock} text-ink-soft`}>{time.text}</span>
        <span className="pl-3.5 text-ink-soft">{time.kind === 'over' ? 'over' : '— full'}</span>
      </>
    );
  return (
    <>
      <span className={clock}>{time.text}</span>
      <Link href={time.href} aria-label={time.spoken} className="edged my-1 flex min-h-12 items-center gap-2.5 px-3.5 hover:border-damson">
        <span className={clock}>{time.places}</span> left
        {time.kind === 'few' ? (
          <span className="ml-auto md:hidden lg:inline large-print:inline">
            <Pegs count={time.places} />
          </span>
        ) : null}
      </Link>
    </>
  );
}
