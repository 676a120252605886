import type { Metadata } from 'next';
import { Part } from '@/components/layout/columns';
import { CsvLink } from '@/components/office/csv-link';
import { DayBill } from '@/components/office/day-bill';
import { PlanNoteForm } from '@/components/office/open-day-forms';
import { PlacesTable } from '@/components/office/places-table';
import { StopsTable } from '@/components/office/stops-table';
import { When } from '@/components/ui/when';
import { placesByTime, sumsOf } from '@/lib/opendays/office-views';
import { toSettle } from '@/lib/opendays/rules/settle';
import { may } from '@/lib/people/rules/capabilities';
import { pageContext } from '@/lib/web/context';
import { addPlanNoteAction } from '../actions';
import { DayCopy, getDayCopy } from '../day-copy';

export const metadata: Metadata = { title: 'Open day', robots: { index: false } };

export default async function OfficeDayPage({ params }: { params: Promise<{ slug: string }> }) {
  const ctx = await pageContext('openDays.see');
  const { club, now } = ctx;
  const copy = await getDayCopy(ctx, (await params).slug);
  const { day, stops } = copy;
  const path = `/office/open-days/${day.slug}`;
  const mayEdit = may(ctx.actor.roles, 'openDays.edit');
  const rows = placesByTime(stops);
  return (
    <DayCopy
      ctx={ctx}
      copy={copy}
      here={path}
      bill={<DayBill day={day} stops={stops.length} sums={sumsOf(stops)} isOver={day.closesAt <= now} club={club} />}
      toSettle={(mayEdit ? toSettle(day, stops, now) : []).map(({ id, by, sentence, href, label }) => ({
        id, sentence, by: by === null ? 'now' : <When on={by} style="bare" club={club} />, link: { href, label }, weight: by === null ? 'now' : 'usual',
      }))}
      foot="Every change on this sheet is in the audit trail."
    >
      <Part title="Stops" place="first">
        <StopsTable stops={stops} path={path} />
      </Part>
      <Part title="Places by time">
        {rows.length === 0 ? <p>No garden has an entry time yet.</p> : <PlacesTable rows={rows} stops={stops} club={club} />}
        <p className="mt-3"><CsvLink href={`${path}/csv`} what="the entry times" /></p>
      </Part>
      {mayEdit ? (
        <Part title="In pencil" id="pencil">
          <PlanNoteForm action={addPlanNoteAction} openDayId={day.id} />
        </Part>
      ) : null}
    </DayCopy>
  );
}
