import { and, eq } from 'drizzle-orm';
import ICAL from 'ical.js';
import { Pool } from 'pg';
import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest';
import { getDb } from '@/db/client';
import { payments } from '@/db/schema/books';
import { charges } from '@/db/schema/dues';
import { openDays } from '@/db/schema/opendays';
import { bearerLinks } from '@/db/schema/people';
import { bookingContacts, bookings, visits } from '@/db/schema/bookings';
import { placeShowings } from '@/db/schema/gardens';
import { letters, lettersDue, letterTexts, sendings } from '@/db/schema/letters';
import type { Id } from '@/lib/core/ids';
import { only } from '@/lib/core/only';
import { addMinutes } from '@/lib/core/time';
import { hashSecret } from '@/lib/infra/secrets';
import { queueLetter, sendAgain, type NewLetter } from '@/lib/letters/commands';
import { findLetter, letterPage } from '@/lib/letters/queries/list';
import { letterListInput } from '@/lib/letters/schema';
import { queueAddressInvitations, queueReminders } from '@/lib/letters/reminders';
import { sendLetter } from '@/lib/letters/sending';
import { enqueueDueLetters } from '@/lib/letters/work';
import { aClub, anAccount, anEntryTime, anOpenDay, apart, aStop, cleo, ctxOf, NOON } from '../../support/cast';
import { aMailServer } from '../../support/mail-server';

let server: Awaited<ReturnType<typeof aMailServer>>;
beforeAll(async () => {
  server = await aMailServer();
  await aClub();
});
beforeEach(() => {
  server.arrived.length = 0;
  server.state.refuse = null;
});
afterAll(() => server.down());

const systemAt = (now = NOON) => ctxOf({ kind: 'system', name: 'letters' } as const, now);
const eve = { name: 'Eve Visitor', address: 'eve+gardens@testvalley.example' };
const queue = (letter: Partial<NewLetter> & Pick<NewLetter, 'key'>) => getDb().transaction(async (tx) => {
  const id = await queueLetter(tx, { kind: 'notice', to: eve, madeAt: NOON, dueAt: NOON, facts: { subject: 'A word', body: 'Hello.' }, ...letter });
  if (id === null) throw new Error('the letter was there already');
  return id;
});
const outcomes = async (letterId: Id<'letter'>) => (await getDb().select({ outcome: sendings.outcome }).from(sendings).where(eq(sendings.letterId, letterId)).orderBy(sendings.triedAt)).map((row) => row.outcome);
const dueRow = async (letterId: Id<'letter'>) => (await getDb().select({ dueAt: lettersDue.dueAt, tries: lettersDue.tries }).from(lettersDue).where(eq(lettersDue.letterId, letterId)))[0];

let drawn = 0;
/** Two confirmed visits of Eve's on the test open day, 90 minutes apart. */
async function aBooking(contact: Partial<typeof bookingContacts.$inferInsert> = {}, changes: Partial<typeof bookings.$inferInsert> = {}) {
  const db = getDb();
  const day = await anOpenDay();
  const [first, second] = [await aStop(day.id, 1), await aStop(day.id, 2)];
  await apart(first.gardenId, second.gardenId, 15);
  const times = [await anEntryTime(first), await anEntryTime(second, { atMinutes: 90 })];
  drawn += 1;
  const booking = only(await db.insert(bookings).values({
    openDayId: day.id, code: `7Q2MXK${drawn % 10}${Math.floor(drawn / 10)}`, madeAt: NOON, heldUntil: NOON, confirmedAt: NOON, rulesAgreedAt: NOON, totalMinor: 4000, currency: 'USD', ...changes,
  }).returning({ id: bookings.id, code: bookings.code }));
  await db.insert(bookingContacts).values({ bookingId: booking.id, name: eve.name, email: eve.address, ...contact });
  const visitRows = await db.insert(visits).values(times.map((time) => ({ bookingId: booking.id, openDayId: day.id, entryTimeId: time.id, adults: 2, children: 1, heads: 3, adultMinor: 800, childMinor: 400, babeMinor: 0 }))).returning({ id: visits.id });
  return { ...booking, openDayId: day.id, visits: visitRows.map((row) => row.id) };
}
type Booking = Awaited<ReturnType<typeof aBooking>>;
const about = (booking: Booking, kind: NewLetter['kind'], key: string, facts: NewLetter['facts'] = {}) => queue({ key: `${key}:${booking.id}`, kind, bookingId: booking.id, openDayId: booking.openDayId, facts });
const invite = (booking: Booking, at: number, key: string) => about(booking, 'calendar', `${key}:${at}`, { visitId: booking.visits[at] ?? '' });
const oneArrived = () => only(server.arrived);
const eventsIn = (text: string) => new ICAL.Component(ICAL.parse(text)).getAllSubcomponents('vevent').map((event) => new ICAL.Event(event));

