import type { Metadata } from 'next';
import { PublicSheet } from '@/app/(public)/public-sheet';
import { FilterForm } from '@/components/garden/filter-form';
import { GardenIndex, LetterKey, NoGardens, PlateWall } from '@/components/garden/garden-list';
import { GardenMap } from '@/components/garden/garden-map';
import { Bill } from '@/components/layout/bill';
import { Columns, Part } from '@/components/layout/columns';
import { GardenFoot } from '@/components/layout/garden-margin';
import { dayOf } from '@/lib/core/time';
import { comingDays, listGardens } from '@/lib/gardens/queries';
import { gardenFilters } from '@/lib/gardens/schema';
import { toGardensPage } from '@/lib/gardens/views';
import { pageContext } from '@/lib/web/context';

export const metadata: Metadata = { title: 'Gardens' };

type Props = { searchParams: Promise<Record<string, string | string[] | undefined>> };

export default async function GardensPage({ searchParams }: Props) {
  const ctx = await pageContext('anyone');
  const filters = gardenFilters.parse(await searchParams);
  const days = await comingDays(ctx);
  const page = toGardensPage(await listGardens(ctx, filters.day ?? days[0]?.slug ?? null), days, filters, dayOf(ctx.now, ctx.club.timeZone), ctx.club);
  return (
    <PublicSheet club={ctx.club} here="/gardens" foot={<GardenFoot plants={page.flowers} />}>
      <Bill name={page.name} line={page.line} sums={page.sums}>
        <FilterForm filters={filters} choices={page.choices} isNarrowed={page.isNarrowed} />
      </Bill>
      {page.shown.length === 0 ? (
        <NoGardens isNarrowed={page.isNarrowed} />
      ) : (
        <>
          <Columns split="halves">
            <div>
              <div className="md:sticky md:top-4 large-print:static">
                <GardenMap gardens={page.shown} />
                <p className="note mt-3 leading-snug">Each hatched patch is a neighbourhood and not a house. The address comes with your tickets.</p>
                <LetterKey />
              </div>
            </div>
            <div>
              <GardenIndex gardens={page.shown} />
            </div>
          </Columns>
          <Part title={page.platesTitle}>
            <p>Two inks, the black and the stop’s own card. Plants stand at their true height beside the trains, and one thing in each is life-sized.</p>
            <PlateWall gardens={page.shown} />
          </Part>
        </>
      )}
    </PublicSheet>
  );
}
