import Link from 'next/link';

type PaginationProps = {
  /** What is counted, in the plural: "households". */
  what: string;
  from: number;
  to: number;
  total: number;
  previousHref?: string;
  nextHref?: string;
};

const Capital = (text: string) => text.charAt(0).toUpperCase() + text.slice(1);

/** "Households 1 to 11 of 143. The next 11", as links, so that a page of a list has an address. */
export function Pagination({ what, from, to, total, previousHref, nextHref }: PaginationProps) {
  const size = to - from + 1;
  const left = Math.min(size, total - to);
  if (total === 0) return null;
  return (
    <nav aria-label={`Pages of ${what}`} className="mt-3 flex flex-wrap items-center gap-x-4">
      <span>
        {Capital(what)} {from} to {to} of {total}.
      </span>
      {previousHref === undefined ? null : <PageLink href={previousHref} rel="prev" label="The ones before" />}
      {nextHref === undefined ? null : <PageLink href={nextHref} rel="next" label={left > 1 ? `The next ${left}` : 'The last one'} />}
    </nav>
  );
}

function PageLink({ href, rel, label }: { href: string; rel: string; label: string }) {
  return (
    <Link href={href} rel={rel} className="link inline-flex min-h-11 items-center pointer-fine:min-h-7">
      {label}
    </Link>
  );
}
