'use server';
import { refresh } from 'next/cache';
import { dropPassword, setPassword } from '@/lib/people/commands/password';
import { newPasswordInput, nothingInput } from '@/lib/people/schema';
import { action } from '@/lib/web/action';

export const setPasswordAction = action({
  requires: 'account',
  input: newPasswordInput,
  run: setPassword,
  after: () => {
    refresh();
    return { status: 'done', message: 'The password is set. Codes by letter still work.' };
  },
});

export const dropPasswordAction = action({
  requires: 'account',
  input: nothingInput,
  run: dropPassword,
  after: () => {
    refresh();
    return { status: 'done', message: 'The password is gone. Sign in by letter.' };
  },
});
