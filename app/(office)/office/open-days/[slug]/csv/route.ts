import { csvFile } from '@/lib/web/csv-file';
import { Refusal } from '@/lib/core/refusal';
import { wallTime } from '@/lib/core/time';
import { findOfficeDay, officeTimes } from '@/lib/opendays/office-queries';
import { toOfficeStops } from '@/lib/opendays/office-views';
import { route } from '@/lib/web/route';

const HEAD = ['Stop', 'Garden', 'Day', 'Start', 'In until', 'Places', 'Taken', 'Kept, not confirmed', 'Set aside', 'People expected', 'Closed'];

export const GET = route({
  name: '/office/open-days/[slug]/csv',
  requires: 'openDays.see',
  run: async ({ ctx, params }) => {
    const day = await findOfficeDay(ctx, params['slug'] ?? '');
    if (!day) throw new Refusal('not_found');
    const { timeZone } = ctx.club;
    const rows = toOfficeStops(await officeTimes(ctx, day.id)).flatMap((stop) => stop.times.map((time) => [
      stop.number, stop.garden, day.heldOn, wallTime(time.opensAt, timeZone), wallTime(time.graceUntil, timeZone), time.capacity, time.taken, time.held, time.walkUps, time.people, time.closedAt === null ? '' : 'closed',
    ]));
    return csvFile(`${day.slug}-entry-times.csv`, HEAD, rows);
  },
});
