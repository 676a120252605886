import { readTicket } from '@/lib/gate/queries';
import { readTicketInput } from '@/lib/gate/schema';
import { route } from '@/lib/web/route';

export const POST = route({ name: '/api/gate/ticket', requires: 'gate', input: readTicketInput, maxBytes: 4_000, run: ({ ctx, input }) => readTicket(ctx, input) });
