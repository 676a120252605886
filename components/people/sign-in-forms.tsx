'use client';

import { ActionForm } from '@/components/forms/action-form';
import { Input } from '@/components/ui/input';
import type { FormAction } from '@/lib/core/form-state';
import { askForCodeInput, newPasswordInput, signInCodeInput, signInPasswordInput } from '@/lib/people/schema';

/** Asks for a letter with a code and a link. */
export function AskForCodeForm({ action }: { action: FormAction }) {
  return (
    <ActionForm action={action} schema={askForCodeInput} submit="Write me a code" sending="Writing the letter.">
      <Input name="email" label="E-mail" type="email" autoComplete="email" required />
    </ActionForm>
  );
}

/** Takes the code from the letter. */
export function SignInCodeForm({ action, email }: { action: FormAction; email: string }) {
  return (
    <ActionForm action={action} schema={signInCodeInput} submit="Sign in" values={{ email }}>
      <Input name="email" label="E-mail" type="email" autoComplete="email" required defaultValue={email} />
      <Input name="code" label="The code in the letter" hint="Six figures. It is good for 15 minutes." inputMode="numeric" autoComplete="one-time-code" required />
    </ActionForm>
  );
}

/** For those who chose a password. */
export function SignInPasswordForm({ action }: { action: FormAction }) {
  return (
    <ActionForm action={action} schema={signInPasswordInput} submit="Sign in with a password" tone="plain">
      <Input name="email" label="E-mail" type="email" autoComplete="username" required />
      <Input name="password" label="Password" type="password" autoComplete="current-password" required />
    </ActionForm>
  );
}

/** One press that uses a letter's link up; the page alone does not. */
export function SignInLinkForm({ action, secret }: { action: FormAction; secret: string }) {
  return (
    <ActionForm action={action} submit="Sign in here">
      <input type="hidden" name="secret" value={secret} />
    </ActionForm>
  );
}

/** Sets or replaces a password. */
export function NewPasswordForm({ action, has }: { action: FormAction; has: 'password' | 'none' }) {
  return (
    <ActionForm action={action} schema={newPasswordInput} submit={has === 'password' ? 'Change the password' : 'Set a password'} tone="plain" whenDone="clear">
      <Input name="password" label="New password" hint="At least 15 characters; four words are good. Spaces and any letters count." type="password" autoComplete="new-password" required />
    </ActionForm>
  );
}

/** A form that is only its button. */
export function PressForm({ action, submit, tone = 'bare', size = 'usual' }: { action: FormAction; submit: string; tone?: 'bare' | 'plain' | 'danger'; size?: 'usual' | 'small' }) {
  return <ActionForm action={action} submit={submit} tone={tone} size={size} />;
}
