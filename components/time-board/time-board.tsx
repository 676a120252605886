'use client';

import { QueryClient, QueryClientProvider } from '@tanstack/react-query';
import { startTransition, useActionState, useState, useSyncExternalStore, type CSSProperties, type FormEvent, type ReactNode } from 'react';
import { VisitorLine } from '@/components/day-graph/visitor-line';
import { idleForm, type FormAction } from '@/lib/core/form-state';
import { countPeople, headsOf } from '@/lib/bookings/rules/party';
import { REFUSALS } from '@/lib/core/refusal';
import { boardStates, chosenCells, hasPlaces, onlyFitting, settingOf, sittingOf, unbarred, withOwn } from '@/lib/opendays/rules/board';
import { dayLine } from '@/lib/opendays/rules/day-line';
import { partyMistake } from '@/lib/opendays/rules/party';
import { firstClash } from '@/lib/opendays/rules/reach';
import type { BoardView } from '@/lib/opendays/views';
import { BoardTable } from './board-table';
import { Fare, NothingLeft } from './fare';
import { goneSentence, News } from './news';
import { PeopleLine } from './people-line';
import styles from './time-board.module.css';
import { firstChoice, partyOf, useChoice, type FirstChoice } from './use-choice';
import { useFreshBoard } from './use-places';

export type TimeBoardProps = {
  board: BoardView;
  action: FormAction;
  first: FirstChoice;
  /** Heads that this browser keeps already, by entry time. */
  own: Record<string, number>;
  /** The page's own address, without its query. */
  path: string;
  caption: string;
  /** Drawn on the server: garden heads and posts by stop, the train, the key, the plants of the margin. */
  heads: Record<string, ReactNode>;
  posts: Record<string, ReactNode>;
  train: ReactNode;
  boardKey: ReactNode;
  beside: ReactNode;
};

const never = () => () => {};

/** The time board with the party's people, its day and the one button; one form that a browser can send without JavaScript. */
export function TimeBoard(props: TimeBoardProps) {
  const [client] = useState(() => new QueryClient({ defaultOptions: { queries: { retry: false } } }));
  return (
    <QueryClientProvider client={client}>
      <Board {...props} />
    </QueryClientProvider>
  );
}

function Board({ board: served, action, first, own, path, caption, heads: headOf, posts, train, boardKey, beside }: TimeBoardProps) {
  const isAwake = useSyncExternalStore(never, () => true, () => false);
  const [state, submit, isSending] = useActionState(action, idleForm);
  const [hasTried, setTried] = useState(false);
  const { adopt, ...choice } = useChoice(firstChoice(state, first), first, path);
  const { fresh, changes } = useFreshBoard(served);
  const board = onlyFitting(withOwn(fresh, own), choice.only, choice.chosen);
  const { party, isReadable } = partyOf(choice.typed);
  const heads = Math.max(1, headsOf(party, board.babesTakePlace));
  const chosen = chosenCells(board, choice.chosen);
  const judged = boardStates(board, heads, chosen);
  const states = isAwake ? judged : judged.map((row) => row.map(unbarred));
  const day = dayLine(board, chosen);
  const mistake = partyMistake(isReadable ? party : null, board.limits.people);
  const gone = goneSentence(board, states, chosen);
  const problem = mistake ?? (chosen.length === 0 ? 'Choose at least one time first.' : chosen.length > board.limits.visits ? REFUSALS.too_many_for_day : gone);
  const insists = choice.insisted.length > 0 && firstClash(chosen.map((cell) => sittingOf(board, cell)), board.minutes) !== null;
  const send = (event: FormEvent<HTMLFormElement>) => {
    event.preventDefault();
    const form = new FormData(event.currentTarget);
    setTried(true);
    if (problem === null && !isSending) startTransition(() => submit(form));
  };
  const called = chosen.find((cell) => cell.entryTimeId === choice.chosen.at(-1)) ?? chosen.at(-1);
  const setting = settingOf(board);
  return (
    <form ref={adopt} action={submit} onSubmit={send} className={styles.board} data-size={setting} noValidate>
      <input type="hidden" name="openDayId" value={board.openDayId} />
      {insists ? <input type="hidden" name="insists" value="on" /> : null}
      <PeopleLine typed={choice.typed} only={choice.only} mistake={mistake} path={path} acts={choice} />
      <div className={styles.sides} data-beside={setting !== 'many'}>
        <div className={styles.measure}>
          <div className={styles.sheet}>
            <div className={`rail ${styles.rail ?? ''}`} aria-hidden="true">
              <span className={styles.train} style={trainStands(((called?.column ?? 0) + 0.5) / Math.max(1, board.columns.length))}>{train}</span>
            </div>
            <BoardTable {...{ board, states, chosen, day, heads, caption, isAwake }} people={countPeople(party)} headOf={(stopId) => headOf[stopId]} choose={choice} />
            {board.stops.length === 0 ? <p className="py-4">No garden fits both. Untick one to see the others.</p> : null}
            {boardKey}
            {chosen.length === 0 ? null : <VisitorLine board={board} day={day} postOf={(stopId) => posts[stopId]} />}
            {chosen.length === 0 && !hasPlaces(board) ? <NothingLeft /> : <Fare {...{ board, chosen, party, heads, state, isSending, isAwake }} problem={gone ?? (hasTried ? problem : null)} />}
          </div>
        </div>
        {beside}
      </div>
      <News states={states} changes={changes} />
    </form>
  );
}

const trainStands = (share: number): CSSProperties & Record<'--share', number> => ({ '--share': share });
