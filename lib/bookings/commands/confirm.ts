import 'server-only';
import { and, asc, eq, isNull } from 'drizzle-orm';
import type { Tx } from '@/db/client';
import { bookingContacts, bookings, visits } from '@/db/schema/bookings';
import type { Id } from '@/lib/core/ids';
import { firstOrNull } from '@/lib/core/only';
import { Refusal } from '@/lib/core/refusal';
import type { Ctx, HolderActor } from '@/lib/infra/context';
import { inTransaction } from '@/lib/infra/transaction';
import { queueLetter } from '@/lib/letters/commands';
import type { HoldIdInput } from '../schema';
import { lockLiveHold, lockOwn } from './keeping';

/** Makes kept places the party's own, in the caller's transaction, and owes it the letters. The booking row is locked and not confirmed. */
export async function confirmBooking(tx: Tx, ctx: Ctx, bookingId: Id<'booking'>): Promise<void> {
  await tx.update(bookings).set({ confirmedAt: ctx.now, releasedAt: null }).where(eq(bookings.id, bookingId));
  const party = await findParty(tx, bookingId);
  if (!party) return;
  const { to, openDayId } = party;
  await queueLetter(tx, { key: `confirmation:${bookingId}`, kind: 'confirmation', to, madeAt: ctx.now, dueAt: ctx.now, openDayId, bookingId, facts: {} });
  await queueInvitations(tx, ctx, party, 'confirmation');
}

/** Owes a party that wants them the invitation to each live visit as it stands when the letter goes. */
export async function queueInvitations(tx: Tx, ctx: Ctx, party: Addressee, cause: string): Promise<void> {
  if (!party.wantsInvitations) return;
  const { bookingId, to, openDayId } = party;
  const live = await tx.select({ id: visits.id, version: visits.version }).from(visits).where(and(eq(visits.bookingId, bookingId), isNull(visits.givenBackAt))).orderBy(asc(visits.id));
  for (const visit of live) await queueInvitation(tx, ctx, { bookingId, to, openDayId }, visit, cause);
}

/** Owes a party the invitation to one visit as it stands when the letter goes, or its withdrawal. */
export async function queueInvitation(tx: Tx, ctx: Ctx, party: Pick<Addressee, 'bookingId' | 'to' | 'openDayId'>, visit: { id: Id<'visit'>; version: number }, cause: string): Promise<void> {
  const { bookingId, to, openDayId } = party;
  await queueLetter(tx, { key: `calendar:${visit.id}:${visit.version}:${cause}`, kind: 'calendar', to, madeAt: ctx.now, dueAt: ctx.now, openDayId, bookingId, facts: { visitId: visit.id } });
}

/** Whom to write to about a booking. */
export type Addressee = { bookingId: Id<'booking'>; to: { name: string; address: string }; openDayId: Id<'openDay'>; wantsInvitations: boolean };

/** Whom to write to about a booking, or null when it gave no address. */
export async function findParty(tx: Tx, bookingId: Id<'booking'>): Promise<Addressee | null> {
  const row = firstOrNull(await tx.select({ name: bookingContacts.name, email: bookingContacts.email, openDayId: bookings.openDayId, wantsInvitations: bookings.wantsInvitations })
    .from(bookings).innerJoin(bookingContacts, eq(bookingContacts.bookingId, bookings.id)).where(eq(bookings.id, bookingId)));
  if (!row || row.email === null) return null;
  return { bookingId, to: { name: row.name, address: row.email }, openDayId: row.openDayId, wantsInvitations: row.wantsInvitations };
}

/** Confirms places that cost nothing; a second press finds them confirmed and is content. Answers the booking's code. */
export async function confirmFree(ctx: Ctx<HolderActor>, input: HoldIdInput): Promise<string> {
  return inTransaction(ctx.db, async (tx) => {
    const own = await lockOwn(tx, ctx, input.bookingId);
    if (own.confirmedAt !== null) return own.code;
    const hold = await lockLiveHold(tx, ctx, input.bookingId);
    if (hold.totalMinor > 0) throw new Refusal('must_be_paid');
    await requireDetails(tx, hold);
    await confirmBooking(tx, ctx, hold.id);
    return hold.code;
  });
}

/** Nothing is confirmed or paid before the party said who it is and agreed to the visit rules. */
export async function requireDetails(tx: Tx, hold: { id: Id<'booking'>; rulesAgreedAt: Date | null }): Promise<{ email: string | null }> {
  const contact = firstOrNull(await tx.select({ email: bookingContacts.email }).from(bookingContacts).where(eq(bookingContacts.bookingId, hold.id)));
  if (hold.rulesAgreedAt === null || !contact) throw new Refusal('terms_not_agreed');
  return contact;
}
