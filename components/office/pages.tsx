import { Pagination } from '@/components/ui/pagination';
import { listingHref, PAGE_ROWS, type Listing } from '@/lib/core/listing';

type PagesProps = { path: string; listing: Listing<string>; what: string; shown: number; total: number; keep?: Record<string, string> };

/** Which rows of a staff table are shown, with the way to the others. */
export function Pages({ path, listing, what, shown, total, keep = {} }: PagesProps) {
  const before = (listing.page - 1) * PAGE_ROWS;
  const hasNext = before + shown < total;
  return (
    <Pagination
      what={what}
      from={shown === 0 ? 0 : before + 1}
      to={before + shown}
      total={total}
      {...(listing.page > 1 ? { previousHref: listingHref(path, listing, { page: listing.page - 1 }, keep) } : {})}
      {...(hasNext ? { nextHref: listingHref(path, listing, { page: listing.page + 1 }, keep) } : {})}
    />
  );
}
