'use client';

import { useSyncExternalStore } from 'react';

const never = () => () => undefined;

/** Opens the browser's own print window. Not there without JavaScript, where it could do nothing. */
export function PrintButton({ children }: { children: string }) {
  const canPrint = useSyncExternalStore(never, () => true, () => false);
  if (!canPrint) return null;
  return (
    <button type="button" onClick={() => window.print()} className="inline-flex min-h-11 cursor-pointer items-center hover:underline hover:underline-offset-4 print:hidden">
      {children}
    </button>
  );
}
