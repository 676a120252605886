import { listed } from '@/lib/opendays/rules/words';
import { lengthInWords, longLength, scaleMilesInWords, shortLength, type LengthSystem } from './particulars-lengths';
import { degreeOfCurve, gradientInWords, prototypeRadiusFeet, scaleMiles, standsFor } from './scale-sums';

/** The particulars of a garden that are drawn or set as figures. Lengths in millimetres. */
export type Particulars = {
  readonly scaleOneTo: number;
  readonly gaugeMm: number;
  readonly trackLengthMm: number;
  readonly minRadiusMm: number | null;
  readonly steepestGradePercent: number | null;
  readonly powers: readonly string[];
  readonly setIn: string | null;
  readonly begunYear: number | null;
  readonly isStepFree: boolean;
  readonly pathWidthMm: number | null;
  readonly pathSurface: string | null;
  readonly stepsNote: string | null;
  readonly trackHeightMm: number | null;
  readonly seats: number | null;
  readonly hasToilet: boolean;
  readonly dogsNote: string | null;
  readonly parkingNote: string | null;
  readonly water: string;
  readonly stayMinutes: number;
  readonly headsLimit: number;
};

/** A name and what is so. */
export type Fact = { readonly label: string; readonly words: string };

const POWER_WORDS: Readonly<Record<string, string>> = {
  'live-steam': 'live steam', battery: 'battery', track: 'track power', overhead: 'overhead wire', clockwork: 'clockwork',
};

/** How a garden runs: "live steam, some battery". The first named is the usual one. */
export function powersInWords(powers: readonly string[]): string {
  const [usual = '', ...others] = powers.map((power) => POWER_WORDS[power] ?? power);
  return others.length === 0 ? usual : `${usual}, some ${listed(others)}`;
}

/** A scale as people say it: "1:22.5". */
export const scaleInWords = (scaleOneTo: number): string => `1:${Number(scaleOneTo.toFixed(2))}`;

/** The line of a garden in a list: "1:22.5, live steam, some battery, 212 feet". */
export const oneLine = (garden: Pick<Particulars, 'scaleOneTo' | 'powers' | 'trackLengthMm'>, system: LengthSystem): string =>
  `${scaleInWords(garden.scaleOneTo)}, ${powersInWords(garden.powers)}, ${lengthInWords(garden.trackLengthMm, system)}`;

/** "212 feet of track, which is 0.9 of a scale mile." */
export const trackSentence = ({ trackLengthMm, scaleOneTo }: Particulars, system: LengthSystem): string =>
  `${lengthInWords(trackLengthMm, system)} of track, which is ${scaleMilesInWords(scaleMiles(trackLengthMm, scaleOneTo))}.`;

/** What the tightest curve would be at full size: "90 ft full size, or 68°" by the 100-ft chord, in the club's units. */
export function curveInWords(radiusMm: number, scaleOneTo: number, system: LengthSystem): string {
  const feet = prototypeRadiusFeet(radiusMm, scaleOneTo);
  const degrees = degreeOfCurve(feet);
  return `${longLength(feet * 304.8, system)} full size${degrees === undefined ? '' : `, or ${Math.round(degrees)}°`}`;
}

function gaugeFact({ scaleOneTo, gaugeMm }: Particulars): string {
  const gauge = standsFor(gaugeMm, scaleOneTo);
  const track = `${scaleInWords(scaleOneTo)} on ${Number(gaugeMm.toFixed(1))} mm track`;
  if (gauge === null) return track;
  return `${track}: ${gauge.fit === 'exact' ? gauge.name : `near enough ${gauge.name}`}`;
}

/** The figures under the drawing. */
export function railwayFacts(garden: Particulars): Fact[] {
  return [
    { label: 'scale', words: gaugeFact(garden) },
    { label: 'how it runs', words: powersInWords(garden.powers) },
    ...(garden.setIn ? [{ label: 'set in', words: garden.setIn }] : []),
    { label: 'a visit', words: `about ${garden.stayMinutes} minutes` },
    { label: 'comfortable with', words: `${garden.headsLimit} people at once` },
    ...(garden.begunYear ? [{ label: 'first train', words: `in ${garden.begunYear}` }] : []),
  ];
}

/** The way round in figures, honestly: widths, steps, heights; what a host did not say is left out. Never a claim about a law. */
export function accessFacts(garden: Particulars, system: LengthSystem): Fact[] {
  const { pathWidthMm, pathSurface, stepsNote, trackHeightMm, seats, dogsNote, parkingNote } = garden;
  return [
    { label: 'steps', words: garden.isStepFree ? (stepsNote ?? 'none, all the way round') : (stepsNote ?? 'some; ask the host') },
    ...(pathWidthMm === null ? [] : [{ label: 'path', words: `${shortLength(pathWidthMm, system)} at its narrowest${pathSurface ? `; ${pathSurface}` : ''}` }]),
    ...(trackHeightMm === null ? [] : [{ label: 'trains run at', words: `${shortLength(trackHeightMm, system)} above the path` }]),
    ...(seats === null ? [] : [{ label: 'places to sit', words: seats === 0 ? 'none' : String(seats) }]),
    { label: 'loo', words: garden.hasToilet ? 'yes, ask the host' : 'none' },
    ...(dogsNote ? [{ label: 'dogs', words: dogsNote }] : []),
    ...(parkingNote ? [{ label: 'parking', words: parkingNote }] : []),
  ];
}

/** What the particulars drawing says to someone who cannot see it. */
export function drawingInWords(garden: Particulars, system: LengthSystem): string {
  const parts = [
    garden.minRadiusMm === null ? '' : `tightest curve ${longLength(garden.minRadiusMm, system)} radius`,
    garden.steepestGradePercent === null ? '' : `steepest climb ${gradientInWords(garden.steepestGradePercent)}`,
    garden.pathWidthMm === null ? '' : `path ${shortLength(garden.pathWidthMm, system)} wide`,
    garden.trackHeightMm === null ? '' : `track ${shortLength(garden.trackHeightMm, system)} above it`,
    garden.water === 'none' ? '' : `a ${garden.water} beyond`,
    'a grown-up and a child drawn for scale',
  ].filter((part) => part !== '');
  const words = parts.join('; ');
  return `${words.charAt(0).toUpperCase()}${words.slice(1)}.`;
}
