import Link from 'next/link';
import { Sign } from '@/components/ui/sign';
import { Table } from '@/components/ui/table';
import { When } from '@/components/ui/when';
import type { ClubTime } from '@/lib/core/time';
import type { LetterRow } from '@/lib/letters/views';

/** Letters, the newest first; what a letter is leads to its words and its tries. */
export function LetterTable({ rows, club, mayOpen, empty }: { rows: readonly LetterRow[]; club: ClubTime; mayOpen: boolean; empty: React.ReactNode }) {
  return (
    <Table
      caption="Letters, the newest first"
      rows={rows}
      rowKey={(row) => row.id}
      empty={empty}
      columns={[
        { key: 'kind', head: 'Letter', names: 'row', cell: (row) => (mayOpen ? <Link className="link" href={`/office/letters/${row.id}`}>{row.kindWords}</Link> : row.kindWords) },
        { key: 'to', head: 'To', cell: (row) => <span className="break-words">{row.to}</span> },
        { key: 'made', head: 'Written', cell: (row) => <When at={row.madeAt} style="short" club={club} /> },
        { key: 'state', head: 'How it stands', cell: (row) => <LetterState row={row} club={club} /> },
      ]}
    />
  );
}

/** A letter's standing as a dated sentence. */
export function LetterState({ row, club }: { row: LetterRow; club: ClubTime }) {
  const tried = row.triedAt === null ? null : <When at={row.triedAt} style="bare" club={club} />;
  switch (row.state) {
    case 'sent': return <>sent {tried}</>;
    case 'dropped': return <>not sent: {row.detail ?? 'it was not needed any more'}</>;
    case 'waiting': return row.dueAt === null ? <>waiting</> : <>goes <When at={row.dueAt} style="bare" club={club} /></>;
    case 'failing': return (
      <span className="text-caution">
        <Sign kind="caution" /> failed {tried}{row.detail === null ? '' : `: ${row.detail}`}{row.dueAt === null ? '' : <>; next try <When at={row.dueAt} show="time" club={club} /></>}
      </span>
    );
  }
}
