import { describe, expect, it } from 'vitest';
import { HouseholdLine } from '@/components/member/household-line';
import { BookingTable } from '@/components/office/booking-table';
import { DayBill } from '@/components/office/day-bill';
import { LetterState } from '@/components/office/letter-table';
import { PlacesTable } from '@/components/office/places-table';
import { RollSums } from '@/components/office/roll-sums';
import { StopTimesTable } from '@/components/office/stop-times';
import { idleForm } from '@/lib/core/form-state';
import { newId } from '@/lib/core/ids';
import { placesByTime, type OfficeStop, type OfficeTime } from '@/lib/opendays/office-views';
import { show } from '../ui/stage';

const CLUB = { timeZone: 'America/New_York', locale: 'en-US', hourCycle: 'h23' as const, currency: 'USD' };
const TEN = new Date('2027-05-15T14:00:00Z');
const at = (minutes: number) => new Date(TEN.getTime() + minutes * 60_000);
const time = (minutes: number, changes: Partial<OfficeTime> = {}): OfficeTime => ({ id: newId<'entryTime'>(), opensAt: at(minutes), graceUntil: at(minutes + 20), capacity: 12, taken: 4, held: 0, walkUps: 0, people: 4, closedAt: null, ...changes });
const stop = (number: number, shortName: string, times: OfficeTime[]): OfficeStop => ({ id: newId<'stop'>(), number, garden: shortName, shortName, stayMinutes: 35, headsLimit: 20, hostLimit: 28, ownPrices: {}, capacity: 0, taken: 0, people: 0, times });
const words = (element: Element | null | undefined) => element?.textContent?.replace(/\s+/g, ' ').trim();
type Day = Parameters<typeof DayBill>[0]['day'];
const pressed = async () => idleForm;

describe('the bill of an open day', () => {
  const day: Day = { title: 'Spring Open Gardens', heldOn: '2027-05-15', placeLine: 'in the valley', opensAt: TEN, closesAt: at(360), publishedAt: TEN, calledOffAt: null, parties: 171, people: 502, cameInMinor: 620_400 };
  const sums = { capacity: 1139, taken: 1014, held: 0, walkUps: 0 };
  const said = (changes: Partial<Day> = {}, isOver = false) => words(show(<DayBill day={{ ...day, ...changes }} stops={7} sums={sums} isOver={isOver} club={CLUB} />).querySelector('.bill'));

  it('puts the figures into sentences', () => {
    expect(said()).toBe('Spring Open GardensSaturday 15 May 2027, seven gardens in the valley, gates 10:00 to 16:001,014 of 1,139 places are taken; 171 parties, 502 people have booked. $6,204.00 has come in. The day is published, and nothing is called off.');
  });

  it('says when the day is not published, and when it is over', () => {
    expect(said({ publishedAt: null })).toContain('The day is not published yet.');
    expect(said({}, true)).toContain('The day is over.');
  });
});

describe('places by time', () => {
  it('has a row for each start of any garden, and no entry where a garden has none', () => {
    const stops = [stop(1, 'Saltmarsh', [time(0), time(45, { taken: 12, people: 13 })]), stop(2, 'Mossgill', [time(15, { closedAt: TEN })])];
    const rows = placesByTime(stops);

    const table = show(<PlacesTable rows={rows} stops={stops} club={CLUB} />);

    expect([...table.querySelectorAll('tbody tr')].map((row) => [...row.children].map(words))).toEqual([
      ['10:00', '4/12', '…no entry', '4'],
      ['10:15', '…no entry', '4/12closed', '4'],
      ['10:45', '12/12full', '…no entry', '13'],
    ]);
  });
});

