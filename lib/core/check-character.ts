/** The 36 values of ISO 7064's alphanumeric set, in order: a character's value is its place here. */
const VALUES = '0123456789ABCDEFGHIJKLMNOPQRSTUVWXYZ';

/** Walks ISO/IEC 7064 MOD 37,36 over `body`; null when a character is outside 0-9 A-Z. */
function carried(body: string): number | null {
  let product = 36;
  for (const character of body) {
    const value = VALUES.indexOf(character);
    if (value < 0) return null;
    const sum = (product + value) % 36 || 36; // nought stands for 36 in the standard's hybrid systems
    product = (sum * 2) % 37;
  }
  return product;
}

/** The ISO/IEC 7064 MOD 37,36 check character of `body` (0-9 A-Z); throws on any other character. */
export function checkCharacter(body: string): string {
  const product = carried(body);
  if (product === null) throw new RangeError('a check character needs 0-9 and A-Z only');
  return VALUES.charAt((37 - product) % 36);
}

/** Whether the last character of `code` is the check character of the rest. */
export function hasGoodCheck(code: string): boolean {
  if (code.length < 2 || carried(code) === null) return false;
  return checkCharacter(code.slice(0, -1)) === code.slice(-1);
}
