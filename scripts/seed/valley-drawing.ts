/**
 * The hand drawing of the demo club's valley: lines through a few points, on a sheet 1600 wide and 1100 high
 * (10 m to the unit, y down). Every name and every line is invented. Where two lines share a point, they meet.
 */
export type Pen = readonly (readonly [number, number])[];

export interface RoadDrawing {
  readonly key: string;
  readonly name: string;
  readonly roadClass: 'main' | 'road' | 'lane';
  readonly pen: Pen;
}

/** Roads, drawn W to E and N to S; main roads last in a crossing lie on top. */
export const roadDrawings: readonly RoadDrawing[] = [
  { key: 'ridge', name: 'Ridge Road', roadClass: 'lane', pen: [[-40, 178], [100, 150], [250, 92], [428, 84], [560, 42], [700, 70], [880, 34], [1072, 78], [1205, 52], [1338, 96], [1460, 66], [1560, 104], [1650, 96]] },
  { key: 'valley', name: 'Valley Road', roadClass: 'main', pen: [[-40, 398], [92, 400], [260, 342], [398, 356], [560, 372], [722, 336], [880, 296], [1046, 322], [1200, 336], [1352, 300], [1460, 262], [1572, 280], [1650, 270]] },
  { key: 'quarry', name: 'Quarry Road', roadClass: 'main', pen: [[-40, 812], [84, 800], [230, 742], [382, 776], [560, 800], [738, 742], [900, 716], [1056, 770], [1200, 832], [1342, 806], [1456, 772], [1566, 812], [1650, 830]] },
  { key: 'moor', name: 'Moor Lane', roadClass: 'lane', pen: [[-40, 1014], [96, 1040], [260, 1066], [444, 1036], [600, 1058], [752, 1020], [900, 1030], [1046, 1058], [1200, 1070], [1362, 1040], [1470, 1024], [1572, 1056], [1650, 1060]] },
  { key: 'ferry', name: 'Ferry Lane', roadClass: 'lane', pen: [[70, -40], [100, 150], [66, 270], [92, 400], [100, 446]] },
  { key: 'saltings', name: 'Saltings Lane', roadClass: 'lane', pen: [[122, 572], [80, 690], [84, 800], [116, 910], [96, 1040], [70, 1140]] },
  { key: 'orchard', name: 'Orchard Hill', roadClass: 'road', pen: [[448, -40], [428, 84], [380, 220], [398, 356], [452, 474], [424, 620], [382, 776], [426, 900], [444, 1036], [420, 1140]] },
  { key: 'halt', name: 'Halt Street', roadClass: 'road', pen: [[684, -40], [700, 70], [752, 200], [722, 336], [744, 462], [706, 590], [738, 742], [788, 880], [752, 1020], [764, 1140]] },
  { key: 'mill', name: 'Mill Hill', roadClass: 'road', pen: [[1096, -40], [1072, 78], [1020, 200], [1046, 322], [1094, 400], [1088, 520], [1030, 650], [1056, 770], [1018, 900], [1046, 1058], [1070, 1140]] },
  { key: 'barrow', name: 'Barrow Lane', roadClass: 'road', pen: [[1310, -40], [1338, 96], [1388, 200], [1352, 300], [1322, 420], [1362, 620], [1342, 806], [1390, 920], [1362, 1040], [1338, 1140]] },
  { key: 'timber', name: 'Timber Lane', roadClass: 'lane', pen: [[1590, -40], [1560, 104], [1546, 190], [1572, 280], [1548, 420], [1580, 620], [1566, 812], [1544, 920], [1572, 1056], [1586, 1140]] },
  { key: 'chapel', name: 'Chapel Lane', roadClass: 'lane', pen: [[738, 742], [860, 842], [916, 950], [1046, 1058]] },
  { key: 'warren', name: 'Warren Lane', roadClass: 'lane', pen: [[382, 776], [262, 860], [214, 960], [96, 1040]] },
];

