import 'server-only';
import { asc, eq, lte } from 'drizzle-orm';
import { letters, lettersDue } from '@/db/schema/letters';
import { asId } from '@/lib/core/ids';
import type { SystemCtx } from '@/lib/infra/context';
import { enqueue } from '@/lib/infra/queue';
import { systemCtx } from '@/lib/infra/system';
import { getClub } from '@/lib/club/queries';
import { SEND_LETTER, sendLetterKey, sendLetterPayload } from './jobs';
import { queueAddressInvitations, queueReminders } from './reminders';
import { sendLetter } from './sending';

const letterCtx = () => systemCtx('letters', getClub);

/** One job a letter. A failure is written in the letter's own row, so the job itself ends well and the sweep comes back to it. */
export const tasks: Record<string, (payload: unknown) => Promise<void>> = {
  [SEND_LETTER]: async (payload) => {
    await sendLetter(await letterCtx(), asId<'letter'>(sendLetterPayload.parse(payload).letterId));
  },
};

/** Gives each letter that is due a job of its own, oldest first; a letter that has one already keeps it. */
export async function enqueueDueLetters({ db, now }: SystemCtx): Promise<number> {
  const due = await db.select({ letterId: lettersDue.letterId }).from(lettersDue).innerJoin(letters, eq(letters.id, lettersDue.letterId))
    .where(lte(lettersDue.dueAt, now)).orderBy(asc(lettersDue.dueAt)).limit(500);
  for (const { letterId } of due) await enqueue(db, SEND_LETTER, { letterId }, { runAt: now, jobKey: sendLetterKey(letterId) });
  return due.length;
}

/** What the nearness of a day makes due comes first, so that it goes out in the same sweep. */
export const sweeps: (() => Promise<void>)[] = [
  async function remindersDue() { await queueReminders(await letterCtx()); },
  async function addressInvitationsDue() { await queueAddressInvitations(await letterCtx()); },
  async function lettersDueNow() { await enqueueDueLetters(await letterCtx()); },
];
