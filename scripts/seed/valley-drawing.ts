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
  { key: 'ridge', name: 'Ridge Road', roadClass: 'lane', pen: [[-40, 190], [96, 168], [240, 112], [410, 106], [540, 70], [672, 96], [840, 64], [1016, 108], [1150, 82], [1282, 122], [1410, 96], [1560, 126], [1650, 118]] },
  { key: 'valley', name: 'Valley Road', roadClass: 'main', pen: [[-40, 398], [92, 400], [250, 346], [384, 358], [560, 376], [698, 340], [850, 300], [994, 326], [1140, 338], [1296, 302], [1420, 264], [1572, 286], [1650, 274]] },
  { key: 'quarry', name: 'Quarry Road', roadClass: 'main', pen: [[-40, 812], [84, 800], [220, 742], [366, 776], [550, 806], [712, 746], [860, 718], [1004, 772], [1140, 830], [1286, 806], [1420, 770], [1574, 806], [1650, 826]] },
  { key: 'moor', name: 'Moor Lane', roadClass: 'lane', pen: [[-40, 1010], [96, 1036], [250, 1060], [428, 1032], [580, 1056], [724, 1018], [860, 1024], [992, 1052], [1120, 1064], [1272, 1036], [1420, 1052], [1596, 1040], [1650, 1044]] },
  { key: 'ferry', name: 'Ferry Lane', roadClass: 'lane', pen: [[74, -40], [96, 168], [66, 280], [92, 400], [100, 446]] },
  { key: 'saltings', name: 'Saltings Lane', roadClass: 'lane', pen: [[122, 586], [80, 690], [84, 800], [116, 910], [96, 1036], [70, 1140]] },
  { key: 'orchard', name: 'Orchard Hill', roadClass: 'road', pen: [[432, -40], [410, 106], [368, 230], [384, 358], [436, 476], [408, 620], [366, 776], [410, 900], [428, 1032], [404, 1140]] },
  { key: 'halt', name: 'Halt Street', roadClass: 'road', pen: [[654, -40], [672, 96], [724, 210], [698, 340], [720, 466], [682, 590], [712, 746], [762, 884], [724, 1018], [736, 1140]] },
  { key: 'mill', name: 'Mill Hill', roadClass: 'road', pen: [[1040, -40], [1016, 108], [966, 220], [994, 326], [1044, 410], [1036, 530], [976, 660], [1004, 772], [966, 900], [992, 1052], [1016, 1140]] },
  { key: 'barrow', name: 'Barrow Lane', roadClass: 'road', pen: [[1254, -40], [1282, 122], [1334, 216], [1296, 302], [1266, 430], [1306, 630], [1286, 806], [1312, 920], [1272, 1036], [1250, 1140]] },
  { key: 'timber', name: 'Timber Lane', roadClass: 'lane', pen: [[1586, -40], [1560, 126], [1546, 200], [1572, 286], [1552, 430], [1580, 630], [1574, 806], [1612, 920], [1596, 1040], [1620, 1140]] },
  { key: 'chapel', name: 'Chapel Lane', roadClass: 'lane', pen: [[712, 746], [832, 846], [880, 950], [992, 1052]] },
  { key: 'warren', name: 'Warren Lane', roadClass: 'lane', pen: [[366, 776], [254, 860], [208, 960], [96, 1036]] },
];

/** The Alder and its north fork in one line, then the south fork, from mouth to source; drawn far wider than life. */
export const riverDrawings = [
  { key: 'alder', name: 'the Alder', widthMeters: [820, 420], pen: [[-60, 524], [60, 504], [180, 456], [320, 430], [450, 448], [600, 444], [740, 410], [870, 388], [970, 402], [1080, 422], [1190, 410], [1300, 382], [1440, 356], [1580, 366], [1680, 344]] },
  { key: 'south-fork', name: 'the South Fork', widthMeters: [300, 250], pen: [[850, 392], [920, 430], [1000, 492], [1090, 540], [1200, 578], [1306, 622], [1420, 684], [1560, 704], [1680, 740]] },
] as const;

/** One railway with its halt; where it went, nobody living has been. */
export const railwayDrawing: Pen = [[-60, 620], [60, 596], [190, 546], [310, 516], [436, 522], [580, 526], [720, 496], [860, 486], [960, 500], [1050, 476], [1160, 466], [1274, 446], [1420, 428], [1560, 440], [1680, 424]];
export const haltPoint = [720, 496] as const;

