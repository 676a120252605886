import Link from 'next/link';
import { NipCard } from '@/components/drawing/nip';
import { When } from '@/components/ui/when';
import type { MyBooking } from '@/lib/bookings/rules/my-visits';
import type { ClubTime, Day } from '@/lib/core/time';

type Visit = { id: string; code: string; day: string; heldOn: Day; garden: string; number: number; opensAt: Date; people: number; givenBackAt: Date | null; isToCome: boolean };
type BookingListProps = { bookings: readonly MyBooking<Visit>[]; club: ClubTime; link: string };

/** A household's bookings, each a small timetable with the way to its tickets. */
export function BookingList({ bookings, club, link }: BookingListProps) {
  return bookings.map((booking) => (
    <section key={booking.code} aria-label={`${booking.day}, booking ${booking.code}`} className="mb-7">
      <h3>{booking.day}</h3>
      <p className="note mb-2 text-lg"><When on={booking.heldOn} club={club} /></p>
      <ul className="border-t-2 border-ink">
        {booking.visits.map((visit) => <VisitLine key={visit.id} visit={visit} club={club} />)}
      </ul>
      <Link className="link relative inline-flex min-h-11 items-center" href={`/bookings/${booking.code}`}>{link}<span className="sr-only">: {booking.day}</span></Link>
    </section>
  ));
}

function VisitLine({ visit, club }: { visit: Visit; club: ClubTime }) {
  return (
    <li className="grid grid-cols-[5em_minmax(0,1fr)] items-baseline gap-x-4 border-b border-rule py-2 sm:grid-cols-[5em_minmax(0,1fr)_auto]">
      <strong className="font-mono"><When at={visit.opensAt} show="time" club={club} /></strong>
      <span className="flex min-w-0 items-baseline gap-x-3">
        <span className="shrink-0"><NipCard stopNumber={visit.number} width={38} /></span>
        <span className={visit.givenBackAt === null ? 'font-semibold' : ''}>{visit.number} {visit.garden}</span>
      </span>
      <span className="col-start-2 text-ink-soft sm:col-start-3">
        {visit.givenBackAt === null ? `${visit.people} ${visit.people === 1 ? 'person' : 'people'}` : <>given back on <When at={visit.givenBackAt} show="day" style="bare" club={club} /></>}
      </span>
    </li>
  );
}
