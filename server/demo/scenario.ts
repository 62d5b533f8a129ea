import type { LayeredEarth, Spread } from '../../inversion/index';
import type { Role } from '../contract/roles';
import type { BedRole } from '../contract/interpretations';

/**
 * The Ostrel valley: an invented valley with an invented village that looks for a second supply well.
 * Three lines of soundings cross it. The ground below each is stated here; the crew's sheets are computed from it.
 * Coordinates are metres east and north on the survey's own grid.
 */
export const SURVEY = {
  name: 'Ostrel valley',
  description:
    'Second supply well for the village of Ostrel. Three lines across the valley: is there a gravel bed thick enough, ' +
    'and how far up the valley does the brackish water reach?',
  grid: 'Valley grid, origin at the old mill, x east, y north',
  errorFloor: 0.03,
} as const;

/** The last day of the crew's season; the demo stands by it, whatever the clock of the machine says. */
export const LAST_FIELD_DAY = '2026-05-26';

export const DEMO_PASSWORD = 'ostrel-valley-well';

export interface DemoPerson {
  readonly email: string;
  readonly name: string;
  readonly role: Role | 'admin';
}

export const PEOPLE = [
  { email: 'lead@layerwell.example', name: 'Ana Dorvik', role: 'lead' },
  { email: 'geophysicist@layerwell.example', name: 'Bram Tollesk', role: 'geophysicist' },
  { email: 'hydrogeologist@layerwell.example', name: 'Cela Windrow', role: 'hydrogeologist' },
  { email: 'analyst@layerwell.example', name: 'Dov Harlin', role: 'analyst' },
  { email: 'guest@layerwell.example', name: 'Edda Pookley', role: 'guest' },
  { email: 'admin@layerwell.example', name: 'Fenn Astorel', role: 'admin' },
] as const satisfies readonly DemoPerson[];

export const LINES = ['Line 1', 'Line 2', 'Line 3'] as const;

export interface DemoSounding {
  readonly name: string;
  readonly line: (typeof LINES)[number];
  readonly xM: number;
  readonly yM: number;
  readonly elevationM: number;
  readonly azimuthDeg: number;
  readonly measuredOn: string;
  readonly array: 'schlumberger' | 'wenner';
  readonly ground: LayeredEarth;
  readonly note?: string;
  /** the sheet has decimal commas and semicolons */
  readonly decimalComma?: true;
  /** what went wrong in the field */
  readonly trouble?:
    | { readonly kind: 'branch-shift'; readonly halfMN: number; readonly factor: number }
    | {
        readonly kind: 'outlier';
        readonly spacing: number;
        readonly factor: number;
        readonly excluded: string | null;
      };
}

const ground = (resistivity: number[], thickness: number[]): LayeredEarth => ({ resistivity, thickness });

const onLine = (
  line: DemoSounding['line'],
  yM: number,
  measuredOn: string,
): Pick<DemoSounding, 'line' | 'yM' | 'azimuthDeg' | 'measuredOn' | 'array'> => ({
  line,
  yM,
  azimuthDeg: 0,
  measuredOn,
  array: 'schlumberger',
});

const L1 = onLine('Line 1', 2400, '2026-05-18');
const L2 = onLine('Line 2', 1300, '2026-05-20');
const L3 = onLine('Line 3', 250, LAST_FIELD_DAY);