/** Field edges and banks that bound a neighbourhood where no road does. */
export const hedgeDrawings: Readonly<Record<string, Pen>> = {
  ferryWest: [[50, 424], [28, 350], [46, 300], [26, 244], [48, 206], [38, 150]],
  saltingsWest: [[24, 568], [44, 630], [22, 698], [48, 746], [34, 840]],
  millNorth: [[960, 596], [1010, 584], [1080, 606], [1130, 586], [1190, 630], [1260, 634], [1340, 690]],
  quarrySouth: [[380, 996], [450, 1008], [520, 984], [590, 1006], [660, 978], [780, 1000]],
  kilnsEast: [[1246, 780], [1236, 860], [1262, 930], [1240, 1000], [1256, 1080]],
  timberEast: [[1530, 60], [1540, 140], [1516, 190], [1540, 240], [1530, 330]],
  weirEast: [[950, 20], [958, 90], [928, 160], [952, 230], [930, 290], [946, 350]],
  orchardsEast: [[656, 40], [640, 110], [674, 180], [644, 250], [664, 320], [650, 396]],
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
  { key: 'the-ferry-end', name: 'the ferry end', inWords: 'the ferry end, on the north bank', homes: 140, label: [222, 240], bounds: ['ridge', 'orchard', 'valley', 'ferryWest'] },
  { key: 'the-old-orchards', name: 'the old orchards', inWords: 'the old orchards, on the north bank', homes: 210, label: [520, 222], bounds: ['ridge', 'orchardsEast', 'valley', 'orchard'] },
  { key: 'above-the-weir', name: 'above the weir', inWords: 'the north bank, above the weir', homes: 180, label: [826, 188], bounds: ['ridge', 'weirEast', 'valley', 'halt'] },
  { key: 'the-ridge', name: 'the ridge', inWords: 'the ridge, on the north bank', homes: 120, label: [1146, 212], bounds: ['ridge', 'barrow', 'valley', 'mill'] },
  { key: 'the-timber-side', name: 'the timber side', inWords: 'the timber side, up the north fork', homes: 95, label: [1428, 180], bounds: ['ridge', 'timberEast', 'valley', 'barrow'] },
  { key: 'the-saltings', name: 'the saltings', inWords: 'the saltings, down the valley', homes: 160, label: [222, 642], bounds: ['railway', 'orchard', 'quarry', 'saltingsWest'] },
  { key: 'the-halt-side', name: 'the halt side', inWords: 'the halt side, west of the town', homes: 320, label: [548, 652], bounds: ['railway', 'halt', 'quarry', 'orchard'] },
  { key: 'the-middle-of-the-town', name: 'the middle of the town', inWords: 'the middle of the town', homes: 540, label: [838, 596], bounds: ['railway', 'mill', 'quarry', 'halt'] },
  { key: 'below-the-mill', name: 'below the mill', inWords: 'below the mill, on the way out east', homes: 230, label: [1140, 712], bounds: ['millNorth', 'barrow', 'quarry', 'mill'] },
  { key: 'the-long-meadows', name: 'the long meadows', inWords: 'the long meadows, between the forks', homes: 110, label: [1430, 536], bounds: ['railway', 'timber', 'south-fork', 'barrow'] },
  { key: 'the-quarry-end', name: 'the quarry end', inWords: 'the quarry end, on the south side', homes: 170, label: [562, 904], bounds: ['quarry', 'halt', 'quarrySouth', 'orchard'] },
  { key: 'the-kilns', name: 'the kilns', inWords: 'the kilns, under the moor', homes: 130, label: [1108, 936], bounds: ['quarry', 'kilnsEast', 'moor', 'mill'] },
  { key: 'the-chapel-rise', name: 'the chapel rise', inWords: 'the chapel rise, south of the town', homes: 190, label: [896, 856], bounds: ['quarry', 'mill', 'chapel'] },
  { key: 'the-barrows', name: 'the barrows', inWords: 'the barrows, under the moor', homes: 75, label: [290, 960], bounds: ['warren', 'orchard', 'moor'] },
  { key: 'the-heath', name: 'the heath', inWords: 'the heath, on the way out east', homes: 60, label: [1440, 900], bounds: ['quarry', 'timber', 'moor', 'barrow'] },
];

/** Woods are clumps of drawn trees, fields are furrows, the ridge is a line of hachures. */
export const woodDrawings: readonly { readonly name: string; readonly trees: Pen }[] = [
  { name: 'Gorsefoot Wood', trees: [[1596, 190], [1572, 226], [1600, 240], [1620, 150]] },
  { name: 'Ferry Copse', trees: [[34, 92], [62, 112], [30, 138], [160, 92], [194, 64], [136, 62]] },
  { name: 'Fork Wood', trees: [[1130, 520], [1160, 506], [1192, 530], [1234, 516], [1214, 544]] },
  { name: 'Barrow Pines', trees: [[280, 900], [312, 924], [340, 896], [290, 952], [326, 972], [262, 990], [306, 1012], [350, 1010]] },
  { name: 'Chapel Spinney', trees: [[880, 800], [912, 826], [944, 802], [922, 872], [944, 906], [900, 772]] },
  { name: 'Heath Firs', trees: [[1420, 856], [1452, 882], [1410, 910], [1462, 932], [1392, 878], [1520, 880], [1546, 904]] },
  { name: 'Warren Oaks', trees: [[30, 880], [56, 904], [30, 934], [58, 960], [160, 872], [186, 896]] },
  { name: 'Moor Top', trees: [[806, 980], [788, 950], [838, 996]] },
];

export const fieldDrawings: readonly { readonly name: string; readonly ring: Pen }[] = [
  { name: 'Ferry Field', ring: [[150, 508], [290, 474], [300, 506], [180, 540]] },
  { name: 'Weir Meadow', ring: [[470, 386], [660, 362], [670, 396], [510, 416]] },
  { name: 'Warren Field', ring: [[130, 820], [220, 780], [290, 806], [236, 850], [186, 930], [130, 986], [124, 900]] },
  { name: 'Fork Field', ring: [[1070, 350], [1180, 354], [1276, 324], [1264, 366], [1180, 386], [1080, 394]] },
  { name: 'Mill Field', ring: [[1330, 690], [1400, 716], [1552, 736], [1550, 780], [1420, 750], [1330, 776]] },
];

export const ridgeDrawing: Pen = [[110, 52], [240, 36], [400, 46], [560, 28], [720, 40], [880, 24], [1060, 42], [1240, 52], [1420, 34], [1560, 50]];
