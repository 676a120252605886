'use client';

import { ActionForm } from '@/components/forms/action-form';
import { Button } from '@/components/ui/button';
import type { ButtonTone } from '@/components/ui/button-look';
import { Input } from '@/components/ui/input';
import { Select } from '@/components/ui/select';
import type { OtherTime } from '@/lib/bookings/views/booking-page';
import { changeInput, giveBackInput } from '@/lib/bookings/schema';
import type { FormAction } from '@/lib/core/form-state';

type VisitFormProps = { action: FormAction; code: string; visitId: string; version: number };

const Which = ({ code, visitId, version }: Omit<VisitFormProps, 'action'>) => (
  <>
    <input type="hidden" name="code" value={code} />
    <input type="hidden" name="visitId" value={visitId} />
    <input type="hidden" name="version" value={version} />
  </>
);

/** How many people are not coming after all. The rule stands above it, before the button. */
export function GiveBackForm({ action, people, ...which }: VisitFormProps & { people: { adults: number; children: number; babes: number } }) {
  return (
    <ActionForm action={action} schema={giveBackInput} submit="Give these places back" tone="danger">
      <Which {...which} />
      <fieldset className="flex flex-wrap gap-x-6 gap-y-3">
        <legend className="mb-2 font-semibold">Who is not coming after all?</legend>
        <Input name="adults" label={`Adults, of ${people.adults}`} width="heads" inputMode="numeric" defaultValue="0" />
        {people.children === 0 ? null : <Input name="children" label={`Children, of ${people.children}`} width="heads" inputMode="numeric" defaultValue="0" />}
        {people.babes === 0 ? null : <Input name="babes" label={`Babes in arms, of ${people.babes}`} width="heads" inputMode="numeric" defaultValue="0" />}
      </fieldset>
    </ActionForm>
  );
}

/** Another entry time for the same people. */
export function ChangeForm({ action, others, ...which }: VisitFormProps & { others: OtherTime[] }) {
  return (
    <ActionForm
      action={action}
      schema={changeInput}
      submit="Change to this time"
      tone="plain"
      wayOn={(state) => (state.code === 'clash' ? <p className="mt-2"><Button type="submit" name="insists" value="on" tone="bare">choose it all the same</Button></p> : null)}
    >
      <Which {...which} />
      <Select name="entryTimeId" label="Another entry time" choices={others.map((other) => ({ value: other.entryTimeId, label: other.label }))} />
    </ActionForm>
  );
}

type BookingButtonProps = { action: FormAction; code: string; submit: string; tone?: ButtonTone };

/** A form of one button about the whole booking. */
export function BookingButton({ action, code, submit, tone = 'plain' }: BookingButtonProps) {
  return (
    <ActionForm action={action} submit={submit} tone={tone} done={(state) => (state.fact?.['address'] === undefined ? null : <code className="figures block break-all">{state.fact['address']}</code>)}>
      <input type="hidden" name="code" value={code} />
    </ActionForm>
  );
}
