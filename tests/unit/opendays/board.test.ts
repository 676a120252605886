import { describe, expect, test } from 'vitest';
import { boardStates, cellState, chosenCells, onlyFitting, runsOf, settingOf, spokenName, withPlaces } from '@/lib/opendays/rules/board';
import { dayLine, journeyInWords, journeyNote, keepWords, visitsInLine } from '@/lib/opendays/rules/day-line';
import { graphOf } from '@/lib/opendays/rules/day-graph';
import { cleanAddress, readBoardAsked } from '@/lib/opendays/rules/board-asked';
import { daysInWords, figuresSentence, whenAndWhere } from '@/lib/opendays/rules/day-words';
import { headsTyped, partyMistake } from '@/lib/opendays/rules/party';
import { partyTotalMinor, priceSentence, sumSentence } from '@/lib/opendays/rules/prices';
import { toBoard, toPlacesLeft } from '@/lib/opendays/views';
import { aBoard, boardClub, boardFacts, entryIdAt, longBefore, STARTS, stopIdAt } from '@/tests/support/boards';

const board = aBoard();
const three = [entryIdAt(0, '10:00'), entryIdAt(2, '11:30'), entryIdAt(4, '13:45')];
const columnOf = (time: string) => STARTS.indexOf(time);
const stateAt = (row: number, time: string, chosen: string[] = [], heads = 3, on = board) =>
  cellState(on, on.rows[row]?.[columnOf(time)] ?? null, heads, chosenCells(on, chosen));

describe('the board of an open day', () => {
  test('has its gardens by number, the union of starts across, and no cell where a garden is not open', () => {
    expect(board.stops.map((stop) => stop.number)).toEqual([1, 2, 3, 4, 5, 6, 7]);
    expect(board.columns.map((column) => column.text)).toEqual(STARTS);
    expect(stateAt(6, '10:00')).toEqual({ kind: 'none' });
  });

  test('says the minutes from the garden above, but not for the first', () => {
    expect(board.stops.map((stop) => stop.minutesFromAbove)).toEqual([null, 5, 10, 5, 10, 10, 10]);
  });

  test('letters its notes: steam, step-free, pond', () => {
    expect(board.stops[2]?.notes).toEqual(['s', 'w', 'p']);
    expect(board.stops[3]?.notes).toEqual(['w']);
  });

  test('takes a garden’s own price before the day’s', () => {
    const facts = boardFacts();
    facts.prices.push({ stopId: stopIdAt(1), kind: 'adult', amountMinor: 1200 });

    expect(toBoard(facts, boardClub, longBefore).stops.slice(0, 2).map((stop) => stop.prices)).toEqual([
      { adultMinor: 800, childMinor: 400, babeMinor: 0 },
      { adultMinor: 1200, childMinor: 400, babeMinor: 0 },
    ]);
  });

  test('is set in strips at every width with more than fourteen times', () => {
    const starts = (count: number) => Array.from({ length: count }, (_, index) => `${String(9 + Math.floor(index / 3)).padStart(2, '0')}:${['00', '20', '40'][index % 3] ?? '00'}`);

    expect([8, 9, 14, 15].map((count) => settingOf(aBoard({ starts: starts(count), placesAt: () => 4 })))).toEqual(['few', 'many', 'many', 'strips']);
  });
});

