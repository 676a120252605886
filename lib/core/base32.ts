/** RFC 4648 section 6: 32 upper-case letters and digits, all inside a QR code's alphanumeric set. */
const ALPHABET = 'ABCDEFGHIJKLMNOPQRSTUVWXYZ234567';

/** `bytes` in base 32 (RFC 4648 section 6) without the padding signs. */
export function toBase32(bytes: Uint8Array): string {
  let text = '';
  let held = 0;
  let bits = 0;
  for (const byte of bytes) {
    held = (held << 8) | byte;
    bits += 8;
    while (bits >= 5) {
      bits -= 5;
      text += ALPHABET.charAt((held >> bits) & 31);
    }
    held &= (1 << bits) - 1;
  }
  return bits > 0 ? text + ALPHABET.charAt((held << (5 - bits)) & 31) : text;
}

/**
 * The bytes behind unpadded base 32, or null for any text that `toBase32` would not have written:
 * one value has one spelling, so a changed character never means the same bytes.
 */
export function fromBase32(text: string): Uint8Array<ArrayBuffer> | null {
  const bytes = new Uint8Array(Math.floor((text.length * 5) / 8));
  let held = 0;
  let bits = 0;
  let at = 0;
  for (const character of text) {
    const value = ALPHABET.indexOf(character);
    if (value < 0) return null;
    held = (held << 5) | value;
    bits += 5;
    if (bits >= 8) {
      bits -= 8;
      bytes[at++] = (held >> bits) & 255;
      held &= (1 << bits) - 1;
    }
  }
  return bits < 5 && held === 0 ? bytes : null;
}
