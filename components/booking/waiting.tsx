import Link from 'next/link';
import { Bill } from '@/components/layout/bill';
import { RailRule } from '@/components/ui/rail-rule';
import type { HoldView } from '@/lib/bookings/views';
import { holdBill } from './hold-body';
import { LookAgain } from './look-again';

/** While the card service's signed word is on its way: usually a second or two. */
export function Waiting({ hold }: { hold: HoldView }) {
  const { line, sums } = holdBill(hold);
  return (
    <>
      <Bill name="One moment" line={line} sums={sums} rail={<RailRule state="waiting" share={0.7} label="Waiting for the card service" />} />
      <div className="part-first mt-7 max-w-prose">
        <p role="status">We are waiting for the card service to tell us that you have paid. It usually takes a second or two, and this page looks again by itself.</p>
        <p className="mt-4">You can leave this page: once you have paid, the places are yours and a letter with the tickets follows. Have you not paid yet? <Link href="/hold" className="link">Go back to your places</Link>.</p>
        <LookAgain everySeconds={2} />
        <noscript><p className="mt-4"><a href="/hold/paid" className="link">Look again now</a></p></noscript>
      </div>
    </>
  );
}
