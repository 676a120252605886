import { z } from 'zod';
import { isDay } from './time';

/** Form data is text: these read it strictly and say what to do next. `z.coerce` would read an empty box as nought. */

const oneLine = (text: string) => text.replace(/[\p{Cc}\u2028\u2029]+/gu, ' ').replace(/[\u202a-\u202e\u2066-\u2069]/g, '').replace(/\s+/g, ' ').trim();
const lengthOf = (text: string) => Array.from(text).length;

/** A one-line text of 1 to `max` characters (code points); control and direction-override characters are dropped. */
export const textField = (what: string, max = 120) =>
  z.string({ error: `Type ${what}.` }).transform(oneLine).pipe(z.string()
    .refine((text) => text.length > 0, { error: `Type ${what}.` })
    .refine((text) => lengthOf(text) <= max, { error: `That is longer than ${max} characters. Shorten it a little.` }));

/** As `textField`, but may be empty, which reads as null. */
export const optionalTextField = (max = 120) =>
  z.string().optional().transform((text) => oneLine(text ?? '') || null)
    .refine((text) => text === null || lengthOf(text) <= max, { error: `That is longer than ${max} characters. Shorten it a little.` });

/** A text of several lines, up to `max` characters; empty reads as null. */
export const notesField = (max = 2000) =>
  z.string().optional()
    .transform((text) => (text ?? '').replace(/\r\n?/g, '\n').replace(/[\p{Cc}\u202a-\u202e\u2066-\u2069]/gu, (c) => (c === '\n' ? c : '')).trim() || null)
    .refine((text) => text === null || lengthOf(text) <= max, { error: `That is longer than ${max} characters. Shorten it a little.` });

/** A whole number typed in a box, within bounds. */
export const wholeField = (bounds: { min: number; max: number; what?: string }) =>
  z.union([z.string(), z.number()], { error: `Type a whole number from ${bounds.min} to ${bounds.max}.` })
    .transform((typed) => (typeof typed === 'number' ? typed : /^\s*-?\d{1,15}\s*$/.test(typed) ? Number(typed) : Number.NaN))
    .refine((value) => Number.isInteger(value) && value >= bounds.min && value <= bounds.max, {
      error: bounds.what ?? `Type a whole number from ${bounds.min} to ${bounds.max}.`,
    });

/** Heads of one kind in a party: 0 to 99, an empty box is nought. The club's own limit is a rule, not a field. */
export const headsField = z.union([z.string(), z.number()]).optional()
  .transform((typed) => (typed === undefined || typed === '' ? 0 : typeof typed === 'number' ? typed : /^\s*\d{1,9}\s*$/.test(typed) ? Number(typed) : Number.NaN))
  .refine((value) => Number.isInteger(value) && value >= 0 && value <= 99, { error: 'Type a whole number of people, from 0 to 99.' });

/** A ticked box: absent is false, the browser's "on" is true, and nothing else is. */
export const tickField = z.union([z.literal('on'), z.literal('true'), z.literal('false'), z.literal(''), z.boolean()]).optional()
  .transform((value) => value === 'on' || value === 'true' || value === true);

// RFC 5321 section 4.5.3.1 limits; a quoted local part and plus signs are legal (RFC 5321 section 4.1.2).
const local = /^(?:[A-Za-z0-9!#$%&'*+/=?^_`{|}~-]+(?:\.[A-Za-z0-9!#$%&'*+/=?^_`{|}~-]+)*|"(?:[\x20\x21\x23-\x5b\x5d-\x7e]|\\[\x20-\x7e])+")$/;
const domain = /^(?:[A-Za-z0-9](?:[A-Za-z0-9-]{0,61}[A-Za-z0-9])?\.)+[A-Za-z][A-Za-z0-9-]{0,61}[A-Za-z0-9]$/;
/** Whether a text is an e-mail address that a mail server would take. */
export function isEmail(text: string): boolean {
  const at = text.lastIndexOf('@');
  return at > 0 && at <= 64 && text.length <= 254 && local.test(text.slice(0, at)) && domain.test(text.slice(at + 1));
}

/** An e-mail address, trimmed, its domain in lower case. */
export const emailField = z.string({ error: 'Type an e-mail address.' }).transform((text) => text.trim())
  .refine((text) => text !== '', { error: 'Type an e-mail address.', abort: true })
  .refine(isEmail, { error: 'That is not an e-mail address we can write to. It looks like name@place.example.' })
  .transform((text) => text.slice(0, text.lastIndexOf('@')) + text.slice(text.lastIndexOf('@')).toLowerCase());

/** A telephone number as typed, or null. */
export const phoneField = optionalTextField(40).refine((text) => text === null || (/^[+\d][\d\s().+-]*$/.test(text) && (text.match(/\d/g) ?? []).length >= 5), {
  error: 'A telephone number has digits, spaces and perhaps a plus. Leave it empty if you like.',
});

/** A calendar day from a date box, of a year that a club has lived or may plan for. */
export const dayField = z.string({ error: 'Choose a day.' }).refine((text) => isDay(text) && text >= '1900' && text < '2200', { error: 'Choose a day.' });

/** A wall-clock time from a time box, `HH:MM`. */
export const timeField = z.string({ error: 'Choose a time.' }).regex(/^([01]\d|2[0-3]):[0-5]\d$/, { error: 'Choose a time like 10:45.' });
