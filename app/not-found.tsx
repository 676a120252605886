import type { Metadata } from 'next';
import Link from 'next/link';
import { Bill } from '@/components/layout/bill';
import { Sheet } from '@/components/layout/sheet';
import { RailRule } from '@/components/ui/rail-rule';
import { pageContext } from '@/lib/web/context';

export const metadata: Metadata = { title: 'No such halt' };

/* Next.js sends this along with every page, so it holds nothing that is the reader's own: not even their name. */
const ACCOUNT = { href: '/account', label: 'Your account' };

export default async function NotFound() {
  const { club } = await pageContext('anyone');
  return (
    <Sheet club={{ name: club.name, line: club.footLine }} account={ACCOUNT}>
      <Bill name="No such halt" line="The line does not run to this address, or no longer does" rail={<RailRule state="failed" />} />
      <p className="mt-6">
        A letter in the address may be wrong, or what stood here was taken down. If a letter of ours brought you, press its link again,
        whole.
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
    </Sheet>
  );
}
