import { useId } from 'react';
import { neighbourhoodsOf, type Valley } from '@/lib/gardens/rules/valley';
import { Fields, Halts, Railway, Rivers, Roads, Woods } from './ground';
import { PlaceName } from './lettering';
import { MapPost } from './map-post';
import { Patches } from './patches';
import { boundsAround, sheetOf } from './sheet';

interface AreaMapProps {
  readonly valley: Valley;
  readonly areaKey: string;
  readonly number: number;
}

const WIDTH = 336;
const PROPORTION = 336 / 250;
const MARGIN_METERS = 900;

/** One garden's neighbourhood and what bounds it. The post stands at the neighbourhood's own point, wherever the garden lies. */
export function AreaMap({ valley, areaKey, number }: AreaMapProps) {
  const idPrefix = `area${useId().replaceAll(/\W/g, '')}`;
  const area = neighbourhoodsOf(valley).find(({ key }) => key === areaKey);
  if (!area) return null;
  const sheet = sheetOf(boundsAround(area.ring, MARGIN_METERS, PROPORTION), WIDTH);
  const [x, y] = sheet.at(area.labelPoint);
  return (
    <svg viewBox={`0 0 ${sheet.width} ${sheet.height}`} role="img" aria-label={`A hatched neighbourhood: ${area.inWords}`} className="block h-auto w-full overflow-hidden bg-paper">
      <rect width={sheet.width} height={sheet.height} className="fill-paper" />
      <Fields valley={valley} sheet={sheet} />
      <Patches patches={[{ number, area }]} sheet={sheet} idPrefix={idPrefix} />
      <Rivers valley={valley} sheet={sheet} />
      <Railway valley={valley} sheet={sheet} />
      <Roads valley={valley} sheet={sheet} />
      <Halts valley={valley} sheet={sheet} />
      <Woods valley={valley} sheet={sheet} />
      <g transform={`translate(${x.toFixed(1)} ${(y + 16).toFixed(1)})`}>
        <MapPost number={number} height={71} />
      </g>
      <PlaceName x={x} y={y + 37} name={area.name} size={19} within={150} />
      <path d={`M1.5 1.5H${sheet.width - 1.5}V${sheet.height - 1.5}H1.5Z`} className="stroke-ink" strokeWidth="3" fill="none" />
    </svg>
  );
}
