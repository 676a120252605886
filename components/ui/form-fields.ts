'use client';

import { createContext, useContext, useEffect, useId, type ChangeEventHandler, type FocusEventHandler, type RefCallback } from 'react';

type Registration = {
  ref?: RefCallback<HTMLInputElement | HTMLSelectElement | HTMLTextAreaElement>;
  onChange?: ChangeEventHandler<HTMLInputElement | HTMLSelectElement | HTMLTextAreaElement>;
  onBlur?: FocusEventHandler<HTMLInputElement | HTMLSelectElement | HTMLTextAreaElement>;
};

/** What a form tells its fields. `ActionForm` provides it; outside a form, fields stand on their own. */
export type FormFields = {
  idOf: (name: string) => string;
  errorsOf: (name: string) => readonly string[];
  /** What was typed or given; undefined when the form does not know the field, so its own default counts. */
  valueOf: (name: string) => string | string[] | undefined;
  register: (name: string) => Registration;
  /** A field says that it is on screen; the answer says that it has gone. */
  enter: (name: string) => () => void;
};

export const FormFieldsContext = createContext<FormFields | null>(null);

export type FieldWiring = { id: string; errors: readonly string[]; value: string | string[] | undefined; registration: Registration };

/** The id, errors, value and listeners of one named field. */
export function useField(name: string, ownErrors: readonly string[] = []): FieldWiring {
  const form = useContext(FormFieldsContext);
  const ownId = useId();
  const enter = form?.enter;
  useEffect(() => enter?.(name), [enter, name]);
  if (form === null) return { id: ownId, errors: ownErrors, value: undefined, registration: {} };
  return { id: form.idOf(name), errors: [...ownErrors, ...form.errorsOf(name)], value: form.valueOf(name), registration: form.register(name) };
}

/** One text of a value that may be a list. */
export const asText = (value: string | string[] | undefined): string | undefined => (Array.isArray(value) ? value[0] : value);

/** Whether a choice is among the chosen. */
export const includesChoice = (value: string | string[] | undefined, choice: string): boolean =>
  Array.isArray(value) ? value.includes(choice) : value === choice;
