import { listingOf } from '@/lib/core/listing';

export const RECEIPT_SORTS = ['received', 'amount', 'number'] as const;
export type ReceiptSort = (typeof RECEIPT_SORTS)[number];

/** How the receipts are asked for, as it stands in the address. */
export const receiptsInput = listingOf(RECEIPT_SORTS, { sort: 'received', order: 'desc' });
