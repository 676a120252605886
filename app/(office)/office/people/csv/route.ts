import { dayOf } from '@/lib/core/time';
import { rolesNow } from '@/lib/people/officer-queries';
import { csvFile } from '@/lib/web/csv-file';
import { route } from '@/lib/web/route';

const HEAD = ['Who', 'Signs in as', 'Role', 'Since'];

export const GET = route({
  name: '/office/people/csv',
  requires: 'roles.edit',
  run: async ({ ctx }) => csvFile('roles.csv', HEAD, (await rolesNow(ctx)).map((row) => [row.name, row.email, row.role, dayOf(row.givenAt, ctx.club.timeZone)])),
});
