'use server';
import { refresh } from 'next/cache';
import { recordPayment } from '@/lib/dues/commands';
import { recordPaymentInput } from '@/lib/dues/schema';
import { receiptNumber } from '@/lib/dues/views';
import { action } from '@/lib/web/action';

export const recordPaymentAction = action({
  requires: 'dues.record',
  input: recordPaymentInput,
  run: recordPayment,
  after: ({ year, number }) => {
    refresh();
    return { status: 'done', message: `Recorded with receipt ${receiptNumber(year, number)}.` };
  },
});
