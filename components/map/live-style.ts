import type { ExpressionSpecification, FilterSpecification, LayerSpecification, StyleSpecification } from 'maplibre-gl';
import type { MapInks } from './map-inks';

/** Which neighbourhood carries which stop's hatch. */
export interface HatchedArea {
  readonly areaKey: string;
  readonly number: number;
}

const VALLEY = 'valley';
/** The same file once more: a tree beside a hatch in one picture atlas takes a hairline of it. */
const WOODS = 'woods';
/** The zoom at which the sheet is as wide as the printed map; lines have the printed map's weights there. */
const PRINTED_ZOOM = 11.3;

const kind = (name: string): FilterSpecification => ['==', ['get', 'kind'], name];
/** A weight that grows with the ground, though not as fast. */
const grown = (points: number): ExpressionSpecification => ['interpolate', ['exponential', 1.5], ['zoom'], PRINTED_ZOOM, points, PRINTED_ZOOM + 3, points * 2.2];
const byClass = (main: number, road: number, lane: number): ExpressionSpecification => {
  const match = (times: number): ExpressionSpecification => ['match', ['get', 'roadClass'], 'main', main * times, 'road', road * times, lane * times];
  return ['interpolate', ['exponential', 1.5], ['zoom'], PRINTED_ZOOM, match(1), PRINTED_ZOOM + 3, match(2.2)];
};

function water({ conifer, paper }: MapInks): LayerSpecification[] {
  const stream = (key: string, half: number, lines: readonly number[]): LayerSpecification[] => [
    { id: `${key}-bed`, type: 'line', source: VALLEY, filter: ['==', ['get', 'key'], key], paint: { 'line-color': paper, 'line-width': grown(half * 2 + 3) } },
    ...lines.map((share, i): LayerSpecification => ({
      id: `${key}-line-${i}`, type: 'line', source: VALLEY, filter: ['==', ['get', 'key'], key],
      paint: { 'line-color': conifer, 'line-width': Math.abs(share) === 1 ? 2.2 : 1.2, 'line-offset': grown(share * half) },
    })),
  ];
  return [...stream('south-fork', 6, [-1, 0, 1]), ...stream('alder', 12, [-1, -0.34, 0.34, 1])];
}

function ways({ ink, inkSoft, paper }: MapInks): LayerSpecification[] {
  return [
    { id: 'railway-bed', type: 'line', source: VALLEY, filter: kind('railway'), paint: { 'line-color': paper, 'line-width': grown(8) } },
    { id: 'railway-line', type: 'line', source: VALLEY, filter: kind('railway'), paint: { 'line-color': ink, 'line-width': 1.6 } },
    { id: 'railway-sleepers', type: 'line', source: VALLEY, filter: kind('railway'), paint: { 'line-color': ink, 'line-width': 5, 'line-dasharray': [0.24, 1] } },
    { id: 'road-edges', type: 'line', source: VALLEY, filter: kind('road'), layout: { 'line-join': 'round' }, paint: { 'line-color': inkSoft, 'line-width': byClass(10, 7.4, 5.4) } },
    { id: 'road-beds', type: 'line', source: VALLEY, filter: kind('road'), layout: { 'line-join': 'round' }, paint: { 'line-color': paper, 'line-width': byClass(6.8, 4.6, 3) } },
  ];
}

function patches(areas: readonly HatchedArea[], { cardInk }: MapInks): LayerSpecification[] {
  return areas.flatMap(({ areaKey, number }): LayerSpecification[] => [
    { id: `patch-${areaKey}`, type: 'fill', source: VALLEY, filter: ['==', ['get', 'key'], areaKey], paint: { 'fill-pattern': `hatch-${number}` } },
    { id: `patch-edge-${areaKey}`, type: 'line', source: VALLEY, filter: ['==', ['get', 'key'], areaKey], paint: { 'line-color': cardInk, 'line-width': 1 } },
  ]);
}

function names({ ink, paper }: MapInks): LayerSpecification[] {
  const paint = { 'text-color': ink, 'text-halo-color': paper, 'text-halo-width': 2.2 };
  return [
    { id: 'river-names', type: 'symbol', source: VALLEY, filter: ['==', ['get', 'key'], 'alder'], layout: { 'symbol-placement': 'line-center', 'text-field': ['get', 'name'], 'text-font': ['Besley Italic'], 'text-size': 18 }, paint },
    { id: 'road-names', type: 'symbol', source: VALLEY, minzoom: 12, filter: kind('road'), layout: { 'symbol-placement': 'line', 'symbol-spacing': 420, 'text-field': ['get', 'name'], 'text-font': ['Besley Italic'], 'text-size': 16 }, paint },
    { id: 'halt-name', type: 'symbol', source: VALLEY, filter: kind('halt'), layout: { 'text-field': ['get', 'name'], 'text-font': ['Besley Italic'], 'text-size': 16, 'text-anchor': 'bottom-left', 'text-offset': [0.3, -0.4] }, paint },
  ];
}

/** The printed map's drawing as a map that moves: the same file, the same inks, the patches' hatches under roads and river. */
export function liveStyle(site: string, areas: readonly HatchedArea[], inks: MapInks): StyleSpecification {
  return {
    version: 8,
    'font-faces': { 'Besley Italic': `${site}/vendor/besley-latin-wght-italic.woff2` },
    sources: { [VALLEY]: { type: 'geojson', data: `${site}/valley/valley.json` }, [WOODS]: { type: 'geojson', data: `${site}/valley/valley.json` } },
    layers: [
      { id: 'sheet', type: 'background', paint: { 'background-color': inks.paper } },
      ...patches(areas, inks),
      ...water(inks),
      ...ways(inks),
      { id: 'trees', type: 'symbol', source: WOODS, filter: kind('wood'), layout: { 'icon-image': 'tree', 'icon-allow-overlap': true, 'icon-ignore-placement': true, 'icon-anchor': 'bottom', 'icon-offset': [0, 8] } },
      ...names(inks),
    ],
  };
}
