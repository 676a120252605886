import { z } from 'zod';
import { ROLES } from '@/lib/core/words';

const none = z.looseObject({});
const count = z.int().min(0);
const line = z.string().max(400);

/** The facts of each kind of letter beside its booking or household: only what is no longer in the tables when it is sent. */
export const letterFacts = {
  /** The places are the party's: the day, the tickets, one calendar file of all visits. */
  confirmation: none,
  /** A visit has another time or other people; `was` says how it stood, "Pine Barrow at 11:30, 3 people". */
  change: z.looseObject({ was: z.array(line).default([]), refundMinor: count.default(0), reason: line.optional() }),
  /** People or whole visits given back; `was` names them; `refundMinor` is what comes back. */
  'given-back': z.looseObject({ was: z.array(line).default([]), refundMinor: count.default(0), reason: line.optional() }),
  /** Money on its way back, for whatever reason. */
  refund: z.looseObject({ amountMinor: count, reason: line.optional() }),
  /** Money came and the places were gone: all of it goes back. */
  'places-lost': z.looseObject({ refundMinor: count }),
  /** The day is near: addresses for a confirmed e-mail, only the link for another. */
  reminder: none,
  /** One visit for the party's calendar: REQUEST, or CANCEL when it was given back. Built when it is sent. */
  calendar: z.looseObject({ visitId: z.uuid(), sentSequence: count.optional() }),
  /** A code and a link to sign in with. */
  'sign-in': z.looseObject({ code: line, secret: line, minutes: count }),
  /** An officer's role was given. */
  invitation: z.looseObject({ role: z.enum(ROLES), invitedBy: line }),
  /** Dues came in. */
  'dues-receipt': z.looseObject({ paymentId: z.uuid() }),
  /** An officer's own words to those affected. */
  notice: z.looseObject({ subject: line, body: z.string().max(10_000) }),
} as const;

export type LetterKind = keyof typeof letterFacts;

/** What a caller gives for a kind of letter. */
export type LetterFacts<K extends LetterKind> = z.input<(typeof letterFacts)[K]>;

/** Every kind of letter, for lists and filters. */
export const LETTER_KINDS = ['confirmation', 'change', 'given-back', 'refund', 'places-lost', 'reminder', 'calendar', 'sign-in', 'invitation', 'dues-receipt', 'notice'] as const satisfies readonly LetterKind[];

/** The button "send again" of the office's list. */
export const sendAgainInput = z.object({ letterId: z.uuid() });
export type SendAgainInput = z.output<typeof sendAgainInput>;

/** The office's list of letters: one page, perhaps only one kind or state. */
export const letterListInput = z.object({
  page: z.coerce.number().int().min(1).max(10_000).catch(1),
  state: z.enum(['all', 'waiting', 'failing', 'sent', 'dropped']).catch('all'),
  kind: z.enum(['all', ...LETTER_KINDS]).catch('all'),
  find: z.string().max(200).catch(''),
});
export type LetterListInput = z.output<typeof letterListInput>;
