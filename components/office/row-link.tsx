import Link from 'next/link';
import type { ReactNode } from 'react';

type RowLinkProps = { /** The page's address with the row open, or shut when it is. */ href: string; isOpen: boolean; children: ReactNode };

/** Opens a row to its line, or shuts it: a plain link, so that an open row has an address. */
export function RowLink({ href, isOpen, children }: RowLinkProps) {
  return (
    <Link href={href} scroll={false} className="link inline-flex min-h-11 items-center pointer-fine:min-h-7" aria-expanded={isOpen}>
      {children}
    </Link>
  );
}
