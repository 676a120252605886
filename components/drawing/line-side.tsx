/* What stands beside the rail: each on its own baseline, wheels' level at the foot. */

/** The end of the line: nothing went through. Its target is the only red thing on the sheet. */
export function BufferStop({ height = 64 }: { height?: number }) {
  return (
    <svg width={Math.round(height * 1.2)} height={height} viewBox="-12 0 64 52" className="block" aria-hidden="true">
      <path d="M2 52V8h8v8l40 36H38L10 26v26ZM0 4h12v10H0Z" fill="currentColor" />
      <path d="M-11 2h4v4H0v6h-7v4h-4Z" className="fill-danger" />
    </svg>
  );
}

/** The engine shed: the day is done. */
export function Shed({ height = 62 }: { height?: number }) {
  return (
    <svg width={Math.round((height * 118) / 62)} height={height} viewBox="0 0 118 62" className="block" aria-hidden="true">
      <path d="M4 62V22L59 2l55 20v40h-10V30H14v32Z" fill="currentColor" />
      <path d="M0 24 59 1l59 23" fill="none" stroke="currentColor" strokeWidth="4" />
      <circle cx="59" cy="17" r="5" fill="var(--ground)" />
    </svg>
  );
}

/** A semaphore arm: lowered when there is a signal, level when there is none. Its word stands beside it. */
export function Semaphore({ arm, height = 28 }: { arm: 'lowered' | 'level'; height?: number }) {
  return (
    <svg width={Math.round((height * 26) / 28)} height={height} viewBox="0 0 26 28" className="block" aria-hidden="true">
      <path d="M6 27V2M2 27h8" stroke="currentColor" strokeWidth="3" />
      <path d={arm === 'lowered' ? 'M6 8.200 23 15.600 21.200 20 4.400 12.600z' : 'M4 6h20v5.400H4z'} fill="currentColor" />
    </svg>
  );
}

/** A pencil arrow from a note in the margin to its row. */
export function PencilArrow() {
  return (
    <svg width="40" height="24" viewBox="0 0 40 24" className="block text-pencil" fill="none" stroke="currentColor" strokeWidth="1.600" strokeLinecap="round" aria-hidden="true">
      <path d="M2 18C12 8 24 17 38.500 13" />
      <path d="M33 8.500l6 4.500-7.500 3.500" />
    </svg>
  );
}