describe('a cell', () => {
  test.each([
    [6, { kind: 'open', places: 6 }],
    [5, { kind: 'few', places: 5 }],
    [3, { kind: 'few', places: 3 }],
    [2, { kind: 'fewer', places: 2 }],
    [1, { kind: 'fewer', places: 1 }],
    [0, { kind: 'full' }],
  ])('with %i places left for a party of three', (places, state) => {
    expect(stateAt(0, '10:00', [], 3, aBoard({ placesAt: () => places }))).toEqual(state);
  });

  test('is over from the minute its grace ends, and not one minute before', () => {
    const opensAt = boardFacts().entries[0]?.graceUntil ?? longBefore;

    expect(stateAt(0, '10:00', [], 3, aBoard({}, new Date(opensAt.getTime() - 60_000)))).toMatchObject({ kind: 'open' });
    expect(stateAt(0, '10:00', [], 3, aBoard({}, opensAt))).toEqual({ kind: 'over' });
  });

  test('that the party can no longer reach is barred, with the reason', () => {
    expect(stateAt(6, '14:30', three)).toMatchObject({ kind: 'barred', clash: { kind: 'late', lateMinutes: 5, minutes: 15 } });
    expect(stateAt(1, '11:30', three)).toMatchObject({ kind: 'barred', clash: { kind: 'there' } });
  });

  test('that is full stays a dash, for it could not be chosen all the same', () => {
    expect(stateAt(2, '12:15', three)).toEqual({ kind: 'full' });
  });

  test('that the party chose and that filled up is still theirs, and gone', () => {
    const filled = withPlaces(board, { places: { [entryIdAt(0, '10:00')]: 2 } });

    expect(stateAt(0, '10:00', three, 3, filled)).toEqual({ kind: 'yours', isGone: true });
    expect(stateAt(0, '10:00', three, 2, filled)).toEqual({ kind: 'yours', isGone: false });
  });

  test('reads aloud as garden, time, then places or the reason', () => {
    const say = (row: number, time: string, chosen: string[] = []) => {
      const [stop, cell] = [board.stops[row], board.rows[row]?.[columnOf(time)]];
      return stop && cell ? spokenName(board, stop, cell, stateAt(row, time, chosen), 3) : null;
    };

    expect(say(0, '10:45')).toBe('Saltmarsh & Plover, 10:45, 12 places left');
    expect(say(3, '13:00')).toBe('Thistledown Junction, 13:00, 1 place left, fewer than your party');
    expect(say(2, '12:15')).toBe('Pine Barrow Light Railway, 12:15, full');
    expect(say(0, '10:00', three)).toBe('Saltmarsh & Plover, 10:00, yours, 3 people');
    expect(say(6, '14:30', three)).toBe('Old Orchard Line, 14:30, cannot be reached: 15 min from Copperkettle, you would be 5 late');
  });
});

describe('fresher places', () => {
  test('change the figures they name, close what is over, and leave the rest', () => {
    const fresh = withPlaces(board, { places: { [entryIdAt(0, '10:00')]: 1, [entryIdAt(0, '10:45')]: null } });

    expect(fresh.rows[0]?.slice(0, 3).map((cell) => [cell?.places, cell?.isOver])).toEqual([[1, false], [12, true], [10, false]]);
  });

  test('never go below nought and are null when the time is over', () => {
    const [first] = boardFacts().entries;
    if (!first) throw new Error('the invented day has entry times');

    expect(toPlacesLeft([{ ...first, places: -2 }], longBefore).places).toEqual({ [first.entryTimeId]: 0 });
    expect(toPlacesLeft([{ ...first, stopClosedAt: longBefore }], longBefore).places).toEqual({ [first.entryTimeId]: null });
  });
});

describe('only step-free, only steam', () => {
  test('leaves the gardens that are both, numbered anew from their own neighbours', () => {
    const both = onlyFitting(board, { stepFree: true, steam: true }, []);

    expect(both.stops.map((stop) => [stop.shortName, stop.minutesFromAbove])).toEqual([['Pine Barrow', null]]);
    expect(both.rows[0]?.[2]?.row).toBe(0);
  });

  test('keeps a garden where the party has a time already', () => {
    expect(onlyFitting(board, { stepFree: false, steam: true }, three).stops.map((stop) => stop.shortName)).toContain('Saltmarsh');
  });
});

