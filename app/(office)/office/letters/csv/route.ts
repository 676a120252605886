import { letterPage } from '@/lib/letters/queries/list';
import { letterListInput } from '@/lib/letters/schema';
import { csvFile } from '@/lib/web/csv-file';
import { route } from '@/lib/web/route';

const HEAD = ['Letter', 'To', 'Subject', 'Written at', 'How it stands', 'Last tried at', 'The server’s words'];

export const GET = route({
  name: '/office/letters/csv',
  requires: 'letters.see',
  input: letterListInput,
  run: async ({ ctx, input }) => {
    const { rows } = await letterPage(ctx, input);
    return csvFile('letters.csv', HEAD, rows.map((row) => [row.kindWords, row.to, row.subject, row.madeAt.toISOString(), row.state, row.triedAt?.toISOString() ?? null, row.detail]));
  },
});
