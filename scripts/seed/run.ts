// Plants the demo club into an empty, migrated database; scripts/start runs it once. The same day gives the same club,
// down to the ids; only password hashes have salt of their own. Never for a live club.
import { sql } from 'drizzle-orm';
import { getDb, type Tx } from '@/db/client';
import { auditTexts, auditTrail, club } from '@/db/schema/club';
import { bookingContacts, bookings, visits } from '@/db/schema/bookings';
import { cardPayments, journalEntries, paymentAttempts, payments, postings, receiptCounters, refunds } from '@/db/schema/books';
import { charges, classDues, membershipClasses, terms } from '@/db/schema/dues';
import { gardenAreas, gardenPlaces, gardenPlants, gardens, plants } from '@/db/schema/gardens';
import { gateFacts } from '@/db/schema/gate';
import { letters, letterTexts, sendings } from '@/db/schema/letters';
import { areaMinutes, entryTimes, openDays, placeMinutes, planChanges, prices, stops } from '@/db/schema/opendays';
import { accounts, contactDetails, gateDevices, gatePasses, households, passwords, people, rolesHeld } from '@/db/schema/people';
import type { Id } from '@/lib/core/ids';
import { addMinutes } from '@/lib/core/time';
import { env } from '@/lib/infra/env';
import { hashPassword } from '@/lib/people/commands/password';
import { bookingRows } from './booking-rows';
import { cardMemory, type MemoryLine, rememberCards } from './card-memory';
import { seedCalendar, type SeedCalendar } from './calendar';
import { CLASSES, CLUB, duesRows as classDuesRows } from './club';
import { dayRows, seedDays } from './days';
import { duesRows } from './dues';
import { gardenRows, minutesRows } from './garden-rows';
import { gateRows } from './gate-rows';
import { seedId } from './ids';
import { bookedRows, numberedReceipts } from './ledger';
import { letterRows } from './letters';
import { type Member, memberRows, members } from './members';
import { seatEveryone } from './seatings';
import { DEMO_SIGN_INS } from './sign-ins';

export { DEMO_SIGN_INS as signIns };

/** Plants the whole demo club in one transaction, dated from `now`, and tells the card stand-in's file of its payments. Throws when a club is there already. */
export async function seed({ now = new Date(), cardsFile }: { now?: Date; cardsFile?: string | undefined } = {}): Promise<void> {
  const mode = env().LEAFHALT_MODE;
  if (mode !== 'demo' && mode !== 'test') throw new Error('The demo club is planted only by scripts/start and by tests.');
  const hashes = await Promise.all(DEMO_SIGN_INS.map(async ({ email, password }) => ({ email, hash: await hashPassword(password) })));
  const payments = await getDb().transaction(async (tx) => {
    if ((await tx.select({ id: club.id }).from(club)).length > 0) throw new Error('There is a club in this database already.');
    return plantClub(tx, seedCalendar(now), hashes);
  });
  if (cardsFile) rememberCards(cardsFile, payments);
}

const accountOf = (roll: readonly Member[], email: string): Id<'account'> => {
  const member = roll.find(({ contact }) => contact.email === email);
  if (!member) throw new Error(`nobody in the demo club is ${email}`);
  return member.accountId;
};

async function plantClub(tx: Tx, calendar: SeedCalendar, hashes: readonly { email: string; hash: string }[]): Promise<MemoryLine[]> {
  const roll = members(calendar);
  await tx.insert(club).values(CLUB);
  await tx.insert(membershipClasses).values([...CLASSES]);
  await tx.insert(classDues).values(classDuesRows(calendar.year));
  await plantRoll(tx, calendar, roll, hashes);
  await plantGardens(tx, roll, calendar.year);
  return plantDays(tx, calendar, roll);
}

async function plantRoll(tx: Tx, calendar: SeedCalendar, roll: readonly Member[], hashes: readonly { email: string; hash: string }[]): Promise<void> {
  const rows = memberRows(roll, calendar);
  await tx.insert(accounts).values(rows.accounts);
  await tx.insert(households).values(rows.households);
  await tx.insert(people).values(rows.people);
  await tx.insert(contactDetails).values(rows.contacts);
  await tx.insert(rolesHeld).values(rows.roles);
  await tx.insert(passwords).values(hashes.map(({ email, hash }) => ({ accountId: accountOf(roll, email), hash, setAt: calendar.now })));
}

