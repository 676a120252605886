import type { Metadata } from 'next';
import { PrintButton } from '@/components/layout/print-button';
import { TicketSheet } from '@/components/ticket/ticket-sheet';
import { LinkButton } from '@/components/ui/link-button';
import { showBooking } from '@/lib/bookings/commands/show-booking';
import { pageContext } from '@/lib/web/context';

export const metadata: Metadata = { title: 'Tickets to print', robots: { index: false, follow: false }, referrer: 'no-referrer' };

/** The pasteboards on one sheet with their cut lines and folds. */
export default async function PrintPage({ params }: { params: Promise<{ code: string }> }) {
  const ctx = await pageContext('booking', await params);
  const { sheet, code } = await showBooking(ctx);
  return (
    <main id="page" tabIndex={-1} className="sheet">
      <p className="mb-6 flex flex-wrap items-center gap-5 print:hidden">
        <PrintButton>Print this sheet</PrintButton>
        <LinkButton href={`/bookings/${code}`} tone="bare">Back to your visits</LinkButton>
      </p>
      <TicketSheet sheet={sheet} />
    </main>
  );
}
