import type { Metadata } from 'next';
import Link from 'next/link';
import { notFound } from 'next/navigation';
import { Bill } from '@/components/layout/bill';
import { Part } from '@/components/layout/columns';
import { LetterTable } from '@/components/office/letter-table';
import { PaymentTable } from '@/components/office/payment-table';
import { VisitsTable } from '@/components/office/visits-table';
import { When } from '@/components/ui/when';
import { findOfficeBooking, paymentsOfBooking, visitsOfBooking } from '@/lib/bookings/office-queries';
import { showSpokenCode } from '@/lib/bookings/rules/spoken-code';
import { formatTime } from '@/lib/core/time';
import { lettersOfBooking } from '@/lib/letters/queries/of-booking';
import { officeTimes } from '@/lib/opendays/office-queries';
import { moveChoices, toOfficeStops } from '@/lib/opendays/office-views';
import { may } from '@/lib/people/rules/capabilities';
import { pageContext } from '@/lib/web/context';
import { OfficePage } from '../../office-page';
import { giveBackForPartyAction, moveVisitAction } from '../actions';

export const metadata: Metadata = { title: 'Booking', robots: { index: false } };

type BookingPageProps = { params: Promise<{ code: string }>; searchParams: Promise<{ open?: string | string[] }> };

export default async function OfficeBookingPage({ params, searchParams }: BookingPageProps) {
  const ctx = await pageContext('bookings.see');
  const { club, now } = ctx;
  const booking = await findOfficeBooking(ctx, (await params).code);
  if (!booking) notFound();
  const { open } = await searchParams;
  const path = `/office/bookings/${booking.code}`;
  const stops = toOfficeStops(await officeTimes(ctx, booking.openDayId));
  const visits = (await visitsOfBooking(ctx, booking.id)).map((visit) => ({ ...visit, choices: moveChoices(stops, visit, now, (at) => formatTime(at, club)) }));
  const [payments, letters] = [await paymentsOfBooking(ctx, booking.id), await lettersOfBooking(ctx, booking.id)];
  const reached = [booking.email, booking.phone].filter((each) => each !== null).join(', ');
  return (
    <OfficePage
      ctx={ctx}
      here="/office/bookings"
      bill={<Bill name={booking.name} line={<>{booking.day}, <When on={booking.heldOn} club={club} />, code <span className="font-mono not-italic">{showSpokenCode(booking.code)}</span></>} sums={<>{reached === '' ? 'No address was given' : reached}. Booked on <When at={booking.madeAt} club={club} style="short" />{booking.cancelledAt === null ? '.' : <>; all given back on <When at={booking.cancelledAt} show="day" club={club} style="short" />.</>} <Link className="link" href={`/office/open-days/${booking.slug}`}>The open day</Link></>} />}
    >
      <Part title="Visits" place="first">
        <VisitsTable visits={visits} path={path} open={typeof open === 'string' ? open : null} mayEdit={may(ctx.actor.roles, 'bookings.edit')} now={now} club={club} move={moveVisitAction} giveBack={giveBackForPartyAction} />
      </Part>
      <Part title="Money">
        <PaymentTable rows={payments} mayOpen={may(ctx.actor.roles, 'books.see')} club={club} empty="Nothing was paid for this booking." />
      </Part>
      <Part title="Letters">
        <LetterTable rows={letters} club={club} mayOpen={may(ctx.actor.roles, 'letters.see')} empty="No letter was written to this party." />
      </Part>
    </OfficePage>
  );
}
