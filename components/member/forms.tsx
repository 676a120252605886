'use client';

import { ActionForm } from '@/components/forms/action-form';
import { Input } from '@/components/ui/input';
import type { FormAction } from '@/lib/core/form-state';
import { contactInput } from '@/lib/people/schema';

type Contact = { id: string; email: string | null; phone: string | null; street: string | null; town: string | null; postcode: string | null };

/** How one person of a household is reached. */
export function ContactForm({ action, person }: { action: FormAction; person: Contact }) {
  return (
    <ActionForm action={action} schema={contactInput} submit="Keep these" tone="plain">
      <input type="hidden" name="personId" value={person.id} />
      <Input name="email" label="E-mail" type="email" autoComplete="email" defaultValue={person.email ?? ''} />
      <Input name="phone" label="Telephone" type="tel" autoComplete="tel" defaultValue={person.phone ?? ''} />
      <Input name="street" label="Street" autoComplete="street-address" defaultValue={person.street ?? ''} />
      <Input name="town" label="Town" autoComplete="address-level2" defaultValue={person.town ?? ''} />
      <Input name="postcode" label="Postcode" autoComplete="postal-code" defaultValue={person.postcode ?? ''} />
    </ActionForm>
  );
}

/** Pays one term's dues by card. */
export function PayDuesForm({ action, chargeId, submit }: { action: FormAction; chargeId: string; submit: string }) {
  return (
    <ActionForm action={action} submit={submit} sending="Asking the card service.">
      <input type="hidden" name="chargeId" value={chargeId} />
    </ActionForm>
  );
}
