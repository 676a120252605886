import { describe, expect, it } from 'vitest';
import { changeRefusal, refundMinor, refundPercent, refundRuleForAll, refundRuleWords, refundWords, type RefundRule } from '@/lib/bookings/rules/refund';

const club = { timeZone: 'America/New_York', locale: 'en-US', hourCycle: 'h23' } as const;
const rule: RefundRule = { refundRules: [{ hoursBefore: 168, percent: 100 }, { hoursBefore: 1, percent: 50 }], changesEndMinutes: 60 };
const entryAt = new Date('2027-05-15T15:30:00Z'); // 11:30 in New York
const before = (hours: number, milliseconds = 0) => new Date(entryAt.getTime() - hours * 3_600_000 + milliseconds);

describe('how much comes back', () => {
  it.each([
    ['a month before', before(720), 100],
    ['exactly a week before', before(168), 100],
    ['a moment later than a week before', before(168, 1), 50],
    ['exactly an hour before', before(1), 50],
    ['a moment later than an hour before', before(1, 1), 0],
    ['after the entry time', before(-1), 0],
  ])('%s it is the rule\'s percent', (_, now, percent) => {
    expect(refundPercent(entryAt, rule, now)).toBe(percent);
  });

  it.each([[1, 50, 1], [101, 50, 51], [333, 50, 167], [799, 30, 240], [1000, 33, 330], [5, 10, 1], [4, 10, 0], [0, 50, 0]])(
    'rounds %i cents at %i %% half up to %i, in the payer\'s favour', (paid, percent, back) => {
      expect(refundMinor(paid, entryAt, { refundRules: [{ hoursBefore: 0, percent }] }, before(1))).toBe(back);
    });

  it('takes the best step that is still met, in whatever order the steps were written', () => {
    expect(refundPercent(entryAt, { refundRules: [...rule.refundRules].reverse() }, before(200))).toBe(100);
    expect(refundPercent(entryAt, { refundRules: [] }, before(200))).toBe(0);
  });
});

describe('until when', () => {
  it('places can be given back until exactly 60 minutes before the entry time', () => {
    expect(changeRefusal(entryAt, rule, before(1))).toBeNull();
    expect(changeRefusal(entryAt, rule, before(1, 1))).toBe('changes_over');
  });
});

describe('what it says before the button', () => {
  it('names the dates of the whole rule', () => {
    expect(refundRuleWords(entryAt, rule, club)).toBe('Given back by 11:30 on Saturday 8 May: all of it. After that, by 10:30 on Saturday 15 May: half of it.');
    expect(refundRuleWords(entryAt, { refundRules: [{ hoursBefore: 72, percent: 80 }], changesEndMinutes: 60 }, club))
      .toBe('Given back by 11:30 on Wednesday 12 May: 80 % of it. After that, and until 10:30 on Saturday 15 May: none of it, but someone else can come.');
    expect(refundRuleWords(entryAt, { refundRules: [], changesEndMinutes: 60 }, club))
      .toBe('Places may be given back until 10:30 on Saturday 15 May. Nothing is returned, and someone else can come.');
  });

  it('says the rule for all visits at once, counted from each one\'s own time', () => {
    expect(refundRuleForAll(rule)).toBe('Given back until a week before a time: all of it is returned. After that, until 60 minutes before a time: half of it is returned.');
    expect(refundRuleForAll({ refundRules: [{ hoursBefore: 48, percent: 80 }], changesEndMinutes: 120 }))
      .toBe('Given back until 2 days before a time: 80 % of it is returned. After that, until 2 hours before: none of it.');
    expect(refundRuleForAll({ refundRules: [], changesEndMinutes: 60 })).toBe('Places may be given back until 60 minutes before each time; nothing is returned, and someone else can come.');
  });

  it('keeps the wall clock when clocks change between the step and the visit', () => {
    const autumn = new Date('2027-11-07T15:30:00Z'); // 10:30 after the clocks went back

    expect(refundRuleWords(autumn, { refundRules: [{ hoursBefore: 24, percent: 100 }], changesEndMinutes: 60 }, club)).toContain('11:30 on Saturday 6 November');
  });

  it('says the sum that this button returns', () => {
    const paid = { amountMinor: 6000, currency: 'USD' };

    expect(refundWords(paid, entryAt, rule, club, before(200))).toBe('All $60.00 comes back the way you paid.');
    expect(refundWords(paid, entryAt, rule, club, before(5))).toBe('$30.00 of $60.00 comes back the way you paid: half of it.');
    expect(refundWords(paid, entryAt, { ...rule, refundRules: [] }, club, before(5))).toBe('Nothing of the $60.00 comes back so near the day. Someone else can come.');
    expect(refundWords({ amountMinor: 0, currency: 'USD' }, entryAt, rule, club, before(5))).toBe('These places cost nothing, so nothing comes back. Someone else can come.');
  });
});
