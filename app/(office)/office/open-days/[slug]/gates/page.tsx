import type { Metadata } from 'next';
import { notFound } from 'next/navigation';
import { OfficeGateList } from '@/components/gate/office-gates';
import { Bill } from '@/components/layout/bill';
import { findOpenDayGates } from '@/lib/gate/queries';
import { gateSums } from '@/lib/gate/views/office';
import { pageContext } from '@/lib/web/context';
import { DayCopy, getDayCopy } from '../../day-copy';
import { makeGatePassAction, revokeGatePassAction } from './actions';

export const metadata: Metadata = { title: 'All gates', robots: { index: false } };

export default async function GatesPage({ params }: { params: Promise<{ slug: string }> }) {
  const ctx = await pageContext('gates.edit');
  const { slug } = await params;
  const copy = await getDayCopy(ctx, slug);
  const view = await findOpenDayGates(ctx, slug);
  if (!view) notFound();
  return (
    <DayCopy ctx={ctx} copy={copy} here={`/office/open-days/${slug}/gates`} bill={<Bill name="All gates" line={`${view.title}, ${view.dayText}`} sums={gateSums(view)} />}>
      <OfficeGateList view={view} makePass={makeGatePassAction} revokePass={revokeGatePassAction} />
    </DayCopy>
  );
}
