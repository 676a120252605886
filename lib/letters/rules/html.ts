import { dayCells } from './day-cells';
import { escapeHtml } from './escape-html';
import type { Block, Inline, Letter, TimetableRow } from './letter';
import { cardOf, DAMSON, HEADING, INK, MIST, MONO, PAPER, RULE, SOFT, STYLE_SHEET, TEXT } from './mail-tokens';
import { oneLine } from './printable';

const inkText = `font:400 18px/1.45 ${TEXT};color:${INK}`;
const softItalic = `font:italic 400 17px/1.35 ${HEADING};color:${SOFT}`;
const table = (attributes: string, rows: string) => `<table role="presentation" cellpadding="0" cellspacing="0" ${attributes}>${rows}</table>`;

/** A letter as a mail program shows it: tables, inline styles, one style sheet for phones and evenings, nothing fetched. */
export function letterHtml(letter: Letter): string {
  const sheet = [
    `<p class="ink" style="margin:0;font:600 16px/1.3 ${HEADING};color:${INK}">${escapeHtml(letter.clubName)}</p>`,
    `<h1 class="ink h1" style="margin:12px 0 0;font:900 52px/1 ${HEADING};letter-spacing:-.02em;color:${INK}">${escapeHtml(letter.title).replaceAll('\n', '<br>')}</h1>`,
    `<p class="ink" style="margin:14px 0;font:italic 400 21px/1.3 ${HEADING};color:${INK}">${escapeHtml(letter.line)}</p>`,
    ...letter.lead.map(block),
    railRule(),
    ...letter.body.map(block),
    hairline(),
    `<p class="soft" style="margin:0;font:400 16px/1.4 ${TEXT};color:${SOFT}">${escapeHtml(letter.foot)}</p>`,
  ].join('\n');
  return `<!doctype html>
<html lang="en"><head><meta charset="utf-8"><meta name="viewport" content="width=device-width"><meta name="color-scheme" content="light dark"><meta name="supported-color-schemes" content="light dark"><title>${escapeHtml(oneLine(letter.subject))}</title>
<style>${STYLE_SHEET}</style></head>
<body class="mist" bgcolor="${MIST}" style="margin:0;background:${MIST}">
<div style="display:none;max-height:0;overflow:hidden">${escapeHtml(letter.preview)}</div>
${table(`class="sheet" width="100%" align="center" bgcolor="${PAPER}" style="width:100%;max-width:600px;background:${PAPER}"`, `<tr><td class="pad" style="padding:28px 30px 26px">\n${sheet}\n</td></tr>`)}
</body></html>`;
}

function block(each: Block): string {
  switch (each.kind) {
    case 'paragraph': return `<p class="ink" style="margin:0 0 16px;${inkText}">${inline(each.parts)}</p>`;
    case 'section': return `<h2 class="ink" style="margin:0 0 6px;font:800 24px/1.15 ${HEADING};color:${INK}">${escapeHtml(each.title)}</h2>
<p class="ink" style="margin:0 0 20px;${inkText}">${inline(each.parts)}</p>`;
    case 'button': return `${table('', `<tr><td class="btn" bgcolor="${DAMSON}" style="background:${DAMSON};padding:17px 26px"><a href="${escapeHtml(each.href)}" style="font:700 20px/1.1 ${TEXT};color:#ffffff;text-decoration:none">${escapeHtml(each.label)}</a></td></tr>`)}<div style="height:14px;font-size:0;line-height:0">&nbsp;</div>`;
    case 'code': return `<p class="ink" style="margin:6px 0 20px;font:700 40px/1.2 ${MONO};letter-spacing:.06em;color:${INK};white-space:nowrap">${escapeHtml(each.code)}</p>`;
    case 'timetable': return timetable(each.rows);
    case 'day': return dayCells(each.visits, each.hour);
    case 'figures': return table('width="100%" style="margin:0 0 20px"', each.rows.map(([label, value]) => `<tr><td class="ink rb" style="${inkText};padding:9px 14px 9px 0;border-bottom:1px solid ${RULE}">${escapeHtml(label)}</td><td class="ink rb" align="right" style="font:600 18px/1.4 ${MONO};color:${INK};padding:9px 0;border-bottom:1px solid ${RULE}">${escapeHtml(value)}</td></tr>`).join(''));
    case 'rule': return hairline();
  }
}

