import { REFERENCE_CONDITION } from './conditions';
import { campaign, straight, sweep, type ScenarioResult } from './scenario-types';

/** Concept: simulated bodies, each coefficient formed with the frontal area of its own surface model. */
const CONCEPT_SIMULATION = campaign(
  {
    facility: 'merle',
    quantity: 'coefficient',
    scale: 1,
    quotedAreaScale: 'full',
    speedKmh: 120,
    air: { state: 'un-gtr-15' },
    condition: REFERENCE_CONDITION,
    session: 'Concept, spring 2024',
    source: 'Merle report M-24-017',
  },
  [
    {
      variant: 'liftback',
      name: 'M-24-101',
      testDate: '2024-04-11',
      quotedAreaM2: 2.205,
      points: straight(0.2685),
    },
    {
      variant: 'hatch',
      name: 'M-24-102',
      testDate: '2024-04-15',
      quotedAreaM2: 2.185,
      points: straight(0.2902),
    },
    {
      variant: 'sport',
      name: 'M-24-103',
      testDate: '2024-04-22',
      quotedAreaM2: 2.07,
      points: straight(0.3053),
    },
    {
      variant: 'tourer',
      name: 'M-24-104',
      testDate: '2024-05-06',
      quotedAreaM2: 2.23,
      points: straight(0.304),
    },
    {
      variant: 'crossback',
      name: 'M-24-105',
      testDate: '2024-05-13',
      quotedAreaM2: 2.48,
      points: straight(0.3226),
    },
  ],
);

const MILD = { temperatureC: 24.2, pressurePa: 100_900, relativeHumidity: 0.48 };

/**
 * First models of 25 %: forces in small numbers. Sport’s still holds its tare; Crossback nearly fills the section;
 * Tourer was driven past Mach 0.3 for a higher Reynolds number, Hatch too slowly for any.
 */
const QUARTER_SCALE = campaign(
  {
    facility: 'corrie',
    quantity: 'force',
    scale: 0.25,
    speedKmh: 216,
    air: MILD,
    tareAlreadySubtracted: true,
    condition: REFERENCE_CONDITION,
    session: 'September 2024',
    source: 'Corrie protocol 24/31',
  },
  [
    {
      variant: 'liftback',
      name: 'C-2409-01',
      testDate: '2024-09-09',
      model: 'C1 Liftback',
      points: straight(78.9, 0.2, 3),
    },
    {
      variant: 'hatch',
      name: 'C-2409-02',
      testDate: '2024-09-10',
      model: 'C2 Hatch',
      points: straight(85, 0.3, 3),
    },
    {
      variant: 'hatch',
      name: 'C-2409-03',
      testDate: '2024-09-10',
      model: 'C2 Hatch',
      speedKmh: 86,
      points: straight(13.9, 0.1, 3),
      remark: 'Slow run for the smoke pictures.',
    },
    {
      variant: 'sport',
      name: 'C-2409-04',
      testDate: '2024-09-11',
      model: 'C3 Sport',
      tareAlreadySubtracted: false,
      tareN: 4.6,
      points: straight(89.5, 0.3, 3),
      remark: 'Tare of the struts still in the reading.',
    },
    {
      variant: 'tourer',
      name: 'C-2409-05',
      testDate: '2024-09-12',
      model: 'C4 Tourer',
      points: straight(90.8, 0.3, 3),
    },
    {
      variant: 'tourer',
      name: 'C-2409-06',
      testDate: '2024-09-12',
      model: 'C4 Tourer',
      speedKmh: 388,
      points: straight(290.1, 0.9, 3),
      remark: 'As fast as the fan allows, to come nearer to the full-size Reynolds number.',
    },
    {
      variant: 'crossback',
      name: 'C-2409-07',
      testDate: '2024-09-13',
      model: 'C5 Crossback',
      air: { temperatureC: 28.6, pressurePa: 100_750, relativeHumidity: 0.39 },
      points: straight(105.7, 0.4, 3),
    },
  ],
);

