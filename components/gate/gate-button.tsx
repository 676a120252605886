import type { ReactNode } from 'react';

type GateButtonProps = { tone?: 'plain' | 'main' | 'bare'; onPress: () => void; isPressed?: boolean; isOff?: boolean; children: ReactNode };

const LOOKS = {
  plain: 'border-current bg-sun-paper px-2',
  main: 'px-2 border-damson bg-damson text-on-damson group-data-[sun=yes]:border-sun-ink group-data-[sun=yes]:bg-sun-ink group-data-[sun=yes]:text-sun-paper',
  bare: 'border-transparent underline decoration-2 underline-offset-4',
};

/** A gate's button: for gloves, sun and a queue. Never lower than 56 px; one `main` a screen. */
export function GateButton({ tone = 'plain', onPress, isPressed, isOff = false, children }: GateButtonProps) {
  return (
    <button
      type="button"
      disabled={isOff}
      onClick={onPress}
      {...(isPressed === undefined ? {} : { 'aria-pressed': isPressed })}
      className={`min-h-14 w-full cursor-pointer border-[2.5px] py-2 text-center text-lg leading-tight font-bold group-data-[sun=yes]:border-[3.5px] disabled:cursor-default disabled:border-dashed disabled:font-normal aria-pressed:bg-card-ink aria-pressed:text-sun-paper group-data-[sun=yes]:aria-pressed:bg-sun-ink ${LOOKS[tone]}`}
    >
      {children}
    </button>
  );
}
