import { sql } from 'drizzle-orm';
import { boolean, check, doublePrecision, index, integer, jsonb, numeric, pgTable, primaryKey, smallint, text } from 'drizzle-orm/pg-core';
import { POWERS, BRIDGES, WATERS } from '../../lib/core/words'; // relative: the migration tool knows no aliases
import { idOf, instant, ownId } from './columns';
import { households } from './people';


/** What the plate needs beyond the particulars; everything has a default drawn from the garden's own id. */
export type PlateNotes = { stock?: string[]; joke?: string; sky?: string };

/** A garden as visitors may know it: layout, path, planting, access. No exact place here, ever. */
export const gardens = pgTable('gardens', {
  id: ownId<'garden'>(),
  slug: text().notNull().unique(),
  railwayName: text().notNull(),
  shortName: text().notNull(), // "Saltmarsh": for lines and sentences
  householdId: idOf<'household'>().notNull().references(() => households.id),
  hostsShownAs: text(), // first names, only if they say so
  subtitle: text().notNull(), // "a narrow-gauge line among dwarf pines"
  about: text(),
  // the railway
  scaleOneTo: numeric({ precision: 6, scale: 3, mode: 'number' }).notNull(), // 22.5
  gaugeMm: numeric({ precision: 5, scale: 1, mode: 'number' }).notNull(), // 45
  trackLengthMm: integer().notNull(),
  minRadiusMm: integer(),
  steepestGradePercent: numeric({ precision: 4, scale: 2, mode: 'number' }),
  powers: text({ enum: POWERS }).array().notNull(),
  bridge: text({ enum: BRIDGES }).notNull().default('none'),
  setIn: text(), // "a branch line, about 1928"
  begunYear: smallint(),
  plate: jsonb().$type<PlateNotes>().notNull().default({}),
  // the way round
  isStepFree: boolean().notNull(),
  pathWidthMm: integer(),
  pathSurface: text(), // "gravel, level"
  stepsNote: text(), // "two steps at the gate; a ramp on asking"
  trackHeightMm: integer(),
  seats: integer(),
  hasToilet: boolean().notNull().default(false),
  dogsNote: text(),
  parkingNote: text(), // words that give no street away
  water: text({ enum: WATERS }).notNull().default('none'),
  waterNote: text(), // "the pond is railed on one side only"
  cautions: text().array().notNull().default(sql`'{}'`),
  // limits
  stayMinutes: integer().notNull().default(35),
  headsLimit: integer().notNull(),
  publishedAt: instant(),
  withdrawnAt: instant(),
}, (t) => [
  index('gardens_by_household').on(t.householdId),
  check('gardens_scale_range', sql`${t.scaleOneTo} between 4 and 100`),
  check('gardens_gauge_range', sql`${t.gaugeMm} between 9 and 300`),
  check('gardens_track_positive', sql`${t.trackLengthMm} > 0`),
  check('gardens_stay_range', sql`${t.stayMinutes} between 5 and 240`),
  check('gardens_heads_range', sql`${t.headsLimit} between 1 and 500`),
  check('gardens_slug_shape', sql`${t.slug} ~ '^[a-z0-9]+(-[a-z0-9]+)*$'`),
]);

/** The exact place. Never joined by public queries; each showing is recorded. */
export const gardenPlaces = pgTable('garden_places', {
  gardenId: idOf<'garden'>().primaryKey().references(() => gardens.id),
  lat: doublePrecision().notNull(),
  lon: doublePrecision().notNull(),
  address: text().notNull(),
  directions: text(),
}, (t) => [check('garden_places_on_earth', sql`${t.lat} between -90 and 90 and ${t.lon} between -180 and 180`)]);

/** The neighbourhood the public may know: a polygon stored once, with a label point of its own. */
export const gardenAreas = pgTable('garden_areas', {
  gardenId: idOf<'garden'>().primaryKey().references(() => gardens.id),
  areaKey: text().notNull(), // the valley map's area
  name: text().notNull(), // "the middle of the town"
  caption: text().notNull(), // "Somewhere in the middle of the town, a short walk south of the river."
  polygon: jsonb().$type<[number, number][]>().notNull(), // lon, lat; closed
  labelLat: doublePrecision().notNull(),
  labelLon: doublePrecision().notNull(),
});

export const plants = pgTable('plants', {
  key: text().primaryKey(), // "thyme"
  commonName: text().notNull(),
  botanicalName: text().notNull(),
  colour: text().notNull(), // "mauve", "evergreen"
  bloomMonths: smallint().array().notNull(), // 1 to 12
  isEvergreen: boolean().notNull().default(false),
  drawing: text().notNull(), // which of our drawings stands for it
});

export const gardenPlants = pgTable('garden_plants', {
  gardenId: idOf<'garden'>().notNull().references(() => gardens.id),
  plantKey: text().notNull().references(() => plants.key),
  heightMm: integer().notNull(),
  note: text(),
}, (t) => [primaryKey({ columns: [t.gardenId, t.plantKey, t.heightMm] }), check('garden_plants_height_positive', sql`${t.heightMm} > 0`)]);

/** Each time an exact place was shown: to whom, in what part. Append-only. */
export const placeShowings = pgTable('place_showings', {
  id: ownId(),
  gardenId: idOf<'garden'>().notNull().references(() => gardens.id),
  at: instant().notNull(),
  viewerKind: text().notNull(), // booking, gate, host, officer, letter, feed
  viewerId: text().notNull(),
}, (t) => [index('place_showings_by_garden').on(t.gardenId, t.at.desc())]);