describe('on a narrow sheet', () => {
  const runsAt = (row: number) => runsOf(board, boardStates(board, 3, chosenCells(board, three))[row] ?? [], row)
    .filter((run) => run.reason !== null).map((run) => [STARTS[run.from], STARTS[run.to], run.reason]);

  test('neighbouring times barred by one visit are one line with one reason', () => {
    expect(runsAt(0)).toEqual([
      ['11:30', '11:30', 'you are at Pine Barrow then'],
      ['13:00', '14:30', '20 min from Copperkettle, too close to your 13:45'],
    ]);
  });

  test('times at which a garden is not open are one line', () => {
    expect(runsOf(board, boardStates(board, 3, [])[6] ?? [], 6)[0]).toEqual({ from: 0, to: 1, reason: null });
  });
});

describe("the party's day", () => {
  const cells = chosenCells(board, [three[2] ?? '', three[0] ?? '', three[1] ?? '']);
  const day = dayLine(board, cells);

  test('is in order of start, with minutes between and time to spare', () => {
    expect(day.stays.map((stay) => [stay.arrivesText, stay.leavesText])).toEqual([['10:00', '10:35'], ['11:30', '12:05'], ['13:45', '14:20']]);
    expect(day.journeys.map(journeyInWords)).toEqual(['10 min on the way, 45 min to spare', '10 min on the way, 90 min to spare']);
  });

  test('is noted after each visit on a narrow sheet', () => {
    const [stay, journey] = [day.stays[0], day.journeys[0]];

    expect(stay && journey && journeyNote(board, stay, journey)).toBe('leave by 10:35, 10 min to Pine Barrow, 45 to spare');
  });

  test('says how late the party will be when it chose a time all the same', () => {
    const late = dayLine(board, chosenCells(board, [entryIdAt(4, '13:45'), entryIdAt(6, '14:30')]));

    expect(late.journeys.map(journeyInWords)).toEqual(['15 min on the way, 5 too late: you chose it all the same']);
  });

  test('is drawn on the scale of the board: each start under the middle of its column', () => {
    const graph = graphOf(board, day);

    expect(graph.stays.map((stay) => Math.round(stay.arrives * 8 * 1000) / 1000)).toEqual([0.5, 2.5, 5.5]);
    expect(graph.hours.map((hour) => hour.text)).toEqual(['10:00', '11:00', '12:00', '13:00', '14:00', '15:00']);
  });

  test('the button says what it will do', () => {
    expect(keepWords(cells, 3)).toBe('Keep 3 places at all three');
    expect(keepWords(cells.slice(0, 2), 3)).toBe('Keep 3 places at both');
    expect(keepWords(cells.slice(1, 2), 1)).toBe('Keep 1 place at 11:30');
    expect(visitsInLine(board, cells)).toBe('10:00 Saltmarsh, 11:30 Pine Barrow and 13:45 Copperkettle');
  });
});

describe('an open day in words', () => {
  const some = { places: 640, taken: 200, parties: 69, people: 180 };

  test.each([
    [some, 'coming', '200 of 640 places are taken, by 69 parties.'],
    [{ ...some, places: 1139, taken: 1014, parties: 171, people: 502 }, 'past', '1,014 of 1,139 places were taken, by 171 parties, 502 people.'],
    [{ ...some, taken: 640 }, 'coming', 'All 640 places are taken, by 69 parties.'],
    [{ ...some, taken: 0, parties: 0 }, 'coming', 'All 640 places are still to be had.'],
    [{ ...some, taken: 3, parties: 1 }, 'coming', '3 of 640 places are taken, by 1 party.'],
    [{ places: 0, taken: 0, parties: 0, people: 0 }, 'coming', 'Its times are not set yet.'],
  ] as const)('%o, %s', (figures, phase, sentence) => {
    expect(figuresSentence(figures, phase, 'en-US')).toBe(sentence);
  });

  test('says its date, its gardens and its hours, in the club’s own clock', () => {
    const day = { heldOn: '2027-05-15', opensAt: new Date('2027-05-15T14:00:00Z'), closesAt: new Date('2027-05-15T20:00:00Z'), placeLine: 'in and around Alder Fork', gardens: 7 };

    expect(whenAndWhere(day, boardClub)).toBe('Saturday 15 May 2027, seven gardens in and around Alder Fork, from 10:00 until 16:00');
    expect(whenAndWhere({ ...day, gardens: 0 }, { ...boardClub, hourCycle: 'h12' })).toBe('Saturday 15 May 2027, in and around Alder Fork, from 10:00 am until 4:00 pm');
    expect([daysInWords(2, 1), daysInWords(0, 0), daysInWords(1, 3)]).toEqual(['Two days to come, and one day that was', 'No day is set yet', 'One day to come, and three days that were']);
  });
});