describe('the outbox', () => {
  it('writes one letter for one cause, however often it is said', async () => {
    await queue({ key: 'once' });

    const again = await getDb().transaction((tx) => queueLetter(tx, { key: 'once', kind: 'notice', to: eve, madeAt: NOON, dueAt: NOON, facts: { subject: 'A word', body: 'Hello.' } }));

    expect(again).toBeNull();
    expect(await getDb().select().from(letters).where(eq(letters.key, 'once'))).toHaveLength(1);
  });

  it('keeps nothing of a letter whose cause was undone', async () => {
    const undone = getDb().transaction(async (tx) => {
      await queueLetter(tx, { key: 'undone', kind: 'notice', to: eve, madeAt: NOON, dueAt: NOON, facts: { subject: 'A word', body: 'Hello.' } });
      throw new Error('the change failed');
    });

    await expect(undone).rejects.toThrow('the change failed');
    expect(await getDb().select().from(letters).where(eq(letters.key, 'undone'))).toHaveLength(0);
  });

  it('sends a letter as HTML and plain text, records it, and owes it no more', async () => {
    const id = await queue({ key: 'plain', facts: { subject: 'Bring a coat', body: 'It may rain.\n\nThe gates open all the same.' } });

    expect(await sendLetter(await systemAt(), id)).toBe('sent');

    const { mail, raw } = oneArrived();
    expect(mail.subject).toBe('Bring a coat');
    expect(mail.text).toContain('The gates open all the same.');
    expect(mail.html).toContain('The gates open all the same.');
    expect(raw).toContain('Content-Type: multipart/alternative');
    expect(mail.from?.text).toBe('"Test Valley Garden Railway Society" <club@testvalley.example>');
    expect(await outcomes(id)).toEqual(['sent']);
    expect(await dueRow(id)).toBeUndefined();
    expect(await sendLetter(await systemAt(), id)).toBe('not due');
  });

  it('does not send before its time', async () => {
    const id = await queue({ key: 'later', dueAt: addMinutes(NOON, 60) });

    expect(await sendLetter(await systemAt(addMinutes(NOON, 59)), id)).toBe('not due');
    expect(await sendLetter(await systemAt(addMinutes(NOON, 60)), id)).toBe('sent');
  });

  it('keeps trying with longer and longer waits while the mail server is down, and sends when it is up again', async () => {
    const id = await queue({ key: 'server down' });
    await server.down();

    let now = NOON;
    const waits: number[] = [];
    for (let tries = 0; tries < 11; tries += 1) {
      expect(await sendLetter(await systemAt(now), id)).toBe('failed');
      const due = (await dueRow(id))?.dueAt ?? now;
      waits.push((due.getTime() - now.getTime()) / 60_000);
      expect(await sendLetter(await systemAt(addMinutes(due, -1)), id)).toBe('not due');
      now = due;
    }
    await server.up();

    expect(waits).toEqual([1, 2, 4, 8, 16, 32, 64, 128, 256, 360, 360]);
    expect(await sendLetter(await systemAt(now), id)).toBe('sent');
    expect(await outcomes(id)).toEqual([...Array(11).fill('failed'), 'sent']);
  });

  it('writes down what the server said without anybody\'s address', async () => {
    const id = await queue({ key: 'refused' });
    server.state.refuse = 'mailbox <eve+gardens@testvalley.example> is full';

    expect(await sendLetter(await systemAt(), id)).toBe('failed');

    const detail = (await getDb().select({ detail: sendings.detail }).from(sendings).where(eq(sendings.letterId, id)))[0]?.detail ?? '';
    expect(detail).toContain('is full');
    expect(detail).not.toContain('eve');
  });

  it('has the same Message-ID when it goes twice', async () => {
    const id = await queue({ key: 'twice' });
    await sendLetter(await systemAt(), id);

    await sendAgain(await ctxOf(await cleo()), { letterId: id });
    expect(await sendLetter(await systemAt(), id)).toBe('sent');

    const [first, second] = server.arrived;
    expect(first?.mail.messageId).toMatch(/^<[0-9a-f]{40}@127\.0\.0\.1>$/);
    expect(second?.mail.messageId).toBe(first?.mail.messageId);
  });

  it('is sent once by two workers at the same time', async () => {
    const id = await queue({ key: 'two workers' });
    const ctx = await systemAt();

    const both = await Promise.all([sendLetter(ctx, id), sendLetter(ctx, id)]);

    expect(both.sort()).toEqual(['not due', 'sent']);
    expect(server.arrived).toHaveLength(1);
  });

  it('gives every letter that is due one job, however often the sweep comes by', async () => {
    const id = await queue({ key: 'swept', dueAt: addMinutes(NOON, 5) });
    const ctx = await systemAt(addMinutes(NOON, 5));

    await enqueueDueLetters(ctx);
    await enqueueDueLetters(ctx);

    const queuePool = new Pool({ connectionString: process.env['QUEUE_DATABASE_URL'] }); // the application's own role may not look into the queue
    const jobs = await queuePool.query('select task_identifier from graphile_worker.jobs where key = $1', [`letter:${id}`]);
    await queuePool.end();
    expect(jobs.rows).toEqual([{ task_identifier: 'sendLetter' }]);
    expect(await sendLetter(ctx, id)).toBe('sent');
  });

  it.each([
    ['an emoji and 4-byte letters', 'Zoë 🚂 𝔄da'], ['right-to-left text', 'שלום علي'], ['a script', '<script>alert(1)</script>'], ['quotes', '"Eve" \'the\' \\ Visitor'],
    ['a header of its own', 'Eve\r\nBcc: all@testvalley.example'], ['a turned-about tail', 'Eve \u202Egnp.exe'], ['300 characters', 'E'.repeat(300)],
  ])('shows a name with %s as text and never breaks a header', async (what, name) => {
    const id = await queue({ key: `hostile: ${what}`, to: { name, address: '"odd.name+x"@testvalley.example' }, facts: { subject: `For ${name}`, body: `Dear ${name}` } });

    expect(await sendLetter(await systemAt(), id)).toBe('sent');

    const { mail, raw } = oneArrived();
    expect(mail.headers.has('bcc')).toBe(false);
    expect(mail.html).not.toContain('<script>');
    expect(mail.subject).not.toMatch(/[\r\n\u202e]/);
    expect(raw.split('\r\n').every((line) => Buffer.byteLength(line) <= 998)).toBe(true); // RFC 5322 section 2.1.1
    expect(mail.subject).toBe(`For ${name}`.replace(/\s+/g, ' ').replace('\u202e', ''));
  });
});

