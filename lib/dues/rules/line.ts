import { formatMoney } from '@/lib/core/money';
import type { Day } from '@/lib/core/time';
import type { Method } from '@/lib/core/words';
import type { Standing } from './standing';

/** What a household's line is drawn from. */
export type LineFacts = {
  joinedOn: Day;
  standing: Standing;
  payments: readonly { on: Day; amountMinor: number; method: Method; reference: string | null }[];
  firstHosted: { on: Day; railway: string } | null;
};

/** One station of a household's line: a dated fact, or what is to come, where no rail is laid yet. */
export type Station = { id: string; name: string; on: Day; note: string; tone: 'plain' | 'caution' | 'danger'; isLaid: boolean };

/** The most payments that a line shows: the newest. */
const PAYMENTS_MOST = 4;

/** A household's line: joined, hosted first, its newest payments, and how it stands, in the order of their days. */
export function lineOf({ joinedOn, standing, payments, firstHosted }: LineFacts, today: Day, club: { locale: string; currency: string }): Station[] {
  const station = (id: string, name: string, on: Day, note = '', tone: Station['tone'] = 'plain'): Station => ({ id, name, on, note, tone, isLaid: on <= today });
  const newest = [...payments].sort((a, b) => (a.on < b.on ? 1 : -1)).slice(0, PAYMENTS_MOST);
  const stations = [
    station('joined', 'joined', joinedOn),
    ...(firstHosted === null ? [] : [station('hosted', firstHosted.on <= today ? 'hosted first' : 'hosts first', firstHosted.on, firstHosted.railway)]),
    ...newest.map((payment, index) => station(`paid-${index}`, 'paid', payment.on, paidNote(payment, club))),
    ...ofStanding(standing, station),
  ];
  return stations.sort((a, b) => (a.on < b.on ? -1 : a.on > b.on ? 1 : 0));
}

const paidNote = ({ amountMinor, method, reference }: LineFacts['payments'][number], { locale, currency }: { locale: string; currency: string }) =>
  [formatMoney({ amountMinor, currency }, locale), method, reference].filter((part) => part !== null).join(', ');

function ofStanding(standing: Standing, station: (id: string, name: string, on: Day, note?: string, tone?: Station['tone']) => Station): Station[] {
  switch (standing.kind) {
    case 'left': return [station('left', 'left', standing.on)];
    case 'life': case 'new': return [];
    case 'paid': return [station('paid-to', 'paid to', standing.to)];
    case 'kept': return [station('owing', 'owing', standing.owingSince, '', 'caution'), station('kept', 'kept on to', standing.keptOnTo, 'then lapses', 'caution')];
    case 'lapsed': return [station('owing', 'owing', standing.owingSince, '', 'danger'), station('lapsed', 'lapsed', standing.keptOnTo, '', 'danger')];
  }
}
