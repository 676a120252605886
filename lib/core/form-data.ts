type Node = string | Node[] | { [name: string]: Node };

const SECRET = /password|secret/i;
const own = (name: string) => !name.startsWith('$ACTION'); // the framework's own hidden fields

/** A form as nested plain data: `wanted.0.adults` nests, a name ending in `[]` is a list, files are dropped. */
export function readForm(form: FormData): Record<string, unknown> {
  const root: { [name: string]: Node } = Object.create(null);
  for (const [name, value] of form.entries()) {
    if (typeof value !== 'string' || !own(name)) continue;
    if (name.endsWith('[]')) {
      const key = name.slice(0, -2);
      const list = root[key];
      root[key] = Array.isArray(list) ? [...list, value] : [value];
    } else {
      put(root, name.split('.').slice(0, 6), value);
    }
  }
  return withLists(root) as Record<string, unknown>; // the root is an object, never a list
}

function put(at: { [name: string]: Node }, path: string[], value: string): void {
  const [head = '', ...rest] = path;
  if (rest.length === 0) {
    at[head] = value;
    return;
  }
  const next = at[head];
  const child: { [name: string]: Node } = typeof next === 'object' && !Array.isArray(next) ? next : Object.create(null);
  at[head] = child;
  put(child, rest, value);
}

/** Objects whose names are all indexes become lists, in their order. */
function withLists(node: Node): Node {
  if (typeof node === 'string' || Array.isArray(node)) return node;
  const names = Object.keys(node);
  const children = names.map((name) => [name, withLists(node[name] ?? '')] as const);
  if (names.length > 0 && names.every((name) => /^\d{1,3}$/.test(name))) {
    return children.sort(([a], [b]) => Number(a) - Number(b)).map(([, child]) => child);
  }
  return Object.fromEntries(children);
}

/** What was typed, to be shown again: text by field name, never a password. */
export function typedValues(form: FormData): Record<string, string | string[]> {
  const values: Record<string, string | string[]> = {};
  for (const name of new Set(form.keys())) {
    if (!own(name) || SECRET.test(name)) continue;
    const all = form.getAll(name).filter((value) => typeof value === 'string').map((value) => value.slice(0, 4000));
    values[name] = all.length === 1 && !name.endsWith('[]') ? (all[0] ?? '') : all;
  }
  return values;
}
