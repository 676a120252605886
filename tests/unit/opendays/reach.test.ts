import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { clashBetween, clashWith, firstClash, minutesTable, reasonForRun, reasonInFull, reasonInShort, type Sitting } from '@/lib/opendays/rules/reach';

// The rule is LOOK's: start + stay + area minutes ≤ the later start. No published source: it is the club's own definition,
// checked here against a brute-force walk through the day, minute by minute.

const at = (time: string) => { const [hours = 0, minutes = 0] = time.split(':').map(Number); return 29_000_000 + hours * 60 + minutes; };
const sitting = (row: number, time: string, stayMinutes = 35): Sitting => ({ row, opens: at(time), stayMinutes });
const names = ['Saltmarsh', 'Mossgill', 'Pine Barrow', 'Copperkettle'];
const naming = { nameOf: (row: number) => names[row] ?? '?', timeOf: ({ opens }: Sitting) => `${Math.floor((opens - 29_000_000) / 60)}:${String((opens - 29_000_000) % 60).padStart(2, '0')}` };
const minutes = [[0, 5, 10, 20], [5, 0, 10, 15], [10, 10, 0, 10], [20, 15, 10, 0]];

describe('a later time', () => {
  test.each([
    ['leaves exactly enough: stay 35 and 15 minutes to go, at 14:35', '14:35', null],
    ['is one minute too soon', '14:34', 1],
    ['is five minutes too soon', '14:30', 5],
    ['begins the minute the stay ends', '14:20', 15],
  ])('%s', (_, time, lateMinutes) => {
    const clash = clashBetween(sitting(1, time), sitting(3, '13:45'), minutes);

    expect(clash && clash.kind === 'late' ? clash.lateMinutes : clash).toBe(lateMinutes);
  });

  test('within the stay is a clash: the party is there then', () => {
    expect(clashBetween(sitting(1, '14:19'), sitting(3, '13:45'), minutes)).toMatchObject({ kind: 'there' });
    expect(clashBetween(sitting(1, '13:45'), sitting(3, '13:45'), minutes)).toMatchObject({ kind: 'there' });
  });
});

describe('an earlier time', () => {
  test('that ends exactly in time can be reached, one minute later cannot', () => {
    expect(clashBetween(sitting(1, '12:55'), sitting(3, '13:45'), minutes)).toBeNull();
    expect(clashBetween(sitting(1, '12:56'), sitting(3, '13:45'), minutes)).toMatchObject({ kind: 'late', way: 'to', lateMinutes: 1 });
  });

  test('that would still be going on says how late the party would be, for it is not there yet', () => {
    expect(clashBetween(sitting(1, '13:30'), sitting(3, '13:45'), minutes)).toMatchObject({ kind: 'late', way: 'to', lateMinutes: 35 });
  });
});

describe('the same garden twice', () => {
  test('can be had when the first stay is over, with no minutes between', () => {
    expect(clashBetween(sitting(3, '14:20'), sitting(3, '13:45'), minutes)).toBeNull();
    expect(clashBetween(sitting(3, '14:19'), sitting(3, '13:45'), minutes)).toMatchObject({ kind: 'there' });
    expect(clashBetween(sitting(3, '13:11'), sitting(3, '13:45'), minutes)).toMatchObject({ kind: 'late', minutes: 0, lateMinutes: 1 });
  });
});

describe('reasons as sentences', () => {
  const say = (clash: ReturnType<typeof clashWith>, row: number) => clash && [reasonInShort(clash, row, naming), reasonInFull(clash, row, naming), reasonForRun(clash, row, naming)];

  test('name the garden, the minutes and how late', () => {
    expect(say(clashWith(sitting(1, '14:30'), [sitting(3, '13:45')], minutes), 1)).toEqual([
      '15 min away, you would be 5 late', '15 min from Copperkettle, you would be 5 late', '15 min from Copperkettle, too close to your 13:45']);
    expect(say(clashWith(sitting(0, '13:00'), [sitting(3, '13:45')], minutes), 0)).toEqual([
      '20 min to Copperkettle, you would be 10 late there', '20 min to Copperkettle, you would be 10 late there', '20 min from Copperkettle, too close to your 13:45']);
    expect(say(clashWith(sitting(1, '10:00'), [sitting(0, '10:00')], minutes), 1)).toEqual(Array(3).fill('you are at Saltmarsh then'));
    expect(say(clashWith(sitting(3, '13:15'), [sitting(3, '13:45')], minutes), 3)).toEqual(Array(3).fill('too close to your 13:45 at the same garden'));
  });

  test('being there comes before being late, and the nearest in time before a farther one', () => {
    const chosen = [sitting(0, '10:00', 200), sitting(2, '11:30')];

    expect(clashWith(sitting(1, '11:31'), chosen, minutes)).toMatchObject({ kind: 'there', other: { row: 2 } });
    expect(clashWith(sitting(1, '12:06'), chosen, minutes)).toMatchObject({ kind: 'there', other: { row: 0 } });
    expect(clashWith(sitting(1, '13:21'), [sitting(0, '10:00', 200), sitting(2, '12:45')], minutes)).toMatchObject({ kind: 'late', other: { row: 2 } });
  });
});

