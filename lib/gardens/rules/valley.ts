import { z } from 'zod';

const lonLat = z.tuple([z.number(), z.number()]);
const line = z.object({ type: z.literal('LineString'), coordinates: z.array(lonLat).min(2) });
const patch = z.object({ type: z.literal('Polygon'), coordinates: z.array(z.array(lonLat).min(4)).min(1) });
const spots = z.object({ type: z.literal('MultiPoint'), coordinates: z.array(lonLat) });
const spot = z.object({ type: z.literal('Point'), coordinates: lonLat });
const feature = <P extends z.ZodType, G extends z.ZodType>(properties: P, geometry: G) => z.object({ type: z.literal('Feature'), properties, geometry });

const riverFeature = feature(z.object({ kind: z.literal('river'), key: z.string(), name: z.string(), widthMeters: lonLat }), line);
const roadFeature = feature(z.object({ kind: z.literal('road'), key: z.string(), name: z.string(), roadClass: z.enum(['main', 'road', 'lane']) }), line);
const railwayFeature = feature(z.object({ kind: z.literal('railway'), key: z.string(), name: z.string() }), line);
const haltFeature = feature(z.object({ kind: z.literal('halt'), key: z.string(), name: z.string() }), spot);
const areaFeature = feature(
  z.object({ kind: z.literal('area'), key: z.string(), name: z.string(), inWords: z.string(), homes: z.number().int(), labelPoint: lonLat }),
  patch,
);
const woodFeature = feature(z.object({ kind: z.literal('wood'), name: z.string() }), spots);
const fieldFeature = feature(z.object({ kind: z.literal('field'), name: z.string() }), patch);
const ridgeFeature = feature(z.object({ kind: z.literal('ridge'), name: z.string() }), line);

/** The GeoJSON of a valley: a feature collection whose features each say what kind of thing they draw. */
export const valleySchema = z.object({
  type: z.literal('FeatureCollection'),
  note: z.string(),
  /** What the printed map shows; roads and water run on beyond it. */
  sheet: z.tuple([z.number(), z.number(), z.number(), z.number()]),
  features: z.array(z.union([riverFeature, roadFeature, railwayFeature, haltFeature, areaFeature, woodFeature, fieldFeature, ridgeFeature])),
});

/** Longitude, latitude in degrees, in GeoJSON's order. */
export type LonLat = z.output<typeof lonLat>;
export type Valley = z.output<typeof valleySchema>;
export type ValleyFeature = Valley['features'][number];
export type ValleyFeatureKind = ValleyFeature['properties']['kind'];
export type FeatureOf<K extends ValleyFeatureKind> = Extract<ValleyFeature, { properties: { kind: K } }>;
export type RoadClass = FeatureOf<'road'>['properties']['roadClass'];

/** The valley's features of one kind, in the order they are drawn. */
export function featuresOf<K extends ValleyFeatureKind>(valley: Valley, kind: K): FeatureOf<K>[] {
  return valley.features.filter((one): one is FeatureOf<K> => one.properties.kind === kind);
}

/** A neighbourhood that the public may know: its ring, its name, and the point where its post stands. */
export interface Neighbourhood {
  readonly key: string;
  readonly name: string;
  readonly inWords: string;
  readonly homes: number;
  readonly labelPoint: LonLat;
  readonly ring: readonly LonLat[];
}

/** All neighbourhoods of the valley; none of their points depends on where a garden is. */
export function neighbourhoodsOf(valley: Valley): Neighbourhood[] {
  return featuresOf(valley, 'area').map(({ properties: { key, name, inWords, homes, labelPoint }, geometry }) => ({
    key, name, inWords, homes, labelPoint, ring: geometry.coordinates[0] ?? [],
  }));
}
