import { escapeHtml } from './escape-html';
import type { DayVisit } from './letter';
import { cardOf, DAMSON, EDGE, HEADING, INK, MONO, RULE, SOFT } from './mail-tokens';
import { oneLine } from './printable';

const STEP = 10; // minutes a cell

type Cell = { card: string | null; foot: boolean; drop: boolean; line: 'hour' | 'half' | null };

/** The party's day as a line, drawn in table cells: time across, one garden a row by its number, stays in card colour. */
export function dayCells(visits: readonly DayVisit[], hour: (minutes: number) => string): string {
  const inTime = [...visits].sort((a, b) => a.arrives - b.arrives);
  const rows = [...new Map(visits.map((visit) => [visit.stopNumber, visit])).values()].sort((a, b) => a.stopNumber - b.stopNumber);
  const from = Math.floor(Math.min(...visits.map((visit) => visit.arrives)) / 60);
  const to = Math.max(from + 2, Math.ceil(Math.max(...visits.map((visit) => visit.leaves)) / 60));
  const hours = Array.from({ length: to - from }, (_, at) => (from + at) * 60);
  const every = hours.length > 7 ? 2 : 1; // figures that would touch are left out; on a phone from five hours on
  const labels = hours.map((minutes, at) => `<td colspan="6" class="ink${hours.length > 4 && at % 2 === 1 ? ' h2' : ''}" style="font:600 16px ${MONO};letter-spacing:-.04em;color:${INK};padding:0 0 4px;white-space:nowrap">${at % every === 0 ? escapeHtml(hour(minutes)) : ''}</td>`);
  const lines = rows.map((row, at) => `<tr><td class="ink gn" align="right" width="140" style="width:140px;font:600 17px/1.1 ${HEADING};color:${INK};padding:0 8px 0 0">${escapeHtml(oneLine(row.name))} ${row.stopNumber}</td>${cells(rows, inTime, at, from * 60, to * 60).map(cellHtml).join('')}</tr>`);
  return `<table role="presentation" width="100%" cellpadding="0" cellspacing="0" style="table-layout:fixed;border-collapse:separate"><tr><td class="gn" width="140" style="width:140px"></td>${labels.join('')}</tr>${lines.join('')}</table>
<p class="soft" style="margin:8px 0 20px;font:italic 400 16px/1.35 ${HEADING};color:${SOFT}">The same day as a line: time across, gardens down.</p>`;
}

/** One row's cells, equal neighbours joined, so that a long day stays a short letter. */
function cells(rows: readonly DayVisit[], inTime: readonly DayVisit[], at: number, from: number, to: number): { cell: Cell; span: number }[] {
  const joined: { cell: Cell; span: number }[] = [];
  for (let minutes = from; minutes < to; minutes += STEP) {
    const cell = cellAt(rows, inTime, at, minutes);
    const last = joined.at(-1);
    if (last && cell.line === null && !cell.drop && cell.card === last.cell.card && cell.foot === last.cell.foot) last.span += 1;
    else joined.push({ cell, span: 1 });
  }
  return joined;
}

/** The line stands at the foot of a garden's row from its arrival to the next one's, and drops there to the next row. */
function cellAt(rows: readonly DayVisit[], inTime: readonly DayVisit[], at: number, minutes: number): Cell {
  const rowOf = (visit: DayVisit) => rows.findIndex((row) => row.stopNumber === visit.stopNumber);
  const covers = (start: number, end: number) => minutes + STEP > start && minutes + STEP / 2 <= end;
  const cell: Cell = { card: null, foot: false, drop: false, line: minutes % 60 === 0 ? 'hour' : minutes % 30 === 0 ? 'half' : null };
  inTime.forEach((visit, place) => {
    const next = inTime[place + 1];
    if (rowOf(visit) === at) {
      if (covers(visit.arrives, visit.leaves)) cell.card = cardOf(visit.stopNumber);
      if (covers(visit.arrives, next ? Math.floor(next.arrives / STEP) * STEP : visit.leaves)) cell.foot = true;
    }
    if (!next || Math.floor(next.arrives / STEP) * STEP !== minutes) return;
    const [upper, lower] = [Math.min(rowOf(visit), rowOf(next)), Math.max(rowOf(visit), rowOf(next))];
    if (at > upper && at <= lower) cell.drop = true;
  });
  return cell;
}

function cellHtml({ cell, span }: { cell: Cell; span: number }): string {
  const left = cell.drop ? `border-left:4px solid ${DAMSON}` : cell.line === 'hour' ? `border-left:1px solid ${EDGE}` : cell.line === 'half' ? `border-left:1px solid ${RULE}` : '';
  const names = [cell.drop ? 'dl' : cell.line === 'hour' ? 'el' : cell.line === 'half' ? 'rl' : '', cell.foot ? 'db' : 'ib'].filter(Boolean).join(' ');
  const bottom = cell.foot ? `border-bottom:4px solid ${DAMSON}` : `border-bottom:1px solid ${INK}`;
  const card = cell.card ? ` bgcolor="${cell.card}"` : '';
  return `<td class="${names}"${span > 1 ? ` colspan="${span}"` : ''} height="34"${card} style="height:34px;padding:0;font-size:0;line-height:0;${left ? `${left};` : ''}${bottom}${cell.card ? `;background:${cell.card}` : ''}">&nbsp;</td>`;
}
