import type { gardenAreas, gardenPlaces, gardenPlants, gardens, plants } from '@/db/schema/gardens';
import type { areaMinutes, placeMinutes } from '@/db/schema/opendays';
import type { Id } from '@/lib/core/ids';
import { instantOf } from '@/lib/core/time';
import { areaFaults } from '@/lib/gardens/rules/area';
import type { Place } from '@/lib/gardens/rules/geodesic';
import { roadGraph } from '@/lib/gardens/rules/roads';
import { areaMinutesTable, minutesBetween } from '@/lib/gardens/rules/travel';
import { type Neighbourhood, neighbourhoodsOf } from '@/lib/gardens/rules/valley';
import { builtInValley } from '@/lib/gardens/rules/valley-data';
import { ZONE } from './calendar';
import { GARDENS, type SeedGarden } from './gardens';
import { MORE_GARDENS } from './gardens-more';
import { diceFor, seedId } from './ids';
import type { Member } from './members';
import { PLANTING } from './planting';
import { PLANTS } from './plants';

export const ALL_GARDENS: readonly SeedGarden[] = [...GARDENS, ...MORE_GARDENS];
export const gardenId = (slug: string): Id<'garden'> => seedId<'garden'>(`garden ${slug}`);

const areas = new Map(neighbourhoodsOf(builtInValley).map((area) => [area.key, area]));

function areaOf({ slug, areaKey }: SeedGarden): Neighbourhood {
  const area = areas.get(areaKey);
  if (!area) throw new Error(`${slug} lies in no neighbourhood of the valley`);
  return area;
}

/** An exact place that the club's own rule accepts in its neighbourhood: thrown until it lands off every guessable point. */
export function placeOf(garden: SeedGarden): Place {
  const { ring, homes } = areaOf(garden);
  const dice = diceFor(`place ${garden.slug}`);
  const [lons, lats] = [ring.map(([lon]) => lon), ring.map(([, lat]) => lat)];
  const within = (values: number[]): number => Math.min(...values) + dice.next() * (Math.max(...values) - Math.min(...values));
  for (let tries = 0; tries < 500; tries++) {
    const place = { lat: Number(within(lats).toFixed(5)), lon: Number(within(lons).toFixed(5)) };
    if (areaFaults(ring, place, homes).length === 0) return place;
  }
  throw new Error(`no place was found for ${garden.slug}`);
}

export type GardenRows = {
  gardens: (typeof gardens.$inferInsert)[]; places: (typeof gardenPlaces.$inferInsert)[]; areas: (typeof gardenAreas.$inferInsert)[];
  plants: (typeof plants.$inferInsert)[]; planting: (typeof gardenPlants.$inferInsert)[];
};

function toGarden(garden: SeedGarden, roll: readonly Member[], year: number): typeof gardens.$inferInsert {
  const household = roll.find(({ number }) => number === garden.host);
  if (!household) throw new Error(`${garden.slug} has no host`);
  return {
    id: gardenId(garden.slug), slug: garden.slug, railwayName: garden.railwayName, shortName: garden.shortName, householdId: household.id, hostsShownAs: garden.hostsShownAs, subtitle: garden.subtitle, about: garden.about,
    scaleOneTo: garden.scaleOneTo, gaugeMm: garden.gaugeMm, trackLengthMm: garden.trackLengthMm, minRadiusMm: garden.minRadiusMm, steepestGradePercent: garden.steepestGradePercent, powers: garden.powers, bridge: garden.bridge,
    setIn: garden.setIn, begunYear: garden.begunYear, plate: garden.plate, isStepFree: garden.isStepFree, pathWidthMm: garden.pathWidthMm, pathSurface: garden.pathSurface, stepsNote: garden.stepsNote, trackHeightMm: garden.trackHeightMm,
    seats: garden.seats, hasToilet: garden.hasToilet, dogsNote: garden.dogsNote, parkingNote: garden.parkingNote, water: garden.water, waterNote: garden.waterNote, cautions: garden.cautions, stayMinutes: garden.stayMinutes,
    headsLimit: garden.headsLimit, publishedAt: instantOf(`${year - 1}-03-01`, '12:00', ZONE),
  };
}

/** The rows of the twelve gardens, their places, neighbourhoods and planting. */
export function gardenRows(roll: readonly Member[], year: number): GardenRows {
  return {
    gardens: ALL_GARDENS.map((garden) => toGarden(garden, roll, year)),
    places: ALL_GARDENS.map((garden) => ({ gardenId: gardenId(garden.slug), ...placeOf(garden), address: `${3 + diceFor(`house ${garden.slug}`).whole(56)} ${garden.road}, Alder Fork`, directions: garden.directions })),
    areas: ALL_GARDENS.map((garden) => {
      const { key, name, ring, labelPoint: [labelLon, labelLat] } = areaOf(garden);
      return { gardenId: gardenId(garden.slug), areaKey: key, name, caption: garden.caption, polygon: [...ring], labelLat, labelLon };
    }),
    plants: PLANTS.map(([key, commonName, botanicalName, colour, bloomMonths, drawing, isEvergreen]) => ({ key, commonName, botanicalName, colour, bloomMonths: [...bloomMonths], drawing, isEvergreen: isEvergreen ?? false })),
    planting: ALL_GARDENS.flatMap(({ slug }) => (PLANTING[slug] ?? []).map(([plantKey, heightMm]) => ({ gardenId: gardenId(slug), plantKey, heightMm }))),
  };
}

/** Minutes between every two gardens: the published ones from label points alone, the officers' from the places themselves. */
export function minutesRows(): { area: (typeof areaMinutes.$inferInsert)[]; place: (typeof placeMinutes.$inferInsert)[] } {
  const graph = roadGraph(builtInValley);
  const table = new Map(areaMinutesTable(graph, [...areas.values()]).map(({ fromKey, toKey, minutes }) => [`${fromKey} ${toKey}`, minutes]));
  const places = new Map(ALL_GARDENS.map((garden) => [garden.slug, placeOf(garden)]));
  const pairs = ALL_GARDENS.flatMap((from) => ALL_GARDENS.filter((to) => to !== from).map((to) => ({ from, to })));
  return {
    area: pairs.map(({ from, to }) => ({ fromGardenId: gardenId(from.slug), toGardenId: gardenId(to.slug), minutes: table.get(`${from.areaKey} ${to.areaKey}`) ?? 5 })),
    place: pairs.map(({ from, to }) => ({ fromGardenId: gardenId(from.slug), toGardenId: gardenId(to.slug), minutes: Math.ceil(minutesBetween(graph, places.get(from.slug) ?? placeOf(from), places.get(to.slug) ?? placeOf(to))) })),
  };
}
