import type { Metadata } from 'next';
import { Bill } from '@/components/layout/bill';
import { BookingTable } from '@/components/office/booking-table';
import { CsvLink } from '@/components/office/csv-link';
import { DayFilter } from '@/components/office/day-filter';
import { FindForm } from '@/components/office/find-form';
import { Pages } from '@/components/office/pages';
import { RailRule } from '@/components/ui/rail-rule';
import { bookingLines, daysWithBookings } from '@/lib/bookings/office-queries';
import { bookingsInput } from '@/lib/opendays/schema';
import { counted } from '@/lib/opendays/rules/words';
import { pageContext } from '@/lib/web/context';
import { OfficePage } from '../office-page';

export const metadata: Metadata = { title: 'Bookings', robots: { index: false } };

const PATH = '/office/bookings';

export default async function OfficeBookingsPage({ searchParams }: { searchParams: Promise<Record<string, string | string[] | undefined>> }) {
  const ctx = await pageContext('bookings.see');
  const asked = bookingsInput.parse(await searchParams);
  const [{ lines, total }, days] = [await bookingLines(ctx, asked), await daysWithBookings(ctx)];
  const keep: Record<string, string> = asked.day === '' ? {} : { day: asked.day };
  const shown = days.find((day) => day.slug === asked.day);
  return (
    <OfficePage
      ctx={ctx}
      here={PATH}
      bill={<Bill name="Bookings" line={shown === undefined ? 'Every party of every open day' : `${shown.title}, every party`} sums={`${total === 0 ? 'No bookings' : counted(total, 'booking', 'bookings')}${asked.find === '' ? '' : ` for “${asked.find}”`}.`} {...(total === 0 && asked.find === '' ? { rail: <RailRule state="empty" /> } : {})} />}
    >
      <h2>Parties</h2>
      <DayFilter days={days.map(({ slug, title, heldOn }) => ({ slug, title, year: heldOn.slice(0, 4) }))} shown={asked.day} path={PATH} />
      <FindForm path={PATH} label="Name, code or e-mail" find={asked.find} submit="Find the party" keep={keep} />
      <BookingTable lines={lines} asked={asked} path={PATH} keep={keep} club={ctx.club} />
      <Pages path={PATH} listing={asked} what="bookings" shown={lines.length} total={total} keep={keep} />
      <p className="mt-4"><CsvLink href={`${PATH}/csv?${new URLSearchParams({ ...keep, find: asked.find, sort: asked.sort, order: asked.order })}`} what="these bookings" /></p>
    </OfficePage>
  );
}
