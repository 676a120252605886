/** The query of a page as the framework gives it. */
export type Query = Record<string, string | string[] | undefined>;

/** What the address of an open day's page asks for: people as typed, which gardens, which times are ticked. */
export type BoardAsked = {
  typed: { adults: string; children: string; babes: string };
  only: { stepFree: boolean; steam: boolean };
  chosen: string[];
};

const listOf = (value: string | string[] | undefined): string[] => (value === undefined ? [] : Array.isArray(value) ? value : [value]);
const UUID = /^[0-9a-f]{8}(-[0-9a-f]{4}){3}-[0-9a-f]{12}$/i; // this goes to the browser, a schema library does not
const TYPED_MOST = 9;
const TIMES_MOST = 14;

/** Reads the address of an open day's page. Nothing in it is ever refused; what makes no sense is left out. */
export function readBoardAsked(query: Query): BoardAsked {
  const typed = (name: string, otherwise: string) => (listOf(query[name])[0] ?? otherwise).slice(0, TYPED_MOST);
  const isOnly = (name: string) => listOf(query[name]).includes('only');
  const times = [...listOf(query['with']), ...listOf(query['entryTimeId[]'])].filter((id) => UUID.test(id));
  return {
    typed: { adults: typed('adults', '2'), children: typed('children', '0'), babes: typed('babes', '0') },
    only: { stepFree: isOnly('step-free'), steam: isOnly('steam') },
    chosen: [...new Set(times)].slice(0, TIMES_MOST),
  };
}

/** The address that asks for this and nothing else; what is usual is left out. */
export function boardAddress(path: string, { typed, only, chosen }: BoardAsked): string {
  const query = new URLSearchParams();
  const usual = readBoardAsked({}).typed;
  for (const kind of ['adults', 'children', 'babes'] as const) if (typed[kind] !== usual[kind]) query.set(kind, typed[kind]);
  if (only.stepFree) query.set('step-free', 'only');
  if (only.steam) query.set('steam', 'only');
  chosen.forEach((id) => query.append('with', id));
  return query.size === 0 ? path : `${path}?${query}`;
}

/** The clean address when a form asked again without JavaScript and left the framework's own fields in it; else null. */
export const cleanAddress = (path: string, query: Query): string | null =>
  Object.keys(query).some((name) => name.startsWith('$ACTION') || name === 'entryTimeId[]') ? boardAddress(path, readBoardAsked(query)) : null;
