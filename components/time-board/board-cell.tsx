import { Pegs } from '@/components/drawing/pegs';
import { namingOf, spokenName, type CellState, type Run } from '@/lib/opendays/rules/board';
import { reasonInShort } from '@/lib/opendays/rules/reach';
import type { Piece } from '@/lib/opendays/rules/track';
import { counted } from '@/lib/opendays/rules/words';
import type { BoardCell, BoardStop, BoardView } from '@/lib/opendays/views';
import styles from './time-board.module.css';

/** What a cell may ask of the board. Before the page is awake nobody listens, and tick boxes work by themselves. */
export type CellActs = { toggle: (id: string) => void; insist: (id: string) => void; ask: (id: string | null) => void; open: (ids: string[]) => void };

export type CellProps = {
  board: BoardView;
  stop: BoardStop;
  cell: BoardCell | null;
  state: CellState;
  row: number;
  column: number;
  heads: number;
  people: number;
  run: Run;
  runIds: string[];
  isOpened: boolean; // its run is unfolded, on a narrow sheet
  isAsked: boolean; // its reason is shown, on a wide one
  line: 'full' | 'from' | 'to' | null;
  pieces: readonly Piece[];
  cut: 'foot' | 'head' | 'both' | null;
  note: string | null;
  tabIndex: number | null;
  acts: CellActs;
};

/** One cell of the board, in both settings: a box with a tick box, a bar with its reason, pegs, a dash or three dots. */
export function Cell(props: CellProps) {
  const { state, row, column, run, board, isOpened, isAsked, line, cut, pieces, note } = props;
  const isFolded = run.to > run.from && !isOpened;
  return (
    <td
      role="cell"
      className={styles.cell}
      data-cell={`${row}-${column}`}
      data-state={state.kind}
      data-side={column < board.columns.length / 2 ? 'left' : 'right'}
      {...(isFolded && column > run.from ? { 'data-run': 'rest' } : {})}
      {...(isOpened ? { 'data-opened': true } : {})}
      {...(isAsked ? { 'data-asked': true } : {})}
      {...(line ? { 'data-line': line } : {})}
      {...(cut ? { 'data-cut': cut } : {})}
    >
      <span className={styles.time} aria-hidden="true">{timesOf(board, column, isFolded && column === run.from ? run : null)}</span>
      <Inside {...props} isFolded={isFolded} />
      {pieces.map((piece) => <Track key={`${piece.part} ${piece.edge}`} piece={piece} />)}
      {note === null ? null : <p className={styles.note}>{note}</p>}
    </td>
  );
}

function timesOf(board: BoardView, column: number, run: Run | null): string {
  const text = (each: number) => (board.columns[each]?.text ?? '').replace(' ', '\u00a0');
  if (run === null) return text(column);
  return run.to === run.from + 1 ? `${text(run.from)}, ${text(run.to)}` : `${text(run.from)}–${text(run.to)}`;
}

function Inside(props: CellProps & { isFolded: boolean }) {
  const { board, stop, cell, state, heads, people } = props;
  if (cell === null) return <Flat mark="···" word="not open" spoken={`${stop.name}, ${board.columns[props.column]?.text ?? ''}, not open`} />;
  const spoken = spokenName(board, stop, cell, state, people);
  switch (state.kind) {
    case 'over': return <Flat mark="" word="over" spoken={spoken} />;
    case 'full': return <Flat mark="—" word="full" spoken={spoken} />;
    case 'fewer': return <Fewer places={state.places} heads={heads} spoken={spoken} />;
    case 'barred': return <Barred {...props} cell={cell} state={state} spoken={spoken} />;
    case 'none': return null;
    default: return <Box {...props} cell={cell} state={state} spoken={spoken} />;
  }
}

function Flat({ mark, word, spoken }: { mark: string; word: string; spoken: string }) {
  return (
    <span className={styles.flat}>
      <span className="sr-only">{spoken}</span>
      <span className={styles.dash} aria-hidden="true">{mark}</span>
      <span className={mark === '' ? '' : styles.narrowOnly} aria-hidden="true">{word}</span>
    </span>
  );
}

