const paths = {
  right: 'M4 10h11M11 5.500 15.500 10 11 14.500',
  left: 'M16 10H5M9 5.500 4.500 10 9 14.500',
  up: 'M5 12.500 10 7l5 5.500',
  down: 'M5 7.500 10 13l5-5.500',
  tick: 'M3.500 10.500 8 15l8.500-10',
  cross: 'M4.500 4.500l11 11M15.500 4.500l-11 11',
  plus: 'M10 3.500v13M3.500 10h13',
  minus: 'M3.500 10h13',
  search: 'M8.500 3a5.500 5.500 0 1 1 0 11 5.500 5.500 0 0 1 0-11ZM12.500 12.500 17 17',
  calendar: 'M3 5h14v12H3ZM3 9h14M7 3v4M13 3v4',
  letter: 'M2.500 5h15v11h-15ZM2.500 5.500 10 11.500l7.500-6',
  print: 'M6 8V3h8v5M6 14H3V8h14v6h-3M6 12h8v5H6Z',
  download: 'M10 3v9M6 8.500 10 12.500l4-4M3.500 16.500h13',
  clock: 'M10 2.500a7.500 7.500 0 1 1 0 15 7.500 7.500 0 0 1 0-15ZM10 6v4.500l3 2',
  person: 'M10 3.500a2.800 2.800 0 1 1 0 5.600 2.800 2.800 0 0 1 0-5.600ZM4.500 17.500c0-4 2-6.300 5.500-6.300s5.500 2.300 5.500 6.300',
  key: 'M6.500 6a4 4 0 1 1 0 8 4 4 0 0 1 0-8ZM10.500 10H18M15 10v3',
  map: 'M3 5l5-2 4 2 5-2v12l-5 2-4-2-5 2ZM8 3v12M12 5v12',
  copy: 'M7 6.500h9.500V17H7ZM13 6.500V3H3.500v10.500H7',
} as const;

export type IconName = keyof typeof paths;

/** A small line drawing that goes with a word. It is never read out: the word is. */
export function Icon({ name }: { name: IconName }) {
  return (
    <svg viewBox="0 0 20 20" className="inline-block size-[1.1em] shrink-0 align-[-0.15em]" aria-hidden="true">
      <path d={paths[name]} fill="none" stroke="currentColor" strokeWidth="1.9" strokeLinejoin="round" strokeLinecap="square" />
    </svg>
  );
}
