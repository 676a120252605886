import { z } from 'zod';
import { idField, type Id } from '@/lib/core/ids';
import { Refusal } from '@/lib/core/refusal';
import { findPlacesLeft } from '@/lib/opendays/queries';
import type { PlacesLeft } from '@/lib/opendays/views';
import { route } from '@/lib/web/route';

const openDayId = z.union([idField<'openDay'>(), z.unknown().transform(() => null)]);

/** One answer a process and second: a hundred phones that ask at once are one query. */
const KEPT_MS = 1000;
type Kept = { until: number; answer: Promise<PlacesLeft | null> };
const kept = new Map<Id<'openDay'>, Kept>();

function placesOnce(id: Id<'openDay'>, now: Date, ask: () => Promise<PlacesLeft | null>): Promise<PlacesLeft | null> {
  const known = kept.get(id);
  if (known && now.getTime() < known.until && now.getTime() >= known.until - KEPT_MS) return known.answer;
  const answer = ask();
  answer.catch(() => kept.delete(id)); // a failure is not an answer: the next one asks again
  if (kept.size > 50) kept.clear(); // a club has a few open days; anything else is someone guessing
  kept.set(id, { until: now.getTime() + KEPT_MS, answer });
  return answer;
}

export const GET = route({
  name: '/api/board/[openDay]',
  requires: 'anyone',
  run: async ({ ctx, params }) => {
    const id = openDayId.parse(params['openDay']);
    const places = id && (await placesOnce(id, ctx.now, () => findPlacesLeft(ctx, id)));
    if (!places) throw new Refusal('not_found');
    return places;
  },
});
