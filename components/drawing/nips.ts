/** A gate's nip: the shape its punch takes out of the lower edge of a card. */
export type Nip = {
  name: string;
  /** Open at the edge (y 0) and growing up to 17, between x 2 and 22. */
  path: string;
};

/* By stop number. An open day has at most 14 stops, and no two share a shape. */
const NIPS: readonly [Nip, ...Nip[]] = [
  { name: 'round', path: 'M4 0A8 8 0 0 0 20 0' },
  { name: 'square', path: 'M5 0V10H19V0' },
  { name: 'wedge', path: 'M3 0L12 14L21 0' },
  { name: 'cross', path: 'M9.500 0V3.500H4.500V8.500H9.500V14H14.500V8.500H19.500V3.500H14.500V0' },
  { name: 'leaf', path: 'M10.800 0C4 3 4 11 12 16C20 11 20 3 13.200 0' },
  { name: 'bell', path: 'M8.400 0C9 5 7.600 8 4 11.400H10C10 14.400 14 14.400 14 11.400H20C16.400 8 15 5 15.600 0' },
  { name: 'star', path: 'M9.600 0L9.200 4.400L3.400 5.200L7.800 8.800L6.400 14.600L12 11.600L17.600 14.600L16.200 8.800L20.600 5.200L14.800 4.400L14.400 0' },
  { name: 'half-moon', path: 'M7 0C1.500 5 4 14.500 15.500 16.500C10.500 12 10.500 5 16.500 0' },
  { name: 'fish', path: 'M5.500 0L10 4.500C4.600 8 6 14 12 17C18 14 19.400 8 14 4.500L18.500 0' },
  { name: 'key', path: 'M10.500 0V1.500H6.500V4.500H10.500V8A4.600 4.600 0 1 0 13.500 8V0' },
  { name: 'crown', path: 'M5.500 0L3 11.500L8 7.500L12 15.500L16 7.500L21 11.500L18.500 0' },
  { name: 'arrow', path: 'M9.500 0V7.500H4.500L12 16L19.500 7.500H14.500V0' },
  { name: 'acorn', path: 'M10 0C6 .8 4 3 4 6.500H6C6 11 8.500 13.500 12 17C15.500 13.500 18 11 18 6.500H20C20 3 18 .8 14 0' },
  { name: 'ring', path: 'M11 0V2.600A7 7 0 1 0 13 2.600V0M12 6.600A3 3 0 1 0 12.010 6.600' },
];

/** The nip of a stop by its number 1 to 14. */
export const nipOf = (stopNumber: number): Nip => NIPS[stopNumber - 1] ?? NIPS[0];
