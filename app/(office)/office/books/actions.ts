'use server';
import { refresh } from 'next/cache';
import { giveBackPayment, paidByHand } from '@/lib/books/commands/give-back-payment';
import { giveBackPaymentInput, paidByHandInput } from '@/lib/books/schema';
import { action } from '@/lib/web/action';

export const giveBackPaymentAction = action({
  requires: 'refunds.make',
  input: giveBackPaymentInput,
  run: giveBackPayment,
  after: (way) => {
    refresh();
    return { status: 'done', message: way === 'card' ? 'It goes back to the card, and the payer is written to.' : 'It is booked as paid out, and the payer is written to.' };
  },
});

export const paidByHandAction = action({
  requires: 'refunds.make',
  input: paidByHandInput,
  run: paidByHand,
  after: () => {
    refresh();
    return { status: 'done', message: 'Booked as paid out.' };
  },
});
