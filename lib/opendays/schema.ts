import { z } from 'zod';
import { dayField, notesField, optionalTextField, textField, timeField, wholeField } from '@/lib/core/fields';
import { idField } from '@/lib/core/ids';
import { listingOf } from '@/lib/core/listing';

const slugField = z.string({ error: 'Type a short name for the address.' }).transform((text) => text.trim().toLowerCase())
  .refine((text) => /^[a-z0-9]+(-[a-z0-9]+)*$/.test(text) && text.length <= 60, { error: 'Use small letters, figures and single hyphens: spring-2027.' })
  .refine((text) => text !== 'new' && text !== 'csv', { error: 'That word is taken. Add the year: spring-2027.' });

/** An amount as typed; read in the club's currency by the command. */
const priceField = z.string({ error: 'Type a price; 0 is free.' }).max(20);

/** A whole number that may be left out: the club's own holds then. */
const optionalWhole = (bounds: { min: number; max: number }) => z.union([z.literal('').transform(() => null), wholeField(bounds)]).optional().transform((value) => value ?? null);

const dayParts = {
  title: textField('the open day’s name', 60),
  placeLine: textField('where it is, in a few words', 80),
  howToCome: notesField(1000),
  heldOn: dayField,
  opensAt: timeField,
  closesAt: timeField,
  adult: priceField,
  child: priceField,
  babe: priceField,
  partyPeopleMax: optionalWhole({ min: 1, max: 99 }),
};

export const openDayInput = z.object({ slug: slugField, ...dayParts });
export const openDayChangeInput = z.object({ openDayId: idField<'openDay'>(), ...dayParts });
export const openDayIdInput = z.object({ openDayId: idField<'openDay'>() });

export const stopInput = z.object({
  openDayId: idField<'openDay'>(),
  gardenId: idField<'garden'>(),
  number: wholeField({ min: 1, max: 14 }),
  stayMinutes: wholeField({ min: 5, max: 240 }),
  headsLimit: wholeField({ min: 1, max: 500 }),
});

export const stopChangeInput = z.object({ stopId: idField<'stop'>(), stayMinutes: wholeField({ min: 5, max: 240 }), headsLimit: wholeField({ min: 1, max: 500 }) });

/** A price that may be left out: the open day's own holds then. */
const ownPriceField = z.string().max(20).optional().transform((text) => (text ?? '').trim());

export const stopPricesInput = z.object({ stopId: idField<'stop'>(), adult: ownPriceField, child: ownPriceField, babe: ownPriceField });

const timeParts = { graceMinutes: wholeField({ min: 1, max: 240 }), capacity: wholeField({ min: 0, max: 500 }) };

/** Entry times from one start to a last one, every so many minutes; one alone when both starts are the same. */
export const entryTimesInput = z.object({ stopId: idField<'stop'>(), firstAt: timeField, lastAt: timeField, everyMinutes: wholeField({ min: 5, max: 480 }), ...timeParts })
  .refine(({ firstAt, lastAt }) => firstAt <= lastAt, { path: ['lastAt'], error: 'The last start comes after the first.' });

export const entryTimeChangeInput = z.object({
  entryTimeId: idField<'entryTime'>(),
  opensAt: timeField,
  ...timeParts,
  reason: optionalTextField(200),
});

export const entryTimeIdInput = z.object({ entryTimeId: idField<'entryTime'>() });

/** A letter in the coordinator's own words to a whole open day's parties, or to those of one stop. */
export const noticeInput = z.object({
  openDayId: idField<'openDay'>(),
  stopId: z.union([z.literal('').transform(() => null), idField<'stop'>()]).optional().transform((stopId) => stopId ?? null),
  subject: textField('a subject', 120),
  body: notesField(5000).transform((text) => text ?? '').refine((text) => text.length > 0, { error: 'Write the letter.' }),
});

export const planNoteInput = z.object({ openDayId: idField<'openDay'>(), note: textField('the note', 300) });

export const BOOKING_SORTS = ['made', 'name', 'people', 'paid'] as const;
export type BookingSort = (typeof BOOKING_SORTS)[number];

/** How bookings are asked for, as it stands in the address; `day` is an open day's slug. */
export const bookingsInput = listingOf(BOOKING_SORTS, { sort: 'made', order: 'desc' }).extend({ day: z.preprocess((value) => (Array.isArray(value) ? value[0] : value) ?? '', z.string().max(60).catch('')) });
