import Link from 'next/link';

export type NavLine = { href: string; label: string };

const look = 'inline-flex min-h-11 items-center text-ink hover:underline hover:underline-offset-4 aria-[current]:underline aria-[current]:decoration-conifer aria-[current]:decoration-[3px] aria-[current]:underline-offset-[0.3em]';

/** One link of a line of links; the page's own is marked. Links that change something are not fetched ahead. */
export function NavLink({ line, here }: { line: NavLine; here: string | undefined }) {
  return (
    <Link href={line.href} className={look} {...(line.href === here ? { 'aria-current': 'page' } : {})}>
      {line.label}
    </Link>
  );
}
