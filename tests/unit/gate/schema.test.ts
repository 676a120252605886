import { describe, expect, test } from 'vitest';
import { exchangePassInput, FACTS_A_BATCH, recordFactsInput, sentFact } from '@/lib/gate/schema';

const id = '7a1f6b62-6c1e-4c39-9d43-0b6d3b6f1c11';
const admit = { id, kind: 'admit', undoesId: null, visitId: id, adults: 2, children: 1, babes: 0, at: '2027-05-15T11:34:00.000Z', verdict: 'let_in', reason: null };

describe('the wire format of gate facts', () => {
  test('an admission arrives with its time as an instant', () => {
    expect(sentFact.parse(admit).at).toEqual(new Date('2027-05-15T11:34:00Z'));
  });

  test.each([
    ['an id that is not a UUID', { id: 'x' }],
    ['an unknown kind', { kind: 'wave_through' }],
    ['an admission of nobody', { adults: 0, children: 0 }],
    ['minus one adult', { adults: -1 }],
    ['half a child', { children: 0.5 }],
    ['a thousand million adults', { adults: 1e9 }],
    ['an admission without a ticket', { visitId: null }],
    ['an admission that undoes something', { undoesId: id }],
    ['an undo that names nothing', { kind: 'undo' }],
    ['a time that is no time', { at: 'noon' }],
    ['a very long reason', { reason: 'x'.repeat(201) }],
  ])('refuses %s', (_, changes) => {
    expect(sentFact.safeParse({ ...admit, ...changes }).success).toBe(false);
  });

  test('what no text may hold is left out of the words a phone sends', () => {
    const sent = recordFactsInput.parse({ phoneTime: admit.at, listVersion: 'v\u00001', facts: [{ ...admit, verdict: 'let\u0000_in', reason: 'wet\u0000 feet' }] });

    expect([sent.listVersion, sent.facts[0]?.verdict, sent.facts[0]?.reason]).toEqual(['v1', 'let_in', 'wet feet']);
  });

  test('an empty reason is no reason', () => {
    expect(sentFact.parse({ ...admit, reason: '  ' }).reason).toBeNull();
  });

  test('a batch has at least one fact and no more than its limit', () => {
    const batch = (facts: unknown[]) => recordFactsInput.safeParse({ phoneTime: admit.at, listVersion: '1', facts }).success;

    expect([batch([]), batch([admit]), batch(Array(FACTS_A_BATCH).fill(admit)), batch(Array(FACTS_A_BATCH + 1).fill(admit))])
      .toEqual([false, true, true, false]);
  });

  test('a device key is 32 bytes in base64url, and nothing shorter opens a gate', () => {
    expect(exchangePassInput.safeParse({ secret: 'a-long-secret', deviceKey: 'A'.repeat(43) }).success).toBe(true);
    expect(exchangePassInput.safeParse({ secret: 'a-long-secret', deviceKey: 'A'.repeat(42) }).success).toBe(false);
  });
});
