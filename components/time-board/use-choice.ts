'use client';

import { useCallback, useState } from 'react';
import type { FormState } from '@/lib/core/form-state';
import type { Only } from '@/lib/opendays/rules/board';
import { boardAddress, readBoardAsked, type BoardAsked, type Query } from '@/lib/opendays/rules/board-asked';
import { headsTyped } from '@/lib/opendays/rules/party';
import type { People } from '@/lib/bookings/rules/party';

/** The people boxes as they were typed. */
export type PartyTyped = BoardAsked['typed'];
/** What the address says, or a form that came back: the board's first setting. */
export type FirstChoice = BoardAsked;

const listOf = (value: string | string[] | undefined) => (value === undefined ? [] : Array.isArray(value) ? value : [value]);
const textOf = (value: string | string[] | undefined, otherwise: string) => listOf(value)[0] ?? otherwise;

/** What was sent and came back is kept; else what the page began with. */
export function firstChoice(state: FormState, first: FirstChoice): FirstChoice {
  const sent = state.values;
  if (!sent) return first;
  const { adults, children, babes } = first.typed;
  return {
    only: first.only,
    chosen: listOf(sent['entryTimeId[]']),
    typed: { adults: textOf(sent['adults'], adults), children: textOf(sent['children'], children), babes: textOf(sent['babes'], babes) },
  };
}

/** The people as numbers; a box that cannot be read counts as its last good figure would: nobody. */
export function partyOf(typed: PartyTyped): { party: People; isReadable: boolean } {
  const [adults, children, babes] = [headsTyped(typed.adults), headsTyped(typed.children), headsTyped(typed.babes)];
  return { party: { adults: adults ?? 0, children: children ?? 0, babes: babes ?? 0 }, isReadable: adults !== null && children !== null && babes !== null };
}

const queryOf = (fields: FormData | URLSearchParams): Query =>
  Object.fromEntries([...new Set(fields.keys())].map((name) => [name, fields.getAll(name).filter((value) => typeof value === 'string')]));

/** What stands in the boxes of the page right now: someone may tick before the script has come. */
const readTyped = (form: FormData): FirstChoice => readBoardAsked(queryOf(form));

/** What the browser's address asks for where it is not what was served: on the way back it shows a kept page at a later address. */
function askedSince(path: string, served: FirstChoice): FirstChoice | null {
  if (window.location.pathname !== path) return null;
  const asked = readBoardAsked(queryOf(new URLSearchParams(window.location.search)));
  return boardAddress(path, asked) === boardAddress(path, served) ? null : asked;
}

const isSame = (a: readonly string[], b: readonly string[]) => a.length === b.length && a.every((each) => b.includes(each));

/**
 * Everything the party decides on the board: people, times, and which it insisted on. `served` is what the address said.
 * The address follows each decision, so that a reload and the way back from the next page find it again.
 */
export function useChoice(first: FirstChoice, served: FirstChoice, path: string) {
  const [choice, setChoice] = useState(first);
  const [insisted, setInsisted] = useState<string[]>([]);
  const adopt = useCallback((form: HTMLFormElement | null) => {
    if (!form) return;
    const before = askedSince(path, served) ?? readTyped(new FormData(form));
    setChoice((now) => ({ ...before, chosen: isSame(now.chosen, before.chosen) ? now.chosen : before.chosen }));
  }, [path, served]);
  const decide = (change: Partial<FirstChoice>) => {
    const next = { ...choice, ...change };
    setChoice(next);
    window.history.replaceState(null, '', boardAddress(path, next));
  };
  const without = (entryTimeId: string) => choice.chosen.filter((each) => each !== entryTimeId);
  return {
    ...choice, insisted, adopt,
    type: (kind: keyof People, text: string) => decide({ typed: { ...choice.typed, [kind]: text } }),
    show: (only: Only) => decide({ only }),
    toggle: (entryTimeId: string) => decide({ chosen: choice.chosen.includes(entryTimeId) ? without(entryTimeId) : [...choice.chosen, entryTimeId] }),
    insist: (entryTimeId: string) => {
      setInsisted((before) => [...before, entryTimeId]);
      decide({ chosen: [...without(entryTimeId), entryTimeId] });
    },
  };
}
export type Choice = ReturnType<typeof useChoice>;