function Fewer({ places, heads, spoken }: { places: number; heads: number; spoken: string }) {
  return (
    <span className={styles.flat}>
      <span className="sr-only">{spoken}</span>
      <span className="inline-flex items-center gap-1.5" aria-hidden="true"><Pegs count={places} /><b className={styles.figure}>{places}</b></span>
      <span className={styles.narrowOnly} aria-hidden="true">left, you are {heads}</span>
    </span>
  );
}

type BoxProps = CellProps & { cell: BoardCell; state: Extract<CellState, { kind: 'open' | 'few' | 'yours' }>; spoken: string };

function Box({ cell, state, people, spoken, tabIndex, acts }: BoxProps) {
  const isYours = state.kind === 'yours';
  return (
    <label className={styles.box}>
      <input
        type="checkbox"
        name="entryTimeId[]"
        value={cell.entryTimeId}
        aria-label={spoken}
        data-control=""
        checked={isYours}
        onChange={() => acts.toggle(cell.entryTimeId)}
        onFocus={() => acts.ask(null)}
        {...(tabIndex === null ? {} : { tabIndex })}
      />
      {isYours ? <Yours cell={cell} isGone={state.isGone} people={people} /> : <Left places={state.places} isFew={state.kind === 'few'} />}
    </label>
  );
}

function Yours({ cell, isGone, people }: { cell: BoardCell; isGone: boolean; people: number }) {
  return (
    <>
      <span className={styles.mine} aria-hidden="true">{isGone ? 'gone: choose another' : `yours, ${counted(people, 'person', 'people')}`}</span>
      <span className={styles.mineWide} aria-hidden="true"><b>{cell.opensText.split(' ')[0]}</b>{isGone ? 'gone' : `${people} of us`}</span>
    </>
  );
}

function Left({ places, isFew }: { places: number; isFew: boolean }) {
  return (
    <>
      <b className={styles.figure} aria-hidden="true">{places}</b>
      <span className={styles.left} aria-hidden="true">left</span>
      {isFew ? <span className={styles.pegs}><Pegs count={places} /></span> : null}
    </>
  );
}

type BarredProps = CellProps & { cell: BoardCell; state: Extract<CellState, { kind: 'barred' }>; spoken: string; isFolded: boolean };

function Barred({ board, cell, state, run, runIds, spoken, tabIndex, acts, isAsked, isOpened, isFolded }: BarredProps) {
  const reason = reasonInShort(state.clash, cell.row, namingOf(board));
  return (
    <>
      <button
        type="button"
        className={styles.bar}
        aria-label={spoken}
        aria-expanded={isAsked || isOpened}
        data-control=""
        onFocus={() => acts.ask(cell.entryTimeId)}
        onClick={() => { acts.ask(cell.entryTimeId); acts.open(runIds); }}
        {...(tabIndex === null ? {} : { tabIndex })}
      >
        <span className={styles.reason}>{isFolded ? run.reason : reason}</span>
      </button>
      {isAsked || isOpened ? (
        <span className={styles.why}>
          <span className={styles.whyReason}>{reason}: </span>
          <button type="button" className={styles.choose} aria-label={`Choose ${cell.opensText} all the same`} onClick={() => acts.insist(cell.entryTimeId)}>
            choose it all the same
          </button>
        </span>
      ) : null}
    </>
  );
}

const PARTS = { start: styles.start, across: styles.across, corner: styles.turn, through: styles.through, end: styles.end };

function Track({ piece }: { piece: Piece }) {
  return (
    <span
      aria-hidden="true"
      className={`${styles.piece ?? ''} ${PARTS[piece.part] ?? ''}`}
      data-edge={piece.edge}
      {...(piece.isCut ? { 'data-cut': true } : {})}
      {...(piece.isBack ? { 'data-back': true } : {})}
    />
  );
}
