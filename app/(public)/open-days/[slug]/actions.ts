'use server';

import { revalidatePath } from 'next/cache';
import { redirect } from 'next/navigation';
import { holdPlaces } from '@/lib/bookings/commands/hold';
import { boardFormInput } from '@/lib/bookings/schema';
import { action } from '@/lib/web/action';

export const holdPlacesAction = action({
  requires: 'browser',
  input: boardFormInput,
  run: holdPlaces,
  after: () => {
    revalidatePath('/open-days/[slug]', 'page'); // whoever comes back finds the places it keeps
    redirect('/hold'); // which hold is meant travels in the cookie, never in the address
  },
});
