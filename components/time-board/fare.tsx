import Link from 'next/link';
import { Button } from '@/components/ui/button';
import { Notice } from '@/components/ui/notice';
import type { FormState } from '@/lib/core/form-state';
import { keepWords, visitsInLine } from '@/lib/opendays/rules/day-line';
import type { People } from '@/lib/bookings/rules/party';
import { sumSentence } from '@/lib/opendays/rules/prices';
import type { BoardCell, BoardView } from '@/lib/opendays/views';
import styles from './time-board.module.css';

type FareProps = { board: BoardView; chosen: readonly BoardCell[]; party: People; heads: number; state: FormState; problem: string | null; isSending: boolean; isAwake: boolean };

/** What the choice comes to, what was refused and the way on, and the one main button. */
export function Fare({ board, chosen, party, heads, state, problem, isSending, isAwake }: FareProps) {
  const prices = chosen.flatMap((cell) => { const stop = board.stops[cell.row]; return stop ? [stop.prices] : []; });
  const sum = sumSentence(prices, party, board);
  const refused = problem ?? (state.status === 'refused' || state.status === 'invalid' ? state.message ?? null : null);
  return (
    <div className={styles.fare} data-chosen={isAwake && chosen.length > 0}>
      <div className="grid gap-1.5">
        {refused === null ? null : <Notice tone="danger" word={null}><Refused message={refused} state={state} isClash={problem === null && state.code === 'clash'} /></Notice>}
        {isAwake && chosen.length > 0 ? (
          <p className="max-w-none leading-snug">
            <span className={styles.narrowOnly}>{visitsInLine(board, chosen)}. </span>
            <span className={styles.wideOnly}>{sum.words} </span>
            <b className="font-heading text-[1.5rem] font-extrabold">{sum.amount}</b>
          </p>
        ) : <p className="max-w-none">Choose one time, or several at different gardens.{isAwake ? '' : ' The price stands on the next page.'}</p>}
        <p className={`max-w-none text-ink-soft ${styles.wideOnly ?? ''}`}>We keep them for you for {board.holdMinutes} minutes while you give a name{prices.length > 0 && sum.amount === 'free' ? '' : ' and pay'}.</p>
      </div>
      <Button type="submit" tone="main" aria-disabled={isSending}>{isAwake ? keepWords(chosen, heads) : 'Keep places at these times'}</Button>
    </div>
  );
}

/** The server's own words; after a clash, the box that says the party means it. */
function Refused({ message, state, isClash }: { message: string; state: FormState; isClash: boolean }) {
  return (
    <>
      <p>{message}</p>
      {Object.values(state.fieldErrors ?? {}).flat().map((sentence) => <p key={sentence}>{sentence}</p>)}
      {isClash ? (
        <label className="inline-flex min-h-11 cursor-pointer items-center gap-3"><input type="checkbox" name="insists" className="tick-box" /> choose it all the same</label>
      ) : null}
    </>
  );
}

/** A day on which nothing can be had now. */
export function NothingLeft() {
  return (
    <div className={styles.fare}>
      <p className="max-w-none">Every place is taken. Places come back when a party gives them back: look again later, or see <Link href="/open-days">the other days</Link>.</p>
    </div>
  );
}
