'use client';

import { startTransition, useActionState, useEffect, useId, useRef, useState, useSyncExternalStore, type FormEvent, type ReactNode } from 'react';
import { useForm } from 'react-hook-form';
import type { z } from 'zod';
import { Button } from '@/components/ui/button';
import type { ButtonSize, ButtonTone } from '@/components/ui/button-look';
import { FormFieldsContext, type FormFields } from '@/components/ui/form-fields';
import { Notice } from '@/components/ui/notice';
import { idleForm, type FormAction, type FormState } from '@/lib/core/form-state';
import { FieldsOnScreen } from './fields-on-screen';
import { FormSummary } from './form-summary';
import { plainName, problemsOf, resolverOf, type Problems } from './problems';

type ActionFormProps = {
  /** A server action built by `action(...)`, passed in by the page. */
  action: FormAction;
  /** The command's own input schema: the browser and the server say the same sentences. */
  schema?: z.ZodType;
  /** What stands in the boxes at first, by field name. */
  values?: Record<string, string | string[]>;
  /** What will happen: "Keep 3 places at 11:30". */
  submit: string;
  /** What is said while it happens. */
  sending?: string;
  tone?: ButtonTone;
  size?: ButtonSize;
  /** After success: keep what was typed, or clear the boxes for the next one. */
  whenDone?: 'keep' | 'clear';
  /** The way on after a refusal, by its code ("choose it all the same"). */
  wayOn?: (state: FormState) => ReactNode;
  /** What success shows beside its sentence, such as a link made once. */
  done?: (state: FormState) => ReactNode;
  /** Beside the button. */
  aside?: ReactNode;
  children?: ReactNode;
};

/**
 * A form joined to its server action, once for the whole product. It works before JavaScript arrives; with it, mistakes
 * are said without a round trip, the summary takes the focus, and what was typed always stays.
 *
 * A form is a small client component that names its schema; the page passes the action in:
 *
 *     'use client';
 *     export function SignInForm({ action }: { action: FormAction }) {
 *       return (
 *         <ActionForm action={action} schema={signInInput} submit="Send me a code" tone="main">
 *           <Input name="email" label="E-mail" type="email" autoComplete="email" required />
 *         </ActionForm>
 *       );
 *     }
 *
 * Names nest with dots (`wanted.0.adults`); several boxes of one list end in `[]`. Fixed facts travel as
 * `<input type="hidden" name="openDayId" value={id} />`. Two buttons: give the second `name` and `value`.
 */
export function ActionForm({ action, schema, values, submit, sending = 'One moment.', tone = 'main', size = 'usual', whenDone = 'keep', wayOn, done, aside, children }: ActionFormProps) {
  const [state, send, isPending] = useActionState(action, idleForm);
  const element = useRef<HTMLFormElement>(null);
  const isSending = useRef(false);
  const fields = useFormFields({ state, isPending, schema, values, form: () => element.current });

  useEffect(() => {
    isSending.current = false;
    if (state.status === 'done' && whenDone === 'clear') element.current?.reset();
  }, [state, whenDone]);

  const submitOnce = (event: FormEvent<HTMLFormElement>) => {
    event.preventDefault();
    if (isSending.current || isPending) return;
    isSending.current = true;
    const data = new FormData(event.currentTarget, submitterOf(event));
    void fields.judge(
      () => startTransition(() => send(data)),
      () => (isSending.current = false),
    );
  };

  return (
    <FormFieldsContext value={fields.context}>
      <form ref={element} action={send} onSubmit={submitOnce} onInput={fields.noteEdit} noValidate={schema !== undefined} className="grid grid-cols-1 gap-5">
        <FormSummary
          key={fields.round}
          message={fields.message}
          problems={fields.problems}
          onScreen={fields.onScreen}
          idOf={fields.context.idOf}
          wayOn={isPending ? null : wayOn?.(state)}
        />
        {children}
        <div className="flex flex-wrap items-center gap-x-5 gap-y-3">
          <Button type="submit" tone={tone} size={size} aria-disabled={isPending}>
            {submit}
          </Button>
          {aside}
          <span role="status" className="note empty:-ml-5">
            {isPending ? sending : null}
          </span>
        </div>
        {state.status === 'done' && !isPending && (state.message !== undefined || done !== undefined) ? (
          <Notice tone="clear">
            {state.message} {done?.(state)}
          </Notice>
        ) : null}
      </form>
    </FormFieldsContext>
  );
}

function submitterOf(event: FormEvent<HTMLFormElement>): HTMLElement | null {
  const native = event.nativeEvent;
  return native instanceof SubmitEvent ? native.submitter : null;
}

type Wiring = {
  state: FormState;
  isPending: boolean;
  schema: z.ZodType | undefined;
  values: Record<string, string | string[]> | undefined;
  form: () => HTMLFormElement | null;
};

const LOOK_AGAIN = 'Some of that needs another look. What you typed is kept.';
const NOBODY: readonly string[] = [];

/** The fields' side of a form: ids, values, problems from the browser first and then the server, and which are on screen. */
function useFormFields({ state, isPending, schema, values, form }: Wiring) {
  const formId = useId();
  const { register, handleSubmit, formState } = useForm({
    mode: 'onSubmit',
    shouldFocusError: false, // the summary takes the focus
    ...(schema === undefined ? {} : { resolver: resolverOf(schema, form) }),
  });
  const [store] = useState(() => new FieldsOnScreen());
  const onScreen = useSyncExternalStore(store.subscribe, store.snapshot, () => NOBODY);
  const [edited, setEdited] = useState<{ since: FormState; names: readonly string[] }>({ since: state, names: [] });

  const own = problemsOf(formState.errors);
  const isOwn = Object.keys(own).length > 0;
  const untouched = (problems: Problems) => Object.fromEntries(Object.entries(problems).filter(([name]) => edited.since !== state || !edited.names.includes(name)));
  const problems = isPending ? {} : isOwn ? own : untouched(state.fieldErrors ?? {});
  const isWrong = state.status === 'invalid' || state.status === 'refused';

  const context: FormFields = {
    idOf: (name) => `${formId}-${plainName(name).replace(/[^\w-]/g, '-')}`,
    errorsOf: (name) => problems[plainName(name)] ?? NOBODY,
    valueOf: (name) => (state.values === undefined ? values?.[name] : (state.values[name] ?? '')),
    register: (name) => {
      const { ref, onChange, onBlur } = register(name);
      return { ref, onChange: (event) => void onChange(event), onBlur: (event) => void onBlur(event) };
    },
    enter: store.enter,
  };
  return {
    context,
    problems,
    onScreen,
    message: isPending ? undefined : isOwn ? LOOK_AGAIN : isWrong ? (state.message ?? LOOK_AGAIN) : undefined,
    /** Changes with each judgement, so that the summary is new and takes the focus again. */
    round: `${formState.submitCount} ${isPending}`,
    judge: (onGood: () => void, onBad: () => void) => handleSubmit(onGood, onBad)(),
    noteEdit: (event: FormEvent<HTMLFormElement>) => {
      const { target } = event;
      if (!(target instanceof HTMLElement)) return;
      const name = plainName(target.getAttribute('name') ?? '');
      setEdited((before) => ({ since: state, names: [...(before.since === state ? before.names : []), name] }));
    },
  };
}
