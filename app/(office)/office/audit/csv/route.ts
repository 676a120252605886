import { auditInput } from '@/lib/club/schema';
import { auditPage } from '@/lib/club/audit-queries';
import { changeSentence } from '@/lib/club/rules/change-sentence';
import { csvFile } from '@/lib/web/csv-file';
import { route } from '@/lib/web/route';

const HEAD = ['When', 'Who', 'What', 'On', 'Which', 'Before and after'];

export const GET = route({
  name: '/office/audit/csv',
  requires: 'audit.see',
  input: auditInput,
  run: async ({ ctx, input }) => {
    const { rows } = await auditPage(ctx, input, 'all');
    return csvFile('audit-trail.csv', HEAD, rows.map((row) => [row.at.toISOString(), row.email ?? row.actorKind, row.action, row.subjectKind, row.subjectId, changeSentence(row.before, row.after, ctx.club)]));
  },
});
