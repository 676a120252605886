import { findBookingByFeed } from '@/lib/bookings/access';
import { showCalendar } from '@/lib/bookings/commands/show-booking';
import { Refusal } from '@/lib/core/refusal';
import { hashSecret } from '@/lib/infra/secrets';
import { route } from '@/lib/web/route';

/** A booking's private calendar feed: the secret in the address is the permission, and it can be taken back. */
export const GET = route({
  name: '/api/calendar/[secret]',
  requires: 'machine',
  run: async ({ ctx, params }) => {
    const bookingId = await findBookingByFeed(ctx.db, hashSecret(params['secret'] ?? ''), ctx.now);
    if (bookingId === null) throw new Refusal('not_found');
    return new Response(await showCalendar(ctx, bookingId, 'feed'), {
      headers: { 'Content-Type': 'text/calendar; charset=utf-8', 'Cache-Control': 'private, no-store', 'X-Robots-Tag': 'noindex' },
    });
  },
});
