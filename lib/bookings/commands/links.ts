import 'server-only';
import { and, eq, isNotNull, isNull } from 'drizzle-orm';
import type { Queryable } from '@/db/client';
import { bookingContacts, bookings } from '@/db/schema/bookings';
import { openDays } from '@/db/schema/opendays';
import { bearerLinks } from '@/db/schema/people';
import type { Id } from '@/lib/core/ids';
import { firstOrNull, only } from '@/lib/core/only';
import { Refusal } from '@/lib/core/refusal';
import { addMinutes } from '@/lib/core/time';
import type { BookingActor, Ctx, HolderActor } from '@/lib/infra/context';
import { hashSecret, newSecret } from '@/lib/infra/secrets';
import { inTransaction } from '@/lib/infra/transaction';
import { linksEndAt } from '@/lib/letters/links';
import type { HoldIdInput } from '../schema';
import { findParty, queueInvitations } from './confirm';

/** A secret whose hash alone is kept; `kind` says how it was handed over. */
async function newLink(db: Queryable, kind: 'browser' | 'calendar', code: string, now: Date, expiresAt: Date): Promise<string> {
  const secret = newSecret();
  await db.insert(bearerLinks).values({ kind, subjectId: code, secretHash: hashSecret(secret), madeAt: now, expiresAt });
  return secret;
}

/** Lets the browser that kept and paid for places open its booking's page. Such a link says nothing about whose mailbox it is. */
export async function openBooking({ db, actor, now }: Ctx<HolderActor>, input: HoldIdInput): Promise<{ code: string; secret: string }> {
  const own = firstOrNull(await db.select({ code: bookings.code, closesAt: openDays.closesAt }).from(bookings).innerJoin(openDays, eq(openDays.id, bookings.openDayId))
    .where(and(eq(bookings.id, input.bookingId), eq(bookings.holderHash, actor.holderHash), isNotNull(bookings.confirmedAt))));
  if (!own) throw new Refusal('not_found');
  return { code: own.code, secret: await newLink(db, 'browser', own.code, now, linksEndAt(own.closesAt)) };
}

/** Makes the private calendar feed of a booking, once; an earlier link stops working. Answers the secret, which is shown this once. */
export async function makeFeed(ctx: Ctx<BookingActor>): Promise<string> {
  return inTransaction(ctx.db, async (tx) => {
    const own = await findOwn(tx, ctx.actor.bookingId);
    await tx.update(bearerLinks).set({ revokedAt: ctx.now }).where(and(eq(bearerLinks.kind, 'calendar'), eq(bearerLinks.subjectId, own.code), isNull(bearerLinks.revokedAt)));
    return newLink(tx, 'calendar', own.code, ctx.now, linksEndAt(own.closesAt));
  });
}

/** Takes the private calendar feed back: calendars that read it find nothing any more. */
export async function revokeFeed(ctx: Ctx<BookingActor>): Promise<void> {
  const own = await findOwn(ctx.db, ctx.actor.bookingId);
  await ctx.db.update(bearerLinks).set({ revokedAt: ctx.now }).where(and(eq(bearerLinks.kind, 'calendar'), eq(bearerLinks.subjectId, own.code), isNull(bearerLinks.revokedAt)));
}

/**
 * Confirms that the letters reach the party: only for whoever followed a link that came in one. After the addresses were
 * released, its calendar learns them now.
 */
export async function confirmEmail(ctx: Ctx<BookingActor>): Promise<void> {
  const { actor, now, club } = ctx;
  if (actor.provesMailbox !== true) throw new Refusal('not_allowed', { sentence: 'Open this page from the letter we sent to that address, then press the button here.' });
  await inTransaction(ctx.db, async (tx) => {
    const news = await tx.update(bookingContacts).set({ emailConfirmedAt: now }).where(and(eq(bookingContacts.bookingId, actor.bookingId), isNull(bookingContacts.emailConfirmedAt))).returning({ id: bookingContacts.bookingId });
    if (news.length === 0) return;
    const { opensAt } = await findOwn(tx, actor.bookingId);
    const party = now >= addMinutes(opensAt, -club.addressReleaseHours * 60) && now < opensAt ? await findParty(tx, actor.bookingId) : null;
    if (party) await queueInvitations(tx, ctx, party, 'address');
  });
}

const findOwn = async (db: Queryable, bookingId: Id<'booking'>) =>
  only(await db.select({ code: bookings.code, opensAt: openDays.opensAt, closesAt: openDays.closesAt }).from(bookings).innerJoin(openDays, eq(openDays.id, bookings.openDayId)).where(eq(bookings.id, bookingId)));
