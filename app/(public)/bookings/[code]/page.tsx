import type { Metadata } from 'next';
import { PublicSheet } from '@/app/(public)/public-sheet';
import { BookingBody } from '@/components/booking/booking-body';
import { Bill } from '@/components/layout/bill';
import { RailRule } from '@/components/ui/rail-rule';
import { showBooking } from '@/lib/bookings/commands/show-booking';
import { pageContext } from '@/lib/web/context';
import { changeVisitAction, confirmEmailAction, giveBackAction, makeFeedAction, revokeFeedAction } from './actions';

export const metadata: Metadata = { title: 'Your tickets', robots: { index: false, follow: false }, referrer: 'same-origin' };

/** A party's own page, for whoever followed its private link, and for its household signed in. */
export default async function BookingPage({ params }: { params: Promise<{ code: string }> }) {
  const ctx = await pageContext('booking', await params);
  const page = await showBooking(ctx);
  const actions = { giveBack: giveBackAction, change: changeVisitAction, confirmEmail: confirmEmailAction, makeFeed: makeFeedAction, revokeFeed: revokeFeedAction };
  return (
    <PublicSheet club={ctx.club} here="/open-days">
      <Bill name={page.title} line={page.line} sums={page.sums} rail={page.state === 'live' ? <RailRule trainAt={0.86} coaches={2} /> : <RailRule state="failed" />} />
      <BookingBody page={page} actions={actions} />
    </PublicSheet>
  );
}
