import { toCsv } from '@/lib/core/csv';
import { rollLines } from '@/lib/dues/roll-queries';
import { standingSentence } from '@/lib/dues/rules/standing';
import { rollInput } from '@/lib/dues/schema';
import { route } from '@/lib/web/route';

const HEAD = ['Household', 'Number', 'Class', 'Dues', 'Railway', 'Since'];

export const GET = route({
  name: '/office/roll/csv',
  requires: 'roll.see',
  input: rollInput,
  run: async ({ ctx, input }) => {
    const { lines } = await rollLines(ctx, input, 'all');
    const rows = lines.map((line) => [line.name, line.memberNumber, line.className, standingSentence(line.standing, ctx.club), line.railways.join('; '), line.since]);
    return new Response(toCsv(HEAD, rows), { headers: { 'Content-Type': 'text/csv; charset=utf-8', 'Content-Disposition': 'attachment; filename="roll.csv"', 'Cache-Control': 'private, no-store' } });
  },
});
