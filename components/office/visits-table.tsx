import { NipCard } from '@/components/drawing/nip';
import type { Choice } from '@/components/ui/select';
import { Table } from '@/components/ui/table';
import { When } from '@/components/ui/when';
import type { FormAction } from '@/lib/core/form-state';
import { costMinor } from '@/lib/bookings/rules/party';
import { refundRuleWords, refundWords, type RefundRule } from '@/lib/bookings/rules/refund';
import type { ClubTime } from '@/lib/core/time';
import { partyInWords } from '@/lib/opendays/rules/prices';
import { GiveBackForPartyForm, MoveVisitForm } from './booking-forms';
import { RowLink } from './row-link';

export type OfficeVisit = {
  id: string; garden: string; number: number; opensAt: Date; adults: number; children: number; babes: number; adultMinor: number; childMinor: number; babeMinor: number;
  version: number; givenBackAt: Date | null; cameIn: number; choices: readonly Choice[];
};
type Club = ClubTime & RefundRule & { currency: string };
type VisitsTableProps = { visits: readonly OfficeVisit[]; path: string; open: string | null; mayEdit: boolean; now: Date; club: Club; move: FormAction; giveBack: FormAction };

/** A booking's visits; each opens to moving it and giving it back. */
export function VisitsTable({ visits, path, open, mayEdit, now, club, move, giveBack }: VisitsTableProps) {
  return (
    <Table
      caption="Visits of this party"
      rows={visits}
      rowKey={(visit) => visit.id}
      empty="This booking has no visit."
      columns={[
        { key: 'stop', head: 'Stop', cell: (visit) => <span className="flex items-baseline gap-2"><NipCard stopNumber={visit.number} width={38} />{visit.number}</span> },
        { key: 'garden', head: 'Garden', names: 'row', cell: (visit) => visit.garden },
        { key: 'at', head: 'At', set: 'figures', cell: (visit) => <When at={visit.opensAt} show="time" club={club} /> },
        { key: 'people', head: 'Who', cell: (visit) => (visit.adults + visit.children + visit.babes === 0 ? 'nobody' : partyInWords(visit)) },
        { key: 'state', head: 'How it stands', cell: (visit) => <State visit={visit} club={club} /> },
        { key: 'change', head: 'Change', cell: (visit) => (mayEdit && visit.givenBackAt === null && visit.cameIn === 0 ? <RowLink isOpen={visit.id === open} href={visit.id === open ? path : `${path}?open=${visit.id}`}>{visit.id === open ? 'Leave it' : 'Move or give back'}</RowLink> : '') },
      ]}
      opened={(visit) => (visit.id === open && visit.givenBackAt === null ? <OpenVisit visit={visit} now={now} club={club} move={move} giveBack={giveBack} /> : null)}
    />
  );
}

function State({ visit, club }: { visit: OfficeVisit; club: Club }) {
  if (visit.givenBackAt !== null) return <>given back on <When at={visit.givenBackAt} show="day" style="bare" club={club} /></>;
  return <>{visit.cameIn > 0 ? `${visit.cameIn} came in` : 'booked'}</>;
}

function OpenVisit({ visit, now, club, move, giveBack }: { visit: OfficeVisit; now: Date; club: Club; move: FormAction; giveBack: FormAction }) {
  const paid = { amountMinor: costMinor(visit, visit), currency: club.currency };
  return (
    <div className="grid gap-8 border-l-2 border-damson pl-4 xl:grid-cols-2">
      <section aria-label={`Give back places at ${visit.garden}`}>
        <h3>Give back</h3>
        <p className="mt-1">{refundRuleWords(visit.opensAt, club, club)}</p>
        <p className="mt-1 mb-4"><strong>All of them now: {refundWords(paid, visit.opensAt, club, club, now)}</strong></p>
        <GiveBackForPartyForm action={giveBack} visit={visit} />
      </section>
      <section aria-label={`Move the visit to ${visit.garden}`}>
        <h3>Move</h3>
        <p className="mt-1 mb-4">The party pays no more and gets nothing back; its code stays the same.</p>
        {visit.choices.length === 0 ? <p>No other entry time has room for this party.</p> : <MoveVisitForm action={move} visit={visit} choices={visit.choices} />}
      </section>
    </div>
  );
}
