'use server';

import { redirect } from 'next/navigation';
import { revalidatePath } from 'next/cache';
import { keepAgain, keepLonger, letGo } from '@/lib/bookings/commands/keeping';
import { openBooking } from '@/lib/bookings/commands/links';
import { payOrConfirm, startPayment } from '@/lib/bookings/commands/pay';
import { detailsInput, holdIdInput } from '@/lib/bookings/schema';
import { action } from '@/lib/web/action';
import { keepBookingLink } from '@/lib/web/cookies';

export const keepLongerAction = action({ requires: 'browser', input: holdIdInput, run: keepLonger, after: () => revalidatePath('/hold') });

export const letGoAction = action({ requires: 'browser', input: holdIdInput, run: letGo, after: () => revalidatePath('/hold') });

export const keepAgainAction = action({ requires: 'browser', input: holdIdInput, run: keepAgain, after: () => redirect('/hold') });

export const payAction = action({
  requires: 'browser',
  input: detailsInput,
  run: payOrConfirm,
  after: (next) => redirect('payAt' in next ? next.payAt : '/hold'),
});

export const payOnAction = action({ requires: 'browser', input: holdIdInput, run: startPayment, after: (payAt) => redirect(payAt) });

export const openBookingAction = action({
  requires: 'browser',
  input: holdIdInput,
  run: openBooking,
  after: async ({ code, secret }) => {
    await keepBookingLink(code, secret);
    redirect(`/bookings/${code}`);
  },
});
