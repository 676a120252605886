import { Post } from '@/components/drawing/post';
import { Money } from '@/components/ui/money';
import type { HoldView } from '@/lib/bookings/views';

type HeldVisitsProps = { hold: Pick<HoldView, 'visits' | 'totalMinor' | 'currency'>; locale: string };

/** The kept places as a timetable of their own: time, garden, people, what they cost, and the sum. */
export function HeldVisits({ hold, locale }: HeldVisitsProps) {
  return (
    <table className="w-full border-collapse border-t-2 border-ink">
      <caption className="sr-only">The places that are kept</caption>
      <thead className="sr-only">
        <tr><th scope="col">Garden</th><th scope="col">Time</th><th scope="col">People</th><th scope="col">Price</th></tr>
      </thead>
      <tbody>
        {hold.visits.map((visit) => (
          <tr key={visit.visitId} className="border-b border-rule align-middle">
            <th scope="row" className="py-2 pr-4 text-left">
              <span className="flex items-center gap-3">
                <Post stopNumber={visit.stopNumber} height={48} label={null} />
                <span>
                  <span className="font-heading text-xl leading-tight font-extrabold">{visit.garden}</span>
                  <span className="block font-normal sm:hidden"><span className="figures font-semibold">{visit.at}</span>, {visit.people}</span>
                </span>
              </span>
            </th>
            <td className="figures hidden py-2 pr-4 text-xl font-semibold sm:table-cell">{visit.at}</td>
            <td className="hidden py-2 pr-4 sm:table-cell">{visit.people}</td>
            <td className="figures py-2 text-right">{visit.costMinor === 0 ? 'free' : <Money amountMinor={visit.costMinor} currency={hold.currency} locale={locale} />}</td>
          </tr>
        ))}
      </tbody>
      <tfoot>
        <tr>
          <th scope="row" className="py-3 text-left font-semibold">Together</th>
          <td className="hidden sm:table-cell" colSpan={2} />
          <td className="figures py-3 text-right text-xl font-bold">{hold.totalMinor === 0 ? 'free' : <Money amountMinor={hold.totalMinor} currency={hold.currency} locale={locale} />}</td>
        </tr>
      </tfoot>
    </table>
  );
}
