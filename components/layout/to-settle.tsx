import Link from 'next/link';
import type { ReactNode } from 'react';

export type Unsettled = {
  id: string;
  /** By when: "today", "Thursday", "31 May". */
  by: ReactNode;
  sentence: ReactNode;
  link: { href: string; label: string };
  /** The one that cannot wait is underlined in ink. */
  weight?: 'now' | 'usual';
};

const letter = (index: number) => String.fromCharCode(97 + (index % 26));

/** What waits for someone, lettered, each with a date and one link. */
export function ToSettle({ items }: { items: readonly Unsettled[] }) {
  return (
    <section aria-labelledby="to-settle" className="mb-8">
      <h2 id="to-settle">To settle</h2>
      {items.length === 0 ? <p className="mt-2 text-ink-soft">Nothing waits here for now.</p> : null}
      <ol className="mt-2">
        {items.map((item, index) => (
          <li key={item.id} className={`settle-row border-b ${item.weight === 'now' ? 'border-ink' : 'border-rule'}`}>
            <span className="font-heading text-[1.1875em] leading-none font-extrabold" aria-hidden="true">
              {letter(index)}
            </span>
            <span>{item.by}</span>
            <span className={`settle-sentence ${item.weight === 'now' ? 'font-semibold' : ''}`}>{item.sentence}</span>
            <Link href={item.link.href} className="link settle-link inline-flex min-h-11 items-center pointer-fine:min-h-7">
              {item.link.label}
            </Link>
          </li>
        ))}
      </ol>
    </section>
  );
}
