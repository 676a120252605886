import type { Metadata } from 'next';
import { redirect } from 'next/navigation';
import { PublicSheet } from '@/app/(public)/public-sheet';
import { HoldBody, holdBill } from '@/components/booking/hold-body';
import { Waiting } from '@/components/booking/waiting';
import { Bill } from '@/components/layout/bill';
import { RailRule } from '@/components/ui/rail-rule';
import { findHold } from '@/lib/bookings/queries/hold';
import { holderContext } from '@/lib/web/context';
import { keepAgainAction, keepLongerAction, letGoAction, openBookingAction, payAction, payOnAction } from '../actions';

export const metadata: Metadata = { title: 'Your payment', robots: { index: false, follow: false }, referrer: 'same-origin' };

/** Where the card service sends the payer: it only reads, waits for the signed word, and tells the truth. */
export default async function PaidPage() {
  const ctx = await holderContext();
  const hold = ctx === null ? null : await findHold(ctx);
  if (ctx === null || hold === null || hold.state === 'kept' || hold.state === 'over') redirect('/hold');
  const { club, now } = ctx;
  const actions = { pay: payAction, payOn: payOnAction, keepLonger: keepLongerAction, letGo: letGoAction, keepAgain: keepAgainAction, open: openBookingAction };
  return (
    <PublicSheet club={club} here="/open-days">
      {hold.state === 'paying' ? <Waiting hold={hold} /> : (
        <>
          <Bill {...holdBill(hold)} rail={hold.state === 'confirmed' ? <RailRule trainAt={1} coaches={2} /> : <RailRule state="failed" />} />
          <HoldBody hold={hold} actions={actions} club={{ locale: club.locale, visitRules: club.visitRules }} servedAt={now.toISOString()} />
        </>
      )}
    </PublicSheet>
  );
}
