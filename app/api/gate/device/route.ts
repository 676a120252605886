import { exchangePass } from '@/lib/gate/commands';
import { exchangePassInput } from '@/lib/gate/schema';
import { route } from '@/lib/web/route';

export const POST = route({ name: '/api/gate/device', requires: 'anyone', input: exchangePassInput, maxBytes: 2_000, run: ({ ctx, input }) => exchangePass(ctx, input) });
