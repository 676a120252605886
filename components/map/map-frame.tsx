import type { ReactNode } from 'react';

/** Keeps a map large enough to read and to press: on a narrow screen it slides sideways inside its own frame. */
export function MapFrame({ children }: { readonly children: ReactNode }) {
  return (
    <div className="scroll-frame">
      <div className="min-w-120">{children}</div>
    </div>
  );
}
