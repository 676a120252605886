import Link from 'next/link';
import type { ReactNode } from 'react';
import { StandingLine } from '@/components/member/standing-line';
import { Table } from '@/components/ui/table';
import { listingHref, sortingOf, type Listing } from '@/lib/core/listing';
import type { RollLine } from '@/lib/dues/views';
import { RowLink } from './row-link';

type RollTableProps = { lines: readonly RollLine[]; asked: Listing<string>; keep: Record<string, string>; open: string | null; line: ReactNode; club: { locale: string; currency: string } };

const PATH = '/office/roll';

/** Households on the roll; a row opens to the household's line. */
export function RollTable({ lines, asked, keep, open, line, club }: RollTableProps) {
  const sorting = (key: string) => sortingOf(PATH, asked, key, keep);
  const here = (more: Record<string, string>) => listingHref(PATH, asked, {}, { ...keep, ...more });
  return (
    <Table
      caption="Households on the roll"
      rows={lines}
      rowKey={(row) => row.id}
      empty={<>Nobody on the roll answers to that. <Link className="link" href={PATH}>Show everyone</Link></>}
      columns={[
        { key: 'name', head: 'Household', names: 'row', sorting: sorting('name'), cell: (row) => <RowLink isOpen={row.id === open} href={row.id === open ? here({}) : here({ open: row.id })}>{row.name}</RowLink> },
        { key: 'number', head: 'No.', set: 'figures', sorting: sorting('number'), cell: (row) => row.memberNumber },
        { key: 'class', head: 'Class', sorting: sorting('class'), cell: (row) => row.className },
        { key: 'dues', head: 'Dues', sorting: sorting('owed'), cell: (row) => <StandingLine standing={row.standing} club={club} /> },
        { key: 'railway', head: 'Railway', cell: (row) => row.railways.join(', ') },
        { key: 'since', head: 'Since', set: 'figures', sorting: sorting('since'), cell: (row) => row.since },
      ]}
      opened={(row) => (row.id === open ? (
        <>
          {line}
          <p className="mt-2"><Link className="link inline-flex min-h-11 items-center pointer-fine:min-h-7" href={`${PATH}/${row.id}`}>The household: people, what it owes, receipts</Link></p>
        </>
      ) : null)}
    />
  );
}
