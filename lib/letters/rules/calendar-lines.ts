/** How long a line of an iCalendar file may be, in octets without its line end (RFC 5545 section 3.1). */
const FOLD_OCTETS = 75;
const CONTROL = /[\u0000-\u0008\u000b-\u001f\u007f]/g;

/** Joins folded lines again (RFC 5545 section 3.1): a line that begins with a space or a tab belongs to the one before. */
export function unfold(file: string): string[] {
  return file.replace(/\r\n[ \t]/g, '').split('\r\n').filter((line) => line !== '');
}

/** Writes content lines as a file: each at most 75 octets, never cut inside a character, each ended by CR LF. */
export function fold(lines: readonly string[]): string {
  return lines.map((line) => `${foldOne(line)}\r\n`).join('');
}

function foldOne(line: string): string {
  const pieces = [''];
  let octets = 0;
  for (const character of line) {
    const size = new TextEncoder().encode(character).length;
    if (octets + size > FOLD_OCTETS) {
      pieces.push('');
      octets = 1; // the space that a continuation begins with
    }
    pieces[pieces.length - 1] += character;
    octets += size;
  }
  return pieces.join('\r\n ');
}

/** Text that an iCalendar TEXT value may hold: one kind of line break, no control characters, no half characters. */
export function calendarText(text: string): string {
  return text.toWellFormed().replace(/\r\n?|[\u0085\u2028\u2029]/g, '\n').replace(CONTROL, '');
}

/** A parameter value in quotes; what may not stand there is written as RFC 6868 says. */
export function quotedParameter(value: string): string {
  const escaped = calendarText(value).replaceAll('^', '^^').replaceAll('"', "^'").replaceAll('\n', '^n').replaceAll('\t', ' ');
  return `"${escaped}"`;
}

/** An e-mail address as a mailto URI (RFC 6068): what a URI may not hold is percent-encoded. */
export function mailtoUri(email: string): string {
  const bare = calendarText(email).replaceAll('\n', '');
  return `mailto:${encodeURIComponent(bare).replaceAll('%40', '@').replaceAll('%2B', '+')}`;
}
