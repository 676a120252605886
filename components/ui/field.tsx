import type { ReactNode } from 'react';

/** The attributes a control needs so that its hint and its mistake are read out with it. */
export type FieldControl = { id: string; 'aria-describedby'?: string; 'aria-invalid'?: true; 'aria-required'?: true };

export type FieldProps = {
  id: string;
  label: ReactNode;
  hint?: ReactNode;
  errors?: readonly string[];
  required?: boolean;
  /** A group of choices is labelled by a legend instead of a label. */
  as?: 'field' | 'group';
  /** `filling`: as wide as the column allows; `fitting`: only as wide as its control, so that a note stands close by. */
  width?: 'filling' | 'fitting';
  children: (control: FieldControl) => ReactNode;
};

export const fieldWidths = { filling: 'min-w-0 max-w-lg flex-[1_1_16rem]', fitting: 'min-w-0 max-w-lg flex-initial' };

const describedBy = (...ids: (string | false)[]) => ids.filter((id) => id !== false).join(' ');

/** A label, a hint, a control, and any mistake as a note in the margin beside it. */
export function Field({ id, label, hint, errors = [], required = false, as = 'field', width = 'filling', children }: FieldProps) {
  const hasErrors = errors.length > 0;
  const described = describedBy(hint !== undefined && `${id}-hint`, hasErrors && `${id}-error`);
  const control: FieldControl = {
    id,
    ...(described === '' ? {} : { 'aria-describedby': described }),
    ...(hasErrors ? { 'aria-invalid': true } : {}),
    ...(required ? { 'aria-required': true } : {}),
  };
  const inner = (
    <>
      {hint === undefined ? null : (
        <p id={`${id}-hint`} className="mb-2 text-ink-soft">
          {hint}
        </p>
      )}
      {children(control)}
    </>
  );
  return (
    <div className="flex min-w-0 max-w-full flex-wrap items-start gap-x-5 gap-y-2">
      {as === 'group' ? (
        <fieldset
          className={fieldWidths[width]}
          id={id}
          {...(described === '' ? {} : { 'aria-describedby': described })}
        >
          <legend className="mb-1.5 font-semibold">{label}</legend>
          {inner}
        </fieldset>
      ) : (
        <div className={fieldWidths[width]}>
          <label htmlFor={id} className="mb-1.5 block leading-tight font-semibold">
            {label}
          </label>
          {inner}
        </div>
      )}
      {hasErrors ? <MarginNote id={`${id}-error`} sentences={errors} /> : null}
    </div>
  );
}

/** A mistake, said in the margin: what to do next, in the ink of a correction. */
export function MarginNote({ id, sentences }: { id: string; sentences: readonly string[] }) {
  return (
    <p id={id} className="note max-w-xs flex-[1_1_11rem] border-l-[3px] border-danger py-0.5 pl-3.5 leading-snug text-danger">
      <span className="sr-only">Mistake: </span>
      {sentences.join(' ')}
    </p>
  );
}
