import type { Metadata } from 'next';
import Link from 'next/link';
import { Bill } from '@/components/layout/bill';
import { StandingLine } from '@/components/member/standing-line';
import { FindForm } from '@/components/office/find-form';
import { Pages } from '@/components/office/pages';
import { RollSums } from '@/components/office/roll-sums';
import { Table } from '@/components/ui/table';
import { sortingOf } from '@/lib/core/listing';
import { dayOf, formatDay } from '@/lib/core/time';
import { rollLines, rollSums } from '@/lib/dues/roll-queries';
import { rollInput } from '@/lib/dues/schema';
import { pageContext } from '@/lib/web/context';
import { OfficePage } from '../office-page';

export const metadata: Metadata = { title: 'The roll', robots: { index: false } };

export default async function RollPage({ searchParams }: { searchParams: Promise<Record<string, string | string[] | undefined>> }) {
  const ctx = await pageContext('roll.see');
  const asked = rollInput.parse(await searchParams);
  const [{ lines, total }, sums] = [await rollLines(ctx, asked), await rollSums(ctx)];
  const keep: Record<string, string> = asked.standing === 'all' ? {} : { standing: asked.standing };
  const sorting = (key: string) => sortingOf('/office/roll', asked, key, keep);
  const today = formatDay(dayOf(ctx.now, ctx.club.timeZone), ctx.club);
  return (
    <OfficePage ctx={ctx} here="/office/roll" bill={<Bill name="The roll" line={`As it stands on ${today}`} sums={<RollSums sums={sums} shown={asked.standing} />} />} foot={<Link className="link" href={`/office/roll/csv?${new URLSearchParams({ find: asked.find, standing: asked.standing, sort: asked.sort, order: asked.order })}`} prefetch={false}>Take this list as a CSV file</Link>}>
      <h2>Households</h2>
      <FindForm path="/office/roll" label="Name, railway, street or number" find={asked.find} submit="Look on the roll" keep={keep} />
      <Table
        caption="Households on the roll"
        rows={lines}
        rowKey={(line) => line.id}
        empty={<>Nobody on the roll answers to that. <Link className="link" href="/office/roll">Show everyone</Link></>}
        columns={[
          { key: 'name', head: 'Household', names: 'row', sorting: sorting('name'), cell: (line) => <Link className="link" href={`/office/roll/${line.id}`}>{line.name}</Link> },
          { key: 'number', head: 'No.', set: 'figures', sorting: sorting('number'), cell: (line) => line.memberNumber },
          { key: 'class', head: 'Class', sorting: sorting('class'), cell: (line) => line.className },
          { key: 'dues', head: 'Dues', cell: (line) => <StandingLine standing={line.standing} club={ctx.club} /> },
          { key: 'railway', head: 'Railway', cell: (line) => line.railways.join(', ') },
          { key: 'since', head: 'Since', set: 'figures', sorting: sorting('since'), cell: (line) => line.since },
        ]}
      />
      <Pages path="/office/roll" listing={asked} what="households" shown={lines.length} total={total} keep={keep} />
    </OfficePage>
  );
}
