export type ButtonTone = 'main' | 'plain' | 'danger' | 'bare';
export type ButtonSize = 'usual' | 'small' | 'gate';

const tones: Record<ButtonTone, string> = {
  main: 'border-2 border-damson bg-damson text-on-damson',
  plain: 'border-2 border-damson text-damson',
  danger: 'border-2 border-danger text-danger',
  bare: 'text-damson underline decoration-[1.5px] underline-offset-[0.18em]',
};

/* Small: 28px where the pointer is fine, a whole fingertip on touch. Gate: gloves, sun, a queue. */
const sizes: Record<ButtonSize, string> = {
  usual: 'min-h-12 py-2 text-lg',
  small: 'min-h-11 py-0.5 text-base pointer-fine:min-h-7',
  gate: 'min-h-16 py-3 text-2xl',
};

const widths: Record<ButtonSize, string> = { usual: 'px-6', small: 'px-3', gate: 'px-8' };

/** The class names that buttons, and links set as buttons, share. */
export function buttonLook(tone: ButtonTone, size: ButtonSize): string {
  const width = tone === 'bare' ? '' : widths[size];
  return `inline-flex cursor-pointer justify-self-start items-center justify-center gap-2 text-center leading-tight font-semibold hover:underline hover:underline-offset-4 aria-disabled:cursor-default aria-disabled:opacity-60 disabled:cursor-default disabled:opacity-60 print:hidden ${tones[tone]} ${sizes[size]} ${width}`;
}