describe('the address of a board', () => {
  const id = '03438734-6a21-4501-838e-c5e7aeca115a';

  test('says who comes, what is shown and which times are ticked; what makes no sense is left out', () => {
    expect(readBoardAsked({ adults: '3', 'step-free': 'only', with: [id, 'x'], steam: 'maybe' })).toEqual({ typed: { adults: '3', children: '0', babes: '0' }, only: { stepFree: true, steam: false }, chosen: [id] });
    expect(readBoardAsked({ adults: '1'.repeat(500) }).typed.adults).toHaveLength(9);
    expect(readBoardAsked({ with: Array.from({ length: 40 }, (_, index) => `00000000-0000-4000-8000-${String(index).padStart(12, '0')}`) }).chosen).toHaveLength(14);
  });

  test('is cleaned of what a form adds when it asks again without JavaScript', () => {
    expect(cleanAddress('/open-days/spring', { $ACTION_1: '', adults: '2', children: '1', 'entryTimeId[]': id })).toBe(`/open-days/spring?children=1&with=${id}`);
    expect(cleanAddress('/open-days/spring', { adults: '2', with: id })).toBeNull();
  });
});

describe('prices', () => {
  const usual = { adultMinor: 800, childMinor: 400, babeMinor: 0 };
  const free = { adultMinor: 0, childMinor: 0, babeMinor: 0 };
  const priced = { currency: 'USD', locale: 'en-US' };

  test('are a sentence', () => {
    expect(priceSentence(usual, [usual], priced)).toBe('A visit is $8 for each adult and $4 for a child; babes in arms come free.');
    expect(priceSentence(free, [], priced)).toBe('A visit is free.');
    expect(priceSentence({ adultMinor: 850, childMinor: 0, babeMinor: 0 }, [], priced)).toBe('A visit is $8.50 for each adult; children and babes in arms come free.');
    expect(priceSentence(usual, [free], priced)).toContain('One garden has a price of its own.');
  });

  test('add up over visits and people, and say how', () => {
    const party = { adults: 2, children: 1, babes: 1 };

    expect(partyTotalMinor([usual, usual, usual], party)).toBe(6000);
    expect(sumSentence([usual, usual, usual], { ...party, babes: 0 }, priced)).toEqual({ words: 'Three visits for 2 adults at $8 and 1 child at $4:', amount: '$60.00' });
    expect(sumSentence([usual, free], party, priced)).toEqual({ words: 'Two visits for 2 adults, 1 child and 1 babe in arms:', amount: '$20.00' });
    expect(sumSentence([free], { adults: 1, children: 0, babes: 0 }, priced)).toEqual({ words: 'One visit for 1 adult:', amount: 'free' });
  });
});

describe('a party', () => {
  test.each([['', 0], [' 3 ', 3], ['0', 0], ['99', 99], ['100', null], ['-1', null], ['3.5', null], ['1e9', null], ['three', null]])('typed as %j is read as %j', (text, heads) => {
    expect(headsTyped(text)).toBe(heads);
  });

  test('that is too large is told the limit in words', () => {
    expect(partyMistake({ adults: 10, children: 0, babes: 0 }, 9)).toBe('Nine is the most one party can bring. For a school or a club, write to the coordinator.');
    expect(partyMistake(null, 9)).toBe('Type whole numbers of people, from 0 to 99.');
  });
});
