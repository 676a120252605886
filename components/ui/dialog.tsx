'use client';

import { useId, useRef, type ReactNode } from 'react';
import { Button } from './button';
import type { ButtonTone } from './button-look';

type DialogProps = {
  /** What the button that opens it says. */
  open: string;
  tone?: ButtonTone;
  title: string;
  children: ReactNode;
};

/** A slip laid over the sheet, the browser's own. It needs JavaScript, so it is never the only way to something. */
export function Dialog({ open, tone = 'plain', title, children }: DialogProps) {
  const slip = useRef<HTMLDialogElement>(null);
  const titleId = useId();
  return (
    <>
      <Button tone={tone} onClick={() => slip.current?.showModal()} aria-haspopup="dialog">
        {open}
      </Button>
      <dialog
        ref={slip}
        aria-labelledby={titleId}
        className="m-auto max-h-[90dvh] w-full max-w-xl border-2 border-ink bg-paper p-6 text-ink backdrop:bg-card-ink/60"
      >
        <h2 id={titleId}>{title}</h2>
        <div className="mt-4 grid gap-4">{children}</div>
        <form method="dialog" className="mt-5">
          <Button type="submit" tone="bare">
            Close
          </Button>
        </form>
      </dialog>
    </>
  );
}
