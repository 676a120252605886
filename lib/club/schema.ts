import { z } from 'zod';
import { notesField, textField, tickField, wholeField } from '@/lib/core/fields';
import { listingOf } from '@/lib/core/listing';

const step = z.object({ hoursBefore: wholeField({ min: 0, max: 2000 }), percent: wholeField({ min: 0, max: 100 }) });

/* A step whose boxes are both empty is none: that is how one is taken away. */
const withoutEmptySteps = (value: unknown) => (Array.isArray(value) ? value.filter((each) => emptyStep.safeParse(each).success === false) : value);
const emptyStep = z.object({ hoursBefore: z.literal(''), percent: z.literal('') });

/** The club's settings that an administrator may change. Later steps of the refund rule come nearer to the entry time. */
export const settingsInput = z.object({
  name: textField('the club’s name', 80),
  footLine: textField('a line for the foot of each page', 120),
  holdMinutes: wholeField({ min: 1, max: 60 }),
  holdsMayBeExtended: tickField,
  partyPeopleMax: wholeField({ min: 1, max: 99 }),
  partyVisitsMax: wholeField({ min: 1, max: 14 }),
  babesTakePlace: tickField,
  addressReleaseHours: wholeField({ min: 0, max: 720 }),
  changesEndMinutes: wholeField({ min: 0, max: 10_080 }),
  duesKeptOnDays: wholeField({ min: 0, max: 366 }),
  hourCycle: z.enum(['h12', 'h23'], { error: 'Choose 12 or 24 hours.' }),
  visitRules: notesField(4000).transform((text) => text ?? ''),
  refundRules: z.preprocess(withoutEmptySteps, z.array(step).max(6)).refine((steps) => steps.every((each, index) => index === 0 || each.hoursBefore < (steps[index - 1]?.hoursBefore ?? 0)), {
    error: 'Put the steps in order, the earliest first.',
  }),
});

/** How the audit trail is asked for, as it stands in the address: newest first or oldest first. */
export const auditInput = listingOf(['at'], { sort: 'at', order: 'desc' });
