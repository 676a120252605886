import { gateList } from '@/lib/gate/queries';
import { route } from '@/lib/web/route';

export const GET = route({ name: '/api/gate/list', requires: 'gate', run: ({ ctx }) => gateList(ctx) });
