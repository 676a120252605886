'use client';

import { ActionForm } from '@/components/forms/action-form';
import { Checkbox } from '@/components/ui/checkbox';
import { Input } from '@/components/ui/input';
import { Select } from '@/components/ui/select';
import { Textarea } from '@/components/ui/textarea';
import { settingsInput } from '@/lib/club/schema';
import type { FormAction } from '@/lib/core/form-state';

export type SettingsView = {
  name: string; footLine: string; holdMinutes: number; holdsMayBeExtended: boolean; partyPeopleMax: number; partyVisitsMax: number; babesTakePlace: boolean;
  addressReleaseHours: number; changesEndMinutes: number; duesKeptOnDays: number; hourCycle: 'h12' | 'h23'; visitRules: string; refundRules: { hoursBefore: number; percent: number }[];
};

const HOURS = [{ value: 'h23', label: '24 hours: 13:45' }, { value: 'h12', label: '12 hours: 1:45 pm' }];

/** The club's settings, one box each, with what each means. */
export function SettingsForm({ action, settings }: { action: FormAction; settings: SettingsView }) {
  return (
    <ActionForm action={action} schema={settingsInput} submit="Keep these settings">
      <Input name="name" label="The club’s name" defaultValue={settings.name} required />
      <Input name="footLine" label="At the foot of each page" defaultValue={settings.footLine} required />
      <Select name="hourCycle" label="Times are written in" choices={HOURS} defaultValue={settings.hourCycle} />
      <Count name="holdMinutes" label="Minutes that places are kept for a party" value={settings.holdMinutes} />
      <Checkbox name="holdsMayBeExtended" label="A party may ask to keep them longer" defaultChecked={settings.holdsMayBeExtended} />
      <Count name="partyPeopleMax" label="People in one party, at most" value={settings.partyPeopleMax} />
      <Count name="partyVisitsMax" label="Visits of one party on an open day, at most" value={settings.partyVisitsMax} />
      <Checkbox name="babesTakePlace" label="Babes in arms take a place" defaultChecked={settings.babesTakePlace} />
      <Count name="addressReleaseHours" label="Hours before an entry time at which a ticket shows the address" value={settings.addressReleaseHours} />
      <Count name="changesEndMinutes" label="Minutes before an entry time at which changing and giving back end" value={settings.changesEndMinutes} />
      {settings.refundRules.map((step, index) => (
        <div key={index} className="grid gap-4 sm:grid-cols-2">
          <Count name={`refundRules.${index}.hoursBefore`} label={`Refund step ${index + 1}: at least this many hours before`} value={step.hoursBefore} />
          <Count name={`refundRules.${index}.percent`} label="percent is returned" value={step.percent} />
        </div>
      ))}
      <Count name="duesKeptOnDays" label="Days a household is kept on after its term" value={settings.duesKeptOnDays} />
      <Textarea name="visitRules" label="Visit rules that a party agrees to" rows={6} defaultValue={settings.visitRules} />
    </ActionForm>
  );
}

function Count({ name, label, value }: { name: string; label: string; value: number }) {
  return <Input name={name} label={label} inputMode="numeric" defaultValue={String(value)} required />;
}
