import { z } from 'zod';
import { dayField, optionalTextField } from '@/lib/core/fields';
import { idField } from '@/lib/core/ids';
import { listingOf } from '@/lib/core/listing';

export const payDuesInput = z.object({ chargeId: idField<'charge'>() });

/** A payment that came on paper: what was typed for the amount is read in the club's currency by the command. */
export const recordPaymentInput = z.object({
  chargeId: idField<'charge'>(),
  method: z.enum(['cheque', 'cash', 'transfer'], { error: 'Say how the money came.' }),
  amount: z.string({ error: 'Type an amount like 62.00.' }).max(40),
  receivedOn: dayField,
  reference: optionalTextField(80),
});

export const ROLL_SORTS = ['name', 'class', 'since', 'number', 'owed'] as const;
export type RollSort = (typeof ROLL_SORTS)[number];

export const ROLL_FILTERS = ['all', 'paid', 'kept', 'lapsed', 'life', 'new', 'left'] as const;
export type RollFilter = (typeof ROLL_FILTERS)[number];

const firstOf = (value: unknown) => (Array.isArray(value) ? value[0] : value) ?? null;

/** How the roll is asked for, as it stands in the address. */
export const rollInput = listingOf(ROLL_SORTS, { sort: 'name', order: 'asc' }).extend({
  standing: z.preprocess(firstOf, z.enum(ROLL_FILTERS).catch('all')),
  /** The household whose row is open. */
  open: z.preprocess(firstOf, z.uuid().nullable().catch(null)),
});
