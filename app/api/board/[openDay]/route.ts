import { z } from 'zod';
import { idField } from '@/lib/core/ids';
import { Refusal } from '@/lib/core/refusal';
import { findPlacesLeft } from '@/lib/opendays/queries';
import { route } from '@/lib/web/route';

const openDayId = z.union([idField<'openDay'>(), z.unknown().transform(() => null)]);

/** Places left of one open day, at most a second old. */
export const GET = route({
  name: '/api/board/[openDay]',
  requires: 'anyone',
  keepMs: 1000,
  run: async ({ ctx, params }) => {
    const id = openDayId.parse(params['openDay']);
    const places = id && (await findPlacesLeft(ctx, id));
    if (!places) throw new Refusal('not_found');
    return places;
  },
});
