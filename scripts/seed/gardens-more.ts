import type { SeedGarden } from './gardens';

const DOGS = 'Assistance dogs only, please.';

export const MORE_GARDENS: readonly SeedGarden[] = [
  {
    slug: 'old-orchard-line', railwayName: 'Old Orchard Line', shortName: 'Old Orchard', areaKey: 'the-old-orchards', host: 21, hostsShownAs: 'Lorcan', subtitle: 'an orchard branch under dwarf apples',
    about: 'Milk, mail and apples, in that order, behind a tank engine that drinks rain water only. Opens at noon, because the host plays the organ.',
    scaleOneTo: 32, gaugeMm: 45, trackLengthMm: 52_000, minRadiusMm: 1500, steepestGradePercent: 1.5, powers: ['live-steam'], bridge: 'none', setIn: 'an orchard branch, about 1910', begunYear: 1995, plate: { stock: ['tank', 'van', 'milk', 'van'], joke: 'mug', sky: 'rings' },
    isStepFree: false, pathWidthMm: 900, pathSurface: 'grass, level', stepsNote: 'one step at the gate; a board is laid on asking', trackHeightMm: 250, seats: 6, hasToilet: false, dogsNote: DOGS, parkingNote: 'Along the orchard wall, on the far side.',
    water: 'none', waterNote: null, cautions: ['Windfalls underfoot from August.'], stayMinutes: 35, headsLimit: 20, road: 'Orchard Hill', caption: 'Somewhere in the old orchards, on the north bank.', directions: 'The third gate in the long wall.',
  },
  {
    slug: 'nightjar-mineral-railway', railwayName: 'Nightjar Mineral Railway', shortName: 'Nightjar', areaKey: 'the-kilns', host: 24, hostsShownAs: null, subtitle: 'a mineral line lit for the evening',
    about: 'Ore goes down, coal goes up, and lamps come on at dusk in every hut. Best seen late in the day.',
    scaleOneTo: 13.7, gaugeMm: 45, trackLengthMm: 30_000, minRadiusMm: 900, steepestGradePercent: 2.8, powers: ['battery'], bridge: 'girder', setIn: 'a mineral line, 1922', begunYear: 2016, plate: { stock: ['diesel', 'van'], joke: 'pot', sky: 'stars' },
    isStepFree: true, pathWidthMm: 1000, pathSurface: 'gravel, level', stepsNote: null, trackHeightMm: 550, seats: 5, hasToilet: false, dogsNote: DOGS, parkingNote: 'In the kiln yard.',
    water: 'none', waterNote: null, cautions: ['Low light at dusk: mind the edging.'], stayMinutes: 30, headsLimit: 18, road: 'Mill Hill', caption: 'Somewhere by the kilns, under the moor.', directions: 'Between the two kilns and left.',
  },
  {
    slug: 'bellwether-street-tram', railwayName: 'Bellwether Street Tram', shortName: 'Bellwether', areaKey: 'the-halt-side', host: 27, hostsShownAs: 'Ottoline and Ray', subtitle: 'a tram under the wire on a street of houseleeks',
    about: 'A street, a depot and a seaside that is round the corner and always will be. The wire is live at twelve volts; the conductor is four years old.',
    scaleOneTo: 22.5, gaugeMm: 45, trackLengthMm: 22_000, minRadiusMm: 600, steepestGradePercent: null, powers: ['overhead'], bridge: 'none', setIn: 'a town tramway, 1926', begunYear: 2018, plate: { stock: ['tram'], joke: 'hand', sky: 'rays' },
    isStepFree: true, pathWidthMm: 1500, pathSurface: 'paving, level', stepsNote: null, trackHeightMm: 650, seats: 8, hasToilet: true, dogsNote: 'Dogs welcome on a lead.', parkingNote: 'In the halt yard; the tram meets no trains.',
    water: 'none', waterNote: null, cautions: [], stayMinutes: 25, headsLimit: 22, road: 'Halt Street', caption: 'Somewhere on the halt side, a short walk west of the town.', directions: 'Ring at the depot doors.',
  },
  {
    slug: 'curlew-pier-railway', railwayName: 'Curlew Pier Railway', shortName: 'Curlew Pier', areaKey: 'the-ferry-end', host: 30, hostsShownAs: 'Sorrel', subtitle: 'a pier on trestles into a sea of gravel',
    about: 'Forty trestle bents carry a pier railway out over a lagoon the size of two bath mats. Bring a bucket.',
    scaleOneTo: 29, gaugeMm: 45, trackLengthMm: 37_000, minRadiusMm: 1100, steepestGradePercent: 0.8, powers: ['battery', 'clockwork'], bridge: 'pier', setIn: 'a pier, 1934', begunYear: 2007, plate: { stock: ['diesel', 'open', 'open'], joke: 'ball', sky: 'rings' },
    isStepFree: true, pathWidthMm: 1000, pathSurface: 'boards, level', stepsNote: null, trackHeightMm: 400, seats: 6, hasToilet: false, dogsNote: DOGS, parkingNote: 'On the hard by the ferry.',
    water: 'lagoon', waterNote: 'The lagoon is shallow and open on all sides', cautions: [], stayMinutes: 30, headsLimit: 20, road: 'Ferry Lane', caption: 'Somewhere at the ferry end, on the north bank.', directions: 'Along the boards beside the boathouse.',
  },
  {
    slug: 'inchworm-and-vale', railwayName: 'Inchworm & Vale', shortName: 'Inchworm', areaKey: 'the-long-meadows', host: 33, hostsShownAs: 'Averil and Kit', subtitle: 'a brick viaduct among irises',
    about: 'Six thousand small bricks, laid one at a time, carry a stopping train across the vale. It takes as long as it takes.',
    scaleOneTo: 32, gaugeMm: 32, trackLengthMm: 63_000, minRadiusMm: 1400, steepestGradePercent: 1.6, powers: ['live-steam'], bridge: 'viaduct', setIn: 'a stopping train, 1907', begunYear: 1988, plate: { stock: ['tank', 'coach', 'coach', 'coach'], joke: 'can', sky: 'clouds' },
    isStepFree: true, pathWidthMm: 950, pathSurface: 'gravel, level', stepsNote: null, trackHeightMm: 350, seats: 8, hasToilet: true, dogsNote: DOGS, parkingNote: 'In the meadow, when it is dry.',
    water: 'brook', waterNote: null, cautions: ['The meadow is soft after rain.'], stayMinutes: 35, headsLimit: 26, road: 'Barrow Lane', caption: 'Somewhere in the long meadows, between the forks.', directions: 'Over the plank bridge, one at a time.',
  },
  {
    slug: 'gorsefoot-timber-line', railwayName: 'Gorsefoot Timber Line', shortName: 'Gorsefoot', areaKey: 'the-timber-side', host: 36, hostsShownAs: 'Ulla', subtitle: 'geared diesels and log cars under snow in May',
    about: 'A timber line high enough for snow, which is felt, and stays on until June. Geared diesels and very small lumberjacks.',
    scaleOneTo: 20.3, gaugeMm: 45, trackLengthMm: 46_000, minRadiusMm: 1200, steepestGradePercent: 3.5, powers: ['battery'], bridge: 'trestle', setIn: 'a timber line, 1947', begunYear: 2011, plate: { stock: ['diesel', 'logs', 'logs'], joke: 'robin', sky: 'drizzle' },
    isStepFree: false, pathWidthMm: 800, pathSurface: 'bark, rising', stepsNote: 'four sleepers up to the summit', trackHeightMm: 500, seats: 4, hasToilet: false, dogsNote: DOGS, parkingNote: 'At the saw bench, nose in.',
    water: 'brook', waterNote: null, cautions: [], stayMinutes: 30, headsLimit: 16, road: 'Timber Lane', caption: 'Somewhere on the timber side, up the north fork.', directions: 'Past the log pile; the gate sticks.',
  },
];
