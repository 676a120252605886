import { formatMoney, formatPrice } from '@/lib/core/money';

type MoneyProps = {
  amountMinor: number;
  currency: string;
  locale: string;
  /** `exact` $60.00, for sums; `price` $8, for prices inside sentences. */
  show?: 'exact' | 'price';
};

/** An amount as the club's locale writes it. The only place a page formats money. */
export function Money({ amountMinor, currency, locale, show = 'exact' }: MoneyProps) {
  const format = show === 'exact' ? formatMoney : formatPrice;
  return <span className="whitespace-nowrap">{format({ amountMinor, currency }, locale)}</span>;
}
