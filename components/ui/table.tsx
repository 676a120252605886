import Link from 'next/link';
import { Fragment, type ReactNode } from 'react';

export type Sorting = { href: string; order: 'ascending' | 'descending' | 'none' };

export type Column<Row> = {
  key: string;
  head: ReactNode;
  /** `figures`: right-aligned, in the mono face. */
  set?: 'text' | 'figures';
  /** The cell that names the row, read out with each of its cells. One a table. */
  names?: 'row';
  sorting?: Sorting;
  cell: (row: Row) => ReactNode;
};

type TableProps<Row> = {
  caption: ReactNode;
  /** A caption that a heading above already says is read out but not printed twice. */
  captionShown?: 'shown' | 'spoken';
  columns: readonly Column<Row>[];
  rows: readonly Row[];
  rowKey: (row: Row) => string;
  /** The row's own address on the page, for a pencil note's arrow. */
  rowId?: (row: Row) => string;
  /** A row opens to its line, below it and as wide as the table. */
  opened?: (row: Row) => ReactNode;
  /** What stands there when there are no rows: a sentence and what to do first. */
  empty: ReactNode;
  /** `figures`: most columns are short numbers, so that more of them fit on a phone. */
  room?: keyof typeof ROOM_REM;
};

/** A staff table: hairlines, figures in columns, heads that sort by link. Scrolls in its own frame on a phone. */
export function Table<Row>({ caption, captionShown = 'spoken', columns, rows, rowKey, rowId, opened, empty, room = 'words' }: TableProps<Row>) {
  if (rows.length === 0) return <div className="py-3">{empty}</div>;
  return (
    <div className="scroll-frame" role="region" aria-label={typeof caption === 'string' ? caption : 'Table'} tabIndex={0}>
      <table className="w-full border-collapse" style={{ minWidth: `${columns.length * ROOM_REM[room]}rem` }}>
        <caption className={captionShown === 'spoken' ? 'sr-only' : 'note pb-2 text-lg'}>{caption}</caption>
        <thead>
          <tr>
            {columns.map((column) => (
              <Head key={column.key} column={column} />
            ))}
          </tr>
        </thead>
        <tbody>
          {rows.map((row) => (
            <Fragment key={rowKey(row)}>
              <tr className="border-b border-rule" {...(rowId === undefined ? {} : { id: rowId(row) })}>
                {columns.map((column) => (
                  <Cell key={column.key} column={column} row={row} />
                ))}
              </tr>
              <OpenedRow span={columns.length}>{opened?.(row)}</OpenedRow>
            </Fragment>
          ))}
        </tbody>
      </table>
    </div>
  );
}

/* Room for each column on a phone, where the frame scrolls rather than break words. */
const ROOM_REM = { words: 6.5, figures: 4.5 };

const setting = (set: 'text' | 'figures' = 'text') => (set === 'figures' ? 'text-right whitespace-nowrap pl-2' : 'text-left pl-4 pr-2 last:pr-0');

function Head<Row>({ column }: { column: Column<Row> }) {
  const { sorting } = column;
  const look = `border-b-[1.5px] border-ink pt-1 pb-1.5 align-bottom font-semibold text-ink-soft first:pl-0 ${setting(column.set)}`;
  if (sorting === undefined) return <th scope="col" className={look}>{column.head}</th>;
  return (
    <th scope="col" className={look} aria-sort={sorting.order}>
      <Link href={sorting.href} className={`inline-flex min-h-11 items-end pointer-fine:min-h-7 ${sorting.order === 'none' ? 'text-ink-soft hover:underline' : 'text-ink underline decoration-[1.5px] underline-offset-4'}`}>
        {column.head}
        {sorting.order === 'none' ? null : <span aria-hidden="true" className="pl-1.5">{sorting.order === 'ascending' ? '▴' : '▾'}</span>}
      </Link>
    </th>
  );
}

function Cell<Row>({ column, row }: { column: Column<Row>; row: Row }) {
  const look = `py-1.5 align-baseline first:pl-0 ${setting(column.set)} ${column.set === 'figures' ? 'figures' : ''}`;
  if (column.names === 'row') return <th scope="row" className={`${look} font-semibold`}>{column.cell(row)}</th>;
  return <td className={look}>{column.cell(row)}</td>;
}

function OpenedRow({ span, children }: { span: number; children: ReactNode }) {
  if (children === undefined || children === null || children === false) return null;
  return (
    <tr className="border-b border-rule">
      <td colSpan={span} className="py-4">{children}</td>
    </tr>
  );
}
