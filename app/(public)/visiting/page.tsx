import type { Metadata } from 'next';
import { FootFlowers } from '@/app/(public)/foot-flowers';
import { PublicSheet } from '@/app/(public)/public-sheet';
import { VisitingBody } from '@/components/garden/visiting-body';
import { Bill } from '@/components/layout/bill';
import { toVisitingPage } from '@/lib/gardens/views/visiting';
import { pageContext } from '@/lib/web/context';

export const metadata: Metadata = { title: 'Visiting', description: 'How a visit works, what to mind, and how to get there.' };

export default async function VisitingPage() {
  const ctx = await pageContext('anyone');
  const { club } = ctx;
  return (
    <PublicSheet club={club} here="/visiting" foot={<FootFlowers ctx={ctx} />}>
      <Bill name="How to visit" line="Other people’s gardens, very small trains, and the manners of both" sums="Everything here holds for every open day; a garden’s own page adds what is different there." />
      <VisitingBody page={toVisitingPage(club)} />
    </PublicSheet>
  );
}
