import type { bookingContacts, bookings, visits } from '@/db/schema/bookings';
import type { cardPayments, paymentAttempts, refunds } from '@/db/schema/books';
import { addMinutes, dayOf } from '@/lib/core/time';
import { ZONE } from './calendar';
import { CLUB } from './club';
import { seedId } from './ids';
import { cardFeeMinor, type SeedEvent, type SeedPayment } from './ledger';
import type { SeedLetter } from './letters';
import { costMinor, headsOf, type SeedBooking, type SeedVisit } from './parties';

export type BookingRows = {
  bookings: (typeof bookings.$inferInsert)[]; contacts: (typeof bookingContacts.$inferInsert)[]; visits: (typeof visits.$inferInsert)[]; attempts: (typeof paymentAttempts.$inferInsert)[];
  cards: (typeof cardPayments.$inferInsert)[]; payments: SeedPayment[]; refunds: (typeof refunds.$inferInsert)[]; events: SeedEvent[]; letters: SeedLetter[];
};

/** The rows of confirmed bookings with their money and their letters, each as the running club would have left them. */
export function bookingRows(all: readonly SeedBooking[], now: Date): BookingRows {
  const rows: BookingRows = { bookings: [], contacts: [], visits: [], attempts: [], cards: [], payments: [], refunds: [], events: [], letters: [] };
  for (const booking of all) {
    addBooking(rows, booking);
    if (booking.totalMinor > 0) addPayment(rows, booking);
    addLetters(rows, booking, now);
  }
  return rows;
}

function addBooking(rows: BookingRows, { id, day, code, member, madeAt, confirmedAt, cancelledAt, totalMinor, contact, emailConfirmedAt, visits: made, people }: SeedBooking): void {
  rows.bookings.push({
    id, openDayId: day.id, householdId: member?.id ?? null, code, madeAt, heldUntil: addMinutes(madeAt, totalMinor > 0 ? 33 : CLUB.holdMinutes), paymentMovedAt: totalMinor > 0 ? addMinutes(madeAt, 3) : null,
    confirmedAt, cancelledAt, totalMinor, currency: CLUB.currency, rulesAgreedAt: addMinutes(madeAt, 2), wantsInvitations: true,
  });
  rows.contacts.push({ bookingId: id, name: contact.name, email: contact.email, phone: contact.phone, emailConfirmedAt });
  rows.visits.push(...made.map(({ id: visitId, stop, time, givenBackAt }) => ({
    id: visitId, bookingId: id, openDayId: day.id, entryTimeId: time.id, ...people, heads: headsOf(people), adultMinor: stop.prices.adultMinor, childMinor: stop.prices.childMinor, babeMinor: stop.prices.babeMinor,
    version: givenBackAt === null ? 1 : 2, givenBackAt,
  })));
}

function addPayment(rows: BookingRows, booking: SeedBooking): void {
  const { name, day, member, madeAt, confirmedAt: at, totalMinor: amountMinor } = booking;
  const attemptId = seedId<'attempt'>(`attempt ${name}`);
  const paymentId = seedId<'payment'>(`payment ${name}`);
  const intent = `pi_demo_${attemptId.replaceAll('-', '')}`;
  const happenedOn = dayOf(at, ZONE);
  const feeMinor = cardFeeMinor(amountMinor);
  const common = { currency: CLUB.currency, appliedAt: at };
  const belongs = { openDayId: day.id, ...(member && { householdId: member.id }) };
  rows.attempts.push({ id: attemptId, bookingId: booking.id, idempotencyKey: `demo ${attemptId}`, amountMinor, currency: CLUB.currency, openedAt: addMinutes(madeAt, 3), sessionId: `cs_demo_${attemptId.replaceAll('-', '')}`, sessionExpiresAt: addMinutes(madeAt, 33), paymentIntentId: intent, endedAt: at, outcome: 'paid' });
  rows.cards.push({ id: seedId(`card paid ${intent}`), objectId: intent, outcome: 'paid', attemptId, amountMinor, ...common }, { id: seedId(`card fee ${intent}`), objectId: intent, outcome: 'fee', amountMinor: feeMinor, ...common });
  rows.payments.push({ id: paymentId, bookingId: booking.id, householdId: member?.id ?? null, method: 'card', amountMinor, currency: CLUB.currency, receivedOn: happenedOn, attemptId, recordedAt: at });
  rows.events.push({ event: { kind: 'received', method: 'card', for: 'tickets', amountMinor }, sourceId: paymentId, happenedOn, at, ...belongs });
  rows.events.push({ event: { kind: 'fee', for: 'tickets', amountMinor: feeMinor }, sourceId: intent, happenedOn, at, openDayId: day.id });
  const back = booking.visits.filter(({ givenBackAt }) => givenBackAt !== null);
  if (back.length > 0) addRefund(rows, booking, paymentId, back);
}

