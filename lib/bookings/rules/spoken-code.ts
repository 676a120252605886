import { checkCharacter, hasGoodCheck } from '@/lib/core/check-character';

/** What codes are made of: digits and letters without I, L, O and U, which are misheard or misread. */
const LETTERS = '0123456789ABCDEFGHJKMNPQRSTVWXYZ';
const UNUSED = /[ILOU]/;
const LENGTH = 8;

/** What to try for a letter that no code holds; the first three are read so without asking. */
const INSTEAD = { O: 'a nought', I: 'a one', L: 'a one', U: 'a V' } as const;

/** What became of a typed or spoken code: the eight characters, or one sentence that says what to do. */
export type SpokenCodeReading = { code: string } | { problem: string };

/**
 * Draws a booking's spoken code: seven characters and the check character over them (ISO/IEC 7064 MOD 37,36).
 * `randomBytes` gives that many unpredictable bytes; five bits of each are used, so each character is equally likely.
 */
export function drawSpokenCode(randomBytes: (count: number) => Uint8Array): string {
  for (;;) {
    const body = [...randomBytes(LENGTH - 1)].map((byte) => LETTERS.charAt(byte & 31)).join('');
    const code = body + checkCharacter(body);
    if (!UNUSED.test(code)) return code; // the check character alone may be one of the four
  }
}

/** Whether a text could be a code as it is stored and stands in an address. */
export const isSpokenCode = (text: string): boolean => /^[0-9A-Z]{8}$/.test(text);

/** The code as it is shown and said: two groups of four, "7Q2M XK4D". */
export function showSpokenCode(code: string): string {
  return `${code.slice(0, 4)} ${code.slice(4)}`;
}

/** Reads what a person typed: case, spaces, hyphens and dots do not matter, O is a nought, I and L are a one. */
export function readSpokenCode(typed: string): SpokenCodeReading {
  const bare = typed.normalize('NFKC').toUpperCase().replace(/[\s.\-\u2010-\u2015_]/g, '');
  if (bare === '') return { problem: 'Type the eight letters and numbers of the code.' };
  const odd = /[^0-9A-Z]/u.exec(bare);
  if (odd) return { problem: 'Our codes hold only letters and numbers. Leave the other signs out.' };
  if (bare.includes('U')) return { problem: unusedLetter('U') };
  const code = bare.replaceAll('O', '0').replace(/[IL]/g, '1');
  if (code.length !== LENGTH) return { problem: `Our codes have eight letters and numbers; this has ${code.length}.` };
  if (hasGoodCheck(code)) return { code };
  const unused = /[OIL]/.exec(bare)?.[0];
  if (unused === 'O' || unused === 'I' || unused === 'L') return { problem: unusedLetter(unused) };
  return { problem: 'One letter or number of this code is not right. Look at it once more.' };
}

function unusedLetter(letter: keyof typeof INSTEAD): string {
  return `There is no letter ${letter} in our codes. Try ${INSTEAD[letter]}.`;
}
