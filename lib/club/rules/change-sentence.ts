type Facts = Record<string, unknown> | null;

const written = (value: unknown): string => (value === null || value === undefined ? 'nothing' : typeof value === 'object' ? JSON.stringify(value) : String(value));

/** What an audit line says was changed: "capacity 12 → 14, closed nothing → …". Names that did not change are left out. */
export function changeSentence(before: Facts, after: Facts): string {
  const names = [...new Set([...Object.keys(before ?? {}), ...Object.keys(after ?? {})])];
  return names
    .filter((name) => written(before?.[name]) !== written(after?.[name]))
    .map((name) => `${name} ${before === null ? '' : `${written(before[name])} → `}${written(after?.[name])}`)
    .join(', ');
}