export const SOUNDINGS: readonly DemoSounding[] = [
  // Line 1, the upper valley: gravel over crystalline basement, shallow on the flanks
  { ...L1, name: 'S-01', xM: 120, elevationM: 418.2, ground: ground([420, 150, 2600], [1.6, 7.5]) },
  { ...L1, name: 'S-02', xM: 290, elevationM: 411.6, ground: ground([260, 125, 2200], [2.1, 16]) },
  { ...L1, name: 'S-03', xM: 455, elevationM: 407.9, ground: ground([190, 34, 118, 1800], [1.8, 4.2, 21]) },
  {
    ...L1,
    name: 'S-04',
    xM: 610,
    elevationM: 406.3,
    decimalComma: true,
    ground: ground([165, 28, 112, 1700], [2.3, 5.1, 26]),
  },
  {
    ...L1,
    name: 'S-05',
    xM: 790,
    elevationM: 409.4,
    array: 'wenner',
    ground: ground([240, 120, 1900], [2.6, 15]),
  },
  {
    ...L1,
    name: 'S-06',
    xM: 950,
    elevationM: 417.5,
    array: 'wenner',
    ground: ground([480, 1500], [2.4]),
    note: 'Outcrop of crystalline rock 60 m to the east.',
  },
  // Line 2, at the village: the thick gravel over marl, and a bed that the curve cannot show
  {
    ...L2,
    name: 'S-07',
    xM: 260,
    elevationM: 396.4,
    ground: ground([139, 15, 122, 12], [2.5, 2.2, 36]),
    trouble: {
      kind: 'outlier',
      spacing: 6.8,
      factor: 1.24,
      excluded: 'cable wet in the rain; not repeated',
    },
    note: 'Proposed site of the second supply well.',
  },
  { ...L2, name: 'S-08', xM: 400, elevationM: 394.8, ground: ground([128, 17, 116, 12], [2.2, 3.0, 31]) },
  { ...L2, name: 'S-09', xM: 540, elevationM: 393.9, ground: ground([110, 19, 108, 13], [1.9, 4.4, 24]) },
  {
    ...L2,
    name: 'S-10',
    xM: 680,
    elevationM: 393.6,
    ground: ground([95, 21, 98, 13], [1.7, 5.6, 19]),
    trouble: { kind: 'branch-shift', halfMN: 2, factor: 1.15 },
    note: 'Backfilled ditch between M and N of the middle branch.',
  },
  {
    ...L2,
    name: 'S-11',
    xM: 820,
    elevationM: 394.1,
    decimalComma: true,
    ground: ground([105, 22, 90, 14], [2.0, 6.8, 14]),
  },
  {
    ...L2,
    name: 'S-12',
    xM: 960,
    elevationM: 395.2,
    ground: ground([48, 95, 420, 1500], [9, 7, 12]),
    note: 'Weathered rock is expected between the gravel and the fresh rock.',
  },
  {
    ...L2,
    name: 'S-13',
    xM: 1090,
    elevationM: 397.8,
    ground: ground([220, 60, 1400], [2.4, 11]),
    trouble: { kind: 'outlier', spacing: 28, factor: 0.72, excluded: null },
  },
  {
    ...L2,
    name: 'S-14',
    xM: 1210,
    elevationM: 401.3,
    array: 'wenner',
    ground: ground([310, 75, 1700], [2.1, 6.5]),
  },
  { ...L2, name: 'S-15', xM: 1330, elevationM: 407.0, array: 'wenner', ground: ground([520, 1900], [1.9]) },
  // Line 3, the lower valley: a wedge of brackish water under the fresh, thickening towards the west
  {
    ...L3,
    name: 'S-16',
    xM: 180,
    elevationM: 384.1,
    ground: ground([85, 62, 3.1], [1.5, 9]),
    note: 'Ditch with brackish water 40 m to the south.',
  },
  { ...L3, name: 'S-17', xM: 330, elevationM: 384.4, ground: ground([92, 66, 3.4], [1.7, 12]) },
  { ...L3, name: 'S-18', xM: 480, elevationM: 384.9, ground: ground([100, 70, 3.9], [1.8, 16.5]) },
  {
    ...L3,
    name: 'S-19',
    xM: 620,
    elevationM: 385.3,
    decimalComma: true,
    ground: ground([108, 74, 4.6], [1.9, 22]),
  },
  { ...L3, name: 'S-20', xM: 760, elevationM: 385.9, ground: ground([112, 20, 80, 5.5], [2.0, 3.2, 26]) },
  { ...L3, name: 'S-21', xM: 890, elevationM: 386.6, ground: ground([118, 18, 88, 7.5], [2.1, 4.0, 30]) },
  { ...L3, name: 'S-22', xM: 1030, elevationM: 387.8, ground: ground([125, 20, 95, 14], [2.3, 3.6, 27]) },
  {
    ...L3,
    name: 'S-23',
    xM: 1160,
    elevationM: 390.1,
    array: 'wenner',
    ground: ground([180, 90, 15], [2.5, 18]),
  },
  {
    ...L3,
    name: 'S-24',
    xM: 1290,
    elevationM: 394.7,
    array: 'wenner',
    ground: ground([260, 105, 900], [2.2, 12]),
  },
];