/** The Alder and its north fork in one line, then the south fork; both drawn downstream to upstream. */
export const riverDrawings = [
  { key: 'alder', name: 'the Alder', widthMeters: [360, 110], pen: [[-60, 520], [60, 500], [180, 452], [330, 424], [470, 444], [620, 440], [780, 404], [920, 384], [1020, 404], [1130, 420], [1240, 404], [1360, 376], [1480, 352], [1580, 362], [1680, 340]] },
  { key: 'south-fork', name: 'the South Fork', widthMeters: [110, 80], pen: [[1020, 404], [1070, 452], [1140, 520], [1250, 566], [1362, 612], [1450, 672], [1560, 690], [1680, 728]] },
] as const;

/** One railway with its halt, which gave the valley's town its station that was never built. */
export const railwayDrawing: Pen = [[-60, 612], [60, 588], [190, 536], [320, 504], [452, 512], [600, 516], [744, 488], [900, 452], [1010, 466], [1110, 466], [1220, 458], [1330, 440], [1460, 420], [1570, 428], [1680, 412]];
export const haltPoint = [744, 488] as const;

/** Field edges and banks that bound a neighbourhood where no road does. */
export const hedgeDrawings: Readonly<Record<string, Pen>> = {
  ferryWest: [[44, 420], [22, 340], [40, 290], [20, 230], [44, 190], [34, 140]],
  saltingsWest: [[20, 560], [40, 620], [18, 690], [46, 740], [30, 840]],
  millNorth: [[1010, 600], [1060, 574], [1130, 590], [1180, 560], [1240, 600], [1310, 590], [1400, 640]],
  quarrySouth: [[400, 1000], [470, 1012], [540, 986], [610, 1010], [690, 980], [800, 1000]],
  kilnsEast: [[1300, 780], [1290, 860], [1316, 930], [1296, 1000], [1310, 1080]],
  timberEast: [[1520, 40], [1530, 110], [1506, 170], [1530, 230], [1520, 320]],
  weirEast: [[1000, 0], [1010, 70], [980, 140], [1004, 220], [984, 280], [1000, 340]],
  orchardsEast: [[680, 20], [664, 90], [700, 160], [668, 240], [690, 310], [676, 390]],
};

export interface AreaDrawing {
  readonly key: string;
  readonly name: string;
  readonly inWords: string;
  readonly homes: number;
  readonly label: readonly [number, number];
  /** The lines that bound it, in order round the patch; each meets the next. */
  readonly bounds: readonly string[];
}

