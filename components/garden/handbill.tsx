import type { ReactNode } from 'react';
import { Fragment } from 'react';

export type HandbillLine = { label: string; words: ReactNode };

/** What, when, where and how to come, as a handbill sets them: a name in italics, what is so in strong type, hairlines between. */
export function Handbill({ lines }: { lines: readonly HandbillLine[] }) {
  return (
    <dl className="grid grid-cols-[minmax(5.5rem,auto)_minmax(0,1fr)] large-print:block">
      {lines.map(({ label, words }, index) => (
        <Fragment key={label}>
          <dt className={`note py-3 pr-5 text-[1.1667rem] leading-snug text-ink-soft ${index === 0 ? '' : 'border-t border-rule'}`}>{label}</dt>
          <dd className={`py-3 text-lg leading-snug ${index === 0 ? '' : 'border-t border-rule large-print:border-t-0'} large-print:pt-0`}>{words}</dd>
        </Fragment>
      ))}
    </dl>
  );
}
