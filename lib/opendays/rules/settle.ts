import type { Day } from '@/lib/core/time';
import { counted } from './words';

type Time = { capacity: number; taken: number; people: number; closedAt: Date | null; opensAt: Date };
type Stop = { number: number; garden: string; times: readonly Time[] };
type OpenDay = { slug: string; heldOn: Day; closesAt: Date; publishedAt: Date | null; calledOffAt: Date | null; lettersFailing: number };

/** One thing that waits for the coordinator: by which day (null: now), what is so, and where it is settled. */
export type Waiting = { id: string; by: Day | null; sentence: string; href: string; label: string };

/** From this share of its places on an entry time counts as nearly full: a party of two still fits, a larger one hardly. */
const NEARLY_FULL = 0.9;

/** What waits on an open day, the most pressing first: only what is really so, and nothing once the day is over but letters. */
export function toSettle(day: OpenDay, stops: readonly Stop[], now: Date): Waiting[] {
  const path = `/office/open-days/${day.slug}`;
  const letters: Waiting[] = day.lettersFailing === 0 ? [] : [{
    id: 'letters', by: null, sentence: `${counted(day.lettersFailing, 'letter has', 'letters have')} not been delivered yet`, href: '/office/letters?state=failing', label: 'See which',
  }];
  if (day.calledOffAt !== null || day.closesAt <= now) return letters;
  const published: Waiting[] = day.publishedAt !== null ? [] : [{
    id: 'published', by: day.heldOn, sentence: 'The day is not published: nobody can see it or book', href: `${path}/plan#publish`, label: 'Publish it',
  }];
  const gardens: Waiting[] = stops.length > 0 ? [] : [{ id: 'stops', by: day.heldOn, sentence: 'No garden takes part yet', href: `${path}/plan#add`, label: 'Add the first' }];
  return [...letters, ...published, ...gardens, ...stops.flatMap((stop) => ofStop(stop, path, day.heldOn, now))];
}

function ofStop({ number, garden, times }: Stop, path: string, heldOn: Day, now: Date): Waiting[] {
  const href = `${path}/stops/${number}`;
  if (times.length === 0) return [{ id: `times-${number}`, by: heldOn, sentence: `${garden} has no entry times`, href, label: 'Make them' }];
  const open = times.filter((time) => time.closedAt === null && time.opensAt > now);
  const nearly = open.filter((time) => time.capacity > 0 && time.taken >= time.capacity * NEARLY_FULL);
  const closed = times.filter((time) => time.closedAt !== null);
  return [
    ...(nearly.length === 0 ? [] : [{ id: `full-${number}`, by: heldOn, sentence: `${garden}: ${counted(nearly.length, 'entry time is', 'entry times are')} full or nearly so`, href, label: 'Look at its times' }]),
    ...(closed.length === 0 ? [] : [{ id: `closed-${number}`, by: heldOn, sentence: `${garden}: ${counted(closed.length, 'entry time is', 'entry times are')} closed to new parties`, href, label: 'Open or keep closed' }]),
  ];
}
