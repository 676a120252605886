import { addMinutes, instantOf } from '@/lib/core/time';
import type { MinutesFact } from '@/lib/opendays/rules/reach';
import { type SeedCalendar, ZONE } from './calendar';
import type { SeedDay, SeedStop } from './days';
import { fillUp, headsOf, Seats, seat, seatParties, type People, type SeedBooking } from './parties';
import type { Member } from './members';

type Days = { past: SeedDay; next: SeedDay; later: SeedDay };

/** The entry times of the coming day that are nearly full, and the one that is full: stop, start, places left. */
const NEARLY_FULL = [[1, '12:15', 3], [2, '11:30', 2], [3, '12:15', 0], [4, '13:00', 1], [5, '12:15', 4], [5, '13:00', 2], [6, '13:00', 4], [7, '13:45', 3]] as const;

const stopOf = (day: SeedDay, number: number): SeedStop => {
  const stop = day.stops.find((each) => each.number === number);
  if (!stop) throw new Error(`the day has no stop ${number}`);
  return stop;
};

/** Stops and starts as a way round: "3 at 11:30". */
function wayOf(day: SeedDay, told: readonly (readonly [number: number, start: string])[]) {
  return told.map(([number, start]) => {
    const stop = stopOf(day, number);
    const time = stop.times.find(({ opensAt }) => opensAt.getTime() === instantOf(day.heldOn, start, ZONE).getTime());
    if (!time) throw new Error(`stop ${number} has no entry at ${start}`);
    return { stop, time };
  });
}

/** Every booking of the three days, and how many heads lie on each entry time. */
export function seatEveryone(days: Days, roll: readonly Member[], minutes: readonly MinutesFact[], { now }: SeedCalendar): { bookings: SeedBooking[]; takenAt: ReadonlyMap<string, number> } {
  const seats = new Seats();
  const member = (number: number): Member => {
    const found = roll.find((each) => each.number === number);
    if (!found) throw new Error(`nobody has number ${number}`);
    return found;
  };
  const seating = (day: SeedDay) => ({ day, seats, roll, minutes, now });
  const family: People = { adults: 2, children: 2, babes: 0 };
  const named = [
    seat(seating(days.past), 'Ben', member(2), family, wayOf(days.past, [[1, '10:00'], [2, '11:00']])),
    seat(seating(days.next), 'Ben', member(2), { ...family, children: 1 }, wayOf(days.next, [[1, '10:00'], [3, '11:30'], [5, '13:45']])),
    seat(seating(days.next), 'Ada', member(1), { adults: 2, children: 1, babes: 0 }, wayOf(days.next, [[6, '10:45'], [4, '14:30']])),
  ];
  const strollers = [...seatParties(seating(days.past), 58), ...seatParties(seating(days.next), 56), ...seatParties(seating(days.later), 15)];
  const kept = [...named, ...strollers].map((booking) => givingBack(booking, seats, now)); // before the filling up, or the full time would not be
  const filling = NEARLY_FULL.flatMap(([number, start, leave]) => fillUp(seating(days.next), number, instantOf(days.next.heldOn, start, ZONE), leave));
  return { bookings: [...kept, ...filling], takenAt: seats.taken };
}

/** Two parties gave places back: one of the coming day all of them, one of the past day its last garden. */
function givingBack(booking: SeedBooking, seats: Seats, now: Date): SeedBooking {
  const giveBack = (at: Date, which: (index: number) => boolean) => booking.visits.map((visit, i) => {
    if (!which(i)) return visit;
    seats.giveBack(visit.time, headsOf(booking.people));
    return { ...visit, givenBackAt: at };
  });
  if (booking.name === 'next party 6') {
    const at = addMinutes(booking.confirmedAt, 40) < now ? addMinutes(booking.confirmedAt, 40) : now;
    return { ...booking, cancelledAt: at, visits: giveBack(at, () => true) };
  }
  if (booking.name === 'past party 4' && booking.visits.length > 1) return { ...booking, visits: giveBack(addMinutes(booking.day.opensAt, -60 * 50), (i) => i === booking.visits.length - 1) };
  return booking;
}
