'use client';

import { ActionForm } from '@/components/forms/action-form';
import { Input } from '@/components/ui/input';
import { Select, type Choice } from '@/components/ui/select';
import { Textarea } from '@/components/ui/textarea';
import { Row } from './row';
import type { FormAction } from '@/lib/core/form-state';
import { entryTimeChangeInput, entryTimesInput, noticeInput, openDayChangeInput, openDayInput, planNoteInput, stopChangeInput, stopInput, stopPricesInput } from '@/lib/opendays/schema';

export type DayParts = { title: string; placeLine: string; howToCome: string; heldOn: string; opensAt: string; closesAt: string; adult: string; child: string; babe: string; partyPeopleMax: string };

type Kinds = { adult: string; child: string; babe: string };

function DayFields({ day }: { day: DayParts }) {
  return (
    <>
      <Input name="title" label="Name" hint="It fills the top of the page: Spring Open Gardens" defaultValue={day.title} required />
      <Input name="placeLine" label="Where, in a few words" hint="in and around Alder Fork" defaultValue={day.placeLine} required />
      <Row>
        <Input name="heldOn" label="Day" type="date" defaultValue={day.heldOn} width="short" required />
        <Input name="opensAt" label="Gates open" type="time" defaultValue={day.opensAt} width="short" required />
        <Input name="closesAt" label="Gates close" type="time" defaultValue={day.closesAt} width="short" required />
      </Row>
      <Row>
        <Input name="adult" label="An adult pays a visit" inputMode="decimal" defaultValue={day.adult} width="short" required />
        <Input name="child" label="A child pays" inputMode="decimal" defaultValue={day.child} width="short" required />
        <Input name="babe" label="A babe in arms pays" inputMode="decimal" defaultValue={day.babe} width="short" required />
      </Row>
      <Input name="partyPeopleMax" label="People in one party, at most" hint="Empty: as many as the club’s settings say." inputMode="numeric" defaultValue={day.partyPeopleMax} width="heads" />
      <Textarea name="howToCome" label="How to come" rows={3} defaultValue={day.howToCome} />
    </>
  );
}

/** Makes an open day that nobody sees yet. */
export function OpenDayForm({ action, day }: { action: FormAction; day: DayParts }) {
  return (
    <ActionForm action={action} schema={openDayInput} submit="Make the open day">
      <Input name="slug" label="Short name for its address" hint="spring-2027" required />
      <DayFields day={day} />
    </ActionForm>
  );
}

/** Changes an open day's words, hours and prices. */
export function OpenDayChangeForm({ action, openDayId, day }: { action: FormAction; openDayId: string; day: DayParts }) {
  return (
    <ActionForm action={action} schema={openDayChangeInput} submit="Keep these" tone="plain">
      <input type="hidden" name="openDayId" value={openDayId} />
      <DayFields day={day} />
    </ActionForm>
  );
}

/** Adds a garden as the next stop. */
export function StopForm({ action, openDayId, gardens, number }: { action: FormAction; openDayId: string; gardens: readonly Choice[]; number: number }) {
  return (
    <ActionForm action={action} schema={stopInput} submit="Add this garden" tone="plain" whenDone="clear">
      <input type="hidden" name="openDayId" value={openDayId} />
      <Select name="gardenId" label="Garden" choices={gardens} />
      <Row>
        <Input name="number" label="Number, for its card and nip" inputMode="numeric" defaultValue={String(number)} width="heads" required />
        <Input name="stayMinutes" label="Usual stay in minutes" inputMode="numeric" defaultValue="35" width="heads" required />
        <Input name="headsLimit" label="People at once, at most" inputMode="numeric" defaultValue="20" width="heads" required />
      </Row>
    </ActionForm>
  );
}

/** Changes a stop's stay and limit. */
export function StopChangeForm({ action, stop }: { action: FormAction; stop: { id: string; stayMinutes: number; headsLimit: number; hostLimit: number } }) {
  return (
    <ActionForm action={action} schema={stopChangeInput} submit="Keep these" tone="plain">
      <input type="hidden" name="stopId" value={stop.id} />
      <Row>
        <Input name="stayMinutes" label="Usual stay in minutes" inputMode="numeric" defaultValue={String(stop.stayMinutes)} width="heads" required />
        <Input name="headsLimit" label={`People at once, at most (the host said ${stop.hostLimit})`} inputMode="numeric" defaultValue={String(stop.headsLimit)} width="heads" required />
      </Row>
    </ActionForm>
  );
}

