import type { Metadata } from 'next';
import { notFound } from 'next/navigation';
import { Bill } from '@/components/layout/bill';
import { Part } from '@/components/layout/columns';
import { EntryTimesForm, StopChangeForm, StopPricesForm } from '@/components/office/open-day-forms';
import { StopTimesTable } from '@/components/office/stop-times';
import { When } from '@/components/ui/when';
import { decimalText, minorDigits } from '@/lib/core/money';
import type { OwnPrices } from '@/lib/opendays/office-views';
import { counted } from '@/lib/opendays/rules/words';
import { may } from '@/lib/people/rules/capabilities';
import { pageContext } from '@/lib/web/context';
import { changeEntryTimeAction, changeStopAction, closeEntryTimeAction, makeEntryTimesAction, reopenEntryTimeAction, setStopPricesAction } from '../../../actions';
import { DayCopy, getDayCopy } from '../../../day-copy';

export const metadata: Metadata = { title: 'Entry times', robots: { index: false } };

type StopPageProps = { params: Promise<{ slug: string; number: string }>; searchParams: Promise<{ open?: string | string[] }> };

export default async function StopPage({ params, searchParams }: StopPageProps) {
  const ctx = await pageContext('openDays.see');
  const { slug, number } = await params;
  const { open } = await searchParams;
  const copy = await getDayCopy(ctx, slug);
  const stop = copy.stops.find((each) => String(each.number) === number);
  if (!stop) notFound();
  const path = `/office/open-days/${slug}/stops/${number}`;
  const price = (amountMinor: number | undefined) => (amountMinor === undefined ? '' : decimalText(amountMinor, minorDigits(ctx.club.currency)));
  const pricesTyped = ({ adult, child, babe }: OwnPrices) => ({ adult: price(adult), child: price(child), babe: price(babe) });
  const mayEdit = may(ctx.actor.roles, 'openDays.edit');
  return (
    <DayCopy
      ctx={ctx}
      copy={copy}
      here={path}
      bill={<Bill name={stop.garden} line={<>Stop {stop.number} of {copy.day.title}, <When on={copy.day.heldOn} club={ctx.club} /></>} sums={`${counted(stop.times.length, 'entry time', 'entry times')}, ${stop.taken} of ${stop.capacity} places taken, ${stop.people} people expected. Never more than ${stop.headsLimit} people at once; they stay about ${stop.stayMinutes} minutes.`} />}
    >
      <Part title="Entry times" place="first">
        <StopTimesTable times={stop.times} path={path} open={mayEdit && typeof open === 'string' ? open : null} mayEdit={mayEdit} club={ctx.club} change={changeEntryTimeAction} close={closeEntryTimeAction} reopen={reopenEntryTimeAction} />
      </Part>
      {mayEdit ? (
        <>
          <Part title="Make entry times"><EntryTimesForm action={makeEntryTimesAction} stopId={stop.id} headsLimit={stop.headsLimit} /></Part>
          <Part title="Prices here">
            <p className="mb-4 text-ink-soft">Empty boxes pay what the open day says. Places already kept or paid for keep the price they had.</p>
            <StopPricesForm action={setStopPricesAction} stopId={stop.id} own={pricesTyped(stop.ownPrices)} day={pricesTyped({ adult: copy.day.adultMinor, child: copy.day.childMinor, babe: copy.day.babeMinor })} />
          </Part>
          <Part title="Stay and limit"><StopChangeForm action={changeStopAction} stop={stop} /></Part>
        </>
      ) : null}
    </DayCopy>
  );
}
