/** What a form knows after it was sent once. Plain JSON: it travels from the server action to the browser. */
export type FormState = {
  status: 'idle' | 'invalid' | 'refused' | 'done';
  /** One sentence for the whole form: what is wrong and what to do, or what was done. */
  message?: string;
  /** The refusal's code, so that a form can offer the way on ("choose it all the same"). */
  code?: string;
  /** Sentences by field name; a name that is not on screen is shown in the summary. */
  fieldErrors?: Record<string, string[]>;
  /** What was typed, by field name, so that nothing is lost. Never a password. */
  values?: Record<string, string | string[]>;
  /** A small fact a form shows once, such as a gate pass's link. */
  fact?: Record<string, string>;
};

export const idleForm: FormState = { status: 'idle' };

/** A server action as forms know it. */
export type FormAction = (state: FormState, form: FormData) => Promise<FormState>;