describe('the entry times of a stop', () => {
  const times = [time(0), time(45, { closedAt: TEN })];
  const table = (open: string | null, mayEdit = true) => show(<StopTimesTable times={times} path="/office/stop" open={open} mayEdit={mayEdit} club={CLUB} change={pressed} close={pressed} reopen={pressed} />);

  it('open to their forms by a link that says so', () => {
    const shut = table(null);
    expect(shut.querySelectorAll('form')).toHaveLength(0);
    expect([...shut.querySelectorAll('tbody a')].map((link) => link.getAttribute('aria-expanded'))).toEqual(['false', 'false']);

    const opened = table(times[1]?.id ?? '');
    expect([...opened.querySelectorAll('button')].map(words)).toEqual(['Change it, and write to those affected', 'Open it again']);
    expect(opened.querySelector('a[aria-expanded=true]')?.getAttribute('href')).toBe('/office/stop');
  });

  it('are only read by someone who may not change them', () => {
    expect(table(null, false).querySelectorAll('tbody a')).toHaveLength(0);
  });
});

describe('the roll\'s figures', () => {
  it('are links inside one sentence, leaving out what nobody is', () => {
    const sums = show(<RollSums sums={{ households: 143, people: 231, by: { paid: 126, life: 6, kept: 1, lapsed: 0, new: 0, left: 4 } }} shown="paid" />);

    expect(words(sums)).toBe('143 households, 231 people: 126 are paid up, 6 are members for life, 1 owes and is kept on and 4 have left.');
    expect(sums.querySelector('[aria-current]')?.textContent).toBe('126 are paid up');
  });
});

describe('a household\'s line', () => {
  it('says each station\'s name, day and note, in order', () => {
    const line = show(<HouseholdLine club={CLUB} stations={[{ id: 'a', name: 'joined', on: '2016-03-24', note: '', tone: 'plain', isLaid: true }, { id: 'b', name: 'kept on to', on: '2027-05-31', note: 'then lapses', tone: 'caution', isLaid: false }]} />);

    expect([...line.querySelectorAll('li')].map(words)).toEqual(['joined24 Mar 2016', 'kept on to31 May 2027then lapses']);
  });
});

describe('bookings', () => {
  const asked = { find: '', sort: 'made', order: 'desc' as const, page: 1 };
  const line = { code: '7Q2MXK4D', name: '<script>alert(1)</script>', email: null, madeAt: TEN, cancelledAt: null, day: 'Spring', heldOn: '2027-05-15', people: 3, visits: 2, paidMinor: 4800, backMinor: 1200, currency: 'USD' };

  it('show a party\'s name as text, whatever it is, and lead to its booking', () => {
    const table = show(<BookingTable lines={[line]} asked={asked} path="/office/bookings" keep={{}} club={CLUB} />);

    expect(table.querySelector('th[scope=row] a')?.textContent).toBe('<script>alert(1)</script>');
    expect(table.querySelector('th[scope=row] a')?.getAttribute('href')).toBe('/office/bookings/7Q2MXK4D');
    expect(words(table.querySelector('tbody'))).toContain('$48.00less $12.00');
  });

  it('say so when there are none, and offer all when none was found', () => {
    expect(words(show(<BookingTable lines={[]} asked={asked} path="/office/bookings" keep={{}} club={CLUB} />))).toBe('Nobody has booked yet.');
    expect(words(show(<BookingTable lines={[]} asked={{ ...asked, find: 'Nemo' }} path="/office/bookings" keep={{}} club={CLUB} />))).toBe('No party answers to that. Show every booking');
  });
});

describe('how a letter stands', () => {
  const row = { id: newId<'letter'>(), kind: 'change', kindWords: 'change', madeAt: TEN, to: 'Eve', subject: null, triedAt: at(1), dueAt: at(61), detail: '550 no such mailbox', maySendAgain: true };

  it.each([
    { state: 'failing' as const, says: 'failed 15 May, 10:01: 550 no such mailbox; next try 11:01' },
    { state: 'sent' as const, says: 'sent 15 May, 10:01' },
    { state: 'waiting' as const, says: 'goes 15 May, 11:01' },
    { state: 'dropped' as const, says: 'not sent: 550 no such mailbox' },
  ])('says of one that is $state: $says', ({ state, says }) => {
    expect(words(show(<LetterState row={{ ...row, state }} club={CLUB} />))).toBe(says);
  });
});
