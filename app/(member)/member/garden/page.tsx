import type { Metadata } from 'next';
import { Bill } from '@/components/layout/bill';
import { Part } from '@/components/layout/columns';
import { RailRule } from '@/components/ui/rail-rule';
import { When } from '@/components/ui/when';
import { comingToMyGardens } from '@/lib/bookings/member-visits';
import { byEntryTime } from '@/lib/bookings/rules/coming';
import { pageContext } from '@/lib/web/context';
import { MemberPage } from '../member-page';

export const metadata: Metadata = { title: 'My garden', robots: { index: false } };

export default async function GardenPage() {
  const ctx = await pageContext('member');
  const days = byEntryTime(await comingToMyGardens(ctx));
  return (
    <MemberPage ctx={ctx} here="/member/garden">
      <Bill name="Who is coming" line="By entry time; names and numbers only" {...(days.length === 0 ? { rail: <RailRule state="empty" /> } : {})} />
      {days.length === 0 ? <p className="mt-6">Your garden takes part in no open day yet. The coordinator sets the days and the times.</p> : null}
      {days.map((day, index) => (
        <Part key={day.key} title={day.garden} place={index === 0 ? 'first' : 'next'}>
          <p className="mb-3">
            {day.day}, <When on={day.heldOn} club={ctx.club} />: {day.people} people so far. Never more than {day.headsLimit} at once.
          </p>
          <ul className="border-t-2 border-ink">
            {day.times.map((time) => (
              <li key={time.id} className="grid gap-x-5 border-b border-rule py-2 sm:grid-cols-[5rem_9rem_1fr]">
                <strong className="font-mono"><When at={time.opensAt} show="time" club={ctx.club} /></strong>
                <span>{time.people} of {time.capacity} places</span>
                <span>{time.parties.length === 0 ? <span className="text-ink-soft">nobody yet</span> : time.parties.map((party) => `${party.name} (${party.people})`).join(', ')}</span>
              </li>
            ))}
          </ul>
        </Part>
      ))}
    </MemberPage>
  );
}
