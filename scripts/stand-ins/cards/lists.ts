// Lists and expansions: newest first, filtered, a page at a time, with named ids replaced by the objects they name.
import { badParam, missing } from './answer';
import { asList, type Params } from './form';
import type { Kinds } from './shapes';
import type { Store } from './store';

type Row = { id: string; created: number };

/** Filters that compare a field with the parameter of the same name. */
export const sameField = (...names: string[]) => (row: object, query: Params) =>
  names.every((name) => query[name] === undefined || Reflect.get(row, name) === query[name]);

/** One page of `rows` (oldest first) as the processor's list object. */
export function page<R extends Row>(rows: R[], query: Params, path: string, keep: (row: R, query: Params) => boolean) {
  const limit = query['limit'] === undefined ? 10 : Number(query['limit']);
  if (!Number.isInteger(limit) || limit < 1 || limit > 100) throw badParam('limit', 'A page has 1 to 100 entries.');
  let found = rows.filter((row) => keep(row, query) && isWithin(row.created, query['created'])).reverse();
  const { starting_after: after, ending_before: before } = query;
  if (typeof after === 'string') found = found.slice(indexOf(found, after, 'starting_after') + 1);
  if (typeof before === 'string') {
    const end = indexOf(found, before, 'ending_before');
    return { object: 'list', url: path, has_more: end > limit, data: found.slice(Math.max(0, end - limit), end) };
  }
  return { object: 'list', url: path, has_more: found.length > limit, data: found.slice(0, limit) };
}

function indexOf(rows: Row[], id: string, param: string): number {
  const index = rows.findIndex((row) => row.id === id);
  if (index < 0) throw missing('object', id, param);
  return index;
}

function isWithin(created: number, range: Params[string] | undefined): boolean {
  if (range === undefined) return true;
  if (typeof range === 'string') return created === Number(range);
  const { gt = -Infinity, gte = -Infinity, lt = Infinity, lte = Infinity } = range;
  return created > Number(gt) && created >= Number(gte) && created < Number(lt) && created <= Number(lte);
}

const PREFIXES: [string, keyof Kinds][] = [['cs_', 'session'], ['pi_', 'intent'], ['ch_', 'charge'], ['re_', 'refund'], ['txn_', 'transaction']];

/** Replaces the ids at the asked-for paths (`expand[]=payment_intent.latest_charge`) by the objects. */
export function expand(value: object, query: Params, store: Store): object {
  const paths = asList(query['expand']);
  const result = structuredClone(value);
  for (const path of Array.isArray(paths) ? paths : []) expandAt(result, String(path).split('.'), store);
  return result;
}

function expandAt(value: object, [field = '', ...rest]: string[], store: Store) {
  if (Array.isArray(value)) {
    for (const row of value) expandAt(row, [field, ...rest], store);
    return;
  }
  let inner: unknown = Reflect.get(value, field);
  if (typeof inner === 'string') {
    const id = inner;
    const kind = PREFIXES.find(([prefix]) => id.startsWith(prefix))?.[1];
    const found = kind ? store.find(kind, id) : null;
    if (!found) return;
    inner = structuredClone(found);
    Reflect.set(value, field, inner);
  }
  if (rest.length > 0 && inner !== null && typeof inner === 'object') expandAt(inner, rest, store);
}
