import Link from 'next/link';
import { OwnDay } from '@/components/day-graph/visitor-line';
import { Post } from '@/components/drawing/post';
import { Columns, Part } from '@/components/layout/columns';
import { TicketPair } from '@/components/ticket/ticket-pair';
import { LinkButton } from '@/components/ui/link-button';
import { Notice } from '@/components/ui/notice';
import type { BookingPage } from '@/lib/bookings/views/booking-page';
import type { FormAction } from '@/lib/core/form-state';
import { BookingButton } from './booking-forms';
import type { BookingActions } from './booking-actions';
import { VisitPart } from './visit-part';

/** The party's own page below its bill: tickets, the way, the day, what may still be changed. */
export function BookingBody({ page, actions }: { page: BookingPage; actions: BookingActions }) {
  const live = page.visits.filter((visit) => visit.ticket.state.kind !== 'given-back');
  return (
    <>
      {page.state === 'called-off' ? <div className="mt-6"><Notice tone="danger" word="Called off" as="standing">This open day is called off. A letter says what happens with your money.</Notice></div> : null}
      <EmailQuestion page={page} action={actions.confirmEmail} />
      {page.state === 'live' && live.length > 0 ? (
        <div className="mt-7 grid gap-6">
          <h2 className="sr-only">Your tickets</h2>
          <div className="grid items-start gap-6 lg:grid-cols-2">{live.map((visit) => <TicketPair key={visit.visitId} ticket={visit.ticket} />)}</div>
          <p className="flex flex-wrap items-center gap-5">
            <LinkButton href={`/bookings/${page.code}/print`} tone="main">Print the tickets</LinkButton>
            <span className="note">This page needs no signal once it is open.</span>
          </p>
        </div>
      ) : null}
      {page.day ? <OwnDay board={page.day.board} day={page.day.line} postOf={(stopId) => <PostOf page={page} stopId={stopId} />} /> : null}
      <section className="part">
        <h2 className="mb-1">The way, and changes</h2>
        {page.addresses === '' ? null : <p className="note mb-4">{page.addresses}</p>}
        {page.visits.map((visit) => <VisitPart key={visit.visitId} visit={visit} code={page.code} actions={actions} />)}
      </section>
      {page.state === 'live' ? <Calendar page={page} actions={actions} /> : null}
    </>
  );
}

function PostOf({ page, stopId }: { page: BookingPage; stopId: string }) {
  const stop = page.day?.board.stops.find((each) => each.stopId === stopId);
  return stop ? <Post stopNumber={stop.number} label={null} /> : null;
}

function EmailQuestion({ page, action }: { page: BookingPage; action: FormAction }) {
  const { address, isConfirmed, mayConfirm } = page.email;
  if (isConfirmed || address === null || page.state !== 'live') return null;
  return (
    <section className="part-first mt-6 border-l-[3px] border-caution pl-4">
      <h2 className="mb-1 text-xl">Is this your e-mail?</h2>
      <p className="mb-3 max-w-prose">We write to <b className="break-all">{address}</b>. {mayConfirm ? 'Press once, so that the addresses of the gardens go to you and nobody else.' : 'Open the link in the letter we sent there and press the button on this page, so that the addresses of the gardens go to you and nobody else.'}</p>
      {mayConfirm ? <BookingButton action={action} code={page.code} submit="Yes, that is mine" tone="main" /> : null}
    </section>
  );
}

function Calendar({ page, actions }: { page: BookingPage; actions: BookingActions }) {
  return (
    <section className="part print:hidden">
      <h2 className="mb-3">In your calendar</h2>
      <Columns split="halves">
        <div>
          <p className="mb-3">One file with all your visits, to keep.</p>
          <a href={`/bookings/${page.code}/calendar.ics`} className="link" download>Add to calendar</a>
        </div>
        <div>
          <p className="mb-3">{page.hasFeed ? 'A private address of your visits is in use. A new one ends the old one.' : 'Or a private address that your calendar reads again and again, so that it follows any change.'}</p>
          <div className="flex flex-wrap items-start gap-5">
            <BookingButton action={actions.makeFeed} code={page.code} submit={page.hasFeed ? 'Make a new address' : 'Make a private address'} />
            {page.hasFeed ? <BookingButton action={actions.revokeFeed} code={page.code} submit="Take it back" tone="bare" /> : null}
          </div>
        </div>
      </Columns>
    </section>
  );
}

/** What stands where a booking cannot be shown, without saying whether there is one. */
export function NoBooking() {
  return (
    <Part title="Nothing to show here" place="first">
      <p className="max-w-prose">Open the private link in the letter we sent, on this device. If you are a member, <Link href="/sign-in" className="link">sign in</Link> and look under your visits.</p>
    </Part>
  );
}
