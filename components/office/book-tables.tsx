import { Money } from '@/components/ui/money';
import { Table } from '@/components/ui/table';
import { When } from '@/components/ui/when';
import { sortingOf, type Listing } from '@/lib/core/listing';
import type { ClubTime, Day } from '@/lib/core/time';
import type { Method } from '@/lib/core/words';
import { receiptNumber } from '@/lib/dues/views';

type Club = ClubTime & { currency: string };
const Amount = ({ minor, club }: { minor: number; club: Club }) => <Money amountMinor={minor} currency={club.currency} locale={club.locale} />;

type Income = { id: string; name: string; on: Day | null; cameInMinor: number; feesMinor: number };

/** What came in, what the card service kept, and what is left. */
export function IncomeTable({ caption, first, rows, club }: { caption: string; first: string; rows: Income[]; club: Club }) {
  return (
    <Table
      caption={caption}
      rows={rows}
      rowKey={(row) => row.id}
      empty="Nothing yet."
      columns={[
        { key: 'name', head: first, names: 'row', cell: (row) => row.name },
        { key: 'on', head: 'Held on', cell: (row) => (row.on === null ? '' : <When on={row.on} club={club} style="short" />) },
        { key: 'in', head: 'Came in', set: 'figures', cell: (row) => <Amount minor={row.cameInMinor} club={club} /> },
        { key: 'fees', head: 'Card fees', set: 'figures', cell: (row) => <Amount minor={row.feesMinor} club={club} /> },
        { key: 'left', head: 'Left', set: 'figures', cell: (row) => <Amount minor={row.cameInMinor - row.feesMinor} club={club} /> },
      ]}
    />
  );
}

type Receipt = { id: string; year: number; number: number; method: Method; amountMinor: number; givenBackMinor: number; receivedOn: Day; reference: string | null; payer: string; isDues: boolean };

/** Receipts, sorted by the address. */
export function ReceiptTable({ rows, asked, path, club }: { rows: Receipt[]; asked: Listing<string>; path: string; club: Club }) {
  return (
    <Table
      caption="Receipts"
      rows={rows}
      rowKey={(row) => row.id}
      empty={asked.find === '' ? 'No money has come in yet.' : 'No receipt answers to that.'}
      columns={[
        { key: 'number', head: 'Receipt', names: 'row', sorting: sortingOf(path, asked, 'number'), cell: (row) => receiptNumber(row.year, row.number) },
        { key: 'on', head: 'Received', sorting: sortingOf(path, asked, 'received'), cell: (row) => <When on={row.receivedOn} club={club} style="short" /> },
        { key: 'payer', head: 'From', cell: (row) => row.payer },
        { key: 'for', head: 'For', cell: (row) => (row.isDues ? 'dues' : 'tickets') },
        { key: 'as', head: 'As', cell: (row) => (row.reference === null ? row.method : `${row.method}, ${row.reference}`) },
        { key: 'amount', head: 'Amount', set: 'figures', sorting: sortingOf(path, asked, 'amount'), cell: (row) => <Amount minor={row.amountMinor} club={club} /> },
        { key: 'back', head: 'Given back', set: 'figures', cell: (row) => (row.givenBackMinor === 0 ? '' : <Amount minor={row.givenBackMinor} club={club} />) },
      ]}
    />
  );
}

type Refund = { id: string; amountMinor: number; reason: string; askedAt: Date; tries: number; failedAt: Date | null };

/** Refunds on their way, or stuck. */
export function RefundTable({ rows, club }: { rows: Refund[]; club: Club }) {
  return (
    <Table
      caption="Refunds not yet through"
      rows={rows}
      rowKey={(row) => row.id}
      empty="None waits."
      columns={[
        { key: 'asked', head: 'Asked', names: 'row', cell: (row) => <When at={row.askedAt} club={club} style="short" /> },
        { key: 'why', head: 'Why', cell: (row) => row.reason },
        { key: 'how', head: 'So far', cell: (row) => (row.failedAt === null ? (row.tries === 0 ? 'on its way' : `tried ${row.tries} times, tried again`) : 'the card service said no: pay it another way') },
        { key: 'amount', head: 'Amount', set: 'figures', cell: (row) => <Amount minor={row.amountMinor} club={club} /> },
      ]}
    />
  );
}
