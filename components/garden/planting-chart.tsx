import { useId } from 'react';
import { shareOfYear } from '@/lib/gardens/rules/bloom';
import type { PlantView } from '@/lib/gardens/views';

const MONTHS = ['Jan', 'Feb', 'Mar', 'Apr', 'May', 'Jun', 'Jul', 'Aug', 'Sep', 'Oct', 'Nov', 'Dec'];
const WEAVES = ['dots', 'cross', 'hatch', 'solid', 'brick', 'wave'] as const;
type Weave = (typeof WEAVES)[number];
const percent = (share: number): string => `${(share * 100).toFixed(2)}%`;

type PlantingChartProps = { plants: readonly PlantView[]; on: string; dayText: string };

/** What flowers when, a row a plant, the page's day as one strong line down all of them. */
export function PlantingChart({ plants, on, dayText }: PlantingChartProps) {
  const prefix = `bloom${useId().replaceAll(/\W/g, '')}`;
  const blooming = plants.filter(({ bars }) => bars.length > 0);
  return (
    <div>
      <Patterns prefix={prefix} />
      <div className="border-y-4 border-ink">
        <div aria-hidden="true" className="grid items-center border-b-2 border-ink md:grid-cols-[12rem_1fr] large-print:block">
          <span className="note hidden md:block large-print:hidden">plant, with its height</span>
          <MonthLine month={Number(on.slice(5, 7))} />
        </div>
        <ul>
          {plants.map((plant) => (
            <Row key={plant.key} plant={plant} weave={WEAVES[blooming.indexOf(plant) % WEAVES.length] ?? 'solid'} prefix={prefix} day={shareOfYear(on)} />
          ))}
        </ul>
      </div>
      <p className="note mt-2.5 leading-snug">The strong line is {dayText}. A filled bar is flower; a barbed line is green all year.</p>
    </div>
  );
}

function MonthLine({ month }: { month: number }) {
  return (
    <div className="grid grid-cols-12">
      {MONTHS.map((name, index) => (
        <span key={name} className={`figures py-2 text-center text-sm font-semibold ${index + 1 === month ? 'bg-ink text-paper' : ''}`}>
          {name.charAt(0)}
          <span className="hidden lg:inline">{name.slice(1)}</span>
        </span>
      ))}
    </div>
  );
}

function Row({ plant, weave, prefix, day }: { plant: PlantView; weave: Weave; prefix: string; day: number }) {
  return (
    <li className="grid border-t border-rule first:border-t-0 md:grid-cols-[12rem_1fr] large-print:block">
      <span className="flex flex-wrap items-baseline gap-x-2 py-1 leading-tight md:block large-print:flex">
        {plant.name}
        <em className="text-ink-soft md:block">{plant.note}</em>
        <span className="sr-only">: {plant.words}</span>
      </span>
      <span className="relative block min-h-9 md:min-h-11">
        <svg className="absolute inset-0 size-full overflow-hidden" aria-hidden="true">
          {MONTHS.slice(1).map((name, index) => (
            <line key={name} x1={percent((index + 1) / 12)} x2={percent((index + 1) / 12)} y1="0" y2="100%" stroke="var(--color-rule)" />
          ))}
          {plant.isEvergreen ? <rect x="0" y="22" width="100%" height="14" fill={`url(#${prefix}-evergreen)`} /> : null}
          {plant.bars.map(({ from, to }) => (
            <rect key={from} x={percent((from - 0.95) / 12)} width={percent((to - from + 0.9) / 12)} y={plant.isEvergreen ? 4 : 9} height={plant.isEvergreen ? 16 : 20} fill={`url(#${prefix}-${weave})`} stroke="var(--color-conifer)" strokeWidth="1.800" />
          ))}
          <line x1={percent(day)} x2={percent(day)} y1="0" y2="100%" stroke="var(--color-ink)" strokeWidth="3" />
        </svg>
      </span>
    </li>
  );
}

/** Weaves instead of colours: one ink, six ways, and the barbed line of an evergreen. */
function Patterns({ prefix }: { prefix: string }) {
  const ink = { stroke: 'var(--color-conifer)', fill: 'none' } as const;
  return (
    <svg width="0" height="0" className="absolute" aria-hidden="true">
      <defs>
        <pattern id={`${prefix}-dots`} width="8" height="8" patternUnits="userSpaceOnUse">
          <path d="M2 2h0M6 6h0" {...ink} strokeWidth="3.800" strokeLinecap="round" />
        </pattern>
        <pattern id={`${prefix}-hatch`} width="7" height="7" patternUnits="userSpaceOnUse" patternTransform="rotate(45)">
          <path d="M0 3.500H7" {...ink} strokeWidth="3" />
        </pattern>
        <pattern id={`${prefix}-cross`} width="9" height="9" patternUnits="userSpaceOnUse" patternTransform="rotate(45)">
          <path d="M0 4.500H9M4.500 0V9" {...ink} strokeWidth="1.700" />
        </pattern>
        <pattern id={`${prefix}-brick`} width="14" height="10" patternUnits="userSpaceOnUse">
          <path d="M0 0H14M0 5H14M3 0V5M10 5V10" {...ink} strokeWidth="1.800" />
        </pattern>
        <pattern id={`${prefix}-wave`} width="12" height="7" patternUnits="userSpaceOnUse">
          <path d="M0 3.500Q3 0 6 3.500T12 3.500" {...ink} strokeWidth="2" />
        </pattern>
        <pattern id={`${prefix}-solid`} width="4" height="4" patternUnits="userSpaceOnUse">
          <rect width="4" height="4" fill="var(--color-conifer)" />
        </pattern>
        <pattern id={`${prefix}-evergreen`} y="22" width="30" height="14" patternUnits="userSpaceOnUse">
          <path d="M0 3H30M15 3l-5 7M15 3l5 7" {...ink} strokeWidth="1.900" />
        </pattern>
      </defs>
    </svg>
  );
}
