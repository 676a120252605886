import { Bill } from '@/components/layout/bill';
import { Money } from '@/components/ui/money';
import { RailRule } from '@/components/ui/rail-rule';
import { When } from '@/components/ui/when';
import type { ClubTime, Day } from '@/lib/core/time';
import { counted, inWords } from '@/lib/opendays/rules/words';

type DayBillProps = {
  day: { title: string; heldOn: Day; placeLine: string; opensAt: Date; closesAt: Date; publishedAt: Date | null; calledOffAt: Date | null; parties: number; people: number; cameInMinor: number };
  stops: number;
  sums: { capacity: number; taken: number; held: number; walkUps: number };
  isOver: boolean;
  club: ClubTime & { currency: string };
};

/** The staff copy's bill of an open day: what is taken, by whom, what it brought, how it stands. */
export function DayBill({ day, stops, sums, isOver, club }: DayBillProps) {
  return (
    <Bill
      name={day.title}
      line={<><When on={day.heldOn} club={club} />, {stops === 0 ? 'no garden yet' : `${inWords(stops)} ${stops === 1 ? 'garden' : 'gardens'}`} {day.placeLine}, gates <When at={day.opensAt} show="time" club={club} /> to <When at={day.closesAt} show="time" club={club} /></>}
      sums={
        <>
          <strong>{figure(sums.taken, club.locale)} of {figure(sums.capacity, club.locale)} places</strong> are taken{sums.held > 0 ? `, ${sums.held} of them kept for parties still deciding` : ''}{sums.walkUps > 0 ? `, ${sums.walkUps} set aside for walk-ups` : ''};{' '}
          <strong>{counted(day.parties, 'party', 'parties')}, {day.people} people</strong> have booked. <strong><Money amountMinor={day.cameInMinor} currency={club.currency} locale={club.locale} /></strong> has come in. {state(day, isOver)}
        </>
      }
      rail={isOver ? <RailRule state="done" /> : <RailRule trainAt={sums.capacity === 0 ? 0.06 : sums.taken / sums.capacity} coaches={2} />}
    />
  );
}

const figure = (count: number, locale: string) => new Intl.NumberFormat(locale).format(count);

function state({ publishedAt, calledOffAt }: { publishedAt: Date | null; calledOffAt: Date | null }, isOver: boolean): string {
  if (calledOffAt !== null) return 'The day is called off.';
  if (isOver) return 'The day is over.';
  return publishedAt === null ? 'The day is not published yet.' : 'The day is published, and nothing is called off.';
}
