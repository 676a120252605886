import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { checkCharacter, hasGoodCheck } from '@/lib/core/check-character';

// Published ISO/IEC 7064 MOD 37,36 examples: four GRid numbers from public test suites; two ISAN roots from memory, recomputed.
const PUBLISHED = [
  ['A12425GABC1234002', 'M'],
  ['A12425GXYZ9876008', '6'],
  ['A12425G1234567890', 'L'],
  ['A12589KCCC2586482', 'V'],
  ['B159D8FA01240000', 'K'],
  ['00000000D07A0090', 'Q'],
] as const;

const alphanumeric = fc.string({ unit: fc.constantFrom(...'0123456789ABCDEFGHIJKLMNOPQRSTUVWXYZ'), minLength: 1, maxLength: 20 });

describe('the check character', () => {
  it.each(PUBLISHED)('of %s is the published %s', (body, check) => {
    expect(checkCharacter(body)).toBe(check);
    expect(hasGoodCheck(body + check)).toBe(true);
  });

  it('finds every single wrong character', () => {
    fc.assert(
      fc.property(alphanumeric, fc.nat(), fc.nat(), (body, where, other) => {
        const code = body + checkCharacter(body);
        const at = where % code.length;
        const wrong = '0123456789ABCDEFGHIJKLMNOPQRSTUVWXYZ'.charAt(other % 36);
        const changed = code.slice(0, at) + wrong + code.slice(at + 1);
        expect(hasGoodCheck(changed)).toBe(changed === code);
      }),
    );
  });

  it('says no to a lone character, to small letters and to anything that is not a letter or digit', () => {
    expect(hasGoodCheck('M')).toBe(false);
    expect(hasGoodCheck('a12425GABC1234002M')).toBe(false);
    expect(hasGoodCheck('A12425GABC1234002-')).toBe(false);
    expect(() => checkCharacter('A B')).toThrow(RangeError);
  });
});
