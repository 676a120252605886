import type { Block, Inline, Letter } from './letter';
import { oneLine, printable } from './printable';

/** A letter as plain text, the same words in the same order; lines are left to the reader's own width. */
export function letterText(letter: Letter): string {
  const parts = [
    oneLine(letter.clubName), '', oneLine(letter.title), oneLine(letter.line), '',
    ...letter.lead.flatMap(block), '-'.repeat(40), '', ...letter.body.flatMap(block), '-'.repeat(40), printable(letter.foot), '',
  ];
  return parts.join('\n');
}

function block(each: Block): string[] {
  switch (each.kind) {
    case 'paragraph': return [inline(each.parts), ''];
    case 'section': return [oneLine(each.title), inline(each.parts), ''];
    case 'button': return [`${oneLine(each.label)}:`, each.href, ''];
    case 'code': return [`    ${oneLine(each.code)}`, ''];
    case 'timetable': return each.rows.flatMap((row) => [
      `arr. ${row.arrives}  dep. ${row.leaves}  garden ${row.stopNumber}: ${oneLine(row.name)}`,
      ...row.notes.map((note) => `    ${inline(note).replaceAll('\n', ', ')}`),
      ...(row.journey === null ? [] : [`    then ${row.journey}`]), '',
    ]);
    case 'figures': return [...each.rows.map(([label, value]) => `${oneLine(label)}: ${oneLine(value)}`), ''];
    case 'day':
    case 'rule': return [];
  }
}

function inline(parts: readonly Inline[]): string {
  return parts.map((part) => {
    if (typeof part === 'string') return printable(part);
    if ('strong' in part) return printable(part.strong);
    if ('address' in part) return printable(part.address);
    if ('code' in part) return oneLine(part.code);
    return `${oneLine(part.link)} (${part.href})`;
  }).join('');
}
