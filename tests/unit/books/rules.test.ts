import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { balanceOf, postingsFor, reversalOf, type BusinessEvent, type PostingLine } from '@/lib/books/rules';
import { sumMinor } from '@/lib/core/money';

// Accounting identities: postings of an entry sum to zero; assets + expenses = liabilities + income (double entry, common practice).
const amountMinor = fc.integer({ min: 1, max: 2_000_000_000 });
const method = fc.constantFrom('card', 'cheque', 'cash', 'transfer' as const);
const purpose = fc.constantFrom('tickets', 'dues' as const);
const anEvent: fc.Arbitrary<BusinessEvent> = fc.oneof(
  fc.record({ kind: fc.constant('received' as const), method, for: purpose, amountMinor }),
  fc.record({ kind: fc.constant('unplaced' as const), for: purpose, amountMinor }),
  fc.record({ kind: fc.constant('refund-owed' as const), for: purpose, amountMinor }),
  fc.record({ kind: fc.constant('refund-paid' as const), method, for: purpose, amountMinor }),
  fc.record({ kind: fc.constant('refund-failed' as const), method, for: purpose, amountMinor }),
  fc.record({ kind: fc.constant('fee' as const), for: purpose, amountMinor }),
);
const total = (lines: readonly PostingLine[]) => sumMinor(lines.map((line) => line.amountMinor));

describe('the table of rules of the books', () => {
  it('balances every entry, whatever happened', () => {
    fc.assert(fc.property(anEvent, (event) => {
      expect(total(postingsFor(event))).toBe(0);
    }));
  });

  it('balances within each fund, so that no fund lives on another', () => {
    fc.assert(fc.property(anEvent, (event) => {
      const lines = postingsFor(event);
      for (const fund of ['general', 'open-days']) expect(total(lines.filter((line) => line.fund === fund))).toBe(0);
    }));
  });

  it('keeps assets and expenses equal to income and debts over any run of events', () => {
    fc.assert(fc.property(fc.array(anEvent, { maxLength: 40 }), (events) => {
      const lines = events.flatMap(postingsFor);
      const left = (['bank', 'cards-clearing', 'cash-in-hand', 'cheques-in-hand', 'card-fees'] as const).map((account) => balanceOf(account, lines));
      const right = (['refunds-owed', 'ticket-income', 'dues-income'] as const).map((account) => balanceOf(account, lines));
      expect(sumMinor([...left, ...right])).toBe(0);
    }));
  });

  it('undoes an entry exactly by reversing it', () => {
    fc.assert(fc.property(anEvent, (event) => {
      const lines = postingsFor(event);
      const both = [...lines, ...reversalOf(lines)];
      for (const { account } of lines) expect(balanceOf(account, both)).toBe(0);
    }));
  });

  it('leaves no trace of tickets that were paid for and wholly refunded, but for the fee', () => {
    const lines = [
      ...postingsFor({ kind: 'received', method: 'card', for: 'tickets', amountMinor: 6000 }),
      ...postingsFor({ kind: 'fee', for: 'tickets', amountMinor: 204 }),
      ...postingsFor({ kind: 'refund-owed', for: 'tickets', amountMinor: 6000 }),
      ...postingsFor({ kind: 'refund-paid', method: 'card', for: 'tickets', amountMinor: 6000 }),
    ];

    expect(balanceOf('ticket-income', lines)).toBe(0);
    expect(balanceOf('refunds-owed', lines)).toBe(0);
    expect(balanceOf('cards-clearing', lines)).toBe(-204);
    expect(balanceOf('card-fees', lines)).toBe(204);
  });

  it.each([0, -1, 0.5, Number.NaN])('refuses to move %s', (wrong) => {
    expect(() => postingsFor({ kind: 'received', method: 'cash', for: 'dues', amountMinor: wrong })).toThrow(RangeError);
  });
});
