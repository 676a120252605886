import type { ReactNode } from 'react';

export type Split = 'halves' | 'thirds' | 'main-aside';

/** Columns parted by hairlines on a wide sheet, one below the other on a phone and in large print. */
export function Columns({ split, children }: { split: Split; children: ReactNode }) {
  return <div className={`columns-ruled columns-${split}`}>{children}</div>;
}

/** The page's text with what grows in its right margin; on a phone the margin comes after it. */
export function WithMargin({ margin, children }: { margin: ReactNode; children: ReactNode }) {
  return (
    <div className="with-margin">
      <div className="min-w-0">{children}</div>
      {margin}
    </div>
  );
}

type PartProps = { title: ReactNode; id?: string; /** `first`: no hairline above, it follows the rail rule. */ place?: 'first' | 'next'; children: ReactNode };

/** One part of a page: a hairline, a heading, what it says. */
export function Part({ title, id, place = 'next', children }: PartProps) {
  return (
    <section {...(id === undefined ? {} : { id })} className={place === 'first' ? 'part-first' : 'part'}>
      <h2 className="mb-3">{title}</h2>
      {children}
    </section>
  );
}
