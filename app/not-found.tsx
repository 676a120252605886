import Link from 'next/link';
import { Bill } from '@/components/layout/bill';
import { RailRule } from '@/components/ui/rail-rule';

export const metadata = { title: 'No such halt' };

export default function NotFound() {
  return (
    <main id="page" tabIndex={-1} className="sheet">
      <Bill name="No such halt" line="The line does not run to this address, or no longer does" rail={<RailRule state="failed" />} />
      <p className="mt-6">
        A letter in the address may be wrong, or what stood here was taken down. If a letter of ours brought you, its link is best pressed
        again, whole.
      </p>
      <p className="mt-4 flex flex-wrap gap-x-7">
        <Link href="/" className="link inline-flex min-h-11 items-center">
          Begin at the first page
        </Link>
        <Link href="/open-days" className="link inline-flex min-h-11 items-center">
          See the open days
        </Link>
        <Link href="/gardens" className="link inline-flex min-h-11 items-center">
          See the gardens
        </Link>
      </p>
    </main>
  );
}