/** What a visit costs at this stop, where it is not what the open day says. */
export function StopPricesForm({ action, stopId, own, day }: { action: FormAction; stopId: string; own: Kinds; day: Kinds }) {
  return (
    <ActionForm action={action} schema={stopPricesInput} submit="Keep these prices" tone="plain">
      <input type="hidden" name="stopId" value={stopId} />
      <Row>
        <Input name="adult" label={`An adult (the day says ${day.adult})`} inputMode="decimal" defaultValue={own.adult} width="short" />
        <Input name="child" label={`A child (${day.child})`} inputMode="decimal" defaultValue={own.child} width="short" />
        <Input name="babe" label={`A babe in arms (${day.babe})`} inputMode="decimal" defaultValue={own.babe} width="short" />
      </Row>
    </ActionForm>
  );
}

/** Makes a row of entry times. */
export function EntryTimesForm({ action, stopId, headsLimit }: { action: FormAction; stopId: string; headsLimit: number }) {
  return (
    <ActionForm action={action} schema={entryTimesInput} submit="Make these entry times">
      <input type="hidden" name="stopId" value={stopId} />
      <Row>
        <Input name="firstAt" label="First start" type="time" defaultValue="10:00" width="short" required />
        <Input name="lastAt" label="Last start" type="time" defaultValue="15:15" width="short" required />
        <Input name="everyMinutes" label="Minutes between" inputMode="numeric" defaultValue="45" width="heads" required />
        <Input name="graceMinutes" label="Minutes of grace" inputMode="numeric" defaultValue="20" width="heads" required />
        <Input name="capacity" label="Places at each" inputMode="numeric" defaultValue={String(Math.min(12, headsLimit))} width="heads" required />
      </Row>
    </ActionForm>
  );
}

/** Changes one entry time; parties whose start moves are written to. */
export function EntryTimeChangeForm({ action, time }: { action: FormAction; time: { id: string; opensAt: string; graceMinutes: number; capacity: number } }) {
  return (
    <ActionForm action={action} schema={entryTimeChangeInput} submit="Change it, and write to those affected" tone="plain">
      <input type="hidden" name="entryTimeId" value={time.id} />
      <Row>
        <Input name="opensAt" label="Start" type="time" defaultValue={time.opensAt} width="short" required />
        <Input name="graceMinutes" label="Minutes of grace" inputMode="numeric" defaultValue={String(time.graceMinutes)} width="heads" required />
        <Input name="capacity" label="Places" inputMode="numeric" defaultValue={String(time.capacity)} width="heads" required />
      </Row>
      <Input name="reason" label="Why, for the letter" hint="May stay empty." />
    </ActionForm>
  );
}

/** Closes or opens one entry time, or publishes a day: a press with one fact. */
export function FactForm({ action, name, value, submit, tone = 'bare' }: { action: FormAction; name: string; value: string; submit: string; tone?: 'main' | 'plain' | 'bare' }) {
  return (
    <ActionForm action={action} submit={submit} tone={tone}>
      <input type="hidden" name={name} value={value} />
    </ActionForm>
  );
}

/** A letter in the coordinator's own words. */
export function NoticeForm({ action, openDayId, stops }: { action: FormAction; openDayId: string; stops: readonly Choice[] }) {
  return (
    <ActionForm action={action} schema={noticeInput} submit="Send the letter" whenDone="clear">
      <input type="hidden" name="openDayId" value={openDayId} />
      <Select name="stopId" label="To the parties of" choices={[{ value: '', label: 'the whole open day' }, ...stops]} />
      <Input name="subject" label="Subject" required />
      <Textarea name="body" label="The letter" rows={8} required />
    </ActionForm>
  );
}

/** A pencil note for the margin. */
export function PlanNoteForm({ action, openDayId }: { action: FormAction; openDayId: string }) {
  return (
    <ActionForm action={action} schema={planNoteInput} submit="Pencil it in" tone="plain" whenDone="clear">
      <input type="hidden" name="openDayId" value={openDayId} />
      <Input name="note" label="A note in the margin" required />
    </ActionForm>
  );
}
