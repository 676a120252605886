import type { Metadata } from 'next';
import { PublicSheet } from '@/app/(public)/public-sheet';
import { HomeDay, HomeRail, HomeRest } from '@/components/garden/home-body';
import { Bill } from '@/components/layout/bill';
import { WithMargin } from '@/components/layout/columns';
import { GardenMargin } from '@/components/layout/garden-margin';
import { dayOf } from '@/lib/core/time';
import { comingDays, listGardens } from '@/lib/gardens/queries';
import { toHomePage } from '@/lib/gardens/views/home';
import { pageContext } from '@/lib/web/context';

export async function generateMetadata(): Promise<Metadata> {
  const { club } = await pageContext('anyone');
  return { title: { absolute: `${club.name}: open days` }, description: 'Garden railways to visit: the next open day, where it is, and how to come.' };
}

export default async function HomePage() {
  const ctx = await pageContext('anyone');
  const days = await comingDays(ctx);
  const page = toHomePage(days, await listGardens(ctx, days[0]?.slug ?? null), dayOf(ctx.now, ctx.club.timeZone), ctx.club);
  return (
    <PublicSheet club={ctx.club} here="/">
      <Bill name={page.name} line={page.line} sums={page.sums} rail={<HomeRail day={page.day} />} />
      <HomeDay page={page} />
      <WithMargin margin={<GardenMargin plants={page.flowers} />}>
        <HomeRest page={page} />
      </WithMargin>
    </PublicSheet>
  );
}
