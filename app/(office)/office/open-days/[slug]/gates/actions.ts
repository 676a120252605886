'use server';
import { refresh } from 'next/cache';
import { env } from '@/lib/infra/env';
import { makeGatePass, revokeGatePass } from '@/lib/gate/commands';
import { makeGatePassInput, revokeGatePassInput } from '@/lib/gate/schema';
import { toPassCard } from '@/lib/gate/views/pass-card';
import { action } from '@/lib/web/action';

export const makeGatePassAction = action({
  requires: 'gates.edit',
  input: makeGatePassInput,
  run: makeGatePass,
  after: (pass) => {
    refresh();
    return { status: 'done', message: `The pass for ${pass.helper} is made.`, fact: toPassCard(pass, env().SITE_URL) };
  },
});

export const revokeGatePassAction = action({
  requires: 'gates.edit',
  input: revokeGatePassInput,
  run: revokeGatePass,
  after: () => {
    refresh();
    return { status: 'done', message: 'The pass is taken back.' };
  },
});
