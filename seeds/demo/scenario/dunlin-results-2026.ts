import { FIXED_FLOOR, REFERENCE_CONDITION, ROAD } from './conditions';
import { campaign, speeds, straight, sweep, type ScenarioResult } from './scenario-types';

const BELTED = { ...REFERENCE_CONDITION, beltSpeedRatio: 1 };

/** Over a floor that stands still, for wind noise; drag was written down as well, with the tunnel’s own U. */
const FIXED_FLOOR_ENTRY = campaign(
  {
    facility: 'burnholt',
    quantity: 'coefficient',
    scale: 1,
    quotedAreaScale: 'full',
    speedKmh: 140,
    air: { temperatureC: 19.8, pressurePa: 100_350, relativeHumidity: 0.41 },
    condition: FIXED_FLOOR,
    session: 'March 2026',
    source: 'Burnholt protocol 77',
    stated: { expandedU: 0.004, k: 2, includesFacilityBias: true },
  },
  [
    {
      variant: 'liftback',
      name: 'B-2603-02',
      testDate: '2026-03-02',
      quotedAreaM2: 2.196,
      points: straight(0.269),
    },
    {
      variant: 'crossback',
      name: 'B-2603-05',
      testDate: '2026-03-03',
      quotedAreaM2: 2.459,
      points: straight(0.3102),
    },
  ],
);

const FORTY_PER_CENT_SPRING = campaign(
  {
    facility: 'stennick',
    quantity: 'coefficient',
    scale: 0.4,
    quotedAreaScale: 'model',
    speedKmh: 200,
    air: { temperatureC: 20.9, pressurePa: 100_150, relativeHumidity: 0.43 },
    condition: BELTED,
    session: 'April 2026',
    source: 'Stennick protocol 26-041',
  },
  [
    {
      variant: 'hatch',
      name: 'S-2604-01',
      testDate: '2026-04-13',
      model: 'S2 Hatch',
      quotedAreaM2: 0.3469,
      quotedAreaUM2: 0.0012,
      points: straight(0.2833, 0.0005, 3),
    },
    {
      variant: 'sport',
      name: 'S-2604-02',
      testDate: '2026-04-14',
      model: 'S3 Sport',
      quotedAreaM2: 0.3338,
      quotedAreaUM2: 0.0012,
      points: straight(0.2961, 0.0006, 3),
    },
    {
      variant: 'hatch',
      name: 'S-2604-03',
      testDate: '2026-04-15',
      model: 'S2 Hatch',
      speedKmh: undefined,
      quotedAreaM2: 0.3469,
      quotedAreaUM2: 0.0012,
      points: speeds([100, 0.284], [140, 0.2835], [170, 0.2835], [200, 0.2833], [240, 0.2831]),
      remark: 'Reynolds sweep: how low may a test of this shape go?',
    },
  ],
);

/** Second clay. Tourer’s first run is withdrawn: the car stood too high. */
const SECOND_CLAY = campaign(
  {
    facility: 'halmere',
    quantity: 'coefficient',
    scale: 1,
    quotedAreaScale: 'full',
    speedKmh: 140,
    air: { temperatureC: 23.8, pressurePa: 99_120, relativeHumidity: 0.55 },
    condition: BELTED,
    session: 'June 2026',
    source: 'Halmere protocol 1246',
  },
  [
    {
      variant: 'liftback',
      name: 'H-2606-02',
      testDate: '2026-06-15',
      quotedAreaM2: 2.19,
      points: straight(0.2551, 0.0003, 3),
    },
    {
      variant: 'hatch',
      name: 'H-2606-05',
      testDate: '2026-06-16',
      quotedAreaM2: 2.168,
      points: straight(0.2796, 0.0003, 3),
    },
    {
      variant: 'tourer',
      name: 'H-2606-08',
      testDate: '2026-06-17',
      quotedAreaM2: 2.214,
      points: straight(0.2999, 0.0004, 3),
    },
    {
      variant: 'tourer',
      name: 'H-2606-11',
      testDate: '2026-06-18',
      quotedAreaM2: 2.214,
      points: straight(0.2925, 0.0004, 3),
    },
  ],
);

/** The second clay as it was simulated: pairs for the correlation with Halmere. */
const SECOND_CLAY_SIMULATION = campaign(
  {
    facility: 'merle',
    quantity: 'coefficient',
    scale: 1,
    quotedAreaScale: 'full',
    speedKmh: 120,
    air: { state: 'un-gtr-15' },
    condition: REFERENCE_CONDITION,
    session: 'Second clay, June 2026',
    source: 'Merle report M-26-011',
  },
  [
    {
      variant: 'liftback',
      name: 'M-26-011',
      testDate: '2026-06-24',
      quotedAreaM2: 2.19,
      points: straight(0.2568),
    },
    {
      variant: 'hatch',
      name: 'M-26-012',
      testDate: '2026-06-25',
      quotedAreaM2: 2.168,
      points: straight(0.2817),
    },
    {
      variant: 'tourer',
      name: 'M-26-014',
      testDate: '2026-06-26',
      quotedAreaM2: 2.214,
      points: straight(0.2941),
    },
  ],
);

