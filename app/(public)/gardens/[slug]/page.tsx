import type { Metadata } from 'next';
import { notFound } from 'next/navigation';
import { cache } from 'react';
import { PublicSheet } from '@/app/(public)/public-sheet';
import { GardenPageBody } from '@/components/garden/garden-page-body';
import { Bill } from '@/components/layout/bill';
import { GardenFoot } from '@/components/layout/garden-margin';
import { AreaMap } from '@/components/map/area-map';
import { RailRule } from '@/components/ui/rail-rule';
import { dayOf } from '@/lib/core/time';
import { findGarden, findNextDay } from '@/lib/gardens/queries';
import { builtInValley } from '@/lib/gardens/rules/valley-data';
import { toGardenPage } from '@/lib/gardens/views';
import { pageContext } from '@/lib/web/context';

type Props = { params: Promise<{ slug: string }> };

const read = cache(async (slug: string) => {
  const ctx = await pageContext('anyone');
  const [garden, day] = await Promise.all([findGarden(ctx, slug), findNextDay(ctx, slug)]);
  if (!garden) notFound();
  return { club: ctx.club, page: toGardenPage(garden, day, dayOf(ctx.now, ctx.club.timeZone), ctx.club) };
});

export async function generateMetadata({ params }: Props): Promise<Metadata> {
  const { club, page } = await read((await params).slug);
  return { title: `${page.name}, ${club.name}`, description: `${page.line}. ${page.sums}` };
}

export default async function GardenPage({ params }: Props) {
  const { club, page } = await read((await params).slug);
  return (
    <PublicSheet club={club} here="/gardens" foot={<GardenFoot plants={page.flowers} />}>
      <Bill name={page.name} line={page.line} sums={page.sums} rail={<RailRule trainAt={0.4} coaches={2} />} />
      <GardenPageBody page={page} map={<AreaMap valley={builtInValley} areaKey={page.whereabouts.areaKey} number={page.card} />} />
    </PublicSheet>
  );
}
