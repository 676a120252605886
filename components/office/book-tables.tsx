import Link from 'next/link';
import type { ReactNode } from 'react';
import { Money } from '@/components/ui/money';
import { Sign } from '@/components/ui/sign';
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
        ...(rows.some((row) => row.on !== null) ? [{ key: 'on', head: 'Held on', cell: (row: Income) => (row.on === null ? '' : <When on={row.on} club={club} style="short" />) }] : []),
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
        { key: 'number', head: 'Receipt', names: 'row', sorting: sortingOf(path, asked, 'number'), cell: (row) => <Link className="link" href={`${path}/receipts/${row.id}`}>{receiptNumber(row.year, row.number)}</Link> },
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

export type Refund = { id: string; amountMinor: number; reason: string; askedAt: Date; tries: number; doneAt: Date | null; failedAt: Date | null; byHand: boolean; isByHandDue: boolean };
type RefundTableProps = { caption: string; rows: readonly Refund[]; club: Club; empty: string; /** The form for one that must be paid out by hand. */ settle?: (refund: Refund) => ReactNode };

/** Refunds with how far each has come; one that must be paid out by hand opens to the form for it. */
export function RefundTable({ caption, rows, club, empty, settle }: RefundTableProps) {
  return (
    <Table
      caption={caption}
      rows={rows}
      rowKey={(row) => row.id}
      empty={empty}
      columns={[
        { key: 'asked', head: 'When', names: 'row', cell: (row) => <When at={row.askedAt} club={club} style="short" /> },
        { key: 'why', head: 'Why', cell: (row) => row.reason },
        { key: 'how', head: 'So far', cell: (row) => <RefundState refund={row} club={club} /> },
        { key: 'amount', head: 'Amount', set: 'figures', cell: (row) => <Amount minor={row.amountMinor} club={club} /> },
      ]}
      opened={(row) => (settle !== undefined && row.isByHandDue ? settle(row) : null)}
    />
  );
}

function RefundState({ refund, club }: { refund: Refund; club: Club }) {
  if (refund.byHand) return <>paid out by hand</>;
  if (refund.failedAt !== null) return <span className="text-danger"><Sign kind="danger" /> the card service would not: pay it another way</span>;
  if (refund.isByHandDue) return <span className="text-caution"><Sign kind="caution" /> to pay out by hand</span>;
  if (refund.doneAt !== null) return <>gone <When at={refund.doneAt} show="day" style="bare" club={club} /></>;
  return <>{refund.tries === 0 ? 'on its way' : `tried ${refund.tries} times, tried again`}</>;
}

const KINDS: Record<string, string> = {
  received: 'money came in', unplaced: 'money without places', 'refund-owed': 'to give back', 'refund-paid': 'given back', 'refund-failed': 'a refund came back', fee: 'card fee', reversal: 'reversed',
};
type Entry = { id: string; kind: string; happenedOn: Day; to: string[]; from: string[]; amountMinor: number };

/** The journal's newest entries: what happened, from where to where. */
export function JournalTable({ rows, club }: { rows: readonly Entry[]; club: Club }) {
  return (
    <Table
      caption="The newest entries of the journal"
      rows={rows}
      rowKey={(row) => row.id}
      empty="Nothing is booked yet."
      columns={[
        { key: 'on', head: 'Day', cell: (row) => <When on={row.happenedOn} style="short" club={club} /> },
        { key: 'kind', head: 'What', names: 'row', cell: (row) => KINDS[row.kind] ?? row.kind },
        { key: 'from', head: 'From', cell: (row) => row.from.join(', ') },
        { key: 'to', head: 'To', cell: (row) => row.to.join(', ') },
        { key: 'amount', head: 'Amount', set: 'figures', cell: (row) => <Amount minor={row.amountMinor} club={club} /> },
      ]}
    />
  );
}
