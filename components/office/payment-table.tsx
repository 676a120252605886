import Link from 'next/link';
import { Money } from '@/components/ui/money';
import { Table } from '@/components/ui/table';
import { When } from '@/components/ui/when';
import type { ClubTime, Day } from '@/lib/core/time';
import type { Method } from '@/lib/core/words';
import { receiptNumber } from '@/lib/dues/views';

type Payment = { id: string; year: number; number: number; method: Method; amountMinor: number; receivedOn: Day; backMinor: number };
type PaymentTableProps = { rows: readonly Payment[]; mayOpen: boolean; club: ClubTime & { currency: string }; empty: string };

/** Payments of one party; the receipt leads to giving money back. */
export function PaymentTable({ rows, mayOpen, club, empty }: PaymentTableProps) {
  const money = (amountMinor: number) => <Money amountMinor={amountMinor} currency={club.currency} locale={club.locale} />;
  return (
    <Table
      caption="Payments of this party"
      rows={rows}
      rowKey={(row) => row.id}
      empty={empty}
      columns={[
        { key: 'number', head: 'Receipt', names: 'row', cell: (row) => (mayOpen ? <Link className="link" href={`/office/books/receipts/${row.id}`}>{receiptNumber(row.year, row.number)}</Link> : receiptNumber(row.year, row.number)) },
        { key: 'on', head: 'Received', cell: (row) => <When on={row.receivedOn} style="short" club={club} /> },
        { key: 'as', head: 'As', cell: (row) => row.method },
        { key: 'amount', head: 'Amount', set: 'figures', cell: (row) => money(row.amountMinor) },
        { key: 'back', head: 'Given back', set: 'figures', cell: (row) => (row.backMinor === 0 ? '' : money(row.backMinor)) },
      ]}
    />
  );
}
