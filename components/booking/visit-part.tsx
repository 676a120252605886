import type { PageVisit } from '@/lib/bookings/views/booking-page';
import type { BookingActions } from './booking-actions';
import { ChangeForm, GiveBackForm } from './booking-forms';

type VisitPartProps = { visit: PageVisit; code: string; actions: Pick<BookingActions, 'giveBack' | 'change'> };

/** One visit: when, where, what to take care of; and, folded away, what may still be changed with the rule before the button. */
export function VisitPart({ visit, code, actions }: VisitPartProps) {
  const { ticket, change } = visit;
  const which = { code, visitId: visit.visitId, version: visit.version };
  return (
    <article className="grid gap-2 border-t border-rule py-4" aria-label={`${ticket.gardenName} at ${visit.at}`}>
      <h3 className="flex flex-wrap items-baseline gap-x-4">
        <span className="figures text-2xl">{visit.at}</span>
        <span>{ticket.gardenName}</span>
        <span className="font-text text-base font-normal">{ticket.peopleWords}</span>
      </h3>
      {ticket.state.kind === 'live' ? null : <p className="note">{ticket.state.words}</p>}
      {ticket.state.kind === 'given-back' ? null : <p>{visit.place}{visit.directions === null ? '' : `. ${visit.directions}`}</p>}
      {visit.cautions.length === 0 || ticket.state.kind === 'given-back' ? null : <p className="text-caution"><b>Take care.</b> {visit.cautions.join(' ')}</p>}
      {visit.ended === null ? null : <p className="note">{visit.ended}</p>}
      {change === null ? null : (
        <details className="print:hidden">
          <summary className="link inline-flex min-h-11 cursor-pointer items-center">Change or give back</summary>
          <div className="columns-ruled columns-halves mt-3">
            <div>
              <p className="mb-2">{change.rule}</p>
              <p className="mb-4"><b>Now:</b> {change.now}</p>
              <GiveBackForm action={actions.giveBack} people={change.people} {...which} />
            </div>
            <div>
              {change.others.length === 0 ? <p>No other entry time has places for you at this price that you could also reach.</p> : <ChangeForm action={actions.change} others={change.others} {...which} />}
              <p className="note mt-3">To a time at the same or a lower price. What it costs less comes back by the same rule.</p>
            </div>
          </div>
        </details>
      )}
    </article>
  );
}
