import Link from 'next/link';
import { Money } from '@/components/ui/money';
import { Table } from '@/components/ui/table';
import { When } from '@/components/ui/when';
import { showSpokenCode } from '@/lib/bookings/rules/spoken-code';
import { sortingOf, type Listing } from '@/lib/core/listing';
import type { ClubTime, Day } from '@/lib/core/time';

type Line = { code: string; name: string; email: string | null; madeAt: Date; cancelledAt: Date | null; day: string; heldOn: Day; people: number; visits: number; paidMinor: number; backMinor: number; currency: string };
type BookingTableProps = { lines: readonly Line[]; asked: Listing<string>; path: string; keep: Record<string, string>; club: ClubTime };

/** Confirmed bookings; a party's name leads to its booking. */
export function BookingTable({ lines, asked, path, keep, club }: BookingTableProps) {
  const sorting = (key: string) => sortingOf(path, asked, key, keep);
  const money = (amountMinor: number, currency: string) => <Money amountMinor={amountMinor} currency={currency} locale={club.locale} />;
  return (
    <Table
      caption="Bookings"
      rows={lines}
      rowKey={(line) => line.code}
      empty={asked.find === '' ? 'Nobody has booked yet.' : <>No party answers to that. <Link className="link" href={path}>Show every booking</Link></>}
      columns={[
        { key: 'name', head: 'Party', names: 'row', sorting: sorting('name'), cell: (line) => <Link className="link break-words" href={`${path}/${line.code}`}>{line.name}</Link> },
        { key: 'code', head: 'Code', cell: (line) => <span className="font-mono whitespace-nowrap">{showSpokenCode(line.code)}</span> },
        ...(keep['day'] === undefined ? [{ key: 'day', head: 'Open day', cell: (line: Line) => <>{line.day}, <When on={line.heldOn} style="short" club={club} /></> }] : []),
        { key: 'people', head: 'People × visits', set: 'figures', sorting: sorting('people'), cell: (line) => (line.cancelledAt === null ? `${line.people} × ${line.visits}` : 'given back') },
        { key: 'paid', head: 'Paid', set: 'figures', sorting: sorting('paid'), cell: (line) => <>{money(line.paidMinor, line.currency)}{line.backMinor === 0 ? null : <span className="block text-ink-soft">less {money(line.backMinor, line.currency)}</span>}</> },
        { key: 'made', head: 'Booked', sorting: sorting('made'), cell: (line) => <When at={line.madeAt} show="day" style="short" club={club} /> },
      ]}
    />
  );
}
