import { Table } from '@/components/ui/table';
import { When } from '@/components/ui/when';
import type { FormAction } from '@/lib/core/form-state';
import { minutesBetween, wallTime, type ClubTime } from '@/lib/core/time';
import type { OfficeTime } from '@/lib/opendays/office-views';
import { EntryTimeChangeForm, FactForm } from './open-day-forms';
import { RowLink } from './row-link';

type StopTimesTableProps = { times: readonly OfficeTime[]; path: string; open: string | null; mayEdit: boolean; club: ClubTime; change: FormAction; close: FormAction; reopen: FormAction };

/** The entry times of a stop; each row opens to what can be done with it. */
export function StopTimesTable({ times, path, open, mayEdit, club, change, close, reopen }: StopTimesTableProps) {
  const start = (time: OfficeTime) => <When at={time.opensAt} show="time" club={club} />;
  return (
    <Table
      caption="Entry times of this stop"
      rows={times}
      rowKey={(time) => time.id}
      rowId={(time) => `time-${time.id}`}
      empty="No entry time yet. Make them below, one or a whole row at once."
      columns={[
        { key: 'start', head: 'Start', names: 'row', cell: (time) => (mayEdit ? <RowLink isOpen={time.id === open} href={time.id === open ? path : `${path}?open=${time.id}`}><span className="font-mono">{start(time)}</span><span className="sr-only">, change or close it</span></RowLink> : <span className="font-mono">{start(time)}</span>) },
        { key: 'until', head: 'In until', set: 'figures', cell: (time) => <When at={time.graceUntil} show="time" club={club} /> },
        { key: 'taken', head: 'Places taken', set: 'figures', cell: (time) => `${time.taken} of ${time.capacity}` },
        { key: 'held', head: 'Kept', set: 'figures', cell: (time) => (time.held === 0 ? '' : time.held) },
        { key: 'walk-ups', head: 'Set aside', set: 'figures', cell: (time) => (time.walkUps === 0 ? '' : time.walkUps) },
        { key: 'people', head: 'People', set: 'figures', cell: (time) => time.people },
        { key: 'state', head: 'How it stands', cell: (time) => (time.closedAt !== null ? 'closed to new parties' : time.taken >= time.capacity ? 'full' : 'open') },
      ]}
      opened={(time) => (time.id === open ? <OpenTime time={time} club={club} change={change} close={close} reopen={reopen} /> : null)}
    />
  );
}

function OpenTime({ time, club, change, close, reopen }: { time: OfficeTime; club: ClubTime; change: FormAction; close: FormAction; reopen: FormAction }) {
  return (
    <div className="grid gap-6 border-l-2 border-damson pl-4">
      <EntryTimeChangeForm action={change} time={{ id: time.id, opensAt: wallTime(time.opensAt, club.timeZone), graceMinutes: minutesBetween(time.opensAt, time.graceUntil), capacity: time.capacity }} />
      {time.closedAt === null
        ? <FactForm action={close} name="entryTimeId" value={time.id} submit="Close it to new parties" />
        : <FactForm action={reopen} name="entryTimeId" value={time.id} submit="Open it again" />}
    </div>
  );
}