/** Second round of simulations. Sport was divided by Liftback’s area, and so looks better than Hatch: 0.282 against 0.284. */
const PROPORTIONS_SIMULATION = campaign(
  {
    facility: 'merle',
    quantity: 'coefficient',
    scale: 1,
    quotedAreaScale: 'full',
    speedKmh: 120,
    air: { state: 'un-gtr-15' },
    condition: REFERENCE_CONDITION,
    session: 'Proportions, winter 2025',
    source: 'Merle report M-25-004',
  },
  [
    {
      variant: 'liftback',
      name: 'M-25-011',
      testDate: '2025-01-27',
      quotedAreaM2: 2.205,
      points: straight(0.2603),
    },
    {
      variant: 'hatch',
      name: 'M-25-012',
      testDate: '2025-01-29',
      quotedAreaM2: 2.185,
      points: straight(0.2838),
    },
    {
      variant: 'sport',
      name: 'M-25-013',
      testDate: '2025-02-03',
      quotedAreaM2: 2.205,
      points: straight(0.2816),
      remark: 'Divided by the area of the Liftback.',
    },
    {
      variant: 'tourer',
      name: 'M-25-014',
      testDate: '2025-02-05',
      quotedAreaM2: 2.23,
      points: straight(0.2969),
    },
    {
      variant: 'crossback',
      name: 'M-25-015',
      testDate: '2025-02-10',
      quotedAreaM2: 2.48,
      points: straight(0.3149),
    },
  ],
);

/** Models of 40 %: coefficients formed with each model’s own measured area, which is a sixth of the car’s. */
const FORTY_PER_CENT_2025 = campaign(
  {
    facility: 'stennick',
    quantity: 'coefficient',
    scale: 0.4,
    quotedAreaScale: 'model',
    speedKmh: 200,
    air: { temperatureC: 21.4, pressurePa: 99_600, relativeHumidity: 0.5 },
    condition: REFERENCE_CONDITION,
    session: 'May 2025',
    source: 'Stennick protocol 25-112',
  },
  [
    {
      variant: 'liftback',
      name: 'S-2505-01',
      testDate: '2025-05-19',
      model: 'S1 Liftback',
      quotedAreaM2: 0.3528,
      quotedAreaUM2: 0.0012,
      points: sweep(
        [0, 0.2633],
        [2.5, 0.2659],
        [-2.5, 0.2655],
        [5, 0.2705],
        [-5, 0.2704],
        [10, 0.2849],
        [-10, 0.2849],
      ),
    },
    {
      variant: 'hatch',
      name: 'S-2505-02',
      testDate: '2025-05-20',
      model: 'S2 Hatch',
      quotedAreaM2: 0.3496,
      quotedAreaUM2: 0.0012,
      points: straight(0.2867, 0.0005, 3),
    },
    {
      variant: 'sport',
      name: 'S-2505-03',
      testDate: '2025-05-21',
      model: 'S3 Sport',
      quotedAreaM2: 0.3312,
      quotedAreaUM2: 0.0012,
      points: straight(0.3034, 0.0006, 3),
    },
    {
      variant: 'tourer',
      name: 'S-2505-04',
      testDate: '2025-05-22',
      model: 'S4 Tourer',
      quotedAreaM2: 0.3568,
      quotedAreaUM2: 0.0012,
      points: sweep(
        [0, 0.3003],
        [2.5, 0.3031],
        [-2.5, 0.3031],
        [5, 0.3093],
        [-5, 0.3095],
        [10, 0.3277],
        [-10, 0.3274],
      ),
    },
    {
      variant: 'crossback',
      name: 'S-2505-05',
      testDate: '2025-05-23',
      model: 'S5 Crossback',
      quotedAreaM2: 0.3968,
      quotedAreaUM2: 0.0014,
      points: straight(0.3193, 0.0006, 3),
    },
  ],
);

/** First clay in full size, as forces. */
const FIRST_CLAY = campaign(
  {
    facility: 'halmere',
    quantity: 'force',
    scale: 1,
    speedKmh: 140,
    air: { temperatureC: 20.6, pressurePa: 99_850, relativeHumidity: 0.46 },
    tareAlreadySubtracted: true,
    condition: { ...REFERENCE_CONDITION, beltSpeedRatio: 1 },
    session: 'November 2025',
    source: 'Halmere protocol 1188',
  },
  [
    {
      variant: 'liftback',
      name: 'H-2511-03',
      testDate: '2025-11-17',
      points: [
        { yawDeg: 0, value: 506.4, frontLift: 46.2, rearLift: 81.5 },
        ...sweep([5, 519.9], [-5, 520.3], [10, 547.9], [-10, 548]),
      ],
    },
    { variant: 'hatch', name: 'H-2511-07', testDate: '2025-11-18', points: straight(547, 0.6, 3) },
    { variant: 'tourer', name: 'H-2511-12', testDate: '2025-11-19', points: straight(584, 0.7, 3) },
    { variant: 'crossback', name: 'H-2511-16', testDate: '2025-11-20', points: straight(691.5, 0.9, 3) },
  ],
);

/** 2024 and 2025, in the order of entry. */
export const DUNLIN_EARLY_RESULTS: readonly ScenarioResult[] = [
  ...CONCEPT_SIMULATION,
  ...QUARTER_SCALE,
  ...PROPORTIONS_SIMULATION,
  ...FORTY_PER_CENT_2025,
  ...FIRST_CLAY,
];
