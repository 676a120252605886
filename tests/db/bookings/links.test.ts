import { eq } from 'drizzle-orm';
import { beforeAll, describe, expect, it } from 'vitest';
import { getDb } from '@/db/client';
import { bookingContacts, bookings, visits } from '@/db/schema/bookings';
import { placeShowings } from '@/db/schema/gardens';
import { bearerLinks } from '@/db/schema/people';
import { findBookingByFeed, findBookingByLink, findOwnBooking } from '@/lib/bookings/access';
import { confirmFree } from '@/lib/bookings/commands/confirm';
import { giveBack } from '@/lib/bookings/commands/give-back';
import { keepAgain, keepLonger, letGo } from '@/lib/bookings/commands/keeping';
import { confirmEmail, makeFeed, openBooking, revokeFeed } from '@/lib/bookings/commands/links';
import { endHolds } from '@/lib/bookings/commands/places';
import { showBooking, showCalendar } from '@/lib/bookings/commands/show-booking';
import { findHold } from '@/lib/bookings/queries/hold';
import { compareTaken } from '@/lib/bookings/queries/taken';
import { only } from '@/lib/core/only';
import { addMinutes } from '@/lib/core/time';
import { hashSecret, newSecret } from '@/lib/infra/secrets';
import { newBookingLink } from '@/lib/letters/links';
import { aBrowser, aClub, ada, ctxOf, MAY_15, NOON } from '../../support/cast';
import { keep, refusalOf, takenAt } from './hold-cast';
import { aDayAhead, bookingOf, eveHolds, machine } from './pay-cast';

beforeAll(() => aClub());

const free = { price: { adult: 0, child: 0, babe: 0 } };
const released = addMinutes(MAY_15.opensAt, -72 * 60);

/** Eve's confirmed booking that cost nothing, and the ways into it. */
async function eveConfirmed() {
  const { day, time, stop } = await aDayAhead(free);
  const eve = await eveHolds(day.id, [time.id], NOON);
  const code = await confirmFree(await ctxOf(eve.who, NOON), eve);
  const byLetter = { kind: 'booking' as const, bookingId: eve.bookingId, provesMailbox: true as const };
  return { ...eve, day, time, stop, code, byLetter, byBrowser: { kind: 'booking' as const, bookingId: eve.bookingId } };
}

describe('a hold', () => {
  it('is kept longer, ten minutes a press, up to half an hour from the first keeping', async () => {
    const { day, time } = await aDayAhead();
    const who = aBrowser();
    const bookingId = await keep(day.id, [time.id], who);
    const ends = [];
    for (let press = 0; press < 2; press += 1) ends.push(await keepLonger(await ctxOf(who, addMinutes(NOON, 5)), { bookingId }));

    expect(ends).toEqual([addMinutes(NOON, 20), addMinutes(NOON, 30)]);
    expect(await refusalOf(keepLonger(await ctxOf(who, addMinutes(NOON, 5)), { bookingId }))).toBe('hold_not_longer');
    expect(await refusalOf(keepLonger(await ctxOf(who, addMinutes(NOON, 30)), { bookingId }))).toBe('hold_over');
    expect(await refusalOf(keepLonger(await ctxOf(aBrowser(), NOON), { bookingId }))).toBe('not_found');
  });

  it('gives its places back when the party lets go, or when its time is up', async () => {
    const { day, time } = await aDayAhead();
    const [hasty, slow] = [aBrowser(), aBrowser()];
    const [first] = [await keep(day.id, [time.id], hasty), await keep(day.id, [time.id], slow)];

    expect(await refusalOf(letGo(await ctxOf(slow), { bookingId: first }))).toBe('not_found');
    await letGo(await ctxOf(hasty), { bookingId: first });
    expect(await takenAt(time.id)).toBe(2);

    await endHolds(getDb(), new Date(addMinutes(NOON, 10).getTime() - 1));
    expect(await takenAt(time.id)).toBe(2);
    await endHolds(getDb(), addMinutes(NOON, 10));
    expect(await takenAt(time.id)).toBe(0);
  });

  it('is told to the same browser after it ran out, with what was typed, and can be kept again', async () => {
    const { day, time } = await aDayAhead();
    const eve = await eveHolds(day.id, [time.id], NOON);
    const later = addMinutes(NOON, 15);
    await getDb().update(bookings).set({ wantsInvitations: false }).where(eq(bookings.id, eve.bookingId));
    await endHolds(getDb(), later);

    expect(await findHold(await ctxOf(eve.who, later))).toMatchObject({ state: 'over', typed: { name: 'Eve Marlow', email: 'eve@visitors.example' } });
    await keepAgain(await ctxOf(eve.who, later), eve);

    expect(await findHold(await ctxOf(eve.who, later))).toMatchObject({ state: 'kept', typed: { name: 'Eve Marlow', wantsInvitations: false }, keptUntil: '12:25' });
    expect(await findHold(await ctxOf(aBrowser(), later))).toBeNull();
    expect(await refusalOf(keepAgain(await ctxOf(aBrowser(), later), eve))).toBe('not_found');
  });
});

