import Link from 'next/link';
import type { OpenDayLine } from '@/lib/opendays/views';

/** Open days to come and open days past, each a line that leads to its page. */
export function OpenDayList({ coming, past }: { coming: readonly OpenDayLine[]; past: readonly OpenDayLine[] }) {
  return (
    <>
      <section className="pt-6">
        <h2>To come</h2>
        {coming.length === 0 ? <p className="mt-3">The sleepers are down; the first rail is a date. Look again soon, or see <Link className="link" href="/gardens">the gardens</Link>.</p> : <Days days={coming} />}
      </section>
      {past.length === 0 ? null : (
        <section className="mt-9 border-t border-edge pt-5">
          <h2>Past</h2>
          <Days days={past} />
        </section>
      )}
    </>
  );
}

function Days({ days }: { days: readonly OpenDayLine[] }) {
  return (
    <ul className="mt-4 list-none p-0">
      {days.map((day) => (
        <li key={day.slug} className="border-t border-rule py-5 last:border-b">
          <h3 className="text-[1.7rem]"><a href={`/open-days/${day.slug}`} className="link inline-flex min-h-11 items-center">{day.title}</a></h3>
          <p className="note mt-1 max-w-none text-[1.1667rem] leading-snug">{day.line}</p>
          <p className="mt-1 max-w-none">{day.phase === 'called-off' ? `Called off. ${day.note ?? ''}` : day.sums}</p>
        </li>
      ))}
    </ul>
  );
}
