import Link from 'next/link';
import { NavLink, type NavLine } from './nav';

const PUBLIC: readonly NavLine[] = [
  { href: '/open-days', label: 'Open days' },
  { href: '/gardens', label: 'Gardens' },
  { href: '/membership', label: 'Membership' },
  { href: '/visiting', label: 'Visiting' },
];

type ImprintProps = { clubName: string; here: string | undefined; account: NavLine };

/** The sheet's first line: the club's name and where else to go. On a phone, a menu that needs no JavaScript. */
export function Imprint({ clubName, here, account }: ImprintProps) {
  return (
    <header className="relative z-10 flex flex-wrap items-baseline gap-x-7 print:block">
      <Link href="/" className="mr-auto py-1 pr-20 font-heading text-[1.3333rem] leading-tight font-bold tracking-[-0.004em] text-ink md:pr-0">
        {clubName}
      </Link>
      <details className="group w-full md:hidden print:hidden">
        <summary className="link absolute top-0 right-0 flex min-h-11 cursor-pointer list-none items-center [&::-webkit-details-marker]:hidden">
          Menu
        </summary>
        <nav aria-label="The club" className="mt-2 grid border-y border-edge py-2">
          <Links here={here} account={account} />
        </nav>
      </details>
      <nav aria-label="The club" className="hidden flex-wrap gap-x-7 md:flex print:hidden">
        <Links here={here} account={account} />
      </nav>
    </header>
  );
}

function Links({ here, account }: { here: string | undefined; account: NavLine }) {
  return (
    <>
      {PUBLIC.map((line) => (
        <NavLink key={line.href} line={line} here={here} />
      ))}
      <LargePrintLink />
      <Link href={account.href} className="link inline-flex min-h-11 items-center" {...(account.href === here ? { 'aria-current': 'page' } : {})}>
        {account.label}
      </Link>
    </>
  );
}

/** Turns large print on or off. A plain link: it sets a cookie, so it must never be fetched ahead of the click. */
export function LargePrintLink() {
  return (
    <a href="/large-print" className="inline-flex min-h-11 items-center text-inherit hover:underline hover:underline-offset-4">
      <span className="large-print:hidden">Large print</span>
      <span className="hidden large-print:inline">Usual print</span>
    </a>
  );
}
