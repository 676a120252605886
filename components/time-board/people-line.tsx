import { Button } from '@/components/ui/button';
import { controlLook } from '@/components/ui/control-look';
import { MarginNote } from '@/components/ui/field';
import type { Only } from '@/lib/opendays/rules/board';
import type { People } from '@/lib/bookings/rules/party';
import type { PartyTyped } from './use-choice';

type PeopleLineProps = {
  typed: PartyTyped;
  only: Only;
  /** Why these people cannot come together, beside their boxes. */
  mistake: string | null;
  /** The page's own address, for a browser that must ask the server again. */
  path: string;
  acts: { type: (kind: keyof People, text: string) => void; show: (only: Only) => void };
};

/** "We are 2 adults, 1 child and 0 babes in arms", and which gardens to show. */
export function PeopleLine({ typed, only, mistake, path, acts }: PeopleLineProps) {
  const box = (kind: keyof People, label: string) => (
    <input
      id={`people-${kind}`}
      name={kind}
      inputMode="numeric"
      autoComplete="off"
      maxLength={9}
      className={controlLook('heads', 'mono')}
      aria-label={label}
      {...(mistake === null ? {} : { 'aria-invalid': true, 'aria-describedby': 'people-mistake' })}
      value={typed[kind]}
      onChange={(event) => acts.type(kind, event.target.value)}
    />
  );
  const tick = (kind: keyof Only, label: string) => (
    <label className="inline-flex min-h-11 cursor-pointer items-center gap-2.5">
      <input
        type="checkbox"
        name={kind === 'stepFree' ? 'step-free' : 'steam'}
        value="only"
        className="tick-box"
        checked={only[kind]}
        onChange={(event) => acts.show({ ...only, [kind]: event.target.checked })}
      />
      {label}
    </label>
  );
  return (
    <div className="mt-4 flex flex-wrap items-center gap-x-3 gap-y-2 text-[1.0556rem] print:hidden" role="group" aria-label="Who is coming, and which gardens to show">
      <span className="flex flex-wrap items-center gap-x-3 gap-y-2">
        <span>We are</span> {box('adults', 'Adults')} <span>{typed.adults === '1' ? 'adult' : 'adults'},</span>
        {box('children', 'Children')} <span>{typed.children === '1' ? 'child' : 'children'} and</span>
        {box('babes', 'Babes in arms')} <span>{typed.babes === '1' ? 'babe' : 'babes'} in arms.</span>
      </span>
      {tick('stepFree', 'Step-free only')}
      {tick('steam', 'Steam only')}
      <noscript>
        <Button type="submit" formAction={path} formMethod="get" formNoValidate>Show these</Button>
      </noscript>
      {mistake === null ? null : <MarginNote id="people-mistake" sentences={[mistake]} />}
    </div>
  );
}