/** Neighbourhoods: an invented count of homes, a label point chosen by eye for the neighbourhood alone. */
export const areaDrawings: readonly AreaDrawing[] = [
  { key: 'the-ferry-end', name: 'the ferry end', inWords: 'the ferry end, on the north bank', homes: 140, label: [226, 232], bounds: ['ridge', 'orchard', 'valley', 'ferryWest'] },
  { key: 'the-old-orchards', name: 'the old orchards', inWords: 'the old orchards, on the north bank', homes: 210, label: [544, 218], bounds: ['ridge', 'orchardsEast', 'valley', 'orchard'] },
  { key: 'above-the-weir', name: 'above the weir', inWords: 'the north bank, above the weir', homes: 180, label: [876, 176], bounds: ['ridge', 'weirEast', 'valley', 'halt'] },
  { key: 'the-ridge', name: 'the ridge', inWords: 'the ridge, on the north bank', homes: 120, label: [1196, 206], bounds: ['ridge', 'barrow', 'valley', 'mill'] },
  { key: 'the-timber-side', name: 'the timber side', inWords: 'the timber side, up the north fork', homes: 95, label: [1452, 184], bounds: ['ridge', 'timberEast', 'valley', 'barrow'] },
  { key: 'the-saltings', name: 'the saltings', inWords: 'the saltings, down the valley', homes: 160, label: [226, 638], bounds: ['railway', 'orchard', 'quarry', 'saltingsWest'] },
  { key: 'the-halt-side', name: 'the halt side', inWords: 'the halt side, west of the town', homes: 320, label: [570, 640], bounds: ['railway', 'halt', 'quarry', 'orchard'] },
  { key: 'the-middle-of-the-town', name: 'the middle of the town', inWords: 'the middle of the town', homes: 540, label: [882, 590], bounds: ['railway', 'mill', 'quarry', 'halt'] },
  { key: 'below-the-mill', name: 'below the mill', inWords: 'below the mill, on the way out east', homes: 230, label: [1196, 690], bounds: ['millNorth', 'barrow', 'quarry', 'mill'] },
  { key: 'the-long-meadows', name: 'the long meadows', inWords: 'the long meadows, between the forks', homes: 110, label: [1456, 540], bounds: ['railway', 'timber', 'south-fork', 'barrow'] },
  { key: 'the-quarry-end', name: 'the quarry end', inWords: 'the quarry end, on the south side', homes: 170, label: [590, 884], bounds: ['quarry', 'halt', 'quarrySouth', 'orchard'] },
  { key: 'the-kilns', name: 'the kilns', inWords: 'the kilns, under the moor', homes: 130, label: [1170, 928], bounds: ['quarry', 'kilnsEast', 'moor', 'mill'] },
  { key: 'the-chapel-rise', name: 'the chapel rise', inWords: 'the chapel rise, south of the town', homes: 190, label: [940, 850], bounds: ['quarry', 'mill', 'chapel'] },
  { key: 'the-barrows', name: 'the barrows', inWords: 'the barrows, under the moor', homes: 75, label: [300, 960], bounds: ['warren', 'orchard', 'moor'] },
  { key: 'the-heath', name: 'the heath', inWords: 'the heath, on the way out east', homes: 60, label: [1460, 910], bounds: ['quarry', 'timber', 'moor', 'barrow'] },
];

/** Woods are clumps of drawn trees, fields are furrows, the ridge is a line of hachures. */
export const woodDrawings: readonly { readonly name: string; readonly trees: Pen }[] = [
  { name: 'Gorsefoot Wood', trees: [[1600, 160], [1618, 205], [1588, 226], [1612, 120], [1592, 60]] },
  { name: 'Ferry Copse', trees: [[16, 62], [48, 84], [22, 112], [150, 62], [184, 34], [118, 40]] },
  { name: 'Fork Wood', trees: [[1176, 500], [1206, 486], [1236, 510], [1290, 500], [1262, 528]] },
  { name: 'Barrow Pines', trees: [[290, 900], [322, 924], [356, 896], [300, 952], [340, 972], [272, 990], [318, 1012]] },
  { name: 'Chapel Spinney', trees: [[920, 800], [952, 826], [986, 800], [962, 872], [988, 906], [938, 770]] },
  { name: 'Heath Firs', trees: [[1450, 866], [1482, 892], [1440, 920], [1492, 942], [1422, 888]] },
  { name: 'Warren Oaks', trees: [[30, 880], [56, 904], [24, 934], [58, 960], [148, 872], [176, 896]] },
  { name: 'Moor Top', trees: [[850, 980], [826, 950], [884, 996]] },
  { name: 'Ridge Top', trees: [[560, 10], [1210, 14], [1236, 26], [800, 12]] },
];

export const fieldDrawings: readonly { readonly name: string; readonly ring: Pen }[] = [
  { name: 'Ferry Field', ring: [[140, 466], [290, 432], [300, 488], [180, 520]] },
  { name: 'Weir Meadow', ring: [[500, 384], [690, 358], [700, 404], [540, 424]] },
  { name: 'Warren Field', ring: [[130, 820], [230, 780], [300, 806], [240, 850], [190, 930], [130, 990], [124, 900]] },
  { name: 'Fork Field', ring: [[1120, 344], [1230, 350], [1330, 320], [1318, 366], [1230, 386], [1130, 398]] },
];

export const ridgeDrawing: Pen = [[120, 34], [300, 18], [480, 30], [640, 14], [900, 8], [1180, 30], [1420, 16], [1600, 40]];
