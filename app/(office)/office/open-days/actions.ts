'use server';
import { refresh } from 'next/cache';
import { redirect } from 'next/navigation';
import { changeEntryTime, closeEntryTime, makeEntryTimes, reopenEntryTime } from '@/lib/opendays/commands/entry-times';
import { writeToParties } from '@/lib/opendays/commands/notice';
import { setStopPrices } from '@/lib/opendays/commands/stop-prices';
import { addPlanNote, addStop, changeOpenDay, changeStop, makeOpenDay, publishOpenDay } from '@/lib/opendays/commands/plan';
import { entryTimeChangeInput, entryTimeIdInput, entryTimesInput, noticeInput, openDayChangeInput, openDayIdInput, openDayInput, planNoteInput, stopChangeInput, stopInput, stopPricesInput } from '@/lib/opendays/schema';
import { action } from '@/lib/web/action';
import { doneWith } from './done';

export const makeOpenDayAction = action({ requires: 'openDays.edit', input: openDayInput, run: makeOpenDay, after: (slug) => redirect(`/office/open-days/${slug}`) });

export const changeOpenDayAction = action({ requires: 'openDays.edit', input: openDayChangeInput, run: changeOpenDay, after: () => doneWith('Kept.') });

export const publishOpenDayAction = action({ requires: 'openDays.edit', input: openDayIdInput, run: publishOpenDay, after: () => doneWith('Everyone can see it now.') });

export const addStopAction = action({ requires: 'openDays.edit', input: stopInput, run: addStop, after: () => doneWith('The garden is a stop. Make its entry times next.') });

export const changeStopAction = action({ requires: 'openDays.edit', input: stopChangeInput, run: changeStop, after: () => doneWith('Kept.') });

export const setStopPricesAction = action({ requires: 'openDays.edit', input: stopPricesInput, run: setStopPrices, after: () => doneWith('These prices hold here from now on.') });

export const makeEntryTimesAction = action({ requires: 'openDays.edit', input: entryTimesInput, run: makeEntryTimes, after: (made) => doneWith(made === 1 ? 'One entry time is made.' : `${made} entry times are made.`) });

export const changeEntryTimeAction = action({
  requires: 'openDays.edit',
  input: entryTimeChangeInput,
  run: changeEntryTime,
  after: (told) => doneWith(told === 0 ? 'Changed.' : `Changed, and ${told === 1 ? 'one party is' : `${told} parties are`} written to.`),
});

export const closeEntryTimeAction = action({ requires: 'openDays.edit', input: entryTimeIdInput, run: closeEntryTime, after: () => refresh() });

export const reopenEntryTimeAction = action({ requires: 'openDays.edit', input: entryTimeIdInput, run: reopenEntryTime, after: () => refresh() });

export const writeToPartiesAction = action({ requires: 'letters.send', input: noticeInput, run: writeToParties, after: (written) => doneWith(`${written} ${written === 1 ? 'letter is' : 'letters are'} on the way.`) });

export const addPlanNoteAction = action({ requires: 'openDays.edit', input: planNoteInput, run: addPlanNote, after: () => doneWith('Pencilled in.') });
