import 'server-only';
import { createHash } from 'node:crypto';
import { and, eq, isNotNull, isNull, sql } from 'drizzle-orm';
import type { z } from 'zod';
import { bookingContacts, bookings, visits } from '@/db/schema/bookings';
import { entryTimes } from '@/db/schema/opendays';
import { recordChange } from '@/lib/club/commands';
import type { AccountCtx } from '@/lib/infra/context';
import { inTransaction } from '@/lib/infra/transaction';
import { queueLetter } from '@/lib/letters/commands';
import type { noticeInput } from '../schema';

/** Writes one letter to each party with live places on an open day, or at one of its stops; returns how many. The same words twice in a minute are one letter. */
export async function writeToParties(ctx: AccountCtx, input: z.output<typeof noticeInput>): Promise<number> {
  const minute = ctx.now.toISOString().slice(0, 16);
  const words = createHash('sha256').update(`${input.subject}\n${input.body}`).digest('base64url').slice(0, 16);
  return inTransaction(ctx.db, async (tx) => {
    const parties = await tx.selectDistinct({ bookingId: bookings.id, name: bookingContacts.name, email: bookingContacts.email })
      .from(bookings)
      .innerJoin(bookingContacts, eq(bookingContacts.bookingId, bookings.id))
      .innerJoin(visits, and(eq(visits.bookingId, bookings.id), isNull(visits.givenBackAt)))
      .innerJoin(entryTimes, eq(entryTimes.id, visits.entryTimeId))
      .where(and(eq(bookings.openDayId, input.openDayId), isNotNull(bookings.confirmedAt), isNotNull(bookingContacts.email), input.stopId === null ? undefined : sql`${entryTimes.stopId} = ${input.stopId}::uuid`));
    for (const { bookingId, name, email } of parties) {
      if (email === null) continue;
      await queueLetter(tx, { key: `notice:${bookingId}:${words}:${minute}`, kind: 'notice', to: { name, address: email }, madeAt: ctx.now, dueAt: ctx.now, openDayId: input.openDayId, bookingId, facts: { subject: input.subject, body: input.body } });
    }
    await recordChange(tx, ctx, { action: 'wrote to the parties', subjectKind: 'open day', subjectId: input.openDayId, after: { subject: input.subject, letters: parties.length } });
    return parties.length;
  });
}
