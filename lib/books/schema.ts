import { z } from 'zod';
import { textField } from '@/lib/core/fields';
import { idField } from '@/lib/core/ids';
import { listingOf } from '@/lib/core/listing';

export const RECEIPT_SORTS = ['received', 'amount', 'number'] as const;
export type ReceiptSort = (typeof RECEIPT_SORTS)[number];

/** How the receipts are asked for, as it stands in the address. */
export const receiptsInput = listingOf(RECEIPT_SORTS, { sort: 'received', order: 'desc' });

/** Some or all of a payment given back: what was typed for the amount is read in the club's currency by the command. */
export const giveBackPaymentInput = z.object({
  paymentId: idField<'payment'>(),
  amount: z.string({ error: 'Type an amount like 62.00.' }).max(40),
  reason: textField('why', 200),
});

/** A refund that the card service would not make, paid out another way. */
export const paidByHandInput = z.object({
  refundId: z.uuid(),
  method: z.enum(['cheque', 'cash', 'transfer'], { error: 'Say how the money went.' }),
});
