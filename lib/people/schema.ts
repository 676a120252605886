import { z } from 'zod';
import { ROLES } from '@/lib/core/words';
import { emailField, optionalTextField, phoneField, textField } from '@/lib/core/fields';
import { idField } from '@/lib/core/ids';
import { passwordProblem } from './rules/password';

export const askForCodeInput = z.object({ email: emailField });

/** Six digits, with or without a space in the middle. */
export const signInCodeInput = z.object({
  email: emailField,
  code: z.string({ error: 'Type the six figures of the code.' }).transform((text) => text.replace(/[\s-]/g, ''))
    .refine((text) => /^\d{6}$/.test(text), { error: 'The code has six figures. Look at the newest letter.' }),
});

export const signInLinkInput = z.object({ secret: z.string().min(40).max(100) });

export const signInPasswordInput = z.object({ email: emailField, password: z.string({ error: 'Type your password.' }).min(1, { error: 'Type your password.' }).max(1000) });

/** NIST SP 800-63B-4: length and a blocklist, no composition rules; counted in code points after NFKC. */
export const newPasswordInput = z.object({ password: z.string().max(1000) }).transform(({ password }, context) => {
  const plain = password.normalize('NFKC');
  const problem = passwordProblem(plain);
  if (problem !== null) context.addIssue({ code: 'custom', message: problem, path: ['password'] });
  return { password: plain };
});

const roleField = z.enum(ROLES, { error: 'Choose a role.' });

export const inviteOfficerInput = z.object({ name: textField('a name'), email: emailField, role: roleField });
export const giveRoleInput = z.object({ accountId: idField<'account'>(), role: roleField });
export const takeRoleInput = giveRoleInput;

/** An e-mail address that may be left out. */
const optionalEmail = z.union([z.literal('').transform(() => null), emailField]).optional().transform((email) => email ?? null);

export const contactInput = z.object({
  personId: idField<'person'>(),
  email: optionalEmail,
  phone: phoneField,
  street: optionalTextField(120),
  town: optionalTextField(80),
  postcode: optionalTextField(20),
});

export const nothingInput = z.object({});
