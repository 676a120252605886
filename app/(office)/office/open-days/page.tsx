import type { Metadata } from 'next';
import { Bill } from '@/components/layout/bill';
import { CsvLink } from '@/components/office/csv-link';
import { DaysTable } from '@/components/office/days-table';
import { LinkButton } from '@/components/ui/link-button';
import { RailRule } from '@/components/ui/rail-rule';
import { dayOf } from '@/lib/core/time';
import { officeOpenDays } from '@/lib/opendays/office-queries';
import { counted } from '@/lib/opendays/rules/words';
import { may } from '@/lib/people/rules/capabilities';
import { pageContext } from '@/lib/web/context';
import { OfficePage } from '../office-page';

export const metadata: Metadata = { title: 'Open days', robots: { index: false } };

export default async function OfficeOpenDaysPage() {
  const ctx = await pageContext('openDays.see');
  const { club } = ctx;
  const days = await officeOpenDays(ctx);
  const today = dayOf(ctx.now, club.timeZone);
  const coming = days.filter((day) => day.heldOn >= today).length;
  return (
    <OfficePage
      ctx={ctx}
      here="/office/open-days"
      bill={<Bill name="Open days" line="Each with its gardens, its entry times and its parties" sums={`${counted(coming, 'open day is', 'open days are')} to come, ${counted(days.length - coming, 'is', 'are')} over.`} {...(days.length === 0 ? { rail: <RailRule state="empty" /> } : {})} />}
    >
      <h2 className="mb-3">All open days</h2>
      <DaysTable days={days} today={today} club={club} empty="No open day is made yet. Make the first one; nobody sees it until you publish it." />
      {days.length === 0 ? null : <p className="mt-4"><CsvLink href="/office/open-days/csv" what="this list" /></p>}
      {may(ctx.actor.roles, 'openDays.edit') ? <p className="mt-6"><LinkButton tone="main" href="/office/open-days/new">Make an open day</LinkButton></p> : null}
    </OfficePage>
  );
}
