export type SignKind = 'note' | 'caution' | 'danger' | 'clear';

const inks: Record<SignKind, string> = { note: 'text-conifer', caution: 'text-caution', danger: 'text-danger', clear: 'text-clear' };

/* Each has a shape of its own, so that none is told by its colour: leaf, triangle, square, ring. */
const shapes: Record<SignKind, string> = {
  note: 'M4 20C3 10 9 4 20.500 3.500 20.500 15 15 21 7 19.500M4 21.500C7 16 10.500 12 15 9',
  caution: 'M12 2.500 22.500 21h-21ZM12 9v6M12 17v2',
  danger: 'M3 3h18v18H3ZM12 7v7M12 16v2.200',
  clear: 'M12 2.500a9.500 9.500 0 1 1 0 19 9.500 9.500 0 0 1 0-19ZM7.500 12.500l3.200 3.500L16.500 9',
};

/** The sign that stands before a caution, a danger, an all-clear or a note. Give `word` where none stands beside it. */
export function Sign({ kind, word }: { kind: SignKind; word?: string }) {
  return (
    <>
      <svg viewBox="0 0 24 24" className={`inline-block size-[1.3em] shrink-0 align-[-0.25em] ${inks[kind]}`} aria-hidden="true">
        <path d={shapes[kind]} fill="none" stroke="currentColor" strokeWidth="2.300" strokeLinejoin="round" />
      </svg>
      {word === undefined ? null : <span className="sr-only">{word}: </span>}
    </>
  );
}
