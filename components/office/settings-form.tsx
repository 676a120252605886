'use client';

import type { ReactNode } from 'react';
import { ActionForm } from '@/components/forms/action-form';
import { Checkbox } from '@/components/ui/checkbox';
import { Input } from '@/components/ui/input';
import { Select } from '@/components/ui/select';
import { Textarea } from '@/components/ui/textarea';
import { settingsInput } from '@/lib/club/schema';
import type { FormAction } from '@/lib/core/form-state';
import { Row } from './row';

export type SettingsView = {
  name: string; footLine: string; holdMinutes: number; holdsMayBeExtended: boolean; partyPeopleMax: number; partyVisitsMax: number; babesTakePlace: boolean;
  addressReleaseHours: number; changesEndMinutes: number; duesKeptOnDays: number; hourCycle: 'h12' | 'h23'; visitRules: string; refundRules: { hoursBefore: number; percent: number }[];
};

const HOURS = [{ value: 'h23', label: '24 hours: 13:45' }, { value: 'h12', label: '12 hours: 1:45 pm' }];

/** The club's settings, one box each, with what each means. */
export function SettingsForm({ action, settings }: { action: FormAction; settings: SettingsView }) {
  const steps = [...settings.refundRules, ...(settings.refundRules.length < STEPS_MOST ? [{ hoursBefore: '', percent: '' }] : [])];
  return (
    <ActionForm action={action} schema={settingsInput} submit="Keep these settings">
      <Group title="The club">
        <Input name="name" label="Its name" defaultValue={settings.name} required />
        <Input name="footLine" label="At the foot of each page" defaultValue={settings.footLine} required />
        <Select name="hourCycle" label="Times are written in" choices={HOURS} defaultValue={settings.hourCycle} width="half" />
      </Group>
      <Group title="Keeping places">
        <Count name="holdMinutes" label="Minutes that places are kept for a party" value={settings.holdMinutes} />
        <Checkbox name="holdsMayBeExtended" label="A party may ask to keep them longer" defaultChecked={settings.holdsMayBeExtended} />
        <Count name="partyPeopleMax" label="People in one party, at most" value={settings.partyPeopleMax} />
        <Count name="partyVisitsMax" label="Visits of one party on an open day, at most" value={settings.partyVisitsMax} />
        <Checkbox name="babesTakePlace" label="Babes in arms take a place" defaultChecked={settings.babesTakePlace} />
      </Group>
      <Group title="Before a visit">
        <Count name="addressReleaseHours" label="Hours before an entry time at which a ticket shows the address" value={settings.addressReleaseHours} />
        <Count name="changesEndMinutes" label="Minutes before an entry time at which changing and giving back end" value={settings.changesEndMinutes} />
      </Group>
      <Group title="What comes back" about="The earliest step first. Empty both boxes to take a step away.">
        {steps.map((step, index) => (
          <Row key={index}>
            <Input name={`refundRules.${index}.hoursBefore`} label={`Step ${index + 1}: hours before, at least`} inputMode="numeric" defaultValue={String(step.hoursBefore)} width="heads" />
            <Input name={`refundRules.${index}.percent`} label={`Step ${index + 1}: percent`} inputMode="numeric" defaultValue={String(step.percent)} width="heads" />
          </Row>
        ))}
      </Group>
      <Group title="Dues">
        <Count name="duesKeptOnDays" label="Days a household is kept on after its term" value={settings.duesKeptOnDays} />
      </Group>
      <Group title="Visit rules">
        <Textarea name="visitRules" label="What a party agrees to" rows={6} defaultValue={settings.visitRules} />
      </Group>
    </ActionForm>
  );
}

const STEPS_MOST = 6;

function Group({ title, about, children }: { title: string; about?: string; children: ReactNode }) {
  return (
    <fieldset className="grid gap-5 border-b border-rule pb-7">
      <legend className="mb-4 font-heading text-[1.5rem] leading-tight font-extrabold">{title}</legend>
      {about === undefined ? null : <p className="-mt-3 text-ink-soft">{about}</p>}
      {children}
    </fieldset>
  );
}

function Count({ name, label, value }: { name: string; label: string; value: number }) {
  return <Input name={name} label={label} inputMode="numeric" defaultValue={String(value)} width="heads" required />;
}
