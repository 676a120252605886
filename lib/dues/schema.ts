import { z } from 'zod';
import { dayField, optionalTextField } from '@/lib/core/fields';
import { idField } from '@/lib/core/ids';

export const payDuesInput = z.object({ chargeId: idField<'charge'>() });

/** A payment that came on paper: what was typed for the amount is read in the club's currency by the command. */
export const recordPaymentInput = z.object({
  chargeId: idField<'charge'>(),
  method: z.enum(['cheque', 'cash', 'transfer'], { error: 'Say how the money came.' }),
  amount: z.string({ error: 'Type an amount like 62.00.' }).max(40),
  receivedOn: dayField,
  reference: optionalTextField(80),
});
