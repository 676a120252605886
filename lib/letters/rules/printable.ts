/* Everything that draws nothing or turns text about: C0 and C1 controls but for the line feed, and the explicit
   directional formatting characters (UAX #9), which could make a name swallow the words beside it. */
const UNPRINTABLE = /[\u0000-\u0009\u000b-\u001f\u007f-\u009f\u061c\u200e\u200f\u202a-\u202e\u2066-\u2069\ufeff]/g;

/** What a person typed, as a letter may show it: whole characters, plain line feeds, nothing that controls. */
export const printable = (text: string): string => text.toWellFormed().replace(/\r\n?|[\u2028\u2029]/g, '\n').replace(UNPRINTABLE, '');

/** The same on one line, for subjects, names and headings. */
export const oneLine = (text: string): string => printable(text).replace(/\s+/g, ' ').trim();
