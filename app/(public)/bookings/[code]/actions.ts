'use server';

import { revalidatePath } from 'next/cache';
import { changeVisit } from '@/lib/bookings/commands/change';
import { giveBack } from '@/lib/bookings/commands/give-back';
import { confirmEmail, makeFeed, revokeFeed } from '@/lib/bookings/commands/links';
import { bookingInput, changeInput, giveBackInput } from '@/lib/bookings/schema';
import { formatMoney } from '@/lib/core/money';
import type { BookingActor, Ctx } from '@/lib/infra/context';
import { siteUrl } from '@/lib/letters/links';
import { action } from '@/lib/web/action';

const look = () => revalidatePath('/bookings/[code]', 'page');

const withRefund = (words: string) => async ({ refundMinor }: { refundMinor: number }, { club }: Ctx<BookingActor>) => {
  look();
  const back = formatMoney({ amountMinor: refundMinor, currency: club.currency }, club.locale);
  return { status: 'done' as const, message: refundMinor === 0 ? words : `${words} ${back} goes back the way you paid.` };
};

export const giveBackAction = action({ requires: 'booking', input: giveBackInput, run: giveBack, after: withRefund('Given back, and a letter says so.') });

export const changeVisitAction = action({ requires: 'booking', input: changeInput, run: changeVisit, after: withRefund('Changed, and a letter says so.') });

export const confirmEmailAction = action({ requires: 'booking', input: bookingInput, run: confirmEmail, after: look });

export const makeFeedAction = action({
  requires: 'booking',
  input: bookingInput,
  run: makeFeed,
  after: (secret) => {
    look();
    return { status: 'done', message: 'Give this address to your calendar. It is shown this once.', fact: { address: siteUrl(`/api/calendar/${secret}`) } };
  },
});

export const revokeFeedAction = action({ requires: 'booking', input: bookingInput, run: revokeFeed, after: look });
