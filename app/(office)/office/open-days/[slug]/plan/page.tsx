import type { Metadata } from 'next';
import Link from 'next/link';
import { Bill } from '@/components/layout/bill';
import { Part } from '@/components/layout/columns';
import { FactForm, OpenDayChangeForm, StopForm } from '@/components/office/open-day-forms';
import { When } from '@/components/ui/when';
import { decimalText, minorDigits } from '@/lib/core/money';
import { wallTime } from '@/lib/core/time';
import { gardensToAdd } from '@/lib/opendays/office-queries';
import { pageContext } from '@/lib/web/context';
import { addStopAction, changeOpenDayAction, publishOpenDayAction } from '../../actions';
import { DayCopy, getDayCopy } from '../../day-copy';

export const metadata: Metadata = { title: 'Words, hours and prices', robots: { index: false } };

export default async function PlanPage({ params }: { params: Promise<{ slug: string }> }) {
  const ctx = await pageContext('openDays.edit');
  const { club } = ctx;
  const copy = await getDayCopy(ctx, (await params).slug);
  const { day, stops } = copy;
  const gardens = await gardensToAdd(ctx, day.id);
  const price = (amountMinor: number) => decimalText(amountMinor, minorDigits(club.currency));
  const time = (at: Date) => wallTime(at, club.timeZone);
  const free = [...Array(14).keys()].map((index) => index + 1).find((number) => !stops.some((stop) => stop.number === number));
  return (
    <DayCopy ctx={ctx} copy={copy} here={`/office/open-days/${day.slug}/plan`} bill={<Bill name={day.title} line={<>Words, hours, prices and gardens for <When on={day.heldOn} club={club} /></>} />}>
      <Part title="For everyone to see" place="first" id="publish">
        {day.publishedAt === null
          ? <FactForm action={publishOpenDayAction} name="openDayId" value={day.id} submit="Publish the day and open its booking" tone="main" />
          : <p>Published on <When at={day.publishedAt} show="day" club={club} />. <Link className="link" href={`/open-days/${day.slug}`}>See what visitors see</Link></p>}
      </Part>
      <Part title="Add a garden" id="add">
        {gardens.length === 0 || free === undefined
          ? <p>Every published garden takes part already, or all fourteen numbers are given.</p>
          : <StopForm action={addStopAction} openDayId={day.id} number={free} gardens={gardens.map((garden) => ({ value: garden.id, label: `${garden.name} (${garden.headsLimit} people at once)` }))} />}
      </Part>
      <Part title="Words, hours and prices">
        <p className="mb-4 text-ink-soft">Places already kept or paid for keep the price they had.</p>
        <OpenDayChangeForm
          action={changeOpenDayAction}
          openDayId={day.id}
          day={{ title: day.title, placeLine: day.placeLine, howToCome: day.howToCome ?? '', heldOn: day.heldOn, opensAt: time(day.opensAt), closesAt: time(day.closesAt), adult: price(day.adultMinor), child: price(day.childMinor), babe: price(day.babeMinor), partyPeopleMax: day.partyPeopleMax === null ? '' : String(day.partyPeopleMax) }}
        />
      </Part>
    </DayCopy>
  );
}
