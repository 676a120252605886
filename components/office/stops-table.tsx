import Link from 'next/link';
import { NipCard } from '@/components/drawing/nip';
import { Table } from '@/components/ui/table';
import type { OfficeStop } from '@/lib/opendays/office-views';

/** The stops of an open day with their sums; a stop's name leads to its entry times. */
export function StopsTable({ stops, path }: { stops: readonly OfficeStop[]; path: string }) {
  return (
    <Table
      caption="The stops of this open day"
      rows={stops}
      rowKey={(stop) => stop.id}
      rowId={(stop) => `stop-${stop.number}`}
      empty="No garden takes part yet."
      columns={[
        { key: 'number', head: 'Stop', cell: (stop) => <span className="flex items-baseline gap-2"><NipCard stopNumber={stop.number} width={38} />{stop.number}</span> },
        { key: 'garden', head: 'Garden', names: 'row', cell: (stop) => <Link className="link" href={`${path}/stops/${stop.number}`}>{stop.garden}</Link> },
        { key: 'times', head: 'Entry times', set: 'figures', cell: (stop) => stop.times.length },
        { key: 'places', head: 'Places taken', set: 'figures', cell: (stop) => (stop.times.length === 0 ? 'none yet' : `${stop.taken} of ${stop.capacity}`) },
        { key: 'people', head: 'People', set: 'figures', cell: (stop) => stop.people },
        { key: 'stay', head: 'Stay', set: 'figures', cell: (stop) => `${stop.stayMinutes} min` },
        { key: 'limit', head: 'At once', set: 'figures', cell: (stop) => stop.headsLimit },
      ]}
    />
  );
}
