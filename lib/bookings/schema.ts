import { z } from 'zod';
import { emailField, headsField, phoneField, textField, tickField, wholeField } from '@/lib/core/fields';
import { idField } from '@/lib/core/ids';

/** An open day has at most 14 stops, so a party never wants more times than that. */
const TIMES_MOST = 14;
const NO_TIME = 'Choose at least one entry time.';

const people = { adults: headsField, children: headsField, babes: headsField };

const wish = z.object({ entryTimeId: idField<'entryTime'>(), ...people });

const eachOnce = <T extends { entryTimeId: string }>(wishes: readonly T[]) => new Set(wishes.map((one) => one.entryTimeId)).size === wishes.length;

/** What a party asks to have kept: entry times of one open day, each once, and who comes to each. */
export const holdInput = z.object({
  openDayId: idField<'openDay'>(),
  wanted: z.array(wish, { error: NO_TIME }).min(1, { error: NO_TIME }).max(TIMES_MOST, { error: `Choose at most ${TIMES_MOST} entry times.` })
    .refine(eachOnce, { error: 'Choose each entry time once.' }),
  insists: tickField,
});
export type HoldInput = z.output<typeof holdInput>;
export type Wish = HoldInput['wanted'][number];

/**
 * The board's own form as a browser without JavaScript sends it: one party for all ticked times. Fields `openDayId`,
 * `adults`, `children`, `babes`, `entryTimeId[]`, `insists`. Reads as a `HoldInput`.
 */
export const boardFormInput = z.object({
  openDayId: idField<'openDay'>(),
  entryTimeId: z.array(idField<'entryTime'>(), { error: NO_TIME }).min(1, { error: NO_TIME }).max(TIMES_MOST, { error: `Choose at most ${TIMES_MOST} entry times.` }),
  ...people,
  insists: tickField,
}).transform(({ openDayId, entryTimeId, adults, children, babes, insists }): HoldInput => ({
  openDayId, insists, wanted: [...new Set(entryTimeId)].map((id) => ({ entryTimeId: id, adults, children, babes })),
}));

/** Which hold of this browser is meant. */
export const holdIdInput = z.object({ bookingId: idField<'booking'>() });
export type HoldIdInput = z.output<typeof holdIdInput>;

/** Who the party is and that it keeps to the visit rules; typed before paying or confirming. */
export const detailsInput = holdIdInput.extend({
  name: textField('the name for the booking'),
  email: emailField,
  phone: phoneField,
  rulesAgreed: tickField.refine((ticked) => ticked, { error: 'Tick that everyone in your party will keep to the visit rules.' }),
  wantsInvitations: tickField,
});
export type DetailsInput = z.output<typeof detailsInput>;

/** People of one visit given back; the version says which state of it the party was looking at. */
export const giveBackInput = z.object({ visitId: idField<'visit'>(), version: wholeField({ min: 1, max: 1_000_000 }), ...people });
export type GiveBackInput = z.output<typeof giveBackInput>;

/** One visit moved to another entry time of the same day. */
export const changeInput = z.object({
  visitId: idField<'visit'>(),
  version: wholeField({ min: 1, max: 1_000_000 }),
  entryTimeId: idField<'entryTime'>(),
  insists: tickField,
});
export type ChangeInput = z.output<typeof changeInput>;

/** An action of a booking's page that needs nothing but the booking itself. */
export const bookingInput = z.object({ code: z.string().max(40).optional() });
export type BookingInput = z.output<typeof bookingInput>;

/** An officer's change of a party's visit, with why. */
export const moveVisitInput = changeInput.extend({ reason: textField('why', 200) });
export type MoveVisitInput = z.output<typeof moveVisitInput>;

/** An officer giving back for a party, with why; `refundPercent` overrides the club's rule, 100 when the club is at fault. */
export const giveBackForPartyInput = giveBackInput.extend({
  reason: textField('why', 200),
  refundPercent: z.union([z.literal('').transform(() => null), wholeField({ min: 0, max: 100 })]).optional().transform((percent) => percent ?? null),
});
export type GiveBackForPartyInput = z.output<typeof giveBackForPartyInput>;
