'use client';

import type { ComponentProps, ReactNode } from 'react';
import { controlLook } from './control-look';
import { Field } from './field';
import { asText, useField } from './form-fields';

type TextareaProps = Omit<ComponentProps<'textarea'>, 'className' | 'id'> & {
  name: string;
  label: ReactNode;
  hint?: ReactNode;
  errors?: readonly string[];
};

/** Several lines of typing. */
export function Textarea({ name, label, hint, errors, rows = 4, defaultValue, required, ...rest }: TextareaProps) {
  const field = useField(name, errors);
  return (
    <Field id={field.id} label={label} errors={field.errors} required={required ?? false} {...(hint === undefined ? {} : { hint })}>
      {(control) => (
        <textarea
          {...rest}
          {...control}
          {...field.registration}
          name={name}
          rows={rows}
          defaultValue={asText(field.value) ?? defaultValue}
          className={`${controlLook('full', 'text')} resize-y`}
        />
      )}
    </Field>
  );
}
