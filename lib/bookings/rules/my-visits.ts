import type { Day } from '@/lib/core/time';

type Visit = { code: string; day: string; heldOn: Day; givenBackAt: Date | null; isToCome: boolean };

/** One booking of a household with its visits, in their order. */
export type MyBooking<V extends Visit> = { code: string; day: string; heldOn: Day; visits: V[] };

/** A household's bookings, parted into those with a visit still to come and the rest; their order is the visits'. */
export function myBookings<V extends Visit>(visits: readonly V[]): { coming: MyBooking<V>[]; before: MyBooking<V>[] } {
  const bookings = new Map<string, MyBooking<V>>();
  for (const visit of visits) {
    const booking = bookings.get(visit.code) ?? { code: visit.code, day: visit.day, heldOn: visit.heldOn, visits: [] };
    booking.visits.push(visit);
    bookings.set(visit.code, booking);
  }
  const all = [...bookings.values()];
  const isComing = (booking: MyBooking<V>) => booking.visits.some((visit) => visit.isToCome && visit.givenBackAt === null);
  return { coming: all.filter(isComing), before: all.filter((booking) => !isComing(booking)) };
}
