import { featuresOf, type FeatureOf, type RoadClass, type Valley } from '@/lib/gardens/rules/valley';
import { pathThrough, type Sheet } from './sheet';

interface GroundProps {
  readonly valley: Valley;
  readonly sheet: Sheet;
}

/** A band of water: a paper bed, then lines from bank to bank, the banks strongest. */
function Water({ river, sheet }: { readonly river: FeatureOf<'river'>; readonly sheet: Sheet }) {
  const places = river.geometry.coordinates;
  const [mouth, source] = river.properties.widthMeters.map((meters) => (meters * sheet.pointsPerMeter) / 2);
  const half = (share: number): number => (mouth ?? 0) + ((source ?? 0) - (mouth ?? 0)) * Math.sqrt(share);
  const lines = (mouth ?? 0) > 8 ? [-1, -0.34, 0.34, 1] : [-1, 0, 1];
  const bank = (side: 1 | -1): string => pathThrough(sheet, side === 1 ? places : [...places].reverse(), (share) => side * (half(side === 1 ? share : 1 - share) + 1.5));
  return (
    <g fill="none" className="stroke-conifer" strokeLinejoin="round">
      <path d={`${bank(1)}${bank(-1).replace('M', 'L')}Z`} className="fill-paper" stroke="none" />
      {lines.map((line) => (
        <path key={line} d={pathThrough(sheet, places, (share) => line * half(share))} strokeWidth={Math.abs(line) === 1 ? 2.2 : 1.2} />
      ))}
    </g>
  );
}

/** The river and its forks; tributaries run in under the main stream. */
export function Rivers({ valley, sheet }: GroundProps) {
  return featuresOf(valley, 'river')
    .reverse()
    .map((river) => <Water key={river.properties.key} river={river} sheet={sheet} />);
}

const CASING: Readonly<Record<RoadClass, { readonly edge: number; readonly bed: number }>> = {
  main: { edge: 10, bed: 6.8 },
  road: { edge: 7.4, bed: 4.6 },
  lane: { edge: 5.4, bed: 3 },
};

/** Cased roads: all edges first, then all beds, so that crossings open into each other. */
export function Roads({ valley, sheet }: GroundProps) {
  const roads = featuresOf(valley, 'road').map(({ properties, geometry }) => ({ ...properties, d: pathThrough(sheet, geometry.coordinates) }));
  return (
    <g fill="none" strokeLinejoin="round">
      {roads.map(({ key, roadClass, d }) => <path key={key} d={d} className="stroke-ink-soft" strokeWidth={CASING[roadClass].edge} />)}
      {roads.map(({ key, roadClass, d }) => <path key={key} d={d} className="stroke-paper" strokeWidth={CASING[roadClass].bed} />)}
    </g>
  );
}

/** The railway: one line across its sleepers. */
export function Railway({ valley, sheet }: GroundProps) {
  return featuresOf(valley, 'railway').map(({ properties, geometry }) => {
    const d = pathThrough(sheet, geometry.coordinates);
    return (
      <g key={properties.key} fill="none" strokeLinejoin="round">
        <path d={d} className="stroke-paper" strokeWidth="8" />
        <path d={d} className="stroke-ink" strokeWidth="1.6" />
        <path d={d} className="stroke-ink" strokeWidth="6" strokeDasharray="1.4 6" />
      </g>
    );
  });
}

/** A halt: a platform beside the line and its nameboard. */
export function Halts({ valley, sheet }: GroundProps) {
  return featuresOf(valley, 'halt').map(({ properties, geometry }) => {
    const [x, y] = sheet.at(geometry.coordinates);
    return (
      <g key={properties.key} transform={`translate(${x.toFixed(1)} ${y.toFixed(1)}) rotate(-8)`}>
        <path d="M6 5H32V11H6Z" className="fill-ink stroke-paper" strokeWidth="1.5" paintOrder="stroke" />
        <text x="5" y="-6" fontSize="18" className="fill-ink stroke-paper font-heading italic" strokeWidth="4.5" strokeLinejoin="round" paintOrder="stroke">the halt</text>
        <path d="M10 11V17M28 11V17M7 17H31" className="stroke-ink" strokeWidth="1.6" fill="none" />
      </g>
    );
  });
}

/** Fields: furrows, cut off at their hedges. */
export function Fields({ valley, sheet }: GroundProps) {
  return featuresOf(valley, 'field').map(({ properties, geometry }, i) => {
    const ring = (geometry.coordinates[0] ?? []).map((place) => sheet.at(place));
    const [xs, ys] = [ring.map(([x]) => x), ring.map(([, y]) => y)];
    const [left, right, top, foot] = [Math.min(...xs), Math.max(...xs), Math.min(...ys), Math.max(...ys)];
    const rows = Array.from({ length: Math.floor((foot - top) / 5) }, (_, row) => top + 3 + row * 5);
    const clip = `field-${i}`;
    return (
      <g key={properties.name}>
        <clipPath id={clip}><path d={`${pathThrough(sheet, geometry.coordinates[0] ?? [])}Z`} /></clipPath>
        <path clipPath={`url(#${clip})`} d={rows.map((row) => `M${left.toFixed(0)} ${row.toFixed(1)}q20 -4 40 0t40 0t40 0t40 0H${right.toFixed(0)}`).join('')} className="stroke-edge" strokeWidth="1" strokeDasharray="9 3" fill="none" />
      </g>
    );
  });
}

/** The ridge: hachures falling from its crest, longer and shorter by turns. */
export function Ridges({ valley, sheet }: GroundProps) {
  return featuresOf(valley, 'ridge').map(({ properties, geometry }) => {
    const crest = geometry.coordinates.map((place) => sheet.at(place));
    const strokes = crest.flatMap(([x, y], i) => {
      const [nextX, nextY] = crest[i + 1] ?? [x, y];
      return [0, 0.25, 0.5, 0.75].map((share, k) => {
        const [footX, footY] = [-1.4 + ((i + k) % 3), 5 + ((i * 5 + k * 3) % 7)];
        return `M${(x + (nextX - x) * share).toFixed(1)} ${(y + (nextY - y) * share).toFixed(1)}l${footX.toFixed(1)} ${footY}`;
      });
    });
    return <path key={properties.name} d={strokes.join('')} className="stroke-ink-soft" strokeWidth="1.1" strokeLinecap="round" fill="none" />;
  });
}

const TREE = 'M0 -24L9 -8H5L12 4H2V9H-2V4H-12L-5 -8H-9Z';

/** Drawn conifers, the nearer (lower on the sheet) in front. */
export function Woods({ valley, sheet }: GroundProps) {
  const trees = featuresOf(valley, 'wood').flatMap(({ geometry }) => geometry.coordinates.map((place) => sheet.at(place)));
  return trees.toSorted(([, a], [, b]) => a - b).map(([x, y], i) => (
    <g key={`${x} ${y}`} transform={`translate(${x.toFixed(1)} ${y.toFixed(1)}) scale(${0.72 + (i % 3) * 0.1})`}>
      <path d={TREE} className="fill-conifer stroke-paper" strokeWidth="3" paintOrder="stroke" />
      <path d="M-3 -10l-2 4M2 -4l3 4M-2 0l-3 3" className="stroke-paper" strokeWidth="1.3" fill="none" />
    </g>
  ));
}
