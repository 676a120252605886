import { showGatePlace } from '@/lib/gate/queries';
import { route } from '@/lib/web/route';

/** A showing writes itself down, so it is asked for and never fetched along. */
export const POST = route({ name: '/api/gate/place', requires: 'gate', run: ({ ctx }) => showGatePlace(ctx) });
