'use client';

import { ActionForm } from '@/components/forms/action-form';
import { Input } from '@/components/ui/input';
import { Select } from '@/components/ui/select';
import type { FormAction } from '@/lib/core/form-state';
import { ROLES, type Role } from '@/lib/core/words';
import { inviteOfficerInput } from '@/lib/people/schema';

/** Gives a role to someone by address; they get a letter. */
export function InviteOfficerForm({ action }: { action: FormAction }) {
  return (
    <ActionForm action={action} schema={inviteOfficerInput} submit="Give the role and write to them" whenDone="clear">
      <Input name="name" label="Name" autoComplete="off" required />
      <Input name="email" label="E-mail" type="email" autoComplete="off" required hint="An officer’s role needs an address of its own." />
      <Select name="role" label="Role" choices={ROLES.map((role) => ({ value: role, label: role }))} />
    </ActionForm>
  );
}

/** Takes one role from one account. */
export function TakeRoleForm({ action, accountId, role, name }: { action: FormAction; accountId: string; role: Role; name: string }) {
  return (
    <ActionForm action={action} submit={`Take the role from ${name}`} tone="bare">
      <input type="hidden" name="accountId" value={accountId} />
      <input type="hidden" name="role" value={role} />
    </ActionForm>
  );
}
