'use client';

import Link from 'next/link';
import { ActionForm } from '@/components/forms/action-form';
import { Checkbox } from '@/components/ui/checkbox';
import { Input } from '@/components/ui/input';
import { detailsInput } from '@/lib/bookings/schema';
import type { FormAction, FormState } from '@/lib/core/form-state';
import type { ButtonTone } from '@/components/ui/button-look';

type OneButtonProps = { action: FormAction; bookingId: string; submit: string; sending?: string; tone?: ButtonTone };

/** A form of one button about one hold or booking. */
export function HoldButton({ action, bookingId, submit, sending = 'One moment.', tone = 'plain' }: OneButtonProps) {
  return (
    <ActionForm action={action} submit={submit} sending={sending} tone={tone}>
      <input type="hidden" name="bookingId" value={bookingId} />
    </ActionForm>
  );
}

type DetailsFormProps = {
  action: FormAction;
  bookingId: string;
  typed: { name: string; email: string; phone: string; wantsInvitations: boolean };
  visitRules: string;
  submit: string;
  isPaid: boolean;
};

/* The time ran out while they typed: the page, looked at anew, offers the same places again. */
const lookAgain = ({ code }: FormState) => (code === 'hold_over' ? <p className="mt-2"><Link className="link" href="/hold?look=again">See what can still be kept</Link></p> : null);

/** Who the party is, the visit rules, and the one button that pays or confirms. */
export function DetailsForm({ action, bookingId, typed, visitRules, submit, isPaid }: DetailsFormProps) {
  const values = { name: typed.name, email: typed.email, phone: typed.phone, wantsInvitations: typed.wantsInvitations ? 'on' : '' };
  return (
    <ActionForm action={action} schema={detailsInput} values={values} wayOn={lookAgain} submit={submit} sending={isPaid ? 'Asking the card service for its page.' : 'Writing your places down.'}>
      <input type="hidden" name="bookingId" value={bookingId} />
      <Input name="name" label="Your name" hint="As the gate will ask for it." autoComplete="name" required />
      <Input name="email" label="E-mail" hint="Your tickets go there, and anything that changes." type="email" autoComplete="email" required />
      <Input name="phone" label="Telephone, if you like" hint="Only for the day itself, if something is called off." type="tel" autoComplete="tel" width="half" />
      <div>
        <h3 className="mb-1">Visit rules</h3>
        <p className="whitespace-pre-line">{visitRules}</p>
      </div>
      <Checkbox name="rulesAgreed" label="Everyone in our party will keep to the visit rules" required />
      <Checkbox name="wantsInvitations" label="Send invitations to my calendar" hint="One for each visit; they follow any change by themselves." />
    </ActionForm>
  );
}
