import { Notice } from '@/components/ui/notice';
import { numbered } from '@/components/layout/garden-margin';
import type { OpenDayPage } from '@/lib/opendays/views';

/** How to come, and the usual cautions of the day with the gardens they are about. */
export function TakeCare({ cautions, howToCome, count }: { cautions: OpenDayPage['cautions']; howToCome: string | null; count: number }) {
  return (
    <section className="mt-9 grid gap-x-9 gap-y-6 border-t border-edge pt-5 md:grid-cols-2 large-print:grid-cols-1">
      {howToCome === null ? null : (
        <div>
          <h2>How to come</h2>
          <p className="mt-3 whitespace-pre-line">{howToCome}</p>
        </div>
      )}
      {cautions.length === 0 ? null : <div>
        <h2>Take care</h2>
        <div className="mt-3">
          <Notice tone="caution" as="standing" word={null}>
            <ul className="grid list-none gap-2 p-0">
              {cautions.map(({ sentence, gardens }) => <li key={sentence}>{sentence} <i>{gardens.length === count ? 'All gardens' : capital(numbered(gardens))}.</i></li>)}
              <li>Each host keeps to the local codes; what they say on the day comes first.</li>
            </ul>
          </Notice>
        </div>
      </div>}
    </section>
  );
}

const capital = (words: string) => words.charAt(0).toUpperCase() + words.slice(1);
