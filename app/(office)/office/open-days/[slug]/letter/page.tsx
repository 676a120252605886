import type { Metadata } from 'next';
import Link from 'next/link';
import { Bill } from '@/components/layout/bill';
import { Part } from '@/components/layout/columns';
import { NoticeForm } from '@/components/office/open-day-forms';
import { counted } from '@/lib/opendays/rules/words';
import { pageContext } from '@/lib/web/context';
import { writeToPartiesAction } from '../../actions';
import { DayCopy, getDayCopy } from '../../day-copy';

export const metadata: Metadata = { title: 'A letter to parties', robots: { index: false } };

export default async function LetterToPartiesPage({ params }: { params: Promise<{ slug: string }> }) {
  const ctx = await pageContext('letters.send');
  const copy = await getDayCopy(ctx, (await params).slug);
  const { day, stops } = copy;
  return (
    <DayCopy
      ctx={ctx}
      copy={copy}
      here={`/office/open-days/${day.slug}/letter`}
      bill={<Bill name="A letter to parties" line={`${day.title}: in your own words, to everyone or to those of one garden`} sums={<>{counted(day.parties, 'party has', 'parties have')} booked. {counted(day.lettersWritten, 'letter was', 'letters were')} written about this day so far. <Link className="link" href="/office/letters">See them</Link></>} />}
    >
      <Part title="The letter" place="first">
        {day.parties === 0
          ? <p>Nobody has booked yet, so there is nobody to write to.</p>
          : <NoticeForm action={writeToPartiesAction} openDayId={day.id} stops={stops.map((stop) => ({ value: stop.id, label: `${stop.number} ${stop.garden}` }))} />}
      </Part>
    </DayCopy>
  );
}
