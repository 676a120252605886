// Form-encoded bodies with brackets, as the processor's interface takes them: a[0][b]=c is a list with one object in it.

export type Params = { [name: string]: Param };
export type Param = string | Params;

/** Reads `a[0][b]=c` and `a[]=c` into nested objects; a list is an object with the keys 0, 1, 2. */
export function parseForm(text: string): Params {
  const result: Params = {};
  for (const [name, value] of new URLSearchParams(text)) put(result, pathOf(name), value);
  return result;
}

function pathOf(name: string): string[] {
  const first = name.split('[', 1)[0] ?? '';
  return [first, ...[...name.slice(first.length).matchAll(/\[([^\]]*)\]/g)].map((match) => match[1] ?? '')];
}

function put(into: Params, [part = '', ...rest]: string[], value: string) {
  const key = part === '' ? String(Object.keys(into).length) : part;
  if (key === '__proto__') return;
  if (rest.length === 0) {
    into[key] = value;
    return;
  }
  const old = into[key];
  const next: Params = typeof old === 'object' ? old : {};
  into[key] = next;
  put(next, rest, value);
}

/** A list sent as an object with the keys 0, 1, 2 becomes an array; anything else stays as it is. */
export const asList = (value: unknown): unknown =>
  value !== null && typeof value === 'object' && Object.keys(value).every((key) => /^\d+$/.test(key)) ? Object.values(value) : value;
