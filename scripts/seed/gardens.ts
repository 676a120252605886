import type { Bridge, Power, Water } from '@/lib/core/words';

/** A demo garden as its host would describe it; `host` is the household's number on the roll. */
export type SeedGarden = {
  slug: string; railwayName: string; shortName: string; areaKey: string; host: number; hostsShownAs: string | null; subtitle: string; about: string;
  scaleOneTo: number; gaugeMm: number; trackLengthMm: number; minRadiusMm: number; steepestGradePercent: number | null; powers: Power[]; bridge: Bridge; setIn: string; begunYear: number;
  plate: { stock?: string[]; joke?: string; sky?: string };
  isStepFree: boolean; pathWidthMm: number; pathSurface: string; stepsNote: string | null; trackHeightMm: number; seats: number; hasToilet: boolean; dogsNote: string; parkingNote: string;
  water: Water; waterNote: string | null; cautions: string[]; stayMinutes: number; headsLimit: number;
  road: string; caption: string; directions: string;
};

const DOGS = 'Assistance dogs only: the trains are the height of a cat.';

export const GARDENS: readonly SeedGarden[] = [
  {
    slug: 'saltmarsh-and-plover', railwayName: 'Saltmarsh & Plover', shortName: 'Saltmarsh', areaKey: 'the-saltings', host: 4, hostsShownAs: 'Ife and Tobin', subtitle: 'a branch line on seven arches over the lagoon',
    about: 'The tide comes in twice a day, by watering can. Battery railcars keep time with it on a viaduct of seven arches, cast one a winter in a bread tin.',
    scaleOneTo: 20.3, gaugeMm: 45, trackLengthMm: 58_000, minRadiusMm: 1500, steepestGradePercent: 1.8, powers: ['battery'], bridge: 'viaduct', setIn: 'a coast line, about 1935', begunYear: 2009, plate: { stock: ['railcar', 'open'], joke: 'snail', sky: 'clouds' },
    isStepFree: true, pathWidthMm: 1100, pathSurface: 'brick, level', stepsNote: null, trackHeightMm: 450, seats: 6, hasToilet: false, dogsNote: DOGS, parkingNote: 'On the grass verge, where a plover stands on a stick.',
    water: 'lagoon', waterNote: 'The lagoon is knee deep and has no rail', cautions: [], stayMinutes: 35, headsLimit: 26, road: 'Saltings Lane', caption: 'Somewhere in the saltings, between the old line and Quarry Road.', directions: 'Through the blue side gate; the path is on the left of the house.',
  },
  {
    slug: 'mossgill-quarry-tramway', railwayName: 'Mossgill Quarry Tramway', shortName: 'Mossgill', areaKey: 'the-quarry-end', host: 9, hostsShownAs: 'Maud', subtitle: 'slate tubs and a saddle tank among ferns',
    about: 'An incline, two levels and a saddle tank that has never been in a hurry. The slate is real and so are the ferns.',
    scaleOneTo: 13.7, gaugeMm: 45, trackLengthMm: 34_000, minRadiusMm: 900, steepestGradePercent: 3.1, powers: ['live-steam', 'battery'], bridge: 'none', setIn: 'a slate quarry, about 1900', begunYear: 1998, plate: { stock: ['saddle', 'tub', 'tub'], joke: 'trowel', sky: 'drizzle' },
    isStepFree: false, pathWidthMm: 900, pathSurface: 'slate chips, rising', stepsNote: 'three steps up to the second level; everything can be seen from the first', trackHeightMm: 600, seats: 4, hasToilet: false, dogsNote: DOGS, parkingNote: 'In the lay-by at the quarry gates.',
    water: 'none', waterNote: null, cautions: ['Slate is slippery after rain.'], stayMinutes: 30, headsLimit: 18, road: 'Orchard Hill', caption: 'Somewhere at the quarry end, south of Quarry Road.', directions: 'Up the drive, past the greenhouse, and listen for the whistle.',
  },
  {
    slug: 'pine-barrow-light-railway', railwayName: 'Pine Barrow Light Railway', shortName: 'Pine Barrow', areaKey: 'the-middle-of-the-town', host: 1, hostsShownAs: 'Ada and Piers', subtitle: 'a narrow-gauge line among dwarf pines',
    about: 'A light railway of the kind that was always about to be extended. A 24-inch trestle over the pond, thyme for a meadow, dwarf spruce for a forest, and steam whenever the kettle is on.',
    scaleOneTo: 22.5, gaugeMm: 45, trackLengthMm: 64_600, minRadiusMm: 1220, steepestGradePercent: 2.4, powers: ['live-steam', 'battery'], bridge: 'trestle', setIn: 'a branch line, about 1928', begunYear: 2004, plate: { stock: ['tank', 'balcony', 'coach'], joke: 'boot', sky: 'ruled' },
    isStepFree: true, pathWidthMm: 965, pathSurface: 'gravel, level', stepsNote: null, trackHeightMm: 457, seats: 8, hasToilet: true, dogsNote: DOGS, parkingNote: 'In the halt yard, a short walk away; not in the street, please.',
    water: 'pond', waterNote: 'The pond is railed on one side only', cautions: ['Sparks now and then: keep loose scarves from the firing side.'], stayMinutes: 35, headsLimit: 28, road: 'Halt Street', caption: 'Somewhere in the middle of the town, a short walk south of the river.', directions: 'The green door in the wall; ring the loco bell.',
  },
  {
    slug: 'thistledown-junction', railwayName: 'Thistledown Junction', shortName: 'Thistledown', areaKey: 'below-the-mill', host: 12, hostsShownAs: 'Jun and Petra', subtitle: 'a main line under apple blossom, 640 feet of it',
    about: 'Two tracks, four stations and a junction that works. Expresses run under dwarf apples, and the stopping train waits its turn as it should.',
    scaleOneTo: 29, gaugeMm: 45, trackLengthMm: 195_000, minRadiusMm: 2400, steepestGradePercent: 1.2, powers: ['track'], bridge: 'girder', setIn: 'a main line, 1958', begunYear: 1991, plate: { stock: ['diesel', 'coach', 'coach', 'coach'], joke: 'apple', sky: 'rays' },
    isStepFree: true, pathWidthMm: 1300, pathSurface: 'paving, level', stepsNote: null, trackHeightMm: 300, seats: 14, hasToilet: true, dogsNote: 'Dogs on a short lead on the lower lawn.', parkingNote: 'In the mill field, signed from the bridge.',
    water: 'brook', waterNote: null, cautions: [], stayMinutes: 40, headsLimit: 40, road: 'Mill Hill', caption: 'Somewhere below the mill, on the way out east.', directions: 'In at the field gate, out at the house gate.',
  },
  {
    slug: 'copperkettle-and-western', railwayName: 'Copperkettle & Western', shortName: 'Copperkettle', areaKey: 'the-ridge', host: 15, hostsShownAs: 'Rosalind', subtitle: 'a logging road over a truss and down to the pond',
    about: 'Geared engines and log cars climb from the mill pond to the top of the rockery in eleven minutes. Nobody has ever needed the logs.',
    scaleOneTo: 20.3, gaugeMm: 45, trackLengthMm: 71_000, minRadiusMm: 1370, steepestGradePercent: 4.0, powers: ['live-steam'], bridge: 'truss', setIn: 'a logging road, 1912', begunYear: 2001, plate: { stock: ['tank', 'logs', 'logs', 'van'], joke: 'cat', sky: 'rings' },
    isStepFree: false, pathWidthMm: 850, pathSurface: 'bark, sloping', stepsNote: 'eight steps down to the pond, with a rail', trackHeightMm: 500, seats: 6, hasToilet: false, dogsNote: DOGS, parkingNote: 'On the common, two minutes downhill.',
    water: 'pond', waterNote: 'The pond is deep at the mill', cautions: ['The path is steep in two places.'], stayMinutes: 35, headsLimit: 22, road: 'Ridge Road', caption: 'Somewhere on the ridge, north of Valley Road.', directions: 'Follow the handrail of old boiler tube.',
  },
  {
    slug: 'tansy-bank-and-dunlin', railwayName: 'Tansy Bank & Dunlin', shortName: 'Tansy Bank', areaKey: 'above-the-weir', host: 18, hostsShownAs: 'Hollis and Bea', subtitle: 'a railbus along a bank of herbs',
    about: 'One railbus, nine stops and forty herbs, all of which may be smelled. The railbus stops for hedgehogs.',
    scaleOneTo: 24, gaugeMm: 45, trackLengthMm: 41_000, minRadiusMm: 1200, steepestGradePercent: 2.0, powers: ['battery'], bridge: 'none', setIn: 'a country railbus, 1951', begunYear: 2013, plate: { stock: ['railcar'], joke: 'hedgehog', sky: 'ruled' },
    isStepFree: true, pathWidthMm: 1200, pathSurface: 'brick, level', stepsNote: null, trackHeightMm: 700, seats: 10, hasToilet: true, dogsNote: 'Dogs on a short lead.', parkingNote: 'At the weir car park, opposite the lane.',
    water: 'none', waterNote: null, cautions: ['Bees, and plenty of them, from May to September.'], stayMinutes: 30, headsLimit: 24, road: 'Ridge Road', caption: 'Somewhere above the weir, on the north bank.', directions: 'Under the arch of hops.',
  },
];
