const SMALL = ['no', 'one', 'two', 'three', 'four', 'five', 'six', 'seven', 'eight', 'nine', 'ten', 'eleven', 'twelve', 'thirteen', 'fourteen'];

/** A count as the printed matter writes it: words up to fourteen (a day has no more stops), figures beyond. */
export const inWords = (count: number): string => SMALL[count] ?? String(count);

/** The same at the start of a sentence: "Seven". */
export function inWordsFirst(count: number): string {
  const words = inWords(count);
  return words.charAt(0).toUpperCase() + words.slice(1);
}

/** A count with its noun: "1 adult", "2 children". */
export const counted = (count: number, one: string, many: string): string => `${count} ${count === 1 ? one : many}`;

/** A list as people say it: "10:00, 11:30 and 13:45". */
export function listed(parts: readonly string[]): string {
  const last = parts.at(-1) ?? '';
  return parts.length < 2 ? last : `${parts.slice(0, -1).join(', ')} and ${last}`;
}
