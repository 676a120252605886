import { BUILT, Drawing, HeightMark, MEASURE, WidthMark } from './drawing-parts';

/** Units of the drawing to a millimetre of garden: a grown-up of 1.71 m stands 189 high. */
const PER_MM = 0.1107;
const BENCH = 130;
const USUAL_PATH_MM = 1000;
const USUAL_HEIGHT_MM = 300;

type PathSectionProps = {
  pathWidthMm: number | null;
  trackHeightMm: number | null;
  hasWater: boolean;
  waterWord: string;
  pathFigure: string | null;
  heightFigure: string | null;
  caption: string;
};

/** The path cut through: the bank the line runs on, the width between, a grown-up and a child, and any water beyond. */
export function PathSection({ pathWidthMm, trackHeightMm, hasWater, waterWord, pathFigure, heightFigure, caption }: PathSectionProps) {
  const bank = Math.max(6, Math.min(150, (trackHeightMm ?? USUAL_HEIGHT_MM) * PER_MM));
  const path = Math.max(64, Math.min(260, (pathWidthMm ?? USUAL_PATH_MM) * PER_MM));
  const far = BENCH + path;
  const left = heightFigure === null ? -2 : -44;
  return (
    <Drawing left={left} top={-196} width={far + (hasWater ? 78 : 34) - left} height={pathFigure === null ? 214 : 268} caption={caption}>
      <Bank height={bank} />
      <path {...BUILT} d={`M${BENCH} 0H${far}`} />
      <path d={gravel(far)} stroke="var(--color-ink)" strokeWidth="3" strokeLinecap="round" />
      <g transform={`translate(${BENCH + path * 0.32} 0) scale(1.87)`}>
        <Grownup />
      </g>
      <g transform={`translate(${BENCH + path * 0.32 + Math.max(44, path * 0.42)} 0) scale(1.144)`}>
        <Child />
      </g>
      {hasWater ? <Pond at={far} word={waterWord} /> : <Border at={far} />}
      {pathFigure === null ? null : <WidthMark from={BENCH} to={far} y={38} figure={pathFigure} />}
      {heightFigure === null ? null : <HeightMark x={-18} from={0} to={-bank} figure={heightFigure} />}
    </Drawing>
  );
}

const gravel = (far: number): string => Array.from({ length: Math.floor((far - BENCH) / 3.7) }, (_, i) => `M${(BENCH + 5 + i * 3.7).toFixed(1)} ${[4, 6.6, 9.2][i % 3]}h0`).join('');
const gouges = (height: number): string => Array.from({ length: Math.max(2, Math.round(height / 1.7)) }, (_, i) => `M${8 + ((i * 37) % 104)} ${(-6 - ((i * 11.3) % Math.max(1, height - 12))).toFixed(1)}l5-1.5`).join('');

function Bank({ height }: { height: number }) {
  return (
    <>
      <path d={`M0 0V${-height}H${BENCH}V0Z`} className="fill-ink" />
      <path d={gouges(height)} stroke="var(--color-paper)" strokeWidth="1.5" />
      <path d={`M${BENCH - 9} ${-height - 4}h10V0h-10Z`} {...BUILT} className="fill-paper" />
      <g transform={`translate(28 ${-height})`}>
        <path className="fill-ink" d="M0-57.200 2.100-49.200 1.300-51.200 4-43.100 2.500-45.100 5.700-37.100 3.600-39.100 7.400-31 4.600-33 9.100-25 5.600-27 10.700-19 6.600-21 12.300-12.900 7.600-14.900 13.900-6.900 8.600-8.900 15.400-.900 9.600-2.900 2-2V0H-2V-2L-9.600-2.900-15.400-.900-8.600-8.900-13.900-6.900-7.600-14.900-12.300-12.900-6.600-21-10.700-19-5.600-27-9.100-25-4.600-33-7.400-31-3.600-39.100-5.700-37.100-2.500-45.100-4-43.100-1.300-51.200-2.100-49.200Z" />
        <path stroke="var(--color-paper)" strokeWidth="1.300" d="M-2-34l-2 5M4-28l2 5M-4-24l2 5M2-18l-2 5M-6-12l-2 5M6-12l2 5M0-42l1 4" />
      </g>
      <g transform={`translate(92 ${-height})`}>
        <path d="M-11 0H11M-9-2V-4M9-2V-4" stroke="var(--color-ink)" strokeWidth="2.400" />
        <path d="M-7-3V-12C-7-19 7-19 7-12V-3ZM-2.400-16V-21H2.400V-16" className="fill-ink" />
        <circle cy="-10" r="3.200" className="fill-paper" />
      </g>
    </>
  );
}

function Grownup() {
  return (
    <>
      <circle cy="-92" r="7.400" className="fill-ink" />
      <path d="M-11-91C-9-97 9-97 11-91ZM-8-96V-101H8V-96Z" className="fill-ink" />
      <path d="M-10-82H10L13-50 9-48 10-40 9 0H1L0-36-1 0H-9L-10-40-9-48-13-50Z" className="fill-ink" />
      <path d="M10-78 17-54M-10-78-16-54" stroke="var(--color-ink)" strokeWidth="5" strokeLinecap="round" />
      <path d="M0-80V-46" stroke="var(--color-paper)" strokeWidth="1.200" />
    </>
  );
}

function Child() {
  return (
    <>
      <circle cy="-88" r="11" className="fill-ink" />
      <path d="M-13-74H13L17-38 11-36 12-30H-12L-11-36-17-38Z" className="fill-ink" />
      <path d="M-10-32V-4H-14V0H-2V-30ZM2-30V0H14V-4H10V-32Z" className="fill-ink" />
      <path d="M-16-66-34-84" stroke="var(--color-ink)" strokeWidth="6" strokeLinecap="round" />
    </>
  );
}

function Pond({ at, word }: { at: number; word: string }) {
  return (
    <g transform={`translate(${at} 0)`}>
      <path {...BUILT} d="M0 0V-84M0-77H12M0-44H12M13 0V-84M14 0C30 24 40 28 72 28" />
      <path {...MEASURE} d="M22 6H72M34 13h18M50 18h16" />
      <text x="76" y="52" textAnchor="end" className="fill-ink font-heading italic" fontSize="18">
        {word}
      </text>
    </g>
  );
}

function Border({ at }: { at: number }) {
  return (
    <g transform={`translate(${at} 0)`}>
      <path {...BUILT} d="M0-6V0H30" />
      <path d="M8 0q-2-16-6-22M13 0q0-22-2-34M18 0q3-18 9-24M23 0q1-10 6-14" {...BUILT} strokeWidth="2" />
      <circle cx="11" cy="-35" r="4" className="fill-ink" />
      <circle cx="27" cy="-25" r="3.400" className="fill-ink" />
    </g>
  );
}
