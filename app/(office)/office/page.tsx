import type { Metadata } from 'next';
import { Bill } from '@/components/layout/bill';
import { Part } from '@/components/layout/columns';
import { DaysTable } from '@/components/office/days-table';
import { RollSums } from '@/components/office/roll-sums';
import { refundsOpen } from '@/lib/books/queries';
import { dayOf } from '@/lib/core/time';
import { rollSums } from '@/lib/dues/roll-queries';
import { letterPage } from '@/lib/letters/queries/list';
import { letterListInput } from '@/lib/letters/schema';
import { officeOpenDays } from '@/lib/opendays/office-queries';
import { may } from '@/lib/people/rules/capabilities';
import { officeWaiting } from '@/lib/people/rules/office-waiting';
import { pageContext } from '@/lib/web/context';
import { OfficePage } from './office-page';

export const metadata: Metadata = { title: 'The office', robots: { index: false } };

export default async function OfficeHome() {
  const ctx = await pageContext('officer');
  const { actor, club } = ctx;
  const today = dayOf(ctx.now, club.timeZone);
  const failing = may(actor.roles, 'letters.see') ? (await letterPage(ctx, letterListInput.parse({ state: 'failing' }))).total : 0;
  const stuck = may(actor.roles, 'books.see') ? (await refundsOpen(ctx)).filter((refund) => refund.isByHandDue).length : 0;
  const sums = may(actor.roles, 'roll.see') ? await rollSums(ctx) : null;
  const coming = may(actor.roles, 'openDays.see') ? (await officeOpenDays(ctx)).filter((day) => day.heldOn >= today).reverse() : null;
  return (
    <OfficePage
      ctx={ctx}
      here="/office"
      bill={<Bill name="The office" line={`${actor.name}, ${actor.roles.join(' and ')}`} {...(sums === null ? {} : { sums: <RollSums sums={sums} shown={null} /> })} />}
      toSettle={officeWaiting({ failing, stuck, lapsed: sums?.by.lapsed ?? 0, unpublished: (coming ?? []).filter((day) => day.publishedAt === null) }).map(({ href, label, ...item }) => ({ ...item, by: 'now', link: { href, label } }))}
    >
      {coming === null ? null : (
        <Part title="Open days to come" place="first">
          <DaysTable days={coming} today={today} club={club} empty="No open day is planned yet." />
        </Part>
      )}
    </OfficePage>
  );
}
