import type { Metadata } from 'next';
import Link from 'next/link';
import { Bill } from '@/components/layout/bill';
import { LinkButton } from '@/components/ui/link-button';
import { Money } from '@/components/ui/money';
import { RailRule } from '@/components/ui/rail-rule';
import { Table } from '@/components/ui/table';
import { When } from '@/components/ui/when';
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
  const stateOf = (day: (typeof days)[number]) => (day.calledOffAt !== null ? 'called off' : day.publishedAt === null ? 'not published' : day.heldOn < today ? 'over' : 'published');
  return (
    <OfficePage
      ctx={ctx}
      here="/office/open-days"
      bill={<Bill name="Open days" line="Each with its gardens, its entry times and its parties" sums={`${counted(coming, 'open day is', 'open days are')} to come, ${counted(days.length - coming, 'is', 'are')} over.`} {...(days.length === 0 ? { rail: <RailRule state="empty" /> } : {})} />}
    >
      <h2 className="mb-3">All open days</h2>
      <Table
        caption="All open days, the latest first"
        rows={days}
        rowKey={(day) => day.id}
        empty="No open day is made yet. Make the first one below; nobody sees it until you publish it."
        columns={[
          { key: 'title', head: 'Open day', names: 'row', cell: (day) => <Link className="link" href={`/office/open-days/${day.slug}`}>{day.title}</Link> },
          { key: 'on', head: 'Held on', cell: (day) => <When on={day.heldOn} style="short" club={club} /> },
          { key: 'state', head: 'How it stands', cell: stateOf },
          { key: 'stops', head: 'Stops', set: 'figures', cell: (day) => day.stops },
          { key: 'places', head: 'Places taken', set: 'figures', cell: (day) => `${day.taken} of ${day.capacity}` },
          { key: 'in', head: 'Came in', set: 'figures', cell: (day) => <Money amountMinor={day.cameInMinor} currency={club.currency} locale={club.locale} /> },
        ]}
      />
      {may(ctx.actor.roles, 'openDays.edit') ? <p className="mt-6"><LinkButton tone="main" href="/office/open-days/new">Make an open day</LinkButton></p> : null}
    </OfficePage>
  );
}
