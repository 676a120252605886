'use server';
import { refresh } from 'next/cache';
import { saveContact } from '@/lib/people/household';
import { contactInput } from '@/lib/people/schema';
import { action } from '@/lib/web/action';

export const saveContactAction = action({
  requires: 'member',
  input: contactInput,
  run: saveContact,
  after: () => {
    refresh();
    return { status: 'done', message: 'Kept.' };
  },
});
