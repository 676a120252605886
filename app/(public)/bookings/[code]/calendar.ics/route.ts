import { showCalendar } from '@/lib/bookings/commands/show-booking';
import { route } from '@/lib/web/route';

/** All visits of a booking as one calendar file to keep. */
export const GET = route({
  name: '/bookings/[code]/calendar.ics',
  requires: 'booking',
  run: async ({ ctx }) => new Response(await showCalendar(ctx, ctx.actor.bookingId, 'booking'), {
    headers: { 'Content-Type': 'text/calendar; charset=utf-8', 'Content-Disposition': 'attachment; filename="visits.ics"', 'Cache-Control': 'private, no-store', 'X-Robots-Tag': 'noindex' },
  }),
});
