import 'server-only';
import type { Id } from '@/lib/core/ids';
import type { Ctx } from '@/lib/infra/context';
import { toCalendar } from '../compose';
import { siteHost } from '../links';
import { visitsFile } from '../rules/calendar';
import { findBookingForLetter } from './booking-facts';

/**
 * A booking's visits as one plain calendar file, for the download and the private feed: areas before the release,
 * addresses after it for a confirmed e-mail; `shown` are the gardens whose address it says. Null when there is no such booking.
 */
export async function bookingCalendar({ db, club, now }: Pick<Ctx, 'db' | 'club' | 'now'>, bookingId: Id<'booking'>): Promise<{ fileName: string; content: string; shown: Id<'garden'>[] } | null> {
  const booking = await findBookingForLetter(db, bookingId, club, now);
  if (!booking) return null;
  const keep = booking.visits.filter((visit) => !visit.isGivenBack).map((visit) => toCalendar(visit, booking, club));
  const content = visitsFile(keep, { name: club.name, email: club.email, host: siteHost(), timeZone: club.timeZone }, now);
  return { fileName: 'visits.ics', content, shown: booking.shown };
}
