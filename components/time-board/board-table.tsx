import { useState, type ReactNode } from 'react';
import { runsOf, type CellState } from '@/lib/opendays/rules/board';
import { journeyNote, type DayLine } from '@/lib/opendays/rules/day-line';
import { cutsOf, trackPieces } from '@/lib/opendays/rules/track';
import type { BoardCell, BoardView } from '@/lib/opendays/views';
import { moveByArrows } from './arrow-keys';
import { Cell, type CellActs } from './board-cell';
import { edgeLine, type Edge } from './edge-line';
import styles from './time-board.module.css';

type BoardTableProps = {
  board: BoardView;
  states: CellState[][];
  chosen: readonly BoardCell[];
  day: DayLine;
  heads: number;
  people: number;
  caption: string;
  headOf: (stopId: string) => ReactNode;
  choose: { toggle: (id: string) => void; insist: (id: string) => void };
  isAwake: boolean;
};

const canFocus = (state: CellState | undefined) => state !== undefined && (state.kind === 'open' || state.kind === 'few' || state.kind === 'yours' || state.kind === 'barred');

/** The time board: a real table, with one stop for the Tab key in each garden and arrow keys between times. */
export function BoardTable({ board, states, chosen, day, heads, people, caption, headOf, choose, isAwake }: BoardTableProps) {
  const [asked, setAsked] = useState<string | null>(null);
  const [opened, setOpened] = useState<readonly string[]>([]);
  const [tabStops, setTabStops] = useState<Record<string, number>>({});
  const pieces = trackPieces(chosen, board.stops.length - 1);
  const cuts = cutsOf(pieces);
  const settle = () => { setAsked(null); setOpened([]); };
  const acts: CellActs = {
    toggle: (id) => { settle(); choose.toggle(id); },
    insist: (id) => { settle(); choose.insist(id); },
    ask: setAsked,
    open: (ids) => setOpened((before) => (ids.every((id) => before.includes(id)) ? before.filter((id) => !ids.includes(id)) : [...before, ...ids])),
  };
  const tabStopOf = (row: number): number => {
    const kept = tabStops[board.stops[row]?.stopId ?? ''];
    if (kept === undefined || !canFocus(states[row]?.[kept])) return states[row]?.findIndex(canFocus) ?? -1;
    const run = runsOf(board, states[row] ?? [], row).find((each) => each.from <= kept && kept <= each.to);
    const isFolded = run !== undefined && run.to > run.from && !opened.includes(board.rows[row]?.[kept]?.entryTimeId ?? '');
    return isFolded ? run.from : kept; // a narrow sheet shows only the first of a folded run
  };
  return (
    <table
      role="table"
      className={styles.table}
      data-clock={board.columns.some((column) => column.text.includes(' ')) ? 'h12' : 'h23'}
      onKeyDown={(event) => { if (event.key === 'Escape') setAsked(null); else moveByArrows(event, board.stops.length, board.columns.length); }}
      onFocus={(event) => rememberStop(event.target, board, setTabStops)}
      onBlur={(event) => { if (event.relatedTarget instanceof Element && !event.relatedTarget.closest('[data-asked]')) setAsked(null); }}
    >
      <caption className="sr-only">{caption}</caption>
      <thead role="rowgroup">
        <tr role="row">
          <th role="columnheader" scope="col" className={styles.corner}>Gardens down, entry times across</th>
          {board.columns.map((column) => <th key={column.opens} role="columnheader" scope="col" className={styles.hour}>{column.text}</th>)}
        </tr>
      </thead>
      <tbody role="rowgroup">
        {board.stops.map((stop, row) => {
          const rowStates = states[row] ?? [];
          const runs = runsOf(board, rowStates, row);
          const edge: Edge = edgeLine(chosen, row);
          return (
            <tr key={stop.stopId} role="row" className={styles.row}>
              <th role="rowheader" scope="row" className={styles.head} {...(edge.head ? { 'data-line': 'full' } : {})}>{headOf(stop.stopId)}</th>
              {rowStates.map((state, column) => {
                const cell = board.rows[row]?.[column] ?? null;
                const run = runs.find((each) => each.from <= column && column <= each.to) ?? { from: column, to: column, reason: null };
                const runIds = (board.rows[row] ?? []).slice(run.from, run.to + 1).flatMap((each) => (each ? [each.entryTimeId] : []));
                const index = cell ? day.stays.findIndex((stay) => stay.entryTimeId === cell.entryTimeId) : -1;
                const [stay, journey] = [day.stays[index], day.journeys[index]];
                return (
                  <Cell
                    key={column}
                    {...{ board, stop, cell, state, row, column, heads, people, run, runIds, acts }}
                    isAsked={cell !== null && asked === cell.entryTimeId && state.kind === 'barred'}
                    isOpened={cell !== null && opened.includes(cell.entryTimeId) && state.kind === 'barred'}
                    line={edge.cell(column)}
                    pieces={pieces.get(`${row}-${column}`) ?? []}
                    cut={cuts.get(`${row}-${column}`) ?? null}
                    note={stay && journey ? journeyNote(board, stay, journey) : null}
                    tabIndex={isAwake ? (tabStopOf(row) === column ? 0 : -1) : null}
                  />
                );
              })}
            </tr>
          );
        })}
      </tbody>
    </table>
  );
}

function rememberStop(target: EventTarget, board: BoardView, keep: (next: (before: Record<string, number>) => Record<string, number>) => void): void {
  const [row, column] = (target instanceof Element ? target.closest('[data-cell]')?.getAttribute('data-cell') ?? '' : '').split('-').map(Number);
  const stopId = row === undefined ? undefined : board.stops[row]?.stopId;
  if (stopId !== undefined && column !== undefined) keep((before) => ({ ...before, [stopId]: column }));
}
