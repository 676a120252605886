import type { ComponentProps, ReactNode } from 'react';
import { NavLink, type NavLine } from './nav';
import { Sheet } from './sheet';

type MemberSheetProps = Omit<ComponentProps<typeof Sheet>, 'ownLine' | 'here'> & {
  /** The member's own pages; hosts have one more. */
  lines: readonly NavLine[];
  here: string;
  /** The button that signs out. */
  signOut?: ReactNode;
};

/** A member's page: the public sheet, with the member's own line of links under the club's. */
export function MemberSheet({ lines, here, signOut, ...sheet }: MemberSheetProps) {
  // Above the bill: the letters of a large name reach further up than they look, and would take the clicks.
  const ownLine = (
    <nav aria-label="Your own pages" className="relative z-10 mt-2 flex flex-wrap items-center gap-x-7 border-y border-rule print:hidden">
      {lines.map((line) => (
        <NavLink key={line.href} line={line} here={here} />
      ))}
      {signOut === undefined ? null : <span className="ml-auto">{signOut}</span>}
    </nav>
  );
  return <Sheet {...sheet} ownLine={ownLine} />;
}
