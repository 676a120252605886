import { decimalText, minorDigits } from '@/lib/core/money';
import { officeOpenDays } from '@/lib/opendays/office-queries';
import { csvFile } from '@/lib/web/csv-file';
import { route } from '@/lib/web/route';

const HEAD = ['Open day', 'Held on', 'Published', 'Called off', 'Stops', 'Places', 'Taken', 'Came in', 'Currency'];

export const GET = route({
  name: '/office/open-days/csv',
  requires: 'openDays.see',
  run: async ({ ctx }) => {
    const { currency } = ctx.club;
    const rows = (await officeOpenDays(ctx)).map((day) => [
      day.title, day.heldOn, day.publishedAt === null ? 'no' : 'yes', day.calledOffAt === null ? 'no' : 'yes', day.stops, day.capacity, day.taken, decimalText(day.cameInMinor, minorDigits(currency)), currency,
    ]);
    return csvFile('open-days.csv', HEAD, rows);
  },
});
