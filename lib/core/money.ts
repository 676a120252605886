import { ISO_MINOR_DIGITS } from './currencies';

/** An amount in integer minor units of an ISO 4217 currency. */
export type Money = { amountMinor: number; currency: string };

/** How many minor digits a currency has by ISO 4217 (2 unless the standard's list says otherwise). */
export const minorDigits = (currency: string): number => ISO_MINOR_DIGITS[currency] ?? 2;

/** Adds amounts in minor units; throws when the sum is no longer an exact integer. */
export function sumMinor(amounts: readonly number[]): number {
  const total = amounts.reduce((sum, amount) => sum + amount, 0);
  if (!Number.isSafeInteger(total)) throw new Error('money left the exact integers');
  return total;
}

/** `percent` of an amount, rounded half up to the minor unit (away from zero for the payer of a positive amount). */
export function percentOfMinor(amountMinor: number, percent: number): number {
  if (!Number.isInteger(amountMinor) || !Number.isInteger(percent)) throw new Error('percentOfMinor takes integers');
  return Math.floor((amountMinor * percent + 50) / 100);
}

/** Splits an amount by weights so that the parts add up exactly: largest remainder, ties to the earlier part. */
export function splitMinor(amountMinor: number, weights: readonly number[]): number[] {
  const total = sumMinor(weights);
  if (total <= 0) throw new Error('splitMinor needs a positive weight');
  const parts = weights.map((weight) => Math.floor((amountMinor * weight) / total));
  const left = amountMinor - sumMinor(parts);
  const byRemainder = weights
    .map((weight, index) => ({ index, remainder: (amountMinor * weight) % total }))
    .sort((a, b) => b.remainder - a.remainder || a.index - b.index);
  for (const { index } of byRemainder.slice(0, left)) parts[index] = (parts[index] ?? 0) + 1;
  return parts;
}

/** Money as a person of `locale` reads it, with the currency's ISO 4217 digits: `$60.00`, `¥1,200`. */
export function formatMoney({ amountMinor, currency }: Money, locale: string): string {
  const digits = minorDigits(currency);
  const options = { style: 'currency', currency, minimumFractionDigits: digits, maximumFractionDigits: digits } as const;
  return new Intl.NumberFormat(locale, options).format(decimalText(amountMinor, digits) as unknown as number); // Intl reads exact decimal strings (ECMA-402 2023); its types lag
}

/** As `formatMoney`, without the fraction when it is nought: `$8`, `$4.50`. For prices inside sentences. */
export function formatPrice({ amountMinor, currency }: Money, locale: string): string {
  const unit = 10 ** minorDigits(currency);
  if (amountMinor % unit !== 0) return formatMoney({ amountMinor, currency }, locale);
  return new Intl.NumberFormat(locale, { style: 'currency', currency, maximumFractionDigits: 0 }).format(amountMinor / unit);
}

/** The amount as a plain decimal text, `-1234` with 2 digits → `-12.34`. For CSV and bank files. */
export function decimalText(amountMinor: number, digits: number): string {
  const sign = amountMinor < 0 ? '-' : '';
  const text = String(Math.abs(amountMinor)).padStart(digits + 1, '0');
  return digits === 0 ? sign + text : `${sign}${text.slice(0, -digits)}.${text.slice(-digits)}`;
}

/** Reads what a person typed ("62", "62.5", "1,062.50", "$62.00") as minor units, or null when it is not an amount of that currency. */
export function parseMoney(typed: string, currency: string): number | null {
  const digits = minorDigits(currency);
  const plain = typed.trim().replace(/^[^\d.,-]+\s*/, '').replace(/,(?=\d{3}(\D|$))/g, '');
  const match = /^(\d{1,9})(?:\.(\d+))?$/.exec(plain);
  if (!match) return null;
  const fraction = match[2] ?? '';
  if (fraction.length > digits) return null;
  return Number(match[1]) * 10 ** digits + Number(fraction.padEnd(digits, '0') || '0');
}
