import { Post } from '@/components/drawing/post';
import { MapFrame } from '@/components/map/map-frame';
import { ValleyMap } from '@/components/map/valley-map';
import type { Valley } from '@/lib/gardens/rules/valley';
import { chosenCells } from '@/lib/opendays/rules/board';
import type { BoardView, OpenDayPage } from '@/lib/opendays/views';

type WhereTheyAreProps = { valley: Valley; gardens: OpenDayPage['gardens']; board: BoardView; visited: readonly string[] };

/** The neighbourhoods of the day's gardens on the drawn map, and the same as a list beside it. */
export function WhereTheyAre({ valley, gardens, board, visited }: WhereTheyAreProps) {
  if (gardens.length === 0) return null;
  const line = chosenCells(board, visited).flatMap((cell) => board.stops[cell.row]?.number ?? []);
  return (
    <section className="mt-9 border-t border-edge pt-5">
      <h2>Where they are</h2>
      <p className="mt-2">Each hatched patch is a neighbourhood and not a house. The address comes with your tickets.</p>
      <div className="mt-4 grid gap-x-9 gap-y-6 lg:grid-cols-[minmax(0,700px)_minmax(0,1fr)] large-print:grid-cols-1">
        <MapFrame>
          <ValleyMap valley={valley} line={line} gardens={gardens.map(({ number, areaKey, name, slug }) => ({ number, areaKey, name, href: `/gardens/${slug}` }))} />
        </MapFrame>
        <ul className="list-none p-0 leading-tight">
          {gardens.map((garden) => (
            <li key={garden.number} className="grid grid-cols-[36px_minmax(0,1fr)] items-center gap-3 border-t border-rule py-2 last:border-b">
              <Post stopNumber={garden.number} height={52} label={`Garden ${garden.number}`} />
              <span>
                <a href={`/gardens/${garden.slug}`} className="inline-flex min-h-6 items-center font-semibold text-ink no-underline hover:underline">{garden.name}</a>
                <span className="block text-[0.9444rem]">{garden.areaName}</span>
              </span>
            </li>
          ))}
        </ul>
      </div>
    </section>
  );
}
