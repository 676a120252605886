import type { Metadata } from 'next';
import { Bill } from '@/components/layout/bill';
import { CsvLink } from '@/components/office/csv-link';
import { FindForm } from '@/components/office/find-form';
import { HouseholdLine } from '@/components/member/household-line';
import { Pages } from '@/components/office/pages';
import { RollSums } from '@/components/office/roll-sums';
import { RollTable } from '@/components/office/roll-table';
import { RailRule } from '@/components/ui/rail-rule';
import { dayOf, formatDay } from '@/lib/core/time';
import { lineFacts } from '@/lib/dues/queries';
import { rollLines, rollSums } from '@/lib/dues/roll-queries';
import { lineOf } from '@/lib/dues/rules/line';
import { rollInput } from '@/lib/dues/schema';
import { may } from '@/lib/people/rules/capabilities';
import { pageContext } from '@/lib/web/context';
import { OfficePage } from '../office-page';

export const metadata: Metadata = { title: 'The roll', robots: { index: false } };

export default async function RollPage({ searchParams }: { searchParams: Promise<Record<string, string | string[] | undefined>> }) {
  const ctx = await pageContext('roll.see');
  const { club } = ctx;
  const asked = rollInput.parse(await searchParams);
  const [{ lines, total }, sums] = [await rollLines(ctx, asked), await rollSums(ctx)];
  const keep: Record<string, string> = asked.standing === 'all' ? {} : { standing: asked.standing };
  const today = dayOf(ctx.now, club.timeZone);
  const opened = lines.find((line) => line.id === asked.open);
  const stations = opened === undefined ? [] : lineOf({ ...opened, ...(await lineFacts(ctx, opened.id)) }, today, club);
  return (
    <OfficePage ctx={ctx} here="/office/roll" bill={<Bill name="The roll" line={`As it stands on ${formatDay(today, club)}`} sums={<RollSums sums={sums} shown={asked.standing} />} {...(sums.households + sums.by.left === 0 ? { rail: <RailRule state="empty" /> } : {})} />} foot="How people are reached is shown only where a household is opened.">
      <h2>Households</h2>
      <FindForm path="/office/roll" label={may(ctx.actor.roles, 'people.see') ? 'Name, railway, street or number' : 'Name, railway or number'} find={asked.find} submit="Look on the roll" keep={keep} />
      <RollTable lines={lines} asked={asked} keep={keep} open={opened?.id ?? null} line={<HouseholdLine stations={stations} club={club} />} club={club} />
      <Pages path="/office/roll" listing={asked} what="households" shown={lines.length} total={total} keep={keep} />
      <p className="mt-4"><CsvLink href={`/office/roll/csv?${new URLSearchParams({ ...keep, find: asked.find, sort: asked.sort, order: asked.order })}`} what="this list" /></p>
    </OfficePage>
  );
}
