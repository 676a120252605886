import { costMinor, type People, type UnitPrices } from '@/lib/bookings/rules/party';
import { formatMoney, formatPrice, sumMinor } from '@/lib/core/money';
import { counted, inWordsFirst, listed } from './words';

/** What one person of each kind pays for one visit, in minor units. */
export type PersonPrices = UnitPrices;
/** How a club writes an amount. */
export type Priced = { currency: string; locale: string };

/** What a party pays for visits at these prices, in minor units. */
export function partyTotalMinor(visits: readonly PersonPrices[], party: People): number {
  return sumMinor(visits.map((prices) => costMinor(party, prices)));
}

const isFree = (prices: PersonPrices) => prices.adultMinor === 0 && prices.childMinor === 0 && prices.babeMinor === 0;
const isSame = (a: PersonPrices, b: PersonPrices) => a.adultMinor === b.adultMinor && a.childMinor === b.childMinor && a.babeMinor === b.babeMinor;

/** The prices of a day as a sentence: "A visit is $8 for each adult and $4 for a child; babes in arms come free." */
export function priceSentence(prices: PersonPrices, overrides: readonly PersonPrices[], priced: Priced): string {
  const say = (amountMinor: number) => formatPrice({ amountMinor, currency: priced.currency }, priced.locale);
  const own = overrides.filter((each) => !isSame(each, prices)).length;
  const but = own === 0 ? '' : ` ${inWordsFirst(own)} ${own === 1 ? 'garden has a price' : 'gardens have prices'} of ${own === 1 ? 'its' : 'their'} own.`;
  if (isFree(prices)) return `A visit is free.${but}`;
  if (prices.adultMinor === prices.childMinor && prices.babeMinor === prices.adultMinor) return `A visit is ${say(prices.adultMinor)} for each person.${but}`;
  const child = prices.childMinor === 0 ? 'children come free' : `${say(prices.childMinor)} for a child`;
  const babe = prices.babeMinor === 0 ? 'babes in arms come free' : `${say(prices.babeMinor)} for a babe in arms`;
  if (prices.childMinor === 0 && prices.babeMinor === 0) return `A visit is ${say(prices.adultMinor)} for each adult; children and babes in arms come free.${but}`;
  return prices.childMinor === 0
    ? `A visit is ${say(prices.adultMinor)} for each adult and ${babe}; ${child}.${but}`
    : `A visit is ${say(prices.adultMinor)} for each adult and ${child}; ${babe}.${but}`;
}

/** The people of a party: "2 adults and 1 child". */
export function partyInWords({ adults, children, babes }: People): string {
  return listed([
    ...(adults > 0 ? [counted(adults, 'adult', 'adults')] : []),
    ...(children > 0 ? [counted(children, 'child', 'children')] : []),
    ...(babes > 0 ? [counted(babes, 'babe in arms', 'babes in arms')] : []),
  ]);
}

/** What a choice comes to: the sentence before the amount and the amount itself, "$60.00" or "free". */
export function sumSentence(visits: readonly PersonPrices[], party: People, priced: Priced): { words: string; amount: string } {
  const first = visits[0];
  const gardens = `${inWordsFirst(visits.length)} ${visits.length === 1 ? 'visit' : 'visits'}`;
  const totalMinor = partyTotalMinor(visits, party);
  if (first === undefined || totalMinor === 0) return { words: `${gardens} for ${partyInWords(party)}:`, amount: 'free' };
  const amount = formatMoney({ amountMinor: totalMinor, currency: priced.currency }, priced.locale);
  if (visits.some((each) => !isSame(each, first))) return { words: `${gardens} for ${partyInWords(party)}:`, amount };
  const each = (count: number, one: string, many: string, amountMinor: number) =>
    count === 0 ? [] : [`${counted(count, one, many)} ${amountMinor === 0 ? 'free' : `at ${formatPrice({ amountMinor, currency: priced.currency }, priced.locale)}`}`];
  const parts = [
    ...each(party.adults, 'adult', 'adults', first.adultMinor),
    ...each(party.children, 'child', 'children', first.childMinor),
    ...each(party.babes, 'babe in arms', 'babes in arms', first.babeMinor),
  ];
  return { words: `${gardens} for ${listed(parts)}:`, amount };
}
