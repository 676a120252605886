/** The ways a club writes lengths: feet and inches, or metres and centimetres. */
export type LengthSystem = 'feet' | 'metres';

const MM_PER_INCH = 25.4;

/** The system a locale's readers measure their gardens in (CLDR measurement systems: US, Liberia and Myanmar use feet). */
export const lengthSystemOf = (locale: string): LengthSystem => (/-(US|LR|MM)\b/.test(locale) ? 'feet' : 'metres');

const trimmed = (value: number, digits: number): string => String(Number(value.toFixed(digits)));

/** A short length, for paths, plants and kerbs: "38 in", or "97 cm". */
export const shortLength = (mm: number, system: LengthSystem): string =>
  system === 'feet' ? `${Math.max(1, Math.round(mm / MM_PER_INCH))} in` : `${Math.max(1, Math.round(mm / 10))} cm`;

/** A long length, for radii and spans: "4 ft", "4 ft 6 in", or "1.2 m". */
export function longLength(mm: number, system: LengthSystem): string {
  if (system === 'metres') return `${trimmed(mm / 1000, mm < 10_000 ? 1 : 0)} m`;
  const inches = Math.round(mm / MM_PER_INCH);
  const rest = inches >= 120 ? 0 : inches % 12; // from ten feet on nobody counts inches
  const feet = inches >= 120 ? Math.round(inches / 12) : Math.floor(inches / 12);
  return [feet > 0 ? `${feet} ft` : '', rest > 0 ? `${rest} in` : ''].filter((part) => part !== '').join(' ');
}

/** A length in a sentence, in whole feet or metres: "212 feet of track". */
export const lengthInWords = (mm: number, system: LengthSystem): string =>
  system === 'feet' ? `${Math.round(mm / 304.8).toLocaleString('en-US')} feet` : `${Math.round(mm / 1000).toLocaleString('en-US')} metres`;

/** Scale miles in a sentence: "0.9 of a scale mile", "2.1 scale miles". */
export function scaleMilesInWords(miles: number): string {
  const shown = miles.toFixed(1);
  if (shown === '1.0') return 'one scale mile';
  return miles < 1 ? `${miles < 0.05 ? miles.toFixed(2) : shown} of a scale mile` : `${shown} scale miles`;
}
