import { decimalText, minorDigits } from '@/lib/core/money';
import { rollLines } from '@/lib/dues/roll-queries';
import { standingSentence } from '@/lib/dues/rules/standing';
import { rollInput } from '@/lib/dues/schema';
import { csvFile } from '@/lib/web/csv-file';
import { route } from '@/lib/web/route';

const HEAD = ['Household', 'Number', 'Class', 'Dues', 'Owed', 'Railway', 'Since'];

export const GET = route({
  name: '/office/roll/csv',
  requires: 'roll.see',
  input: rollInput,
  run: async ({ ctx, input }) => {
    const { lines } = await rollLines(ctx, input, 'all');
    const rows = lines.map((line) => [line.name, line.memberNumber, line.className, standingSentence(line.standing, ctx.club), decimalText(line.owedMinor, minorDigits(ctx.club.currency)), line.railways.join('; '), line.since]);
    return csvFile('roll.csv', HEAD, rows);
  },
});
