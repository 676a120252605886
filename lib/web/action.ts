import 'server-only';
import { unstable_rethrow } from 'next/navigation';
import type { z } from 'zod';
import type { FormState } from '@/lib/core/form-state';
import { Refusal } from '@/lib/core/refusal';
import type { Ctx } from '@/lib/infra/context';
import { log } from '@/lib/infra/log';
import { requestContext } from './context';
import { readForm, typedValues } from '@/lib/core/form-data';
import { fieldErrorsOf } from './problems';
import type { ActorFor, Requires } from './requires';

type After<R extends Requires, O> = (result: O, ctx: Ctx<ActorFor<R>>, form: FormData) => Promise<FormState | void> | FormState | void;

/** What an action is made of; `after` redirects, refreshes, or answers with the form's next state. */
export type ActionParts<R extends Requires, S extends z.ZodType, O> = {
  requires: R;
  input: S;
  run: (ctx: Ctx<ActorFor<R>>, input: z.output<S>) => Promise<O>;
  after?: After<R, O>;
};

/**
 * Builds a server action, the one way there is: find the actor, parse the form, run the command, turn a `Refusal`
 * into form state. Anything else crashes to the error page. `after` runs outside the try: redirect() works by throwing.
 */
export function action<R extends Requires, S extends z.ZodType, O>(parts: ActionParts<R, S, O>) {
  return async function run(_state: FormState, form: FormData): Promise<FormState> {
    const done = await attempt(parts, form);
    if ('state' in done) return done.state;
    const next = await parts.after?.(done.result, done.ctx, form);
    return next ?? { status: 'done' };
  };
}

async function attempt<R extends Requires, S extends z.ZodType, O>(parts: ActionParts<R, S, O>, form: FormData) {
  const code = form.get('code');
  try {
    const ctx = await requestContext(parts.requires, typeof code === 'string' ? { code } : {});
    const parsed = parts.input.safeParse(readForm(form));
    if (!parsed.success) {
      const message = 'Some of that needs another look. What you typed is kept.';
      return { state: { status: 'invalid', message, fieldErrors: fieldErrorsOf(parsed.error), values: typedValues(form) } satisfies FormState };
    }
    return { result: await parts.run(ctx, parsed.data), ctx };
  } catch (error) {
    unstable_rethrow(error);
    if (error instanceof Refusal) return { state: refusedState(error, form) };
    log.error('action failed', error);
    throw new Error('an action failed: its line in the log says why'); // the framework prints what is thrown, and a query's error holds what was typed
  }
}

function refusedState(refusal: Refusal, form: FormData): FormState {
  const fields = Object.entries(refusal.detail.fields ?? {}).map(([name, sentence]) => [name, [sentence]]);
  return { status: 'refused', code: refusal.code, message: refusal.sentence, fieldErrors: Object.fromEntries(fields), values: typedValues(form) };
}
