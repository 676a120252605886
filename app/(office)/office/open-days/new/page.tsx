import type { Metadata } from 'next';
import { Bill } from '@/components/layout/bill';
import { OpenDayForm } from '@/components/office/open-day-forms';
import { addMonths, dayOf } from '@/lib/core/time';
import { pageContext } from '@/lib/web/context';
import { OfficePage } from '../../office-page';
import { makeOpenDayAction } from '../actions';

export const metadata: Metadata = { title: 'A new open day', robots: { index: false } };

export default async function NewOpenDayPage() {
  const ctx = await pageContext('openDays.edit');
  const heldOn = addMonths(dayOf(ctx.now, ctx.club.timeZone), 3);
  return (
    <OfficePage ctx={ctx} here="/office/open-days" bill={<Bill name="A new open day" line="Nobody sees it until you publish it; gardens and entry times come next" />}>
      <OpenDayForm action={makeOpenDayAction} day={{ title: '', placeLine: '', howToCome: '', heldOn, opensAt: '10:00', closesAt: '16:00', adult: '8.00', child: '4.00', babe: '0', partyPeopleMax: '' }} />
    </OfficePage>
  );
}
