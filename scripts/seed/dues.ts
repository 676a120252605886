import type { cardPayments, paymentAttempts } from '@/db/schema/books';
import type { charges, terms } from '@/db/schema/dues';
import { addDays, addMinutes, instantOf, type Day } from '@/lib/core/time';
import type { Id } from '@/lib/core/ids';
import { type SeedCalendar, ZONE } from './calendar';
import { CLUB, DUES } from './club';
import { diceFor, seedId } from './ids';
import { cardFeeMinor, type SeedEvent, type SeedPayment } from './ledger';
import type { SeedLetter } from './letters';
import type { Member } from './members';

export type DuesRows = {
  charges: (typeof charges.$inferInsert)[]; terms: (typeof terms.$inferInsert)[]; payments: SeedPayment[]; attempts: (typeof paymentAttempts.$inferInsert)[];
  cards: (typeof cardPayments.$inferInsert)[]; events: SeedEvent[]; letters: SeedLetter[];
};

/** Renewals are asked for 45 days before the year ends. */
const ASKED_DAYS_BEFORE = 45;

/** Ben likes to pay next year's dues early, so that there is always somebody with dues to pay. */
const ASKED_EARLY = 2;

type Year = { member: Member; year: number; madeOn: Day; paidOn: Day | null };

/** Which years a household was asked to pay, and when it did. What would be paid after today is not paid yet. */
function yearsOf(member: Member, { today, year }: SeedCalendar): Year[] {
  if (member.standing === 'life') return [];
  if (member.standing === 'joining') return [{ member, year, madeOn: member.joinedOn, paidOn: null }];
  const dice = diceFor(`dues ${member.number}`);
  const joinedYear = Number(member.joinedOn.slice(0, 4));
  const one = (of: number, pays: boolean): Year => {
    const askedOn = addDays(`${of}-01-01`, -ASKED_DAYS_BEFORE);
    const madeOn = member.joinedOn > askedOn ? member.joinedOn : askedOn;
    const paidOn = addDays(madeOn, 4 + dice.whole(62));
    return { member, year: of, madeOn, paidOn: pays && paidOn <= today ? paidOn : null };
  };
  const last = one(year - 1, true);
  const present = one(year, member.standing !== 'lapsed' && member.standing !== 'left');
  const nextYear = one(year + 1, false);
  const coming = member.number === ASKED_EARLY && nextYear.madeOn > today ? { ...nextYear, madeOn: addDays(today, -3) } : nextYear;
  const isAsked = coming.madeOn <= today && (member.standing === 'paid' || member.standing === 'ahead') && present.paidOn !== null;
  const ahead: Year = { ...coming, paidOn: member.standing === 'ahead' && addDays(coming.madeOn, 5) <= today ? addDays(coming.madeOn, 5) : null };
  return [...(joinedYear < year ? [last] : []), ...(member.standing === 'left' ? [] : [present]), ...(isAsked ? [ahead] : [])];
}

/** The rows of the dues of the last year, this one and, once it is asked for, the next. */
export function duesRows(roll: readonly Member[], calendar: SeedCalendar, treasurer: Id<'account'>): DuesRows {
  const rows: DuesRows = { charges: [], terms: [], payments: [], attempts: [], cards: [], events: [], letters: [] };
  for (const member of roll) {
    if (member.standing === 'life') rows.terms.push({ id: seedId(`term ${member.number}`), householdId: member.id, classKey: 'life', during: `[${member.joinedOn},)`, madeAt: instantOf(member.joinedOn, '20:00', ZONE) });
    for (const year of yearsOf(member, calendar)) addYear(rows, year, calendar, treasurer);
  }
  return rows;
}

function addYear(rows: DuesRows, { member, year, madeOn, paidOn }: Year, calendar: SeedCalendar, treasurer: Id<'account'>): void {
  const name = `${member.number} ${year}`;
  const amountMinor = DUES[member.classKey][year < calendar.year ? 'before' : 'now'];
  const termFrom = member.joinedOn > `${year}-01-01` ? member.joinedOn : `${year}-01-01`;
  const charge = { id: seedId<'charge'>(`charge ${name}`), householdId: member.id, classKey: member.classKey, termFrom, termTo: `${year}-12-31`, amountMinor, currency: CLUB.currency, dueOn: termFrom, madeAt: instantOf(madeOn, '09:00', ZONE) };
  rows.charges.push(charge);
  if (paidOn === null) return;
  rows.terms.push({ id: seedId(`term ${name}`), householdId: member.id, classKey: member.classKey, during: `[${termFrom},${year + 1}-01-01)`, madeAt: instantOf(paidOn, '12:00', ZONE) });
  pay(rows, { member, name, chargeId: charge.id, amountMinor, paidOn, treasurer });
}

type Paying = { member: Member; name: string; chargeId: Id<'charge'>; amountMinor: number; paidOn: Day; treasurer: Id<'account'> };

function pay(rows: DuesRows, { member, name, chargeId, amountMinor, paidOn, treasurer }: Paying): void {
  const { method, id: householdId, contact } = member;
  const at = instantOf(paidOn, '18:10', ZONE);
  const paymentId = seedId<'payment'>(`payment dues ${name}`);
  const recordedBy = method === 'card' ? null : treasurer;
  const attemptId = method === 'card' ? seedId<'attempt'>(`attempt dues ${name}`) : null;
  const reference = { card: null, cheque: `no. ${1000 + (member.number * 37) % 900}`, cash: null, transfer: `AFGRS ${member.number}` }[method];
  rows.payments.push({ id: paymentId, chargeId, householdId, method, amountMinor, currency: CLUB.currency, receivedOn: paidOn, reference, attemptId, recordedAt: at, recordedBy });
  rows.events.push({ event: { kind: 'received', method, for: 'dues', amountMinor }, sourceId: paymentId, happenedOn: paidOn, at, householdId, ...(recordedBy && { madeBy: recordedBy }) });
  rows.letters.push({ key: `dues-receipt:${paymentId}`, kind: 'dues-receipt', to: { name: contact.name, address: contact.email }, at, facts: { paymentId }, householdId });
  if (attemptId === null) return;
  const intent = `pi_demo_${attemptId.replaceAll('-', '')}`;
  const feeMinor = cardFeeMinor(amountMinor);
  const card = { currency: CLUB.currency, appliedAt: at };
  rows.attempts.push({ id: attemptId, chargeId, idempotencyKey: `demo ${attemptId}`, amountMinor, currency: CLUB.currency, openedAt: addMinutes(at, -4), sessionId: `cs_demo_${attemptId.replaceAll('-', '')}`, sessionExpiresAt: addMinutes(at, 26), paymentIntentId: intent, endedAt: at, outcome: 'paid' });
  rows.cards.push({ id: seedId(`card paid ${intent}`), objectId: intent, outcome: 'paid', attemptId, amountMinor, ...card }, { id: seedId(`card fee ${intent}`), objectId: intent, outcome: 'fee', amountMinor: feeMinor, ...card });
  rows.events.push({ event: { kind: 'fee', for: 'dues', amountMinor: feeMinor }, sourceId: intent, happenedOn: paidOn, at });
}