test('a pair of gardens nobody has measured counts as far as the farthest known one, so that no plan depends on it', () => {
  const facts = [{ fromGardenId: 'a', toGardenId: 'b', minutes: 20 }, { fromGardenId: 'b', toGardenId: 'a', minutes: 20 }, { fromGardenId: 'a', toGardenId: 'c', minutes: 5 }];

  expect(minutesTable(['a', 'b', 'c'], facts)).toEqual([[0, 20, 5], [20, 0, 20], [20, 20, 0]]);
  expect(minutesTable(['a', 'b'], [])).toEqual([[0, 0], [0, 0]]);
});

// Brute force: a party walks through the day minute by minute. It may be at one place only, on the road or in a garden.
const rowArb = fc.integer({ min: 0, max: 3 });
const sittingArb = fc.record({ row: rowArb, opens: fc.integer({ min: 0, max: 240 }), stayMinutes: fc.integer({ min: 1, max: 60 }) });
const tableArb = fc.array(fc.integer({ min: 0, max: 8 }), { minLength: 6, maxLength: 6 }).map((steps) => {
  const [ab = 0, ac = 0, ad = 0, bc = 0, bd = 0, cd = 0] = steps.map((step) => step * 5);
  return [[0, ab, ac, ad], [ab, 0, bc, bd], [ac, bc, 0, cd], [ad, bd, cd, 0]];
});

function canWalk(a: Sitting, b: Sitting, table: number[][]): boolean {
  const [first, then] = a.opens <= b.opens ? [a, b] : [b, a];
  let minute = first.opens, stayLeft = first.stayMinutes, roadLeft = first.row === then.row ? 0 : table[first.row]?.[then.row] ?? 0;
  for (; minute < 2000; minute += 1) {
    if (stayLeft === 0 && roadLeft === 0) return minute <= then.opens;
    if (stayLeft > 0) stayLeft -= 1;
    else roadLeft -= 1;
  }
  return false;
}

test('agrees with a party walking through the day minute by minute', () => {
  fc.assert(fc.property(sittingArb, fc.array(sittingArb, { maxLength: 5 }), tableArb, (wanted, chosen, table) => {
    const isReachable = chosen.every((each) => canWalk(wanted, each, table));

    expect(clashWith(wanted, chosen, table) === null).toBe(isReachable);
  }), { numRuns: 2000 });
});

test('does not depend on which of two times was chosen first', () => {
  fc.assert(fc.property(sittingArb, sittingArb, tableArb, (a, b, table) => {
    expect(clashBetween(a, b, table) === null).toBe(clashBetween(b, a, table) === null);
  }));
});

test('a whole day has a clash exactly when two of its visits have one', () => {
  fc.assert(fc.property(fc.array(sittingArb, { maxLength: 5 }), tableArb, (visits, table) => {
    const pairs = visits.flatMap((a, index) => visits.slice(index + 1).map((b) => [a, b] as const));

    expect(firstClash(visits, table) === null).toBe(pairs.every(([a, b]) => canWalk(a, b, table)));
  }));
});

test('an hour more of time between two visits never makes a reachable one unreachable', () => {
  fc.assert(fc.property(sittingArb, sittingArb, tableArb, (a, b, table) => {
    const [first, then] = a.opens <= b.opens ? [a, b] : [b, a];
    fc.pre(clashBetween(then, first, table) === null);

    expect(clashBetween({ ...then, opens: then.opens + 60 }, first, table)).toBeNull();
  }));
});
