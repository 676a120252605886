import type { ReactNode } from 'react';
import { Contents, type ContentsGroup } from './contents';
import { PencilNotes, type PencilNote } from './pencil-notes';
import { PrintButton } from './print-button';
import { ToSettle, type Unsettled } from './to-settle';

type StaffCopyProps = {
  clubName: string;
  /** When this copy was printed: `<When at={now} … />`. */
  printedAt: ReactNode;
  /** The page's `<Bill>`. */
  bill: ReactNode;
  contents: readonly ContentsGroup[];
  /** The contents line that this page is. */
  here: string;
  notes?: readonly PencilNote[];
  /** What waits for someone; leave it out on pages that settle nothing. */
  toSettle?: readonly Unsettled[];
  /** The button that signs out. */
  signOut?: ReactNode;
  foot?: ReactNode;
  children: ReactNode;
};

/** An officer's page: the staff copy of the same timetable, on buff, with its contents in the margin. */
export function StaffCopy({ clubName, printedAt, bill, contents, here, notes = [], toSettle, signOut, foot, children }: StaffCopyProps) {
  return (
    <div className="staff">
      <div className="copy">
        <header className="flex flex-wrap items-baseline justify-between gap-x-6 pb-1">
          <span className="font-heading text-lg font-semibold">{clubName}</span>
          <span className="note text-lg">Staff copy, {printedAt}</span>
        </header>
        <main id="page" tabIndex={-1} className="copy-grid">
          <div className="copy-bill">{bill}</div>
          <div className="copy-contents">
            <Contents groups={contents} here={here} />
          </div>
          <div className="copy-text">
            {toSettle === undefined ? null : <ToSettle items={toSettle} />}
            {children}
          </div>
          <div className="copy-notes">
            <PencilNotes notes={notes} />
          </div>
        </main>
        <footer className="mt-8 flex flex-wrap items-center gap-x-6 border-t border-rule pt-1 text-ink-soft">
          {foot === undefined ? null : <span className="py-2">{foot}</span>}
          <PrintButton>Print the staff copy</PrintButton>
          {signOut}
          <span className="ml-auto py-2">Set in Leafhalt</span>
        </footer>
      </div>
    </div>
  );
}
