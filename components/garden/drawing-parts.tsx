import type { ReactNode } from 'react';

type DrawingProps = { width: number; height: number; left?: number; top?: number; caption: string; align?: 'left' | 'centre'; children: ReactNode };

/** A drawing with its line below. Its units are an eighteenth of a rem, so that the lettering grows with large print. */
export function Drawing({ width, height, left = 0, top = 0, caption, align = 'left', children }: DrawingProps) {
  return (
    <div style={{ width: `${(width / 18).toFixed(2)}rem` }} className="flex max-w-full flex-col gap-2">
      <svg viewBox={`${left} ${top} ${width} ${height}`} className="block h-auto w-full overflow-visible">
        {children}
      </svg>
      <p className={`note leading-snug ${align === 'centre' ? 'text-center' : ''}`}>{caption}</p>
    </div>
  );
}

/** Ink outlines of the dimensioned drawing: what is built, and what measures it. */
export const BUILT = { stroke: 'var(--color-ink)', strokeWidth: 2.4, fill: 'none' } as const;
export const MEASURE = { stroke: 'var(--color-ink)', strokeWidth: 1.2, fill: 'none' } as const;

const head = (x: number, y: number, turn: number) => <path key={`${x} ${y}`} transform={`translate(${x} ${y}) rotate(${turn})`} d="M0 0-11-3.6V3.6Z" className="fill-ink" />;

/** A measured length along the ground, its figure below. */
export function WidthMark({ from, to, y, figure }: { from: number; to: number; y: number; figure: string }) {
  return (
    <g>
      <path {...MEASURE} d={`M${from} ${y - 20}V${y + 6}M${to} ${y - 20}V${y + 6}M${from} ${y}H${to}`} />
      {head(from, y, 180)}
      {head(to, y, 0)}
      <text x={(from + to) / 2} y={y + 28} textAnchor="middle" className="fill-ink font-heading font-bold" fontSize="24">
        {figure}
      </text>
    </g>
  );
}

/** A measured height, its figure standing beside it. */
export function HeightMark({ x, from, to, figure }: { x: number; from: number; to: number; figure: string }) {
  const isShort = from - to < 40;
  return (
    <g>
      <path {...MEASURE} d={`M${x - 6} ${from}H${x + 14}M${x - 6} ${to}H${x + 14}M${x} ${from}V${to}`} />
      {isShort ? null : [head(x, from, 90), head(x, to, -90)]}
      <text transform={`translate(${x - 10} ${(from + to) / 2}) rotate(-90)`} textAnchor="middle" className="fill-ink font-heading font-bold" fontSize="24">
        {figure}
      </text>
    </g>
  );
}
