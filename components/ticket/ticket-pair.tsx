import type { TicketView } from '@/lib/bookings/rules/ticket-view';
import { TicketBack } from './ticket-back';
import { TicketCard } from './ticket-card';
import look from './ticket.module.css';

/** One ticket whole: the pasteboard and, below it (on paper beside it), the card with its QR and spoken code. */
export function TicketPair({ ticket }: { ticket: TicketView }) {
  const { gardenName, day, year, time, timeSuffix, inBy, peopleWords } = ticket;
  const spoken = `Ticket for ${gardenName}, ${day} ${year}, ${[time, timeSuffix].filter(Boolean).join(' ')}, in by ${inBy}, ${peopleWords}`;
  return (
    <article className={look['pair']} aria-label={spoken} id={`ticket-${ticket.visitId}`}>
      <TicketCard ticket={ticket} />
      <TicketBack ticket={ticket} />
      <CutLines />
    </article>
  );
}

/** On paper: dashes to cut on with ticks at their ends, dots to fold on. */
function CutLines() {
  return (
    <svg className={look['cuts']} viewBox="0 0 706 186" preserveAspectRatio="none" aria-hidden="true" fill="none">
      <path d="M0 0H706M0 186H706M0 0V186M706 0V186" stroke="var(--color-edge)" strokeWidth="1.200" strokeDasharray="7 5" />
      <path d="M353 0V186" stroke="var(--color-card-ink)" strokeWidth="2.400" strokeDasharray="0 7" strokeLinecap="round" />
      <path d="M-6 0h-16M712 0h16M-6 186h-16M712 186h16" stroke="var(--color-card-ink)" strokeWidth="1.200" />
    </svg>
  );
}
