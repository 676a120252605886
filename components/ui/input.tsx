'use client';

import type { ComponentProps, ReactNode } from 'react';
import { controlLook, type ControlWidth } from './control-look';
import { Field } from './field';
import { asText, useField } from './form-fields';

type InputProps = Omit<ComponentProps<'input'>, 'className' | 'id' | 'size' | 'type'> & {
  name: string;
  label: ReactNode;
  hint?: ReactNode;
  errors?: readonly string[];
  type?: 'text' | 'email' | 'tel' | 'password' | 'search' | 'url' | 'date' | 'time' | 'number';
  /** `heads` is two or three figures wide, `short` a code or an amount. */
  width?: ControlWidth;
  /** Codes, times and figures are set in the mono face. */
  face?: 'text' | 'mono';
};

/** One line of typing. */
export function Input({ name, label, hint, errors, width = 'full', face = 'text', type = 'text', defaultValue, required, ...rest }: InputProps) {
  const field = useField(name, errors);
  return (
    <Field id={field.id} width={width === 'full' ? 'filling' : 'fitting'} label={label} errors={field.errors} required={required ?? false} {...(hint === undefined ? {} : { hint })}>
      {(control) => (
        <input
          {...rest}
          {...control}
          {...field.registration}
          name={name}
          type={type}
          defaultValue={asText(field.value) ?? defaultValue}
          className={controlLook(width, face)}
        />
      )}
    </Field>
  );
}
