'use client';

import { Bill } from '@/components/layout/bill';
import { Button } from '@/components/ui/button';
import { RailRule } from '@/components/ui/rail-rule';

type ErrorPageProps = { error: unknown; retry: () => void };

const digestOf = (error: unknown) =>
  typeof error === 'object' && error !== null && 'digest' in error && typeof error.digest === 'string' ? error.digest : null;

const HOME = '/';

/** The page when something broke: what it means for the reader, the way back, and a number to quote. */
export default function ErrorPage({ error, retry }: ErrorPageProps) {
  const digest = digestOf(error);
  return (
    <main id="page" tabIndex={-1} className="sheet">
      <Bill name="It did not work" line="Something broke at our end, and it has been written down" rail={<RailRule state="failed" />} />
      <p className="mt-6">
        If you were paying, look at your booking before you pay again: it says whether the money came. Places you were keeping are still
        kept until the time that was shown.
      </p>
      {digest === null ? null : (
        <p className="mt-3">
          If you write to us about it, quote <span className="figures font-semibold">{digest}</span>.
        </p>
      )}
      <p className="mt-5 flex flex-wrap items-center gap-x-7 gap-y-3">
        <Button tone="main" onClick={retry}>
          Try that again
        </Button>
        {/* A whole new page, not a client-side step: what broke may be the script itself. */}
        <a href={HOME} className="link inline-flex min-h-11 items-center">
          Begin at the first page
        </a>
      </p>
    </main>
  );
}
