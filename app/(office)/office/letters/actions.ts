'use server';
import { refresh } from 'next/cache';
import { sendAgain } from '@/lib/letters/commands';
import { sendAgainInput } from '@/lib/letters/schema';
import { action } from '@/lib/web/action';

export const sendAgainAction = action({
  requires: 'letters.send',
  input: sendAgainInput,
  run: sendAgain,
  after: () => {
    refresh();
    return { status: 'done', message: 'It goes again now.' };
  },
});
