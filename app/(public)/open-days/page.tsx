import type { Metadata } from 'next';
import { PublicSheet } from '@/app/(public)/public-sheet';
import { Bill } from '@/components/layout/bill';
import { OpenDayList } from '@/components/open-day/open-day-list';
import { RailRule } from '@/components/ui/rail-rule';
import { listOpenDays } from '@/lib/opendays/queries';
import { daysInWords } from '@/lib/opendays/rules/day-words';
import { pageContext } from '@/lib/web/context';

export const metadata: Metadata = { title: 'Open days' };

export default async function OpenDaysPage() {
  const ctx = await pageContext('anyone');
  const days = await listOpenDays(ctx);
  const coming = days.filter((day) => day.phase !== 'past');
  const past = days.filter((day) => day.phase === 'past');
  return (
    <PublicSheet club={ctx.club} here="/open-days">
      <Bill name="Open days" line={daysInWords(coming.length, past.length)} rail={<RailRule {...(coming.length === 0 ? { state: 'empty' } : { trainAt: 0.3 })} />} />
      <OpenDayList coming={coming} past={past} />
    </PublicSheet>
  );
}
