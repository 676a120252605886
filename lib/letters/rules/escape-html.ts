import { printable } from './printable';

/** The only way text gets into a letter's HTML: what a person typed is shown, never obeyed. */
export function escapeHtml(text: string): string {
  return printable(text).replaceAll('&', '&amp;').replaceAll('<', '&lt;').replaceAll('>', '&gt;').replaceAll('"', '&quot;').replaceAll("'", '&#39;');
}
