'use client';

import type { ComponentProps, ReactNode } from 'react';
import { fieldWidths, MarginNote } from './field';
import { includesChoice, useField } from './form-fields';

type CheckboxProps = Omit<ComponentProps<'input'>, 'className' | 'id' | 'type'> & {
  name: string;
  label: ReactNode;
  hint?: ReactNode;
  errors?: readonly string[];
  value?: string;
};

/** A box to tick. Sends `on` (or its `value`) when ticked and nothing when not. */
export function Checkbox({ name, label, hint, errors, value = 'on', defaultChecked, required, ...rest }: CheckboxProps) {
  const field = useField(name, errors);
  const id = value === 'on' ? field.id : `${field.id}-${value}`;
  const described = [hint === undefined ? '' : `${id}-hint`, field.errors.length > 0 ? `${id}-error` : ''].filter((each) => each !== '').join(' ');
  return (
    <div className="flex min-w-0 max-w-full flex-wrap items-start gap-x-5 gap-y-1">
      <div className={fieldWidths.fitting}>
        <label htmlFor={id} className="inline-flex min-h-11 cursor-pointer items-center gap-3 leading-snug">
          <input
            {...rest}
            {...field.registration}
            id={id}
            name={name}
            type="checkbox"
            value={value}
            defaultChecked={field.value === undefined ? (defaultChecked ?? false) : includesChoice(field.value, value)}
            className="tick-box"
            {...(described === '' ? {} : { 'aria-describedby': described })}
            {...(field.errors.length > 0 ? { 'aria-invalid': true } : {})}
            {...(required ? { 'aria-required': true } : {})}
          />
          <span>{label}</span>
        </label>
        {hint === undefined ? null : (
          <p id={`${id}-hint`} className="pl-9 text-ink-soft">
            {hint}
          </p>
        )}
      </div>
      {field.errors.length > 0 ? <MarginNote id={`${id}-error`} sentences={field.errors} /> : null}
    </div>
  );
}