describe('the ways to a booking', () => {
  it('open from a letter and from the browser that booked, and only the letter proves the mailbox', async () => {
    const { who, bookingId, code } = await eveConfirmed();
    const fromBrowser = await openBooking(await ctxOf(who), { bookingId });
    const fromLetter = (await newBookingLink(getDb(), code, NOON, addMinutes(NOON, 60))).split('/').at(-1) ?? '';

    expect(await findBookingByLink(getDb(), code, hashSecret(fromLetter), NOON)).toEqual({ kind: 'booking', bookingId, provesMailbox: true });
    expect(await findBookingByLink(getDb(), code, hashSecret(fromBrowser.secret), NOON)).toEqual({ kind: 'booking', bookingId });
    expect(await findBookingByLink(getDb(), code, hashSecret(fromLetter), addMinutes(NOON, 60))).toBeNull();
    expect(await findBookingByLink(getDb(), (await eveConfirmed()).code, hashSecret(fromLetter), NOON)).toBeNull();
    expect(await findBookingByLink(getDb(), code, hashSecret(newSecret()), NOON)).toBeNull();
    expect(await refusalOf(openBooking(await ctxOf(aBrowser()), { bookingId }))).toBe('not_found');
  });

  it('open to the household that booked, and to no other', async () => {
    const { day, time } = await aDayAhead(free);
    const [member, other] = [await ada(), await ada()];
    const eve = await eveHolds(day.id, [time.id], NOON, aBrowser(member.householdId));
    const code = await confirmFree(await ctxOf(eve.who), eve);
    if (member.householdId === null || other.householdId === null) throw new Error('members have households');

    expect(await findOwnBooking(getDb(), code, member.householdId)).toBe(eve.bookingId);
    expect(await findOwnBooking(getDb(), code, other.householdId)).toBeNull();
  });

  it('confirm the e-mail by the button on the letter’s page, and by no other way', async () => {
    const { byLetter, byBrowser, bookingId } = await eveConfirmed();

    expect(await refusalOf(confirmEmail(await ctxOf(byBrowser)))).toBe('not_allowed');
    await confirmEmail(await ctxOf(byLetter));

    expect(only(await getDb().select({ at: bookingContacts.emailConfirmedAt }).from(bookingContacts).where(eq(bookingContacts.bookingId, bookingId))).at).toEqual(NOON);
  });
});

describe('the exact place of a garden', () => {
  const placeIn = async (by: Parameters<typeof showBooking>[0]['actor'], now: Date) => JSON.stringify(await showBooking(await ctxOf(by, now)));

  it('is shown from the release time on to a party whose e-mail is confirmed, and each showing is recorded', async () => {
    const { byLetter, stop } = await eveConfirmed();
    await confirmEmail(await ctxOf(byLetter));

    expect(await placeIn(byLetter, addMinutes(released, -1))).not.toContain('Secret Lane');
    expect(await placeIn(byLetter, released)).toContain('Secret Lane');

    expect(await getDb().select({ kind: placeShowings.viewerKind, by: placeShowings.viewerId }).from(placeShowings).where(eq(placeShowings.gardenId, stop.gardenId)))
      .toEqual([{ kind: 'booking', by: byLetter.bookingId }]);
  });

  it('is not shown to a party whose e-mail is not confirmed, or which gave its places back', async () => {
    const [{ byLetter }, gone] = [await eveConfirmed(), await eveConfirmed()];
    await confirmEmail(await ctxOf(gone.byLetter));
    const visit = only(await getDb().select({ id: visits.id }).from(visits).where(eq(visits.bookingId, gone.bookingId)));
    await giveBack(await ctxOf(gone.byLetter), { visitId: visit.id, version: 1, adults: 2, children: 0, babes: 0 });

    expect(await placeIn(byLetter, released)).not.toContain('Secret Lane');
    expect(await placeIn(gone.byLetter, released)).not.toContain('Secret Lane');
  });

  it('comes into the calendar feed at its time, until the feed is taken back', async () => {
    const { byLetter, bookingId } = await eveConfirmed();
    await confirmEmail(await ctxOf(byLetter));
    const first = await makeFeed(await ctxOf(byLetter));
    const second = await makeFeed(await ctxOf(byLetter));

    expect(await findBookingByFeed(getDb(), hashSecret(first), NOON)).toBeNull();
    expect(await findBookingByFeed(getDb(), hashSecret(second), NOON)).toBe(bookingId);
    expect(await showCalendar(await ctxOf(machine, NOON), bookingId, 'feed')).not.toContain('Secret Lane');
    expect(await showCalendar(await ctxOf(machine, released), bookingId, 'feed')).toContain('Secret Lane');

    await revokeFeed(await ctxOf(byLetter));
    expect(await findBookingByFeed(getDb(), hashSecret(second), NOON)).toBeNull();
    expect((await getDb().select().from(bearerLinks).where(eq(bearerLinks.kind, 'calendar'))).every((link) => link.secretHash !== second)).toBe(true);
  });
});

describe('the one kept figure', () => {
  it('agrees with live visits after all of this, and a difference is found', async () => {
    expect(await compareTaken(getDb())).toEqual([]);
    const { time, bookingId } = await eveConfirmed();
    await getDb().update(visits).set({ givenBackAt: NOON }).where(eq(visits.bookingId, bookingId)); // as a wrong command would

    expect(await compareTaken(getDb())).toContainEqual({ entryTimeId: time.id, taken: 2, live: 0 });
    expect((await bookingOf(bookingId)).cancelledAt).toBeNull();
  });
});
