import { bookingLines } from '@/lib/bookings/office-queries';
import { showSpokenCode } from '@/lib/bookings/rules/spoken-code';
import { decimalText, minorDigits } from '@/lib/core/money';
import { dayOf } from '@/lib/core/time';
import { bookingsInput } from '@/lib/opendays/schema';
import { csvFile } from '@/lib/web/csv-file';
import { route } from '@/lib/web/route';

const HEAD = ['Party', 'E-mail', 'Telephone', 'Code', 'Open day', 'Held on', 'People', 'Visits', 'Paid', 'Given back', 'Currency', 'Booked on', 'All given back on'];

export const GET = route({
  name: '/office/bookings/csv',
  requires: 'bookings.see',
  input: bookingsInput,
  run: async ({ ctx, input }) => {
    const { lines } = await bookingLines(ctx, input, 'all');
    const { timeZone } = ctx.club;
    const rows = lines.map((line) => {
      const money = (amountMinor: number) => decimalText(amountMinor, minorDigits(line.currency));
      return [
        line.name, line.email, line.phone, showSpokenCode(line.code), line.day, line.heldOn, line.people, line.visits, money(line.paidMinor), money(line.backMinor), line.currency,
        dayOf(line.madeAt, timeZone), line.cancelledAt === null ? null : dayOf(line.cancelledAt, timeZone),
      ];
    });
    return csvFile('bookings.csv', HEAD, rows);
  },
});
