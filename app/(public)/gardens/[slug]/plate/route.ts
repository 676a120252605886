import { Refusal } from '@/lib/core/refusal';
import { findGarden } from '@/lib/gardens/queries';
import { plateSvg } from '@/lib/gardens/rules/plate/plate';
import { plateInput } from '@/lib/gardens/schema';
import { toPlateParticulars } from '@/lib/gardens/views';
import { route } from '@/lib/web/route';

const DAY = 24 * 3600;

/** A garden's linocut as a picture of its own. The address names the version, so a browser may keep it for good. */
export const GET = route({
  name: '/gardens/[slug]/plate',
  requires: 'anyone',
  input: plateInput,
  run: async ({ ctx, input, params }) => {
    const garden = await findGarden(ctx, params['slug'] ?? '');
    if (!garden) throw new Refusal('not_found');
    const svg = plateSvg(toPlateParticulars(garden), input.card, garden.railwayName);
    const keep = input.v === undefined ? 3600 : 365 * DAY;
    return new Response(svg, {
      headers: {
        'Content-Type': 'image/svg+xml; charset=utf-8',
        'Cache-Control': `public, max-age=${keep}${input.v === undefined ? '' : ', immutable'}`,
        'Content-Security-Policy': "default-src 'none'; style-src 'unsafe-inline'", // a picture, even when opened by itself
      },
    });
  },
});
