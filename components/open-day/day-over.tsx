import Link from 'next/link';
import { Notice } from '@/components/ui/notice';

/** A day whose gates are shut. */
export function DayDone() {
  return (
    <section className="mt-6">
      <h2>The day is done</h2>
      <p className="mt-2">The gates are shut and the trains are in their shed. Thank you to everyone who came, and to the hosts. <Link href="/open-days">See the days to come</Link>.</p>
    </section>
  );
}

/** A day that will not run. The note is the coordinator's own. */
export function DayCalledOff({ note }: { note: string | null }) {
  return (
    <section className="mt-6">
      <h2>Called off</h2>
      <div className="mt-3">
        <Notice tone="caution" as="standing" word={null}>
          <p>This open day will not run. {note} Everyone with tickets has a letter from us that says what happens to them.</p>
        </Notice>
      </div>
      <p className="mt-4"><Link href="/open-days">See the other days</Link>.</p>
    </section>
  );
}
