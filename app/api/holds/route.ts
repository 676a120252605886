import { holdPlaces } from '@/lib/bookings/commands/hold';
import { holdInput } from '@/lib/bookings/schema';
import { route } from '@/lib/web/route';

/** Keeps places, as the board's form does; which hold it is travels in the cookie. */
export const POST = route({
  name: '/api/holds',
  requires: 'browser',
  input: holdInput,
  maxBytes: 16 * 1024,
  given: 'ground', // holds come in a rush: the club's settings travel with the hold's own facts
  run: async ({ ctx, input }) => {
    await holdPlaces(ctx, input);
    return { next: '/hold' };
  },
});
