import type { Metadata } from 'next';
import { PublicSheet } from '@/app/(public)/public-sheet';
import { HoldBody, holdBill } from '@/components/booking/hold-body';
import { Bill } from '@/components/layout/bill';
import { NothingKept } from '@/components/booking/nothing-kept';
import { RailRule } from '@/components/ui/rail-rule';
import { findHold } from '@/lib/bookings/queries/hold';
import { holderContext, pageContext } from '@/lib/web/context';
import { keepAgainAction, keepLongerAction, letGoAction, openBookingAction, payAction, payOnAction } from './actions';

// Not `no-referrer`: a form posted without JavaScript would then carry `Origin: null` (Fetch standard, "serializing a request origin") and be turned away.
export const metadata: Metadata = { title: 'Your places', robots: { index: false, follow: false }, referrer: 'same-origin' };

type Props = { searchParams: Promise<Record<string, string | string[] | undefined>> };

/** The places that this browser keeps, whatever became of them. */
export default async function HoldPage({ searchParams }: Props) {
  const { day } = await searchParams;
  const ctx = await holderContext();
  const hold = ctx === null ? null : await findHold(ctx, typeof day === 'string' ? day : undefined);
  const { club, now } = ctx ?? await pageContext('anyone');
  if (hold === null) return <PublicSheet club={club} here="/open-days"><NothingKept /></PublicSheet>;
  const rail = hold.state === 'confirmed' ? <RailRule trainAt={1} coaches={2} /> : <RailRule state={hold.state === 'kept' || hold.state === 'paying' ? 'plain' : 'failed'} />;
  const actions = { pay: payAction, payOn: payOnAction, keepLonger: keepLongerAction, letGo: letGoAction, keepAgain: keepAgainAction, open: openBookingAction };
  return (
    <PublicSheet club={club} here="/open-days">
      <Bill {...holdBill(hold)} rail={rail} />
      <HoldBody hold={hold} actions={actions} club={{ locale: club.locale, visitRules: club.visitRules }} servedAt={now.toISOString()} />
    </PublicSheet>
  );
}
