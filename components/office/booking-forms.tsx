'use client';

import { ActionForm } from '@/components/forms/action-form';
import { Checkbox } from '@/components/ui/checkbox';
import { Input } from '@/components/ui/input';
import { Select, type Choice } from '@/components/ui/select';
import type { FormAction } from '@/lib/core/form-state';
import { giveBackForPartyInput, moveVisitInput } from '@/lib/bookings/schema';
import { Row } from './row';

type Visit = { id: string; version: number; adults: number; children: number; babes: number };

/** Moves a party's visit to another entry time of the day. */
export function MoveVisitForm({ action, visit, choices }: { action: FormAction; visit: Visit; choices: readonly Choice[] }) {
  return (
    <ActionForm action={action} schema={moveVisitInput} submit="Move the visit, and write to the party" tone="plain">
      <Facts visit={visit} />
      <Select name="entryTimeId" label="To" choices={choices} />
      <Input name="reason" label="Why, for the letter" required />
      <Checkbox name="insists" label="Even if the party cannot reach all its times" />
    </ActionForm>
  );
}

/** Gives people of a visit back for the party. */
export function GiveBackForPartyForm({ action, visit }: { action: FormAction; visit: Visit }) {
  return (
    <ActionForm action={action} schema={giveBackForPartyInput} submit="Give these places back, and write to the party" tone="danger">
      <Facts visit={visit} />
      <Row>
        <People name="adults" word="Adults" of={visit.adults} />
        {visit.children === 0 ? null : <People name="children" word="Children" of={visit.children} />}
        {visit.babes === 0 ? null : <People name="babes" word="Babes in arms" of={visit.babes} />}
      </Row>
      <Input name="refundPercent" label="Percent that comes back" hint="Empty: the club’s rule above. 100 when the club is at fault." inputMode="numeric" width="heads" />
      <Input name="reason" label="Why, for the letter" required />
    </ActionForm>
  );
}

function Facts({ visit }: { visit: Visit }) {
  return (
    <>
      <input type="hidden" name="visitId" value={visit.id} />
      <input type="hidden" name="version" value={visit.version} />
    </>
  );
}

function People({ name, word, of }: { name: string; word: string; of: number }) {
  return <Input name={name} label={`${word} not coming, of ${of}`} inputMode="numeric" defaultValue={String(of)} width="heads" />;
}
