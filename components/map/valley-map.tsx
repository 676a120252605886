import { useId } from 'react';
import { CROW_SPEED_KMH, DETOUR_FACTOR } from '@/lib/gardens/rules/travel';
import { featuresOf, type Neighbourhood, neighbourhoodsOf, type Valley } from '@/lib/gardens/rules/valley';
import { Fields, Halts, Railway, Ridges, Rivers, Roads, Woods } from './ground';
import { DoubleFrame, PlaceName, ScaleBar } from './lettering';
import { MapPost } from './map-post';
import { Patches } from './patches';
import { type Sheet, sheetOf } from './sheet';
import { VisitLine } from './visit-line';

/** A garden as the map may know it: its number, its published neighbourhood, its name and its page. */
export interface MapGarden {
  readonly number: number;
  readonly areaKey: string;
  readonly name: string;
  readonly href: string;
}

interface ValleyMapProps {
  readonly valley: Valley;
  readonly gardens: readonly MapGarden[];
  /** Numbers of the gardens that a party goes to, in order. */
  readonly line?: readonly number[];
}

interface Standing extends MapGarden {
  readonly area: Neighbourhood;
  readonly x: number;
  readonly y: number;
}

const WIDTH = 700;
const POST_HEIGHT = 54;
const NAME_SIZE = 20;

/** Gardens that share a neighbourhood stand side by side. */
function standings(gardens: readonly MapGarden[], areas: readonly Neighbourhood[], sheet: Sheet): Standing[] {
  return gardens.flatMap((garden) => {
    const area = areas.find(({ key }) => key === garden.areaKey);
    if (!area) return [];
    const together = gardens.filter(({ areaKey }) => areaKey === garden.areaKey);
    const [x, y] = sheet.at(area.labelPoint);
    return [{ ...garden, area, x: x + (together.indexOf(garden) - (together.length - 1) / 2) * 40, y: y + 12 }];
  });
}

function PostLink({ number, name, href, area, x, y }: Standing) {
  return (
    <a href={href} aria-label={`Garden ${number}, ${name}: ${area.name}`} className="cursor-pointer">
      <rect x={x - 24} y={y - POST_HEIGHT - 2} width="48" height={POST_HEIGHT + 4} fill="transparent" />
      <g transform={`translate(${x.toFixed(1)} ${y.toFixed(1)})`}>
        <MapPost number={number} height={POST_HEIGHT} />
      </g>
    </a>
  );
}

/** The valley as one printed drawing: hatched neighbourhoods under roads and river, a post in each, each post a link. */
export function ValleyMap({ valley, gardens, line = [] }: ValleyMapProps) {
  const sheet = sheetOf(valley.sheet, WIDTH);
  const posts = standings(gardens, neighbourhoodsOf(valley), sheet);
  const idPrefix = `patch${useId().replaceAll(/\W/g, '')}`;
  const visited = line.flatMap((number) => posts.find((post) => post.number === number)?.area ?? []);
  const named = posts.filter(({ area }, i) => posts.findIndex((other) => other.area.key === area.key) === i);
  const fiveMinutes = ((CROW_SPEED_KMH * 1000) / 12 / DETOUR_FACTOR) * sheet.pointsPerMeter;
  return (
    <svg viewBox={`0 0 ${sheet.width} ${sheet.height}`} role="group" aria-label={`Map of ${named.length} neighbourhoods; the list beside it says the same in words`} className="block h-auto w-full overflow-hidden bg-paper">
      <g aria-hidden="true">
        <rect width={sheet.width} height={sheet.height} className="fill-paper" />
        <Ridges valley={valley} sheet={sheet} />
        <Fields valley={valley} sheet={sheet} />
        <Patches patches={posts} sheet={sheet} idPrefix={idPrefix} />
        <Rivers valley={valley} sheet={sheet} />
        <Railway valley={valley} sheet={sheet} />
        <Roads valley={valley} sheet={sheet} />
        <Halts valley={valley} sheet={sheet} />
        <Woods valley={valley} sheet={sheet} />
        {visited.length > 1 && <VisitLine valley={valley} areas={visited} sheet={sheet} />}
        {named.map(({ area }) => <AreaName key={area.key} area={area} sheet={sheet} />)}
        <RiverName valley={valley} sheet={sheet} />
        <ScaleBar x={sheet.width - fiveMinutes - 22} y={sheet.height - 36} length={Math.round(fiveMinutes)} />
      </g>
      {posts.map((post) => <PostLink key={post.number} {...post} />)}
      <DoubleFrame width={sheet.width} height={sheet.height} />
    </svg>
  );
}

function AreaName({ area, sheet }: { readonly area: Neighbourhood; readonly sheet: Sheet }) {
  const [x, y] = sheet.at(area.labelPoint);
  const easts = area.ring.map((place) => sheet.at(place)[0]);
  return <PlaceName x={x} y={y + 31} name={area.name} size={NAME_SIZE} within={Math.min((Math.max(...easts) - Math.min(...easts)) * 1.12, (sheet.width - x) * 2 - 24)} />;
}

/** The main river's name, at its bank where it leaves the sheet. */
function RiverName({ valley, sheet }: { readonly valley: Valley; readonly sheet: Sheet }) {
  const river = featuresOf(valley, 'river')[0];
  const mouth = river?.geometry.coordinates.map((place) => sheet.at(place)).find(([x]) => x > 0);
  return river && mouth && <PlaceName x={16} y={mouth[1] - 28} name={river.properties.name} size={NAME_SIZE} anchor="start" />;
}
