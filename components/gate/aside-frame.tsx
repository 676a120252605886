import type { ReactNode } from 'react';
import { takeFocus } from './take-focus';

/** A screen without the camera: its sentence, what it is about, and its presses by the thumb. */
export function AsideFrame({ title, children, presses }: { title: string; children: ReactNode; presses: ReactNode }) {
  return (
    <div className="flex flex-1 flex-col px-5 pt-5 pb-5">
      <h2 ref={takeFocus} tabIndex={-1} className="font-heading text-[2.75rem] leading-none font-black tracking-tight">{title}</h2>
      <div className="flex-1 py-4 text-xl leading-snug">{children}</div>
      <div className="grid gap-4">{presses}</div>
    </div>
  );
}
