import type { ReactNode } from 'react';

/** Short boxes of a staff form side by side, their labels on one line. */
export function Row({ children }: { children: ReactNode }) {
  return <div className="flex flex-wrap items-end gap-x-7 gap-y-5">{children}</div>;
}
