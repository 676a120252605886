import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { fromBase32, toBase32 } from '@/lib/core/base32';

// RFC 4648 section 10, without the padding signs.
const RFC_4648 = [['', ''], ['f', 'MY'], ['fo', 'MZXQ'], ['foo', 'MZXW6'], ['foob', 'MZXW6YQ'], ['fooba', 'MZXW6YTB'], ['foobar', 'MZXW6YTBOI']] as const;

describe('base 32', () => {
  it.each(RFC_4648)('writes and reads "%s" as the standard says', (plain, coded) => {
    const bytes = new TextEncoder().encode(plain);

    expect(toBase32(bytes)).toBe(coded);
    expect(fromBase32(coded)).toEqual(bytes);
  });

  it('brings back any bytes', () => {
    fc.assert(fc.property(fc.uint8Array({ maxLength: 200 }), (bytes) => {
      expect(fromBase32(toBase32(bytes))).toEqual(bytes);
    }));
  });

  it.each(['my', 'M', 'MZX', 'MZXW6Y', 'MY======', 'M1', 'MZ'])('does not read "%s", which it would never write', (text) => {
    expect(fromBase32(text)).toBeNull();
  });
});
