import type { CSSProperties, ReactNode } from 'react';
import { cardClass } from '@/components/drawing/card-class';

/** What the sheet is printed on: a ticket's own colour when the gate is open, else white. */
export type GateGround = 'card' | 'white';

type GateSheetProps = { stopNumber: number; ground: GateGround; scheme: 'day' | 'sun'; children: ReactNode };

const vars = (values: Record<`--${string}`, string>): CSSProperties => values;

/**
 * The gate's whole screen. Always by day, whatever the phone prefers: it stands in the sun. The sun scheme is black
 * on white with heavier lines, and has no tint to read.
 */
export function GateSheet({ stopNumber, ground, scheme, children }: GateSheetProps) {
  const isSun = scheme === 'sun';
  const paper = 'var(--color-sun-paper)';
  const printedOn = ground === 'card' && !isSun ? 'var(--card)' : paper;
  return (
    <main
      id="page"
      tabIndex={-1}
      data-scheme="day"
      data-sun={isSun ? 'yes' : 'no'}
      className={`group ${cardClass(stopNumber)} min-h-dvh bg-(--gate-ground) text-lg leading-snug ${isSun ? 'font-semibold text-sun-ink' : 'text-card-ink'}`}
      style={vars({ '--gate-ground': printedOn, '--ground': printedOn, ...(isSun ? { '--card': paper } : {}) })}
    >
      {children}
    </main>
  );
}
