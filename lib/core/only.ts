/** The one element of a list that must have exactly one; a programming error otherwise. */
export function only<T>(rows: readonly T[]): T {
  if (rows.length !== 1) throw new Error(`expected one row, found ${rows.length}`);
  return rows[0] as T; // the length was checked above
}

/** The first element, or null. */
export const firstOrNull = <T>(rows: readonly T[]): T | null => rows[0] ?? null;
