import type { Neighbourhood } from '@/lib/gardens/rules/valley';
import { pathThrough, type Sheet } from './sheet';

interface Hatch {
  readonly turn: number;
  readonly gap: number;
  readonly weight: number;
  readonly dash?: string;
}

/** One hatch a card, so that no patch is told from its neighbour by colour alone. */
const HATCHES: readonly Hatch[] = [
  { turn: 35, gap: 8, weight: 1.2 },
  { turn: -40, gap: 8, weight: 1.5 },
  { turn: 90, gap: 7, weight: 1.2 },
  { turn: 0, gap: 8, weight: 1.5 },
  { turn: 60, gap: 8, weight: 1.2, dash: '5 2' },
  { turn: -20, gap: 9, weight: 1.5, dash: '5 2' },
  { turn: 120, gap: 8, weight: 1.2, dash: '5 2' },
];

/** The pattern of one stop's patch; from the eighth stop on the same hatch is woven with a second one across it. */
function PatchPattern({ id, number }: { readonly id: string; readonly number: number }) {
  const hatch = HATCHES[(number - 1) % HATCHES.length] ?? { turn: 0, gap: 8, weight: 1.2 };
  const half = hatch.gap / 2;
  const woven = number > HATCHES.length ? `M${half} 0V${hatch.gap}` : '';
  return (
    <pattern id={id} width={hatch.gap} height={hatch.gap} patternUnits="userSpaceOnUse" patternTransform={`rotate(${hatch.turn})`}>
      <rect width={hatch.gap} height={hatch.gap} className={`card-${number} fill-(--card)`} />
      <path d={`M0 ${half}H${hatch.gap}${woven}`} className="stroke-card-ink" strokeWidth={woven === '' ? hatch.weight : 0.9} strokeDasharray={hatch.dash} fill="none" />
    </pattern>
  );
}

export interface Patch {
  readonly number: number;
  readonly area: Neighbourhood;
}

/** Hatched neighbourhoods. Two gardens in one neighbourhood share the hatch of the lower number. */
export function Patches({ patches, sheet, idPrefix }: { readonly patches: readonly Patch[]; readonly sheet: Sheet; readonly idPrefix: string }) {
  const first = patches.filter(({ area }, i) => patches.findIndex((other) => other.area.key === area.key) === i);
  return (
    <g>
      <defs>{first.map(({ number }) => <PatchPattern key={number} id={`${idPrefix}-${number}`} number={number} />)}</defs>
      {first.map(({ number, area }) => (
        <path key={area.key} d={`${pathThrough(sheet, area.ring)}Z`} fill={`url(#${idPrefix}-${number})`} className="stroke-card-ink" strokeWidth="1" strokeLinejoin="round" />
      ))}
    </g>
  );
}
