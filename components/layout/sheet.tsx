import type { ReactNode } from 'react';
import { Imprint, LargePrintLink } from './imprint';
import type { NavLine } from './nav';
import { PrintButton } from './print-button';

export type SheetClub = {
  name: string;
  /** What follows the name in the foot: "founded in a potting shed in 1983". */
  line?: string;
};

type SheetProps = {
  club: SheetClub;
  /** The address in the first line that this page belongs to, such as `/gardens`. */
  here?: string;
  /** The last link of the first line: signing in, or the reader's own page. */
  account?: NavLine;
  /** A second line of links, for pages of the reader's own. */
  ownLine?: ReactNode;
  /** What grows on the foot rule: `<GardenFoot>`. */
  foot?: ReactNode;
  children: ReactNode;
};

const SIGN_IN: NavLine = { href: '/sign-in', label: 'Sign in' };

/** A public page: one printed sheet, the club's name first and Leafhalt small at the foot. */
export function Sheet({ club, here, account = SIGN_IN, ownLine, foot, children }: SheetProps) {
  return (
    <div className="sheet">
      <Imprint clubName={club.name} here={here} account={account} />
      {ownLine}
      <main id="page" tabIndex={-1}>
        {children}
      </main>
      {foot}
      <SheetFoot club={club} growing={foot !== undefined} />
    </div>
  );
}

function SheetFoot({ club, growing }: { club: SheetClub; growing: boolean }) {
  return (
    <footer className={`flex flex-wrap items-center gap-x-7 gap-y-1 pt-2 text-ink-soft ${growing ? 'border-t-2 border-ink' : 'mt-11 border-t border-rule'}`}>
      <span>{club.line === undefined ? club.name : `${club.name}, ${club.line}`}</span>
      <PrintButton>Printed sheet</PrintButton>
      <span className="print:hidden">
        <LargePrintLink />
      </span>
      <span className="ml-auto">Set in Leafhalt</span>
    </footer>
  );
}