describe('a confirmation', () => {
  it('carries one plain file of all visits, and a link whose secret lies in no table', async () => {
    const booking = await aBooking();
    const id = await about(booking, 'confirmation', 'confirmed');

    await sendLetter(await systemAt(), id);

    const { mail } = oneArrived();
    const file = only(mail.attachments);
    expect(file.contentType).toBe('text/calendar');
    expect(file.filename).toBe('visits.ics');
    expect(file.content.toString()).toContain('METHOD:PUBLISH');
    expect(eventsIn(file.content.toString())).toHaveLength(2);
    const secret = /\/bookings\/\w{8}\/link\/([\w-]{43})/.exec(mail.text ?? '')?.[1] ?? '';
    expect(await getDb().select().from(bearerLinks).where(and(eq(bearerLinks.subjectId, booking.code), eq(bearerLinks.secretHash, hashSecret(secret))))).toHaveLength(1);
    expect(JSON.stringify(await getDb().select().from(letterTexts).where(eq(letterTexts.letterId, id)))).not.toContain(secret);
  });

  it('says areas, times, people and the code, and no address before the release', async () => {
    const booking = await aBooking({ emailConfirmedAt: NOON });

    await sendLetter(await systemAt(), await about(booking, 'confirmation', 'said'));

    const { mail, raw } = oneArrived();
    for (const words of ['Your day in two gardens', '10:00', '11:30', '2 adults and 1 child', '$40.00', `${booking.code.slice(0, 4)} ${booking.code.slice(4)}`, 'the test end', '15 minutes by road']) expect(mail.text).toContain(words);
    expect(mail.html).not.toMatch(/<img|https?:\/\/(?!127\.0\.0\.1)/);
    expect(raw + mail.html + mail.text + only(mail.attachments).content.toString()).not.toContain('Secret Lane');
  });
});

