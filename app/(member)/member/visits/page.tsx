import type { Metadata } from 'next';
import Link from 'next/link';
import { Bill } from '@/components/layout/bill';
import { Part } from '@/components/layout/columns';
import { RailRule } from '@/components/ui/rail-rule';
import { When } from '@/components/ui/when';
import { myVisits } from '@/lib/bookings/member-visits';
import { pageContext } from '@/lib/web/context';
import { MemberPage } from '../member-page';

export const metadata: Metadata = { title: 'My visits', robots: { index: false } };

export default async function VisitsPage() {
  const ctx = await pageContext('member');
  const all = await myVisits(ctx);
  const isComing = (visit: (typeof all)[number]) => visit.isToCome && visit.givenBackAt === null;
  return (
    <MemberPage ctx={ctx} here="/member/visits">
      <Bill name="My visits" line="Booked while signed in, or by an officer for you" />
      <Part title="To come" place="first">
        <Visits visits={all.filter(isComing)} club={ctx.club} nothing="No visit is booked." />
      </Part>
      <Part title="Before">
        <Visits visits={all.filter((visit) => !isComing(visit))} club={ctx.club} nothing="No visit yet." />
      </Part>
    </MemberPage>
  );
}

type Visit = Awaited<ReturnType<typeof myVisits>>[number];
type Club = Parameters<typeof When>[0]['club'];

function Visits({ visits, club, nothing }: { visits: Visit[]; club: Club; nothing: string }) {
  if (visits.length === 0) {
    return (
      <>
        <RailRule state="empty" />
        <p>{nothing} <Link className="link" href="/open-days">See the open days</Link></p>
      </>
    );
  }
  return (
    <ul className="border-t border-rule">
      {visits.map((visit) => (
        <li key={visit.id} className="flex flex-wrap items-baseline gap-x-4 border-b border-rule py-2">
          <When at={visit.opensAt} club={club} style="short" />
          <strong>{visit.garden}</strong>
          <span>{visit.people} {visit.people === 1 ? 'person' : 'people'}</span>
          {visit.givenBackAt === null
            ? <Link className="link ml-auto inline-flex min-h-11 items-center" href={`/bookings/${visit.code}`}>Open the tickets</Link>
            : <span className="ml-auto text-ink-soft">given back on <When at={visit.givenBackAt} show="day" style="bare" club={club} /></span>}
        </li>
      ))}
    </ul>
  );
}