function addRefund(rows: BookingRows, { id: bookingId, name, day, member, people, contact }: SeedBooking, paymentId: SeedPayment['id'], back: readonly SeedVisit[]): void {
  const at = back[0]?.givenBackAt;
  if (!at) return;
  const paidMinor = back.reduce((sum, { stop }) => sum + costMinor(people, stop), 0);
  const isEarly = addMinutes(at, 168 * 60) <= day.opensAt;
  const amountMinor = isEarly ? paidMinor : Math.floor((paidMinor * 50 + 50) / 100); // the club's rule: all until a week before, half until two days before
  if (amountMinor === 0) return;
  const refundId = seedId(`refund ${name}`);
  const processorId = `re_demo_${refundId.replaceAll('-', '')}`;
  const doneAt = addMinutes(at, 2);
  const belongs = { openDayId: day.id, ...(member && { householdId: member.id }) };
  rows.refunds.push({ id: refundId, paymentId, amountMinor, currency: CLUB.currency, reason: 'given back by the party', askedAt: at, dueAt: at, tries: 1, processorId, doneAt });
  rows.cards.push({ id: seedId(`card refunded ${processorId}`), objectId: processorId, outcome: 'refunded', amountMinor, currency: CLUB.currency, appliedAt: doneAt });
  rows.events.push({ event: { kind: 'refund-owed', for: 'tickets', amountMinor }, sourceId: refundId, happenedOn: dayOf(at, ZONE), at, ...belongs });
  rows.events.push({ event: { kind: 'refund-paid', method: 'card', for: 'tickets', amountMinor }, sourceId: refundId, happenedOn: dayOf(doneAt, ZONE), at: doneAt, ...belongs });
  rows.letters.push({ key: `given-back:${bookingId}:2`, kind: 'given-back', to: { name: contact.name, address: contact.email }, at, facts: { was: back.map(({ stop }) => stop.slug.replaceAll('-', ' ')), refundMinor: amountMinor }, openDayId: day.id, bookingId, ...(member && { householdId: member.id }) });
}

function addLetters(rows: BookingRows, { id: bookingId, day, member, contact, confirmedAt, cancelledAt, name }: SeedBooking, now: Date): void {
  const belongs = { openDayId: day.id, bookingId, ...(member && { householdId: member.id }) };
  const to = { name: contact.name, address: contact.email };
  rows.letters.push({ key: `confirmation:${bookingId}`, kind: 'confirmation', to, at: confirmedAt, facts: {}, ...belongs, ...(name.endsWith('party 9') && { failedFirst: true as const }) });
  const release = addMinutes(day.opensAt, -CLUB.addressReleaseHours * 60);
  const remindedAt = release > confirmedAt ? release : confirmedAt;
  if (remindedAt < now && cancelledAt === null) rows.letters.push({ key: `reminder:${bookingId}`, kind: 'reminder', to, at: remindedAt, facts: {}, ...belongs });
}
