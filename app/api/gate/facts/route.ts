import { recordFacts } from '@/lib/gate/commands';
import { recordFactsInput } from '@/lib/gate/schema';
import { route } from '@/lib/web/route';

export const POST = route({ name: '/api/gate/facts', requires: 'gate', input: recordFactsInput, maxBytes: 256 * 1024, run: ({ ctx, input }) => recordFacts(ctx, input) });