describe('an invitation', () => {
  const release = addMinutes(new Date('2027-05-15T14:00:00Z'), -72 * 60);

  it('is one REQUEST with one UID, as the part that mail programs act on', async () => {
    const booking = await aBooking();

    await sendLetter(await systemAt(), await invite(booking, 0, 'first'));

    const { raw, mail } = oneArrived();
    expect(raw).toMatch(/Content-Type: text\/calendar; charset=utf-8; method=REQUEST;?\s+component=VEVENT/);
    const files = mail.attachments.map((file) => file.content.toString());
    expect(new Set(files.flatMap((file) => eventsIn(file).map((event) => event.uid))).size).toBe(1);
    expect(files[0]).toContain('ATTENDEE');
  });

  it('is built from the present state, and dropped when as much has gone', async () => {
    const booking = await aBooking();
    const [first, second] = [await invite(booking, 0, 'a'), await invite(booking, 0, 'b')];
    await getDb().update(visits).set({ version: 2, adults: 1, heads: 2 }).where(eq(visits.id, booking.visits[0] ?? asNever()));

    expect(await sendLetter(await systemAt(), first)).toBe('sent');
    expect(await sendLetter(await systemAt(), second)).toBe('dropped');

    const file = oneArrived().mail.attachments[0]?.content.toString() ?? '';
    expect(file).toContain('SEQUENCE:4');
    expect(eventsIn(file)[0]?.description).toContain('1 adult and 1 child');
    expect(await outcomes(second)).toEqual(['dropped']);
  });

  it('is a CANCEL with a higher SEQUENCE after the visit was given back, and nothing if none had gone', async () => {
    const booking = await aBooking();
    await sendLetter(await systemAt(), await invite(booking, 0, 'asked'));
    await getDb().update(visits).set({ givenBackAt: NOON, version: 2 }).where(eq(visits.bookingId, booking.id));

    expect(await sendLetter(await systemAt(), await invite(booking, 0, 'off'))).toBe('sent');
    expect(await sendLetter(await systemAt(), await invite(booking, 1, 'never'))).toBe('dropped');

    const file = server.arrived[1]?.mail.attachments[0]?.content.toString() ?? '';
    expect(file).toContain('METHOD:CANCEL');
    expect(file).toContain('SEQUENCE:4');
    expect(file).toContain('STATUS:CANCELLED');
  });

  it('has the address in its place from the release on, with SEQUENCE raised, for a confirmed e-mail only', async () => {
    const [confirmed, other] = [await aBooking({ emailConfirmedAt: NOON }), await aBooking()];
    for (const booking of [confirmed, other]) await sendLetter(await systemAt(), await invite(booking, 0, 'early'));
    server.arrived.length = 0;

    expect(await sendLetter(await systemAt(release), await invite(confirmed, 0, 'near'))).toBe('sent');
    expect(await sendLetter(await systemAt(release), await invite(other, 0, 'near'))).toBe('dropped');

    const file = oneArrived().mail.attachments[0]?.content.toString() ?? '';
    expect(eventsIn(file)[0]?.location).toMatch(/Secret Lane/);
    expect(file).toContain('SEQUENCE:3');
  });

  it('is taken back when the open day is called off', async () => {
    const booking = await aBooking();
    await sendLetter(await systemAt(), await invite(booking, 0, 'still on'));
    await getDb().update(openDays).set({ calledOffAt: NOON, calledOffNote: 'thunder' }).where(eq(openDays.id, booking.openDayId));

    expect(await sendLetter(await systemAt(), await invite(booking, 0, 'called off'))).toBe('sent');

    const file = server.arrived[1]?.mail.attachments[0]?.content.toString() ?? '';
    expect(file).toContain('METHOD:CANCEL');
    expect(file).toContain('SEQUENCE:4');
  });

  it('is not sent to a party that wants none', async () => {
    const booking = await aBooking({}, { wantsInvitations: false });

    expect(await sendLetter(await systemAt(), await invite(booking, 0, 'unwanted'))).toBe('dropped');
  });
});

