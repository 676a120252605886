import { curveInWords, type Fact, type Particulars } from '@/lib/gardens/rules/particulars';
import { longLength, shortLength, type LengthSystem } from '@/lib/gardens/rules/particulars-lengths';
import { gradientInWords } from '@/lib/gardens/rules/scale-sums';
import { CurveDrawing } from './curve-drawing';
import { GradientPost } from './gradient-post';
import { PathSection } from './path-section';

type DrawnProps = { particulars: Particulars; system: LengthSystem; words: string };

/** The particulars as a dimensioned drawing: what a host did not measure is not drawn. */
export function DrawnParticulars({ particulars, system, words }: DrawnProps) {
  const { minRadiusMm, scaleOneTo, steepestGradePercent, pathWidthMm, trackHeightMm, water, isStepFree, pathSurface } = particulars;
  return (
    <div role="img" aria-label={words} className="mt-2 flex flex-wrap items-start gap-x-6 gap-y-8 md:items-end">
      {minRadiusMm === null ? null : <CurveDrawing figure={longLength(minRadiusMm, system)} caption={`tightest curve, ${curveInWords(minRadiusMm, scaleOneTo, system)}`} />}
      {steepestGradePercent === null ? null : <GradientPost climb={gradientInWords(steepestGradePercent)} caption={steepestGradePercent === 0 ? 'level all the way' : 'steepest climb'} />}
      <PathSection
        pathWidthMm={pathWidthMm}
        trackHeightMm={trackHeightMm}
        hasWater={water !== 'none'}
        waterWord={water}
        pathFigure={pathWidthMm === null ? null : shortLength(pathWidthMm, system)}
        heightFigure={trackHeightMm === null ? null : shortLength(trackHeightMm, system)}
        caption={`${pathSurface ?? 'the way round'}, ${isStepFree ? 'no steps' : 'with steps'}`}
      />
    </div>
  );
}

/** Figures in three columns of hairlines: a name in italics, what is so in strong type. */
export function Facts({ facts }: { facts: readonly Fact[] }) {
  return (
    <dl className="mt-6 grid grid-cols-2 gap-x-5 sm:gap-x-7 lg:grid-cols-3 large-print:block">
      {facts.map(({ label, words }) => (
        <div key={label} className="border-t border-rule pt-2 pb-3">
          <dt className="note leading-snug text-ink-soft">{label}</dt>
          <dd className="leading-snug font-semibold">{words}</dd>
        </div>
      ))}
    </dl>
  );
}
