import { and, eq } from 'drizzle-orm';
import { getDb } from '@/db/client';
import { auditTrail } from '@/db/schema/club';
import { letters } from '@/db/schema/letters';
import { confirmFree } from '@/lib/bookings/commands/confirm';
import { saveDetails } from '@/lib/bookings/commands/keeping';
import type { Id } from '@/lib/core/ids';
import { aBrowser, anEntryTime, anOpenDay, aStop, ctxOf } from '@/tests/support/cast';
import { keep, TWO } from '../bookings/hold-cast';

const FREE = { adult: 0, child: 0, babe: 0 };

/** A free open day with one stop and one entry time at 10:00. */
export async function aFreeDay({ capacity = 12 } = {}) {
  const day = await anOpenDay({}, FREE);
  const stop = await aStop(day.id);
  return { day, stop, time: await anEntryTime(stop, { capacity }) };
}

/** A party that holds confirmed places. */
export async function aParty(openDayId: Id<'openDay'>, times: readonly Id<'entryTime'>[], { name = 'Eve Marlow', email = 'eve@visitors.example', people = TWO, wantsInvitations = true } = {}) {
  const who = aBrowser();
  const bookingId = await keep(openDayId, times, who, { people });
  const ctx = await ctxOf(who);
  await saveDetails(ctx, { bookingId, name, email, phone: null, rulesAgreed: true, wantsInvitations });
  const code = await confirmFree(ctx, { bookingId });
  return { bookingId, code };
}

/** The kinds of letters written to a booking since it was confirmed. */
export const lettersTo = async (bookingId: Id<'booking'>) =>
  (await getDb().select({ kind: letters.kind, key: letters.key }).from(letters).where(eq(letters.bookingId, bookingId))).filter((each) => !each.key.startsWith('confirmation') && !each.key.endsWith(':confirmation')).map((each) => each.kind).sort();

/** Who is on the audit trail for an action on a row. */
export const auditOf = (action: string, subjectId: string) =>
  getDb().select({ by: auditTrail.accountId }).from(auditTrail).where(and(eq(auditTrail.action, action), eq(auditTrail.subjectId, subjectId)));