async function plantGardens(tx: Tx, roll: readonly Member[], year: number): Promise<void> {
  const rows = gardenRows(roll, year);
  const minutes = minutesRows();
  await tx.insert(gardens).values(rows.gardens);
  await tx.insert(gardenPlaces).values(rows.places);
  await tx.insert(gardenAreas).values(rows.areas);
  await tx.insert(plants).values(rows.plants);
  await tx.insert(gardenPlants).values(rows.planting);
  await tx.insert(areaMinutes).values(minutes.area);
  await tx.insert(placeMinutes).values(minutes.place);
}

async function plantDays(tx: Tx, calendar: SeedCalendar, roll: readonly Member[]): Promise<MemoryLine[]> {
  const cleo = accountOf(roll, 'cleo@alderfork.example');
  const days = seedDays(calendar);
  const seated = seatEveryone(days, roll, minutesRows().area, calendar);
  const day = dayRows([days.past, days.next, days.later], seated.takenAt, cleo, calendar.now);
  await tx.insert(openDays).values(day.days);
  await tx.insert(stops).values(day.stops);
  await tx.insert(entryTimes).values(day.times);
  await tx.insert(prices).values(day.prices);
  await tx.insert(planChanges).values(day.notes);
  const payments = await plantMoney(tx, calendar, roll, bookingRows(seated.bookings, calendar.now));
  const gate = gateRows(days.past, seated.bookings.filter((booking) => booking.day === days.past), cleo);
  await tx.insert(gatePasses).values(gate.passes);
  await tx.insert(gateDevices).values(gate.devices);
  await tx.insert(gateFacts).values(gate.facts);
  await plantAudit(tx, calendar, cleo, days.next.stops.find(({ number }) => number === 5)?.id ?? null);
  return payments;
}

/** Dues and bookings lie in one set of books, with one run of receipt numbers a year. */
async function plantMoney(tx: Tx, calendar: SeedCalendar, roll: readonly Member[], booked: ReturnType<typeof bookingRows>): Promise<MemoryLine[]> {
  const dues = duesRows(roll, calendar, accountOf(roll, 'dov@alderfork.example'));
  const receipts = numberedReceipts([...dues.payments, ...booked.payments]);
  const ledger = bookedRows([...dues.events, ...booked.events]);
  const written = letterRows([...dues.letters, ...booked.letters]);
  await tx.insert(bookings).values(booked.bookings);
  await tx.insert(bookingContacts).values(booked.contacts);
  await tx.insert(visits).values(booked.visits);
  await tx.insert(charges).values(dues.charges);
  await tx.insert(terms).values(dues.terms);
  await tx.insert(paymentAttempts).values([...dues.attempts, ...booked.attempts]);
  await tx.insert(payments).values(receipts.rows);
  await tx.insert(receiptCounters).values(receipts.counters);
  await tx.insert(cardPayments).values([...dues.cards, ...booked.cards]);
  await tx.insert(refunds).values(booked.refunds);
  await tx.insert(journalEntries).values(ledger.entries);
  await tx.insert(postings).values(ledger.lines);
  await tx.execute(sql`set constraints all immediate`); // an unbalanced entry is named here, not at the end
  await tx.insert(letters).values(written.letters);
  await tx.insert(letterTexts).values(written.texts);
  await tx.insert(sendings).values(written.sendings);
  return cardMemory([...dues.attempts, ...booked.attempts], [...dues.cards, ...booked.cards], refundedBy(booked));
}

/** What went back of each card payment, by its intent. */
function refundedBy({ refunds: back, payments: paid, attempts }: ReturnType<typeof bookingRows>): Map<string, number> {
  return new Map(back.flatMap(({ paymentId, amountMinor }) => {
    const attemptId = paid.find(({ id }) => id === paymentId)?.attemptId;
    const intent = attempts.find(({ id }) => id === attemptId)?.paymentIntentId;
    return intent ? [[intent, amountMinor]] : [];
  }));
}

async function plantAudit(tx: Tx, { now }: SeedCalendar, cleo: Id<'account'>, stopId: Id<'stop'> | null): Promise<void> {
  const id = seedId<'auditLine'>('audit capacity');
  await tx.insert(auditTrail).values({ id, at: addMinutes(now, -9 * 1440), actorKind: 'account', accountId: cleo, action: 'changed the places at a stop', subjectKind: 'stop', subjectId: stopId });
  await tx.insert(auditTexts).values({ lineId: id, before: { capacity: 12 }, after: { capacity: 14 } });
}
