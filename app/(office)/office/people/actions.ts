'use server';
import { refresh } from 'next/cache';
import { inviteOfficer, takeRole } from '@/lib/people/commands/roles';
import { inviteOfficerInput, takeRoleInput } from '@/lib/people/schema';
import { action } from '@/lib/web/action';

export const inviteOfficerAction = action({
  requires: 'roles.edit',
  input: inviteOfficerInput,
  run: inviteOfficer,
  after: () => {
    refresh();
    return { status: 'done', message: 'The role is given and a letter is on its way.' };
  },
});

export const takeRoleAction = action({
  requires: 'roles.edit',
  input: takeRoleInput,
  run: takeRole,
  after: () => {
    refresh();
    return { status: 'done', message: 'The role is taken back.' };
  },
});
