/** A name that would be longer than `most` letters goes on two lines, parted where the halves come out most alike. */
export function nameLines(name: string, most: number): string[] {
  if (name.length <= most) return [name];
  const words = name.split(' ');
  const splits = words.slice(1).map((_, i) => [words.slice(0, i + 1).join(' '), words.slice(i + 1).join(' ')]);
  const longest = (lines: readonly string[]): number => Math.max(...lines.map((line) => line.length));
  return splits.reduce((best, lines) => (longest(lines) < longest(best) ? lines : best), [name]);
}

interface PlaceNameProps {
  readonly x: number;
  readonly y: number;
  readonly name: string;
  readonly size: number;
  readonly anchor?: 'middle' | 'start';
  /** How wide the lettering may be before it is parted, in points of the sheet. */
  readonly within?: number;
}

/** A place's name in italics on a paper halo, so that it reads over hatching and roads. */
export function PlaceName({ x, y, name, size, anchor = 'middle', within = Infinity }: PlaceNameProps) {
  return (
    <text textAnchor={anchor} fontSize={size} className="fill-ink stroke-paper font-heading italic" strokeWidth={size * 0.3} strokeLinejoin="round" paintOrder="stroke">
      {nameLines(name, within / (size * 0.5)).map((line, i) => (
        <tspan key={line} x={x.toFixed(1)} y={(y + i * size * 1.12).toFixed(1)}>{line}</tspan>
      ))}
    </text>
  );
}

/** How far one gets by car in five minutes, as the crow flies. */
export function ScaleBar({ x, y, length }: { readonly x: number; readonly y: number; readonly length: number }) {
  const fifths = [0.2, 0.4, 0.6, 0.8].map((share) => `M${(share * length).toFixed(1)} -4V4`).join('');
  return (
    <g transform={`translate(${x} ${y})`}>
      <path d={`M-5 0H${length + 5}`} className="stroke-paper" strokeWidth="18" />
      <path d={`M0 0H${length}M0 -6V6M${length} -6V6${fifths}`} className="stroke-ink" strokeWidth="2" fill="none" />
      <text x={length / 2} y="-12" textAnchor="middle" fontSize="19" className="fill-ink stroke-paper font-text" strokeWidth="5" paintOrder="stroke" strokeLinejoin="round">5 min by car</text>
    </g>
  );
}

/** The double frame round a sheet. */
export function DoubleFrame({ width, height }: { readonly width: number; readonly height: number }) {
  return (
    <g className="stroke-ink" fill="none">
      <path d={`M1.5 1.5H${width - 1.5}V${height - 1.5}H1.5Z`} strokeWidth="3" />
      <path d={`M7 7H${width - 7}V${height - 7}H7Z`} strokeWidth="1" />
    </g>
  );
}