function inline(parts: readonly Inline[]): string {
  return parts.map((part) => {
    if (typeof part === 'string') return escapeHtml(part).replaceAll('\n', '<br>');
    if ('strong' in part) return `<b>${escapeHtml(part.strong)}</b>`;
    if ('address' in part) return escapeHtml(part.address).replaceAll('\n', '<br>');
    if ('code' in part) return `<span style="font:600 19px ${MONO};white-space:nowrap">${escapeHtml(part.code)}</span>`;
    return `<a class="dam" href="${escapeHtml(part.href)}" style="color:${DAMSON};text-decoration:underline">${escapeHtml(part.link)}</a>`;
  }).join('');
}

/** The rail rule: a rail on its sleeper ends, as cells of a table. */
function railRule(): string {
  const sleeper = `<td class="ink-bg" bgcolor="${INK}" style="height:6px;font-size:0;line-height:0"></td><td style="font-size:0;line-height:0"></td>`;
  const rail = table('width="100%"', `<tr><td class="ink-bg" bgcolor="${INK}" height="4" style="height:4px;font-size:0;line-height:0"></td></tr><tr><td height="2" style="height:2px;font-size:0;line-height:0"></td></tr>`);
  return `${rail}${table('width="100%" style="table-layout:fixed"', `<tr style="height:6px">${sleeper.repeat(25)}</tr>`)}<div style="height:22px;font-size:0;line-height:0">&nbsp;</div>`;
}

const hairline = (): string => table('width="100%"', `<tr><td class="rt" style="border-top:1px solid ${RULE};height:18px;font-size:0;line-height:0">&nbsp;</td></tr>`);

function timetable(rows: readonly TimetableRow[]): string {
  const head = ['arr.', 'garden', 'dep.'].map((word, at) => `<td class="soft ib" align="${at === 2 ? 'right' : 'left'}" style="${softItalic};padding:0 0 7px;border-bottom:2px solid ${INK}">${word}</td>`).join('');
  const body = rows.map((row, at) => {
    const isLast = at === rows.length - 1;
    const time = (text: string, name: string, align: string) => `<td width="76" align="${align}" valign="top" class="ink ${name}" style="width:76px;font:600 20px/1.25 ${MONO};color:${INK};white-space:nowrap;padding:15px 0 0">${escapeHtml(text)}</td>`;
    const notes = row.notes.map((note) => `<div class="ink" style="${inkText};padding-top:3px">${inline(note)}</div>`).join('');
    const name = `<div class="ink" style="font:800 20px/1.15 ${HEADING};color:${INK}">${escapeHtml(row.name)}</div>${notes}`;
    const garden = `<td valign="top" style="padding:11px 10px 0 0">${table('', `<tr><td class="po" width="48" valign="top" style="width:48px">${post(row.stopNumber)}</td><td valign="top" style="padding:3px 0 0">${name}</td></tr>`)}</td>`;
    const closing = isLast
      ? `<tr><td colspan="3" class="ib" style="height:14px;font-size:0;line-height:0;border-bottom:2px solid ${INK}">&nbsp;</td></tr>`
      : `<tr><td class="rb" style="border-bottom:1px solid ${RULE};font-size:0">&nbsp;</td><td colspan="2" class="soft rb jo" style="${softItalic};padding:6px 0 10px 48px;border-bottom:1px solid ${RULE}">${row.journey === null ? '&nbsp;' : escapeHtml(row.journey)}</td></tr>`;
    return `<tr>${time(row.arrives, 'tt', 'left')}${garden}${time(row.leaves, 'td', 'right')}</tr>${closing}`;
  });
  return `${table('width="100%"', `<tr>${head}</tr>${body.join('')}`)}<div style="height:22px;font-size:0;line-height:0">&nbsp;</div>`;
}

/** The stop's post as mail can draw it: its number on its card colour, the dark face beside it; doubled edges from the eighth on. */
function post(stopNumber: number): string {
  const edge = stopNumber > 7 ? `4px double ${INK}` : `2px solid ${INK}`;
  return table('', `<tr><td class="pe" width="22" height="34" align="center" bgcolor="${cardOf(stopNumber)}" style="width:22px;height:34px;background:${cardOf(stopNumber)};border:${edge};border-right:0;font:800 20px/1 ${HEADING};color:${INK}">${stopNumber}</td><td class="ink-bg" width="9" bgcolor="${INK}" style="width:9px;font-size:0;line-height:0">&nbsp;</td></tr>`);
}
