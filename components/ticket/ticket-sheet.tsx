import { RailRule } from '@/components/ui/rail-rule';
import type { TicketSheetView } from '@/lib/bookings/rules/ticket-view';
import { TicketPair } from './ticket-pair';
import look from './ticket.module.css';

/** The print sheet of pasteboards, for A4 and Letter alike: who, what, the way, and the cards with their cut lines and folds. */
export function TicketSheet({ sheet: { clubName, to, title, letter, directions, tickets } }: { sheet: TicketSheetView }) {
  return (
    <div className={look['sheet']}>
      <p className="flex flex-wrap items-baseline justify-between gap-x-6">
        <b className="font-heading text-2xl font-bold">{clubName}</b>
        <em className="text-xl">to {to}</em>
      </p>
      <h1 className={`mt-3 text-4xl font-black tracking-tight ${look['title']}`}>{title}</h1>
      <p className="mt-2 max-w-none">{letter}</p>
      <RailRule trainAt={0.86} coaches={2} />
      <ol className={`mt-4 ${look['directions']}`}>
        {directions.map((each) => (
          <li key={`${each.time} ${each.shortName}`}>
            <b className="font-heading block text-2xl leading-none font-extrabold tracking-tight">{each.time}<br />{each.shortName}</b>
            <span className="mt-1 block">{each.place}</span>
            {each.note === null ? null : <span className="block">{each.note}</span>}
            {each.journey === null ? null : <em className="block">{each.journey}</em>}
          </li>
        ))}
      </ol>
      <p className="mt-3 hidden max-w-none print:block"><em>Cut on the dashes, fold on the dots, and each card has its code on its back.</em></p>
      <h2 className="sr-only">Tickets</h2>
      <div className={`mt-5 ${look['pairs']}`}>
        {tickets.map((ticket) => <TicketPair key={ticket.visitId} ticket={ticket} />)}
      </div>
    </div>
  );
}
