import type { ReactNode } from 'react';
import { Button } from '@/components/ui/button';
import { controlLook } from '@/components/ui/control-look';
import { LinkButton } from '@/components/ui/link-button';
import { powersInWords, scaleInWords } from '@/lib/gardens/rules/particulars';
import type { GardenFilters } from '@/lib/gardens/schema';

export type FilterChoices = { scales: readonly number[]; powers: readonly string[]; days: readonly { slug: string; words: string }[] };
type FilterFormProps = { filters: GardenFilters; choices: FilterChoices; isNarrowed: boolean };

/** What to show, asked in one sentence. A plain GET form: the answer stands in the address, with or without JavaScript. */
export function FilterForm({ filters, choices, isNarrowed }: FilterFormProps) {
  return (
    <form action="/gardens" method="get" aria-label="Which gardens to show" className="mt-4 flex flex-wrap items-center gap-x-3 gap-y-3 text-lg print:hidden">
      <Choice name="scale" label="Scale" value={filters.scale === null ? '' : String(filters.scale)} any="any" options={choices.scales.map((scale) => [String(scale), scaleInWords(scale)])} />
      <Choice name="runs" label="run by" value={filters.runs ?? ''} any="anything" options={choices.powers.map((power) => [power, powersInWords([power])])} />
      <Choice name="day" label="open on" value={filters.day ?? ''} any="any day" options={choices.days.map(({ slug, words }) => [slug, words])} />
      <Word label="with at least">
        <input name="places" defaultValue={filters.places ?? ''} inputMode="numeric" pattern="[0-9]{0,2}" maxLength={2} placeholder="any" aria-label="With at least this many places left" className={controlLook('heads', 'mono')} />
        <span aria-hidden="true">places left</span>
      </Word>
      <label className="inline-flex min-h-11 cursor-pointer items-center gap-2.5">
        <input type="checkbox" name="access" value="step-free" defaultChecked={filters.access !== null} className="tick-box" />
        Step-free only
      </label>
      <span className="flex flex-wrap items-center gap-x-5 gap-y-2 md:ml-auto">
        {isNarrowed ? (
          <LinkButton tone="bare" href="/gardens">
            Show all
          </LinkButton>
        ) : null}
        <Button type="submit">Show these</Button>
      </span>
    </form>
  );
}

function Word({ label, children }: { label: string; children: ReactNode }) {
  return (
    <span className="inline-flex items-center gap-2">
      <span aria-hidden="true">{label}</span>
      {children}
    </span>
  );
}

type ChoiceProps = { name: string; label: string; value: string; any: string; options: readonly (readonly [string, string])[] };

function Choice({ name, label, value, any, options }: ChoiceProps) {
  return (
    <label className="flex max-w-full items-center gap-2 max-sm:w-full">
      <span className="shrink-0">{label}</span>
      <select name={name} defaultValue={value} className={`${controlLook('full', 'text')} min-w-0 sm:w-auto`}>
        <option value="">{any}</option>
        {options.map(([key, words]) => (
          <option key={key} value={key}>
            {words}
          </option>
        ))}
      </select>
    </label>
  );
}
