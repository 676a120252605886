'use client';

import { useRouter } from 'next/navigation';
import { useEffect } from 'react';

type LookAgainProps = { everySeconds: number };

/** Asks the server for the page again every few seconds while it is looked at: the payment's return page waits so. */
export function LookAgain({ everySeconds }: LookAgainProps) {
  const router = useRouter();
  useEffect(() => {
    const timer = setInterval(() => {
      if (document.visibilityState === 'visible') router.refresh();
    }, everySeconds * 1000);
    return () => clearInterval(timer);
  }, [router, everySeconds]);
  return (
    <noscript>
      <meta httpEquiv="refresh" content={String(everySeconds * 2)} />
    </noscript>
  );
}
