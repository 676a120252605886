import type { Id } from '@/lib/core/ids';
import { addMinutes } from '@/lib/core/time';
import { minutesFor, minutesTable, type MinutesFact } from '@/lib/opendays/rules/reach';
import { drawSpokenCode } from '@/lib/bookings/rules/spoken-code';
import type { SeedDay, SeedStop, SeedTime } from './days';
import { gardenId } from './garden-rows';
import { diceFor, type Dice, seedId } from './ids';
import type { Member } from './members';
import { VISITORS } from './visitors';

export type People = { adults: number; children: number; babes: number };
export type SeedVisit = { id: Id<'visit'>; stop: SeedStop; time: SeedTime; givenBackAt: Date | null };
/** One party's confirmed booking. */
export type SeedBooking = {
  id: Id<'booking'>; name: string; day: SeedDay; code: string; member: Member | null; contact: { name: string; email: string; phone: string | null }; people: People; visits: SeedVisit[];
  madeAt: Date; confirmedAt: Date; emailConfirmedAt: Date | null; totalMinor: number; cancelledAt: Date | null;
};

export const headsOf = ({ adults, children }: People): number => adults + children; // babes in arms take no place in this club
export const costMinor = ({ adults, children, babes }: People, { prices }: SeedStop): number => adults * prices.adultMinor + children * prices.childMinor + babes * prices.babeMinor;

/** Keeps count of the places while parties are seated, so that nothing is ever oversold. */
export class Seats {
  readonly taken = new Map<string, number>();
  private readonly codes = new Set<string>();

  left({ id, capacity, walkUps }: SeedTime): number {
    return capacity - walkUps - (this.taken.get(id) ?? 0);
  }

  take(time: SeedTime, heads: number): void {
    if (heads > this.left(time)) throw new Error('the seed would oversell an entry time');
    this.taken.set(time.id, (this.taken.get(time.id) ?? 0) + heads);
  }

  giveBack(time: SeedTime, heads: number): void {
    this.taken.set(time.id, (this.taken.get(time.id) ?? 0) - heads);
  }

  newCode(dice: Dice): string {
    for (;;) {
      const code = drawSpokenCode(dice.bytes);
      if (!this.codes.has(code)) {
        this.codes.add(code);
        return code;
      }
    }
  }
}

function peopleFrom(dice: Dice): People {
  const children = dice.next() < 0.5 ? 0 : 1 + dice.whole(3);
  return { adults: dice.next() < 0.25 && children < 2 ? 1 : 2 + dice.whole(2), children, babes: dice.next() < 0.08 ? 1 : 0 };
}

/** A way round some gardens that the party can make: each start at or after the last one's stay and the drive. */
function wayRound(day: SeedDay, seats: Seats, heads: number, minutes: readonly MinutesFact[], dice: Dice): { stop: SeedStop; time: SeedTime }[] {
  const table = minutesTable(day.stops.map(({ slug }) => gardenId(slug)), minutes);
  const wanted = dice.pick([1, 2, 2, 2, 3, 3, 4]);
  const order = [...day.stops].map((stop) => ({ stop, at: dice.next() })).sort((a, b) => a.at - b.at).map(({ stop }) => stop);
  const firstStart = dice.whole(4);
  return order.reduce<{ stop: SeedStop; time: SeedTime }[]>((way, stop) => {
    if (way.length === wanted) return way;
    const last = way.at(-1);
    const ready = last ? addMinutes(last.time.opensAt, last.stop.stayMinutes + minutesFor(table, day.stops.indexOf(last.stop), day.stops.indexOf(stop))) : stop.times[firstStart]?.opensAt;
    const keepBack = 1 + dice.whole(6); // strollers fill no entry time
    const time = ready && stop.times.find((each) => each.opensAt >= ready && seats.left(each) >= heads + keepBack);
    return time ? [...way, { stop, time }] : way;
  }, []);
}

type Seating = { day: SeedDay; seats: Seats; roll: readonly Member[]; minutes: readonly MinutesFact[]; now: Date };