describe('a reminder', () => {
  const release = addMinutes(new Date('2027-05-15T14:00:00Z'), -72 * 60);

  it('tells the addresses to a confirmed e-mail, and each showing is recorded', async () => {
    const booking = await aBooking({ emailConfirmedAt: NOON });
    const id = await about(booking, 'reminder', 'reminded');

    await sendLetter(await systemAt(release), id);

    expect(oneArrived().mail.text).toContain('Secret Lane');
    expect(await getDb().select().from(placeShowings).where(eq(placeShowings.viewerId, id))).toHaveLength(2);
  });

  it('carries only the link to an unconfirmed one', async () => {
    const booking = await aBooking();

    await sendLetter(await systemAt(release), await about(booking, 'reminder', 'link only'));

    const { mail } = oneArrived();
    expect(mail.text).not.toContain('Secret Lane');
    expect(mail.text).not.toContain(booking.code.slice(0, 4) + ' ');
    expect(mail.text).toMatch(/\/bookings\/\w{8}\/link\//);
    expect(mail.attachments).toHaveLength(0);
  });

  it('is not sent when everything was given back', async () => {
    const booking = await aBooking();
    await getDb().update(visits).set({ givenBackAt: NOON }).where(eq(visits.bookingId, booking.id));

    expect(await sendLetter(await systemAt(release), await about(booking, 'reminder', 'gone'))).toBe('dropped');
  });
});

describe('what the nearness of the day makes due', () => {
  const release = addMinutes(new Date('2027-05-15T14:00:00Z'), -72 * 60);
  const keysOf = async (booking: Booking) => (await getDb().select({ key: letters.key }).from(letters).where(eq(letters.bookingId, booking.id))).map((row) => row.key).sort();

  it('is one reminder a booking from the release on, not before, however often the sweep comes by', async () => {
    const booking = await aBooking();

    await queueReminders(await systemAt(addMinutes(release, -1)));
    const before = await keysOf(booking);
    await queueReminders(await systemAt(release));
    await queueReminders(await systemAt(addMinutes(release, 1)));

    expect(before).toEqual([]);
    expect(await keysOf(booking)).toEqual([`reminder:${booking.id}`]);
  });

  it.each([
    ['was given back', { cancelledAt: NOON }], ['was made after the release', { confirmedAt: release }], ['is not confirmed yet', { confirmedAt: null }],
  ])('is no reminder for a booking that %s', async (_, changes) => {
    const booking = await aBooking({}, changes);

    await queueReminders(await systemAt(addMinutes(release, 5)));

    expect(await keysOf(booking)).toEqual([]);
  });

  it('is an invitation with the address for each visit of a confirmed e-mail, also when it is confirmed later', async () => {
    const booking = await aBooking();
    await queueAddressInvitations(await systemAt(release));
    const unconfirmed = await keysOf(booking);
    await getDb().update(bookingContacts).set({ emailConfirmedAt: release }).where(eq(bookingContacts.bookingId, booking.id));

    await queueAddressInvitations(await systemAt(addMinutes(release, 60)));
    await queueAddressInvitations(await systemAt(addMinutes(release, 61)));

    expect(unconfirmed).toEqual([]);
    expect(await keysOf(booking)).toEqual(booking.visits.map((id) => `calendar:${id}:1:address`).sort());
  });
});

describe('a letter to a household or an officer', () => {
  it('is the receipt of a payment, with its number, what it was for and to when it is paid', async () => {
    const ben = await anAccount('Ben Okonjo');
    if (ben.householdId === null) throw new Error('Ben has a household');
    const charge = only(await getDb().insert(charges).values({ householdId: ben.householdId, classKey: 'household', termFrom: '2027-01-01', termTo: '2027-12-31', amountMinor: 6200, currency: 'USD', dueOn: '2027-01-01', madeAt: NOON }).returning({ id: charges.id }));
    const payment = only(await getDb().insert(payments).values({ chargeId: charge.id, householdId: ben.householdId, method: 'cheque', amountMinor: 6200, currency: 'USD', receivedOn: '2027-05-01', receiptYear: 2027, receiptNumber: 41, recordedAt: NOON }).returning({ id: payments.id }));
    const id = await queue({ key: 'receipt', kind: 'dues-receipt', householdId: ben.householdId, facts: { paymentId: payment.id } });

    expect(await sendLetter(await systemAt(), id)).toBe('sent');

    for (const words of ['2027/0041', '$62.00', '1 May 2027, cheque', 'dues, Household', 'paid to 31 Dec 2027']) expect(oneArrived().mail.text).toContain(words);
  });

  it('tells an officer of the role and where to sign in', async () => {
    const id = await queue({ key: 'invited', kind: 'invitation', facts: { role: 'treasurer', invitedBy: 'Nell Abara' } });

    expect(await sendLetter(await systemAt(), id)).toBe('sent');

    expect(oneArrived().mail.text).toContain('Nell Abara gave you the role of treasurer.');
    expect(oneArrived().mail.text).toContain('/sign-in');
  });

  it.each([
    ['refund', { amountMinor: 2400, reason: 'the garden is called off' }, '$24.00 is on its way back'], ['places-lost', { refundMinor: 4000 }, 'all $40.00 is on its way back'],
  ] as const)('says what comes back: %s', async (kind, facts, words) => {
    const id = await queue({ key: `money: ${kind}`, kind, facts });

    expect(await sendLetter(await systemAt(), id)).toBe('sent');

    expect(`${oneArrived().mail.subject} ${oneArrived().mail.text}`).toContain(words);
  });
});

describe('the office', () => {
  it('reads what was sent with codes, links and addresses left out', async () => {
    const booking = await aBooking({ emailConfirmedAt: NOON });
    const id = await about(booking, 'reminder', 'for the office');
    await sendLetter(await systemAt(addMinutes(new Date('2027-05-15T14:00:00Z'), -60)), id);
    const office = await ctxOf(await cleo());

    const letter = (await findLetter(office, id)) ?? expect.fail();

    expect(letter.state).toBe('sent');
    expect(letter.text).toContain('(blanked)');
    expect(letter.text).not.toMatch(new RegExp(`Secret Lane|/link/|${booking.code.slice(0, 4)} `));
    const stored = JSON.stringify(await getDb().select().from(letterTexts).where(eq(letterTexts.letterId, id)));
    expect(stored).not.toMatch(/Secret Lane|\/link\//);
  });

  it('cannot read a sign-in code, before it went or after, nor send it again', async () => {
    const id = await queue({ key: 'sign-in', kind: 'sign-in', facts: { code: '493817', secret: 's'.repeat(43), minutes: 15 } });
    const office = await ctxOf(await cleo());
    const before = (await findLetter(office, id)) ?? expect.fail();
    await sendLetter(await systemAt(), id);
    const after = (await findLetter(office, id)) ?? expect.fail();

    expect(oneArrived().mail.text).toContain('493817');
    expect(JSON.stringify([before, after])).not.toMatch(/493817|s{43}/);
    expect(JSON.stringify(await getDb().select().from(letterTexts).where(eq(letterTexts.letterId, id)))).not.toMatch(/493817|s{43}/);
    await expect(sendAgain(office, { letterId: id })).rejects.toThrow('not_allowed');
  });

  it('does not send a code that has run out', async () => {
    const id = await queue({ key: 'old code', kind: 'sign-in', facts: { code: '493817', secret: 's'.repeat(43), minutes: 15 } });

    expect(await sendLetter(await systemAt(addMinutes(NOON, 15)), id)).toBe('dropped');
  });

  it('finds what fails and pages through the rest, newest first', async () => {
    const id = await queue({ key: 'failing', to: { name: 'Percy 100%', address: 'percy@testvalley.example' } });
    server.state.refuse = 'try later';
    await sendLetter(await systemAt(), id);
    const office = await ctxOf(await cleo());

    const failing = await letterPage(office, letterListInput.parse({ state: 'failing', find: '100%' }));
    const all = await letterPage(office, letterListInput.parse({}));

    expect(failing.rows.map((row) => row.id)).toEqual([id]);
    expect(failing.rows[0]?.detail).toContain('try later');
    expect(all.total).toBeGreaterThan(10);
    expect(all.rows).toHaveLength(Math.min(50, all.total));
  });
});

function asNever(): never {
  throw new Error('the booking has a first visit');
}
