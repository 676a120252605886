import { When } from '@/components/ui/when';
import type { ClubTime } from '@/lib/core/time';
import type { OfficeStop, OfficeTime, PlaceRow } from '@/lib/opendays/office-views';

const head = 'border-b-[1.5px] border-ink px-2 pt-1 pb-1.5 align-bottom font-semibold text-ink-soft';

/** Starts down, gardens across: places taken of those there are, and the people expected at each start. */
export function PlacesTable({ rows, stops, club }: { rows: readonly PlaceRow[]; stops: readonly OfficeStop[]; club: ClubTime }) {
  return (
    <div className="scroll-frame" role="region" aria-label="Places by entry time and garden" tabIndex={0}>
      <table className="w-full border-collapse" style={{ minWidth: `${8 + stops.length * 5.2}rem` }}>
        <caption className="sr-only">Places taken of those there are, by entry time and garden</caption>
        <thead>
          <tr>
            <th scope="col" className={`${head} pl-0 text-left`}>Start</th>
            {stops.map((stop) => <th key={stop.id} scope="col" className={`${head} text-right leading-tight break-normal`}>{stop.number} {stop.shortName}</th>)}
            <th scope="col" className={`${head} pr-0 text-right`}>People</th>
          </tr>
        </thead>
        <tbody>
          {rows.map((row) => (
            <tr key={row.at.toISOString()} className="border-b border-rule">
              <th scope="row" className="py-1.5 pr-2 text-left font-mono font-semibold"><When at={row.at} show="time" club={club} /></th>
              {row.cells.map((cell) => <td key={cell.number} className="figures px-2 py-1.5 text-right whitespace-nowrap"><Places time={cell.time} /></td>)}
              <td className="figures py-1.5 pl-2 text-right font-semibold">{row.people}</td>
            </tr>
          ))}
        </tbody>
      </table>
    </div>
  );
}

function Places({ time }: { time: OfficeTime | null }) {
  if (time === null) return <span className="text-ink-soft"><span aria-hidden="true">…</span><span className="sr-only">no entry</span></span>;
  const isFull = time.taken >= time.capacity;
  return (
    <>
      <span className={isFull ? 'font-bold' : ''}>{time.taken}/{time.capacity}</span>
      {time.closedAt === null ? null : <span className="note block text-caution">closed</span>}
      {isFull && time.closedAt === null ? <span className="note block">full</span> : null}
    </>
  );
}
