/**
 * One table as CSV (RFC 4180): CRLF lines, quotes doubled. A text that a spreadsheet would run as a formula (it begins
 * with = + - @, a tab or a carriage return) gets an apostrophe before it; numbers stay numbers. Begins with a byte-order
 * mark, without which common spreadsheets misread UTF-8.
 */
export function toCsv(head: readonly string[], rows: readonly (readonly (string | number | null)[])[]): string {
  return `\ufeff${[head, ...rows].map((row) => row.map(cell).join(',')).join('\r\n')}\r\n`;
}

function cell(value: string | number | null): string {
  if (value === null) return '';
  if (typeof value === 'number') return String(value);
  const safe = /^[=+\-@\t\r]/.test(value) ? `'${value}` : value;
  return /[",\r\n]/.test(safe) || safe !== safe.trim() ? `"${safe.replaceAll('"', '""')}"` : safe;
}
