import { LiveMap, type LivePost } from '@/components/map/live-map';
import { ValleyMap } from '@/components/map/valley-map';
import { neighbourhoodsOf } from '@/lib/gardens/rules/valley';
import { builtInValley } from '@/lib/gardens/rules/valley-data';
import type { ListedGarden } from '@/lib/gardens/views';

/** The valley with the shown gardens: printed first, and laid over with a map that moves where the browser can draw one. */
export function GardenMap({ gardens }: { gardens: readonly ListedGarden[] }) {
  const areas = neighbourhoodsOf(builtInValley);
  const posts = gardens.flatMap(({ card, areaKey, name, href }): LivePost[] => {
    const area = areas.find(({ key }) => key === areaKey);
    return area ? [{ number: card, areaKey, areaName: area.name, labelPoint: area.labelPoint, name, href }] : [];
  });
  return (
    <LiveMap posts={posts} sheet={builtInValley.sheet}>
      <ValleyMap valley={builtInValley} gardens={posts} />
    </LiveMap>
  );
}