/** Schlumberger steps with an overlap at each change of MN, as [AB/2, MN/2] in m. */
export const SCHLUMBERGER_LADDER: readonly (readonly [number, number])[] = [
  ...[1.5, 2, 2.7, 3.6].map((halfAB) => [halfAB, 0.25] as const),
  ...[3.6, 5, 6.8, 9, 12].map((halfAB) => [halfAB, 0.5] as const),
  ...[12, 16, 21, 28, 38, 50].map((halfAB) => [halfAB, 2] as const),
  ...[50, 68, 90, 120, 160].map((halfAB) => [halfAB, 8] as const),
  ...[160, 210, 280, 370].map((halfAB) => [halfAB, 30] as const),
];
/** Wenner spacings a, m. */
export const WENNER_LADDER: readonly number[] = [1, 1.5, 2, 3, 4.5, 6, 9, 13, 18, 27, 40, 60, 90, 130];

export const spreadsOf = (array: DemoSounding['array']): Spread[] =>
  array === 'wenner'
    ? WENNER_LADDER.map((spacing) => ({ type: 'wenner', spacing }))
    : SCHLUMBERGER_LADDER.map(([halfAB, halfMN]) => ({ type: 'schlumberger', halfAB, halfMN }));

export const BOREHOLES = [
  {
    name: 'BH-1',
    xM: 470,
    yM: 2385,
    elevationM: 407.7,
    depthM: 34,
    drilledOn: '1998-09-14',
    note: 'Village well no. 1; log from the driller’s notebook.',
    intervals: [
      { topM: 0, baseM: 1.9, description: 'dry silty gravel' },
      { topM: 1.9, baseM: 6.2, description: 'stiff clay with stones' },
      { topM: 6.2, baseM: 27.4, description: 'sandy gravel, water-bearing' },
      { topM: 27.4, baseM: 34, description: 'crystalline rock, fresh below 29 m' },
    ],
    waterLevels: [
      { measuredOn: '1998-09-20', depthM: 5.1 },
      { measuredOn: '2026-05-18', depthM: 6.4 },
    ],
  },
  {
    name: 'BH-2',
    xM: 545,
    yM: 1312,
    elevationM: 393.8,
    depthM: 38,
    drilledOn: '2011-06-02',
    note: 'Observation hole of the village.',
    intervals: [
      { topM: 0, baseM: 2.0, description: 'sandy silt, dry' },
      { topM: 2.0, baseM: 6.5, description: 'grey clay' },
      { topM: 6.5, baseM: 30.6, description: 'gravel and coarse sand, water-bearing' },
      { topM: 30.6, baseM: 38, description: 'grey marl' },
    ],
    waterLevels: [
      { measuredOn: '2011-06-05', depthM: 3.2 },
      { measuredOn: '2026-05-20', depthM: 3.9 },
    ],
  },
  {
    name: 'BH-3',
    xM: 1195,
    yM: 1290,
    elevationM: 400.8,
    depthM: 22,
    drilledOn: '2011-06-09',
    note: 'Stopped in rock.',
    intervals: [
      { topM: 0, baseM: 2.2, description: 'dry gravel' },
      { topM: 2.2, baseM: 8.8, description: 'weathered rock, damp' },
      { topM: 8.8, baseM: 22, description: 'crystalline rock, few joints' },
    ],
    waterLevels: [{ measuredOn: '2011-06-12', depthM: 7.9 }],
  },
  {
    name: 'BH-4',
    xM: 470,
    yM: 262,
    elevationM: 384.8,
    depthM: 30,
    drilledOn: '2019-10-22',
    note: 'Water turned brackish at 18.1 m; hole plugged below 17 m.',
    intervals: [
      { topM: 0, baseM: 1.8, description: 'sandy soil' },
      { topM: 1.8, baseM: 18.1, description: 'sand and gravel, fresh water' },
      { topM: 18.1, baseM: 30, description: 'sand and gravel, brackish water' },
    ],
    waterLevels: [
      { measuredOn: '2019-10-25', depthM: 1.6 },
      { measuredOn: LAST_FIELD_DAY, depthM: 1.9 },
    ],
  },
] as const;

export interface DemoInterpretation {
  readonly sounding: string;
  readonly layers: number;
  readonly title: string;
  readonly narrative: string;
  readonly beds: readonly {
    readonly ground: string;
    readonly role: BedRole;
    readonly confidence: 'well-supported' | 'likely' | 'possible';
    readonly otherCandidates: string;
  }[];
  readonly waterLevelDepthM: number | null;
  readonly end: 'draft' | 'in-review' | 'accepted';
}
