import type { KeyboardEvent } from 'react';

type Step = { row: number; column: number };

/** In strips a garden's times run down the page; in the timetable they run across. */
const ACROSS: Record<string, Step> = { ArrowRight: { row: 0, column: 1 }, ArrowLeft: { row: 0, column: -1 }, ArrowDown: { row: 1, column: 0 }, ArrowUp: { row: -1, column: 0 } };
const DOWN: Record<string, Step> = { ArrowDown: { row: 0, column: 1 }, ArrowUp: { row: 0, column: -1 }, ArrowRight: { row: 1, column: 0 }, ArrowLeft: { row: -1, column: 0 } };

const controlIn = (table: HTMLElement, row: number, column: number) =>
  table.querySelector<HTMLElement>(`[data-cell="${row}-${column}"] [data-control]`);

/** Arrow keys go to the next time that can be chosen or asked about; Home and End to the ends of a garden. */
export function moveByArrows(event: KeyboardEvent<HTMLTableElement>, rows: number, columns: number): void {
  const table = event.currentTarget;
  const cell = event.target instanceof HTMLElement ? event.target.closest('[data-cell]') : null;
  const [row, column] = (cell?.getAttribute('data-cell') ?? '').split('-').map(Number);
  if (row === undefined || column === undefined || Number.isNaN(row) || event.altKey || event.ctrlKey || event.metaKey) return;
  const isWide = getComputedStyle(table).display === 'table';
  const step = (isWide ? ACROSS : DOWN)[event.key];
  const next = step ? search(table, row, column, step, rows, columns) : ends(table, event.key, row, columns);
  if (!next) return;
  event.preventDefault();
  next.focus();
}

function search(table: HTMLElement, row: number, column: number, step: Step, rows: number, columns: number): HTMLElement | null {
  for (let r = row + step.row, c = column + step.column; r >= 0 && r < rows && c >= 0 && c < columns; r += step.row, c += step.column) {
    const control = controlIn(table, r, c);
    if (control && isShown(control)) return control;
  }
  return null;
}

function ends(table: HTMLElement, key: string, row: number, columns: number): HTMLElement | null {
  if (key !== 'Home' && key !== 'End') return null;
  return key === 'Home' ? search(table, row, -1, { row: 0, column: 1 }, row + 1, columns) : search(table, row, columns, { row: 0, column: -1 }, row + 1, columns);
}

/** Rows of a run that is folded into one are not on the page. */
const isShown = (control: HTMLElement) => control.getClientRects().length > 0;
