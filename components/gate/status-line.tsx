import { NipCard } from '@/components/drawing/nip';

type StatusLineProps = { stopNumber: number; garden: string; hasSignal: boolean; words: string };

/** Which gate this is, and how fresh its list: the arm is lowered for a signal and level for none. */
export function StatusLine({ stopNumber, garden, hasSignal, words }: StatusLineProps) {
  return (
    <header className="flex min-h-14 flex-wrap items-center gap-x-2 gap-y-1 border-b-[1.5px] border-current px-3 py-1 group-data-[sun=yes]:border-b-[3.5px]">
      <NipCard stopNumber={stopNumber} width={46} />
      <h1 className="flex-1 text-lg leading-none font-extrabold whitespace-nowrap">
        <span className="sr-only">The gate of garden </span>
        {stopNumber} {garden}
      </h1>
      <p role="status" className="flex items-center gap-1.5 text-base whitespace-nowrap">
        <svg aria-hidden width="22" height="24" viewBox="0 0 26 28">
          <path d="M6 27V2" stroke="currentColor" strokeWidth="3" />
          <path d={hasSignal ? 'M6 8.2 23 15.6 21.2 20 4.4 12.6z' : 'M4 6h20v5.4H4z'} fill="currentColor" />
        </svg>
        {words}
      </p>
    </header>
  );
}
