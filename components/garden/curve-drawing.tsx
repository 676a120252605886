import { BUILT, Drawing, MEASURE } from './drawing-parts';

const CENTRE = { x: 20, y: 170 };
const INNER = 139;
const GAUGE = 10;

const on = (degrees: number, radius: number): string => {
  const turn = (degrees * Math.PI) / 180;
  return `${(CENTRE.x + Math.cos(turn) * radius).toFixed(1)} ${(CENTRE.y - Math.sin(turn) * radius).toFixed(1)}`;
};
const SLEEPERS = Array.from({ length: 19 }, (_, i) => `M${on(0.8 + i * 4.9, INNER - 5)}L${on(0.8 + i * 4.9, INNER + GAUGE + 5)}`).join('');
const quarter = (radius: number): string => `M${on(90, radius)}A${radius} ${radius} 0 0 1 ${on(0, radius)}`;

/** A quarter of the tightest curve, with its radius. */
export function CurveDrawing({ figure, caption }: { figure: string; caption: string }) {
  return (
    <Drawing width={182} height={172} caption={caption}>
      <path d={SLEEPERS} stroke="var(--color-ink)" strokeWidth="5" />
      <path d={quarter(INNER) + quarter(INNER + GAUGE)} stroke="var(--color-paper)" strokeWidth="4.5" fill="none" />
      <path {...BUILT} strokeWidth="2" d={quarter(INNER) + quarter(INNER + GAUGE)} />
      <path {...MEASURE} d={`M${CENTRE.x} ${CENTRE.y}L${on(41, INNER)}M${CENTRE.x - 9} ${CENTRE.y}h18M${CENTRE.x} ${CENTRE.y - 9}v18`} />
      <path className="fill-ink" transform={`translate(${on(41, INNER)}) rotate(-41)`} d="M0 0-11-3.6V3.6Z" />
      <text transform={`translate(${on(44, 72)}) rotate(-41)`} textAnchor="middle" className="fill-ink font-heading font-bold" fontSize="24" paintOrder="stroke" stroke="var(--color-paper)" strokeWidth="7">
        {figure}
      </text>
    </Drawing>
  );
}
