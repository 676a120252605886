import { z } from 'zod';

/** The most rows a page of a staff table shows. */
export const PAGE_ROWS = 50;

/** How a staff table is asked for, as it stands in the address: words to find, a sort key, an order and a page. */
export type Listing<Sort extends string> = { find: string; sort: Sort; order: 'asc' | 'desc'; page: number };

/** A schema that reads a listing from a page's query; anything odd in it falls back instead of failing. */
export const listingOf = <const S extends readonly [string, ...string[]]>(sorts: S, initial: { sort: S[number]; order: 'asc' | 'desc' }) =>
  z.object({
    find: z.preprocess(firstOf, z.string().max(200).catch('')).transform((text) => text.trim()),
    sort: z.preprocess(firstOf, z.enum(sorts).catch(initial.sort)),
    order: z.preprocess(firstOf, z.enum(['asc', 'desc']).catch(initial.order)),
    page: z.preprocess((value) => Number(firstOf(value)), z.int().min(1).max(10_000).catch(1)),
  });

const firstOf = (value: unknown) => (Array.isArray(value) ? value[0] : value) ?? '';

/** The address of the same table asked for otherwise; `keep` is the page's own filters. */
export function listingHref(path: string, listing: Listing<string>, change: Partial<Listing<string>>, keep: Record<string, string> = {}): string {
  const next = { ...listing, ...change };
  const query = new URLSearchParams(keep);
  if (next.find !== '') query.set('find', next.find);
  query.set('sort', next.sort);
  query.set('order', next.order);
  if (next.page > 1) query.set('page', String(next.page));
  return `${path}?${query}`;
}

/** What a column's head does: its address and how it is sorted now. */
export function sortingOf(path: string, listing: Listing<string>, sort: string, keep: Record<string, string> = {}) {
  const isNow = listing.sort === sort;
  const order = isNow && listing.order === 'asc' ? 'desc' : 'asc';
  const now = isNow ? (listing.order === 'asc' ? ('ascending' as const) : ('descending' as const)) : ('none' as const);
  return { href: listingHref(path, listing, { sort, order, page: 1 }, keep), order: now };
}

/** Words to find as a LIKE pattern with its own wildcards taken literally; null when there are none. */
export const likeOf = (find: string): string | null => (find === '' ? null : `%${find.replace(/[\\%_]/g, (each) => `\\${each}`)}%`);
