import type { Metadata } from 'next';
import Link from 'next/link';
import { Bill } from '@/components/layout/bill';
import { Part } from '@/components/layout/columns';
import { BookingList } from '@/components/member/booking-list';
import { RailRule } from '@/components/ui/rail-rule';
import { myVisits } from '@/lib/bookings/member-visits';
import { myBookings } from '@/lib/bookings/rules/my-visits';
import { pageContext } from '@/lib/web/context';
import { MemberPage } from '../member-page';

export const metadata: Metadata = { title: 'My visits', robots: { index: false } };

export default async function VisitsPage() {
  const ctx = await pageContext('member');
  const { coming, before } = myBookings(await myVisits(ctx));
  const isEmpty = coming.length + before.length === 0;
  return (
    <MemberPage ctx={ctx} here="/member/visits">
      <Bill name="My visits" line="Booked while signed in, or by an officer for you" {...(isEmpty ? { rail: <RailRule state="empty" /> } : {})} />
      <Part title="To come" place="first">
        {coming.length === 0 ? <p>No visit is booked. <Link className="link" href="/open-days">See the open days</Link></p> : <BookingList bookings={coming} club={ctx.club} link="Open the tickets" />}
      </Part>
      {before.length === 0 ? null : (
        <Part title="Before">
          <BookingList bookings={before} club={ctx.club} link="See the booking" />
        </Part>
      )}
    </MemberPage>
  );
}