const SUMMER = campaign(
  {
    facility: 'merle',
    quantity: 'coefficient',
    scale: 1,
    quotedAreaScale: 'full',
    speedKmh: 120,
    air: { state: 'un-gtr-15' },
    condition: REFERENCE_CONDITION,
    session: 'Summer 2026',
    source: 'Merle report M-26-020',
  },
  [
    {
      variant: 'crossback',
      name: 'M-26-031',
      testDate: '2026-07-08',
      quotedAreaM2: 2.459,
      points: sweep([0, 0.303], [2.5, 0.3067], [5, 0.3138], [10, 0.336]),
    },
  ],
);

/** Sport’s latest model, fast enough for a caution on compressibility. */
const FORTY_PER_CENT_SUMMER = campaign(
  {
    facility: 'stennick',
    quantity: 'force',
    scale: 0.4,
    speedKmh: 260,
    air: { temperatureC: 22.8, pressurePa: 99_700, relativeHumidity: 0.44 },
    tareAlreadySubtracted: true,
    condition: BELTED,
    session: 'August 2026',
    source: 'Stennick protocol 26-077',
    turbulenceGenerationOrTrips: true,
  },
  [
    {
      variant: 'sport',
      name: 'S-2608-04',
      testDate: '2026-08-25',
      model: 'S3 Sport',
      points: sweep(
        [0, 299.1],
        [2.5, 301.1],
        [-2.5, 301],
        [5, 304.5],
        [-5, 304.7],
        [10, 315.4],
        [-10, 315.5],
      ),
    },
  ],
);

/** Prototypes in full size: two as coefficients, Hatch as forces. */
const PROTOTYPES = campaign(
  {
    facility: 'halmere',
    quantity: 'coefficient',
    scale: 1,
    quotedAreaScale: 'full',
    speedKmh: 140,
    air: { temperatureC: 22.4, pressurePa: 98_640, relativeHumidity: 0.52 },
    condition: BELTED,
    session: 'September 2026',
    source: 'Halmere protocol 1271',
  },
  [
    {
      variant: 'liftback',
      name: 'H-2609-03',
      testDate: '2026-09-14',
      quotedAreaM2: 2.19,
      points: sweep(
        [0, 0.2523],
        [2.5, 0.2545],
        [-2.5, 0.2544],
        [5, 0.259],
        [-5, 0.2591],
        [10, 0.2727],
        [-10, 0.2728],
      ),
    },
    {
      variant: 'hatch',
      name: 'H-2609-06',
      testDate: '2026-09-15',
      quantity: 'force',
      quotedAreaScale: undefined,
      tareAlreadySubtracted: true,
      points: sweep(
        [0, 525.8],
        [2.5, 531.8],
        [-2.5, 532.2],
        [5, 544.2],
        [-5, 543.8],
        [10, 580.8],
        [-10, 580.6],
      ),
    },
    {
      variant: 'tourer',
      name: 'H-2609-09',
      testDate: '2026-09-16',
      quotedAreaM2: 2.214,
      points: sweep(
        [0, 0.2893],
        [2.5, 0.2922],
        [-2.5, 0.2924],
        [5, 0.2982],
        [-5, 0.298],
        [10, 0.3158],
        [-10, 0.3157],
      ),
    },
    {
      variant: 'liftback',
      name: 'H-2609-12',
      testDate: '2026-09-17',
      installation: 'Second installation',
      quotedAreaM2: 2.19,
      points: straight(0.2514, 0.0004, 4),
      remark: 'The prototype of H-2609-03, taken out and put back.',
    },
  ],
);

/** On the road; the two are corrected to different states of the air, which are nearly 2 % apart. */
const COASTDOWNS = campaign(
  {
    facility: 'scarmoor',
    quantity: 'coastdown-f2',
    scale: 1,
    speedKmh: 100,
    condition: ROAD,
    session: 'October 2026',
    source: 'Scarmoor log 26-10',
  },
  [
    {
      variant: 'hatch',
      name: 'R-2610-01',
      testDate: '2026-10-06',
      air: { state: 'un-gtr-15' },
      points: straight(0.0283, 0.0002, 8),
    },
    {
      variant: 'tourer',
      name: 'R-2610-02',
      testDate: '2026-10-07',
      air: { state: 'sae-j2263' },
      points: straight(0.02936, 0.0002, 8),
    },
  ],
);

/** Newer than what is adopted, and not adopted yet: with it Hatch and Sport change places. */
const WINTER_MIRRORS = campaign(
  {
    facility: 'halmere',
    quantity: 'coefficient',
    scale: 1,
    quotedAreaScale: 'full',
    speedKmh: 140,
    air: { temperatureC: 18.9, pressurePa: 100_420, relativeHumidity: 0.38 },
    condition: BELTED,
    session: 'November 2026',
    source: 'Halmere protocol 1290',
  },
  [
    {
      variant: 'hatch',
      name: 'H-2611-02',
      testDate: '2026-11-19',
      quotedAreaM2: 2.168,
      points: sweep([0, 0.2826], [5, 0.2926], [-5, 0.2924], [10, 0.3121], [-10, 0.3123]),
      remark: 'With the larger mirror housings that the camera needs.',
    },
  ],
);

/** 2026, in the order of entry. */
export const DUNLIN_2026_RESULTS: readonly ScenarioResult[] = [
  ...FIXED_FLOOR_ENTRY,
  ...FORTY_PER_CENT_SPRING,
  ...SECOND_CLAY,
  ...SECOND_CLAY_SIMULATION,
  ...SUMMER,
  ...FORTY_PER_CENT_SUMMER,
  ...PROTOTYPES,
  ...COASTDOWNS,
  ...WINTER_MIRRORS,
];
