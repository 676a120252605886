'use server';
import { refresh } from 'next/cache';
import { moveVisit } from '@/lib/bookings/commands/change';
import { giveBackForParty } from '@/lib/bookings/commands/give-back';
import { giveBackForPartyInput, moveVisitInput } from '@/lib/bookings/schema';
import { formatMoney } from '@/lib/core/money';
import { action } from '@/lib/web/action';

export const moveVisitAction = action({
  requires: 'bookings.edit',
  input: moveVisitInput,
  run: moveVisit,
  after: () => {
    refresh();
    return { status: 'done', message: 'Moved, and the party is written to.' };
  },
});

export const giveBackForPartyAction = action({
  requires: 'bookings.edit',
  input: giveBackForPartyInput,
  run: giveBackForParty,
  after: ({ refundMinor }, { club }) => {
    refresh();
    const money = refundMinor === 0 ? 'No money goes back.' : `${formatMoney({ amountMinor: refundMinor, currency: club.currency }, club.locale)} goes back.`;
    return { status: 'done', message: `The places are given back, and the party is written to. ${money}` };
  },
});
