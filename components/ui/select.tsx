'use client';

import type { ComponentProps, ReactNode } from 'react';
import { controlLook, type ControlWidth } from './control-look';
import { Field } from './field';
import { asText, useField } from './form-fields';
import { Icon } from './icon';

export type Choice = { value: string; label: string; disabled?: boolean };

type SelectProps = Omit<ComponentProps<'select'>, 'className' | 'id' | 'children' | 'multiple'> & {
  name: string;
  label: ReactNode;
  choices: readonly Choice[];
  hint?: ReactNode;
  errors?: readonly string[];
  width?: ControlWidth;
};

/** One of many, when there are too many for a row of radio buttons. */
export function Select({ name, label, choices, hint, errors, width = 'full', defaultValue, required, ...rest }: SelectProps) {
  const field = useField(name, errors);
  return (
    <Field id={field.id} width={width === 'full' ? 'filling' : 'fitting'} label={label} errors={field.errors} required={required ?? false} {...(hint === undefined ? {} : { hint })}>
      {(control) => (
        <span className="relative inline-block max-w-full has-[.w-full]:block">
          <select
            {...rest}
            {...control}
            {...field.registration}
            name={name}
            defaultValue={asText(field.value) ?? defaultValue}
            className={`${controlLook(width, 'text')} appearance-none pr-10`}
          >
            {choices.map((choice) => (
              <option key={choice.value} value={choice.value} disabled={choice.disabled ?? false}>
                {choice.label}
              </option>
            ))}
          </select>
          <span className="pointer-events-none absolute inset-y-0 right-3 flex items-center">
            <Icon name="down" />
          </span>
        </span>
      )}
    </Field>
  );
}
