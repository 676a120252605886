import Link from 'next/link';

export type ContentsLine = { href: string; label: string; /** How many there are, or a short word such as "Thu". */ count?: number | string };
export type ContentsGroup = readonly ContentsLine[];

/** The staff copy's contents: dotted leaders to the counts. On a phone they fold away under one word. */
export function Contents({ groups, here }: { groups: readonly ContentsGroup[]; here: string }) {
  return (
    <>
      <details className="border-b border-rule lg:hidden print:hidden">
        <summary className="link flex min-h-11 cursor-pointer items-center font-semibold">Contents</summary>
        <nav aria-label="Contents" className="pb-3">
          <Lines groups={groups} here={here} />
        </nav>
      </details>
      <nav aria-label="Contents" className="hidden lg:block print:hidden">
        <p className="font-heading text-[1.1875em] leading-tight font-extrabold">Contents</p>
        <Lines groups={groups} here={here} />
      </nav>
    </>
  );
}

function Lines({ groups, here }: { groups: readonly ContentsGroup[]; here: string }) {
  return groups.map((group, index) => (
    <ul key={index} className="mt-2">
      {group.map((line) => (
        <ContentsItem key={line.href} line={line} isHere={line.href === here} />
      ))}
    </ul>
  ));
}

function ContentsItem({ line, isHere }: { line: ContentsLine; isHere: boolean }) {
  return (
    <li className={`flex items-baseline leading-tight ${isHere ? 'text-damson' : ''}`}>
      <Link
        href={line.href}
        className={`inline-flex min-h-11 items-center hover:underline pointer-fine:min-h-7 ${isHere ? 'font-bold' : ''}`}
        {...(isHere ? { 'aria-current': 'page' } : {})}
      >
        {line.label}
      </Link>
      <span className={`mx-1.5 flex-1 -translate-y-1 border-b-[1.5px] border-dotted ${isHere ? 'border-damson' : 'border-edge'}`} aria-hidden="true" />
      {line.count === undefined ? null : <span className="figures">{line.count}</span>}
    </li>
  );
}
