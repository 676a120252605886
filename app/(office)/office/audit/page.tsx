import type { Metadata } from 'next';
import { Bill } from '@/components/layout/bill';
import { CsvLink } from '@/components/office/csv-link';
import { FindForm } from '@/components/office/find-form';
import { Pages } from '@/components/office/pages';
import { Table } from '@/components/ui/table';
import { When } from '@/components/ui/when';
import { RailRule } from '@/components/ui/rail-rule';
import { auditPage } from '@/lib/club/audit-queries';
import { auditInput } from '@/lib/club/schema';
import { changeSentence } from '@/lib/club/rules/change-sentence';
import { sortingOf } from '@/lib/core/listing';
import { counted } from '@/lib/opendays/rules/words';
import { pageContext } from '@/lib/web/context';
import { OfficePage } from '../office-page';

export const metadata: Metadata = { title: 'Audit trail', robots: { index: false } };

const PATH = '/office/audit';

export default async function AuditPage({ searchParams }: { searchParams: Promise<Record<string, string | string[] | undefined>> }) {
  const ctx = await pageContext('audit.see');
  const listing = auditInput.parse(await searchParams);
  const { rows, total } = await auditPage(ctx, listing);
  return (
    <OfficePage ctx={ctx} here={PATH} bill={<Bill name="Audit trail" line="Who changed what, and when; nothing here can be edited" sums={`${counted(total, 'line', 'lines')}.`} {...(total === 0 && listing.find === '' ? { rail: <RailRule state="empty" /> } : {})} />}>
      <FindForm path={PATH} label="Action, address or kind" find={listing.find} submit="Look" />
      <Table
        caption="The audit trail"
        rows={rows}
        rowKey={(row) => row.id}
        empty={listing.find === '' ? 'Nothing has been changed yet.' : 'No line says that. Try fewer words.'}
        columns={[
          { key: 'at', head: 'When', sorting: sortingOf(PATH, listing, 'at'), cell: (row) => <When at={row.at} style="short" club={ctx.club} /> },
          { key: 'who', head: 'Who', cell: (row) => row.email ?? row.actorKind },
          { key: 'what', head: 'What', names: 'row', cell: (row) => row.action },
          { key: 'on', head: 'On', cell: (row) => row.subjectKind },
          { key: 'change', head: 'Before and after', cell: (row) => changeSentence(row.before, row.after, ctx.club) },
        ]}
      />
      <Pages path={PATH} listing={listing} what="lines" shown={rows.length} total={total} />
      <p className="mt-4"><CsvLink href={`${PATH}/csv?${new URLSearchParams({ find: listing.find, order: listing.order })}`} what="these lines" /></p>
    </OfficePage>
  );
}
