import Link from 'next/link';
import type { ReactNode } from 'react';
import { Money } from '@/components/ui/money';
import { Table } from '@/components/ui/table';
import { When } from '@/components/ui/when';
import type { ClubTime, Day } from '@/lib/core/time';

type OfficeDayLine = { id: string; slug: string; title: string; heldOn: Day; publishedAt: Date | null; calledOffAt: Date | null; stops: number; capacity: number; taken: number; cameInMinor: number };

const stateOf = (day: OfficeDayLine, today: Day) => (day.calledOffAt !== null ? 'called off' : day.publishedAt === null ? 'not published' : day.heldOn < today ? 'over' : 'published');

/** Open days with how each stands; a name leads to its staff copy. */
export function DaysTable({ days, today, club, empty }: { days: readonly OfficeDayLine[]; today: Day; club: ClubTime & { currency: string }; empty: ReactNode }) {
  return (
    <Table
      caption="Open days"
      rows={days}
      rowKey={(day) => day.id}
      empty={empty}
      columns={[
        { key: 'title', head: 'Open day', names: 'row', cell: (day) => <Link className="link" href={`/office/open-days/${day.slug}`}>{day.title}</Link> },
        { key: 'on', head: 'Held on', cell: (day) => <When on={day.heldOn} style="short" club={club} /> },
        { key: 'state', head: 'How it stands', cell: (day) => stateOf(day, today) },
        { key: 'stops', head: 'Stops', set: 'figures', cell: (day) => day.stops },
        { key: 'places', head: 'Places taken', set: 'figures', cell: (day) => (day.capacity === 0 ? 'none yet' : `${day.taken} of ${day.capacity}`) },
        { key: 'in', head: 'Came in', set: 'figures', cell: (day) => <Money amountMinor={day.cameInMinor} currency={club.currency} locale={club.locale} /> },
      ]}
    />
  );
}
