import type { Metadata } from 'next';
import { Bill } from '@/components/layout/bill';
import { CsvLink } from '@/components/office/csv-link';
import { InviteOfficerForm, TakeRoleForm } from '@/components/office/role-forms';
import { Table } from '@/components/ui/table';
import { When } from '@/components/ui/when';
import { counted } from '@/lib/opendays/rules/words';
import { rolesNow } from '@/lib/people/officer-queries';
import { pageContext } from '@/lib/web/context';
import { OfficePage } from '../office-page';
import { inviteOfficerAction, takeRoleAction } from './actions';

export const metadata: Metadata = { title: 'People and roles', robots: { index: false } };

export default async function RolesPage() {
  const ctx = await pageContext('roles.edit');
  const rows = await rolesNow(ctx);
  return (
    <OfficePage ctx={ctx} here="/office/people" bill={<Bill name="People and roles" line="Who may do what; every giving and taking is in the audit trail" sums={`${counted(rows.length, 'role is', 'roles are')} held.`} />}>
      <h2>Roles held</h2>
      <Table
        caption="Roles held now"
        rows={rows}
        rowKey={(row) => `${row.accountId} ${row.role}`}
        empty="Nobody holds a role."
        columns={[
          { key: 'name', head: 'Who', names: 'row', cell: (row) => row.name },
          { key: 'email', head: 'Signs in as', cell: (row) => row.email },
          { key: 'role', head: 'Role', cell: (row) => row.role },
          { key: 'since', head: 'Since', cell: (row) => <When at={row.givenAt} show="day" style="short" club={ctx.club} /> },
          { key: 'take', head: 'Take back', cell: (row) => <TakeRoleForm action={takeRoleAction} accountId={row.accountId} role={row.role} name={row.name} /> },
        ]}
      />
      <p className="mt-4"><CsvLink href="/office/people/csv" what="this list" /></p>
      <section aria-labelledby="give" className="mt-9 border-t border-rule pt-5">
        <h2 id="give" className="mb-3">Give a role</h2>
        <InviteOfficerForm action={inviteOfficerAction} />
      </section>
    </OfficePage>
  );
}
