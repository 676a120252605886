export type ControlWidth = 'heads' | 'short' | 'half' | 'full';

const widths: Record<ControlWidth, string> = { heads: 'w-20 text-center', short: 'w-44', half: 'w-72', full: 'w-full' };

/** The class names that typed and chosen controls share. */
export const controlLook = (width: ControlWidth, face: 'text' | 'mono'): string =>
  `edged min-h-11 max-w-full bg-paper px-3 py-1.5 text-lg font-medium text-ink placeholder:text-ink-soft aria-invalid:border-[2.5px] aria-invalid:border-danger disabled:bg-mist disabled:text-ink-soft ${face === 'mono' ? 'figures' : 'font-text'} ${widths[width]}`;
