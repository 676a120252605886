import { set, type FieldErrors, type FieldValues, type Resolver } from 'react-hook-form';
import type { z } from 'zod';
import { readForm } from '@/lib/core/form-data';

/** Sentences by field name, as the server sends them; '' for the whole form. */
export type Problems = Record<string, string[]>;

/** `days[]` and `days` are one field to a person. */
export const plainName = (name: string) => (name.endsWith('[]') ? name.slice(0, -2) : name);

/* react-hook-form keeps errors nested; a problem of a whole list or form sits beside its fields' problems. */
const WHOLE = 'whole';

/**
 * Judges what stands in the boxes, not what was noticed being typed: a browser fills boxes before the script arrives,
 * and some fields are not registered. The same reading and the same sentences as on the server.
 */
export function resolverOf(schema: z.ZodType, form: () => HTMLFormElement | null): Resolver<FieldValues> {
  return (values) => {
    const element = form();
    const parsed = schema.safeParse(element === null ? values : readForm(new FormData(element)));
    if (parsed.success) return { values, errors: {} };
    const errors: FieldErrors = {};
    for (const issue of parsed.error.issues) {
      set(errors, [...issue.path.map(String), WHOLE].join('.'), { type: 'problem', message: issue.message });
    }
    return { values: {}, errors };
  };
}

/** Nested errors as sentences by field name. */
export function problemsOf(errors: object, path = ''): Problems {
  const found: Problems = {};
  for (const [key, value] of Object.entries(errors)) {
    if (typeof value !== 'object' || value === null) continue;
    if (key === WHOLE && 'message' in value) found[path] = [String(value.message)];
    else Object.assign(found, problemsOf(value, path === '' ? key : `${path}.${key}`));
  }
  return found;
}
