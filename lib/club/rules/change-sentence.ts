import { formatMoney } from '@/lib/core/money';

type Facts = Record<string, unknown> | null;
type Club = { locale: string; currency: string };

/** What an audit line says was changed: "capacity 12 → 14, closed no → yes". Names that did not change are left out. */
export function changeSentence(before: Facts, after: Facts, club: Club): string {
  const names = [...new Set([...Object.keys(before ?? {}), ...Object.keys(after ?? {})])];
  return names.map((name) => partOf(name, before, after, club)).filter((part) => part !== '').join(', ');
}

/* A name that only one side has is a fact of the change, not a change of its own. */
function partOf(name: string, before: Facts, after: Facts, club: Club): string {
  const say = (value: unknown) => written(name, value, club);
  const [was, is] = [before?.[name], after?.[name]];
  if (was === undefined || (is === undefined && after !== null)) return `${wordsOf(name)} ${say(was ?? is)}`;
  return say(was) === say(is) ? '' : `${wordsOf(name)} ${say(was)} → ${say(is)}`;
}

const wordsOf = (name: string): string => name.replace(/Minor$/, '').replace(/[A-Z]/g, (letter) => ` ${letter.toLowerCase()}`);

function written(name: string, value: unknown, { locale, currency }: Club): string {
  if (value === null || value === undefined) return 'nothing';
  if (typeof value === 'boolean') return value ? 'yes' : 'no';
  if (typeof value === 'number' && name.endsWith('Minor')) return formatMoney({ amountMinor: value, currency }, locale);
  if (Array.isArray(value)) return value.map((each) => written(name, each, { locale, currency })).join('; ');
  if (typeof value === 'object') return Object.entries(value).map(([part, of]) => `${wordsOf(part)} ${written(part, of, { locale, currency })}`).join(' ');
  return String(value);
}
