const MM_PER_FOOT = 304.8;
const MM_PER_MILE = 1_609_344;

/** Full-size gauges that garden lines stand for, in millimetres (the table of scales and gauges; NEM 010 and NMRA usage). */
const GAUGES = [
  { name: 'standard gauge', mm: 1435 }, { name: '3 ft 6 in gauge', mm: 1067 }, { name: 'metre gauge', mm: 1000 }, { name: '3 ft gauge', mm: 914.4 },
  { name: '2 ft 6 in gauge', mm: 762 }, { name: '2 ft gauge', mm: 609.6 },
] as const;

/** What a model gauge stands for: the full-size gauge, and how near it comes. */
export type StandsFor = { readonly name: string; readonly fullSizeMm: number; readonly fit: 'exact' | 'near' };

/** The full-size gauge a track stands for; null when nothing is within a tenth. Within 3 % counts as exact: 44.45 and 45 mm are one gauge in practice. */
export function standsFor(gaugeMm: number, scaleOneTo: number): StandsFor | null {
  const fullSizeMm = gaugeMm * scaleOneTo;
  const off = (mm: number): number => Math.abs(fullSizeMm / mm - 1);
  const nearest = GAUGES.reduce((best, each) => (off(each.mm) < off(best.mm) ? each : best));
  if (off(nearest.mm) > 0.1) return null;
  return { name: nearest.name, fullSizeMm, fit: off(nearest.mm) <= 0.03 ? 'exact' : 'near' };
}

/** How many scale miles a length of model track comes to. */
export const scaleMiles = (trackLengthMm: number, scaleOneTo: number): number => (trackLengthMm * scaleOneTo) / MM_PER_MILE;

/** The full-size radius of a model curve, in feet. */
export const prototypeRadiusFeet = (radiusMm: number, scaleOneTo: number): number => (radiusMm * scaleOneTo) / MM_PER_FOOT;

/** Degree of curve by the 100-ft chord, D = 2·asin(50/R); undefined under a radius of 50 ft, where no such chord fits (NMRA S-8 uses the same). */
export function degreeOfCurve(radiusFeet: number): number | undefined {
  return radiusFeet < 50 ? undefined : (2 * Math.asin(50 / radiusFeet) * 180) / Math.PI;
}

/** A gradient as a lineside post says it: "1 in 42", or "level". */
export const gradientInWords = (percent: number): string => (percent <= 0 ? 'level' : `1 in ${Math.round(100 / percent)}`);

/** How fast a model must run, in feet a minute, to look like `mph` at full size: mph × 88 ÷ scale. */
export const modelFeetPerMinute = (mph: number, scaleOneTo: number): number => (mph * 88) / scaleOneTo;

/** The full-size speed that a model shows, in miles an hour. */
export const scaleMph = (feetPerMinute: number, scaleOneTo: number): number => (feetPerMinute * scaleOneTo) / 88;
