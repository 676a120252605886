import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { drawSpokenCode, readSpokenCode, showSpokenCode } from '@/lib/bookings/rules/spoken-code';
import { checkCharacter, hasGoodCheck } from '@/lib/core/check-character';

const LETTERS = '0123456789ABCDEFGHJKMNPQRSTVWXYZ';
const bytesFor = (body: string) => Uint8Array.from(body, (letter) => LETTERS.indexOf(letter));

/** A source of bytes that never repeats itself for long: a linear congruential generator's upper byte. */
function bytesFrom(seed: number): (count: number) => Uint8Array {
  let state = seed >>> 0;
  const next = () => (state = (Math.imul(state, 1664525) + 1013904223) >>> 0) >>> 24;
  return (count) => Uint8Array.from({ length: count }, next);
}

/** A body whose check character is the given one of the four that codes leave out. */
function bodyWithCheck(check: string): string {
  for (let n = 0; ; n += 1) {
    const body = [...Array(7).keys()].map((place) => LETTERS.charAt(Math.floor(n / 32 ** place) % 32)).join('');
    if (checkCharacter(body) === check) return body;
  }
}

describe('drawing a spoken code', () => {
  it('gives eight characters with a good check character and none of I, L, O, U', () => {
    fc.assert(
      fc.property(fc.nat(), (seed) => {
        const code = drawSpokenCode(bytesFrom(seed));

        expect(code).toMatch(/^[0-9A-HJKMNP-TV-Z]{8}$/);
        expect(hasGoodCheck(code)).toBe(true);
      }),
    );
  });

  it.each(['I', 'L', 'O', 'U'])('draws again when the check character would be %s', (letter) => {
    const draws = [bytesFor(bodyWithCheck(letter)), bytesFor('7Q2MXK5')];

    const code = drawSpokenCode(() => draws.shift() ?? new Uint8Array(7));

    expect(code.slice(0, 7)).toBe('7Q2MXK5');
    expect(draws).toHaveLength(0);
  });
});

describe('reading a spoken code', () => {
  const code = drawSpokenCode(() => bytesFor('7Q2MXK5'));

  it('is shown as two groups of four', () => {
    expect(showSpokenCode('7Q2MXK4D')).toBe('7Q2M XK4D');
  });

  it('reads back any code however it is typed: small letters, spaces, hyphens, dots', () => {
    fc.assert(
      fc.property(fc.nat(), fc.constantFrom(' ', '-', '.', '', '  ', '\u2013', '\u00a0'), (seed, gap) => {
        const drawn = drawSpokenCode(bytesFrom(seed));
        const typed = ` ${drawn.slice(0, 3).toLowerCase()}${gap}${drawn.slice(3)} `;

        expect(readSpokenCode(typed)).toEqual({ code: drawn });
      }),
    );
  });

  it('takes O for a nought and I and L for a one', () => {
    const withBoth = drawSpokenCode(() => bytesFor('01A01B0'));
    const spoken = withBoth.replaceAll('0', 'o');

    expect(readSpokenCode(spoken.replaceAll('1', 'l'))).toEqual({ code: withBoth });
    expect(readSpokenCode(spoken.replaceAll('1', 'I'))).toEqual({ code: withBoth });
  });

  it('says which letter is not used, and what to try, when the code is still not right', () => {
    const wrong = code.startsWith('7O') ? '8O' : '7O';

    expect(readSpokenCode(wrong + code.slice(2))).toEqual({ problem: 'There is no letter O in our codes. Try a nought.' });
    expect(readSpokenCode('7U2M XK4D')).toEqual({ problem: 'There is no letter U in our codes. Try a V.' });
    expect(readSpokenCode(`7L${code.slice(2)}`)).toEqual({ problem: 'There is no letter L in our codes. Try a one.' });
  });

  it.each([
    ['', 'Type the eight letters and numbers of the code.'],
    ['7Q2M XK4', 'Our codes have eight letters and numbers; this has 7.'],
    ['7Q2M XK4D Z', 'Our codes have eight letters and numbers; this has 9.'],
    ['7Q2M/XK4D', 'Our codes hold only letters and numbers. Leave the other signs out.'],
    ['🚂Q2M XK4D', 'Our codes hold only letters and numbers. Leave the other signs out.'],
  ])('answers "%s" with a sentence', (typed, problem) => {
    expect(readSpokenCode(typed)).toEqual({ problem });
  });

  it('notices one wrong character', () => {
    const wrong = (code.startsWith('8') ? '9' : '8') + code.slice(1);

    expect(readSpokenCode(wrong)).toEqual({ problem: 'One letter or number of this code is not right. Look at it once more.' });
  });
});
