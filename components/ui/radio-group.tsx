'use client';

import type { ReactNode } from 'react';
import { Field } from './field';
import { includesChoice, useField } from './form-fields';

export type RadioChoice = { value: string; label: ReactNode; hint?: ReactNode; disabled?: boolean };

type RadioGroupProps = {
  name: string;
  label: ReactNode;
  choices: readonly RadioChoice[];
  hint?: ReactNode;
  errors?: readonly string[];
  defaultValue?: string;
  required?: boolean;
  run?: 'down' | 'across';
};

/** One of a few, all of them in sight. */
export function RadioGroup({ name, label, choices, hint, errors, defaultValue, required = false, run = 'down' }: RadioGroupProps) {
  const field = useField(name, errors);
  const chosen = field.value ?? defaultValue;
  return (
    <Field as="group" width="fitting" id={field.id} label={label} errors={field.errors} {...(hint === undefined ? {} : { hint })}>
      {() => (
        <div className={run === 'across' ? 'flex flex-wrap gap-x-7' : 'grid'}>
          {choices.map((choice) => (
            <label key={choice.value} className="inline-flex min-h-11 cursor-pointer items-center gap-3 py-1 leading-snug">
              <input
                {...field.registration}
                type="radio"
                name={name}
                value={choice.value}
                required={required}
                disabled={choice.disabled ?? false}
                defaultChecked={includesChoice(chosen, choice.value)}
                className="tick-box tick-round"
              />
              <span>
                {choice.label}
                {choice.hint === undefined ? null : <span className="block text-ink-soft">{choice.hint}</span>}
              </span>
            </label>
          ))}
        </div>
      )}
    </Field>
  );
}