/** Between when and when parties of this day booked. */
function bookedBetween({ day, now }: Seating): { from: Date; minutes: number } {
  const until = day.key === 'past' ? addMinutes(day.opensAt, -3 * 1440) : addMinutes(now, -120);
  const first = addMinutes(day.publishedAt < now ? day.publishedAt : now, 60);
  const from = Math.max(first.getTime(), addMinutes(until, -25 * 1440).getTime());
  return { from: new Date(from), minutes: Math.max(1, (until.getTime() - from) / 60_000) };
}

/** Seats one party at the given times. */
export function seat(seating: Seating, name: string, who: Member | string, people: People, way: readonly { stop: SeedStop; time: SeedTime }[]): SeedBooking {
  const { day, seats } = seating;
  const dice = diceFor(`booking ${day.key} ${name}`);
  const member = typeof who === 'string' ? null : who;
  const between = bookedBetween(seating);
  const madeAt = addMinutes(between.from, Math.floor(dice.next() * between.minutes));
  for (const { time } of way) seats.take(time, headsOf(people));
  const contact = typeof who === 'string'
    ? { name: who, email: `${who.toLowerCase().replace(/[^a-z]+/g, '.')}@post.example`, phone: dice.next() < 0.4 ? `555-01${String(10 + dice.whole(89))}` : null }
    : { ...who.contact, phone: null };
  return {
    id: seedId<'booking'>(`booking ${day.key} ${name}`), name: `${day.key} ${name}`, day, code: seats.newCode(dice), member, contact, people, madeAt, cancelledAt: null,
    visits: way.map(({ stop, time }) => ({ id: seedId<'visit'>(`visit ${day.key} ${name} ${stop.number}`), stop, time, givenBackAt: null })),
    confirmedAt: addMinutes(madeAt, 4 + dice.whole(5)), emailConfirmedAt: member || dice.next() < 0.7 ? addMinutes(madeAt, 12 + dice.whole(30)) : null,
    totalMinor: way.reduce((sum, { stop }) => sum + costMinor(people, stop), 0),
  };
}

/** Parties that go round as they please: some members, some visitors. */
export function seatParties(seating: Seating, count: number): SeedBooking[] {
  const dice = diceFor(`parties ${seating.day.key}`);
  const paidUp = seating.roll.filter(({ standing, number }) => (standing === 'paid' || standing === 'ahead' || standing === 'life') && number > 2);
  return Array.from({ length: count }, (_, i) => i).flatMap((i) => {
    const people = peopleFrom(dice);
    const way = wayRound(seating.day, seating.seats, headsOf(people), seating.minutes, dice);
    const who = dice.next() < 0.35 ? paidUp[(i * 7) % paidUp.length] : VISITORS[i % VISITORS.length];
    return way.length === 0 || who === undefined ? [] : [seat(seating, `party ${i}`, who, people, way)];
  });
}

/** Fills one entry time with small parties until only `leave` places are left. */
export function fillUp(seating: Seating, stopNumber: number, start: Date, leave: number): SeedBooking[] {
  const stop = seating.day.stops.find(({ number }) => number === stopNumber);
  const time = stop?.times.find(({ opensAt }) => opensAt.getTime() === start.getTime());
  if (!stop || !time) throw new Error(`stop ${stopNumber} has no such entry time`);
  const filled: SeedBooking[] = [];
  for (let short = seating.seats.left(time) - leave; short > 0; short = seating.seats.left(time) - leave) {
    const heads = short === 5 ? 3 : Math.min(short, 4);
    const people = { adults: Math.min(2, heads), children: heads - Math.min(2, heads), babes: 0 };
    const who = VISITORS[(stopNumber * 11 + filled.length * 5 + start.getUTCMinutes()) % VISITORS.length] ?? VISITORS[0];
    filled.push(seat(seating, `filling ${stopNumber} ${start.toISOString()} ${filled.length}`, who, people, [{ stop, time }]));
  }
  return filled;
}
